import { readTable } from '../../src/exchange/table/read-table.js';
import { recogniseColumns } from '../../src/exchange/table/columns.js';
import { workedRows } from '../../src/exchange/table/worked-rows.js';
import type { RowsSummary } from '../../src/exchange/table/worked-rows.js';
import { EMPTY_SITE } from '../../src/lot/entry.js';
import type { LotEntry } from '../../src/lot/entry.js';
import { lots } from './parts/lots.js';
import { straightRow } from './parts/straight-list.js';
import type { StraightRow } from './parts/straight-list.js';

// A year's file: rows of a sheet read as text and worked out, as the worker does it. Against the same arithmetic written out by hand,
// by the row for a short and a long file, and how much memory it takes. Ends with exit code 1 when a target is missed.

const MANY = 100_000;
const FEW = 10_000;
const MOST_RATIO = 2;
const MOST_GROWTH = 1.3;
const MOST_MEGABYTES = 400;

const HEADER = ['Lot', 'Oil [kg]', 'Water [%]', 'Titrant [mol/L]', 'Titration temperature [°C]', 'Sample 1 [g]', 'Start 1 [mL]', 'End 1 [mL]', 'Sample 2 [g]', 'Start 2 [mL]', 'End 2 [mL]'];
const figureOf = (figure: { text: string } | { typed: string } | undefined): string => (figure && 'text' in figure ? figure.text : '');
const cellsOf = ({ figures, runs }: LotEntry): readonly string[] => [
  figures['oilAmount'], figures['waterContent'], figures['titrantStrength'], figures['titrationTemperature'], ...runs.flatMap(({ sample, start, end }) => [sample, start, end]),
].map(figureOf);

/** The text of a file of so many rows, direct route all of them. */
function fileOf(rows: number): string {
  const base = lots(2_000, 2.2, 5).map(cellsOf);
  const cells = Array.from({ length: rows }, (_, i) => base[i % base.length]!);
  return [HEADER.join('\t'), ...cells.map((row, i) => [`L${i}`, ...row].join('\t'))].join('\r\n');
}

const megabytes = (bytes: number): number => bytes / 2 ** 20;
let peak = 0;
const look = (): void => void (peak = Math.max(peak, process.memoryUsage().rss));

/** Works a file out and looks at each row, as a page that shows them does. */
function work(text: string): { readonly summary: RowsSummary; readonly first: readonly (StraightRow & { state: string })[]; readonly milliseconds: number } {
  const start = process.hrtime.bigint();
  const table = readTable(text);
  if ('fault' in table) throw new Error(table.fault.code);
  const slices = workedRows({ table, columns: recogniseColumns(table), mark: '.', dates: 'day-first', site: EMPTY_SITE });
  const first: (StraightRow & { state: string })[] = [];
  for (let slice = 0; ; slice++) {
    const { done, value } = slices.next();
    if (done) return { summary: value, first, milliseconds: Number(process.hrtime.bigint() - start) / 1e6 };
    if (first.length < 2_000) first.push(...(value as readonly (StraightRow & { state: string })[]));
    if (slice % 20 === 0) look();
  }
}

function straight(text: string): { readonly rows: readonly StraightRow[]; readonly milliseconds: number } {
  const start = process.hrtime.bigint();
  const rows: StraightRow[] = [];
  for (const line of text.split('\r\n').slice(1)) {
    const out = straightRow(line.split('\t').slice(1));
    if (rows.length < 2_000) rows.push(out);
  }
  return { rows, milliseconds: Number(process.hrtime.bigint() - start) / 1e6 };
}

const missed: string[] = [];
const kept = (what: string, figure: number, most: number): void => {
  if (figure > most) missed.push(what);
  console.log(`${what}: ${figure.toFixed(2)} (at most ${most}) ${figure > most ? 'MISSED' : 'kept'}`);
};

const few = fileOf(FEW);
// both must give the same, or the comparison means nothing
const [listed, byHand] = [work(few), straight(few)];
for (const [i, row] of byHand.rows.entries()) {
  const other = listed.first[i];
  if (!other || (['acidValue', 'freeFattyAcid', 'plusMinus', 'catalyst', 'methanol'] as const).some((key) => row[key] !== other[key])) throw new Error(`row ${i}: ${JSON.stringify(row)} ${JSON.stringify(other)}`);
}
const rounds = Array.from({ length: 3 }, () => ({ list: work(few).milliseconds, hand: straight(few).milliseconds }));
const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]!;
const perRowFew = median(rounds.map(({ list }) => list)) / FEW;

const many = fileOf(MANY);
const long = work(many);
console.log(`${MANY} rows: ${Math.round((1000 * MANY) / long.milliseconds)} a second, peak ${megabytes(peak).toFixed(0)} MB`);
console.log(`by hand: ${Math.round(1000 / (median(rounds.map(({ hand }) => hand)) / FEW))} a second`);
kept('rows of a sheet to the same by hand', median(rounds.map(({ list, hand }) => list / hand)), MOST_RATIO);
kept('cost a row, 100,000 to 10,000', long.milliseconds / MANY / perRowFew, MOST_GROWTH);
kept('peak memory, MB', megabytes(peak), MOST_MEGABYTES);
if (long.summary.states.accepted + long.summary.states['held-for-retest'] !== MANY) throw new Error(JSON.stringify(long.summary));
if (missed.length) {
  console.log(`missed: ${missed.join(', ')}`);
  process.exitCode = 1;
}
