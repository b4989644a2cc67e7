import { EMPTY_LOT, EMPTY_SITE, FORMAT_VERSION } from './entry.js';
import type { LotEntry, SiteProfile } from './entry.js';

/** What is wrong with an entry or a profile as a document, before any figure is looked at. */
export interface Fault {
  readonly code: 'not-an-object' | 'newer-version' | 'unknown-version' | 'unknown-key' | 'wrong-type' | 'too-long' | 'unknown-option';
  /** Where, e.g. `runs.0.sample.unit`. */
  readonly path: string;
  readonly found?: string;
}

/** The keys that figures and options may have, and the options each choice knows. */
export interface KnownKeys {
  readonly figures: ReadonlySet<string>;
  readonly options: ReadonlyMap<string, readonly string[]>;
}

/** Checks a lot entry from outside. Parts left out count as empty. */
export function checkLotEntry(value: unknown, keys: KnownKeys): LotEntry | readonly Fault[] {
  return check({ ...EMPTY_LOT }, value, { ...shared(keys), source: text, date: text, runs: runs(), retestRuns: runs() });
}

/** Checks a site profile from outside. Parts left out count as empty. */
export function checkSiteProfile(value: unknown, keys: KnownKeys): SiteProfile | readonly Fault[] {
  return check({ ...EMPTY_SITE }, value, { ...shared(keys), titrantRuns: runs(), titrantDate: text, currency });
}

/** Checks a document of this version against its shape; parts it leaves out are those of `empty`. */
export function check<Document extends object>(empty: Document, value: unknown, shape: Shape): Document | readonly Fault[] {
  if (!isObject(value)) return [{ code: 'not-an-object', path: '' }];
  const { version } = value;
  if (version !== FORMAT_VERSION) {
    const newer = typeof version === 'number' && version > FORMAT_VERSION;
    return [{ code: newer ? 'newer-version' : 'unknown-version', path: 'version', found: kindOf(version) }];
  }
  const faults: Fault[] = [];
  record(shape)(value, '', faults);
  return faults.length ? faults : { ...empty, ...value };
}

const MOST_TEXT = 10_000;
export const MOST_RUNS = 20;
/** Letters of a currency that a table still has room for. */
export const MOST_CURRENCY = 5;

/** Looks at a value and adds what is wrong with it. */
export type Check = (value: unknown, path: string, faults: Fault[]) => void;
export type Shape = Readonly<Record<string, Check>>;

const shared = (keys: KnownKeys): Shape => ({ version: () => undefined, name: text, figures: figuresOf(keys), options: optionsOf(keys) });

export function text(value: unknown, path: string, faults: Fault[]): void {
  if (typeof value !== 'string') faults.push({ code: 'wrong-type', path, found: kindOf(value) });
  else if (value.length > MOST_TEXT) faults.push({ code: 'too-long', path, found: String(value.length) });
}

/** A sign or a short name of money. */
function currency(value: unknown, path: string, faults: Fault[]): void {
  text(value, path, faults);
  if (typeof value === 'string' && value.length > MOST_CURRENCY) faults.push({ code: 'too-long', path, found: String(value.length) });
}

/** An object with some of the named parts, and no other. */
export function record(shape: Shape): Check {
  return (value, path, faults) => {
    if (!isObject(value)) return void faults.push({ code: 'wrong-type', path, found: kindOf(value) });
    for (const key of Object.keys(value)) {
      const part = Object.hasOwn(shape, key) ? shape[key] : undefined;
      if (part) part(value[key], below(path, key), faults);
      else faults.push({ code: 'unknown-key', path: below(path, key), found: key });
    }
  };
}

export function list(item: Check, most = MOST_RUNS): Check {
  return (value, path, faults) => {
    if (!Array.isArray(value)) faults.push({ code: 'wrong-type', path, found: kindOf(value) });
    else if (value.length > most) faults.push({ code: 'too-long', path, found: String(value.length) });
    else value.forEach((one, index) => item(one, below(path, String(index)), faults));
  };
}

/** Decimal text and its unit, or what was typed and the doubt about it. */
export function figure(value: unknown, path: string, faults: Fault[]): void {
  const doubted = isObject(value) && 'doubt' in value;
  const parts: Shape = doubted ? { typed: text, doubt: text, unit: text } : { text, unit: text };
  record(parts)(value, path, faults);
  if (!isObject(value)) return;
  for (const part of Object.keys(parts)) if (!Object.hasOwn(value, part)) text(undefined, below(path, part), faults);
}

const runs = (): Check => list(record({ sample: figure, start: figure, end: figure, struck: text }));

/** One of a few words. */
export function oneOf(words: readonly string[]): Check {
  return (value, path, faults) => {
    if (typeof value !== 'string') text(value, path, faults);
    else if (!words.includes(value)) faults.push({ code: 'unknown-option', path, found: value });
  };
}

const figuresOf = ({ figures }: KnownKeys): Check =>
  entries((key, value, path, faults) => {
    if (figures.has(key)) figure(value, path, faults);
    else faults.push({ code: 'unknown-key', path, found: key });
  });

const optionsOf = ({ options }: KnownKeys): Check =>
  entries((key, value, path, faults) => {
    const known = options.get(key);
    if (known) oneOf(known)(value, path, faults);
    else faults.push({ code: 'unknown-key', path, found: key });
  });

function entries(each: (key: string, value: unknown, path: string, faults: Fault[]) => void): Check {
  return (value, path, faults) => {
    if (!isObject(value)) return void faults.push({ code: 'wrong-type', path, found: kindOf(value) });
    for (const key of Object.keys(value)) each(key, value[key], below(path, key), faults);
  };
}

const isObject = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value);
const below = (path: string, key: string): string => (path ? `${path}.${key}` : key);

/** A short word or figure for a message, never the whole of what was found. */
function kindOf(value: unknown): string {
  if (typeof value === 'number' || typeof value === 'boolean') return String(value);
  if (typeof value === 'string') return value.slice(0, 40);
  return Array.isArray(value) ? 'list' : value === null ? 'null' : typeof value;
}
