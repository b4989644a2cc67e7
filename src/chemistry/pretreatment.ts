import { constant, whereBelow } from '../formula/expression.js';
import type { Expression, Operand } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import type { Quantity, QuantityDefinition } from '../formula/quantity.js';
import type { Unit } from '../formula/unit.js';
import { gramPerMillilitre, kilogram, litre, mole, molePerMole, one, perMinute, percent } from '../formula/units.js';
import { freeFattyAcidLike, referenceAcidMolarMass } from './acidity.js';
import { conversionAfter, equilibrium, equilibriumConversion, rateAt60, rateFactorOf } from './esterification.js';
import type { Pace } from './esterification.js';
import type { Glycerides } from './glycerides.js';
import { methanolAssay, methanolDensity } from './methanol.js';
import { oilMass, oilVolume, waterContent } from './oil.js';
import { ESTERIFICATION_EQUILIBRIUM, ESTERIFICATION_RATE, NREL_PRETREATMENT, PRACTICE, STOICHIOMETRY, WATER_INHIBITION } from './sources.js';
import { M_METHANOL, M_WATER } from './substances.js';

/** What the methanol of the acid step is counted on. `by-acidity`: 40 mol a mol of acid below 15 % FFA, else 20. */
export const pretreatmentMethanolBasis = choice('pretreatmentMethanolBasis', ['by-acidity', 'per-acid', 'per-oil', 'oil-volume']);
/** What the sulfuric acid is counted on. `by-acidity`: 10 % of the FFA below 15 % FFA, else 5 %. */
export const pretreatmentAcidBasis = choice('pretreatmentAcidBasis', ['by-acidity', 'of-acid', 'of-oil', 'oil-volume']);

const ratio = (key: string, symbol: string, most: string): Quantity =>
  quantity({ key, symbol, unit: molePerMole, limits: [limit('above', '0', 'not-above-zero'), limit('atMost', most, 'out-of-range')] });
const share = (key: string, symbol: string, least: 'above' | 'atLeast' = 'above'): Quantity =>
  quantity({
    key, symbol, unit: percent, cites: [PRACTICE],
    limits: [limit(least, '0', least === 'above' ? 'not-above-zero' : 'negative'), limit('atMost', '100', 'above-100-percent')],
  });

export const pretreatmentMethanolPerAcid = ratio('pretreatmentMethanolPerAcid', 'R_FFA', '500');
export const pretreatmentMethanolPerOil = ratio('pretreatmentMethanolPerOil', 'R_oil', '100');
export const pretreatmentMethanolShare = share('pretreatmentMethanolShare', 'φ_M');
export const pretreatmentAcidOfAcid = share('pretreatmentAcidOfAcid', 'a_FFA');
export const pretreatmentAcidOfOil = share('pretreatmentAcidOfOil', 'a_oil');
export const pretreatmentAcidShare = share('pretreatmentAcidShare', 'φ_S');
export const sulfuricAssay = share('sulfuricAssay', 'w_S');
export const sulfuricDensity = quantity({
  key: 'sulfuricDensity', symbol: 'ρ_S', unit: gramPerMillilitre, digits: { decimals: 3 },
  limits: [limit('atLeast', '1', 'out-of-range'), limit('atMost', '1.9', 'out-of-range')],
});
/** Share of methanol, water and sulfuric acid that stays in the oil when the layer is drawn off. */
export const carryOver = share('carryOver', 'φ_c', 'atLeast');

/** Above this FFA the leaner of the two published rules holds. */
const RICH_ACID = constant('15', percent, { source: NREL_PRETREATMENT });
const mol = (text: string): Expression => constant(text, molePerMole, { source: NREL_PRETREATMENT });
const pct = (text: string): Expression => constant(text, percent, { source: NREL_PRETREATMENT });

/** What a pass leaves behind, for the next pass or the base step. */
export interface PassResult {
  /** Free fatty acid left, mol, at each end of the band. */
  readonly acid: Readonly<Record<Pace, Quantity>>;
  readonly ffa: Readonly<Record<Pace, Quantity>>;
  /** Methanol and water that stay in the oil, mol; sulfuric acid, kg. */
  readonly methanolCarried: Readonly<Record<Pace, Quantity>>;
  readonly waterCarried: Readonly<Record<Pace, Quantity>>;
  readonly sulfuricCarried: Quantity;
}

