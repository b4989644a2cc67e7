import { constant, greatest, named } from '../formula/expression.js';
import type { Expression, Operand } from '../formula/expression.js';
import { limit, quantity } from '../formula/quantity.js';
import type { Quantity, QuantityDefinition } from '../formula/quantity.js';
import { degreeCelsius, gramPerMillilitre, hour, kilogram, litre, minute, mole, percent } from '../formula/units.js';
import { conversion } from './base-charge.js';
import { catalystAssay, catalystMolarMass, methanolInRest, soapGain, waterInRest, waterPerCatalyst } from './catalyst.js';
import { acidVolumeOf, neutralisingAssay, neutralisingEquivalents, neutralisingMolarMass, splittingEquivalents } from './neutralising.js';
import { METHANOL_BOILS_AT, methanolAssay, methanolDensity } from './methanol.js';
import { insolubles, oilDensity, oilMass, oilVolume } from './oil.js';
import type { RouteName } from './route-name.js';
import { PRACTICE, STOICHIOMETRY } from './sources.js';
import { M_METHANOL, M_SULFURIC } from './substances.js';

// What is in the vessel after the base step, the catalyst neutralised, and how it settles into two layers.

/** The hold of the base step, as the site runs it. */
export const reactionTemperature = quantity({
  key: 'reactionTemperature', symbol: 't_r', unit: degreeCelsius, digits: { decimals: 1 },
  limits: [limit('atLeast', '0', 'out-of-range'), limit('below', METHANOL_BOILS_AT, 'above-boiling-point')],
});
export const reactionTime = quantity({
  key: 'reactionTime', symbol: 't_hold', unit: minute, digits: { decimals: 0 },
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '10000', 'out-of-range')],
});
export const settlingTime = quantity({
  key: 'settlingTime', symbol: 't_settle', unit: hour, digits: { decimals: 0 },
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '10000', 'out-of-range')],
});

/** Share of the methanol left that settles with the glycerol. */
export const methanolInLower = quantity({
  key: 'methanolInLower', symbol: 'φ_M,low', unit: percent, digits: { decimals: 0 },
  limits: [limit('atLeast', '0', 'negative'), limit('atMost', '100', 'above-100-percent')],
});

const density = (key: string, symbol: string): Quantity =>
  quantity({
    key, symbol, unit: gramPerMillilitre, digits: { decimals: 3 },
    limits: [limit('atLeast', '0.5', 'out-of-range'), limit('atMost', '3', 'out-of-range')],
  });
export const esterDensity = density('esterDensity', 'ρ_E');
export const glycerolDensity = density('glycerolDensity', 'ρ_gly');
/** Of water, and of the soap dissolved beside it. */
export const waterDensity = density('waterDensity', 'ρ_H2O');
/** Of the catalyst's salt and what else is solid, as it adds to the volume of the lower layer. */
export const saltDensity = density('saltDensity', 'ρ_salt');

/**
 * Neutralising what the base step leaves of its catalyst, and the layers after it. The extra is spent on acid, so the base
 * load is what is left, as methoxide: a proton gives its methanol back, and the water of a hydroxide is already counted as made.
 *
 * @param route prefix of the base step's keys
 * @param methanolInFeed methanol that the oil brings from the acid step, mol
 */
