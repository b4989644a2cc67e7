import { constant, exponential } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { limit, quantity } from '../formula/quantity.js';
import type { Quantity } from '../formula/quantity.js';
import { degreeCelsius, joulePerMole, joulePerMoleKelvin, kelvin, minute, one, perMinute, percent } from '../formula/units.js';
import { METHANOL_BOILS_AT } from './methanol.js';
import { ESTERIFICATION_EQUILIBRIUM, ESTERIFICATION_RATE, GAS_CONSTANT, PRACTICE, WATER_INHIBITION } from './sources.js';

// How far the acid step gets: an equilibrium and a first-order approach to it. Published results
// differ tenfold in time scale, so the figures are a band between a slow and a fast end.

/** The two ends of the band. Plans use the slow one. */
export const PACES = ['slow', 'fast'] as const;
export type Pace = (typeof PACES)[number];

export const pretreatmentTemperature = quantity({
  key: 'pretreatmentTemperature', symbol: 't_est', unit: degreeCelsius, cites: [PRACTICE], digits: { decimals: 1 },
  limits: [limit('atLeast', '0', 'out-of-range'), limit('below', METHANOL_BOILS_AT, 'above-boiling-point')],
});
export const pretreatmentTime = quantity({
  key: 'pretreatmentTime', symbol: 't_min', unit: minute, cites: [PRACTICE], digits: { decimals: 0 },
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '10000', 'out-of-range')],
});

const pureAbove = (key: string, symbol: string, source = ESTERIFICATION_RATE): Quantity =>
  quantity({ key, symbol, unit: one, cites: [source], limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '1000', 'out-of-range')] });

export const equilibrium: Readonly<Record<Pace, Quantity>> = {
  slow: pureAbove('esterification.equilibriumSlow', 'K_slow', ESTERIFICATION_EQUILIBRIUM),
  fast: pureAbove('esterification.equilibriumFast', 'K_fast', ESTERIFICATION_EQUILIBRIUM),
};
const rate = (key: string, symbol: string): Quantity =>
  quantity({ key, symbol, unit: perMinute, cites: [ESTERIFICATION_RATE], limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '100', 'out-of-range')] });
/** Rate constants at 60 °C and 5 % acid on FFA. */
export const rateAt60: Readonly<Record<Pace, Quantity>> = {
  slow: rate('esterification.rateSlow', 'k_60,slow'),
  fast: rate('esterification.rateFast', 'k_60,fast'),
};
export const loadExponent = pureAbove('esterification.loadExponent', 'n_a');
export const waterExponent = pureAbove('esterification.waterExponent', 'n_W', WATER_INHIBITION);
export const activationEnergy = quantity({
  key: 'esterification.activationEnergy', symbol: 'E_a', unit: joulePerMole, cites: [ESTERIFICATION_RATE], digits: { significant: 5 },
  limits: [limit('atLeast', '0', 'negative'), limit('atMost', '200000', 'out-of-range')],
});

const ZERO_CELSIUS = constant('273.15', kelvin);

/** Arrhenius factor between the temperature of the step and 60 °C. */
export const temperatureFactor = quantity({
  key: 'esterification.temperatureFactor', symbol: 'f_T', unit: one, cites: [ESTERIFICATION_RATE],
  is: exponential(
    activationEnergy
      .per(constant('8.314462618', joulePerMoleKelvin, { symbol: 'R', source: GAS_CONSTANT }))
      .times(constant('1').per(constant('333.15', kelvin)).minus(constant('1').per(pretreatmentTemperature.plus(ZERO_CELSIUS)))),
  ),
});

/** Share of the acid esterified at equilibrium: K(1−x)(R−x) = x(W+x), solved for x. */
export function equilibriumConversion(k: Expression, methanolPerAcid: Expression, waterPerAcid: Expression): Expression {
  const sum = k.times(constant('1').plus(methanolPerAcid)).plus(waterPerAcid);
  const root = sum.power('2').minus(constant('4').times(k.minus('1')).times(k).times(methanolPerAcid)).power('0.5');
  // the root in the form that loses no digits and needs no case for K = 1
  return constant('2').times(k).times(methanolPerAcid).per(sum.plus(root));
}

/** What turns a rate constant at 60 °C and 5 % acid into that of the step: f_T · (a/5 %)^n · (1 + W)^−m. */
export function rateFactorOf(acidLoad: Expression, waterPerAcid: Expression): Expression {
  return temperatureFactor
    .times(acidLoad.per(constant('5', percent)).power(loadExponent))
    .per(constant('1').plus(waterPerAcid).power(waterExponent));
}

/** First order towards equilibrium: x(t) = x_eq (1 − exp(−k t / x_eq)), written with 1/exp(…). */
export function conversionAfter(atEquilibrium: Expression, k: Expression): Expression {
  return atEquilibrium.times(constant('1').minus(constant('1').per(exponential(k.times(pretreatmentTime).per(atEquilibrium)))));
}
