import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Decimal } from '../../src/formula/decimal.js';
import { derivative } from '../../src/formula/derivative.js';
import { doublesOf } from '../../src/formula/doubles.js';
import { greatest, least, median, whereBelow } from '../../src/formula/expression.js';
import type { Expression } from '../../src/formula/expression.js';
import { Plan } from '../../src/formula/plan.js';
import type { Findings } from '../../src/formula/plan.js';
import { choice, quantity } from '../../src/formula/quantity.js';
import type { Quantity } from '../../src/formula/quantity.js';
import { isKnown } from '../../src/formula/reading.js';
import { Sheet } from '../../src/formula/sheet.js';
import { NotKnown } from '../../src/formula/trace.js';
import { gram, kilogram, one } from '../../src/formula/units.js';
import { evaluated, given } from './given.js';
import { randomSheet } from './random-sheet.js';
import { ROUND, RoundingOf } from './rounding.js';

const x = quantity({ key: 'x', symbol: 'x', unit: one });
const z = quantity({ key: 'z', symbol: 'z', unit: one });
const result = (is: Expression, key = 'y'): Quantity => quantity({ key, symbol: key, unit: one, is });

/** The wanted quantities with errors added to some. */
function drawn({ plan, findings }: { plan: Plan; findings: Findings }, wanted: readonly string[], errors: Readonly<Record<string, number>> = {}): number[] {
  const out = new Float64Array(wanted.length);
  doublesOf(plan, findings, wanted, Object.keys(errors)).draw(Float64Array.from(Object.values(errors)), out);
  return [...out];
}

const y = (is: Expression, values: Record<string, string>, errors: Record<string, number> = {}): number => drawn(evaluated([x, z, result(is)], values), ['y'], errors)[0]!;

describe('without errors', () => {
  /** Half a unit in the last of a double's 53 bits, against the rounding that the bounds are reckoned with; functions may be off by a few. */
  const COARSER = (4 * 2 ** -53) / ROUND;

  it('equals the decimals on random sheets, to twelve digits wherever doubles can keep them', { timeout: 60_000 }, () => {
    let sharp = 0;
    let compared = 0;
    fc.assert(
      fc.property(randomSheet, ({ entries, results, values, options }) => {
        const sheet = Sheet.define(entries);
        const plan = new Plan(sheet, results);
        const findings = plan.evaluate(given(values, options));
        const rounding = new RoundingOf(sheet, findings, 1);
        for (const key of results) {
          const outcome = findings.outcome(key);
          const { error } = rounding.quantity(key);
          const value = isKnown(outcome) ? outcome.toNumber() : NaN;
          if (!Number.isFinite(error)) continue;
          // every quantity disturbed, by nothing: so none is taken from the decimals but the inputs
          const none = Object.fromEntries(plan.order.filter((at) => isKnown(findings.outcome(at))).map((at) => [at, 0]));
          const off = Math.abs(drawn({ plan, findings }, [key], none)[0]! - value);
          const bound = error * COARSER;
          if (off > bound) expect.fail(`${key} is ${value} and off by ${off}; rounding explains ${bound}`);
          compared++;
          if (bound <= 1e-12 * Math.abs(value)) sharp++;
        }
      }),
      { numRuns: 300, seed: 20_260_301 },
    );
    expect(compared).toBeGreaterThan(500);
    expect(sharp / compared).toBeGreaterThan(0.95);
  });
});

describe('an error', () => {
  it('is added to the value of an input, of a result, or of what is wanted itself', () => {
    const u = result(x.times('2'), 'u');
    const run = evaluated([x, z, u, result(u.plus(z))], { x: '3', z: '1' });
    expect(drawn(run, ['y'], { x: 0.5 })).toEqual([8]);
    expect(drawn(run, ['y'], { u: 0.5 })).toEqual([7.5]);
    expect(drawn(run, ['y', 'u'], { x: 1, u: 10, z: 100, y: 1000 })).toEqual([1119, 18]);
  });

  it('that is small moves a result by its derivative', () => {
    const run = evaluated([x, z, result(x.power(z).per(x.plus(z)))], { x: '2', z: '1.5' });
    for (const input of ['x', 'z']) {
      const quotient = (drawn(run, ['y'], { [input]: 1e-6 })[0]! - drawn(run, ['y'], { [input]: -1e-6 })[0]!) / 2e-6;
      expect(quotient).toBeCloseTo((derivative(run.plan, run.findings, 'y', input) as Decimal).toNumber(), 8);
    }
  });

  it('that takes a figure over a corner changes the side', () => {
    expect(y(whereBelow(x, z, x.times('2'), x.times('7')), { x: '1', z: '3' }, { x: 3 })).toBe(28);
    expect(y(whereBelow(x, z, x.times('2'), x.times('7')), { x: '3', z: '3' }, { x: -1 })).toBe(4);
    expect(y(least(x, z), { x: '1', z: '3' }, { x: 5 })).toBe(3);
    expect(y(greatest(x, z), { x: '1', z: '3' }, { x: 5 })).toBe(6);
    expect(y(median([x, z, '2.5']), { x: '1', z: '3' }, { x: 8 })).toBe(3);
    expect(y(median([x, z]), { x: '1', z: '3' }, { x: 1 })).toBe(2.5);
  });

  it('does not change an option', () => {
    const route = choice('route', ['acid', 'base']);
    const run = evaluated([x, z, route, result(route.of({ acid: x.times('3'), base: z }))], { x: '2' }, { route: 'acid' });
    expect(drawn(run, ['y'], { x: 1 })).toEqual([9]);
  });

  it('stays in the draw it was made in', () => {
    const { plan, findings } = evaluated([x, z, result(x.times(z))], { x: '2', z: '3' });
    const doubles = doublesOf(plan, findings, ['y'], ['x']);
    const out = new Float64Array(1);
    const seen = [1, 0, -1].map((error) => (doubles.draw(Float64Array.of(error), out), out[0]));
    expect(seen).toEqual([9, 6, 3]);
  });
});

describe('a draw', () => {
  it('counts conversions', () => {
    const m = quantity({ key: 'm', symbol: 'm', unit: kilogram });
    const run = evaluated([m, quantity({ key: 'y', symbol: 'y', unit: gram, is: m.in(gram) })], { m: '3' });
    expect(drawn(run, ['y'], { m: 0.5 })).toEqual([3500]);
  });

  it('names all that the wanted ones rest on, and nothing else', () => {
    const { plan, findings } = evaluated([x, z, result(x.times('2'), 'u'), result(z, 'v'), result(x.plus('1'))], { x: '1', z: '1' });
    expect([...doublesOf(plan, findings, ['u'], []).rests].sort()).toEqual(['u', 'x']);
  });

  it('has no finite value where its formula has none', () => {
    expect(y(x.per(z), { x: '1', z: '2' }, { z: -2 })).toBe(Infinity);
    expect(y(z.power('0.5').times(x), { x: '1', z: '2' }, { z: -3 })).toBeNaN();
  });

  it('keeps to the branch whose figures are known', () => {
    const w = quantity({ key: 'w', symbol: 'w', unit: one });
    const run = evaluated([x, z, w, result(whereBelow(x, z, x.times('2'), w))], { x: '1', z: '3' });
    expect(drawn(run, ['y'], { x: 5 })).toEqual([12]);
  });

  it('of what is not known is refused', () => {
    const run = evaluated([x, z, result(x.plus(z))], { x: '1' });
    expect(() => drawn(run, ['y'])).toThrow(NotKnown);
  });
});
