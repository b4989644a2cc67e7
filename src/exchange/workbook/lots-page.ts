import { Decimal, MOST_DIGITS } from '../../formula/decimal.js';
import { fieldLabel } from '../../locales/quantity-name.js';
import type { LotEntry, RunEntry } from '../../lot/entry.js';
import type { Figure } from '../../lot/figure.js';
import { KNOWN_KEYS } from '../../lot/keys.js';
import { MOST_SHEET_DIGITS } from '../results/row.js';
import { BLANK, address, number, text, typedText } from './cells.js';
import type { Cell, SheetPage } from './cells.js';
import type { FigureCells } from './figure-formula.js';
import type { WorkbookWords } from './words.js';

/** The sheet of what was typed: a row a lot, a column a figure with its unit beside it. */
export interface LotsPage {
  readonly page: SheetPage;
  /** Where a figure of a lot stands (by its field, `run1.sample` too), where any lot has it. */
  figure(field: string, lot: number): FigureCells | undefined;
  option(key: string, lot: number): string | undefined;
  /** Figures with more digits than a sheet keeps. */
  readonly shortened: readonly Shortened[];
}

export interface Shortened {
  readonly where: string;
  readonly text: string;
}

interface Column {
  readonly key: string;
  readonly label: string;
  cell(entry: LotEntry): Cell;
}

const HEADS = 2;
const LISTS = [['', 'runs'], ['retest.', 'retestRuns']] as const;
const RUN_CELLS = ['sample', 'start', 'end'] as const;

export function lotsPage(lots: readonly LotEntry[], words: WorkbookWords): LotsPage {
  const { texts, own } = words;
  const fields = [...KNOWN_KEYS.figures].filter((key) => lots.some(({ figures }) => key in figures));
  const options = [...KNOWN_KEYS.options.keys()].filter((key) => lots.some((lot) => key in lot.options));
  const columns: Column[] = [
    ...(['name', 'source', 'date'] as const).map((key): Column => ({ key, label: texts.lot[key], cell: (entry) => typedText(entry[key]) })),
    ...fields.flatMap((key) => figureColumns(key, ({ figures }) => figures[key], words)),
    ...options.map((key): Column => ({ key, label: fieldLabel(key, texts), cell: (entry) => typedText(entry.options[key]) })),
    ...LISTS.flatMap(([prefix, list]) => runColumns(prefix, lots.map((lot) => lot[list]), (entry) => entry[list], words)),
  ];
  const columnOf = new Map(columns.map(({ key }, at) => [key, at]));
  const cellAt = (key: string, lot: number): string | undefined => {
    const column = columnOf.get(key);
    return column === undefined ? undefined : `${own.sheets.lots}!${address(column, lot + HEADS)}`;
  };
  const rows = [
    { cells: columns.map(({ label }) => text(label, 'head')) },
    { cells: columns.map(({ key }) => text(key, 'quiet')) },
    ...lots.map((entry) => ({ cells: columns.map(({ cell }) => cell(entry)) })),
  ];
  return {
    page: { name: own.sheets.lots, rows, widths: [22, 16, 12, 12], frozen: { columns: 1, rows: HEADS } },
    figure: (field, lot) => {
      const [figure, unit] = [cellAt(field, lot), cellAt(unitKey(field), lot)];
      return figure && unit ? { figure, unit } : undefined;
    },
    option: cellAt,
    shortened: lots.flatMap((entry, lot) => columns.flatMap(({ label, cell }) => shortenedIn(cell(entry), `${entry.name ?? lot + 1}, ${label}`))),
  };
}

const unitKey = (field: string): string => `${field}.unit`;

function figureColumns(key: string, figureOf: (entry: LotEntry) => Figure | undefined, { texts, own }: WorkbookWords): readonly Column[] {
  const label = fieldLabel(key, texts);
  return [
    { key, label, cell: (entry) => figureCell(figureOf(entry)) },
    { key: unitKey(key), label: own.heads.unitOf, cell: (entry) => typedText(figureOf(entry)?.unit) },
  ];
}

function runColumns(prefix: string, all: readonly (readonly RunEntry[])[], runsOf: (entry: LotEntry) => readonly RunEntry[], words: WorkbookWords): readonly Column[] {
  const most = Math.max(0, ...all.map((runs) => runs.length));
  return Array.from({ length: most }, (_, at) => at).flatMap((at) => {
    const key = `${prefix}run${at + 1}`;
    const struck: Column = { key: `${key}.struck`, label: words.own.heads.struck, cell: (entry) => text(runsOf(entry)[at]?.struck ?? '', 'quiet') };
    return [...RUN_CELLS.flatMap((cell) => figureColumns(`${key}.${cell}`, (entry) => runsOf(entry)[at]?.[cell], words)), struck];
  });
}

/** A figure as typed; one that could not be read stands as text. */
export function figureCell(figure: Figure | undefined): Cell {
  if (!figure) return BLANK;
  if ('doubt' in figure) return typedText(figure.typed);
  return isDecimal(figure.text) ? number(figure.text, 'typed') : typedText(figure.text);
}

/** Text that `readFigure` takes; more digits than that are refused there, and must not pass for a number here. */
const isDecimal = (of: string): boolean => /^-?\d{1,200}(?:\.\d{1,200})?$/.test(of) && of.replace(/[-.]/g, '').replace(/^0+/, '').length <= MOST_DIGITS;

export const shortenedIn = (cell: Cell, where: string): readonly Shortened[] =>
  cell?.kind === 'number' && new Decimal(cell.text).precision() > MOST_SHEET_DIGITS ? [{ where, text: cell.text }] : [];
