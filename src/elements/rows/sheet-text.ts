import { decimalMarkOf } from '../../exchange/table/marks.js';
import type { MarkFound } from '../../exchange/table/marks.js';
import { columnUse, recogniseColumns } from '../../exchange/table/columns.js';
import type { ColumnMemory, Columns, ColumnUse } from '../../exchange/table/columns.js';
import { dateOrderOf } from '../../exchange/table/dates.js';
import type { DateOrder, OrderFound } from '../../exchange/table/dates.js';
import { readTable } from '../../exchange/table/read-table.js';
import { rowEntry } from '../../exchange/table/row-entry.js';
import type { RowReading } from '../../exchange/table/row-entry.js';
import type { ReadTable, Table } from '../../exchange/table/table.js';
import type { DecimalMark } from '../../exchange/number-text.js';

/** Rows that are looked at before anything is worked out; a longer sheet is read by the worker. */
export const LOOKED = 1000;

/** What was pasted, and what a person made of it. Nothing of it changes in place. */
export class SheetText {
  readonly read: ReadTable;
  readonly columns: Columns;
  readonly markFound: MarkFound;
  readonly orderFound: OrderFound;

  /** @param chosen what a person made of columns, by their place */
  constructor(
    readonly text: string,
    memory: ColumnMemory | undefined,
    readonly chosen: ReadonlyMap<number, ColumnUse> = new Map(),
    readonly chosenMark?: DecimalMark,
    readonly chosenOrder?: DateOrder,
    before?: SheetText,
  ) {
    this.read = before?.text === text ? before.read : readTable(text);
    const { table } = this;
    const found = table ? recogniseColumns(table, memory) : [];
    this.columns = found.map((column, i) => chosen.get(i) ?? (column.key && [...chosen.values()].some(({ key }) => key === column.key) ? columnUse(column.header, undefined) : column));
    this.markFound = table ? decimalMarkOf(table, this.columns) : {};
    this.orderFound = table ? dateOrderOf(table, this.columns) : {};
  }

  get table(): Table | undefined {
    return 'fault' in this.read ? undefined : this.read;
  }

  /** The mark in force, where the sheet does not tell that of the page. */
  mark(ofPage: DecimalMark): DecimalMark {
    return this.chosenMark ?? this.markFound.mark ?? ofPage;
  }

  get order(): DateOrder {
    return this.chosenOrder ?? this.orderFound.order ?? 'day-first';
  }

  /** Whether any column says how sour the oil is. */
  get tells(): boolean {
    return this.columns.some(({ key }) => key === 'certificateFfa' || key === 'certificateAcidValue' || (key && /^run\.\d+\.(?:end|titre)$/.test(key)));
  }

  /** The first rows as lots. */
  looked(mark: DecimalMark): readonly RowReading[] {
    const { table, columns, order } = this;
    return table ? table.rows.slice(0, LOOKED).map((cells, i) => rowEntry(cells, table.firstRow + i, columns, mark, order)) : [];
  }
}
