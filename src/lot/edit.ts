import { EMPTY_LOT } from './entry.js';
import type { LotEntry, RunEntry, SiteProfile } from './entry.js';
import type { Figure } from './figure.js';
import type { RunList } from './keys.js';

export type RunCell = 'sample' | 'start' | 'end';

/** One thing a person changed. An undefined figure or text means the field was emptied. */
export type Edit =
  | { readonly kind: 'figure'; readonly key: string; readonly figure: Figure | undefined }
  | { readonly kind: 'option'; readonly key: string; readonly option: string }
  | { readonly kind: 'text'; readonly key: 'name' | 'source' | 'date' | 'titrantDate' | 'currency'; readonly text: string }
  | { readonly kind: 'cells'; readonly list: RunList; readonly cells: readonly CellEdit[] }
  | { readonly kind: 'strike'; readonly list: RunList; readonly index: number; readonly reason: string | undefined }
  | { readonly kind: 'replace'; readonly entry: LotEntry };

export interface CellEdit {
  readonly index: number;
  readonly cell: RunCell;
  readonly figure: Figure | undefined;
}

/** The entry after an edit; the one given is left as it is. */
export function applyEdit(entry: LotEntry, edit: Edit): LotEntry {
  switch (edit.kind) {
    case 'figure':
      return { ...entry, figures: withKey(entry.figures, edit.key, edit.figure) };
    case 'option':
      return withSampleUnits({ ...entry, options: withKey(entry.options, edit.key, edit.option) }, edit);
    case 'text':
      return withKey(entry, edit.key, edit.text || undefined);
    case 'cells':
    case 'strike':
      return withRuns(entry, edit);
    case 'replace':
      return edit.entry;
  }
}

/** The site profile after an edit of it; an undefined figure gives the default back. */
export function applySiteEdit(site: SiteProfile, edit: SiteEdit): SiteProfile {
  switch (edit.kind) {
    case 'figure':
      return { ...site, figures: withKey(site.figures, edit.key, edit.figure) };
    case 'option':
      return { ...site, options: withKey(site.options, edit.key, edit.option) };
    case 'text':
      return withKey(site, edit.key, edit.text || undefined);
    default:
      return withRuns(site, edit);
  }
}

/** An edit that a site profile takes too. */
export type SiteEdit = Exclude<Edit, { kind: 'replace' }>;

/** The runs of a list with cells filled, or one struck out. */
function withRuns<Document extends LotEntry | SiteProfile>(document: Document, edit: Extract<Edit, { kind: 'cells' | 'strike' }>): Document {
  const runs = (document as Partial<Record<RunList, readonly RunEntry[]>>)[edit.list] ?? [];
  const changed = edit.kind === 'cells'
    ? edit.cells.reduce(withCell, runs)
    : runs.map((run, index) => (index === edit.index ? withKey(run, 'struck', edit.reason) : run));
  return { ...document, [edit.list]: changed };
}

/** A new lot titrated in the same way: the titrant and the method stay, everything about the oil goes. */
export function nextLot(entry: LotEntry): LotEntry {
  const kept = (keys: readonly string[], from: Readonly<Record<string, Figure>>): Record<string, Figure> =>
    Object.fromEntries(Object.entries(from).filter(([key]) => keys.includes(key)));
  return { ...EMPTY_LOT, options: entry.options, figures: kept(BENCH_FIGURES, entry.figures) };
}

/** Figures that belong to the bench, not to the oil. */
const BENCH_FIGURES = ['titrantStrength', 'blank', 'standardisationTemperature', 'titrationTemperature'];

/** Portions change their unit with the way they are measured out; what was typed stays. */
function withSampleUnits(entry: LotEntry, edit: Extract<Edit, { kind: 'option' }>): LotEntry {
  if (edit.key !== 'sampleTakenBy') return entry;
  const unit = edit.option === 'volume' ? 'mL' : 'g';
  const changed = (runs: readonly RunEntry[]): readonly RunEntry[] =>
    runs.map((run) => (run.sample ? { ...run, sample: { ...run.sample, unit } } : run));
  return { ...entry, runs: changed(entry.runs), retestRuns: changed(entry.retestRuns) };
}

function withCell(runs: readonly RunEntry[], { index, cell, figure }: CellEdit): readonly RunEntry[] {
  const filled = [...runs];
  while (filled.length <= index) filled.push({});
  filled[index] = withKey(filled[index] ?? {}, cell, figure);
  while (filled.length && Object.keys(filled.at(-1) ?? {}).length === 0) filled.pop();
  return filled;
}

/** A copy with the key set, or without it. */
function withKey<T extends object>(record: T, key: string, value: unknown): T {
  const { [key]: _, ...rest } = record as Record<string, unknown>;
  return (value === undefined ? rest : { ...rest, [key]: value }) as T;
}
