import { Decimal } from '../formula/decimal.js';
import { Missing, isKnown, joinUnknown } from '../formula/reading.js';
import type { Problem } from '../formula/reading.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { fieldOf } from './keys.js';
import { lotRun } from './lot-run.js';
import { unpriced } from './unpriced.js';

type Cheaper = 'direct' | 'two-step' | 'same';

/** What both routes cost at an acid content, ¤ a tonne of oil. Doubles, for drawing. */
export interface CostPoint {
  /** % */
  readonly ffa: number;
  readonly direct: number;
  readonly twoStep: number;
}

/** Where the other route becomes the cheaper one. */
export interface Crossing {
  /** FFA, %, as decimal text to 0.01 %. */
  readonly ffa: string;
  readonly below: Cheaper;
  readonly above: Cheaper;
  /** `crossing`: the costs meet there; `step`: one of them jumps past the other, as where a rule changes or a pass is added. */
  readonly kind: 'crossing' | 'step';
}

export interface BreakEven {
  readonly points: readonly CostPoint[];
  /** From sweet to sour; none, where one route is the cheaper one all along. */
  readonly crossings: readonly Crossing[];
  /** The cheaper route at the sweet end, all along where nothing crosses. */
  readonly cheapest: Cheaper;
  /** Prices that were left out of one total or both, by field. */
  readonly unpriced: readonly string[];
}

/** Why there is no comparison: the fields still needed, or what was refused. */
export interface NoBreakEven {
  readonly missing?: readonly string[];
  readonly problem?: Problem;
}

/** FFA in steps of 0.0001 %, so that each is exact as text: from 0.1 to 40 %, closer where oils usually lie. */
const UNIT = 10_000;
const LEAST = UNIT / 10;
const BANDS = [{ to: 5 * UNIT, step: UNIT / 4 }, { to: 20 * UNIT, step: UNIT / 2 }, { to: 40 * UNIT, step: UNIT }] as const;

/**
 * The acid content at which the cheaper route changes: the lot's own formulas with another FFA put in, as from a
 * certificate and without a retest. A change of the cheaper route between two points is found by halving; two changes
 * within one step of the scale (0.25 to 1 %) cancel out and are not seen.
 */
export function breakEven(entry: LotEntry, site: SiteProfile): BreakEven | NoBreakEven {
  const at = costsAt(entry, site);
  const first = at(LEAST);
  if (!('costs' in first)) return first;
  const scale = [LEAST];
  for (const { to, step } of BANDS) for (let x = Math.floor((scale.at(-1) ?? 0) / step) * step + step; x <= to; x += step) scale.push(x);
  const known = scale.flatMap((x) => {
    const found = at(x);
    return 'costs' in found ? [{ x, ...found.costs }] : [];
  });
  const crossings = known.flatMap((right, i) => {
    const left = known[i - 1];
    return left && cheaper(left) !== cheaper(right) ? [crossingBetween(left, right, at)] : [];
  });
  return {
    points: known.map(({ x, direct, twoStep }) => ({ ffa: x / UNIT, direct: direct.toNumber(), twoStep: twoStep.toNumber() })),
    crossings, cheapest: cheaper(first.costs), unpriced: unpriced(entry, site, 'twoStep'),
  };
}

interface Costs {
  readonly direct: Decimal;
  readonly twoStep: Decimal;
}
type At = (x: number) => { readonly costs: Costs } | NoBreakEven;

function costsAt(entry: LotEntry, site: SiteProfile): At {
  const { certificateFfa: _, 'retest.certificateFfa': __, 'retest.certificateAcidValue': ___, ...figures } = entry.figures;
  const without: LotEntry = { ...entry, runs: [], retestRuns: [], options: { ...entry.options, acidKnownFrom: 'certificate-ffa', 'retest.acidKnownFrom': 'titration' } };
  return (x) => {
    const ffa = { text: new Decimal(x).div(UNIT).toFixed(), unit: '%' };
    const { findings } = lotRun({ ...without, figures: { ...figures, certificateFfa: ffa } }, site);
    const direct = findings.outcome('cost.direct.perTonne');
    const twoStep = findings.outcome('cost.twoStep.perTonne');
    if (isKnown(direct) && isKnown(twoStep)) return { costs: { direct, twoStep } };
    const why = joinUnknown(direct, twoStep);
    return why instanceof Missing ? { missing: [...new Set(why.missing.map(fieldOf))] } : { problem: { ...why.problem, quantity: fieldOf(why.problem.quantity) } };
  };
}

function cheaper({ direct, twoStep }: Costs): Cheaper {
  const order = direct.cmp(twoStep);
  return order < 0 ? 'direct' : order > 0 ? 'two-step' : 'same';
}

/** Halves the way between two points of which another route is the cheaper one. */
function crossingBetween(left: Costs & { x: number }, right: Costs & { x: number }, at: At): Crossing {
  const below = cheaper(left);
  let [low, high] = [left, right];
  /** How far apart the two routes' difference lies at both ends: it shrinks with the way between, unless it jumps. */
  const jump = (): Decimal => low.direct.minus(low.twoStep).minus(high.direct.minus(high.twoStep)).abs();
  let before = jump();
  while (high.x - low.x > 1) {
    const x = Math.floor((low.x + high.x) / 2);
    const found = at(x);
    if (!('costs' in found)) break;
    if (high.x - low.x >= STEEP) before = jump();
    const middle = { x, ...found.costs };
    if (cheaper(middle) === below) low = middle;
    else high = middle;
  }
  const kind = jump().times(SHRUNK).gt(before) ? 'step' : 'crossing';
  return { ffa: new Decimal(high.x).div(UNIT).toFixed(2), below, above: cheaper(right), kind };
}

/** Of the way between, in steps, from which on the difference is expected to have shrunk by this much or more. */
const STEEP = 16;
const SHRUNK = 4;
