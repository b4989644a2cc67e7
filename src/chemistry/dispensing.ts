import { constant, named, nearest } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { limit, quantity } from '../formula/quantity.js';
import type { Quantity, QuantityDefinition } from '../formula/quantity.js';
import { kilogram, litre, molePerMole, percent } from '../formula/units.js';
import { catalystAssay, methanolInRest } from './catalyst.js';
import { methanolAssay, methanolDensity } from './methanol.js';
import type { RouteName } from './route-name.js';
import { STOICHIOMETRY } from './sources.js';
import { M_METHANOL } from './substances.js';

// What scales and meters can give: amounts in whole steps, and what the rounding changes.

/** The smallest step of the meter for methanol. */
export const methanolStep = quantity({
  key: 'methanolStep', symbol: 's_M', unit: litre, limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '10000', 'out-of-range')],
});
/** The smallest step of the scale for the catalyst. */
export const catalystStep = quantity({
  key: 'catalystStep', symbol: 's_cat', unit: kilogram, limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '10000', 'out-of-range')],
});
/** The smallest step of the scale for sulfuric acid. */
export const sulfuricStep = quantity({
  key: 'sulfuricStep', symbol: 's_S', unit: kilogram, limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '10000', 'out-of-range')],
});

type Dispensed = (name: string, symbol: string, is: Expression, more?: Partial<QuantityDefinition>) => Quantity;
const dispensed = (step: string): Dispensed => (name, symbol, is, more = {}) =>
  quantity({ key: `${step}.dispensed.${name}`, symbol, unit: kilogram, cites: [STOICHIOMETRY], ...more, is });

/** The base step's amounts in whole steps, and the methanol ratio and base load that they make. */
export function dispensedBase(route: RouteName): readonly Quantity[] {
  const make = dispensed(route);
  const of = (name: string): Expression => named(`${route}.${name}`);
  const methanolVolume = make('methanolVolume', 'V_M,s', nearest(of('methanolVolume'), methanolStep), { unit: litre });
  const catalyst = make('catalyst', 'm_cat,s', nearest(of('catalyst'), catalystStep));
  const brought = catalyst.times(constant('100', percent).minus(catalystAssay)).times(methanolInRest).in(kilogram);
  const methanolRatio = make('methanolRatio', 'r_s',
    methanolVolume.times(methanolDensity).times(methanolAssay).in(kilogram).plus(brought).per(M_METHANOL.times(of('glycerideAmount')).in(kilogram)).in(molePerMole),
    { unit: molePerMole, digits: { decimals: 2 } });
  const baseLoad = make('baseLoad', 'x_s',
    catalyst.times(catalystAssay).in(kilogram).minus(of('extraPure')).per(of('feedMass')).in(percent), { unit: percent, digits: { decimals: 3 } });
  return [methanolVolume, catalyst, methanolRatio, baseLoad];
}

/** An acid pass's amounts in whole steps. */
export function dispensedPass(pass: 1 | 2 | 3): readonly Quantity[] {
  const make = dispensed(`pass${pass}`);
  const of = (name: string): Expression => named(`pass${pass}.${name}`);
  return [
    make('methanolVolume', 'V_M,s', nearest(of('methanolVolume'), methanolStep), { unit: litre }),
    make('sulfuric', 'm_S,s', nearest(of('sulfuric'), sulfuricStep)),
  ];
}
