import * as v from 'valibot';
import type { Figure } from './figure.js';

/** The version of the lot entry and the site profile that this code writes. */
export const FORMAT_VERSION = 1;

/** A run of a titration as typed. A run is struck out with a reason, never deleted in silence. */
export interface RunEntry {
  /** The portion: weighed, or by volume, as `sampleTakenBy` says. */
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
}

export const EMPTY_LOT: LotEntry = { version: FORMAT_VERSION, figures: {}, options: {}, runs: [], retestRuns: [] };
export const EMPTY_SITE: SiteProfile = { version: FORMAT_VERSION, figures: {}, options: {} };

/** What is wrong with an entry or a profile as a document, before any figure is looked at. */
export interface Fault {
  readonly code: 'not-an-object' | 'newer-version' | 'unknown-version' | 'unknown-key' | 'wrong-type' | 'too-long' | 'unknown-option';
  /** Where, e.g. `runs.0.sample.unit`. */
  readonly path: string;
  readonly found?: string;
}

const MOST_TEXT = 10_000;
const MOST_RUNS = 20;
const text = v.pipe(v.string(), v.maxLength(MOST_TEXT));
const figure = v.union([v.strictObject({ text, unit: text }), v.strictObject({ typed: text, doubt: text, unit: text })]);
const run = v.strictObject({
  sample: v.exactOptional(figure), start: v.exactOptional(figure), end: v.exactOptional(figure), struck: v.exactOptional(text),
});
const runs = v.pipe(v.array(run), v.maxLength(MOST_RUNS));
/** A list is no record of keys, though it would pass for one. */
const keyed = v.custom<Record<string, unknown>>((value) => !Array.isArray(value));
const shared = {
  version: v.literal(FORMAT_VERSION),
  name: v.exactOptional(text),
  figures: v.pipe(keyed, v.record(text, figure)),
  options: v.pipe(keyed, v.record(text, text)),
};
const siteSchema = v.strictObject(shared);
const lotSchema = v.strictObject({ ...shared, source: v.exactOptional(text), date: v.exactOptional(text), runs, retestRuns: runs });

/** Checks a lot entry from outside. Parts left out count as empty. */
export function checkLotEntry(value: unknown, keys: KnownKeys): LotEntry | readonly Fault[] {
  return check(lotSchema, value, { figures: {}, options: {}, runs: [], retestRuns: [] }, keys);
}

/** Checks a site profile from outside. Parts left out count as empty. */
export function checkSiteProfile(value: unknown, keys: KnownKeys): SiteProfile | readonly Fault[] {
  return check(siteSchema, value, { figures: {}, options: {} }, keys);
}

/** The keys that figures and options may have, and the options each choice knows. */
export interface KnownKeys {
  readonly figures: ReadonlySet<string>;
  readonly options: ReadonlyMap<string, readonly string[]>;
}

function check<Schema extends typeof lotSchema | typeof siteSchema>(schema: Schema, value: unknown, empty: object, keys: KnownKeys): v.InferOutput<Schema> | readonly Fault[] {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return [{ code: 'not-an-object', path: '' }];
  const version = (value as { version?: unknown }).version;
  if (version !== FORMAT_VERSION) {
    const newer = typeof version === 'number' && version > FORMAT_VERSION;
    return [{ code: newer ? 'newer-version' : 'unknown-version', path: 'version', found: typeof version === 'number' || typeof version === 'string' ? String(version) : typeof version }];
  }
  const parsed = v.safeParse(schema, { ...empty, ...value });
  if (!parsed.success) return parsed.issues.map(faultOf);
  // on the value as it came: the schema drops keys such as `__proto__` in silence
  const faults = unknownKeys({ ...empty, ...value } as SiteProfile, keys);
  return faults.length ? faults : parsed.output;
}

function unknownKeys({ figures, options }: SiteProfile, keys: KnownKeys): Fault[] {
  const faults: Fault[] = [];
  for (const key of Object.keys(figures)) {
    if (!keys.figures.has(key)) faults.push({ code: 'unknown-key', path: `figures.${key}`, found: key });
  }
  for (const [key, option] of Object.entries(options)) {
    const known = keys.options.get(key);
    if (!known) faults.push({ code: 'unknown-key', path: `options.${key}`, found: key });
    else if (!known.includes(option)) faults.push({ code: 'unknown-option', path: `options.${key}`, found: option });
  }
  return faults;
}

function faultOf(issue: v.BaseIssue<unknown>): Fault {
  const path = v.getDotPath(issue) ?? '';
  const code = issue.type === 'strict_object' && issue.expected === 'never' ? 'unknown-key' : issue.type === 'max_length' ? 'too-long' : 'wrong-type';
  return { code, path, found: issue.received };
}
