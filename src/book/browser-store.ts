import idb from 'pouchdb-adapter-idb';
import PouchDB from 'pouchdb-core';
import type { Store } from './store.js';

PouchDB.plugin(idb);

/** A database of the browser, in IndexedDB. It is made where there is none of that name. Fails where the browser gives none. */
export async function browserStore(name: string): Promise<Store> {
  await storageAllowed();
  return new PouchDB<Store>(name, { adapter: 'idb' });
}

/**
 * Tries whether the browser opens a database at all: in a private window or a sandboxed frame it may throw, and PouchDB would
 * then wait for ever, and every later database with it.
 */
async function storageAllowed(): Promise<void> {
  const trial = 'esterway-trial';
  await new Promise<void>((allowed, denied) => {
    const request = indexedDB.open(trial);
    request.onerror = () => denied(request.error ?? new Error('not allowed'));
    request.onsuccess = () => {
      request.result.close();
      allowed();
    };
  });
  indexedDB.deleteDatabase(trial);
}
