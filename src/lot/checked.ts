import { checkLotEntry, checkSiteProfile } from './check.js';
import type { Fault } from './check.js';
import { FORMAT_VERSION } from './entry.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { KNOWN_KEYS } from './keys.js';
import type { LotFaults } from './lot-reading.js';

/** A lot and its site that can be read, or what is wrong with the documents. */
export function checkedLot(entry: unknown, site: unknown): { readonly lot: LotEntry; readonly profile: SiteProfile } | LotFaults {
  const lot = checkLotEntry(entry, KNOWN_KEYS);
  const profile = checkSiteProfile(site, KNOWN_KEYS);
  if (!isFaults(lot) && !isFaults(profile)) return { lot, profile };
  const faults = [
    ...(isFaults(lot) ? lot.map((fault) => ({ ...fault, in: 'entry' as const })) : []),
    ...(isFaults(profile) ? profile.map((fault) => ({ ...fault, in: 'site' as const })) : []),
  ];
  return { version: FORMAT_VERSION, faults };
}

const isFaults = (checked: object): checked is readonly Fault[] => Array.isArray(checked);
