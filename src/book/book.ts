import type { HistoryPoint } from '../lot/history.js';
import { EMPTY_LOT } from '../lot/entry.js';
import type { LotEntry, SiteProfile } from '../lot/entry.js';
import { bookText, readBookText } from './book-file.js';
import { Catalogue, lineOf } from './catalogue.js';
import type { BookFound, BookQuery, CatalogueEntry } from './catalogue.js';
import { follow } from './followed.js';
import { VERSION_ID, newBench, newLotId, newVersionId } from './ids.js';
import { RECORD_VERSION, byAge, readRecord } from './record.js';
import type { LotRecord } from './record.js';
import { refuse, storageFault } from './refusal.js';
import type { BookRefused } from './refusal.js';
import { sameJson } from './same.js';
import { isMissing, isThereAlready } from './store.js';
import type { Store, StoredDocument } from './store.js';
import { summaryOf } from './summary.js';
import type { StateOf } from './summary.js';

/** How a book is opened. */
export interface BookOptions {
  /** Gives the database of a name; throws where there can be none. */
  readonly store: (name: string) => Store | Promise<Store>;
  /** What becomes of a delivery; the verdict of its route when left out. */
  readonly stateOf?: StateOf;
  readonly now?: () => Date;
}

/** A version that was kept, or the one that says the same already. */
export interface Kept {
  readonly record: LotRecord;
  readonly unchanged: boolean;
}

/** What came of restoring: how many versions went in, were there, or were there with another content (which stays). */
export interface Restored {
  readonly added: number;
  readonly already: number;
  readonly different: number;
}

const BENCH = '_local/bench';
/** Documents written or read at once. */
const BATCH = 500;

/** Opens the book of a name, or begins it. Nothing of it can be lost by opening. */
export async function openBook(name: string, options: BookOptions): Promise<Book | BookRefused> {
  let store: Store;
  let bench: string;
  try {
    store = await options.store(name);
    bench = await benchOf(store);
  } catch (fault) {
    const { params } = storageFault(fault);
    return refuse('no-storage', params);
  }
  const book = new Book(store, bench, options);
  try {
    await book.begin();
  } catch (fault) {
    return storageFault(fault);
  }
  return book;
}

/** The name of this bench in ids. */
async function benchOf(store: Store): Promise<string> {
  for (;;) {
    try {
      return String((await store.get(BENCH))['bench']);
    } catch (fault) {
      if (!isMissing(fault)) throw fault;
    }
    try {
      const bench = newBench();
      await store.put({ _id: BENCH, bench });
      return bench;
    } catch (fault) {
      // another tab was first
      if (!isThereAlready(fault)) throw fault;
    }
  }
}

/**
 * The intake book: lots as they were kept, every version of each. Nothing in it is ever changed or removed; an amendment is another version.
 * Writing one version is one write: it is there as a whole or not at all.
 */
export class Book {
  readonly #catalogue = new Catalogue();
  readonly #listeners = new Set<() => void>();
  readonly #options: BookOptions;
  #end: (() => void) | undefined;
  #lost: BookRefused | undefined;
  #revision = 0;

  constructor(
    private readonly store: Store,
    private readonly bench: string,
    options: BookOptions,
  ) {
    this.#options = options;
  }

  /** Reads what is there and follows what comes in. */
  async begin(): Promise<void> {
    const told = (lines: Parameters<Parameters<typeof follow>[1]>[0]): void => {
      // all of them: a line that is known already must not keep the next from being taken
      if (lines.filter((line) => this.#catalogue.take(line)).length) this.#tell();
    };
    this.#end = await follow(this.store, told, (fault) => {
      this.#lost = storageFault(fault);
      this.#tell();
    });
  }

  /** How many lots are in it. */
  get size(): number {
    return this.#catalogue.size;
  }

  /** How many versions a newer code wrote: they are kept, but cannot be shown. */
  get unread(): number {
    return this.#catalogue.unread;
  }

  /** Why what other tabs keep is no longer seen; undefined while all is well. */
  get lost(): BookRefused | undefined {
    return this.#lost;
  }

  /** Another number whenever something came in. */
  get revision(): number {
    return this.#revision;
  }

  /** Calls back whenever something came in, from wherever. Gives back what ends it. */
  watch(listener: () => void): () => void {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  }

  // -- keeping --------------------------------------------------------------

  /** Keeps a lot as a new one. One that is in the book as it is comes back as `unchanged`. */
  async keep(entry: LotEntry, site: SiteProfile, { by }: { readonly by?: string } = {}): Promise<Kept | BookRefused> {
    try {
      const same = await this.#sameAs(entry, site);
      if (same) return { record: same, unchanged: true };
      const keptAt = this.#now();
      return await this.#write(newLotId(keptAt, this.bench), 1, keptAt, entry, site, by ? { by } : {});
    } catch (fault) {
      return storageFault(fault);
    }
  }

