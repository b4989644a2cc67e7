import type { RouteName } from '../chemistry/route-name.js';
import { Decimal, decimal } from '../formula/decimal.js';
import { isKnown } from '../formula/reading.js';
import type { Outcome } from '../formula/reading.js';
import { atOrBelow } from './compare.js';
import { GUARD_FACTOR, probabilityBelow } from './guard.js';

/**
 * `direct`: base step with extra catalyst; `two-step`: acid step first; `too-close`: within the
 * guard band of a limit; `outside`: above both routes' limits; `no-acid-step`: needs the acid step,
 * which the site cannot run; `not-known`: something it rests on is missing or refused.
 */
export type Verdict = 'direct' | 'two-step' | 'too-close' | 'outside' | 'no-acid-step' | 'not-known';

/** Why, as data: the locale makes the sentence from the code and the figures. */
export interface Reason {
  readonly code: ReasonCode;
  /** Decimal text, by the name the sentence uses. */
  readonly params: Readonly<Record<string, string>>;
}

export const REASON_CODES = [
  'at-or-below-direct-limit', 'above-direct-limit', 'above-pretreatment-limit', 'within-guard-band', 'extra-negligible',
  'no-acid-proof-equipment', 'dry-before-base-step', 'dry-before-acid-step', 'water-not-measured',
  'pretreatment-misses-target', 'ffa-not-known', 'no-guard-band', 'runs-differ', 'more-runs-settle', 'many-runs-settle', 'no-runs-settle',
] as const;
export type ReasonCode = (typeof REASON_CODES)[number];

export interface Route {
  readonly verdict: Verdict;
  /** In a close call, the route that is safe on either side of the limit. */
  readonly safe?: Verdict;
  /** In a close call: the limit, % FFA, and the probability that the true FFA is at or below it, 0 to 1. */
  readonly odds?: { readonly limit: string; readonly below: string };
  readonly reasons: readonly Reason[];
}

/** The route to charge by: the one of the verdict, in a close call the safe one; the acid step wherever the direct route does not do. */
export function chargedRoute({ verdict, safe }: Pick<Route, 'verdict' | 'safe'>): RouteName {
  const taken = verdict === 'too-close' ? safe : verdict;
  return taken === 'direct' || taken === 'not-known' ? 'direct' : 'twoStep';
}

/** What the route is decided on; shares in per cent. */
export interface RouteBasis {
  readonly ffa: Outcome;
  /** Standard uncertainty of the FFA, where it is known. */
  readonly u?: Decimal;
  readonly directLimit: Outcome;
  readonly pretreatmentLimit: Outcome;
  /** Water as measured; an assumed figure is no ground for a gate. */
  readonly water: Outcome | undefined;
  readonly waterLimitBase: Outcome;
  readonly waterLimitAcid: Outcome;
  readonly acidProofEquipment: boolean;
}

/** At or below this FFA the extra catalyst is lost in the scatter of the base load (published limits of 0.5 %). */
const NEGLIGIBLE = decimal('0.5');

/** The route by the site's limits, the guard band and the water gate. */
export function decideRoute(basis: RouteBasis): Route {
  const { ffa, directLimit, pretreatmentLimit } = basis;
  if (!isKnown(ffa) || !isKnown(directLimit) || !isKnown(pretreatmentLimit)) {
    return { verdict: 'not-known', reasons: [{ code: 'ffa-not-known', params: {} }] };
  }
  const guard = basis.u ? GUARD_FACTOR.times(basis.u) : new Decimal(0);
  const beyond = (limit: Decimal): 'below' | 'above' | 'close' =>
    atOrBelow(ffa.plus(guard), limit) ? 'below' : atOrBelow(ffa.minus(guard), limit) ? 'close' : 'above';
  const reasons: Reason[] = [];
  const say = (code: ReasonCode, params: Record<string, Decimal> = {}): void => {
    reasons.push({ code, params: Object.fromEntries(Object.entries(params).map(([name, value]) => [name, value.toString()])) });
  };
  const acidStep: Verdict = basis.acidProofEquipment ? 'two-step' : 'no-acid-step';
  const result = (verdict: Verdict): Route => {
    waterGate(basis, verdict, say);
    return { verdict, reasons };
  };
  const tooClose = (limit: Decimal, safe: Verdict): Route => {
    say('within-guard-band', { ffa, limit, guard });
    waterGate(basis, safe, say);
    const below = probabilityBelow(ffa, basis.u ?? new Decimal(0), limit);
    return { verdict: 'too-close', safe, odds: { limit: limit.toString(), below: below.toFixed(4) }, reasons };
  };

  switch (beyond(directLimit)) {
    case 'below':
      say('at-or-below-direct-limit', { ffa, limit: directLimit });
      if (atOrBelow(ffa, NEGLIGIBLE)) say('extra-negligible', { limit: NEGLIGIBLE });
      return result('direct');
    case 'close':
      return tooClose(directLimit, acidStep);
    case 'above':
      break;
  }
  switch (beyond(pretreatmentLimit)) {
    case 'above':
      say('above-pretreatment-limit', { ffa, limit: pretreatmentLimit });
      return result('outside');
    case 'close':
      return tooClose(pretreatmentLimit, 'outside');
    case 'below':
      say('above-direct-limit', { ffa, limit: directLimit });
      if (!basis.acidProofEquipment) say('no-acid-proof-equipment');
      return result(acidStep);
  }
}

function waterGate(basis: RouteBasis, route: Verdict, say: (code: ReasonCode, params?: Record<string, Decimal>) => void): void {
  const { water } = basis;
  if (water === undefined) return say('water-not-measured');
  if (!isKnown(water)) return;
  const gate = route === 'direct' ? basis.waterLimitBase : route === 'two-step' ? basis.waterLimitAcid : undefined;
  if (gate === undefined || !isKnown(gate) || atOrBelow(water, gate)) return;
  say(route === 'direct' ? 'dry-before-base-step' : 'dry-before-acid-step', { water, limit: gate });
}
