import type { Decimal } from './decimal.js';

/** Why a figure was refused: a code that the locale turns into a sentence, at the quantity it concerns. */
export interface Problem {
  readonly code: string;
  /** Key of the quantity (or choice) at whose field the problem stands. */
  readonly quantity: string;
  /** Figures and words for the sentence, as text. */
  readonly params?: Readonly<Record<string, string>>;
}

/** Not known: inputs that nobody has given yet. */
export class Missing {
  constructor(
    /** Keys of the inputs still needed, each once. */
    readonly missing: readonly string[],
  ) {}
}

/** Not known: it rests on a figure that was refused. */
export class Refused {
  constructor(readonly problem: Problem) {}
}

export type Unknown = Missing | Refused;

/** What evaluation gives for a quantity: its value in the quantity's unit, or why it is not known. */
export type Outcome = Decimal | Unknown;

export function isKnown(outcome: Outcome): outcome is Decimal {
  return !(outcome instanceof Missing || outcome instanceof Refused);
}

/** What remains unknown when either of two is: a refusal outweighs a gap; gaps add up. */
export function joinUnknown(a: Outcome, b: Outcome): Unknown {
  if (a instanceof Refused) return a;
  if (b instanceof Refused) return b;
  if (isKnown(a)) return b as Missing;
  if (isKnown(b)) return a;
  return new Missing([...new Set([...a.missing, ...b.missing])]);
}