export function afterReaction(route: RouteName, methanolInFeed: Expression): readonly Quantity[] {
  const make = (name: string, symbol: string, is: Operand, more: Partial<QuantityDefinition> = {}): Quantity =>
    quantity({ key: `after.${route}.${name}`, symbol, unit: kilogram, cites: [STOICHIOMETRY], ...more, is });
  const of = (name: string): Expression => named(`${route}.${name}`);
  const asBought = (amount: Expression): Expression => amount.times(neutralisingMolarMass).per(neutralisingAssay).in(kilogram);
  const volumeOf = (mass: Expression): Expression => acidVolumeOf((ofAcid) => mass.per(ofAcid).in(litre), constant('0', litre));
  const rest = (mass: Expression, assay: Expression): Expression => mass.times(constant('100', percent).minus(assay)).in(kilogram);

  const catalystLeft = make('catalystLeft', 'n_left', of('basePure').per(catalystMolarMass).in(mole), { unit: mole });
  const acidAmount = make('acidAmount', 'n_a', catalystLeft.per(neutralisingEquivalents), { unit: mole });
  const acidPure = make('acidPure', 'm_a', acidAmount.times(neutralisingMolarMass).in(kilogram));
  const acid = make('acid', 'm_a/w', asBought(acidAmount));
  const acidVolume = make('acidVolume', 'V_a', volumeOf(acid), { unit: litre });
  // where the soap is split, the catalyst's salt is as sour as the soap's acid: both count by what the acid gives off there
  const splitAmount = make('splitAmount', 'n_split', catalystLeft.plus(of('acid')).per(splittingEquivalents).minus(acidAmount), { unit: mole });
  const splitAcid = make('splitAcid', 'm_split/w', asBought(splitAmount));
  const splitVolume = make('splitVolume', 'V_split', volumeOf(splitAcid), { unit: litre });

  const salt = make('salt', 'm_salt', acidPure.plus(catalystLeft.times(soapGain).in(kilogram)));
  const sulfate = make('sulfate', 'm_SO4', of('sulfuricAcid').times(M_SULFURIC.plus(constant('2').times(soapGain))).in(kilogram));
  const water = make('water', 'm_H2O', of('waterInBatch').plus(rest(acid, neutralisingAssay)));
  const methanolLeft = make('methanolLeft', 'm_M,left',
    of('methanol').times(methanolAssay).in(kilogram)
      .plus(of('methanolFromCatalyst'))
      .plus(methanolInFeed
        // a hydroxide makes water where a methoxide gives methanol
        .plus(of('catalystAmount').times(constant('1').minus(waterPerCatalyst)))
        .minus(constant('3').times(of('glycerideAmount')).times(conversion).in(mole))
        .times(M_METHANOL).in(kilogram)));
  const glyceridesLeft = make('glyceridesLeft', 'm_TG,left', of('glycerideAmount').times(constant('100', percent).minus(conversion)).times(named('glycerideMolarMass')).in(kilogram));
  const solids = make('solids', 'm_sol',
    insolubles.times(oilMass).in(kilogram)
      .plus(rest(of('catalyst'), catalystAssay).times(constant('100', percent).minus(methanolInRest).minus(waterInRest)).in(kilogram)));
  const ester = make('ester', 'm_E,up', greatest(constant('0', kilogram), of('ester').minus(of('esterEntrained'))), { cites: [PRACTICE, STOICHIOMETRY] });
  const methanolLower = make('methanolLower', 'm_M,low', methanolInLower.times(methanolLeft).in(kilogram), { cites: [PRACTICE] });
  const methanolUpper = methanolLeft.minus(methanolLower);
  const esterLower = of('ester').minus(ester);

  const layer = { cites: [PRACTICE, STOICHIOMETRY] };
  const litres = (mass: Expression, ofIt: Expression): Expression => mass.per(ofIt).in(litre);
  const upperMass = make('upperMass', 'm_up', ester.plus(glyceridesLeft).plus(methanolUpper), layer);
  const upperVolume = make('upperVolume', 'V_up',
    litres(ester, esterDensity).plus(litres(glyceridesLeft, oilDensity)).plus(litres(methanolUpper, methanolDensity)), { unit: litre, ...layer });
  const lowerMass = make('lowerMass', 'm_low',
    of('glycerol').plus(methanolLower).plus(water).plus(of('soap')).plus(esterLower).plus(salt).plus(sulfate).plus(solids), layer);
  const lowerVolume = make('lowerVolume', 'V_low',
    litres(of('glycerol'), glycerolDensity)
      .plus(litres(methanolLower, methanolDensity))
      .plus(litres(water.plus(of('soap')), waterDensity))
      .plus(litres(esterLower, esterDensity))
      .plus(litres(salt.plus(sulfate).plus(solids), saltDensity)), { unit: litre, ...layer });
  const lowerShare = make('lowerShare', 'φ_low', lowerVolume.per(oilVolume).in(percent), { unit: percent, ...layer, digits: { significant: 2 } });

  return [
    catalystLeft, acidAmount, acidPure, acid, acidVolume, splitAmount, splitAcid, splitVolume, salt, sulfate, water, methanolLeft, glyceridesLeft, solids, ester,
    methanolLower, upperMass, upperVolume, lowerMass, lowerVolume, lowerShare,
  ];
}