  /**
   * Keeps a further version of a lot.
   *
   * @param onto id of the version that was amended; refused as `amended-meanwhile` where it is not the newest
   */
  async amend(lot: string, entry: LotEntry, site: SiteProfile, { reason, by, onto }: { readonly reason: string; readonly by?: string; readonly onto?: string }): Promise<Kept | BookRefused> {
    if (!reason.trim()) return refuse('reason-missing');
    try {
      const newest = (await this.#recordsOf(lot)).at(-1);
      if (!newest) return refuse('unknown-lot');
      if (onto !== undefined && onto !== newest.id) return refuse('amended-meanwhile', { number: String(newest.number) });
      if (sameJson(newest.entry, entry) && sameJson(newest.site, site)) return { record: newest, unchanged: true };
      return await this.#write(lot, newest.number + 1, this.#now(), entry, site, { reason: reason.trim(), ...(by && { by }) });
    } catch (fault) {
      return storageFault(fault);
    }
  }

  /** Every version of a lot that this code can read, the oldest first. */
  async versions(lot: string): Promise<readonly LotRecord[] | BookRefused> {
    try {
      const records = await this.#recordsOf(lot);
      return records.length ? records : refuse('unknown-lot');
    } catch (fault) {
      return storageFault(fault);
    }
  }

  // -- finding --------------------------------------------------------------

  find(query: BookQuery = {}): BookFound {
    return this.#catalogue.find(query);
  }

  newestOf(lot: string): CatalogueEntry | undefined {
    return this.#catalogue.newestOf(lot);
  }

  sources(): readonly string[] {
    return this.#catalogue.sources();
  }

  states(): readonly string[] {
    return this.#catalogue.states();
  }

  history(source: string): readonly HistoryPoint[] {
    return this.#catalogue.history(source);
  }

  // -- the whole book -------------------------------------------------------

  /** All of it as the text of a file, those versions too that this code cannot show. */
  async exportBook(): Promise<{ readonly text: string } | BookRefused> {
    try {
      const records: object[] = [];
      for (let startkey = ''; ; ) {
        const { rows } = await this.store.allDocs({ include_docs: true, startkey, endkey: '\uffff', limit: BATCH });
        for (const { id, doc } of rows) if (doc && VERSION_ID.test(id)) records.push(recordOf(doc));
        const last = rows.at(-1)?.id;
        if (last === undefined || rows.length < BATCH) return { text: bookText(records, this.#now()) };
        startkey = `${last}\u0000`;
      }
    } catch (fault) {
      return storageFault(fault);
    }
  }

  /**
   * Puts in what a file has and the book has not. What is there stays as it is. Asked again after an interruption, it adds the rest.
   *
   * @param told called now and then with how many of all versions have been looked at
   */
  async restore(text: string, told?: (done: number, all: number) => void): Promise<Restored | BookRefused> {
    const records = readBookText(text);
    if ('refused' in records) return records;
    let [added, already, different] = [0, 0, 0];
    try {
      for (let start = 0; start < records.length; start += BATCH) {
        const batch = records.slice(start, start + BATCH);
        const results = await this.store.bulkDocs(batch.map(documentOf));
        for (const [index, { status }] of results.entries()) {
          const record = batch[index];
          if (!record) continue;
          if (status === undefined) added += 1;
          else if (status !== 409) return storageFault(results[index], { added: String(added) });
          else if (sameJson(recordOf(await this.store.get(record.id)), record)) already += 1;
          else different += 1;
        }
        this.#take(batch.filter((_, index) => results[index]?.status === undefined));
        told?.(start + batch.length, records.length);
      }
      return { added, already, different };
    } catch (fault) {
      return storageFault(fault, { added: String(added) });
    }
  }

  /** Ends following and gives the database back. */
  async close(): Promise<void> {
    this.#end?.();
    this.#listeners.clear();
    // another book of the same page may have closed the same database already
    await this.store.close().catch(() => undefined);
  }

  // -------------------------------------------------------------------------

  async #write(lot: string, number: number, keptAt: string, entry: LotEntry, site: SiteProfile, why: { readonly by?: string; readonly reason?: string }): Promise<Kept | BookRefused> {
    if (isEmpty(entry)) return refuse('empty-lot');
    const summary = summaryOf(entry, site, this.#options.stateOf);
    if (!summary) return refuse('unreadable-lot');
    const record: LotRecord = { version: RECORD_VERSION, id: newVersionId(lot, number), lot, number, keptAt, ...why, entry, site, summary };
    await this.store.put(documentOf(record));
    this.#take([record]);
    return { record, unchanged: false };
  }

  /** A lot whose newest version says just this. */
  async #sameAs(entry: LotEntry, site: SiteProfile): Promise<LotRecord | undefined> {
    const summary = summaryOf(entry, site, this.#options.stateOf);
    const alike = this.#catalogue.find(summary?.source === undefined ? {} : { source: summary.source }).lots.filter((lot) => sameJson(lot.summary, summary));
    for (const { lot } of alike) {
      // from the store: another tab may have amended it a moment ago
      const newest = (await this.#recordsOf(lot)).at(-1);
      if (newest && sameJson(newest.entry, entry) && sameJson(newest.site, site)) return newest;
    }
    return undefined;
  }

  async #recordsOf(lot: string): Promise<readonly LotRecord[]> {
    const { rows } = await this.store.allDocs({ include_docs: true, startkey: `${lot}.`, endkey: `${lot}.\uffff` });
    const records = rows.flatMap(({ doc }) => {
      const record = doc && readRecord(recordOf(doc));
      return record === undefined || typeof record === 'string' ? [] : [record];
    });
    return records.sort(byAge);
  }

  #take(records: readonly LotRecord[]): void {
    const lines = records.flatMap((record) => lineOf(documentOf(record)) ?? []);
    if (lines.filter((line) => this.#catalogue.take(line)).length) this.#tell();
  }

  #tell(): void {
    this.#revision += 1;
    for (const listener of this.#listeners) listener();
  }

  #now(): string {
    return (this.#options.now?.() ?? new Date()).toISOString();
  }
}

/** A lot of which nothing was typed. */
const isEmpty = (entry: LotEntry): boolean => sameJson({ ...EMPTY_LOT, ...entry, options: {} }, EMPTY_LOT);

const documentOf = ({ id, ...record }: LotRecord): StoredDocument => ({ _id: id, ...record });
const recordOf = ({ _id, _rev, ...record }: StoredDocument): Readonly<Record<string, unknown>> => ({ id: _id, ...record });
