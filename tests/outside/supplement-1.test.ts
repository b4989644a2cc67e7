import { describe, expect, it } from 'vitest';
import { doublesOf } from '../../src/formula/doubles.js';
import type { Expression } from '../../src/formula/expression.js';
import { quantity } from '../../src/formula/quantity.js';
import type { Quantity } from '../../src/formula/quantity.js';
import { seededRandom } from '../../src/formula/random.js';
import { summedUp } from '../../src/formula/sampled.js';
import type { Sampled } from '../../src/formula/sampled.js';
import type { ErrorShape } from '../../src/formula/uncertainty-source.js';
import { one } from '../../src/formula/units.js';
import { evaluated } from '../formula/given.js';

// The worked examples of JCGM 101:2008 (Supplement 1 to the GUM), clause 9; figures from memory.

const DRAWS = 200_000;
const input = (key: string): Quantity => quantity({ key, symbol: key, unit: one });

type Input = readonly [quantity: Quantity, value: string, u: number, shape: ErrorShape];

/** The distribution of a model's result. */
function propagated(inputs: readonly Input[], model: Expression): Sampled {
  const values = Object.fromEntries(inputs.map(([{ key }, value]) => [key, value]));
  const { plan, findings } = evaluated([...inputs.map(([one]) => one), quantity({ key: 'y', symbol: 'y', unit: one, is: model })], values);
  const { draw } = doublesOf(plan, findings, ['y'], inputs.map(([{ key }]) => key));
  const random = seededRandom(1);
  const out = new Float64Array(1);
  return summedUp(Float64Array.from({ length: DRAWS }, () => {
    draw(Float64Array.from(inputs, ([, , u, shape]) => u * random.error(shape)), out);
    return out[0]!;
  }));
}

/** A quantity that lies evenly between two figures. */
const even = (quantity: Quantity, low: number, high: number): Input => [quantity, String((low + high) / 2), (high - low) / Math.sqrt(12), 'rectangular'];

describe('9.2, four quantities added', () => {
  const x = [1, 2, 3, 4].map((n) => input(`x${n}`));
  const sum = x.slice(1).reduce<Expression>((all, one) => all.plus(one), x[0]!);
  /** The ends of an interval scatter by √(p (1 − p)/n) over the density at the end; here by no more than 1 % of u. */
  const near = (found: number, stated: number, u: number): void => expect(Math.abs(found - stated)).toBeLessThan(0.03 * u);

  it.each<[string, ErrorShape, number, number, number]>([
    ['9.2.2, normal', 'normal', 1, 2.0, 3.92],
    ['9.2.3, rectangular', 'rectangular', 1, 2.0, 3.88],
    ['9.2.4, rectangular, one ten times as wide', 'rectangular', 10, 10.1, 17.0],
  ])('%s', (_, shape, last, u, end) => {
    const found = propagated(x.map((one, at) => [one, '0', at === 3 ? last : 1, shape]), sum);
    expect(Math.abs(found.mean)).toBeLessThan(4 * found.meanError);
    expect(Math.abs(found.u - u)).toBeLessThan(4 * found.uError + 0.05);
    near(found.symmetric[0], -end, found.u);
    near(found.symmetric[1], end, found.u);
  });
});

describe('9.3, calibration of a mass', () => {
  const [reference, added, air, weight, standard] = ['mR', 'dmR', 'ra', 'rW', 'rR'].map(input) as [Quantity, Quantity, Quantity, Quantity, Quantity];
  // δm = (m_R + δm_R) (1 + (ρ_a − 1.2) (1/ρ_W − 1/ρ_R)) − 100 000, in mg and kg/m³
  const buoyancy = air.minus('1.2').times(weight.power('-1').minus(standard.power('-1')));
  const model = reference.plus(added).times(buoyancy.plus('1')).minus('100000');
  const { mean, u, uError, shortest } = propagated(
    [[reference, '100000', 0.05, 'normal'], [added, '1.234', 0.02, 'normal'], even(air, 1.1, 1.3), even(weight, 7000, 9000), even(standard, 7950, 8050)],
    model,
  );

  it('finds the uncertainty that the first order misses: 0.0754 mg, not 0.0539 mg', () => {
    expect(mean).toBeCloseTo(1.234, 3);
    expect(Math.abs(u - 0.0754)).toBeLessThan(4 * uError + 0.00005);
  });

  it('and its shortest interval, 1.0834 to 1.3825 mg', () => {
    // the shortest interval of a flat-topped heap slides along it: its width is surer than its ends
    expect(Math.abs(shortest[1] - shortest[0] - (1.3825 - 1.0834))).toBeLessThan(0.02 * u * 2);
    expect(Math.abs(shortest[0] - 1.0834)).toBeLessThan(0.1 * u);
  });
});
