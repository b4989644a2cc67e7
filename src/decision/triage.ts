import { Decimal } from '../formula/decimal.js';
import { isKnown } from '../formula/reading.js';
import type { Outcome } from '../formula/reading.js';
import { atOrBelow } from './compare.js';
import { GUARD_FACTOR } from './guard.js';
import type { Replicates } from './replicates.js';

/** What becomes of a delivery, the best first; `not-known`: its free fatty acid is missing or refused. */
export const STATES = ['accepted', 'for-pretreatment', 'for-blending', 'held-for-retest', 'declined', 'not-known'] as const;
export type DeliveryState = (typeof STATES)[number];

export const TRIAGE_CODES = [
  'within-direct-limit', 'within-pretreatment-limit', 'within-blending-limit', 'above-all-limits', 'no-acid-proof-equipment', 'too-close', 'ffa-not-known',
  'runs-differ', 'one-run', 'certificate-only', 'no-guard-band',
  'water-above', 'water-not-measured', 'insolubles-above', 'insolubles-not-measured', 'too-warm', 'too-cold', 'temperature-not-measured', 'limit-out-of-order',
] as const;
export type TriageCode = (typeof TRIAGE_CODES)[number];

/** Why, as data: figures as decimal text in per cent or °C, states and keys of limits as they are. */
export interface TriageReason {
  readonly code: TriageCode;
  /** What the reason alone would make of the delivery; left out where it is only said. */
  readonly state?: DeliveryState;
  readonly params: Readonly<Record<string, string>>;
}

/** What to measure again before a held delivery is judged. */
export type Retest = 'acidity' | 'water' | 'insolubles' | 'temperature';

export interface Judgement {
  readonly state: DeliveryState;
  /** In a fixed order: acidity, how well it is known, water, insolubles, temperature. */
  readonly reasons: readonly TriageReason[];
  readonly retest: readonly Retest[];
  /** Of a close call, the limit, %. */
  readonly closeTo?: Decimal;
}

/** What is above an asked-for share: the load is held until it is dried or settled and measured again, or declined. */
export type WhenAbove = 'hold' | 'decline';

/** What a delivery is judged by; shares in %, temperatures in °C. A limit that is not set is `Missing`, and asks nothing. */
export interface TriageBasis {
  readonly ffa: Outcome;
  /** Standard uncertainty of the FFA, where it is known. */
  readonly u?: Decimal;
  readonly directLimit: Outcome;
  readonly pretreatmentLimit: Outcome;
  readonly blendingLimit: Outcome;
  readonly acidProofEquipment: boolean;
  readonly replicates: Replicates;
  readonly titrated: boolean;
  /** Whether the site takes a delivery on one run, and on a certificate. */
  readonly takes: { readonly oneRun: boolean; readonly certificate: boolean };
  /** As measured; undefined where it was not. */
  readonly water: Outcome | undefined;
  readonly acceptedWater: Outcome;
  readonly waterAbove: WhenAbove;
  readonly insolubles: Outcome | undefined;
  readonly acceptedInsolubles: Outcome;
  readonly insolublesAbove: WhenAbove;
  readonly temperature: Outcome;
  readonly lowestArrival: Outcome;
  readonly highestArrival: Outcome;
}

/**
 * The state of a delivery by the site's limits. Each limit is judged alone; the worst of what they say is the state. The free fatty
 * acid keeps the guard band of the route (1.645 u): too close to a limit, the delivery is held.
 */
export function judgeDelivery(basis: TriageBasis): Judgement {
  const { ffa } = basis;
  const acidity = isKnown(ffa) ? judgeAcidity(basis, ffa) : { reasons: [{ code: 'ffa-not-known' as const, params: {} }] };
  const reasons: TriageReason[] = [
    ...acidity.reasons, ...howKnown(basis),
    ...shareReasons('water', basis.water, basis.acceptedWater, basis.waterAbove),
    ...shareReasons('insolubles', basis.insolubles, basis.acceptedInsolubles, basis.insolublesAbove),
    ...temperatureReasons(basis),
  ];
  const worst = reasons.reduce((so, { state }) => (state === undefined ? so : Math.max(so, STATES.indexOf(state))), 0);
  // a load declined for what is known already stays declined
  const state = !isKnown(ffa) && STATES[worst] !== 'declined' ? 'not-known' : (STATES[worst] ?? 'not-known');
  const again = reasons.flatMap(({ code, state: alone }) => (alone === 'held-for-retest' ? [RETEST[code] ?? 'acidity'] : []));
  return { state, reasons, retest: state === 'held-for-retest' ? [...new Set(again)] : [], ...('closeTo' in acidity && acidity.closeTo && { closeTo: acidity.closeTo }) };
}

const RETEST: Readonly<Partial<Record<TriageCode, Retest>>> = {
  'water-above': 'water', 'water-not-measured': 'water', 'insolubles-above': 'insolubles', 'insolubles-not-measured': 'insolubles',
  'too-warm': 'temperature', 'too-cold': 'temperature', 'temperature-not-measured': 'temperature',
};

