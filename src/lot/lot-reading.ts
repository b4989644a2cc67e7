import type { ChargeStep } from '../decision/charge.js';
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

/** A remark that refuses nothing. */
export interface Notice {
  readonly code: 'one-run' | 'run-incomplete' | 'target-not-reached' | 'lauric-on-other-basis';
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
