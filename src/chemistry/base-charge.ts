import { constant, greatest } from '../formula/expression.js';
import type { Expression, Operand } from '../formula/expression.js';
import { limit, quantity } from '../formula/quantity.js';
import type { Quantity, QuantityDefinition } from '../formula/quantity.js';
import { gramPerKilogram, gramPerLitre, kilogram, kilogramPerKilogram, litre, mole, percent } from '../formula/units.js';
import { acidMolarMass } from './acidity.js';
import { catalyst, catalystAssay, catalystBaseLoad, catalystMolarMass, methanolInRest, soapGain, solutionDensity, waterInRest, waterPerCatalyst } from './catalyst.js';
import type { Glycerides } from './glycerides.js';
import { methanolAssay, methanolDensity, methanolRatio } from './methanol.js';
import { oilDensity, oilMass, oilVolume } from './oil.js';
import type { RouteName } from './route-name.js';
import { PRACTICE, STOICHIOMETRY } from './sources.js';
import { M_GLYCEROL, M_METHANOL, M_METHYLENE, M_WATER } from './substances.js';

/** Share of the glycerides expected to become ester. */
export const conversion = quantity({
  key: 'conversion', symbol: 'X', unit: percent, cites: [PRACTICE], digits: { decimals: 1 },
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '100', 'above-100-percent')],
});

/** Ester that the soap carries into the lower layer, kilogram a kilogram of soap. */
export const entrainedEster = quantity({
  key: 'entrainedEster', symbol: 'e', unit: kilogramPerKilogram, cites: [PRACTICE],
  limits: [limit('atLeast', '0', 'negative'), limit('atMost', '10', 'out-of-range')],
});

/** What the base step starts from. */
export interface BaseFeed {
  /** Mass of the oil charged, kg. */
  readonly mass: Expression;
  /** Free fatty acid in it, mol. */
  readonly acid: Expression;
  /** Sulfuric acid left in it and not already counted by a titration, mol. */
  readonly sulfuricAcid: Expression;
  /** Water in it, kg. */
  readonly water: Expression;
  /** Ester in it, kg. */
  readonly ester: Expression;
}

/**
 * The base step: base-catalysed transesterification of an oil that still holds some acid. The
 * catalyst is worked out pure, as a base load that drives the reaction and an extra that the acid
 * spends, and the **sum** is divided by the assay.
 *
 * @param route prefix of the keys
 */
