import { PORTIONS } from '../chemistry/titration-plan.js';
import { portionFits } from '../decision/portion-table.js';
import { decimal } from '../formula/decimal.js';
import type { Decimal } from '../formula/decimal.js';
import { isKnown } from '../formula/reading.js';
import type { LotEntry, RunEntry, SiteProfile } from './entry.js';
import type { Figure } from './figure.js';
import { lotRun } from './lot-run.js';
import { COVERAGE_FACTOR, uncertaintyOf } from './uncertainty.js';

/** Titrants that methods and the trade keep, mol/L. */
const USUAL_STRENGTHS = ['0.01', '0.02', '0.05', '0.1', '0.25', '0.5', '1'];
/** Runs that the ± is told for. */
const RUNS = 2;

/** How to titrate an oil of an expected acid value; decimal text, in the units said. */
export interface TitrationPlan {
  /** mg/g */
  readonly expected: string;
  /** The titrant to use, mol/L; `keep` where it is the one in use. */
  readonly strength: string;
  readonly keep: boolean;
  /** Oil to weigh in, g. */
  readonly portion: string;
  /** The same by volume, mL. */
  readonly portionVolume: string;
  /** What the method's table has for it, g. */
  readonly tablePortion: string;
  /** Whether the portion lies near the table's. */
  readonly likeTable: boolean;
  /** The titre to expect, mL. */
  readonly titre: string;
  /** Of the burette, mL. */
  readonly capacity: string;
  /** Expanded uncertainty of the acid value to expect from two runs, mg/g; undefined where a source of it is not known. */
  readonly expanded?: string;
}

/**
 * A portion and a titrant that put the titre into the good part of the burette (20 to 80 % of it,
 * common practice). The titrant in use is kept where the method's table allows it; else the nearest
 * usual strength whose portion lies near the table's.
 *
 * @returns undefined while no acid value is expected (nor found yet) or no titrant is known
 */
export function planTitration(entry: LotEntry, site: SiteProfile): TitrationPlan | undefined {
  const expected = expectedOf(entry, site);
  if (!expected) return undefined;
  const lot = { ...entry, figures: { ...entry.figures, expectedAcidValue: expected } };
  const inUse = planWith(lot, site);
  if (!inUse || inUse.likeTable) return inUse && { ...inUse, keep: true };
  const others = USUAL_STRENGTHS.map((text) => ({ ...lot, figures: { ...lot.figures, titrantStrength: { text, unit: 'mol/L' } } }));
  const fit = others.map((other) => planWith(other, site)).filter((plan) => plan?.likeTable);
  const apart = (plan: { strength: string } | undefined): Decimal => decimal(plan?.strength ?? '1').div(inUse.strength).ln().abs();
  const [nearest] = fit.sort((a, b) => apart(a).cmp(apart(b)));
  return nearest ? { ...nearest, keep: false } : { ...inUse, keep: true };
}

/** What was typed, else what the first runs gave. */
function expectedOf(entry: LotEntry, site: SiteProfile): Figure | undefined {
  const typed = entry.figures['expectedAcidValue'];
  if (typed) return typed;
  const found = lotRun(entry, site, ['acidValue']).findings.outcome('acidValue');
  return isKnown(found) ? { text: found.toSignificantDigits(6).toFixed(), unit: 'mg/g' } : undefined;
}

const PLANNED = [
  'planned.portion', 'planned.portionVolume', 'planned.tablePortion', 'planned.titre', 'titrantConcentration', 'expectedAcidValue', 'buretteCapacity',
] as const;

function planWith(entry: LotEntry, site: SiteProfile): Omit<TitrationPlan, 'keep'> | undefined {
  const { findings, givens } = lotRun(entry, site, PLANNED);
  const figures = PLANNED.map((key) => findings.outcome(key)).filter(isKnown);
  const [portion, volume, tablePortion, titre, strength, expected, capacity] = figures;
  if (!portion || !volume || !tablePortion || !titre || !strength || !expected || !capacity) return undefined;
  const lines = PORTIONS[givens.chosen('portionTable') as keyof typeof PORTIONS];
  const expanded = expandedFor(entry, site, portion, titre);
  return {
    capacity: capacity.toString(), portionVolume: volume.toString(), expected: expected.toString(), strength: strength.toString(), portion: portion.toString(), tablePortion: tablePortion.toString(),
    likeTable: portionFits(portion, expected, lines), titre: titre.toString(), ...(expanded && { expanded: expanded.toString() }),
  };
}

/** The U that two runs of such a portion and titre would leave: the lot's own formulas, on runs as planned. */
function expandedFor(entry: LotEntry, site: SiteProfile, portion: Decimal, titre: Decimal): Decimal | undefined {
  const run: RunEntry = { sample: figure(portion, 'g'), start: { text: '0', unit: 'mL' }, end: figure(titre, 'mL') };
  const options = { ...entry.options, acidKnownFrom: 'titration', sampleTakenBy: 'weighing', blankPolicy: 'solvent-neutralised' };
  const { blank: _, ...figures } = entry.figures;
  const planned = { ...entry, options, figures, runs: Array.from({ length: RUNS }, () => run), retestRuns: [] };
  const found = uncertaintyOf(lotRun(planned, site), 'acidValue');
  return 'budget' in found ? found.u.times(COVERAGE_FACTOR) : undefined;
}

const figure = (value: Decimal, unit: string): Figure => ({ text: value.toFixed(6), unit });
