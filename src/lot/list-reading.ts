import type { DeliveryState } from '../decision/triage.js';
import { chargedRoute } from '../decision/route.js';
import type { RouteName } from '../chemistry/route-name.js';
import { shownText } from '../formula/digits.js';
import { Refused, isKnown } from '../formula/reading.js';
import type { Problem } from '../formula/reading.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { judgedRoute } from './judged-route.js';
import { fieldOf } from './keys.js';
import { lotReplicates } from './lot-replicates.js';
import { LotList } from './lot-run.js';
import type { LotRun } from './lot-run.js';
import { TRIAGE_KEYS, triageOf } from './triage.js';
import { shownUncertainty, uncertaintyOf } from './uncertainty.js';

/** What a list shows of a lot: figures as they are reported, decimal text. */
export interface ListReading {
  /** mg/g */
  readonly acidValue?: string;
  /** %, and its expanded uncertainty. */
  readonly freeFattyAcid?: string;
  readonly plusMinus?: string;
  readonly state: DeliveryState;
  /** The route to charge by; left out where the acidity is not known. */
  readonly route?: RouteName;
  /** Of the base step of that route, kg. */
  readonly catalyst?: string;
  readonly methanol?: string;
  /** Why something is not known: a figure that is refused, else the fields still needed. */
  readonly problem?: Problem;
  readonly missing?: readonly string[];
}

/**
 * Reads lots for a list: the same figures as `readLot` and `triage`, and nothing else. The entry is one that `checkLotEntry` has
 * passed, or was made by this code; the site profile likewise.
 */
export const listReader = (site: SiteProfile): ((entry: LotEntry) => ListReading) => {
  const list = new LotList(site, WANTED);
  return (entry) => readForList(list.run(entry), entry);
};

function readForList(run: LotRun, entry: LotEntry): ListReading {
  const { findings, sheet } = run;
  const replicates = lotReplicates(run, '', entry.runs);
  const { state } = triageOf(run, entry, replicates);
  const ffa = findings.outcome('freeFattyAcid');
  if (!isKnown(ffa)) return { state, ...why(ffa) };
  const route = chargedRoute(judgedRoute(run, entry, replicates));
  const shown = (key: string): string | undefined => {
    const outcome = findings.outcome(key);
    return isKnown(outcome) ? shownText(outcome, sheet.quantity(key).digits) : undefined;
  };
  const uncertainty = uncertaintyOf(run, 'freeFattyAcid');
  const [acidValue, freeFattyAcid, catalyst, methanol] = ['acidValue', 'freeFattyAcid', `${route}.catalyst`, `${route}.methanol`].map(shown);
  const charge = findings.outcome(`${route}.catalyst`);
  return {
    state, route,
    ...(acidValue !== undefined && { acidValue }), ...(freeFattyAcid !== undefined && { freeFattyAcid }),
    ...('budget' in uncertainty && { plusMinus: shownUncertainty(uncertainty, ffa, sheet.quantity('freeFattyAcid').digits) }),
    ...(catalyst !== undefined && { catalyst }), ...(methanol !== undefined && { methanol }),
    ...(isKnown(charge) ? {} : why(charge)),
  };
}

const WANTED = [...new Set(['acidValue', 'direct.catalyst', 'direct.methanol', 'twoStep.catalyst', 'twoStep.methanol', ...TRIAGE_KEYS])];

function why(unknown: Refused | { readonly missing: readonly string[] }): Pick<ListReading, 'problem' | 'missing'> {
  if (unknown instanceof Refused) return { problem: { ...unknown.problem, quantity: fieldOf(unknown.problem.quantity) } };
  return { missing: [...new Set(unknown.missing.map(fieldOf))] };
}
