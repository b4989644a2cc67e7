import type { HistoryPoint } from '../lot/history.js';
import { RECORD_VERSION, byAge, compareText, isObject } from './record.js';
import type { LotRecord } from './record.js';
import type { StoredDocument } from './store.js';

/** What is kept in memory of a version: all but what was typed. */
export type CatalogueEntry = Omit<LotRecord, 'version' | 'entry' | 'site'>;

/** A line of the catalogue: a version, one of a newer code's that cannot be read, or one that is no longer there. */
export type CatalogueLine = CatalogueEntry | { readonly id: string; readonly unread: true } | { readonly id: string; readonly gone: true };

/** What to find; parts left out do not matter. */
export interface BookQuery {
  readonly source?: string;
  /** First and last day, ISO 8601; of a lot without such a date, the day of keeping. */
  readonly from?: string;
  readonly to?: string;
  readonly state?: string;
  /** %, decimal text, bounds included. */
  readonly ffaFrom?: string;
  readonly ffaTo?: string;
  /** Words that must all occur in name, source, who kept it or why, in any order and case. */
  readonly text?: string;
  /** How many to give, and how many to pass over first. */
  readonly limit?: number;
  readonly skip?: number;
}

export interface BookFound {
  /** How many there are in all. */
  readonly total: number;
  /** The newest version of each, the lot kept last first. */
  readonly lots: readonly CatalogueEntry[];
}

interface Shelf {
  readonly versions: Map<string, CatalogueEntry>;
  newest: CatalogueEntry;
  /** What its text is searched in. */
  words: string;
}

/** The newest version of every lot in memory, to find lots by. It takes lines in any order and more than once. */
export class Catalogue {
  readonly #shelves = new Map<string, Shelf>();
  readonly #unread = new Set<string>();
  #inOrder: readonly Shelf[] | undefined;

  /** How many lots there are. */
  get size(): number {
    return this.#shelves.size;
  }

  /** Versions that a newer code wrote: kept, but not shown. */
  get unread(): number {
    return this.#unread.size;
  }

  /** Whether the line told anything new. */
  take(line: CatalogueLine): boolean {
    if ('gone' in line) return this.#remove(line.id);
    if ('unread' in line) return this.#unread.size < this.#unread.add(line.id).size;
    const there = this.#shelves.get(line.lot);
    if (there?.versions.has(line.id)) return false;
    this.#inOrder = undefined;
    if (!there) {
      this.#shelves.set(line.lot, { versions: new Map([[line.id, line]]), newest: line, words: wordsOf(line) });
      return true;
    }
    there.versions.set(line.id, line);
    if (byAge(line, there.newest) > 0) this.#setNewest(there, line);
    return true;
  }

  newestOf(lot: string): CatalogueEntry | undefined {
    return this.#shelves.get(lot)?.newest;
  }

  find(query: BookQuery = {}): BookFound {
    const wanted = matcher(query);
    const all = this.#sorted().filter(wanted);
    const { skip = 0, limit = all.length } = query;
    return { total: all.length, lots: all.slice(skip, skip + limit).map(({ newest }) => newest) };
  }

  /** Every source there is, in the order of the alphabet. */
  sources(): readonly string[] {
    return this.#distinct(({ source }) => source);
  }

  /** Every state there is. */
  states(): readonly string[] {
    return this.#distinct(({ state }) => state);
  }

  /** The lots of a source as they stand now, the oldest delivery first. */
  history(source: string): readonly HistoryPoint[] {
    const lots = this.#sorted().filter(({ newest }) => newest.summary.source === source).map(({ newest }) => newest);
    const points = lots.map((lot) => {
      const { name, freeFattyAcid, acidValue, water } = lot.summary;
      return {
        date: dayOf(lot), id: lot.lot, ...(name !== undefined && { name }),
        ...(freeFattyAcid !== undefined && { freeFattyAcid }), ...(acidValue !== undefined && { acidValue }), ...(water !== undefined && { water }),
      };
    });
    return points.sort((a, b) => compareText(a.date, b.date) || compareText(a.id ?? '', b.id ?? ''));
  }

  #distinct(of: (summary: CatalogueEntry['summary']) => string | undefined): readonly string[] {
    const found = new Set<string>();
    for (const { newest } of this.#shelves.values()) {
      const one = of(newest.summary);
      if (one !== undefined) found.add(one);
    }
    return [...found].sort((a, b) => a.localeCompare(b));
  }

  #sorted(): readonly Shelf[] {
    return (this.#inOrder ??= [...this.#shelves.values()].sort((a, b) => compareText(b.newest.lot, a.newest.lot)));
  }

  #setNewest(shelf: Shelf, newest: CatalogueEntry): void {
    shelf.newest = newest;
    shelf.words = wordsOf(newest);
  }

  #remove(id: string): boolean {
    const lot = id.split('.')[0] ?? '';
    const shelf = this.#shelves.get(lot);
    this.#unread.delete(id);
    if (!shelf?.versions.delete(id)) return false;
    this.#inOrder = undefined;
    const [newest] = [...shelf.versions.values()].sort((a, b) => byAge(b, a));
    if (newest) this.#setNewest(shelf, newest);
    else this.#shelves.delete(lot);
    return true;
  }
}

/** The line for a document; undefined for one that is no version of a lot. */
export function lineOf({ _id: id, _rev: _, entry: _entry, site: _site, version, ...rest }: StoredDocument): CatalogueLine | undefined {
  if (typeof version !== 'number' || !isObject(rest['summary']) || typeof rest['lot'] !== 'string' || typeof rest['keptAt'] !== 'string') {
    return typeof version === 'number' && version > RECORD_VERSION ? { id, unread: true } : undefined;
  }
  return version > RECORD_VERSION ? { id, unread: true } : ({ id, ...rest } as unknown as CatalogueEntry);
}

/** The day a lot is found by. */
export function dayOf({ summary: { date = '' }, keptAt }: Pick<CatalogueEntry, 'summary' | 'keptAt'>): string {
  return /^\d{4}-\d{2}-\d{2}$/.test(date) ? date : keptAt.slice(0, 10);
}

/** Accents and case aside. */
const folded = (text: string): string => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();

const wordsOf = ({ summary: { name, source }, by, reason }: CatalogueEntry): string => folded([name, source, by, reason].filter(Boolean).join('\n'));

function matcher({ source, from, to, state, ffaFrom, ffaTo, text }: BookQuery): (shelf: Shelf) => boolean {
  const words = folded(text ?? '').split(/\s+/).filter(Boolean);
  // shown figures have a handful of digits: as numbers they keep their order
  const least = ffaFrom === undefined ? undefined : Number(ffaFrom);
  const most = ffaTo === undefined ? undefined : Number(ffaTo);
  return ({ newest, words: there }) => {
    const { summary } = newest;
    if (source !== undefined && summary.source !== source) return false;
    if (state !== undefined && summary.state !== state) return false;
    if (from !== undefined && dayOf(newest) < from) return false;
    if (to !== undefined && dayOf(newest) > to) return false;
    if (least !== undefined || most !== undefined) {
      if (summary.freeFattyAcid === undefined) return false;
      const ffa = Number(summary.freeFattyAcid);
      if ((least !== undefined && ffa < least) || (most !== undefined && ffa > most)) return false;
    }
    return words.every((word) => there.includes(word));
  };
}
