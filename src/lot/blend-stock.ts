import { GOALS, MASS_RULES, SHARES } from '../decision/blend/stock.js';
import type { BlendItem, BlendTask, Goal, MassRule, Share } from '../decision/blend/stock.js';
import { decimal } from '../formula/decimal.js';
import type { Decimal } from '../formula/decimal.js';
import { isKnown } from '../formula/reading.js';
import type { Problem } from '../formula/reading.js';
import type { Unit } from '../formula/unit.js';
import { currencyPerKilogram, kilogram, percent } from '../formula/units.js';
import { check, figure, list, oneOf, record, text } from './check.js';
import type { Fault } from './check.js';
import { DEFAULT_FIGURES } from './defaults.js';
import { FORMAT_VERSION } from './entry.js';
import type { SiteProfile } from './entry.js';
import { readFigure } from './figure.js';
import type { Figure } from './figure.js';

/** A lot or a tank in stock as typed. */
export interface StockItem {
  readonly name?: string;
  /** What there is. */
  readonly mass?: Figure;
  /** What must go in. */
  readonly leastMass?: Figure;
  readonly freeFattyAcid?: Figure;
  readonly water?: Figure;
  readonly insolubles?: Figure;
  readonly cost?: Figure;
}

/** Highest shares of the blend, and its mass. */
export interface StockLimits {
  /** The site's direct limit where left out. */
  readonly freeFattyAcid?: Figure;
  /** No limit where left out, like insolubles and mass. */
  readonly water?: Figure;
  readonly insolubles?: Figure;
  readonly mass?: Figure;
  /** `at-least` where left out. */
  readonly massRule?: MassRule;
  /** To which masses are rounded; 1 kg where left out, 1 lb on a page in US units. */
  readonly step?: Figure;
}

/** What is in stock and what is wanted of it: a document of its own, that a page can keep. */
export interface BlendStock {
  readonly version: typeof FORMAT_VERSION;
  readonly items: readonly StockItem[];
  readonly limits: StockLimits;
  readonly goal: Goal;
}

export const EMPTY_STOCK: BlendStock = { version: FORMAT_VERSION, items: [], limits: {}, goal: 'use-sour' };

/** The figures of an item, in the order of the table. */
export const ITEM_FIGURES = ['mass', 'freeFattyAcid', 'cost', 'water', 'insolubles', 'leastMass'] as const;
export type ItemFigure = (typeof ITEM_FIGURES)[number];
export const MOST_ITEMS = 200;
export const DEFAULT_STEP: Figure = { text: '1', unit: 'kg' };

/** Checks a stock from outside. Parts left out count as empty. */
export function checkBlendStock(value: unknown): BlendStock | readonly Fault[] {
  const item = record({ name: text, ...Object.fromEntries(ITEM_FIGURES.map((key) => [key, figure])) });
  const limits = record({ ...Object.fromEntries([...SHARES, 'mass', 'step'].map((key) => [key, figure])), massRule: oneOf(MASS_RULES) });
  return check({ ...EMPTY_STOCK }, value, { version: () => undefined, items: list(item, MOST_ITEMS), limits, goal: oneOf(GOALS) });
}

/** A stock as figures. */
export interface StockTask {
  /** Undefined while a limit cannot be used. */
  readonly task: BlendTask | undefined;
  /** Place in the stock of each item of the task; those with a problem are left out. */
  readonly places: readonly number[];
  /** `items.0.water`, `limits.mass` … Besides the codes of figures: `needed`, and `least-above-available`. */
  readonly problems: readonly Problem[];
}

/** The limit of free fatty acid that stands where the stock has none. */
export const standingLimit = (site: SiteProfile): Figure | undefined => site.figures['directLimit'] ?? DEFAULT_FIGURES['directLimit'];

