import { limit, quantity } from '../formula/quantity.js';
import type { Quantity } from '../formula/quantity.js';
import { kilogram, litre, percent } from '../formula/units.js';
import { FFA_DIGITS } from './acidity.js';
import { oilMass } from './oil.js';
import { PRACTICE, STOICHIOMETRY } from './sources.js';

// What a site allows itself, and what an oil beyond it would need.

const share = (key: string, symbol: string): Quantity =>
  quantity({
    key, symbol, unit: percent, cites: [PRACTICE], digits: FFA_DIGITS,
    limits: [limit('atLeast', '0', 'negative'), limit('atMost', '100', 'above-100-percent')],
  });

/** Highest FFA that goes straight to the base step. */
export const directLimit = share('directLimit', 'FFA_direct');
/** Highest FFA that the acid step takes. */
export const pretreatmentLimit = share('pretreatmentLimit', 'FFA_max');
/** FFA that the acid step must reach before the base step. */
export const pretreatmentTarget = share('pretreatmentTarget', 'FFA_target');
export const waterLimitBase = share('waterLimitBase', 'w_max,base');
export const waterLimitAcid = share('waterLimitAcid', 'w_max,acid');
/** Water in the whole base-step batch, brought and made, as a share of the oil. */
export const batchWaterLimit = share('batchWaterLimit', 'w_max,batch');
/** Soap made in the base step, as a share of the oil, that settling and washing still cope with. */
export const soapLimit = share('soapLimit', 'w_max,soap');
/** FFA of the clean oil that a site keeps for blending. */
export const cleanOilFfa = share('cleanOilFfa', 'FFA_clean');

/** The reaction vessel, and how much of it is filled. */
export const vesselVolume = quantity({
  key: 'vesselVolume', symbol: 'V_vessel', unit: litre,
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '10000000', 'out-of-range')],
});
export const vesselFill = share('vesselFill', 'φ_vessel');
export const vesselWorkingVolume = quantity({
  key: 'vesselWorkingVolume', symbol: 'V_work', unit: litre, cites: [PRACTICE], is: vesselVolume.times(vesselFill).in(litre),
});

/** Clean oil that brings the lot down to the direct limit: acid mixes by mass. Negative below the limit. */
export const blendOil = (freeFattyAcid: Quantity): Quantity =>
  quantity({
    key: 'blendOil', symbol: 'm_clean', unit: kilogram, cites: [STOICHIOMETRY],
    is: oilMass.times(freeFattyAcid.minus(directLimit)).per(directLimit.minus(cleanOilFfa)),
  });
