import { describe, expect, it } from 'vitest';
import { certified, numberIn, read, site } from './lot.js';

const codes = (entry: Parameters<typeof read>[0], profile = site({})) => read(entry, profile).notices.map(({ code, quantity }) => `${code} ${quantity}`);

describe('remarks on the base step', () => {
  it('soap: FFA of 4 % as oleic acid makes 4 · 320.56 / 282.47 = 4.54 % of potassium oleate, above 4 %', () => {
    // molar masses from atomic weights; of the acid by the method’s 282: 4 % are 0.14184 mol/kg, by 320.558 g/mol 4.547 %
    expect(numberIn(read(certified('4')), 'direct.soapShare')).toBeCloseTo(4.547, 3);
    expect(codes(certified('4'))).toContain('soap-above-limit direct.soapShare');
    expect(codes(certified('3.5'))).not.toContain('soap-above-limit direct.soapShare');
    expect(codes(certified('4'), site({ figures: { soapLimit: '5 %' } }))).not.toContain('soap-above-limit direct.soapShare');
  });

  it('water: what the oil brings and what the hydroxide makes, of the oil', () => {
    const wet = certified('2', { figures: { waterContent: '0.9 %' } });
    expect(codes(wet)).toContain('batch-too-wet direct.waterShare');
    expect(codes(certified('2', { figures: { waterContent: '0.05 %' } }))).not.toContain('batch-too-wet direct.waterShare');
    // a methoxide makes none
    const methoxide = certified('2', { figures: { waterContent: '0.9 %' }, options: { catalyst: 'NaOCH3' } });
    expect(numberIn(read(methoxide), 'direct.waterMade')).toBe(0);
    expect(codes(methoxide)).not.toContain('batch-too-wet direct.waterShare');
  });
});

describe('the acid step', () => {
  it.each([['pretreatmentTime', '0 min', 'not-above-zero'], ['pretreatmentTemperature', '64.8 °C', 'above-boiling-point']])('%s of %s is refused at its field, and the direct route stays', (key, figure, code) => {
    const reading = read(certified('8', { figures: { [key]: figure } }));
    expect(reading.problems).toContainEqual(expect.objectContaining({ code, quantity: key }));
    expect(reading.readings['twoStep.catalyst']!.value).toBeUndefined();
    expect(reading.readings['direct.catalyst']!.value).toBeDefined();
  });
});
