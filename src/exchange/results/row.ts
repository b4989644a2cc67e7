import { Decimal } from '../../formula/decimal.js';
import { chargedRoute } from '../../decision/route.js';
import type { Route, Verdict } from '../../decision/route.js';
import type { LotEntry, SiteProfile } from '../../lot/entry.js';
import type { LotFaults, LotReading, ReadingJson } from '../../lot/lot-reading.js';
import type { ResultColumn, ResultFrom, ResultWords } from './columns.js';

/** A cell of a table; a number is canonical decimal text with a point, whatever mark it is written with later. */
export interface ResultCell {
  readonly kind: 'text' | 'number' | 'empty';
  readonly text: string;
}

export interface ResultOptions {
  readonly words: ResultWords & { readonly verdicts: Readonly<Record<Verdict, string>> };
  /** `reported`: rounded as the panel shows it; `full`: every digit there is, up to 34. */
  readonly figures?: 'reported' | 'full';
}

/** The most significant digits that every sheet keeps (a double has between 15 and 17). */
export const MOST_SHEET_DIGITS = 15;

export const textCell = (text: string | undefined): ResultCell => (text ? { kind: 'text', text } : EMPTY);
export const numberCell = (text: string | undefined): ResultCell => (text === undefined ? EMPTY : { kind: 'number', text });
const EMPTY: ResultCell = { kind: 'empty', text: '' };

/** Whether a sheet would drop digits of a figure without saying so. */
export const beyondSheet = ({ kind, text }: ResultCell): boolean => kind === 'number' && new Decimal(text).precision() > MOST_SHEET_DIGITS;

/** Columns in which a figure has more digits than a sheet keeps: to be said before the rows are handed on. */
export const columnsBeyondSheet = (rows: readonly (readonly ResultCell[])[], columns: readonly ResultColumn[]): readonly ResultColumn[] =>
  columns.filter((_, at) => rows.some((row) => row[at] && beyondSheet(row[at])));

/** The row of a lot: a cell for each column, empty where nothing is known. */
export function resultRow(
  entry: LotEntry, site: SiteProfile, reading: LotReading | LotFaults, columns: readonly ResultColumn[], { words, figures = 'reported' }: ResultOptions,
): readonly ResultCell[] {
  const lot = 'faults' in reading ? undefined : reading;
  const cell = (from: ResultFrom): ResultCell => {
    if ('text' in from) {
      if (from.text === 'site') return textCell(site.name);
      if (from.text === 'route') return textCell(lot && words.verdicts[lot.route.verdict]);
      if (from.text === 'state') return textCell(words.states[stateOf(reading, columns)]);
      return textCell(entry[from.text]);
    }
    if ('expanded' in from) {
      const known = lot?.uncertainties[from.expanded];
      return numberCell(figures === 'full' ? known?.expanded : known?.shown);
    }
    const key = readingKey(from, lot?.route);
    const found = key === undefined ? undefined : lot?.readings[key];
    return numberCell(figures === 'full' ? found?.value : found?.shown);
  };
  return columns.map(({ from }) => cell(from));
}

/** Which reading fills a column; none where the lot takes another route, or none. */
function readingKey(from: Exclude<ResultFrom, { text: string } | { expanded: string }>, route: Route | undefined): string | undefined {
  if ('reading' in from) return from.reading;
  if (!route || !CHARGED.includes(route.verdict === 'too-close' ? (route.safe ?? 'not-known') : route.verdict)) return undefined;
  const charged = chargedRoute(route);
  if ('baseStep' in from) return `${charged}.${from.baseStep}`;
  return charged === 'twoStep' ? from.acidStep : undefined;
}

const CHARGED: readonly Verdict[] = ['direct', 'two-step'];

/** How far a lot is known, as far as the columns ask. */
export function stateOf(reading: LotReading | LotFaults, columns: readonly ResultColumn[]): keyof ResultWords['states'] {
  if ('faults' in reading) return 'unreadable';
  if (reading.problems.length) return 'refused';
  const asked = columns.flatMap(({ from }) => ('reading' in from ? [reading.readings[from.reading]] : []));
  const lacks = (one: ReadingJson | undefined): boolean => one?.value === undefined;
  return asked.some(lacks) ? 'missing' : 'complete';
}
