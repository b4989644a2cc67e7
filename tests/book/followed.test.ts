import { expect, it } from 'vitest';
import type { Store, StoredChange } from '../../src/book/store.js';
import { EMPTY_SITE } from '../../src/core.js';
import { delivery, done, inMemory, keep, newName, open, textOf } from './books.js';

/** A store that counts the documents it hands out to be read. */
function counting(): { readonly store: (name: string) => Store; readonly read: () => number } {
  let read = 0;
  const store = (name: string): Store =>
    new Proxy<Store>(inMemory(name), {
      get: (real, key) => {
        if (key !== 'changes') return typeof real[key as keyof Store] === 'function' ? (real[key as keyof Store] as () => unknown).bind(real) : undefined;
        return (wanted: { readonly live?: true }) => {
          const changes = real.changes(wanted as never) as unknown as Promise<{ readonly results: readonly StoredChange[] }>;
          return wanted.live ? changes : changes.then((found) => ((read += found.results.length), found));
        };
      },
    });
  return { store, read: () => read };
}

/** A book of many lots, as a file brings them. */
async function large(name: string, lots: number) {
  const [source, book] = [await open(), await open(name)];
  await keep(source, delivery('A', '1.2'));
  const file = JSON.parse(await textOf(source)) as { records: Record<string, unknown>[] };
  const records = Array.from({ length: lots }, (_, i) => {
    const lot = `20260101T${String(i).padStart(9, '0')}Z-aaaaaa-aaaa`;
    return { ...file.records[0], lot, id: `${lot}.0001.aaaaaaaa` };
  });
  done(await book.restore(JSON.stringify({ ...file, records })));
  return book;
}

/** Waits until the feed has laid a sheet down. */
async function laid(name: string, sheet: number): Promise<void> {
  const store = inMemory(name);
  for (;;) {
    const found = await store.get(`_local/catalogue-${sheet}`).catch(() => undefined);
    if (found) return;
    await new Promise((turn) => setImmediate(turn));
  }
}

it('a large book opens without being read through, and shows the same', async () => {
  const name = newName();
  const book = await large(name, 2300);
  await laid(name, 1);
  const { store, read } = counting();
  const again = await open(name, { store });
  expect(again.find().lots).toEqual(book.find().lots);
  expect([again.size, read()]).toEqual([2300, 300]);
  // what comes in later is seen by both
  const lot = book.find({ limit: 1 }).lots[0]!.lot;
  done(await again.amend(lot, delivery('A', '2'), EMPTY_SITE, { reason: 'x' }));
  expect((await open(name)).newestOf(lot)).toMatchObject({ number: 2 });
});

it.each([['of another version', { version: 99 }], ['that does not join the one before', { since: 7 }]])('a sheet %s is left aside and the documents are read', async (_, other) => {
  const name = newName();
  const book = await large(name, 2100);
  await laid(name, 1);
  const store = inMemory(name);
  await store.put({ ...(await store.get('_local/catalogue-1')), ...other });
  const counted = counting();
  const again = await open(name, { store: counted.store });
  expect(again.find().lots).toEqual(book.find().lots);
  expect(counted.read()).toBe(1100);
});
