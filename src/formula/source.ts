/**
 * How well a source is known. `found`: read in the named document or in a text quoting it;
 * `memory`: recalled from the named document; `derived`: computed from other facts;
 * `practice`: common practice of the trade, without a source; `definition`: true by definition.
 */
export type Mark = 'found' | 'memory' | 'derived' | 'practice' | 'definition';

/** Where a formula or a constant comes from. */
export interface Source {
  /** The document, as a reference list names it. */
  readonly title: string;
  readonly mark: Mark;
}

export const source = (title: string, mark: Mark): Source => Object.freeze({ title, mark });
