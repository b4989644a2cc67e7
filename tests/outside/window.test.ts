import { describe, expect, it } from 'vitest';
import { DEFAULT_FIGURES } from '../../src/core.js';
import { certified, numberIn, read } from '../lot/lot.js';

describe('the hold of the acid step', () => {
  // common practice, no source: 55 to 65 °C
  it('is between 55 and 65 °C by default, and says that this is practice', () => {
    const celsius = numberIn(read(certified('20')), 'pretreatmentTemperature');
    expect(celsius).toBeGreaterThanOrEqual(55);
    expect(celsius).toBeLessThanOrEqual(65);
    expect(DEFAULT_FIGURES['pretreatmentTemperature']?.source.mark).toBe('practice');
  });

  // methanol boils at 64.7 °C (from memory; 65 °C in a safety summary, found)
  it.each(['64.7', '65', '100'])('is refused at %s °C, where methanol boils', (celsius) => {
    const { readings } = read(certified('20', { figures: { pretreatmentTemperature: `${celsius} °C` } }));
    expect(readings['pretreatmentTemperature']?.problem).toMatchObject({ code: 'above-boiling-point', quantity: 'pretreatmentTemperature', params: { bound: '64.7' } });
    expect(readings['pass1.ffaLeft.slow']?.problem?.code).toBe('above-boiling-point');
  });

  it.each(['55', '60', '64.6'])('is taken at %s °C', (celsius) => {
    expect(read(certified('20', { figures: { pretreatmentTemperature: `${celsius} °C` } })).problems).toEqual([]);
  });

  // 148.4 °F is 64.67 °C, 148.5 °F is 64.72 °C
  it('counts °F as °C', () => {
    const problems = (fahrenheit: string) => read(certified('20', { figures: { pretreatmentTemperature: `${fahrenheit} °F` } })).problems.map(({ code }) => code);
    expect(problems('148.4')).toEqual([]);
    expect(problems('148.5')).toEqual(['above-boiling-point']);
  });
});
