import { readLot } from '../../src/core.js';
import type { LotEntry, LotReading } from '../../src/core.js';
import { lots } from './parts/lots.js';
import { straightLine } from './parts/straight-line.js';

// What it costs to read a lot: against the same arithmetic written out by hand, in milliseconds, and
// for long lists. Ends with exit code 1 when a ratio misses its target; milliseconds depend on the machine.

const MOST_RATIO = 3;
const MOST_MILLISECONDS = 2;
const MOST_GROWTH = 1.3;

const collect = (globalThis as { gc?: () => void }).gc ?? ((): void => undefined);
const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]!;
const milliseconds = (work: () => void): number => {
  const start = process.hrtime.bigint();
  work();
  return Number(process.hrtime.bigint() - start) / 1e6;
};

function read(entry: LotEntry, only?: readonly string[]): LotReading {
  const result = readLot(entry, undefined, only ? { only } : {});
  if ('faults' in result) throw new Error(JSON.stringify(result.faults));
  return result;
}

/** A combined uncertainty is summed up in another order; its last digits differ. */
const same = (key: string, one: string, other: string | undefined): boolean =>
  one === other || (key.startsWith('±') && other !== undefined && Math.abs(Number(one) / Number(other) - 1) < 1e-14);

/** Both ways must give the same readings, value and shown text, or the comparison means nothing. */
function verify(entries: readonly LotEntry[]): number {
  let figures = 0;
  for (const entry of entries) {
    const byHand = straightLine(entry);
    const { readings: plain, uncertainties } = read(entry);
    const readings: Readonly<Record<string, { readonly value?: string; readonly shown?: string }>> = {
      ...plain, ...Object.fromEntries(Object.entries(uncertainties).map(([key, { expanded }]) => [`± ${key}`, { value: expanded, shown: '' }])),
    };
    const wrong = [...new Set([...Object.keys(readings), ...Object.keys(byHand)])].filter((key) =>
      readings[key]?.value === undefined || !same(key, readings[key].value, byHand[key]?.value) || readings[key].shown !== byHand[key]?.shown);
    if (wrong.length) throw new Error(`not the same: ${wrong.map((key) => `${key} ${JSON.stringify(readings[key])} ${JSON.stringify(byHand[key])}`).join('\n')}`);
    figures += Object.keys(readings).length;
  }
  return figures / entries.length;
}

const missed: string[] = [];
const report = (what: string, ratio: number, most: number): void => {
  const kept = ratio <= most;
  if (!kept) missed.push(what);
  console.log(`${what}: ${ratio.toFixed(2)} (at most ${most}) ${kept ? 'kept' : 'MISSED'}`);
};

function oneLot(): void {
  const entries = lots(40, 2.4); // one pass of the acid step each, as the plain function is written for
  console.log(`${verify(entries)} figures a lot, equal to those written out by hand`);
  const ways = { plain: () => entries.forEach((entry) => straightLine(entry)), lot: () => entries.forEach((entry) => read(entry)) };
  const times: { plain: number; lot: number }[] = [];
  for (let round = 0; round < 40; round++) {
    // each way goes first in every other round
    const plainFirst = round % 2 === 0 ? milliseconds(ways.plain) : undefined;
    const lot = milliseconds(ways.lot);
    times.push({ plain: plainFirst ?? milliseconds(ways.plain), lot });
  }
  const settled = times.slice(10).map(({ plain, lot }) => ({ plain: plain / entries.length, lot: lot / entries.length }));
  const perLot = median(settled.map(({ lot }) => lot));
  console.log(`written out by hand: ${median(settled.map(({ plain }) => plain)).toFixed(3)} ms a lot`);
  const fastest = Math.min(...settled.map(({ lot }) => lot));
  const verdict = perLot < MOST_MILLISECONDS ? 'kept' : 'not kept on this machine';
  console.log(`readLot, all readings: ${perLot.toFixed(3)} ms a lot, ${fastest.toFixed(3)} in the fastest round (wanted: under ${MOST_MILLISECONDS} ms) ${verdict}`);
  report('readLot to the same by hand', median(settled.map(({ plain, lot }) => lot / plain)), MOST_RATIO);
}

function manyLots(): void {
  const only = ['acidValue', 'freeFattyAcid', 'direct.catalyst', 'direct.methanol'];
  /** Reads lots and keeps what a list shows of them. */
  const list = (entries: readonly LotEntry[], kept: string[]): void => {
    for (const entry of entries) {
      const { readings, route } = read(entry, only);
      kept.push(only.map((key) => readings[key]!.shown!).join('\t') + route.verdict);
    }
  };
  const SLICE = 2_000;
  const few = lots(SLICE, 12);
  const many = lots(10 * SLICE, 12, 11);
  list(few, []);

  const megabytes = (bytes: number): string => `${(bytes / 2 ** 20).toFixed(0)} MB`;
  const peaks = (entries: readonly LotEntry[]): string => {
    collect();
    const kept: string[] = [];
    let [rss, heap] = [0, 0];
    for (let from = 0; from < entries.length; from += 500) {
      list(entries.slice(from, from + 500), kept);
      const now = process.memoryUsage();
      [rss, heap] = [Math.max(rss, now.rss), Math.max(heap, now.heapUsed)];
    }
    return `peak rss ${megabytes(rss)}, peak heap ${megabytes(heap)}`;
  };
  const memory = { few: peaks(few), many: peaks(many) };

  // the long list goes in slices with the short one between them, so that other work on the machine slows both alike
  const times: { few: number; many: number }[] = [];
  for (let round = 0; round < 5; round++) {
    collect();
    const time = { few: 0, many: 0 };
    const kept: string[] = [];
    for (let from = 0; from < many.length; from += SLICE) {
      time.many += milliseconds(() => {
        list(many.slice(from, from + SLICE), kept);
      });
      time.few += milliseconds(() => {
        list(few, []);
      });
    }
    if (kept.length !== many.length) throw new Error('a lot got lost');
    times.push(time);
  }
  const rate = (of: (time: (typeof times)[number]) => number): number => Math.round((1000 * many.length) / median(times.map(of)));
  console.log(`lists of 2,000 lots, ${only.length} readings each: ${rate((time) => time.few)} lots a second, ${memory.few}`);
  console.log(`a list of 20,000 lots, ${only.length} readings each: ${rate((time) => time.many)} lots a second, ${memory.many}`);
  report('cost a lot, 20,000 to 2,000', median(times.map((time) => time.many / time.few)), MOST_GROWTH);
}

oneLot();
manyLots();
if (missed.length) {
  console.log(`missed: ${missed.join(', ')}`);
  process.exitCode = 1;
}
