import { directCharge, twoStepCharge } from '../decision/charge.js';
import type { Route } from '../decision/route.js';
import type { Decimal } from '../formula/decimal.js';
import { shownText } from '../formula/digits.js';
import type { Plan } from '../formula/plan.js';
import { Refused, isKnown } from '../formula/reading.js';
import type { Outcome, Problem } from '../formula/reading.js';
import { checkedLot } from './checked.js';
import { FORMAT_VERSION } from './entry.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { ROUTE_KEYS, judgedRoute } from './judged-route.js';
import { fieldOf } from './keys.js';
import type { LotFaults, LotReading, ReadingJson, UncertaintyJson } from './lot-reading.js';
import { lotReplicates } from './lot-replicates.js';
import { lotRun } from './lot-run.js';
import type { LotRun } from './lot-run.js';
import { missedTarget, noticesOn } from './notices.js';
import { runState } from './runs.js';
import { uncertaintyJson, uncertaintyOf } from './uncertainty.js';

/** What to read; everything when left out. */
export interface ReadOptions {
  /** Keys of the readings wanted; nothing else is computed but the route. For long lists of lots. A key this lot has no quantity for gives `unknown-quantity`. */
  readonly only?: readonly string[];
  /** The day of reading, ISO 8601: the age of the titrant counts up to the lot's date, or to this day where the lot has none. */
  readonly today?: string;
}

/**
 * Reads a lot: acid value, FFA, the route with its reasons, and the charges of both routes. Pure:
 * JSON in, JSON out, and never an exception for bad input. A document that cannot be read at all
 * (unknown keys, a newer version) gives `faults`; a bad figure gives a reading with a `problem`,
 * and everything that does not rest on it is still read.
 *
 * @param entry a {@link LotEntry}
 * @param site a `SiteProfile`; the defaults stand where it says nothing
 */
export function readLot(entry: unknown, site: unknown = { version: FORMAT_VERSION }, options: ReadOptions = {}): LotReading | LotFaults {
  const checked = checkedLot(entry, site);
  if ('faults' in checked) return checked;
  const { lot, profile } = checked;
  const { only } = options;
  const run = lotRun(lot, profile, only && [...only, ...ROUTE_KEYS]);
  const replicates = { lot: lotReplicates(run, '', lot.runs), retest: lotReplicates(run, 'retest.', lot.retestRuns) };
  const route = judgedRoute(run, lot, replicates.lot);
  const passes = only ? undefined : passesOf(run);
  if (!only) compute(run, lot, profile, passes);
  const readings = readingsOf(run, only ?? run.findings.touched());
  return {
    version: FORMAT_VERSION,
    readings,
    runs: lot.runs.map(runState),
    retestRuns: lot.retestRuns.map(runState),
    replicates,
    uncertainties: only ? {} : uncertaintiesOf(run),
    route: only ? route : withTarget(route, run, passes),
    charges: { direct: directCharge(), twoStep: twoStepCharge(passes ?? 1) },
    problems: problemsIn(readings),
    notices: only ? [] : noticesOn(lot, profile, run, passes, options.today),
  };
}

/** Results that stand with their ± beside them. */
const WITH_UNCERTAINTY = ['acidValue', 'freeFattyAcid', 'retest.acidValue', 'retest.freeFattyAcid', 'titrantConcentration'];

function uncertaintiesOf(run: LotRun): Readonly<Record<string, UncertaintyJson>> {
  const known: Record<string, UncertaintyJson> = {};
  const touched = new Set(run.findings.touched());
  for (const key of WITH_UNCERTAINTY) {
    if (!touched.has(key)) continue;
    const uncertainty = uncertaintyOf(run, key);
    if ('budget' in uncertainty) known[key] = uncertaintyJson(uncertainty, run.findings.outcome(key) as Decimal, run.sheet.quantity(key).digits);
  }
  return known;
}

/** A two-step route that three passes do not bring to the target says so among its reasons. */
function withTarget(route: Route, { findings }: LotRun, passes: number | undefined): Route {
  const missed = route.verdict === 'two-step' ? missedTarget(findings, passes) : undefined;
  return missed ? { ...route, reasons: [...route.reasons, { code: 'pretreatment-misses-target', params: missed }] } : route;
}

