import { readLot } from '../../src/core.js';
import type { LotEntry } from '../../src/core.js';
import { isKnown } from '../../src/formula/reading.js';
import { balance } from '../../src/lot/balance.js';
import { lotRun } from '../../src/lot/lot-run.js';
import { lots } from './parts/lots.js';

// What it costs to know where everything in a batch goes: the mass balance of both routes, step by step, and what both routes
// cost, against reading the same lot. Ends with exit code 1 when the ratio misses its target.

const MOST_RATIO = 2;
const ROUTES = ['direct', 'twoStep'] as const;
const figure = (text: string, unit: string): { text: string; unit: string } => ({ text, unit });
const SITE = {
  version: 1, options: {},
  figures: {
    oilPrice: figure('600', '¤/t'), esterPrice: figure('1000', '¤/t'), methanolPrice: figure('0.5', '¤/kg'), 'KOH.price': figure('1.2', '¤/kg'),
    sulfuricPrice: figure('0.3', '¤/kg'), 'acetic.price': figure('0.9', '¤/kg'), 'phosphoric.price': figure('1.5', '¤/kg'), drawnOffPrice: figure('100', '¤/t'), lowerLayerPrice: figure('20', '¤/t'),
  },
} as const;

const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]!;
const milliseconds = (work: () => void): number => {
  const start = process.hrtime.bigint();
  work();
  return Number(process.hrtime.bigint() - start) / 1e6;
};

const COSTS = ROUTES.flatMap((route) => ['total', 'perTonne'].map((name) => `cost.${route}.${name}`));
/** Keeps what is computed from being left out. */
let figures = 0;

function both(entry: LotEntry): void {
  for (const route of ROUTES) {
    const found = balance(entry, SITE, route);
    if (!('steps' in found)) throw new Error(JSON.stringify(found));
    for (const { step, in: into, out, difference } of found.steps) {
      if (difference.mass !== '0') throw new Error(`${step} does not close: ${difference.mass} kg`);
      figures += into.length + out.length;
    }
  }
  const { findings } = lotRun(entry, SITE);
  for (const key of COSTS) if (!isKnown(findings.outcome(key))) throw new Error(`${key} is not known`);
  figures += COSTS.length;
}

const entries = lots(40, 12);
const ways = { read: () => entries.forEach((entry) => readLot(entry, SITE)), both: () => entries.forEach(both) };
const rounds: { read: number; both: number }[] = [];
for (let round = 0; round < 24; round++) {
  const readFirst = round % 2 === 0 ? milliseconds(ways.read) : undefined;
  const spent = milliseconds(ways.both);
  rounds.push({ read: readFirst ?? milliseconds(ways.read), both: spent });
}
const settled = rounds.slice(6);
const ratio = median(settled.map(({ read, both: spent }) => spent / read));
console.log(`${Math.round(figures / rounds.length / entries.length)} figures a lot`);
console.log(`reading a lot: ${(median(settled.map(({ read }) => read)) / entries.length).toFixed(3)} ms; balance and cost of both routes: ${(median(settled.map(({ both: spent }) => spent)) / entries.length).toFixed(3)} ms`);
console.log(`balance and cost of both routes to reading the lot: ${ratio.toFixed(2)} (at most ${MOST_RATIO}) ${ratio <= MOST_RATIO ? 'kept' : 'MISSED'}`);
if (ratio > MOST_RATIO) process.exitCode = 1;
