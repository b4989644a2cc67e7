import type { StateOf } from '../../book/summary.js';
import { triage } from '../../lot/triage.js';

/** What becomes of a delivery by the limits of the site. */
export const judgedState: StateOf = (entry, site) => {
  const judged = triage(entry, site);
  return 'state' in judged ? judged.state : undefined;
};
