import { decimalMark } from '../number-format.js';
import type { DecimalMark } from '../number-text.js';
import type { ResultCell } from './row.js';

/** Whose decimal mark figures are written with: that of the page, or the one that the sheet expects. */
export const MARK_CHOICES = ['page', 'point', 'comma'] as const;
export type MarkChoice = (typeof MARK_CHOICES)[number];

/** @param language of the page, BCP 47 */
export const chosenMark = (choice: MarkChoice, language: string): DecimalMark => (choice === 'page' ? decimalMark(language) : choice === 'comma' ? ',' : '.');

export type Rows = readonly (readonly ResultCell[])[];

/**
 * What makes a sheet take a text for a formula: `=`, `+`, `-`, `@`, a tab, a carriage return or a line feed in
 * front, or a full-width form of these signs (OWASP, “CSV Injection”; from memory). Blanks and unseen characters
 * before them are looked through, since sheets drop them.
 */
const FORMULA_LIKE = /^(?:[\t\r\n]|[\s\p{Cf}\p{Cc}]*[=+\-@\uff1d\uff0b\uff0d\uff20\u2212])/u;

/** The text of a text cell, with an apostrophe before what would be a formula (as OWASP advises). */
export const guardedText = (text: string): string => (FORMULA_LIKE.test(text) ? `'${text}` : text);

/** What a cell holds in a text file: a text guarded, a number with the mark of the sheet it goes to and no groups. */
export function plainCell({ kind, text }: ResultCell, mark: DecimalMark): string {
  return kind === 'number' ? text.replace('.', mark) : guardedText(text);
}

/**
 * Rows as the clipboard takes them: tabs between cells, CR LF after each row. A cell that holds a tab, a line
 * end or a quotation mark is quoted as sheets themselves do it.
 */
export const asTsv = (rows: Rows, mark: DecimalMark): string => delimited(rows, mark, '\t');

export interface CsvOptions {
  readonly mark: DecimalMark;
  /** A semicolon where the decimal mark is a comma is what sheets expect. */
  readonly delimiter: ',' | ';';
  /** A byte order mark in front, by which sheets know the file for UTF-8. */
  readonly byteOrderMark?: boolean;
}

/** Rows as a file after RFC 4180: CR LF after each row, cells quoted where they must be, quotation marks doubled. */
export const asCsv = (rows: Rows, { mark, delimiter, byteOrderMark = false }: CsvOptions): string =>
  (byteOrderMark ? '\ufeff' : '') + delimited(rows, mark, delimiter);

function delimited(rows: Rows, mark: DecimalMark, delimiter: string): string {
  const quoted = (text: string): string => (/["\r\n\t]/.test(text) || text.includes(delimiter) || text !== text.trim() ? `"${text.replace(/"/g, '""')}"` : text);
  return rows.map((row) => `${row.map((cell) => quoted(plainCell(cell, mark))).join(delimiter)}\r\n`).join('');
}

/** Rows as a table of HTML, for the clipboard: sheets take it before plain text and keep its cells. */
export function asHtmlTable(rows: Rows, mark: DecimalMark): string {
  const cell = (one: ResultCell): string => `<td${one.kind === 'number' ? ' align="right"' : ''}>${escaped(plainCell(one, mark))}</td>`;
  return `<meta charset="utf-8"><table><tbody>${rows.map((row) => `<tr>${row.map(cell).join('')}</tr>`).join('')}</tbody></table>`;
}

const SIGNS: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', '\'': '&#39;', '\n': '<br>', '\r': '' };

const escaped = (text: string): string => text.replace(/\0/g, '\ufffd').replace(/\r(?!\n)/g, '\n').replace(/[&<>"'\r\n]/g, (sign) => SIGNS[sign] ?? sign);
