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

/** Both ways must give the same readings, value and shown text, or the comparison means nothing. */
function verify(entries: readonly LotEntry[]): number {
  let figures = 0;
  for (const entry of entries) {
    const byHand = straightLine(entry);
    const { readings } = read(entry);
    const wrong = [...new Set([...Object.keys(readings), ...Object.keys(byHand)])].filter((key) =>
      readings[key]?.value === undefined || readings[key].value !== byHand[key]?.value || readings[key].shown !== byHand[key].shown);
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
  let most = { rss: 0, heap: 0 };
  /** Reads a list and keeps what a list shows; time a lot, in milliseconds. */
  const list = (entries: readonly LotEntry[]): number => {
    collect();
    const kept: string[] = [];
    const time = milliseconds(() => {
      entries.forEach((entry, index) => {
        const { readings, route } = read(entry, only);
        kept.push(only.map((key) => readings[key]!.shown!).join('\t') + route.verdict);
        if (index % 500 === 0) {
          const { rss, heapUsed } = process.memoryUsage();
          most = { rss: Math.max(most.rss, rss), heap: Math.max(most.heap, heapUsed) };
        }
      });
    });
    if (kept.length !== entries.length) throw new Error('a lot got lost');
    return time / entries.length;
  };
  const megabytes = (bytes: number): string => `${(bytes / 2 ** 20).toFixed(0)} MB`;
  const few = lots(2_000, 12);
  const many = lots(20_000, 12, 11);
  list(few);
  const times: { few: number; many: number; fewMemory: typeof most; manyMemory: typeof most }[] = [];
  for (let round = 0; round < 5; round++) {
    most = { rss: 0, heap: 0 };
    const ofFew = Math.min(list(few), list(few), list(few));
    const fewMemory = most;
    most = { rss: 0, heap: 0 };
    times.push({ few: ofFew, fewMemory, many: list(many), manyMemory: most });
  }
  const line = (count: string, perLot: number, memory: readonly (typeof most)[]): void =>
    console.log(`${count} lots, ${only.length} readings each: ${Math.round(1000 / perLot)} lots a second, peak rss ${megabytes(Math.max(...memory.map(({ rss }) => rss)))}, peak heap ${megabytes(Math.max(...memory.map(({ heap }) => heap)))}`);
  // other work on the machine only ever adds, so lists of either length are compared in their fastest round
  const fastest = (of: (time: (typeof times)[number]) => number): number => Math.min(...times.map(of));
  line('2,000', fastest((time) => time.few), times.map((time) => time.fewMemory));
  line('20,000', fastest((time) => time.many), times.map((time) => time.manyMemory));
  report('cost a lot, 20,000 to 2,000', fastest((time) => time.many) / fastest((time) => time.few), MOST_GROWTH);
}

oneLot();
manyLots();
if (missed.length) {
  console.log(`missed: ${missed.join(', ')}`);
  process.exitCode = 1;
}
