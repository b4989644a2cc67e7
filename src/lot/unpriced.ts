import { LOST_RATE, outlayRates } from '../chemistry/cost.js';
import type { RouteName } from '../chemistry/route-name.js';
import { Missing } from '../formula/reading.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { fieldOf } from './keys.js';
import { lotRun } from './lot-run.js';

/** Fields of the prices, hours and energies that were not given, so that a route's total leaves out what needs them. */
export function unpriced(entry: LotEntry, site: SiteProfile, route: RouteName): readonly string[] {
  const { findings } = lotRun(entry, site);
  const fields = [...outlayRates(route), LOST_RATE].flatMap((rate) => {
    const outcome = findings.outcome(rate);
    return outcome instanceof Missing ? outcome.missing.map(fieldOf) : [];
  });
  return [...new Set(fields)];
}
