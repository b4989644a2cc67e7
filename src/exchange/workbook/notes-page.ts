import { fill } from '../../locales/fill.js';
import { text } from './cells.js';
import type { SheetPage } from './cells.js';
import type { Shortened } from './lots-page.js';
import type { WorkbookWords } from './words.js';

/** More letters of a name than this are of no use in a sentence. */
const LONGEST_NAME = 80;

/** The first sheet: what the workbook is, what comes before it, and what it could not hold. */
export function notesPage(lots: number, shortened: readonly Shortened[], leftOut: readonly string[], { own }: WorkbookWords): SheetPage {
  const lines = [
    ...own.notes,
    lots ? fill(own.made, { count: String(lots) }) : own.noLots,
    ...shortened.map(({ where, text: figure }) => fill(own.shortened, { where: short(where), text: figure })),
    ...leftOut.map((name) => fill(own.leftOut, { name: short(name) })),
  ];
  return {
    name: own.sheets.notes,
    rows: [{ cells: [text(own.title, 'head')] }, ...lines.map((line) => ({ cells: [text(line, 'wrapped')] }))],
    widths: [100, 10],
    frozen: { columns: 0, rows: 0 },
  };
}

const short = (of: string): string => (of.length > LONGEST_NAME ? `${of.slice(0, LONGEST_NAME)}…` : of);
