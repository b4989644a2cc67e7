import type { Verdict } from '../decision/route.js';
import type { LotEntry, SiteProfile } from '../lot/entry.js';
import { readLot } from '../lot/read-lot.js';

/** What the list of a book shows of a lot, and what it is found by. Figures as they were shown, decimal text. */
export interface LotSummary {
  readonly name?: string;
  readonly source?: string;
  /** As written in the lot; ISO 8601 where the panel writes it. */
  readonly date?: string;
  /** mg/g */
  readonly acidValue?: string;
  /** % */
  readonly freeFattyAcid?: string;
  /** %, as measured; not there where only a usual value stood in. */
  readonly water?: string;
  readonly route: Verdict;
  /** What became of the delivery, by the judge of the book; the route where it has none. */
  readonly state: string;
}

/** Says what becomes of a delivery, as a word; nothing where it does not know. */
export type StateOf = (entry: LotEntry, site: SiteProfile) => string | undefined;

/** What is worth finding a lot by; undefined where the lot cannot be read at all. */
export function summaryOf(entry: LotEntry, site: SiteProfile, stateOf?: StateOf): LotSummary | undefined {
  const reading = readLot(entry, site, { only: ['acidValue', 'freeFattyAcid', 'waterContent'] });
  if ('faults' in reading) return undefined;
  const { acidValue, freeFattyAcid, waterContent } = reading.readings;
  const route = reading.route.verdict;
  const water = waterContent?.from === 'default' ? undefined : waterContent?.value;
  const { name, source, date } = entry;
  return {
    ...(name && { name }), ...(source && { source }), ...(date && { date }),
    ...(acidValue?.shown !== undefined && { acidValue: acidValue.shown }),
    ...(freeFattyAcid?.shown !== undefined && { freeFattyAcid: freeFattyAcid.shown }),
    ...(water !== undefined && { water }),
    route, state: stateOf?.(entry, site) ?? route,
  };
}
