import { describe, expect, it } from 'vitest';
import { CAUTIONS, directCharge, twoStepCharge } from '../../src/decision/charge.js';
import type { ChargeStep } from '../../src/decision/charge.js';

const order = ({ lines }: ChargeStep) => lines.map(({ what }) => what);

describe('the order of a charge', () => {
  // order of mixing (from memory): solid alkali slowly into methanol, never methanol onto dry caustic; concentrated acid
  // slowly into methanol or oil, never the reverse
  it('has the methanol before the caustic in the base step', () => {
    for (const step of [...directCharge(), ...twoStepCharge(2)].filter(({ step }) => step === 'base')) {
      expect(order(step).indexOf('methanol')).toBeLessThan(order(step).indexOf('catalyst'));
      expect(order(step).indexOf('catalyst')).toBeLessThan(order(step).indexOf('mix-methoxide'));
      expect(step.cautions).toContain('caustic-into-methanol');
    }
  });

  it('has oil and methanol before the sulfuric acid in the acid step', () => {
    const [first, second] = twoStepCharge(2);
    expect(order(first!)).toEqual(['oil', 'methanol', 'sulfuric-acid', 'settle']);
    expect(order(second!)).toEqual(['cool', 'methanol', 'sulfuric-acid', 'settle', 'retest']); // the oil is in the vessel, still warm
    for (const step of [first!, second!]) expect(step.cautions).toContain('acid-into-oil');
  });

  it('warns of methanol and of waste at every step', () => {
    for (const step of [...directCharge(), ...twoStepCharge(3)]) {
      for (const caution of ['methanol', 'closed-vessel', 'layers-are-hazardous'] as const) expect(step.cautions).toContain(caution);
      for (const caution of step.cautions) expect(CAUTIONS).toContain(caution);
    }
  });

  it('defers to those who know, on every route', () => {
    for (const route of [directCharge(), twoStepCharge(1), twoStepCharge(3)]) expect(route.some(({ cautions }) => cautions.includes('defer'))).toBe(true);
  });
});

describe('the steps of the two-step route', () => {
  it.each([1, 2, 3])('%d passes, numbered, and the base step', (passes) => {
    const steps = twoStepCharge(passes);
    expect(steps.map(({ step, pass }) => [step, pass])).toEqual([...Array.from({ length: passes }, (_, i) => ['acid', i + 1]), ['base', undefined]]);
    expect(steps.filter((step) => order(step).includes('retest'))).toHaveLength(1);
  });
});
