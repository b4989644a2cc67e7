import type { Figure } from './figure.js';

/** The version of the lot entry and the site profile that this code writes. */
export const FORMAT_VERSION = 1;

/** A run of a titration as typed. A run is struck out with a reason, never deleted in silence. */
export interface RunEntry {
  /** The portion of oil: weighed, or by volume, as `sampleTakenBy` says; of the standard: weighed. */
  readonly sample?: Figure;
  readonly start?: Figure;
  readonly end?: Figure;
  /** Why the run does not count. */
  readonly struck?: string;
}

/**
 * What a person typed or a sheet supplied about one lot of oil, and nothing that follows from it.
 * It is the one thing stored. Figures and options it leaves out come from the site profile.
 */
export interface LotEntry {
  readonly version: typeof FORMAT_VERSION;
  readonly name?: string;
  readonly source?: string;
  /** As written; ISO 8601 where the panel writes it. */
  readonly date?: string;
  readonly figures: Readonly<Record<string, Figure>>;
  readonly options: Readonly<Record<string, string>>;
  readonly runs: readonly RunEntry[];
  /** Runs of the titration after the acid step. */
  readonly retestRuns: readonly RunEntry[];
}

/** What a site has decided once: figures and options under the same keys as a lot's, for every lot. */
export interface SiteProfile {
  readonly version: typeof FORMAT_VERSION;
  readonly name?: string;
  readonly figures: Readonly<Record<string, Figure>>;
  readonly options: Readonly<Record<string, string>>;
  /** Runs of the standardisation of the titrant in use. */
  readonly titrantRuns?: readonly RunEntry[];
  /** Day of the standardisation, ISO 8601. */
  readonly titrantDate?: string;
  /** How the site writes its money, e.g. `€`; prices are in `¤`, whatever that is. */
  readonly currency?: string;
}

export const EMPTY_LOT: LotEntry = { version: FORMAT_VERSION, figures: {}, options: {}, runs: [], retestRuns: [] };
export const EMPTY_SITE: SiteProfile = { version: FORMAT_VERSION, figures: {}, options: {} };
