/** How a source's error is distributed (GUM 4.3). */
export type ErrorShape = 'normal' | 'rectangular' | 'triangular';

/** One source of uncertainty: an error that is added to the value of one quantity, or – the same error – to several. */
export interface UncertaintySource {
  /** Key of the quantity that is its standard uncertainty, in the unit of the quantities it moves. */
  readonly key: string;
  readonly shape: ErrorShape;
  /** Keys of the quantities that it moves, e.g. the titre of every run read on one burette. */
  readonly at: readonly string[];
}
