import type { Decimal } from '../../formula/decimal.js';

/** How a cell looks; `typed` ones are for people to change. */
export type Look = 'plain' | 'head' | 'quiet' | 'typed' | 'wrapped';

/** A cell of a sheet; undefined leaves it empty. A text is never a formula, whatever it begins with. */
export type Cell =
  | { readonly kind: 'text'; readonly text: string; readonly look: Look }
  /** Canonical decimal text. */
  | { readonly kind: 'number'; readonly text: string; readonly look: Look }
  /** Without the equals sign; with what it comes to, for readers that do not compute. */
  | { readonly kind: 'formula'; readonly formula: string; readonly cached: Decimal | string; readonly look: Look }
  /** Empty, to be typed into. */
  | { readonly kind: 'blank'; readonly look: Look }
  | undefined;

export interface SheetRow {
  readonly cells: readonly Cell[];
  /** Folded away. */
  readonly hidden?: boolean;
}

export interface SheetPage {
  readonly name: string;
  readonly rows: readonly SheetRow[];
  /** Width of the columns, in letters; the last one counts for those after it. */
  readonly widths: readonly number[];
  /** Columns and rows that stay in sight. */
  readonly frozen: { readonly columns: number; readonly rows: number };
}

export const text = (of: string, look: Look = 'plain'): Cell => (of ? { kind: 'text', text: of, look } : undefined);
export const BLANK: Cell = { kind: 'blank', look: 'typed' };
/** A text to be changed, or the place for it. */
export const typedText = (of: string | undefined): Cell => (of ? text(of, 'typed') : BLANK);
export const number = (of: string, look: Look = 'plain'): Cell => ({ kind: 'number', text: of, look });
export const formula = (of: string, cached: Decimal | string, look: Look = 'plain'): Cell => ({ kind: 'formula', formula: of, cached, look });

/** Letters of a column, from 0: `A`, `Z`, `AA`. */
export function columnName(column: number): string {
  const rest = column % 26;
  const head = (column - rest) / 26;
  return (head ? columnName(head - 1) : '') + String.fromCharCode(65 + rest);
}

/** Address of a cell, both from 0: `B7`. */
export const address = (column: number, row: number): string => columnName(column) + String(row + 1);

/** A text as it stands in a formula. */
export const literal = (of: string): string => `"${of.replace(/"/g, '""')}"`;
