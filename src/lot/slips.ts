import { Decimal } from '../formula/decimal.js';
import type { Findings, Givens } from '../formula/plan.js';
import { isKnown } from '../formula/reading.js';
import type { Outcome } from '../formula/reading.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { lotRun } from './lot-run.js';
import type { LotRun } from './lot-run.js';

/** Code of a slip of working by hand; the locale has its sentence. */
export const SLIP_CODES = [
  'blank-left-out', 'blank-added', 'blank-twice', 'burette-start-ignored', 'one-run', 'struck-run-counted', 'other-average',
  'temperature-left-out', 'temperature-reversed', 'volume-as-mass', 'mass-as-volume',
  'strength-as-moles', 'strength-as-grams', 'other-titrant-molar-mass', 'label-strength', 'titrant-assay-left-out',
  'ffa-as-acid-value', 'acid-value-as-ffa', 'acid-value-as-sodium-hydroxide', 'other-reference-acid', 'exact-molar-mass',
  'litres-for-kilograms', 'kilograms-for-litres', 'oil-density-left-out', 'oil-temperature-left-out', 'free-acid-not-deducted', 'oil-water-left-out',
  'catalyst-assay-left-out', 'catalyst-assay-multiplied', 'catalyst-assay-twice', 'extra-without-assay', 'other-catalyst-molar-mass', 'other-base-load',
  'base-on-litres', 'base-left-out', 'extra-left-out', 'mineral-left-out', 'mineral-counted-once',
  'methanol-of-solution-left-out', 'methanol-assay-left-out', 'methanol-assay-multiplied', 'methanol-on-acid', 'methanol-on-oil', 'other-methanol-basis',
  'sulfuric-assay-left-out', 'sulfuric-assay-multiplied', 'sulfuric-on-oil', 'other-acid-basis', 'rule-of-other-acidity',
  'estimate-for-retest', 'untreated-acid', 'untreated-mass',
  'density-left-out', 'density-multiplied', 'volume-for-mass', 'per-litre-for-per-kilogram', 'other-route',
  'per-cent-as-fraction', 'thousandfold', 'tenfold', 'pounds-and-kilograms', 'gallons-and-litres',
] as const;
export type SlipCode = (typeof SLIP_CODES)[number];

/** The value under the code of a quantity as it comes out with the slip made; NaN while it is not known. */
export type ValueOf = (key: string) => Decimal;
/** What a quantity is taken for instead of its right value (NaN while that is not known). */
export type Change = (normal: Decimal, of: ValueOf) => Decimal;

export type Changes = Readonly<Record<string, Change>>;

/** A slip: what is put in another's place. The formulas stay what they are. */
export interface Slip {
  readonly code: SlipCode;
  /** What the slip is about: of two slips about one thing only one is made at a time. */
  readonly topic: string;
  /** For the sentence: which run, which substance. */
  readonly params?: Readonly<Record<string, string>>;
  readonly replaced?: Changes;
  readonly options?: Readonly<Record<string, string>>;
  /** The entry as it was misread. */
  readonly entry?: (entry: LotEntry) => LotEntry;
  /** By which the result itself is off. */
  readonly factor?: Decimal;
}

/** A figure that is checked, as it comes out without a slip. */
export class CheckedFigure {
  readonly run: LotRun;

  constructor(
    readonly entry: LotEntry,
    readonly site: SiteProfile,
    readonly key: string,
  ) {
    this.run = lotRun(entry, site);
  }

  get outcome(): Outcome {
    return this.run.findings.outcome(this.key);
  }

  /** A quantity of the lot without a slip; NaN while it is not known. */
  readonly value: ValueOf = (key) => known(this.run.findings.outcome(key));

  /** The option in force; undefined while it is not settled. */
  option(key: string): string | undefined {
    const option = this.run.findings.option(key);
    return typeof option === 'string' ? option : undefined;
  }

  /** The options of a choice that are not in force. */
  others(key: string): readonly string[] {
    const taken = this.option(key);
    return this.run.sheet.choices.get(key)?.options.filter((option) => option !== taken) ?? [];
  }

  /** A quantity – the checked one when no key is given – with slips made; NaN while it is not known. */
  with(slips: readonly Omit<Slip, 'code' | 'topic'>[], key = this.key): Decimal {
    const entry = slips.reduce((so, slip) => slip.entry?.(so) ?? so, this.entry);
    const { plan, givens } = entry === this.entry ? this.run : lotRun(entry, this.site);
    const options: Readonly<Record<string, string>> = Object.assign({}, ...slips.map((slip) => slip.options));
    const misread: Givens = { input: (name) => givens.input(name), option: (name, so) => options[name] ?? givens.option(name, so) };
    const of: ValueOf = (name) => known(findings.outcome(name));
    const replaced = new Map<string, (normal: Outcome) => Outcome>();
    for (const slip of slips) {
      for (const [name, change] of Object.entries(slip.replaced ?? {})) {
        const before = replaced.get(name);
        replaced.set(name, (normal) => change(known(before ? before(normal) : normal), of));
      }
    }
    const findings: Findings = plan.evaluate(misread, replaced);
    return slips.reduce((value, { factor }) => (factor ? value.times(factor) : value), of(key));
  }
}

const known = (outcome: Outcome): Decimal => (isKnown(outcome) ? outcome : NOT_KNOWN);
const NOT_KNOWN = new Decimal(NaN);

/** Changes that many slips share. */
export const to = (key: string): Change => (_, of) => of(key);
export const times = (...keys: readonly string[]): Change => (normal, of) => keys.reduce((value, key) => value.times(of(key)), normal);
export const per = (key: string): Change => (normal, of) => normal.div(of(key));
export const nothing: Change = () => new Decimal(0);

/** The same changes made in several places, e.g. on both routes. */
export const each = (places: readonly string[], changes: (place: string) => Changes): Changes =>
  Object.assign({}, ...places.map(changes)) as Changes;
export const ROUTES = ['direct.', 'twoStep.'] as const;
export const PASSES = ['pass1.', 'pass2.', 'pass3.'] as const;
