import { blend } from '../decision/blend/blend.js';
import type { Blended, NoBlend } from '../decision/blend/blend.js';
import { mixtureOf } from '../decision/blend/mixture.js';
import { twoLots } from '../decision/blend/two-lots.js';
import type { Share } from '../decision/blend/stock.js';
import { Decimal } from '../formula/decimal.js';
import type { Problem } from '../formula/reading.js';
import { DEFAULT_STEP, checkBlendStock, stockTask } from './blend-stock.js';
import type { StockItem } from './blend-stock.js';
import type { Fault } from './check.js';
import { nextLot } from './edit.js';
import { EMPTY_LOT, EMPTY_SITE } from './entry.js';
import type { LotEntry, SiteProfile } from './entry.js';
import type { Figure } from './figure.js';
import { readLot } from './read-lot.js';

/** One lot in a blend; masses in kg, share in % of the blend. */
export interface BlendPart {
  /** Place in the stock. */
  readonly item: number;
  readonly name: string;
  readonly mass: string;
  readonly available: string;
  readonly share: string;
}

/** Figures as decimal text; items by their place in the stock. */
type Json<T> = T extends Decimal ? string : T extends readonly (infer Item)[] ? readonly Json<Item>[] : T extends object ? { readonly [K in keyof T]: Json<T[K]> } : T;

/** A blend, as JSON. */
export interface BlendFound extends Json<Omit<Blended, 'masses' | 'mixture'>>, Json<Blended['mixture']> {
  readonly parts: readonly BlendPart[];
  /** kg in stock above the limit of free fatty acid. */
  readonly sourThere: string;
  /** Of a blend of two: the highest share of the sourer one, %, and the limit that sets it. */
  readonly pair?: { readonly item: number; readonly most: string; readonly by: Share };
  readonly problems: readonly Problem[];
}

export interface BlendRefused extends Json<NoBlend> {
  readonly problems: readonly Problem[];
}

/**
 * Chooses a blend from what is in stock. Pure: JSON in, JSON out, and never an exception for bad input.
 *
 * @param stock a `BlendStock`
 * @param site a `SiteProfile`, whose direct limit stands where the stock sets none
 * @param step to which masses are rounded where the stock does not say
 * @returns a blend; or why there is none (`refused`) and what would help; or what is to be put right first (`problems` alone);
 *   or `faults` where the document cannot be read
 */
export function readBlend(stock: unknown, site: SiteProfile = EMPTY_SITE, step: Figure = DEFAULT_STEP): BlendFound | BlendRefused | { readonly problems: readonly Problem[] } | { readonly faults: readonly Fault[] } {
  const checked = checkBlendStock(stock);
  if (!('items' in checked)) return { faults: checked };
  const { task, places, problems } = stockTask(checked, site, step);
  if (!task) return { problems };
  const found = blend(task);
  // the task has only the items that can be used
  const placed = <T extends object>(one: T): T => ('item' in one ? { ...one, item: places[Number(one.item)] } : one);
  if ('refused' in found) return json({ ...found, remedies: found.remedies.map((one) => placed(one)), problems });

  const { masses, mixture, bindings, ...rest } = found;
  const used = task.items.map((item, i) => ({ ...item, i, mass: masses[i] ?? new Decimal(0) })).filter(({ mass }) => mass.gt(0));
  const parts = used.map(({ name, i, mass, available }) => ({ item: places[i] ?? i, name, mass, available, share: mass.div(mixture.mass).times(100) }));
  const [first, second, ...others] = [...used].sort((a, b) => (b.shares.freeFattyAcid ?? b.available).cmp(a.shares.freeFattyAcid ?? a.available));
  const pair = first && second && !others.length ? twoLots(first.shares, second.shares, task.limits) : undefined;
  return json({
    ...rest, ...mixture, parts, sourThere: mixtureOf(task, task.items.map(({ available }) => available)).sour, bindings: bindings.map((one) => placed(one)), problems,
    ...(first && pair?.by && { pair: { item: places[first.i] ?? first.i, most: pair.most, by: pair.by } }),
  });
}

/** Decimals write themselves as plain text. */
const json = <T>(value: T): Json<T> => JSON.parse(JSON.stringify(value)) as Json<T>;

/**
 * A blend as a lot to be charged: its free fatty acid as from a certificate, since it is worked out from figures of the parts and
 * carries the doubt of a certificate until it is titrated. The bench stays as in the lot that it takes the place of.
 *
 * @param from the lot on the bench before
 */
export function blendedLot({ parts, mass, shares }: Pick<BlendFound, 'parts' | 'mass' | 'shares'>, from: LotEntry = EMPTY_LOT): LotEntry {
  const { options, figures, ...rest } = nextLot(from);
  const { referenceAcid: _, ...kept } = options;
  const name = parts.map((part) => part.name || `${part.item + 1}`).join(' + ');
  const share = (text: string | undefined): Figure | undefined => (text === undefined ? undefined : { text: new Decimal(text).toDecimalPlaces(4, Decimal.ROUND_UP).toString(), unit: '%' });
  const given = { oilAmount: { text: mass, unit: 'kg' }, certificateFfa: share(shares.freeFattyAcid), waterContent: share(shares.water), insolubles: share(shares.insolubles) };
  return {
    ...rest,
    name: name.length > LONGEST ? `${name.slice(0, LONGEST - 1)}…` : name,
    source: parts.map((part) => `${part.mass} kg ${part.name || part.item + 1}`).join(' + '),
    options: { ...kept, acidKnownFrom: 'certificate-ffa' },
    figures: { ...figures, ...Object.fromEntries(Object.entries(given).filter(([, figure]) => figure)) as Record<string, Figure> },
  };
}

/**
 * The lot on the bench as an item in stock: the oil as it came. Its free fatty acid is counted as the site counts it, whatever
 * reference acid the lot itself is reported in, or the figures of a stock would not mix.
 */
export function stockItemOf(entry: LotEntry, site: SiteProfile = EMPTY_SITE): StockItem {
  const { oilMass, freeFattyAcid, acidValue } = valuesOf(entry, site);
  const own = 'referenceAcid' in entry.options || 'otherAcidMolarMass' in entry.figures;
  const asSite = own && acidValue ? valuesOf({ ...EMPTY_LOT, options: { acidKnownFrom: 'certificate-acid-value' }, figures: { certificateAcidValue: { text: acidValue, unit: 'mg/g' } } }, site).freeFattyAcid : freeFattyAcid;
  const { waterContent: water, insolubles, oilPrice = site.figures['oilPrice'] } = entry.figures;
  return {
    ...(entry.name && { name: entry.name }),
    ...(oilMass && { mass: { text: new Decimal(oilMass).toDecimalPlaces(3, Decimal.ROUND_DOWN).toString(), unit: 'kg' } }),
    ...(asSite && { freeFattyAcid: { text: new Decimal(asSite).toDecimalPlaces(4, Decimal.ROUND_UP).toString(), unit: '%' } }),
    // a price by volume needs a density, which a stock has not
    ...(oilPrice && /kg|t|lb/.test(oilPrice.unit) && { cost: oilPrice }),
    ...(water && { water }), ...(insolubles && { insolubles }),
  };
}

function valuesOf(entry: LotEntry, site: SiteProfile): Readonly<Record<string, string | undefined>> {
  const reading = readLot(entry, site, { only: ['oilMass', 'freeFattyAcid', 'acidValue'] });
  return 'faults' in reading ? {} : Object.fromEntries(Object.entries(reading.readings).map(([key, { value }]) => [key, value]));
}

/** Letters of a name that a section still shows on a line or two. */
const LONGEST = 60;
