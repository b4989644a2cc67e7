/** Why a curve gives no end point. */
export const CURVE_REFUSALS = ['not-finite', 'too-few', 'flat', 'no-step', 'at-edge'] as const;
/** What is said beside an end point. */
export const CURVE_REMARKS = ['left-out', 'sorted', 'averaged', 'thinned', 'two-steps', 'several-steps', 'falling', 'coarse', 'gran-differs'] as const;
/** Why Gran's method gives nothing. */
export const GRAN_REFUSALS = ['gran-few', 'gran-not-straight', 'gran-outside'] as const;

export type CurveCode = (typeof CURVE_REMARKS)[number];

/** A code and its figures: volumes in mL, readings in pH or mV. The sentence is made by the language. */
export interface CurveRemark<Code extends string = CurveCode> {
  readonly code: Code;
  readonly params: Readonly<Record<string, number>>;
}

export interface CurveRefusal {
  readonly refused: CurveRemark<(typeof CURVE_REFUSALS)[number]>;
}
