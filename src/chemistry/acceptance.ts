import { limit, quantity } from '../formula/quantity.js';
import type { Quantity } from '../formula/quantity.js';
import { degreeCelsius, percent } from '../formula/units.js';
import { FFA_DIGITS } from './acidity.js';

// What a site asks of a delivery, beside the limits of its routes. None of it has a usual value: what a site leaves out it does not ask.

const share = (key: string, symbol: string): Quantity =>
  quantity({ key, symbol, unit: percent, digits: FFA_DIGITS, limits: [limit('atLeast', '0', 'negative'), limit('atMost', '100', 'above-100-percent')] });

/** Highest FFA of an oil that the site takes to blend it down. */
export const blendingLimit = share('blendingLimit', 'FFA_blend');
/** Highest water and insolubles of a delivery. */
export const acceptedWater = share('acceptedWater', 'w_accept');
export const acceptedInsolubles = share('acceptedInsolubles', 'w_accept,ins');

const temperature = (key: string, symbol: string): Quantity =>
  quantity({ key, symbol, unit: degreeCelsius, digits: { decimals: 0 }, limits: [limit('atLeast', '-50', 'out-of-range'), limit('atMost', '200', 'out-of-range')] });

/** Of the oil as it is delivered, and the range in which the site takes it: hot oil burns and gives off vapour, cold oil does not flow. */
export const arrivalTemperature = temperature('arrivalTemperature', 't_arrival');
export const lowestArrival = temperature('lowestArrival', 't_min');
export const highestArrival = temperature('highestArrival', 't_max');
