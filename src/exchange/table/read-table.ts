import Papa from 'papaparse';
import { headed } from './header.js';
import { MOST_BYTES, MOST_COLUMNS } from './table.js';
import type { ReadTable, TableWarning } from './table.js';

/**
 * Reads a table from text: tabs between the cells as a sheet copies them, or CSV after RFC 4180 with comma or semicolon. Line ends of
 * any kind, quoted cells with line breaks in them, a byte order mark. Never throws.
 */
export function readTable(text: string): ReadTable {
  if (text.length > MOST_BYTES) return { fault: { code: 'too-large', params: { most: String(MOST_BYTES / 1e6) } } };
  if (looksBinary(text)) return { fault: { code: 'binary' } };
  const plain = text.replace(/^\ufeff/, '').replace(CONTROL, '');
  const delimiter = delimiterOf(plain);
  const { data, errors } = Papa.parse<string[]>(plain, { delimiter, skipEmptyLines: false, fastMode: plain.includes('"') ? false : true });
  const open = errors.find(({ code }) => code === 'MissingQuotes');
  if (open) return { fault: { code: 'quote-never-closed', params: { row: String((open.row ?? 0) + 1) } } };
  const warnings: TableWarning[] = plain.length === text.replace(/^\ufeff/, '').length ? [] : [{ code: 'control-characters' }];
  return tabled(data, delimiter === '\t' ? 'tsv' : 'csv', warnings);
}

/** The first table of a page, as the clipboard gives one; its text is read, nothing of it runs. */
export function readHtmlTable(document: Document): ReadTable {
  const table = document.querySelector('table');
  if (!table) return { fault: { code: 'no-table' } };
  const rows = [...table.rows].map((row) => [...row.cells].flatMap((cell) => [(cell.textContent ?? '').replace(CONTROL, '').replace(/\s+/g, ' ').trim(), ...Array<string>(Math.max(0, Math.min(cell.colSpan, MOST_COLUMNS) - 1)).fill('')]));
  return tabled(rows, 'html', []);
}

function tabled(all: readonly (readonly string[])[], from: 'tsv' | 'csv' | 'html', before: readonly TableWarning[]): ReadTable {
  let end = all.length;
  while (end && isEmptyRow(all[end - 1] ?? [])) end--;
  const begin = all.findIndex((row) => !isEmptyRow(row));
  if (begin < 0) return { fault: { code: 'empty' } };
  const rows = all.slice(begin, end);
  const width = rows.reduce((most, row) => Math.max(most, row.length), 0);
  if (width > MOST_COLUMNS) return { fault: { code: 'too-many-columns', params: { columns: String(width), most: String(MOST_COLUMNS) } } };
  const { header, body } = headed(rows);
  const twice = header && header.find((name, i) => name.trim() !== '' && header.findIndex((other) => other.trim().toLowerCase() === name.trim().toLowerCase()) < i);
  const warnings: TableWarning[] = [
    ...before,
    ...(width === 1 ? [{ code: 'one-column' as const }] : []),
    ...(header ? [] : [{ code: 'no-header' as const }]),
    ...(twice ? [{ code: 'header-twice' as const, params: { header: twice.trim() } }] : []),
  ];
  if (!body.length) return { fault: { code: 'empty' } };
  return { ...(header && { header }), rows: body, from, firstRow: begin + 1 + (header ? 1 : 0), warnings };
}

export const isEmptyRow = (row: readonly string[]): boolean => row.every((cell) => cell.trim() === '');

/** Characters that no cell has a use for, tab and line ends left alone. */
const CONTROL = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]/g;

/** Signs of a file that is no text: how workbooks, archives, documents and pictures begin, or many control characters. */
function looksBinary(text: string): boolean {
  if (/^(?:PK\u0003\u0004|%PDF-|\u00d0\u00cf\u0011\u00e0|\ufffd\ufffd\u0011\ufffd|\u0089PNG|\ufffdPNG|GIF8|\u001f[\u008b\ufffd])/.test(text)) return true;
  const looked = text.slice(0, 20_000);
  return (looked.match(CONTROL)?.length ?? 0) + (looked.match(/\ufffd/g)?.length ?? 0) > looked.length / 20;
}

/** What separates the cells, by the first line that has anything in it: a tab before a semicolon before a comma. */
function delimiterOf(text: string): '\t' | ';' | ',' {
  const line = /^[^\S\n]*(\S[^\n]*)/m.exec(text)?.[0] ?? '';
  // inside quotes a delimiter is text
  const bare = line.replace(/"[^"]*"/g, '');
  if (bare.includes('\t')) return '\t';
  if (bare.includes(';')) return ';';
  // a single column of figures with a decimal comma is no table of two
  return bare.includes(',') && !/^\s*[-+]?\d+,\d+\s*$/.test(line) ? ',' : '\t';
}
