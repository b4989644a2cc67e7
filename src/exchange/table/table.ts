/** A table as a sheet gives it: text cells, nothing understood yet. */
export interface Table {
  /** The headings, where the first row has them. */
  readonly header?: readonly string[];
  readonly rows: readonly (readonly string[])[];
  readonly from: 'tsv' | 'csv' | 'html';
  /** Number of `rows[0]` in the sheet as it was given, from 1. */
  readonly firstRow: number;
  readonly warnings: readonly TableWarning[];
}

export const TABLE_FAULTS = ['too-large', 'binary', 'empty', 'too-many-columns', 'quote-never-closed', 'no-table'] as const;
/** Why there is no table; `quote-never-closed` comes with the row in which the quote opens. */
export interface TableFault {
  readonly code: (typeof TABLE_FAULTS)[number];
  readonly params?: Readonly<Record<string, string>>;
}

export const TABLE_WARNINGS = ['one-column', 'header-twice', 'no-header', 'control-characters'] as const;
/** What is to be looked at although there is a table: `header-twice` with the heading; `control-characters` were left out. */
export interface TableWarning {
  readonly code: (typeof TABLE_WARNINGS)[number];
  readonly params?: Readonly<Record<string, string>>;
}

export type ReadTable = Table | { readonly fault: TableFault };

/** Bytes of a file, or letters pasted, that are still looked at. */
export const MOST_BYTES = 50_000_000;
export const MOST_COLUMNS = 999;
