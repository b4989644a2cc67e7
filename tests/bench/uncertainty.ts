import { readLot } from '../../src/core.js';
import type { LotEntry } from '../../src/core.js';
import { lotRun } from '../../src/lot/lot-run.js';
import { uncertaintyOf } from '../../src/lot/uncertainty.js';
import { lots } from './parts/lots.js';

// What it costs to know how well every shown figure is known: u and budget of acid value, FFA, titrant and all amounts of both
// charges, against reading the same lot. Ends with exit code 1 when the ratio misses its target.

const MOST_RATIO = 6;
const SITE = { version: 1, figures: {}, options: {} } as const;

const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]!;
const milliseconds = (work: () => void): number => {
  const start = process.hrtime.bigint();
  work();
  return Number(process.hrtime.bigint() - start) / 1e6;
};

function shown(entry: LotEntry): readonly string[] {
  const reading = readLot(entry);
  if ('faults' in reading) throw new Error(JSON.stringify(reading.faults));
  const amounts = Object.values(reading.charges).flatMap((steps) => steps.flatMap(({ lines }) => lines.flatMap(({ mass, volume }) => [mass, volume].filter((key) => key !== undefined))));
  return [...new Set(['acidValue', 'freeFattyAcid', 'titrantConcentration', ...amounts])];
}

const entries = lots(40, 12);
const keys = entries.map(shown);
/** Keeps what is computed from being left out. */
let sources = 0;
const all = (entry: LotEntry, wanted: readonly string[]): void => {
  const run = lotRun(entry, SITE);
  for (const key of wanted) {
    const found = uncertaintyOf(run, key);
    if (!('budget' in found)) throw new Error(`${key} is not known`);
    sources += found.budget.length;
  }
};

const ways = { read: () => entries.forEach((entry) => readLot(entry)), all: () => entries.forEach((entry, i) => all(entry, keys[i]!)) };
const rounds: { read: number; all: number }[] = [];
for (let round = 0; round < 24; round++) {
  const readFirst = round % 2 === 0 ? milliseconds(ways.read) : undefined;
  const spent = milliseconds(ways.all);
  rounds.push({ read: readFirst ?? milliseconds(ways.read), all: spent });
}
const settled = rounds.slice(6);
const ratio = median(settled.map(({ read, all: spent }) => spent / read));
console.log(`${(keys.flat().length / keys.length).toFixed(1)} figures a lot, ${Math.round(sources / rounds.length / keys.flat().length)} sources each`);
console.log(`reading a lot: ${(median(settled.map(({ read }) => read)) / entries.length).toFixed(3)} ms; uncertainty and budget of all its figures: ${(median(settled.map(({ all: spent }) => spent)) / entries.length).toFixed(3)} ms`);
console.log(`uncertainties to reading the lot: ${ratio.toFixed(2)} (at most ${MOST_RATIO}) ${ratio <= MOST_RATIO ? 'kept' : 'MISSED'}`);
if (ratio > MOST_RATIO) process.exitCode = 1;
