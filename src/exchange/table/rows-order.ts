import type { RowsSummary, RowsTask, WorkedRow } from './worked-rows.js';

/** What a worker is to work out: the bytes of the table, which move to it, and how it is to be read. */
export interface RowsOrder extends Omit<RowsTask, 'table'> {
  readonly bytes: Uint8Array;
}

/** What it says: rows as they come, and the sum at the end. An error is a mistake of the program, or of the order. */
export type RowsReport = { readonly rows: readonly WorkedRow[] } | { readonly summary: RowsSummary } | { readonly error: string };
