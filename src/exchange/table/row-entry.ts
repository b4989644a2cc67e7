import { EMPTY_LOT } from '../../lot/entry.js';
import type { LotEntry, RunEntry } from '../../lot/entry.js';
import { MOST_RUNS } from '../../lot/check.js';
import type { Figure } from '../../lot/figure.js';
import { readNumber } from '../number-text.js';
import type { DecimalMark, NumberDoubt } from '../number-text.js';
import type { Columns } from './columns.js';
import { readDate } from './dates.js';
import type { DateOrder } from './dates.js';
import { isTextKey, runColumn } from './meanings.js';
import { isEmptyRow } from './read-table.js';
import type { Table } from './table.js';

/** What is wrong with a cell: a figure that cannot be read, a date that is none, a text longer than any name. */
export interface RowProblem {
  readonly code: NumberDoubt | 'not-a-date' | 'too-long';
  /** From 0. */
  readonly column: number;
  readonly typed: string;
}

/** A row of a sheet as a lot. */
export interface RowReading {
  /** Its number in the sheet, from 1. */
  readonly row: number;
  /** Left out for an empty row. What could not be read is kept in it as typed. */
  readonly entry?: LotEntry;
  readonly problems: readonly RowProblem[];
}

/** Letters of a name or a source; more is no name. */
const MOST_LETTERS = 1000;

/** The rows of a table as lots, each by itself: a bad one does not keep the others. */
export function* rowEntries(table: Table, columns: Columns, mark: DecimalMark, order: DateOrder = 'day-first'): Generator<RowReading> {
  for (const [i, cells] of table.rows.entries()) yield rowEntry(cells, table.firstRow + i, columns, mark, order);
}

/** One row as a lot. */
export function rowEntry(cells: readonly string[], row: number, columns: Columns, mark: DecimalMark, order: DateOrder): RowReading {
  if (isEmptyRow(cells)) return { row, problems: [] };
  const problems: RowProblem[] = [];
  const texts: Record<string, string> = {};
  const figures: Record<string, Figure> = {};
  const runs: RunEntry[] = [];
  for (const [column, { key, unit = '' }] of columns.entries()) {
    const typed = (cells[column] ?? '').trim();
    if (!key || typed === '') continue;
    if (isTextKey(key)) {
      if (typed.length > MOST_LETTERS) problems.push({ code: 'too-long', column, typed: `${typed.slice(0, 40)}…` });
      const date = key === 'date' ? readDate(typed, order) : undefined;
      if (key === 'date' && !date) problems.push({ code: 'not-a-date', column, typed });
      texts[key] = (date ?? typed).slice(0, MOST_LETTERS);
      continue;
    }
    const figure = cellFigure(typed, unit, mark);
    if ('doubt' in figure) problems.push({ code: figure.doubt as NumberDoubt, column, typed });
    const cell = runColumn(key);
    if (!cell) figures[key] = figure;
    else if (cell.run <= MOST_RUNS) {
      const at = cell.run - 1;
      while (runs.length <= at) runs.push({});
      // a titre is a burette that began at zero
      runs[at] = { ...runs[at], ...(cell.part === 'titre' ? { start: { text: '0', unit }, end: figure } : { [cell.part]: figure }) };
    }
  }
  return { row, entry: { ...EMPTY_LOT, ...texts, figures, options: optionsOf(figures, runs), runs }, problems };
}

/** What the columns that are filled say of how the lot was measured. */
function optionsOf(figures: Readonly<Record<string, Figure>>, runs: readonly RunEntry[]): Readonly<Record<string, string>> {
  const titrated = runs.some(({ end }) => end);
  const known = titrated ? undefined : figures['certificateFfa'] ? 'certificate-ffa' : figures['certificateAcidValue'] ? 'certificate-acid-value' : undefined;
  const retest = figures['retest.certificateFfa'] ? 'certificate-ffa' : figures['retest.certificateAcidValue'] ? 'certificate-acid-value' : undefined;
  return {
    ...(known && { acidKnownFrom: known }), ...(retest && { 'retest.acidKnownFrom': retest }),
    ...(figures['blank'] && { blankPolicy: 'blank-subtracted' }),
    ...(runs.some(({ sample }) => sample?.unit === 'mL' || sample?.unit === 'L') && { sampleTakenBy: 'volume' }),
  };
}

/** Digits that mean one thing and are canonical as they stand. */
const PLAIN = /^(?:0|[1-9]\d{0,14})(?:\.\d{1,15})?$/;

/** A figure as typed; a per cent sign behind a share is no fault, as sheets show shares so. */
function cellFigure(typed: string, unit: string, mark: DecimalMark): Figure {
  // most cells of a sheet are no puzzle
  if (PLAIN.test(typed) && (mark === '.' || !typed.includes('.'))) return { text: typed, unit };
  const read = readNumber(unit === '%' ? typed.replace(/\s*%$/, '') : typed, mark);
  if ('text' in read) return { text: read.text, unit };
  return { typed: typed.slice(0, MOST_LETTERS), doubt: 'doubt' in read ? read.doubt : 'not-a-number', unit };
}
