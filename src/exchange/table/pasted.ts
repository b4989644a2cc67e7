import { readHtmlTable } from './read-table.js';

/**
 * What was pasted, as text with tabs: the plain text, as sheets mean it; where there is none, or it is the source of a table of HTML,
 * the first table in that. Nothing of it runs: it is parsed into a document of its own, which is thrown away.
 */
export function pastedText(plain: string, html: string): string {
  const source = /^\s*<(?:!doctype|html|meta|table)\b/i.test(plain) ? plain : plain.trim() ? '' : html;
  if (!source) return plain;
  let table: ReturnType<typeof readHtmlTable>;
  try {
    table = readHtmlTable(new DOMParser().parseFromString(source, 'text/html'));
  } catch {
    return plain; // a page that trusts no text as HTML
  }
  if ('fault' in table) return plain;
  const rows = table.header ? [table.header, ...table.rows] : table.rows;
  return rows.map((row) => row.map((cell) => (/["\t\r\n]/.test(cell) ? `"${cell.replace(/"/g, '""')}"` : cell)).join('\t')).join('\n');
}
