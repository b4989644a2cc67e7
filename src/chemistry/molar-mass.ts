import { Decimal, decimal } from '../formula/decimal.js';
import type { Expression } from '../formula/expression.js';
import { constant } from '../formula/expression.js';
import { gramPerMole } from '../formula/units.js';
import { ATOMIC_WEIGHTS } from './sources.js';

/** IUPAC conventional atomic weights, g/mol. */
const ATOMIC_WEIGHT = {
  C: '12.011', H: '1.008', O: '15.999', K: '39.0983', Na: '22.98977', S: '32.06', P: '30.973762', Cl: '35.45',
} as const;

/** How many atoms of each element make one formula unit. */
export type Composition = Readonly<Partial<Record<keyof typeof ATOMIC_WEIGHT, number>>>;

/** Molar mass in g/mol, exact in the atomic weights: methanol, CH4O, is 32.042. */
export function molarMass(composition: Composition): Decimal {
  return Object.entries(composition).reduce(
    (sum, [element, count]) => sum.plus(decimal(ATOMIC_WEIGHT[element as keyof typeof ATOMIC_WEIGHT]).times(count)),
    new Decimal(0),
  );
}

/** A molar mass as a constant of a formula, printed as `M_…` in general and as its figure when worked out. */
export const molarMassOf = (composition: Composition, name: string): Expression =>
  constant(molarMass(composition).toString(), gramPerMole, { symbol: `M_${name}`, source: ATOMIC_WEIGHTS });
