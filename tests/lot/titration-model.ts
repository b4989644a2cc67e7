// The titration of a lot a second time, in plain numbers and without the project's formulas: what the result is, and what each source
// of uncertainty puts into it, by the quotient of differences and the rules of the GUM. For checks.

export interface Portion {
  /** g, or mL where the portion is measured by volume. */
  readonly sample: number;
  /** mL. */
  readonly titre: number;
}

export interface Bench {
  readonly runs: readonly Portion[];
  readonly byVolume: boolean;
  /** mol/L, or the standardisation runs that it comes from. */
  readonly strength: number | readonly Portion[];
  /** mL; none where the solvent was neutralised. */
  readonly blank: number | undefined;
  /** °C, where it was read. */
  readonly temperature: number | undefined;
  /** mL; none was titrated where it is 0. */
  readonly khpBlank: number;
  /** Repeatability limit as a share of the acid value. */
  readonly repeatability: number;
}

// The usual equipment, as the defaults have it: burette B 25 mL, drop, balances, tolerances.
const BURETTE = 0.1;
const DROP = 0.05;
const [BALANCE, STANDARD_BALANCE] = [0.002, 0.0002];
const [SAMPLE_VOLUME, DENSITY, DENSITY_TOLERANCE] = [0.1, 0.917, 0.005];
const [BETA, T0, THERMOMETER, ROOM] = [0.0011, 20, 0.5, 3];
const [LABEL, PURITY, PURITY_TOLERANCE, M_KHP, M_KHP_U, STANDARD_SCATTER] = [0.005, 1, 0.0005, 204.2223, 0.0038, 0.002];
const KOH = 56.1;

/** ISO 5725-6 (from memory) and ISO 7870-2 (from memory), for 2, 3, 4 results. */
const CRITICAL = [2.8, 3.3, 3.6];
const D2 = [1.128, 1.693, 2.059];

const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;
const range = (values: readonly number[]): number => Math.max(...values) - Math.min(...values);
function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const half = sorted.length / 2;
  return Number.isInteger(half) ? (sorted[half - 1]! + sorted[half]!) / 2 : sorted[Math.floor(half)]!;
}

/** The errors of one draw, each added to what it moves. */
interface Errors {
  titre?: number;
  titreOf?: readonly number[];
  sample?: number;
  density?: number;
  blank?: number;
  factor?: number;
  strength?: number;
  khpTitre?: number;
  khpTitreOf?: readonly number[];
  khpTitreShare?: number;
  khpBlank?: number;
  khpPortion?: number;
  khpPurity?: number;
  khpMolarMass?: number;
}

function strengthOf({ strength, khpBlank }: Bench, errors: Errors): number {
  if (typeof strength === 'number') return strength + (errors.strength ?? 0);
  return mean(strength.map(({ sample, titre }, i) => {
    const volume = titre * (1 + (errors.khpTitreShare ?? 0)) + (errors.khpTitre ?? 0) + (errors.khpTitreOf?.[i] ?? 0) - khpBlank - (errors.khpBlank ?? 0);
    return (1000 * (sample + (errors.khpPortion ?? 0)) * (PURITY + (errors.khpPurity ?? 0))) / ((M_KHP + (errors.khpMolarMass ?? 0)) * volume);
  }));
}

/** Acid content of each run, mmol/g. */
function contents(bench: Bench, errors: Errors = {}): number[] {
  const factor = 1 - BETA * ((bench.temperature ?? T0) - T0) + (errors.factor ?? 0);
  const strength = strengthOf(bench, errors);
  return bench.runs.map(({ sample, titre }, i) => {
    const mass = bench.byVolume ? (sample + (errors.sample ?? 0)) * (DENSITY + (errors.density ?? 0)) : sample + (errors.sample ?? 0);
    const volume = titre + (errors.titre ?? 0) + (errors.titreOf?.[i] ?? 0) - (bench.blank === undefined ? 0 : bench.blank + (errors.blank ?? 0));
    return (strength * volume * factor) / mass;
  });
}

