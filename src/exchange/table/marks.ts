import type { DecimalMark } from '../number-text.js';
import { isTextKey } from './meanings.js';
import type { Columns } from './columns.js';
import type { Table } from './table.js';

/** Which mark of decimals a sheet uses: surely, or not to be told; `mixed` where cells of both kinds are in it, with a row of each. */
export type MarkFound = { readonly mark: DecimalMark; readonly mixed?: undefined } | { readonly mark?: undefined; readonly mixed?: { readonly point: number; readonly comma: number } };

/** Looks at all figures of the columns in use. One mark with other than three digits behind it, or both marks in one figure, are proof. */
export function decimalMarkOf(table: Table, columns: Columns): MarkFound {
  const seen: Partial<Record<DecimalMark, number>> = {};
  const figures = columns.flatMap(({ key }, i) => (key && !isTextKey(key) ? [i] : []));
  for (const [i, row] of table.rows.entries()) {
    for (const column of figures) {
      const proof = proofIn(row[column] ?? '');
      if (proof) seen[proof] ??= table.firstRow + i;
    }
    if (seen['.'] !== undefined && seen[','] !== undefined) return { mixed: { point: seen['.'], comma: seen[','] } };
  }
  const mark = seen[','] !== undefined ? ',' : seen['.'] !== undefined ? '.' : undefined;
  return mark ? { mark } : {};
}

function proofIn(cell: string): DecimalMark | undefined {
  const figure = /^\s*[-+]?([\d.,'\u00a0\u202f ]+)%?\s*$/.exec(cell)?.[1]?.trim();
  const marks = figure?.replace(/[^.,]/g, '') ?? '';
  if (!figure || !marks) return undefined;
  const last = marks.at(-1) as DecimalMark;
  if (marks.includes('.') && marks.includes(',')) return marks.indexOf(last) === marks.length - 1 ? last : undefined;
  // a mark that comes again groups thousands, so the other one is for decimals
  if (marks.length > 1) return last === '.' ? ',' : '.';
  const behind = figure.length - figure.lastIndexOf(last) - 1;
  return behind !== 3 || /^0?[.,]/.test(figure) || figure.indexOf(last) > 3 ? last : undefined;
}
