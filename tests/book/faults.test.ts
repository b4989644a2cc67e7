import { describe, expect, it } from 'vitest';
import { openBook } from '../../src/book/book.js';
import { readRecord } from '../../src/book/record.js';
import type { Store, StoredDocument } from '../../src/book/store.js';
import { EMPTY_SITE } from '../../src/core.js';
import { delivery, done, inMemory, keep, newName, open, textOf } from './books.js';

describe('what goes wrong', () => {
  const failing = (fault: unknown, of: keyof Store = 'put') => (name: string): Store =>
    new Proxy(inMemory(name), {
      get: (store, key) => {
        if (key === of) return async (document: { readonly _id?: string }) => (String(document._id).startsWith('_local/') ? store.put(document as StoredDocument) : Promise.reject(fault));
        const value = Reflect.get(store, key) as unknown;
        return typeof value === 'function' ? (value.bind(store) as unknown) : value;
      },
    });
  // as the adapter for IndexedDB hands a full disk on
  const full = Object.assign(new Error('QuotaExceededError'), { name: 'indexed_db_went_bad', reason: 'QuotaExceededError', status: 500 });

  it('a full disk is told as such, and nothing is in the book', async () => {
    const book = await open(undefined, { store: failing(full) });
    expect(await book.keep(delivery('A', '1'), EMPTY_SITE)).toEqual({ refused: 'storage-full', params: {} });
    expect(book.size).toBe(0);
    const restoring = await open(undefined, { store: failing(full, 'bulkDocs') });
    const other = await open();
    await keep(other, delivery('A', '1'));
    expect(await restoring.restore(await textOf(other))).toEqual({ refused: 'storage-full', params: { added: '0' } });
  });

  it('any other fault of the store is told with its words', async () => {
    const book = await open(undefined, { store: failing(new Error('gone')) });
    expect(await book.keep(delivery('A', '1'), EMPTY_SITE)).toEqual({ refused: 'storage-failed', params: { detail: 'Error, gone' } });
  });

  it('no store at all is told', async () => {
    const none = await openBook('none', { store: () => { throw new Error('Invalid Adapter: idb'); } });
    expect(none).toEqual({ refused: 'no-storage', params: { detail: 'Error, Invalid Adapter: idb' } });
  });

  it('closed in the middle of writing, a version is there as a whole or not at all', async () => {
    for (let attempt = 0; attempt < 20; attempt++) {
      const name = newName();
      const book = await open(name);
      const { record } = await keep(book, delivery('A', '1'));
      void book.amend(record.lot, delivery('A', '2'), EMPTY_SITE, { reason: 'x' });
      for (let turn = 0; turn < attempt; turn++) await Promise.resolve();
      await book.close();
      const again = await open(name);
      const versions = done(await again.versions(record.lot));
      expect(versions[0]).toEqual(record);
      expect([1, 2]).toContain(versions.length);
      expect(versions.every((version) => typeof readRecord(version) !== 'string')).toBe(true);
      expect(again.find().lots.map(({ id }) => id)).toEqual([versions.at(-1)!.id]);
      await again.close();
    }
  });
});
