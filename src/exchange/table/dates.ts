import type { Columns } from './columns.js';
import type { Table } from './table.js';

/** In which order a sheet writes day and month. */
export type DateOrder = 'day-first' | 'month-first';

/** Surely one of the two; not to be told (`asked`, with a date that could be read both ways); or no date needs it. */
export type OrderFound = { readonly order: DateOrder; readonly asked?: undefined } | { readonly order?: undefined; readonly asked?: string };

/** Looks at all dates of a sheet. */
export function dateOrderOf(table: Table, columns: Columns): OrderFound {
  const column = columns.findIndex(({ key }) => key === 'date');
  let asked: string | undefined;
  let order: DateOrder | undefined;
  for (const row of table.rows) {
    const found = parts(row[column] ?? '');
    if (!found) continue;
    const proof = found.mark === '.' || found.first > 12 ? 'day-first' : found.second > 12 ? 'month-first' : undefined;
    if (!proof) asked ??= (row[column] ?? '').trim();
    else if (order && order !== proof) return { asked: (row[column] ?? '').trim() };
    else order = proof;
  }
  return order ? { order } : asked === undefined ? {} : { asked };
}

/** A date as ISO 8601, or undefined where it is none. Days of a spreadsheet's own count (1 is 1900-01-01) are dates too. */
export function readDate(cell: string, order: DateOrder): string | undefined {
  const text = cell.trim().replace(/[T ]\d{1,2}:\d{2}(?::\d{2}(?:\.\d+)?)?(?:Z|[+-]\d{2}:?\d{2})?$/, '');
  const iso = /^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})$/.exec(text);
  if (iso) return isoOf(Number(iso[1]), Number(iso[2]), Number(iso[3]));
  if (/^\d{5}(?:[.,]\d+)?$/.test(text)) return serial(Number(text.slice(0, 5)));
  const found = parts(text);
  if (!found) return undefined;
  const dayFirst = found.mark === '.' || (order === 'day-first' ? found.second <= 12 : found.first > 12);
  return dayFirst ? isoOf(found.year, found.second, found.first) : isoOf(found.year, found.first, found.second);
}

function parts(cell: string): { readonly first: number; readonly second: number; readonly year: number; readonly mark: string } | undefined {
  const [, first, mark = '', second, year] = /^\s*(\d{1,2})([./-])\s?(\d{1,2})\2\s?(\d{4}|\d{2})(?:[T ].*)?$/.exec(cell) ?? [];
  if (first === undefined) return undefined;
  // two digits: the years that plants have records of
  return { first: Number(first), second: Number(second), year: Number(year) + (year?.length === 2 ? 2000 : 0), mark };
}

function isoOf(year: number, month: number, day: number): string | undefined {
  const date = new Date(Date.UTC(year, month - 1, day));
  const real = date.getUTCFullYear() === year && date.getUTCMonth() === month - 1 && date.getUTCDate() === day;
  return real && year >= 1900 && year < 2200 ? date.toISOString().slice(0, 10) : undefined;
}

/** Spreadsheets count days from 1899-12-30 on, from 1 March 1900; below 20000 (1954) it is rather a figure. */
function serial(days: number): string | undefined {
  return days >= 20_000 && days < 100_000 ? new Date(Date.UTC(1899, 11, 30) + days * 86_400_000).toISOString().slice(0, 10) : undefined;
}
