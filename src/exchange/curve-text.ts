import type { CurveKind, CurvePoint } from '../decision/titration-curve/points.js';
import { readNumber } from './number-text.js';
import type { DecimalMark, NumberDoubt } from './number-text.js';

/**
 * Why a line was not taken, besides the doubts about a figure in it:
 * - `one-column`, `more-columns`: a line is a volume and a reading;
 * - `which-comma`: a comma that may part two columns or mark decimals (`1,50`).
 */
export const LINE_DOUBTS = ['one-column', 'more-columns', 'which-comma'] as const;

export interface LineFault {
  /** Counted from 1, empty lines too. */
  readonly line: number;
  readonly code: (typeof LINE_DOUBTS)[number] | NumberDoubt;
  /** The cell, or the whole line. */
  readonly typed: string;
}

export interface CurveText {
  readonly points: readonly CurvePoint[];
  /** Lines that could not be read; the others are. */
  readonly faults: readonly LineFault[];
  /** As the heading has it. */
  readonly kind?: CurveKind;
}

/** A line in its cells. */
interface Row {
  readonly line: number;
  readonly text: string;
  readonly cells: readonly string[];
}

/**
 * Reads two columns, volume in mL and pH or mV, as copied from a sheet or a recorder: parted by tabs,
 * semicolons or spaces, or by commas where these cannot be decimal marks. A heading may name the columns,
 * in either order. Never throws.
 *
 * @param mark that of the page, which decides where the text does not
 */
export function readCurveText(text: string, mark: DecimalMark): CurveText {
  const lines = text.split(/\r\n?|\n/).map((line, at) => ({ line: at + 1, text: line.trim() })).filter((line) => line.text);
  const byComma = partedByCommas(lines.map((line) => line.text));
  const rows = lines.map((line): Row => ({ ...line, cells: cellsOf(line.text, byComma) }));

  const isFigure = (cell: string): boolean => 'text' in readNumber(cell, byComma ? '.' : mark);
  const first = rows.findIndex(({ cells }) => cells.some((cell) => /^[-+]?[\d.,]*\d/.test(cell) && !/\p{L}{2}/u.test(cell)));
  const data = first < 0 ? rows : rows.slice(first);
  const heading = rows.slice(0, Math.max(0, first));
  const used = byComma ? '.' : markOf(data.flatMap(({ cells }) => cells), mark, isFigure);

  const swapped = heading.some(({ cells }) => READING.test(cells[0] ?? '') && VOLUME.test(cells[1] ?? '') && !VOLUME.test(cells[0] ?? ''));
  const kind = kindOf(heading.map((row) => row.text).join(' '));
  const points: CurvePoint[] = [];
  const faults: LineFault[] = [];
  for (const row of data) {
    const read = readRow(row, used, swapped);
    if ('code' in read) faults.push(read);
    else points.push(read);
  }
  return { points, faults, ...(kind && { kind }) };
}

const READING = /\bpH\b|\bmV\b|potential|\bEMF\b|\bEMK\b/i;
const VOLUME = /vol|\bm[lL]\b/i;

function kindOf(heading: string): CurveKind | undefined {
  if (/\bpH\b/i.test(heading)) return 'pH';
  return READING.test(heading) ? 'potential' : undefined;
}

const TAB_OR_SEMICOLON = /\s*[\t;]\s*/;

function cellsOf(text: string, byComma: boolean): readonly string[] {
  const cells = TAB_OR_SEMICOLON.test(text) ? text.split(TAB_OR_SEMICOLON) : text.split(byComma ? /\s*,\s*|\s+/ : /,?\s+/);
  // nothing behind the last separator is no column
  return cells.at(-1) === '' ? cells.slice(0, -1) : cells;
}

/** Commas part the columns where nothing else does, no line has two, and a point marks decimals beside one. */
function partedByCommas(lines: readonly string[]): boolean {
  const withComma = lines.filter((line) => line.includes(','));
  const alone = withComma.every((line) => !/[\t;]|\d\s+[-+]?\d/.test(line) && line.split(',').length === 2);
  return alone && withComma.some((line) => /\d\.\d*,|,\s*[-+]?\d*\.\d/.test(line));
}

/** The page's decimal mark, unless the text has figures that can only be meant with the other, and none with the page's. */
function markOf(cells: readonly string[], mark: DecimalMark, isFigure: (cell: string) => boolean): DecimalMark {
  const other = mark === '.' ? ',' : '.';
  return cells.some((cell) => cell.includes(other) && isFigure(cell)) && !cells.some((cell) => cell.includes(mark)) ? other : mark;
}

function readRow({ line, text, cells }: Row, mark: DecimalMark, swapped: boolean): CurvePoint | LineFault {
  if (cells.length > 2) return { line, code: 'more-columns', typed: text };
  if (cells.length < 2) return { line, code: /^[-+]?\d+,\d+$/.test(text) ? 'which-comma' : 'one-column', typed: text };
  const figures = cells.map((cell) => readNumber(cell, mark));
  const wrong = figures.findIndex((figure) => !('text' in figure));
  if (wrong >= 0) {
    const figure = figures[wrong];
    return figure && 'doubt' in figure ? { line, code: figure.doubt, typed: cells[wrong] ?? '' } : { line, code: 'one-column', typed: text };
  }
  const [a = 0, b = 0] = figures.map((figure) => ('text' in figure ? Number(figure.text) : NaN));
  return swapped ? { volume: b, reading: a } : { volume: a, reading: b };
}
