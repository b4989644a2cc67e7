import { constant, greatest, least, median } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import type { Choice, Quantity } from '../formula/quantity.js';
import type { Unit } from '../formula/unit.js';
import { milligramPerGram, millimolePerGram, percent } from '../formula/units.js';
import { METHOD_KOH, acidValueLike, freeFattyAcidOf } from './acidity.js';
import { D664_FRESH, D664_USED, ISO_5725_6, MEAN_RANGE, MEDIAN_SPREAD, PRACTICE } from './sources.js';

// How far the runs of a titration may lie apart, and what is made of them (ISO 5725-6).

/** Where the repeatability limit comes from: a published method's, or the site's own as a figure or a share. */
export const repeatabilityBy = choice('repeatabilityBy', ['d664-used', 'd664-fresh', 'typed', 'typed-share']);

export const repeatabilityTyped = quantity({
  key: 'repeatabilityTyped', symbol: 'r_site', unit: milligramPerGram, digits: { significant: 3 },
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '100', 'out-of-range')],
});
export const repeatabilityShare = quantity({
  key: 'repeatabilityShare', symbol: 'r_%', unit: percent, digits: { significant: 3 },
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '100', 'above-100-percent')],
});

/** Critical range factors for 2 to 20 results: 95 % points of the studentised range. */
export const RANGE_FACTORS = ['2.8', '3.3', '3.6', '3.9', '4.0', '4.2', '4.3', '4.4', '4.5', '4.6', '4.6', '4.7', '4.7', '4.8', '4.8', '4.9', '4.9', '5.0', '5.0'] as const;
/** Mean range of 2 to 20 results in standard deviations, d2. */
export const MEAN_RANGES = [
  '1.128', '1.693', '2.059', '2.326', '2.534', '2.704', '2.847', '2.970', '3.078', '3.173', '3.258', '3.336', '3.407', '3.472', '3.532', '3.588', '3.640', '3.689', '3.735',
] as const;

/** The largest less the smallest. */
export function rangeOfRuns(values: readonly Expression[]): Expression {
  const end = (pick: typeof least): Expression => values.reduce((so, value) => pick(so, value));
  return end(greatest).minus(end(least));
}

/** The factor for so many results; a list that ends sooner stays at its last. */
export const factorOf = (factors: readonly string[], results: number): string => factors[results - 2] ?? factors.at(-1) ?? '';

/** What is made of the runs that count. */
export interface Replicates {
  /** Acid content of the sample: the mean, or the median of runs that lie too far apart. */
  readonly result: Quantity;
  readonly all: readonly (Quantity | Choice)[];
}

/** Arithmetic mean. */
export function meanOf(values: readonly Expression[]): Expression {
  const [first, ...rest] = values;
  if (!first) throw new RangeError('a mean of no runs');
  return rest.length ? rest.reduce((sum, value) => sum.plus(value), first).per(String(values.length)) : first;
}

/**
 * @param prefix of the keys: empty for the oil as it came, `retest.` after pretreatment
 * @param contents acid contents of the runs that count, one or more
 */
export function replicates(prefix: '' | 'retest.', contents: readonly Expression[]): Replicates {
  const n = contents.length;
  const mark = prefix ? ',r' : '';
  const like = (key: string, symbol: string, is: Expression, cites = [ISO_5725_6]): Quantity =>
    quantity({ key: prefix + key, symbol: symbol + mark, ...acidValueLike, digits: { decimals: 2 }, cites, is });
  const averageBy = choice(`${prefix}averageBy`, ['mean', 'median']);
  const runsAgree = choice(`${prefix}runsAgree`, ['yes', 'no']);

  const mean = like('meanAcidValue', 'AV_mean', METHOD_KOH.times(meanOf(contents)));
  const limitOfTwo = like('repeatabilityLimit', 'r', repeatabilityBy.of({
    'd664-used': constant('0.117', undefined, { source: D664_USED }).times(mean),
    'd664-fresh': constant('0.044', undefined, { source: D664_FRESH }).times(mean.plus(constant('1', milligramPerGram))),
    typed: repeatabilityTyped,
    'typed-share': repeatabilityShare.times(mean).in(milligramPerGram),
  }), [D664_USED, D664_FRESH, PRACTICE]);
  // r is 2.8 standard deviations of a single run
  const single = limitOfTwo.per('2.8');
  const share = constant('1').per(constant(String(n)).power('0.5'));
  const doubt = (name: string, symbol: string, unit: Unit, is: Expression): Quantity =>
    quantity({ key: `${prefix}u.${name}`, symbol: `u_${symbol}${mark}`, unit, cites: [ISO_5725_6, MEDIAN_SPREAD], digits: { significant: 2 }, is });
  /** What scatter leaves of the result, of the mean, and of what each run tells by itself. */
  const scatter = (deviation: Expression, factor: Expression): Quantity[] => [
    doubt('repeatability', 'rep', millimolePerGram, deviation.per(METHOD_KOH).times(factor)),
    doubt('meanAcidValue', 'AV_mean', milligramPerGram, deviation.times(share)),
    doubt('runAcidValue', 'AV_run', milligramPerGram, deviation),
    doubt('runFreeFattyAcid', 'FFA_run', percent, freeFattyAcidOf(deviation.per(METHOD_KOH))),
  ];
  const made = (is: Expression): Quantity =>
    quantity({ key: `${prefix}titratedAcidContent`, symbol: `b_t${mark}`, unit: millimolePerGram, cites: [ISO_5725_6], is });
  const alone = made(meanOf(contents));
  if (n < 2) return { result: alone, all: [averageBy, runsAgree, alone, mean, limitOfTwo, ...scatter(single, share)] };

  const range = like('runRange', 'R', METHOD_KOH.times(rangeOfRuns(contents)));
  const critical = like('criticalRange', 'CR', constant(factorOf(RANGE_FACTORS, n), undefined, { source: ISO_5725_6 }).times(single));
  const deviation = like('runDeviation', 's_run', runsAgree.of({
    yes: single,
    no: greatest(single, range.per(constant(factorOf(MEAN_RANGES, n), undefined, { source: MEAN_RANGE }))),
  }), [ISO_5725_6, MEAN_RANGE]);
  // of two, the median is the mean
  const byAverage = (mean: Expression, median: Expression): Expression => (n > 2 ? averageBy.of({ mean, median }) : mean);
  const result = made(byAverage(meanOf(contents), median(contents)));
  const doubts = scatter(deviation, byAverage(share, constant('1.2533', undefined, { source: MEDIAN_SPREAD }).times(share)));
  return { result, all: [averageBy, runsAgree, mean, limitOfTwo, range, critical, deviation, result, ...doubts] };
}
