import { describe, expect, it } from 'vitest';
import { MOST_PASSES, passesNeeded } from '../../src/decision/passes.js';
import { Decimal } from '../../src/formula/decimal.js';
import { Missing, Refused } from '../../src/formula/reading.js';
import type { Outcome } from '../../src/formula/reading.js';
import { certified, numberIn, read, site, valueIn } from '../lot/lot.js';

describe('the passes of the acid step', () => {
  const after = (...left: readonly (string | Outcome)[]) => (pass: number): Outcome => {
    const outcome = left[pass - 1]!;
    return typeof outcome === 'string' ? new Decimal(outcome) : outcome;
  };
  const target = new Decimal('1.0');

  it.each([
    [['0.9', '0.1', '0.01'], '1'],
    [['1.0', '0.1', '0.01'], '1'], // at the target
    [['1.0000000000000000000000000000000001', '0.1', '0.01'], '1'], // the rounding of the last digit is no second pass
    [['1.01', '0.5', '0.1'], '2'],
    [['9', '2', '0.5'], '3'],
    [['9', '5', '3'], '3'], // and no more than three, reached or not
  ] as const)('%j left: %s', (left, passes) => {
    expect(passesNeeded(after(...left), target)).toBe(passes);
  });

  it('are not looked further than needed', () => {
    const asked: number[] = [];
    passesNeeded((pass) => {
      asked.push(pass);
      return new Decimal('0.5');
    }, target);
    expect(asked).toEqual([1]);
  });

  it('are not known while what is left or the target is not', () => {
    const missing = new Missing(['titrantStrength']);
    const refused = new Refused({ code: 'negative', quantity: 'pretreatmentTarget' });
    expect(passesNeeded(after(missing, missing, missing), target)).toBe(missing);
    expect(passesNeeded(after('0.1', '0.1', '0.1'), refused)).toBe(refused);
  });
});

describe('the passes of a lot', () => {
  const counted = (ffa: string, target: string) => {
    const reading = read(certified(ffa), site({ figures: { pretreatmentTarget: `${target} %` } }));
    return { reading, passes: reading.charges.twoStep.filter(({ step }) => step === 'acid').length };
  };

  it.each([['5', '1.0'], ['20', '1.0'], ['35', '1.0'], ['20', '0.1'], ['20', '3.0'], ['1', '0.0001']])('FFA %s %%, target %s %%: the fewest that the slow end asks for', (ffa, target) => {
    const { reading, passes } = counted(ffa, target);
    const left = (pass: number) => numberIn(reading, `pass${pass}.ffaLeft.slow`);
    if (passes < MOST_PASSES) expect(left(passes)).toBeLessThanOrEqual(Number(target));
    if (passes > 1) expect(left(passes - 1)).toBeGreaterThan(Number(target));
    expect(reading.readings[`pass${passes + 1}.methanol`]).toBeUndefined();
    expect(valueIn(reading, 'pretreated.ffaLeft.slow').eq(valueIn(reading, `pass${passes}.ffaLeft.slow`))).toBe(true);
    // a target that is missed is said to be
    expect(reading.notices.some(({ code }) => code === 'target-not-reached')).toBe(left(passes) > Number(target));
  });

  it('stop at the very target', () => {
    const { reading } = counted('20', '1.0');
    const left = reading.readings['pass1.ffaLeft.slow']?.value ?? '';
    expect(counted('20', left).passes).toBe(1);
  });

  it('each take fresh methanol and acid for the acid that is left, and are retested at the end', () => {
    const { reading, passes } = counted('20', '0.0001');
    expect(passes).toBe(3);
    for (const pass of [2, 3]) {
      const before = valueIn(reading, `pass${pass - 1}.acidLeft.slow`);
      const grams = before.times(valueIn(reading, `pass${pass}.methanolRule`)).times('32.042');
      expect(valueIn(reading, `pass${pass}.methanolPure`).times(1000).minus(grams).abs().lt('1e-20')).toBe(true);
    }
    const steps = reading.charges.twoStep.map(({ lines }) => lines.map(({ what }) => what));
    expect(steps.map((what) => what.includes('retest'))).toEqual([false, false, true, false]);
    expect(steps.map((what) => what.includes('settle'))).toEqual([true, true, true, false]);
  });
});
