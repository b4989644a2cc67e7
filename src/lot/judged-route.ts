import { MOST_RUNS, furtherRuns } from '../decision/further-runs.js';
import { decideRoute } from '../decision/route.js';
import type { Reason, Route } from '../decision/route.js';
import type { Replicates } from '../decision/replicates.js';
import { Decimal } from '../formula/decimal.js';
import { isKnown } from '../formula/reading.js';
import type { LotEntry } from './entry.js';
import type { LotRun } from './lot-run.js';
import { uncertaintyOf } from './uncertainty.js';
import type { Uncertainty } from './uncertainty.js';

/** Sources that fall as runs are added. */
const PER_RUN = ['u.repeatability', 'u.endPoint'];

/** Keys of the quantities that a route is judged by, and of the uncertainty of the FFA. */
export const ROUTE_KEYS = [
  'freeFattyAcid', 'directLimit', 'pretreatmentLimit', 'waterContent', 'waterLimitBase', 'waterLimitAcid',
  'u.repeatability', 'u.endPoint', 'u.blankEndPoint', 'u.burette', 'u.balance', 'u.sampleVolume', 'u.sampleDensity', 'u.temperature', 'u.titrant', 'u.certificate',
  'u.khpEndPoint', 'u.khpBlankEndPoint', 'u.khpBurette', 'u.khpBalance', 'u.khpPurity', 'u.khpMolarMass', 'u.khpTemperature', 'u.khpRepeatability',
];

/** The route of a lot with its guard band, and in a close call what would settle it. */
export function judgedRoute(run: LotRun, entry: LotEntry, replicates: Replicates): Route {
  const { findings, givens } = run;
  const ffa = findings.outcome('freeFattyAcid');
  const uncertainty = isKnown(ffa) ? uncertaintyOf(run, 'freeFattyAcid') : undefined;
  const known = uncertainty && 'budget' in uncertainty ? uncertainty : undefined;
  const route = decideRoute({
    ffa,
    ...(known && { u: known.u }),
    directLimit: findings.outcome('directLimit'),
    pretreatmentLimit: findings.outcome('pretreatmentLimit'),
    water: 'waterContent' in entry.figures ? findings.outcome('waterContent') : undefined,
    waterLimitBase: findings.outcome('waterLimitBase'),
    waterLimitAcid: findings.outcome('waterLimitAcid'),
    acidProofEquipment: givens.chosen('acidProofEquipment') === 'yes',
  });
  const reasons: Reason[] = replicates.state === 'differ' ? [{ code: 'runs-differ', params: {} }] : [];
  if (!known && route.verdict !== 'not-known') reasons.push({ code: 'no-guard-band', params: {} });
  const settle = known && isKnown(ffa) && route.odds ? whatSettles(known, new Decimal(route.odds.limit).minus(ffa).abs(), replicates) : [];
  return reasons.length || settle.length ? { ...route, reasons: [...reasons, ...route.reasons, ...settle] } : route;
}

/** What would put a result that is this far from a limit clear of it: further runs, or the source that no run takes away. */
export function whatSettles({ u, budget }: Uncertainty, distance: Decimal, { runs }: Replicates): readonly Reason[] {
  const shareOf = (perRun: boolean): Decimal =>
    budget.filter(({ key }) => PER_RUN.includes(key) === perRun).reduce((sum, { share }) => sum.plus(share), new Decimal(0));
  const variance = u.pow(2);
  const further = furtherRuns({ distance, perRun: variance.times(shareOf(true)), lasting: variance.times(shareOf(false)), runs });
  if (further === 'many') return [{ code: 'many-runs-settle', params: { runs: String(MOST_RUNS) } }];
  if (further !== 'lasting') return [{ code: 'more-runs-settle', params: { runs: String(further) } }];
  const source = budget.find(({ key }) => !PER_RUN.includes(key));
  return source ? [{ code: 'no-runs-settle', params: { source: source.key } }] : [];
}
