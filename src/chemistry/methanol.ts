import { constant } from '../formula/expression.js';
import { limit, quantity } from '../formula/quantity.js';
import { degreeCelsius, gramPerMillilitre, gramPerMillilitreDegree, molePerMole, percent } from '../formula/units.js';
import { METHANOL_BOILING, METHANOL_DENSITY, METHANOL_RATIO } from './sources.js';

// Methanol as it is bought, and how much of it the base step gets.

export const methanolAssay = quantity({
  key: 'methanolAssay', symbol: 'w_M', unit: percent, digits: { decimals: 1 },
  limits: [limit('atLeast', '50', 'out-of-range'), limit('atMost', '100', 'above-100-percent')],
});

export const methanolTemperature = quantity({
  key: 'methanolTemperature', symbol: 't_M', unit: degreeCelsius, digits: { decimals: 1 },
  limits: [limit('atLeast', '-20', 'out-of-range'), limit('atMost', '60', 'out-of-range')],
});

/** °C, at 1 atm. */
export const METHANOL_BOILS_AT = '64.7';

export const methanolBoilingPoint = quantity({
  key: 'methanolBoilingPoint', symbol: 't_boil', unit: degreeCelsius, cites: [METHANOL_BOILING], digits: { decimals: 1 },
  is: constant(METHANOL_BOILS_AT, degreeCelsius, { source: METHANOL_BOILING }),
});

export const methanolDensity = quantity({
  key: 'methanolDensity', symbol: 'ρ_M', unit: gramPerMillilitre, cites: [METHANOL_DENSITY], digits: { decimals: 4 },
  is: constant('0.7913', gramPerMillilitre, { source: METHANOL_DENSITY }).minus(
    constant('0.00094', gramPerMillilitreDegree, { source: METHANOL_DENSITY }).times(methanolTemperature.minus(constant('20', degreeCelsius))),
  ),
});

/** Moles of methanol a mole of triglyceride in the base step; the reaction itself takes three. */
export const methanolRatio = quantity({
  key: 'methanolRatio', symbol: 'r', unit: molePerMole, cites: [METHANOL_RATIO], digits: { significant: 3 },
  limits: [limit('atLeast', '3', 'below-stoichiometric'), limit('atMost', '60', 'out-of-range')],
});
