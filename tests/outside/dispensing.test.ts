import { describe, expect, it } from 'vitest';
import { certified, numberIn, read, shownIn, site } from '../lot/lot.js';

// Amounts in whole steps of a scale or meter, worked out by hand. 1000 kg of oil of 2 % FFA as oleic acid, KOH of 90 %.

const lot = certified('2', { options: { catalyst: 'KOH' } });
const steps = site({ figures: { methanolStep: '5 L', catalystStep: '500 g', sulfuricStep: '0.1 kg' } });

describe('amounts in whole steps', () => {
  const reading = read(lot, steps);

  it('are the nearest that the scale or the meter gives', () => {
    // base 10 kg, extra 20 / 282 · 56.1053 = 3.979 kg, together by 90 %: 15.532 kg
    expect(numberIn(reading, 'direct.catalyst')).toBeCloseTo(15.532, 3);
    expect(shownIn(reading, 'direct.dispensed.catalyst')).toBe('15.50 kg');
    const volume = numberIn(reading, 'direct.methanolVolume');
    expect(numberIn(reading, 'direct.dispensed.methanolVolume')).toBe(5 * Math.round(volume / 5));
  });

  it('tell what the rounding changes: the base load by what is left of the catalyst, the ratio by the volume', () => {
    // 15.5 · 0.9 − 3.979 = 9.971 kg in 1000 kg
    expect(numberIn(reading, 'direct.dispensed.baseLoad')).toBeCloseTo(0.9971, 3);
    const wanted = numberIn(reading, 'direct.methanolVolume');
    expect(numberIn(reading, 'direct.dispensed.methanolRatio')).toBeCloseTo((6 * numberIn(reading, 'direct.dispensed.methanolVolume')) / wanted, 9);
  });

  it('count the methanol that comes with a catalyst solution', () => {
    const solution = read(certified('2', { options: { catalyst: 'NaOCH3-solution' } }), site({ figures: { methanolStep: '0.000001 L', catalystStep: '0.000001 kg' } }));
    expect(numberIn(solution, 'direct.dispensed.methanolRatio')).toBeCloseTo(6, 5);
  });

  it('are not asked for where the site names no step', () => {
    expect(Object.keys(read(lot).readings).filter((key) => key.includes('dispensed'))).toEqual([]);
  });

  it('of nothing are refused at the field', () => {
    const { problems } = read(lot, site({ figures: { methanolStep: '0 L' } }));
    expect(problems.map(({ code, quantity }) => [code, quantity])).toEqual([['not-above-zero', 'methanolStep']]);
  });
});