export interface Modelled {
  readonly acidValue: number;
  readonly strength: number;
  /** Standard uncertainty of the acid value that each source alone would leave. */
  readonly budget: ReadonlyMap<string, number>;
}

export function modelled(bench: Bench): Modelled {
  const found = contents(bench);
  const n = found.length;
  const single = (bench.repeatability * mean(found)) / 2.8;
  const agree = n < 2 || range(found) <= CRITICAL[n - 2]! * single;
  const averaged = agree || n < 3 ? mean : median;
  const acidValue = (errors: Errors): number => KOH * averaged(contents(bench, errors));
  /** By a quotient of differences over a thousandth of the error. */
  const moved = (u: number, errorOf: (size: number) => Errors): number => (1000 * Math.abs(acidValue(errorOf(u / 1000)) - acidValue(errorOf(-u / 1000)))) / 2;
  const each = (u: number, count: number, errorOf: (errors: readonly number[]) => Errors): number =>
    Math.hypot(...Array.from({ length: count }, (_, at) => moved(u, (size) => errorOf(Array.from({ length: count }, (_, i) => (i === at ? size : 0))))));
  const flat = (half: number): number => half / Math.sqrt(3);
  const peaked = (half: number): number => half / Math.sqrt(6);

  const budget = new Map<string, number>();
  const deviation = agree ? single : Math.max(single, range(found) / D2[n - 2]!);
  budget.set('u.repeatability', ((KOH * deviation) / Math.sqrt(n)) * (averaged === median ? Math.sqrt(Math.PI / 2) : 1));
  budget.set('u.endPoint', each(flat(DROP / 2), n, (titreOf) => ({ titreOf })));
  budget.set('u.burette', moved(peaked(BURETTE), (titre) => ({ titre })));
  if (bench.byVolume) {
    budget.set('u.sampleVolume', moved(peaked(SAMPLE_VOLUME), (sample) => ({ sample })));
    budget.set('u.sampleDensity', moved(flat(DENSITY_TOLERANCE), (density) => ({ density })));
  } else budget.set('u.balance', moved(Math.SQRT2 * flat(BALANCE), (sample) => ({ sample })));
  if (bench.blank !== undefined) budget.set('u.blankEndPoint', moved(flat(DROP / 2), (blank) => ({ blank })));
  budget.set('u.temperature', moved((BETA * (bench.temperature === undefined ? ROOM : THERMOMETER)) / 1.96, (factor) => ({ factor })));
  const strength = strengthOf(bench, {});
  if (typeof bench.strength === 'number') budget.set('u.titrant', moved(flat(LABEL * strength), (error) => ({ strength: error })));
  else {
    const count = bench.strength.length;
    budget.set('u.khpEndPoint', each(flat(DROP / 2), count, (khpTitreOf) => ({ khpTitreOf })));
    if (bench.khpBlank) budget.set('u.khpBlankEndPoint', moved(flat(DROP / 2), (khpBlank) => ({ khpBlank })));
    budget.set('u.khpBurette', moved(peaked(BURETTE), (khpTitre) => ({ khpTitre })));
    budget.set('u.khpBalance', moved(Math.SQRT2 * flat(STANDARD_BALANCE), (khpPortion) => ({ khpPortion })));
    budget.set('u.khpPurity', moved(flat(PURITY_TOLERANCE), (khpPurity) => ({ khpPurity })));
    budget.set('u.khpMolarMass', moved(M_KHP_U, (khpMolarMass) => ({ khpMolarMass })));
    budget.set('u.khpTemperature', moved((BETA * ROOM) / 1.96, (khpTitreShare) => ({ khpTitreShare })));
    // a share of the strength is the same share of the acid value
    budget.set('u.khpRepeatability', (acidValue({}) * STANDARD_SCATTER) / Math.sqrt(count));
  }
  return { acidValue: acidValue({}), strength, budget };
}