function passesOf({ findings }: LotRun): number | undefined {
  const passes = findings.option('passes');
  return typeof passes === 'string' ? Number(passes) : undefined;
}

/** Results that nothing else in a plan asks for: the first pass is shown even where the charge is not known yet. */
function compute({ plan, findings }: LotRun, entry: LotEntry, site: SiteProfile, passes: number | undefined): void {
  const hasTitrant = 'titrantStrength' in entry.figures || Boolean(site.titrantRuns?.length) || TITRANT_FIGURES.some((key) => key in site.figures);
  const hasSteps = DISPENSING_STEPS.some((key) => key in entry.figures || key in site.figures);
  const shows = (key: string): boolean => {
    const pass = /^pass(\d)\./.exec(key);
    if (key.includes('.dispensed.')) return hasSteps && (!pass || Number(pass[1]) <= (passes ?? 1));
    if (pass) return Number(pass[1]) <= (passes ?? 1);
    const run = /^(retest\.)?run(\d+)\.(acidValue|freeFattyAcid)$/.exec(key);
    if (run) return Number(run[2]) <= (run[1] ? entry.retestRuns : entry.runs).length;
    if (key.startsWith('retest.')) return entry.retestRuns.length > 0 && RESULTS.test(key.slice('retest.'.length));
    return key === 'titrantConcentration' ? hasTitrant : RESULTS.test(key);
  };
  for (const key of resultsOf(plan)) if (shows(key)) findings.outcome(key);
}

/** Keys of a plan that any lot may show without being asked. */
function resultsOf(plan: Plan): readonly string[] {
  let keys = RESULTS_OF.get(plan);
  if (!keys) RESULTS_OF.set(plan, (keys = plan.order.filter((key) => OF_SOME_LOTS.test(key) || RESULTS.test(key.replace(/^retest\./, '')))));
  return keys;
}

const RESULTS_OF = new WeakMap<Plan, readonly string[]>();
/** Results of a run or a pass, in whole steps, of the titrant. */
const OF_SOME_LOTS = /^(?:(?:retest\.)?(?:run|pass)\d|titrantConcentration$)|\.dispensed\./;

const DISPENSING_STEPS = ['methanolStep', 'catalystStep', 'sulfuricStep'];
const TITRANT_FIGURES = ['titrantStrength', 'titrantWeighedMass'];
const RESULTS = /^(?:(?:direct|twoStep|pretreated)\..*|acidValue|freeFattyAcid|alkaliPerLitreOfOil|oilVolume|blendOil|waterContent|insolubles|pretreatmentTarget|runRange|criticalRange)$/;

function readingsOf({ sheet, findings, givens }: LotRun, keys: readonly string[]): Record<string, ReadingJson> {
  const readings: Record<string, ReadingJson> = {};
  for (const key of keys) {
    if (!sheet.quantities.has(key)) {
      readings[key] = { symbol: '', unit: '', from: 'none', problem: { code: 'unknown-quantity', quantity: key } };
      continue;
    }
    const { symbol, unit, digits, is } = sheet.quantity(key);
    const outcome = findings.outcome(key);
    const from = is ? 'formula' : givens.origin(key);
    readings[key] = isKnown(outcome)
      ? { symbol, unit: unit.symbol, from, value: outcome.toFixed(), shown: (is ? undefined : givens.written(key)) ?? shownText(outcome, digits) }
      : { symbol, unit: unit.symbol, from, ...unknownJson(outcome) };
  }
  return readings;
}

function unknownJson(outcome: Exclude<Outcome, { isZero(): boolean }>): Pick<ReadingJson, 'missing' | 'problem'> {
  return outcome instanceof Refused ? { problem: atField(outcome.problem) } : { missing: [...new Set(outcome.missing.map(fieldOf))] };
}

const atField = (problem: Problem): Problem => ({ ...problem, quantity: fieldOf(problem.quantity) });

function problemsIn(readings: Readonly<Record<string, ReadingJson>>): readonly Problem[] {
  const found = new Map<string, Problem>();
  for (const { problem } of Object.values(readings)) if (problem) found.set(`${problem.code} ${problem.quantity}`, problem);
  return [...found.values()];
}