export function baseCharge(route: RouteName, feed: BaseFeed, { content, acidMolarMass: meanAcid }: Glycerides): readonly Quantity[] {
  const make = (name: string, symbol: string, is: Operand, more: Partial<QuantityDefinition> = {}): Quantity =>
    quantity({ key: `${route}.${name}`, symbol, unit: kilogram, cites: [STOICHIOMETRY], ...more, is });
  const assayed = (pure: Expression): Expression => pure.per(catalystAssay).in(kilogram);
  const restOf = (product: Expression): Expression => product.times(constant('100', percent).minus(catalystAssay));

  const feedMass = make('feedMass', 'm_feed', feed.mass);
  const acid = make('acid', 'n_acid', feed.acid, { unit: mole });
  const sulfuricAcid = make('sulfuricAcid', 'n_H2SO4', feed.sulfuricAcid, { unit: mole });

  const basePure = make('basePure', 'm_base', catalystBaseLoad.times(feedMass).in(kilogram), { cites: [PRACTICE] });
  const acidPure = make('acidPure', 'm_acid', acid.times(catalystMolarMass).in(kilogram));
  const mineralPure = make('mineralPure', 'm_mineral', constant('2').times(sulfuricAcid).times(catalystMolarMass).in(kilogram));
  const extraPure = make('extraPure', 'm_extra', acidPure.plus(mineralPure));
  const baseProduct = make('baseProduct', 'm_base/w', assayed(basePure));
  const extraProduct = make('extraProduct', 'm_extra/w', assayed(extraPure));
  const mineralProduct = make('mineralProduct', 'm_mineral/w', assayed(mineralPure));
  const catalystProduct = make('catalyst', 'm_cat', assayed(basePure.plus(extraPure)));
  const density = (product: keyof typeof solutionDensity): Expression => catalystProduct.per(solutionDensity[product]).in(litre);
  const catalystVolume = make('catalystVolume', 'V_cat', catalyst.of({
    KOH: constant('0', litre), NaOH: constant('0', litre), KOCH3: constant('0', litre), NaOCH3: constant('0', litre),
    'KOCH3-solution': density('KOCH3-solution'), 'NaOCH3-solution': density('NaOCH3-solution'),
  }), { unit: litre });
  const perLitre = make('catalystPerLitre', 'm_cat/V_oil', catalystProduct.per(oilVolume).in(gramPerLitre), { unit: gramPerLitre });
  const perKilogram = make('catalystPerKilogram', 'm_cat/m_oil', catalystProduct.per(oilMass).in(gramPerKilogram), { unit: gramPerKilogram });

  const glycerideAmount = make('glycerideAmount', 'n_TG', content.times(oilMass), { unit: mole });
  const methanolNeeded = make('methanolNeeded', 'm_M', methanolRatio.times(glycerideAmount).times(M_METHANOL).in(kilogram));
  const methanolFromCatalyst = make('methanolFromCatalyst', 'm_M,cat', restOf(catalystProduct).times(methanolInRest).in(kilogram));
  const methanol = make('methanol', 'm_MeOH', greatest(constant('0', kilogram), methanolNeeded.minus(methanolFromCatalyst).per(methanolAssay).in(kilogram)));
  const methanolVolume = make('methanolVolume', 'V_MeOH', methanol.per(methanolDensity).in(litre), { unit: litre });

  const batchVolume = make('batchVolume', 'V_batch', feedMass.per(oilDensity).in(litre).plus(methanolVolume).plus(catalystVolume), { unit: litre });
  // against what the methanol can dissolve, whether it comes with the catalyst or apart
  const inMethanol = make('catalystInMethanol', 'γ_cat', basePure.plus(extraPure).per(methanolNeeded.per(methanolDensity)).in(gramPerLitre), { unit: gramPerLitre });
  const catalystAmount = make('catalystAmount', 'n_cat', basePure.plus(extraPure).per(catalystMolarMass).in(mole), { unit: mole });
  const waterMade = make('waterMade', 'm_H2O,made', catalystAmount.times(waterPerCatalyst).times(M_WATER).in(kilogram));
  const waterBrought = make('waterBrought', 'm_H2O,in',
    feed.water
      .plus(restOf(catalystProduct).times(waterInRest).in(kilogram))
      .plus(methanol.times(constant('100', percent).minus(methanolAssay)).in(kilogram)));
  const waterInBatch = make('waterInBatch', 'm_H2O', waterMade.plus(waterBrought));
  const waterShare = make('waterShare', 'w_H2O', waterInBatch.per(feedMass).in(percent), { unit: percent });

  const soap = make('soap', 'm_soap', acid.times(acidMolarMass.plus(soapGain)).in(kilogram));
  const soapShare = make('soapShare', 'w_soap', soap.per(feedMass).in(percent), { unit: percent, digits: { significant: 3 } });
  const acidToSoap = make('acidToSoap', 'm_FFA', acid.times(acidMolarMass).in(kilogram));
  const esterEntrained = make('esterEntrained', 'm_ent', entrainedEster.times(soap), { cites: [PRACTICE] });
  const oilLost = make('oilLost', 'm_lost', acidToSoap.plus(esterEntrained), { cites: [PRACTICE, STOICHIOMETRY] });

  const esterMade = make('esterMade', 'm_E,made',
    constant('3').times(glycerideAmount).times(conversion).times(meanAcid.plus(M_METHYLENE)).in(kilogram));
  const ester = make('ester', 'm_ester', esterMade.plus(feed.ester));
  const glycerol = make('glycerol', 'm_gly', glycerideAmount.times(conversion).times(M_GLYCEROL).in(kilogram));

  return [
    feedMass, acid, sulfuricAcid, basePure, acidPure, mineralPure, extraPure, baseProduct, extraProduct, mineralProduct, catalystProduct,
    catalystVolume, perLitre, perKilogram, glycerideAmount, methanolNeeded, methanolFromCatalyst, methanol, methanolVolume,
    batchVolume, inMethanol, catalystAmount, waterMade, waterBrought, waterInBatch, waterShare, soap, soapShare, acidToSoap, esterEntrained, oilLost, esterMade, ester, glycerol,
  ];
}
