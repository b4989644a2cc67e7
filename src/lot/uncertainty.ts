import { Decimal } from '../formula/decimal.js';
import { slopes } from '../formula/derivative.js';
import { shownText } from '../formula/digits.js';
import type { Digits } from '../formula/quantity.js';
import { isKnown } from '../formula/reading.js';
import type { Unknown } from '../formula/reading.js';
import type { Sheet } from '../formula/sheet.js';
import type { UncertaintySource } from '../formula/uncertainty-source.js';
import type { UncertaintyJson } from './lot-reading.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { lotRun } from './lot-run.js';
import type { LotRun } from './lot-run.js';
import { uncertaintySources } from './uncertainty-sources.js';

/** A line of a budget: what one source puts into the uncertainty of a result. */
export interface Contribution {
  /** Key of the source's standard uncertainty, e.g. `u.burette`. */
  readonly key: string;
  /** Standard uncertainty that it alone would leave, in the unit of the result. */
  readonly u: Decimal;
  /** Its share of the variance, 0 to 1. */
  readonly share: Decimal;
}

/** How well a result is known (GUM, first order). */
export interface Uncertainty {
  /** Combined standard uncertainty, in the unit of the result. */
  readonly u: Decimal;
  /** Largest first; sources that put nothing in are left out. */
  readonly budget: readonly Contribution[];
}

/** Coverage factor of the expanded uncertainty U = 2 u, for about 95 % (QUAM 8.3). */
export const COVERAGE_FACTOR = new Decimal(2);

/**
 * The combined standard uncertainty of a result, u² = Σ (∂y/∂xᵢ · uᵢ)², with the sensitivities taken
 * from the formulas. An error that moves several figures at once, such as that of the one burette,
 * counts with the sum of their sensitivities. A source whose own uncertainty is not known is why the
 * whole is not.
 *
 * @returns why it is not known, where the result or one of its sources is not
 */
export function uncertaintyOf(run: LotRun, key: string): Uncertainty | Unknown {
  let ofRun = FOUND.get(run);
  if (!ofRun) FOUND.set(run, (ofRun = new Map()));
  let found = ofRun.get(key);
  if (!found) ofRun.set(key, (found = combined(run, key)));
  return found;
}

/** What has been worked out for a lot at hand: its route and its result ask for the same. */
const FOUND = new WeakMap<LotRun, Map<string, Uncertainty | Unknown>>();

function combined(run: LotRun, key: string): Uncertainty | Unknown {
  const { plan, findings } = run;
  const found = slopes(plan, findings, key);
  if (!(found instanceof Map)) return found as Unknown;
  const slopeAt = found as ReadonlyMap<string, Decimal>;
  const contributions = new Map<string, Decimal[]>();
  for (const source of sourcesOf(run)) {
    const slope = slopeOf(source, slopeAt);
    if (!slope || slope.isZero()) continue;
    const u = findings.outcome(source.key);
    if (!isKnown(u)) return u;
    if (u.isZero()) continue;
    const alone = slope.times(u).abs();
    const others = contributions.get(source.key);
    if (others) others.push(alone);
    else contributions.set(source.key, [alone]);
  }
  return new Combined(contributions);
}

/** How much a result moves with an error that moves several figures at once; undefined where it moves none. */
function slopeOf({ at }: UncertaintySource, slopeAt: ReadonlyMap<string, Decimal>): Decimal | undefined {
  let slope: Decimal | undefined;
  for (const key of at) {
    const one = slopeAt.get(key);
    if (one) slope = slope ? slope.plus(one) : one;
  }
  return slope;
}

/** The sources of lots with the same runs are the same. */
function sourcesOf({ sheet, runs }: LotRun): readonly UncertaintySource[] {
  let sources = SOURCES.get(sheet);
  if (!sources) SOURCES.set(sheet, (sources = uncertaintySources(runs)));
  return sources;
}

