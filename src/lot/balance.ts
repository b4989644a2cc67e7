import { balanceFormulas } from '../chemistry/balance.js';
import { balanceSteps } from '../chemistry/balance-steps.js';
import type { Component, Flow, StepFlows, StepName, Stream } from '../chemistry/balance-steps.js';
import { addFormulas } from '../chemistry/lot-formulas.js';
import type { RouteName } from '../chemistry/route-name.js';
import { chargedRoute } from '../decision/route.js';
import { Missing, isKnown, joinUnknown } from '../formula/reading.js';
import type { Outcome, Problem, Unknown } from '../formula/reading.js';
import { checkedLot } from './checked.js';
import { FORMAT_VERSION } from './entry.js';
import { judgedRoute } from './judged-route.js';
import { fieldOf } from './keys.js';
import type { LotFaults } from './lot-reading.js';
import { lotReplicates } from './lot-replicates.js';
import { lotRun } from './lot-run.js';
import type { LotRun } from './lot-run.js';

/** An amount as decimal text, kg or L, and the key of the quantity it is, by which it can be opened to its working. */
export interface Weighed {
  readonly mass: string;
  readonly key: string;
}

/** A substance that goes into a step or comes out of it, and the stream it is in. */
export interface BalanceFlow extends Weighed {
  readonly stream: Stream;
  readonly component: Component;
}

/** A layer that a step leaves: kg and L, with their keys. */
export interface BalanceLayer extends Weighed {
  readonly stream: Stream;
  readonly volume: string;
  readonly volumeKey: string;
}

export interface BalanceStep {
  readonly step: StepName;
  readonly in: readonly BalanceFlow[];
  readonly out: readonly BalanceFlow[];
  /** Products charged in this step, whole. */
  readonly charged: readonly (Weighed & { readonly stream: Stream })[];
  readonly layers: readonly BalanceLayer[];
  readonly totals: { readonly in: Weighed; readonly out: Weighed };
  /** Nothing, but for the retest, where it is what the titration changed. */
  readonly difference: Weighed;
}

/** The mass balance of a route. */
export interface Balance {
  readonly version: typeof FORMAT_VERSION;
  readonly route: RouteName;
  readonly steps: readonly BalanceStep[];
}

/** There is no balance: the fields still needed, or what was refused. */
export interface NoBalance {
  readonly version: typeof FORMAT_VERSION;
  readonly missing?: readonly string[];
  readonly problem?: Problem;
}

/**
 * The mass balance of a lot: what goes into each step of a route and what comes out of it, substance by substance, and the
 * layers by mass and volume. Every step closes to the last digit computed with. A `retest` between the acid step and the base
 * step is no step of the plant: it puts what was titrated in the place of what was predicted, and shows the difference.
 * Pure: JSON in, JSON out, and never an exception for bad input.
 *
 * @param entry a {@link LotEntry}
 * @param site a `SiteProfile`; the defaults stand where it says nothing
 * @param route the one that the lot is charged by when left out
 */
export function balance(entry: unknown, site: unknown = { version: FORMAT_VERSION }, route?: RouteName): Balance | NoBalance | LotFaults {
  addFormulas(balanceFormulas);
  const checked = checkedLot(entry, site);
  if ('faults' in checked) return checked;
  const { lot, profile } = checked;
  const run = lotRun(lot, profile);
  return balanceOf(run, route ?? chargedRoute(judgedRoute(run, lot, lotReplicates(run, '', lot.runs))));
}

/** The balance of a lot under evaluation. Its sheet must hold the formulas of the balance. */
export function balanceOf({ findings }: LotRun, route: RouteName): Balance | NoBalance {
  const passes = route === 'direct' ? '1' : findings.option('passes');
  const from = route === 'direct' ? 'estimate' : findings.option('baseStepAcidFrom');
  if (typeof passes !== 'string') return unknown(passes);
  if (typeof from !== 'string') return unknown(from);
  const steps = balanceSteps(route, Number(passes), from === 'retest');
  const [first, ...others] = steps.flatMap(keysOf).map((key) => findings.outcome(key)).filter((outcome): outcome is Unknown => !isKnown(outcome));
  if (first) return unknown(others.reduce(joinUnknown, first));
  const text = (key: string): string => known(findings.outcome(key), key);
  return { version: FORMAT_VERSION, route, steps: steps.map((step) => stepJson(step, text)) };
}

/** Every key that a step names. */
export const keysOf = ({ in: into, out, charged, layers, totals }: StepFlows): readonly string[] => [
  ...[...into, ...out, ...charged].map(({ key }) => key), ...layers.flatMap(({ mass, volume }) => [mass, volume]), ...Object.values(totals),
];

function stepJson({ step, in: into, out, charged, layers, totals }: StepFlows, text: (key: string) => string): BalanceStep {
  const weighed = (key: string): Weighed => ({ mass: text(key), key });
  const flow = ({ stream, component, key }: Flow): BalanceFlow => ({ stream, component, ...weighed(key) });
  return {
    step, in: into.map(flow), out: out.map(flow),
    charged: charged.map(({ stream, key }) => ({ stream, ...weighed(key) })),
    layers: layers.map(({ stream, mass, volume }) => ({ stream, ...weighed(mass), volume: text(volume), volumeKey: volume })),
    totals: { in: weighed(totals.in), out: weighed(totals.out) }, difference: weighed(totals.difference),
  };
}

function known(outcome: Outcome, key: string): string {
  if (!isKnown(outcome)) throw new RangeError(`${key} is not known`);
  return outcome.toFixed();
}

function unknown(why: Unknown): NoBalance {
  return why instanceof Missing
    ? { version: FORMAT_VERSION, missing: [...new Set(why.missing.map(fieldOf))] }
    : { version: FORMAT_VERSION, problem: { ...why.problem, quantity: fieldOf(why.problem.quantity) } };
}
