import memory from 'pouchdb-adapter-memory';
import PouchDB from 'pouchdb-core';
import { Book, openBook } from '../../src/book/book.js';
import type { BookOptions, Kept } from '../../src/book/book.js';
import type { BookRefused } from '../../src/book/refusal.js';
import type { Store } from '../../src/book/store.js';
import type { LotEntry } from '../../src/core.js';
import { EMPTY_SITE } from '../../src/core.js';
import { certified } from '../lot/lot.js';

// Books in memory, as tests open them.

PouchDB.plugin(memory);

/** One way; tells how many documents it wrote. */
type Replicate = (other: string) => Promise<{ readonly ok: boolean; readonly docs_written: number }>;
/** With the plugin for replication. */
type Database = Store & { readonly replicate: { readonly to: Replicate; readonly from: Replicate } };

let names = 0;
/** A name that no other test has. */
export const newName = (): string => `book-${process.pid}-${++names}`;
export const inMemory = (name: string): Database => new PouchDB<Database>(name, { adapter: 'memory' });

/** A clock that goes on by a minute with each look. */
export function clock(start = '2026-03-02T08:00:00.000Z'): () => Date {
  let time = Date.parse(start);
  return () => new Date((time += 60_000));
}

export async function open(name = newName(), options: Partial<BookOptions> = {}): Promise<Book> {
  return opened(await openBook(name, { store: inMemory, now: clock(), ...options }));
}

export function opened(book: Book | BookRefused): Book {
  if (!(book instanceof Book)) throw new Error(JSON.stringify(book));
  return book;
}

export function done<Result extends object>(result: Result | BookRefused): Result {
  if ('refused' in result) throw new Error(JSON.stringify(result));
  return result;
}

export const delivery = (name: string, ffa: string, source = 'Canteen', date = '2026-03-02'): LotEntry => ({ ...certified(ffa), name, source, date });
export const keep = async (book: Book, entry: LotEntry): Promise<Kept> => done(await book.keep(entry, EMPTY_SITE));
/** The whole book as the text of its file. */
export const textOf = async (book: Book): Promise<string> => done(await book.exportBook()).text;
export const refused = (result: object): string | undefined => (result as Partial<BookRefused>).refused;
