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

export const deskOf = (entry: LotEntry, site: SiteProfile, units: UnitSystem, canUndo = false): Desk => ({
  entry, site, units, canUndo, reading: readLot(entry, site),
});

export const EMPTY_DESK: Desk = deskOf(EMPTY_LOT, EMPTY_SITE, 'metric');