const SOURCES = new WeakMap<Sheet, readonly UncertaintySource[]>();

/** Roots are dear, and most who ask want the whole only: the budget is worked out when asked for. */
class Combined implements Uncertainty {
  readonly u: Decimal;
  readonly #variance: Decimal;
  readonly #contributions: ReadonlyMap<string, readonly Decimal[]>;

  constructor(contributions: ReadonlyMap<string, readonly Decimal[]>) {
    this.#contributions = contributions;
    this.#variance = [...contributions.values()].reduce((sum, alike) => sum.plus(varianceOf(alike)), ZERO);
    this.u = this.#variance.sqrt();
  }

  get budget(): readonly Contribution[] {
    const lines = [...this.#contributions].map(([key, alike]) => {
      const variance = varianceOf(alike);
      const [first, ...more] = alike;
      return { key, u: first && !more.length ? first : variance.sqrt(), share: variance.div(this.#variance) };
    });
    return lines.sort((a, b) => b.share.cmp(a.share));
  }
}

/** Of errors that are new each time. */
const varianceOf = (alike: readonly Decimal[]): Decimal => alike.reduce((sum, one) => sum.plus(one.times(one)), ZERO);

/** A line of a budget, as JSON. */
export interface BudgetLine {
  /** Key of the source's standard uncertainty. */
  readonly source: string;
  /** Standard uncertainty that it alone would leave, in the unit of the result. */
  readonly u: string;
  /** Its share of the variance, 0 to 1. */
  readonly share: string;
}

/** The uncertainty of a reading with what it is made of, as JSON. */
export interface Budget extends UncertaintyJson {
  /** Largest first. */
  readonly budget: readonly BudgetLine[];
}

/**
 * How well any figure of a lot is known, with the budget.
 *
 * @returns undefined where the figure, or a source of its uncertainty, is not known
 * @throws SheetFault for a key that no quantity has
 */
export function uncertainty(entry: LotEntry, site: SiteProfile, key: string): Budget | undefined {
  const run = lotRun(entry, site);
  const { digits } = run.sheet.quantity(key);
  const found = uncertaintyOf(run, key);
  const value = run.findings.outcome(key);
  if (!('budget' in found) || !isKnown(value)) return undefined;
  const budget = found.budget.map(({ key: source, u, share }) => ({ source, u: u.toString(), share: share.toString() }));
  return { ...uncertaintyJson(found, value, digits), budget };
}

/** The same without budgets, for several figures of one lot at once; those that are not known are left out. */
export function uncertainties(entry: LotEntry, site: SiteProfile, keys: readonly string[]): Readonly<Record<string, UncertaintyJson>> {
  const run = lotRun(entry, site);
  return Object.fromEntries(keys.flatMap((key) => {
    const found = uncertaintyOf(run, key);
    const value = run.findings.outcome(key);
    return 'budget' in found && isKnown(value) ? [[key, uncertaintyJson(found, value, run.sheet.quantity(key).digits)] as const] : [];
  }));
}

/** As JSON, U to the decimals of the result it stands beside, but to no less than its first digit. */
export function uncertaintyJson(uncertainty: Uncertainty, value: Decimal, digits: Digits): UncertaintyJson {
  const { u } = uncertainty;
  return { u: u.toString(), expanded: u.times(COVERAGE_FACTOR).toString(), shown: shownUncertainty(uncertainty, value, digits) };
}

/** U as it is shown beside its result. */
export function shownUncertainty({ u }: Uncertainty, value: Decimal, digits: Digits): string {
  const expanded = u.times(COVERAGE_FACTOR);
  const beside = shownText(expanded, { decimals: decimalsOf(shownText(value, digits)) });
  return /[1-9]/.test(beside) || expanded.isZero() ? beside : shownText(expanded, { significant: 1 });
}

const decimalsOf = (text: string): number => text.split('.')[1]?.length ?? 0;

const ZERO = new Decimal(0);
