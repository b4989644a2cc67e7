import type { SiteProfile } from '../../lot/entry.js';
import { listReader } from '../../lot/list-reading.js';
import type { ListReading } from '../../lot/list-reading.js';
import { STATES } from '../../decision/triage.js';
import type { DeliveryState } from '../../decision/triage.js';
import type { DecimalMark } from '../number-text.js';
import type { Columns } from './columns.js';
import type { DateOrder } from './dates.js';
import { rowEntry } from './row-entry.js';
import type { RowProblem } from './row-entry.js';
import type { Table } from './table.js';

/** A row of a sheet worked out: its place, what it is called, and what a list shows of it. An empty row has its number alone. */
export interface WorkedRow extends Partial<ListReading> {
  readonly row: number;
  readonly name?: string;
  /** Cells that could not be read. */
  readonly cells?: readonly RowProblem[];
}

/** How many rows came to what. */
export interface RowsSummary {
  readonly rows: number;
  readonly empty: number;
  readonly states: Readonly<Record<DeliveryState, number>>;
  /** By the code of the problem, `missing` for figures that are not there. */
  readonly problems: Readonly<Record<string, number>>;
}

/** How a table is to be read. */
export interface RowsTask {
  readonly table: Table;
  readonly columns: Columns;
  readonly mark: DecimalMark;
  readonly dates: DateOrder;
  readonly site: SiteProfile;
}

/** Rows between two reports: a twentieth of a second or so, so that a page that computes them itself stays alive. */
const SLICE = 100;

/** Works a table out in slices, and sums it up at its end. The site profile is one that has been checked. */
export function* workedRows({ table, columns, mark, dates, site }: RowsTask): Generator<readonly WorkedRow[], RowsSummary, void> {
  const states = Object.fromEntries(STATES.map((state) => [state, 0])) as Record<DeliveryState, number>;
  const problems: Record<string, number> = {};
  const count = (code: string): void => void (problems[code] = (problems[code] ?? 0) + 1);
  const read = listReader(site);
  let empty = 0;
  for (let from = 0; from < table.rows.length; from += SLICE) {
    const slice: WorkedRow[] = [];
    for (let i = from; i < Math.min(from + SLICE, table.rows.length); i++) {
      const { row, entry, problems: cells } = rowEntry(table.rows[i] ?? [], table.firstRow + i, columns, mark, dates);
      if (!entry) {
        empty++;
        slice.push({ row });
        continue;
      }
      const found = read(entry);
      states[found.state]++;
      for (const { code } of cells) count(code);
      if (found.problem && !cells.some(({ code }) => code === found.problem?.code)) count(found.problem.code);
      if (found.missing) count('missing');
      slice.push({ row, ...(entry.name !== undefined && { name: entry.name }), ...found, ...(cells.length && { cells }) });
    }
    yield slice;
  }
  return { rows: table.rows.length, empty, states, problems };
}
