import { checkLotEntry, checkSiteProfile } from '../lot/check.js';
import type { LotEntry, SiteProfile } from '../lot/entry.js';
import { KNOWN_KEYS } from '../lot/keys.js';
import { LOT_ID, VERSION_ID } from './ids.js';
import type { LotSummary } from './summary.js';

/** The version of the records that this code writes. */
export const RECORD_VERSION = 1;

/**
 * One version of a lot as it was kept: a document of its own that is never changed. An amendment is another document,
 * so books that were copied to each other hold the versions of both and nothing to be settled.
 */
export interface LotRecord {
  readonly version: typeof RECORD_VERSION;
  /** Of this version; unique, and sorts behind the earlier ones of its lot. */
  readonly id: string;
  /** Of the lot, the same in all its versions; sorts by the time of first keeping. */
  readonly lot: string;
  /** 1 for the lot as first kept. Two benches that amend at once both write the next number; both stand. */
  readonly number: number;
  /** ISO 8601, UTC. */
  readonly keptAt: string;
  /** Who kept it, as typed. */
  readonly by?: string;
  /** Why it was amended; always there from the second version on. */
  readonly reason?: string;
  readonly entry: LotEntry;
  /** The site profile in force: all figures and options that differ from the usual ones. */
  readonly site: SiteProfile;
  /** What was found then, by the code of then: for the list and the search. */
  readonly summary: LotSummary;
}

/** Why a document is no record that this code can read. */
export type RecordFault = 'newer-version' | 'unknown-version' | 'damaged';

/** A step from one version of the record to the next. */
export type Migration = (older: Readonly<Record<string, unknown>>) => Readonly<Record<string, unknown>>;

/** Steps by the version they start from. Version 1 is the first there is. */
export const MIGRATIONS: Readonly<Record<number, Migration>> = {};

/**
 * Reads a record from outside: a file, or a document that another bench wrote. An older one is brought to this version
 * in the copy given back; what is stored stays as it was written.
 */
export function readRecord(value: unknown, migrations = MIGRATIONS, version: number = RECORD_VERSION): LotRecord | RecordFault {
  if (!isObject(value)) return 'damaged';
  if (typeof value['version'] !== 'number') return 'unknown-version';
  if (value['version'] > version) return 'newer-version';
  let record: Readonly<Record<string, unknown>> = value;
  for (let from = value['version']; from < version; from++) {
    const step = migrations[from];
    if (!step) return 'unknown-version';
    record = step(record);
  }
  return isWhole(record) ? (record as unknown as LotRecord) : 'damaged';
}

function isWhole({ version: _, id, lot, number, keptAt, by = '', reason = '', entry, site, summary, ...rest }: Readonly<Record<string, unknown>>): boolean {
  if (Object.keys(rest).length) return false;
  if (typeof id !== 'string' || typeof lot !== 'string' || !VERSION_ID.test(id) || !LOT_ID.test(lot) || !id.startsWith(`${lot}.`)) return false;
  if (typeof number !== 'number' || !Number.isSafeInteger(number) || number < 1 || Number(id.split('.')[1]) !== number) return false;
  if (typeof keptAt !== 'string' || Number.isNaN(Date.parse(keptAt)) || typeof by !== 'string' || typeof reason !== 'string') return false;
  if (!isObject(summary) || typeof summary['route'] !== 'string' || typeof summary['state'] !== 'string') return false;
  if (Object.values(summary).some((part) => typeof part !== 'string')) return false;
  return !Array.isArray(checkLotEntry(entry, KNOWN_KEYS)) && !Array.isArray(checkSiteProfile(site, KNOWN_KEYS));
}

export const isObject = (value: unknown): value is Readonly<Record<string, unknown>> => typeof value === 'object' && value !== null && !Array.isArray(value);

/** By which versions of a lot follow each other: number, then time, then what is left to chance. */
export function byAge(a: Pick<LotRecord, 'number' | 'keptAt' | 'id'>, b: Pick<LotRecord, 'number' | 'keptAt' | 'id'>): number {
  return a.number - b.number || compareText(a.keptAt, b.keptAt) || compareText(a.id, b.id);
}

/** By code units, as the database sorts its keys. */
export const compareText = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);
