import idb from 'pouchdb-adapter-idb';
import PouchDB from 'pouchdb-core';
import type { Store } from './store.js';

PouchDB.plugin(idb);

/** A database of the browser, in IndexedDB. It is made where there is none of that name. Throws where the browser gives none. */
export function browserStore(name: string): Store {
  return new PouchDB<Store>(name, { adapter: 'idb' });
}