/** A pass of the acid step: its charge, and what to expect of it. */
export interface Pass extends PassResult {
  readonly all: readonly Quantity[];
}

/**
 * One pass of acid-catalysed esterification. What is charged follows from the slow end of what the
 * pass before it leaves; both ends of the band are then worked out for the same charge.
 *
 * @param number of the pass, from 1
 * @param acidAmount free fatty acid of the untreated batch, mol
 */
export function pretreatmentPass(number: 1 | 2 | 3, acidAmount: Expression, glycerides: Glycerides, before: PassResult | undefined): Pass {
  const make = (name: string, symbol: string, is: Operand, more: Partial<QuantityDefinition> = {}): Quantity =>
    quantity({ key: `pass${number}.${name}`, symbol, unit: kilogram, cites: [STOICHIOMETRY], ...more, is });
  const start: Readonly<Record<Pace, Expression>> = before ? before.acid : { slow: acidAmount, fast: acidAmount };

  const acidMass = make('acidMass', 'm_FFA', start.slow.times(referenceAcidMolarMass).in(kilogram));
  const ffaAtStart = make('ffaAtStart', 'FFA_0', acidMass.per(oilMass).in(percent), freeFattyAcidLike);

  const methanolRule = make('methanolRule', 'R_rule', whereBelow(ffaAtStart, RICH_ACID, mol('40'), mol('20')), { unit: molePerMole, cites: [NREL_PRETREATMENT], digits: { decimals: 0 } });
  const acidRule = make('acidRule', 'a_rule', whereBelow(ffaAtStart, RICH_ACID, pct('10'), pct('5')), { unit: percent, cites: [NREL_PRETREATMENT], digits: { decimals: 0 } });

  const methanolOfVolume = pretreatmentMethanolShare.times(oilVolume).times(methanolDensity).times(methanolAssay).in(kilogram);
  const perAcid = (moles: Expression): Expression => moles.times(start.slow).times(M_METHANOL).in(kilogram);
  const methanolPure = make('methanolPure', 'm_M', pretreatmentMethanolBasis.of({
    'by-acidity': perAcid(methanolRule),
    'per-acid': perAcid(pretreatmentMethanolPerAcid),
    'per-oil': pretreatmentMethanolPerOil.times(glycerides.content).times(oilMass).times(M_METHANOL).in(kilogram),
    'oil-volume': methanolOfVolume,
  }), { cites: [NREL_PRETREATMENT] });
  const methanol = make('methanol', 'm_MeOH', methanolPure.per(methanolAssay).in(kilogram));
  const methanolVolume = make('methanolVolume', 'V_MeOH', methanol.per(methanolDensity).in(litre), { unit: litre });

  const sulfuricPure = make('sulfuricPure', 'm_S', pretreatmentAcidBasis.of({
    'by-acidity': acidRule.times(acidMass).in(kilogram),
    'of-acid': pretreatmentAcidOfAcid.times(acidMass).in(kilogram),
    'of-oil': pretreatmentAcidOfOil.times(oilMass).in(kilogram),
    'oil-volume': pretreatmentAcidShare.times(oilVolume).times(sulfuricDensity).times(sulfuricAssay).in(kilogram),
  }), { cites: [NREL_PRETREATMENT] });
  const sulfuric = make('sulfuric', 'm_H2SO4', sulfuricPure.per(sulfuricAssay).in(kilogram));
  const sulfuricVolume = make('sulfuricVolume', 'V_H2SO4', sulfuric.per(sulfuricDensity).in(litre), { unit: litre });

  const batchVolume = make('batchVolume', 'V_batch', oilVolume.plus(methanolVolume).plus(sulfuricVolume), { unit: litre });

  const sulfuricPresent = make('sulfuricPresent', 'm_S,in', before ? sulfuricPure.plus(before.sulfuricCarried) : sulfuricPure);
  const sulfuricCarried = make('sulfuricCarried', 'm_S,left', carryOver.times(sulfuricPresent).in(kilogram), { cites: [PRACTICE] });
  const rest = (product: Expression, assay: Expression): Expression => product.times(constant('100', percent).minus(assay)).in(kilogram);
  const freshWater = rest(methanol, methanolAssay).plus(rest(sulfuric, sulfuricAssay)).per(M_WATER).in(mole);

  // what the acid meets; in the first pass it is the same at both ends of the band, so it is worked out once
  const conditions = (pace: Pace, suffix: string) => {
    const of = (name: string, symbol: string, is: Operand, unit: Unit, cites = [STOICHIOMETRY]): Quantity => make(name + suffix, symbol, is, { unit, cites });
    const waterBefore = before ? before.waterCarried[pace] : waterContent.times(oilMass).per(M_WATER).in(mole);
    const fresh = methanolPure.per(M_METHANOL).in(mole);
    const methanolPresent = of('methanolPresent', 'n_M', before ? fresh.plus(before.methanolCarried[pace]) : fresh, mole);
    const waterPresent = of('waterPresent', 'n_W', freshWater.plus(waterBefore), mole);
    const methanolPerAcid = of('methanolPerAcid', 'R', methanolPresent.per(start[pace]), molePerMole);
    const waterPerAcid = of('waterPerAcid', 'W', waterPresent.per(start[pace]), molePerMole);
    const acidLoad = of('acidLoad', 'a', sulfuricPresent.per(start[pace].times(referenceAcidMolarMass)).in(percent), percent);
    const rateFactor = of('rateFactor', 'f_k', rateFactorOf(acidLoad, waterPerAcid), one, [ESTERIFICATION_RATE, WATER_INHIBITION]);
    return { methanolPresent, waterPresent, methanolPerAcid, waterPerAcid, rateFactor, all: [methanolPresent, waterPresent, methanolPerAcid, waterPerAcid, acidLoad, rateFactor] };
  };
  const atSlow = conditions('slow', before ? '.slow' : '');
  const atFast = before ? conditions('fast', '.fast') : atSlow;

  const band = (pace: Pace, { methanolPresent, waterPresent, methanolPerAcid, waterPerAcid, rateFactor }: typeof atSlow) => {
    const end = (name: string, symbol: string, is: Operand, more: Partial<QuantityDefinition>): Quantity => make(`${name}.${pace}`, symbol, is, more);
    const limitOfIt = end('equilibrium', 'x_eq', equilibriumConversion(equilibrium[pace], methanolPerAcid, waterPerAcid), { unit: one, cites: [ESTERIFICATION_EQUILIBRIUM] });
    const k = end('rate', 'k', rateAt60[pace].times(rateFactor), { unit: perMinute, cites: [ESTERIFICATION_RATE] });
    const reached = end('conversion', 'x', conversionAfter(limitOfIt, k), { unit: one, cites: [ESTERIFICATION_RATE, ESTERIFICATION_EQUILIBRIUM] });
    const turned = end('esterified', 'n_est', reached.times(start[pace]), { unit: mole });
    const acidLeft = end('acidLeft', 'n_left', start[pace].minus(turned), { unit: mole });
    const ffaLeft = end('ffaLeft', 'FFA_left', acidLeft.times(referenceAcidMolarMass).per(oilMass).in(percent), freeFattyAcidLike);
    const methanolCarried = end('methanolCarried', 'n_M,left', carryOver.times(methanolPresent.minus(turned)).in(mole), { unit: mole, cites: [PRACTICE] });
    const waterCarried = end('waterCarried', 'n_W,left', carryOver.times(waterPresent.plus(turned)).in(mole), { unit: mole, cites: [PRACTICE] });
    return {
      acidLeft, ffaLeft, methanolCarried, waterCarried,
      all: [limitOfIt, k, reached, turned, acidLeft, ffaLeft, methanolCarried, waterCarried],
    };
  };
  const slow = band('slow', atSlow);
  const fast = band('fast', atFast);
  return {
    acid: { slow: slow.acidLeft, fast: fast.acidLeft },
    ffa: { slow: slow.ffaLeft, fast: fast.ffaLeft },
    methanolCarried: { slow: slow.methanolCarried, fast: fast.methanolCarried },
    waterCarried: { slow: slow.waterCarried, fast: fast.waterCarried },
    sulfuricCarried,
    all: [
      acidMass, ffaAtStart, methanolRule, acidRule, methanolPure, methanol, methanolVolume, sulfuricPure, sulfuric, sulfuricVolume, batchVolume, sulfuricPresent, sulfuricCarried,
      ...atSlow.all, ...(before ? atFast.all : []), ...slow.all, ...fast.all,
    ],
  };
}