/** Reads the figures of a stock. An item with a problem is left out of the task, and its problem said. */
export function stockTask({ items, limits, goal }: BlendStock, site: SiteProfile, standingStep: Figure): StockTask {
  const problems: Problem[] = [];
  const read = (given: Figure | undefined, field: string, bounds: Bounds): Decimal | undefined => {
    const outcome = given && readFigure(given, bounds.unit, field);
    if (!outcome) return undefined;
    const wrong = isKnown(outcome) ? outOf(outcome, bounds, field) : 'problem' in outcome ? outcome.problem : undefined;
    if (!wrong && isKnown(outcome)) return outcome;
    if (wrong) problems.push(wrong);
    return undefined;
  };

  const shares: Partial<Record<Share, Decimal>> = {};
  for (const share of SHARES) {
    const limit = read(limits[share] ?? (share === 'freeFattyAcid' ? standingLimit(site) : undefined), `limits.${share}`, PERCENT);
    if (limit) shares[share] = limit;
  }
  const mass = read(limits.mass, 'limits.mass', MASS);
  const step = read(limits.step ?? standingStep, 'limits.step', { ...MASS, above: true });
  const sound = !problems.length;

  const places: number[] = [];
  const usable: BlendItem[] = [];
  items.forEach((item, place) => {
    if (isEmpty(item)) return;
    const before = problems.length;
    const at = (key: ItemFigure): string => `items.${place}.${key}`;
    const needed = (key: ItemFigure): void => void problems.push({ code: 'needed', quantity: at(key) });
    const figures = Object.fromEntries(ITEM_FIGURES.map((key) => [key, read(item[key], at(key), BOUNDS[key])])) as Partial<Record<ItemFigure, Decimal>>;
    const { mass: available, leastMass: least = ZERO, cost } = figures;
    if (!item.mass) needed('mass');
    for (const share of SHARES) if (!item[share] && (share === 'freeFattyAcid' || shares[share])) needed(share);
    if (available?.lt(least)) problems.push({ code: 'least-above-available', quantity: at('leastMass') });
    if (problems.length > before || !available) return;
    places.push(place);
    usable.push({ name: item.name ?? '', available, least, shares: Object.fromEntries(SHARES.flatMap((share) => (figures[share] ? [[share, figures[share]]] : []))), ...(cost && { cost }) });
  });
  const task = sound && step ? { items: usable, limits: shares, goal, step, ...(mass && { mass: { rule: limits.massRule ?? 'at-least', of: mass } }) } : undefined;
  return { task, places, problems };
}

/** Whether nothing at all is typed for an item. */
export const isEmpty = (item: StockItem): boolean => !item.name && ITEM_FIGURES.every((key) => !item[key]);

interface Bounds {
  readonly unit: Unit;
  readonly least?: Decimal;
  readonly most: Decimal;
  readonly above?: boolean;
}
const ZERO = decimal('0');
const PERCENT: Bounds = { unit: percent, least: ZERO, most: decimal('100') };
/** More than ten thousand tonnes is a slip, and no solver's figure. */
const MASS: Bounds = { unit: kilogram, least: ZERO, most: decimal('10000000') };
/** Oil can be paid for being taken: a price may be negative. */
const COST: Bounds = { unit: currencyPerKilogram, most: decimal('1000000') };
const BOUNDS: Readonly<Record<ItemFigure, Bounds>> = { mass: MASS, leastMass: MASS, freeFattyAcid: PERCENT, water: PERCENT, insolubles: PERCENT, cost: COST };

function outOf(value: Decimal, { unit, least, most, above }: Bounds, quantity: string): Problem | undefined {
  if (above && value.lte(0)) return { code: 'not-above-zero', quantity };
  if (least && value.lt(least)) return { code: 'negative', quantity };
  if (value.abs().lte(most)) return undefined;
  return unit === percent ? { code: 'above-100-percent', quantity } : { code: 'out-of-range', quantity, params: { bound: most.toString(), unit: unit.symbol } };
}
