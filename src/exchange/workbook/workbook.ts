import { isKnown } from '../../formula/reading.js';
import type { Sheet } from '../../formula/sheet.js';
import { checkedLot } from '../../lot/checked.js';
import { EMPTY_LOT, EMPTY_SITE } from '../../lot/entry.js';
import type { LotEntry, SiteProfile } from '../../lot/entry.js';
import { KNOWN_KEYS, fieldOf, runCell } from '../../lot/keys.js';
import type { LotFaults } from '../../lot/lot-reading.js';
import { lotRun } from '../../lot/lot-run.js';
import type { LotRun } from '../../lot/lot-run.js';
import { readLot } from '../../lot/read-lot.js';
import { fill } from '../../locales/fill.js';
import { lotsPage } from './lots-page.js';
import type { Shortened } from './lots-page.js';
import { notesPage } from './notes-page.js';
import { officeFile } from './office-file.js';
import { rowsNeeded } from './rows-needed.js';
import { sitePage } from './site-page.js';
import type { AskedFigure } from './site-page.js';
import { workingPage } from './working-page.js';
import type { WorkedLot } from './working-page.js';
import { workbookWords } from './words.js';

export interface WorkbookOptions {
  /** BCP 47 tag: `en` or `de`. */
  readonly language?: string;
}

export interface Workbook {
  /** An .xlsx file. */
  readonly bytes: Uint8Array;
  /** Figures with more digits than a sheet keeps; the first sheet lists them too. */
  readonly shortened: readonly Shortened[];
  /** Lots that could not be read, by their place in the list. */
  readonly leftOut: readonly { readonly lot: number; readonly faults: LotFaults['faults'] }[];
}

/**
 * Lots as a workbook that computes: what was typed, what stands for the site, and every quantity as a formula over
 * them. Options are words in cells that the formulas compare, so that another option can be tried in the sheet; which
 * runs count stays as it is in the entries.
 */
export function workbookOf(lots: readonly LotEntry[], site: SiteProfile = EMPTY_SITE, { language = 'en' }: WorkbookOptions = {}): Workbook {
  const words = workbookWords(language);
  const nameOf = (entry: LotEntry, at: number): string => (typeof entry.name === 'string' && entry.name) || fill(words.own.unnamed, { n: String(at + 1) });
  const read = lots.map((entry, lot) => ({ entry, lot, name: nameOf(entry, lot), reading: readLot(entry, site) }));
  const leftOut = read.flatMap(({ lot, reading }) => ('faults' in reading ? [{ lot, faults: reading.faults }] : []));
  const known = read.flatMap(({ entry, name, reading }) => ('faults' in reading ? [] : [{ entry: { ...EMPTY_LOT, ...entry }, name, reading }]));
  const readable = checkedLot(EMPTY_LOT, site);
  const profile = 'faults' in readable ? EMPTY_SITE : readable.profile;

  const worked = known.map(({ entry, name, reading }): WorkedLot => {
    const run = lotRun(entry, profile);
    return { name, run, touched: new Set([...Object.keys(reading.readings), ...furtherResults(run)]) };
  });
  const ofSite = lotRun(EMPTY_LOT, profile);
  const sheets = [...new Set([...worked.map(({ run }) => run.sheet), ofSite.sheet])];
  const keys = rowsNeeded(sheets, worked.flatMap(({ touched }) => [...touched]));
  const entries = known.map(({ entry }) => entry);
  const typed = lotsPage(entries, words);
  const standing = sitePage(profile, askedFigures(keys, sheets), askedOptions(keys), words);
  const shortened = [...typed.shortened, ...standing.shortened];
  const pages = [
    notesPage(known.length, shortened, leftOut.map(({ lot }) => read[lot]?.name ?? ''), words),
    typed.page, standing.page, workingPage(keys, worked, ofSite, typed, standing, words),
  ];
  return { bytes: officeFile(pages), shortened, leftOut };
}

/** Results that the panel works out where its parts are opened: after the reaction, heat, balance, cost, settlement; those that are known. */
const furtherResults = ({ sheet, findings }: LotRun): readonly string[] =>
  [...sheet.quantities.keys()].filter((key) => /^(?:after|heat|balance|cost|settlement)\./.test(key) && isKnown(findings.outcome(key)));

/** Inputs that may stand for the site: all but the runs of a lot. */
function askedFigures(keys: readonly string[], sheets: readonly Sheet[]): readonly AskedFigure[] {
  const asked = new Map<string, AskedFigure>();
  for (const key of keys) {
    const quantity = sheets.map(({ quantities }) => quantities.get(key)).find((one) => one !== undefined);
    const run = runCell(key);
    if (!quantity || quantity.is || (run && run.list !== 'titrantRuns')) continue;
    const field = fieldOf(key);
    if (!asked.has(field)) asked.set(field, { field, unit: quantity.unit.symbol });
  }
  return [...asked.values()];
}

/** Whether to correct for temperature is asked for by no formula, but decides on one. */
const askedOptions = (keys: readonly string[]): readonly string[] => [...KNOWN_KEYS.options.keys()].filter((key) => keys.includes(key) || key === 'temperatureCorrected');