interface Rung {
  readonly key: 'directLimit' | 'pretreatmentLimit' | 'blendingLimit';
  readonly limit: Decimal;
  readonly state: DeliveryState;
  readonly code: TriageCode;
}

/** The limits that the site has, in the order in which an oil climbs them; one that lies below the one before it takes no oil. */
function ladder(basis: TriageBasis): { readonly rungs: readonly Rung[]; readonly outOfOrder: readonly TriageReason[] } {
  const all = [
    { key: 'directLimit', limit: basis.directLimit, state: 'accepted', code: 'within-direct-limit' },
    ...(basis.acidProofEquipment ? [{ key: 'pretreatmentLimit', limit: basis.pretreatmentLimit, state: 'for-pretreatment', code: 'within-pretreatment-limit' } as const] : []),
    { key: 'blendingLimit', limit: basis.blendingLimit, state: 'for-blending', code: 'within-blending-limit' },
  ] as const;
  const rungs: Rung[] = [];
  const outOfOrder: TriageReason[] = [];
  for (const { limit, ...rest } of all) {
    if (!isKnown(limit)) continue;
    const before = rungs.at(-1);
    if (before && limit.lt(before.limit)) outOfOrder.push({ code: 'limit-out-of-order', params: { which: rest.key, limit: limit.toString(), before: before.limit.toString(), beforeWhich: before.key } });
    else rungs.push({ ...rest, limit });
  }
  return { rungs, outOfOrder };
}

function judgeAcidity(basis: TriageBasis, ffa: Decimal): { readonly reasons: readonly TriageReason[]; readonly closeTo?: Decimal } {
  const { rungs, outOfOrder } = ladder(basis);
  const guard = basis.u ? GUARD_FACTOR.times(basis.u) : new Decimal(0);
  const last = rungs.at(-1);
  for (const [i, { limit, state, code, key }] of rungs.entries()) {
    const params = { ffa: ffa.toString(), limit: limit.toString() };
    if (atOrBelow(ffa.plus(guard), limit)) return { reasons: [{ code, state, params }, ...equipment(basis, ffa), ...outOfOrder] };
    if (atOrBelow(ffa.minus(guard), limit)) {
      const above = rungs[i + 1]?.state ?? 'declined';
      return { reasons: [{ code: 'too-close', state: 'held-for-retest', params: { ...params, guard: guard.toString(), which: key, below: state, above } }, ...outOfOrder], closeTo: limit };
    }
  }
  const params = { ffa: ffa.toString(), ...(last && { limit: last.limit.toString() }) };
  return { reasons: [{ code: 'above-all-limits', state: 'declined', params }, ...equipment(basis, ffa), ...outOfOrder] };
}

/** An oil that another plant would pretreat. */
function equipment({ acidProofEquipment, directLimit, pretreatmentLimit }: TriageBasis, ffa: Decimal): readonly TriageReason[] {
  if (acidProofEquipment || !isKnown(directLimit) || !isKnown(pretreatmentLimit)) return [];
  return !atOrBelow(ffa, directLimit) && atOrBelow(ffa, pretreatmentLimit) ? [{ code: 'no-acid-proof-equipment', params: {} }] : [];
}

function howKnown({ ffa, u, replicates, titrated, takes }: TriageBasis): readonly TriageReason[] {
  if (!isKnown(ffa)) return [];
  const held = (code: TriageCode): TriageReason => ({ code, state: 'held-for-retest', params: {} });
  return [
    ...(replicates.state === 'differ' ? [held('runs-differ')] : []),
    ...(titrated && replicates.state === 'one' && !takes.oneRun ? [held('one-run')] : []),
    ...(!titrated && !takes.certificate ? [held('certificate-only')] : []),
    ...(u ? [] : [{ code: 'no-guard-band' as const, params: {} }]),
  ];
}

function shareReasons(what: 'water' | 'insolubles', found: Outcome | undefined, most: Outcome, whenAbove: WhenAbove): readonly TriageReason[] {
  if (!isKnown(most)) return [];
  const limit = most.toString();
  if (!found || !isKnown(found)) return [{ code: `${what}-not-measured`, state: 'held-for-retest', params: { limit } }];
  if (atOrBelow(found, most)) return [];
  return [{ code: `${what}-above`, state: whenAbove === 'decline' ? 'declined' : 'held-for-retest', params: { found: found.toString(), limit } }];
}

function temperatureReasons({ temperature, lowestArrival, highestArrival }: TriageBasis): readonly TriageReason[] {
  if (!isKnown(lowestArrival) && !isKnown(highestArrival)) return [];
  if (!isKnown(temperature)) return [{ code: 'temperature-not-measured', state: 'held-for-retest', params: {} }];
  const held = (code: TriageCode, limit: Decimal): TriageReason => ({ code, state: 'held-for-retest', params: { found: temperature.toString(), limit: limit.toString() } });
  if (isKnown(highestArrival) && temperature.gt(highestArrival)) return [held('too-warm', highestArrival)];
  if (isKnown(lowestArrival) && temperature.lt(lowestArrival)) return [held('too-cold', lowestArrival)];
  return [];
}
