import memory from 'pouchdb-adapter-memory';
import PouchDB from 'pouchdb-core';
import { openBook } from '../../src/book/book.js';
import type { Book } from '../../src/book/book.js';
import type { BookRefused } from '../../src/book/refusal.js';
import type { Store } from '../../src/book/store.js';

// A book of twenty thousand lots on a store in memory: opening it, finding in it, keeping one more. In a browser the store is
// slower and the catalogue the same. Ends with exit code 1 when a target is missed.

const LOTS = 20_000;
const OPEN_MILLISECONDS = 1000;
const FIND_MILLISECONDS = 100;

PouchDB.plugin(memory);
const store = (name: string): Store => new PouchDB<Store>(name, { adapter: 'memory' });
const open = async (): Promise<Book> => opened(await openBook('bench', { store }));

function opened(book: Book | BookRefused): Book {
  if ('refused' in book) throw new Error(book.refused);
  return book;
}

function record(i: number): object {
  const keptAt = new Date(Date.UTC(2016, 0, 1) + i * 4 * 3600 * 1000).toISOString();
  const lot = `${keptAt.replace(/[-:.]/g, '')}-bench0-${String(i % 10_000).padStart(4, '0')}`;
  const [name, source, date, ffa] = [`HK-${i}`, `Kitchen ${i % 60}`, keptAt.slice(0, 10), ((i * 37) % 3000) / 100];
  return {
    version: 1, id: `${lot}.0001.${String(i).padStart(8, '0')}`, lot, number: 1, keptAt,
    entry: { version: 1, name, source, date, figures: { oilAmount: { text: '900', unit: 'kg' }, certificateFfa: { text: String(ffa), unit: '%' } }, options: { acidKnownFrom: 'certificate-ffa' }, runs: [], retestRuns: [] },
    site: { version: 1, figures: {}, options: {} },
    summary: { name, source, date, acidValue: (ffa * 1.99).toFixed(1), freeFattyAcid: ffa.toFixed(2), route: ffa > 3 ? 'two-step' : 'direct', state: ffa > 3 ? 'two-step' : 'direct' },
  };
}

async function time<Result>(what: () => Result | Promise<Result>): Promise<readonly [number, Result]> {
  const before = performance.now();
  const result = await what();
  return [performance.now() - before, result];
}

const first = await open();
const [restoring] = await time(() => first.restore(JSON.stringify({ format: 'esterway-book', version: 1, records: Array.from({ length: LOTS }, (_, i) => record(i)) })));
// whatever came in is laid down by the feed, a thousand at a time
await new Promise<void>((done) => setTimeout(done, 2000));
console.log(`restoring ${LOTS} lots: ${(restoring / 1000).toFixed(1)} s`);

const [opening, book] = await time(open);
if (book.size !== LOTS) throw new Error(`${book.size} lots`);
const queries = [{}, { text: 'hk-19 kitchen 5' }, { source: 'Kitchen 7', ffaFrom: '2', ffaTo: '4' }, { from: '2020-01-01', to: '2020-12-31', state: 'direct' }, { text: 'nothing of the kind' }];
const finds: number[] = [];
for (let round = 0; round < 20; round++) {
  for (const query of queries) finds.push((await time(() => book.find({ ...query, limit: 50 })))[0]);
}
const slowest = Math.max(...finds);
const [keeping] = await time(() => book.keep({ version: 1, name: 'new', figures: {}, options: {}, runs: [], retestRuns: [] }, { version: 1, figures: {}, options: {} }));
const [after] = await time(() => book.find({ limit: 50 }));

const line = (what: string, took: number, most: number): void => {
  console.log(`${what}: ${took.toFixed(1)} ms (at most ${most}) ${took <= most ? 'kept' : 'MISSED'}`);
  if (took > most) process.exitCode = 1;
};
line('opening', opening, OPEN_MILLISECONDS);
line(`finding, slowest of ${finds.length}`, Math.max(slowest, after), FIND_MILLISECONDS);
console.log(`keeping one more, with a look for the same: ${keeping.toFixed(1)} ms`);
process.exit();
