import type { Expression } from '../formula/expression.js';
import { constant, greatest } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import type { Choice, Quantity } from '../formula/quantity.js';
import { currency, currencyPerTonne, currencyPerTonnePerPercent, kilogram, percent } from '../formula/units.js';
import { insolubles, oilMass, waterContent } from './oil.js';
import { oilPrice } from './prices.js';
import { SETTLEMENT } from './sources.js';

// What a delivery is paid: the price less a deduction for each per cent above what is allowed. Base, allowances and rates are the
// contract's; there is no standard for them, and none has a usual value.

const allowed = (key: string, symbol: string): Quantity =>
  quantity({ key, symbol, unit: percent, digits: { decimals: 2 }, limits: [limit('atLeast', '0', 'negative'), limit('atMost', '100', 'above-100-percent')] });
const rate = (key: string, symbol: string): Quantity =>
  quantity({ key, symbol, unit: currencyPerTonnePerPercent, limits: [limit('atLeast', '0', 'negative'), limit('atMost', '1000000000', 'out-of-range')] });

export const baseFfa = allowed('settlement.baseFfa', 'FFA_base');
export const waterAllowance = allowed('settlement.waterAllowance', 'w_free');
export const insolublesAllowance = allowed('settlement.insolublesAllowance', 'w_free,ins');
export const ffaRate = rate('settlement.ffaRate', 'k_FFA');
export const waterRate = rate('settlement.waterRate', 'k_w');
export const insolublesRate = rate('settlement.insolublesRate', 'k_ins');

/** What is paid for: the load as it came, or without its water and insolubles. */
export const settledBy = choice('settledBy', ['as-delivered', 'without-water-and-insolubles']);
export const settledMass = quantity({
  key: 'settlement.mass', symbol: 'm_paid', unit: kilogram, cites: [SETTLEMENT],
  is: settledBy.of({
    'as-delivered': oilMass,
    'without-water-and-insolubles': oilMass.times(constant('100', percent).minus(waterContent).minus(insolubles)).in(kilogram),
  }),
});

/** Whether the contract has a rate: without one nothing is deducted. */
const given = {
  ffa: choice('priced.settlement.ffaRate', ['yes', 'no']),
  water: choice('priced.settlement.waterRate', ['yes', 'no']),
  insolubles: choice('priced.settlement.insolublesRate', ['yes', 'no']),
};
export const settlementChoices: readonly Choice[] = Object.values(given).map((one): Choice => one);

const NOTHING = constant('0', currencyPerTonne);
const NONE = constant('0', percent);

function deduction(key: string, symbol: string, when: Choice<'yes' | 'no'>, per: Quantity, found: Expression, free: Quantity): Quantity {
  return quantity({
    key, symbol, unit: currencyPerTonne, cites: [SETTLEMENT], digits: { decimals: 2 },
    is: when.of({ yes: per.times(greatest(found.minus(free), NONE)), no: NOTHING }),
  });
}

/** The deductions and the payment, for the free fatty acid of the oil as it came. */
export function settlement(freeFattyAcid: Quantity): readonly (Quantity | Choice)[] {
  const ffa = deduction('settlement.ffaDeduction', 'd_FFA', given.ffa, ffaRate, freeFattyAcid, baseFfa);
  const water = deduction('settlement.waterDeduction', 'd_w', given.water, waterRate, waterContent, waterAllowance);
  const dirt = deduction('settlement.insolublesDeduction', 'd_ins', given.insolubles, insolublesRate, insolubles, insolublesAllowance);
  const price = quantity({
    key: 'settlement.price', symbol: 'p_paid', unit: currencyPerTonne, cites: [SETTLEMENT], digits: { decimals: 2 },
    is: oilPrice.minus(ffa).minus(water).minus(dirt),
  });
  const amount = quantity({
    key: 'settlement.amount', symbol: 'P', unit: currency, cites: [SETTLEMENT], digits: { decimals: 2 }, is: price.times(settledMass).in(currency),
  });
  return [ffa, water, dirt, price, amount];
}
