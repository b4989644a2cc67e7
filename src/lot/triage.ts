import { judgeDelivery } from '../decision/triage.js';
import type { Judgement, Retest, TriageReason, WhenAbove } from '../decision/triage.js';
import type { Decimal } from '../formula/decimal.js';
import { shownText } from '../formula/digits.js';
import { Missing, isKnown } from '../formula/reading.js';
import type { Outcome, Problem } from '../formula/reading.js';
import { checkLotEntry, checkSiteProfile } from './check.js';
import type { Fault } from './check.js';
import { FORMAT_VERSION } from './entry.js';
import type { LotEntry } from './entry.js';
import { ROUTE_KEYS, whatSettles } from './judged-route.js';
import { KNOWN_KEYS, fieldOf } from './keys.js';
import { lotRun } from './lot-run.js';
import type { LotRun } from './lot-run.js';
import { lotReplicates } from './lot-replicates.js';
import { uncertaintyOf } from './uncertainty.js';

/** What to do before a held delivery is judged again; codes, whose sentences the locale makes. */
export interface RetestAdvice {
  readonly what: Retest;
  readonly how: 'titrate' | 'second-run' | 'one-more' | 'two-more' | 'look-for-cause' | 'more-runs-settle' | 'many-runs-settle' | 'no-runs-settle' | 'measure' | 'treat-and-measure';
  readonly params: Readonly<Record<string, string>>;
}

/** What a delivery is paid, decimal text; deductions in ¤/t. */
export interface Settlement {
  readonly price: string;
  readonly amount?: string;
  readonly deductions: Readonly<Record<'ffa' | 'water' | 'insolubles', string>>;
  /** Fields that were not measured: what usually stands there was counted. */
  readonly assumed: readonly string[];
}

export interface Triage {
  readonly version: typeof FORMAT_VERSION;
  readonly state: Judgement['state'];
  readonly reasons: readonly TriageReason[];
  readonly retest: readonly RetestAdvice[];
  /** Left out while it is not known; then `unsettled` has the fields still to give. */
  readonly settlement?: Settlement;
  readonly unsettled: readonly string[];
  /** Limits, rates or figures that cannot be used. */
  readonly problems: readonly Problem[];
}

const LIMITS = ['blendingLimit', 'acceptedWater', 'acceptedInsolubles', 'arrivalTemperature', 'lowestArrival', 'highestArrival'];
const SETTLED = ['settlement.price', 'settlement.amount', 'settlement.ffaDeduction', 'settlement.waterDeduction', 'settlement.insolublesDeduction', 'settlement.ffaRate', 'settlement.waterRate', 'settlement.insolublesRate'];
/** Keys of the quantities that a triage looks at. */
export const TRIAGE_KEYS: readonly string[] = [...ROUTE_KEYS, 'insolubles', ...LIMITS];

/**
 * Judges a delivery by the site's limits, and what it is paid by the site's rates. Pure: JSON in, JSON out, and never an exception
 * for bad input.
 *
 * @param entry a `LotEntry`
 * @param site a `SiteProfile`
 */
export function triage(entry: unknown, site: unknown = { version: FORMAT_VERSION }): Triage | { readonly version: typeof FORMAT_VERSION; readonly faults: readonly Fault[] } {
  const lot = checkLotEntry(entry, KNOWN_KEYS);
  const profile = checkSiteProfile(site, KNOWN_KEYS);
  const faults = [lot, profile].flatMap((checked) => (isFaults(checked) ? checked : []));
  if (isFaults(lot) || isFaults(profile)) return { version: FORMAT_VERSION, faults };
  const run = lotRun(lot, profile, [...TRIAGE_KEYS, ...SETTLED]);
  const judged = triageOf(run, lot);
  const { settlement, unsettled } = settled(run, lot);
  const problems = new Map<string, Problem>();
  for (const key of [...LIMITS, ...SETTLED, 'freeFattyAcid', 'waterContent', 'insolubles']) {
    const outcome = run.findings.outcome(key);
    if (!isKnown(outcome) && 'problem' in outcome) problems.set(`${outcome.problem.code} ${outcome.problem.quantity}`, { ...outcome.problem, quantity: fieldOf(outcome.problem.quantity) });
  }
  return {
    version: FORMAT_VERSION, state: judged.state, reasons: judged.reasons, retest: judged.retest.map((what) => advice(what, judged, run, lot)),
    ...(settlement && { settlement }), unsettled, problems: [...problems.values()],
  };
}

