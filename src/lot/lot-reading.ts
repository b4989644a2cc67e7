import type { ChargeStep } from '../decision/charge.js';
import type { Replicates } from '../decision/replicates.js';
import type { Route } from '../decision/route.js';
import type { Problem } from '../formula/reading.js';
import type { Fault } from './check.js';
import type { Origin } from './givens.js';
import type { RunState } from './runs.js';

// What readLot gives: plain JSON, every figure as decimal text.

/** A quantity of a lot: its value, or what is missing, or what was refused. */
export interface ReadingJson {
  readonly symbol: string;
  readonly unit: string;
  /** `formula` for a computed quantity, else where the figure was given. */
  readonly from: Origin | 'formula';
  /** The full value, up to 34 digits. */
  readonly value?: string;
  /** The value as reported, rounded to its digits, or an input as it was written; decimal point, no grouping. */
  readonly shown?: string;
  /** Fields that must be filled first. */
  readonly missing?: readonly string[];
  readonly problem?: Problem;
}

/** The uncertainty of a reading, in its unit, as decimal text. */
export interface UncertaintyJson {
  /** Combined standard uncertainty. */
  readonly u: string;
  /** Expanded uncertainty U = 2 u, for about 95 %. */
  readonly expanded: string;
  /** U rounded for showing beside the reading. */
  readonly shown: string;
}

export const NOTICE_CODES = [
  'one-run', 'run-incomplete', 'runs-tenfold', 'target-not-reached', 'lauric-on-other-basis', 'titre-small', 'titre-above-burette', 'portion-unusual',
  'strength-perhaps-grams', 'strength-perhaps-moles', 'strength-unlikely', 'blank-large', 'titrant-old', 'titrant-age-unknown', 'titrant-not-standardised',
  'standardisation-differs', 'purity-as-fraction', 'date-in-future', 'temperature-not-corrected', 'batch-above-vessel', 'methanol-little-for-catalyst',
  'batch-too-wet', 'soap-above-limit', 'retest-higher',
] as const;
export type NoticeCode = (typeof NOTICE_CODES)[number];

/** A remark that refuses nothing. */
export interface Notice {
  readonly code: NoticeCode;
  /** Field or quantity it stands at. */
  readonly quantity: string;
  readonly params?: Readonly<Record<string, string>>;
}

export interface LotReading {
  readonly version: 1;
  /** By model key, each after the ones it rests on. */
  readonly readings: Readonly<Record<string, ReadingJson>>;
  readonly runs: readonly RunState[];
  readonly retestRuns: readonly RunState[];
  /** What was made of the runs, and what to do next. */
  readonly replicates: { readonly lot: Replicates; readonly retest: Replicates };
  /** How well acid value, FFA and titrant strength are known, by key; those that are known. */
  readonly uncertainties: Readonly<Record<string, UncertaintyJson>>;
  readonly route: Route;
  /** Both routes, always; amounts are keys into `readings`, in order of addition. */
  readonly charges: { readonly direct: readonly ChargeStep[]; readonly twoStep: readonly ChargeStep[] };
  /** Every refusal, each once. */
  readonly problems: readonly Problem[];
  readonly notices: readonly Notice[];
}

/** The document itself could not be read. */
export interface LotFaults {
  readonly version: 1;
  readonly faults: readonly (Fault & { readonly in: 'entry' | 'site' })[];
}
