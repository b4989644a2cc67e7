import { createContext } from '@lit/context';
import type { UnitSystem } from '../../exchange/amount.js';
import { EMPTY_LOT, EMPTY_SITE } from '../../lot/entry.js';
import type { LotEntry, SiteProfile } from '../../lot/entry.js';
import type { LotFaults, LotReading } from '../../lot/lot-reading.js';
import { readLot } from '../../lot/read-lot.js';

/** What lies on the bench: the lot and the site as given, and what was read from them. Never changed in place. */
export interface Desk {
  readonly entry: LotEntry;
  readonly site: SiteProfile;
  readonly reading: LotReading | LotFaults;
  readonly units: UnitSystem;
  /** Whether a step can be taken back. */
  readonly canUndo: boolean;
}

/** By which the elements of one lot share it. A second copy of the code on the page has a context of its own. */
export const deskContext = createContext<Desk>(Symbol('esterway-desk'));

export function deskOf(entry: LotEntry, site: SiteProfile, units: UnitSystem, canUndo = false): Desk {
  const reading = readLot(entry, site, { today: today() });
  const rest = { reading, units, canUndo };
  if ('faults' in reading) return { entry, site, ...rest };
  return { entry: whole(EMPTY_LOT, entry), site: whole(EMPTY_SITE, site), ...rest };
}

/** The day by the clock of the machine, ISO 8601. */
function today(): string {
  const now = new Date();
  const two = (part: number): string => String(part).padStart(2, '0');
  return `${now.getFullYear()}-${two(now.getMonth() + 1)}-${two(now.getDate())}`;
}

/** Parts left out of a document count as empty. */
const whole = <Document extends object>(empty: Document, given: Document): Document =>
  Object.keys(empty).every((part) => part in given) ? given : { ...empty, ...given };

export const EMPTY_DESK: Desk = deskOf(EMPTY_LOT, EMPTY_SITE, 'metric');
