import { constant } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import type { Quantity } from '../formula/quantity.js';
import { gram, gramPerKilogram, gramPerMole, millilitre, millimolePerGram, molePerLitre } from '../formula/units.js';
import { acidValueLike, acidValueOf } from './acidity.js';
import { catalyst, catalystMolarMass } from './catalyst.js';
import { AOCS_CC_17, EN_14104, STOICHIOMETRY, TWO_INDICATORS } from './sources.js';
import { titrantConcentration } from './titration.js';

// Checks of the finished ester: its acid value, and the soap and catalyst left in it.

const portion = (key: string, symbol: string): Quantity =>
  quantity({ key, symbol, unit: gram, limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '1000', 'out-of-range')] });
const reading = (key: string, symbol: string): Quantity =>
  quantity({ key, symbol, unit: millilitre, digits: { decimals: 2 }, limits: [limit('atLeast', '0', 'negative'), limit('atMost', '1000', 'out-of-range')] });
/** A titre less its blank. Nothing found is a good result, less than nothing is a slip. */
const net = (key: string, symbol: string, titre: Quantity, blank: Quantity): Quantity =>
  quantity({
    key, symbol, unit: millilitre, cites: [STOICHIOMETRY], digits: { decimals: 2 }, is: titre.minus(blank), limits: [limit('atLeast', '0', 'titre-below-blank', titre.key)],
  });

/** Whether the product's acid value comes from a titration here or from elsewhere. */
export const productAcidFrom = choice('productAcidFrom', ['titration', 'typed']);
export const productAcidTyped = quantity({
  key: 'productAcidTyped', symbol: 'AV_typed', ...acidValueLike,
  limits: [limit('atLeast', '0', 'negative'), limit('atMost', '935', 'out-of-range')],
});
export const productSample = portion('productSample', 'm_p');
export const productTitre = reading('productTitre', 'V_p');
export const productBlank = reading('productBlank', 'V_p0');
export const productNetTitre = net('after.productNetTitre', 'V_p,net', productTitre, productBlank);
/** Highest acid value of the finished ester. */
export const productAcidLimit = quantity({
  key: 'productAcidLimit', symbol: 'AV_max', ...acidValueLike,
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '935', 'out-of-range')],
});
/** With the titrant of the lot. */
export const productAcidValue = quantity({
  key: 'after.productAcidValue', symbol: 'AV_p', ...acidValueLike, cites: [EN_14104],
  is: productAcidFrom.of({ titration: acidValueOf(titrantConcentration.times(productNetTitre).per(productSample).in(millimolePerGram)), typed: productAcidTyped }),
});

export const soapSample = portion('soapSample', 'm_s');
/** Strength of the hydrochloric acid. */
export const soapTitrantStrength = quantity({
  key: 'soapTitrantStrength', symbol: 'c_HCl', unit: molePerLitre,
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '20', 'out-of-range')],
});
/** To the end of phenolphthalein: the catalyst. */
export const phenolphthaleinTitre = reading('phenolphthaleinTitre', 'A');
export const phenolphthaleinBlank = reading('phenolphthaleinBlank', 'A_0');
/** From there on to the end of bromophenol blue: the soap. */
export const bromophenolTitre = reading('bromophenolTitre', 'B');
export const bromophenolBlank = reading('bromophenolBlank', 'B_0');
export const catalystTitre = net('after.catalystTitre', 'A_net', phenolphthaleinTitre, phenolphthaleinBlank);
export const soapTitre = net('after.soapTitre', 'B_net', bromophenolTitre, bromophenolBlank);

const sodium = constant('304.4', gramPerMole, { source: AOCS_CC_17 });
const potassium = constant('320.56', gramPerMole, { source: TWO_INDICATORS });
/** Molar mass by which the method counts soap: as sodium or potassium oleate. */
export const soapMolarMass = quantity({
  key: 'soapMolarMass', symbol: 'M_soap', unit: gramPerMole, cites: [AOCS_CC_17, TWO_INDICATORS], digits: { decimals: 2 },
  is: catalyst.of({ KOH: potassium, NaOH: sodium, KOCH3: potassium, NaOCH3: sodium, 'KOCH3-solution': potassium, 'NaOCH3-solution': sodium }),
});

const found = (titre: Expression, molarMass: Expression): Expression => titre.times(soapTitrantStrength).times(molarMass).per(soapSample).in(gramPerKilogram);
/** As the alkali that was charged. */
export const catalystFound = quantity({
  key: 'after.catalystFound', symbol: 'w_cat', unit: gramPerKilogram, cites: [TWO_INDICATORS], digits: { significant: 3 }, is: found(catalystTitre, catalystMolarMass),
});
export const soapFound = quantity({
  key: 'after.soapFound', symbol: 'w_soap', unit: gramPerKilogram, cites: [TWO_INDICATORS, AOCS_CC_17], digits: { significant: 3 }, is: found(soapTitre, soapMolarMass),
});
