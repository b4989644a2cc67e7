import { named } from '../formula/expression.js';
import type { Expression, Operand } from '../formula/expression.js';
import { limit, quantity } from '../formula/quantity.js';
import type { Quantity, QuantityDefinition } from '../formula/quantity.js';
import { degreeCelsius, kelvin, kilojoule, kilojoulePerKilogramKelvin, kilojoulePerMole, mole } from '../formula/units.js';
import { CATALYST_PRODUCTS, catalyst, perProduct } from './catalyst.js';
import { methanolBoilingPoint, methanolTemperature } from './methanol.js';
import { oilMass } from './oil.js';
import type { RouteName } from './route-name.js';
import { ENERGY_BALANCE, HEAT_IN_WATER } from './sources.js';
import { M_SULFURIC } from './substances.js';

// How warm dissolving the catalyst in the methanol, or pouring in the sulfuric acid, would make the mixture if nothing were
// cooled and nothing lost. Published heats are those in water: a marker that says when to take care, not a prediction.

const evolved = (key: string): Quantity =>
  quantity({
    key, symbol: 'q', unit: kilojoulePerMole, digits: { decimals: 1 },
    limits: [limit('atLeast', '-500', 'out-of-range'), limit('atMost', '500', 'out-of-range')],
  });
/** Heat given off in dissolving a mole. For the methoxides and their solutions none is published: the site may have its own. */
export const heatOfSolution = perProduct(CATALYST_PRODUCTS, (product) => evolved(`${product}.heatOfSolution`));
export const sulfuricHeat = evolved('sulfuricHeat');
export const catalystHeat = quantity({
  key: 'catalystHeat', symbol: 'q_cat', unit: kilojoulePerMole, cites: [HEAT_IN_WATER], digits: { decimals: 1 }, is: catalyst.of(heatOfSolution),
});

const capacity = (key: string, symbol: string): Quantity =>
  quantity({
    key, symbol, unit: kilojoulePerKilogramKelvin, digits: { decimals: 2 }, limits: [limit('atLeast', '0.5', 'out-of-range'), limit('atMost', '5', 'out-of-range')],
  });
export const methanolHeatCapacity = capacity('methanolHeatCapacity', 'c_M');
export const oilHeatCapacity = capacity('oilHeatCapacity', 'c_oil');

const HEAT = { cites: [ENERGY_BALANCE, HEAT_IN_WATER], digits: { decimals: 0 } } as const;
const maker = (step: string) => (name: string, symbol: string, is: Operand, more: Partial<QuantityDefinition> = {}): Quantity =>
  quantity({ key: `heat.${step}.${name}`, symbol, unit: kelvin, ...HEAT, ...more, is });
/** Of a mass that counts as methanol: salt and acid store less heat, which is left out. */
const rise = (heat: Expression, mass: Expression): Expression => heat.per(mass.times(methanolHeatCapacity));
const endOf = (make: ReturnType<typeof maker>, by: Expression): readonly Quantity[] => {
  const reached = make('reached', 't_max', methanolTemperature.plus(by), { unit: degreeCelsius });
  return [reached, make('margin', 'Δt_boil', methanolBoilingPoint.minus(reached))];
};

/** Dissolving the base step's catalyst in its methanol. A margin below zero: it would come to the boil. */
export function methoxideHeat(route: RouteName): readonly Quantity[] {
  const make = maker(route);
  const heat = make('heat', 'Q', named(`${route}.catalystAmount`).times(catalystHeat), { unit: kilojoule });
  const by = make('rise', 'ΔT', rise(heat, named(`${route}.methanol`).plus(named(`${route}.catalyst`))));
  return [heat, by, ...endOf(make, by)];
}

/** The sulfuric acid of a pass: into its methanol alone, the worst order of mixing, and into methanol and oil together. */
export function sulfuricAcidHeat(pass: 1 | 2 | 3): readonly Quantity[] {
  const make = maker(`pass${pass}`);
  const [methanol, sulfuric] = [named(`pass${pass}.methanol`), named(`pass${pass}.sulfuric`)];
  const heat = make('heat', 'Q', named(`pass${pass}.sulfuricPure`).per(M_SULFURIC).in(mole).times(sulfuricHeat), { unit: kilojoule });
  const by = make('riseInMethanol', 'ΔT', rise(heat, methanol.plus(sulfuric)));
  const inBatch = make('riseInBatch', 'ΔT_batch', heat.per(methanol.plus(sulfuric).times(methanolHeatCapacity).plus(oilMass.times(oilHeatCapacity))));
  return [heat, by, inBatch, ...endOf(make, by)];
}