const isFaults = (checked: object): checked is readonly Fault[] => Array.isArray(checked);

/** The state of a lot that is being read anyway, with its reasons: for long lists. Its plan must hold {@link TRIAGE_KEYS}. */
export function triageOf(run: LotRun, entry: LotEntry): Judgement {
  const { findings, givens } = run;
  const at = (key: string): Outcome => findings.outcome(key);
  const ffa = at('freeFattyAcid');
  const uncertainty = isKnown(ffa) ? uncertaintyOf(run, 'freeFattyAcid') : undefined;
  const measured = (key: string): Outcome | undefined => (key in entry.figures ? at(key) : undefined);
  return judgeDelivery({
    ffa, ...(uncertainty && 'budget' in uncertainty && { u: uncertainty.u }),
    directLimit: at('directLimit'), pretreatmentLimit: at('pretreatmentLimit'), blendingLimit: at('blendingLimit'),
    acidProofEquipment: givens.chosen('acidProofEquipment') === 'yes',
    replicates: lotReplicates(run, '', entry.runs), titrated: givens.chosen('acidKnownFrom') === 'titration',
    takes: { oneRun: givens.chosen('takesOneRun') !== 'no', certificate: givens.chosen('takesCertificate') !== 'no' },
    water: measured('waterContent'), acceptedWater: at('acceptedWater'), waterAbove: givens.chosen('waterAbove') as WhenAbove,
    insolubles: measured('insolubles'), acceptedInsolubles: at('acceptedInsolubles'), insolublesAbove: givens.chosen('insolublesAbove') as WhenAbove,
    temperature: at('arrivalTemperature'), lowestArrival: at('lowestArrival'), highestArrival: at('highestArrival'),
  });
}

function advice(what: Retest, { reasons, closeTo }: Judgement, run: LotRun, entry: LotEntry): RetestAdvice {
  const has = (code: TriageReason['code']): boolean => reasons.some((reason) => reason.code === code);
  if (what !== 'acidity') {
    const above = reasons.some(({ code }) => code === `${what}-above` || (what === 'temperature' && (code === 'too-warm' || code === 'too-cold')));
    return { what, how: above ? 'treat-and-measure' : 'measure', params: {} };
  }
  const replicates = lotReplicates(run, '', entry.runs);
  if (has('runs-differ') && replicates.next !== 'nothing') return { what, how: replicates.next, params: {} };
  if (has('certificate-only')) return { what, how: 'titrate', params: {} };
  if (has('one-run')) return { what, how: 'second-run', params: {} };
  const ffa = run.findings.outcome('freeFattyAcid');
  const known = uncertaintyOf(run, 'freeFattyAcid');
  if (closeTo && isKnown(ffa) && 'budget' in known) {
    const [settles] = whatSettles(known, closeTo.minus(ffa).abs(), replicates);
    if (settles && (settles.code === 'more-runs-settle' || settles.code === 'many-runs-settle' || settles.code === 'no-runs-settle')) return { what, how: settles.code, params: settles.params };
  }
  return { what, how: 'titrate', params: {} };
}

/** What usually stands for water and insolubles is no ground for a deduction, unless it is said. */
function settled({ findings }: LotRun, entry: LotEntry): { readonly settlement?: Settlement; readonly unsettled: readonly string[] } {
  const price = findings.outcome('settlement.price');
  if (!isKnown(price)) return { unsettled: price instanceof Missing ? [...new Set(price.missing.map(fieldOf))] : [] };
  const amount = findings.outcome('settlement.amount');
  const text = (key: string, decimals = 2): string => shownText(findings.outcome(key) as Decimal, { decimals });
  const rated = (key: string): boolean => isKnown(findings.outcome(`settlement.${key}Rate`));
  const assumed = [...(rated('water') && !('waterContent' in entry.figures) ? ['waterContent'] : []), ...(rated('insolubles') && !('insolubles' in entry.figures) ? ['insolubles'] : [])];
  return {
    settlement: {
      price: text('settlement.price'), ...(isKnown(amount) && { amount: text('settlement.amount') }),
      deductions: { ffa: text('settlement.ffaDeduction'), water: text('settlement.waterDeduction'), insolubles: text('settlement.insolublesDeduction') }, assumed,
    },
    unsettled: amount instanceof Missing ? [...new Set(amount.missing.map(fieldOf))] : [],
  };
}
