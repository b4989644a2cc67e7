import { constant } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import { degreeCelsius, kilogram, kilogramPerCubicMetre, kilogramPerCubicMetreDegree, litre, milligramPerGram, one, percent } from '../formula/units.js';
import { LUND, OIL_EXPANSION, WATER_DENSITY } from './sources.js';

// The oil of a batch: how much, how dense, how wet.

export const oilAmountBy = choice('oilAmountBy', ['mass', 'volume']);
export const oilDensityBy = choice('oilDensityBy', ['typical', 'measured', 'lund']);

export const weighedOil = quantity({
  key: 'weighedOil', symbol: 'm_w', unit: kilogram,
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '10000000', 'out-of-range')],
});
export const oilVolumeGiven = quantity({
  key: 'oilVolumeGiven', symbol: 'V_w', unit: litre,
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '10000000', 'out-of-range')],
});
export const oilTemperature = quantity({
  key: 'oilTemperature', symbol: 't_oil', unit: degreeCelsius, digits: { decimals: 1 },
  limits: [limit('atLeast', '-20', 'out-of-range'), limit('atMost', '150', 'out-of-range')],
});

const densityLimits = [limit('atLeast', '800', 'out-of-range'), limit('atMost', '1000', 'out-of-range')];
export const typicalOilDensity = quantity({ key: 'typicalOilDensity', symbol: 'ρ_typ', unit: kilogramPerCubicMetre, limits: densityLimits });
export const measuredOilDensity = quantity({ key: 'measuredOilDensity', symbol: 'ρ_meas', unit: kilogramPerCubicMetre, limits: densityLimits });

export const saponificationValue = quantity({
  key: 'saponificationValue', symbol: 'SV', unit: milligramPerGram, digits: { decimals: 1 },
  limits: [limit('atLeast', '100', 'out-of-range'), limit('atMost', '300', 'out-of-range')],
});
export const iodineValue = quantity({
  key: 'iodineValue', symbol: 'IV', unit: one, digits: { decimals: 0 },
  limits: [limit('atLeast', '0', 'negative'), limit('atMost', '250', 'out-of-range')],
});

const SAPONIFICATION_SHARE = saponificationValue.per(constant('1', milligramPerGram));

export const oilDensity15 = quantity({
  key: 'oilDensity15', symbol: 'ρ_15', unit: kilogramPerCubicMetre, cites: [LUND, WATER_DENSITY], digits: { decimals: 1 },
  is: oilDensityBy.of({
    typical: typicalOilDensity,
    measured: measuredOilDensity,
    lund: constant('0.8475', one, { source: LUND })
      .plus(constant('0.00030', one, { source: LUND }).times(SAPONIFICATION_SHARE))
      .plus(constant('0.00014', one, { source: LUND }).times(iodineValue))
      .times(constant('999.1', kilogramPerCubicMetre, { source: WATER_DENSITY })),
  }),
});

/** Density at the oil's temperature: ρ(t) = ρ15 − 0.64 (t − 15). */
export const oilDensity = quantity({
  key: 'oilDensity', symbol: 'ρ_oil', unit: kilogramPerCubicMetre, cites: [OIL_EXPANSION], digits: { decimals: 1 },
  is: oilDensity15.minus(
    constant('0.64', kilogramPerCubicMetreDegree, { source: OIL_EXPANSION }).times(oilTemperature.minus(constant('15', degreeCelsius))),
  ),
});

export const oilMass = quantity({
  key: 'oilMass', symbol: 'm_oil', unit: kilogram, cites: [OIL_EXPANSION],
  is: oilAmountBy.of({ mass: weighedOil, volume: oilVolumeGiven.times(oilDensity).in(kilogram) }),
});

export const oilVolume = quantity({
  key: 'oilVolume', symbol: 'V_oil', unit: litre, cites: [OIL_EXPANSION],
  is: oilAmountBy.of({ mass: weighedOil.per(oilDensity).in(litre), volume: oilVolumeGiven }),
});

const share = (key: string, symbol: string) =>
  quantity({
    key, symbol, unit: percent, digits: { decimals: 2 },
    limits: [limit('atLeast', '0', 'negative'), limit('atMost', '100', 'above-100-percent')],
  });

export const waterContent = share('waterContent', 'w_water');
export const insolubles = share('insolubles', 'w_ins');

