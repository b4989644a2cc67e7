import { describe, expect, it } from 'vitest';
import { readLot } from '../../src/core.js';
import type { LotReading } from '../../src/core.js';
import { certified, figure, lot, numberIn, read, run, shownIn, site, valueIn } from './lot.js';

/** 1000 kg, 0.1 mol/L, two runs: invented, with figures that are easy to follow by hand. */
const WORKED = lot({
  figures: { oilAmount: '1000 kg', titrantStrength: '0.1000 mol/L', waterContent: '0.10 %' },
  options: { catalyst: 'NaOH' },
  runs: [run('5.000 g', '0.00', '4.00'), run('4.000 g', '4.00', '7.28')],
});

/** To the digits that a calculation by hand kept. */
const expectAbout = (reading: LotReading, figures: Readonly<Record<string, string>>): void => {
  for (const [key, byHand] of Object.entries(figures)) {
    const decimals = byHand.split('.')[1]?.length ?? 0;
    expect([key, valueIn(reading, key).toFixed(decimals, 4)]).toEqual([key, byHand]);
  }
};

describe('a lot worked by hand', () => {
  const reading = read(WORKED);

  it('acidity', () => {
    expectAbout(reading, {
      'run1.acidContent': '0.0800', // 0.1 · (4.00 − 0.00) / 5.000
      'run2.acidContent': '0.0820', // 0.1 · (7.28 − 4.00) / 4.000
      acidContent: '0.0810', // their mean
      acidValue: '4.5441', // 56.1 · 0.081
      freeFattyAcid: '2.2842', // 282 · 0.081 / 10
    });
    expect([shownIn(reading, 'acidValue'), shownIn(reading, 'freeFattyAcid')]).toEqual(['4.5 mg/g', '2.28 %']);
  });

  it('the oil', () => {
    expectAbout(reading, {
      oilDensity: '916.8', // 920 − 0.64 · (20 − 15)
      oilVolume: '1090.7504', // 1000 / 916.8 · 1000
      glycerideContent: '1.10182978', // (190 − 56.1053 · 0.081) / (3 · 56.1053)
      glycerideShare: '97.5620092', // 100 − 282.468 · 0.081 / 10 − 0.10 − 0.05
      glycerideMolarMass: '885.45446', // 97.5620092 / 1.10182978 · 10
      glycerideAcidMolarMass: '282.46849', // (885.45446 − 38.049) / 3
    });
  });

  it('the direct charge', () => {
    expectAbout(reading, {
      'direct.acid': '81', // 0.081 · 1000
      'direct.basePure': '6.00', // 0.6 / 100 · 1000
      'direct.extraPure': '3.23973837', // 81 · 39.99677 / 1000
      'direct.baseProduct': '6.122449', // 6.00 / 0.98
      'direct.extraProduct': '3.305855', // 3.23973837 / 0.98
      'direct.catalyst': '9.428304', // the sum, 9.23973837 / 0.98
      'direct.catalystPerLitre': '8.643870', // 9.428304 / 1090.7504 · 1000
      'direct.glycerideAmount': '1101.829778', // 1.10182978 · 1000
      'direct.methanolNeeded': '211.828978', // 6 · 1101.829778 · 32.042 / 1000
      'direct.methanol': '212.041019', // 211.828978 / 0.999
      'direct.methanolVolume': '267.965398', // 212.041019 / 0.7913
      'direct.catalystAmount': '231.012113', // 9.23973837 · 1000 / 39.99677
      'direct.waterMade': '4.161683', // 231.012113 · 18.015 / 1000
      'direct.waterBrought': '1.400607', // 1.000 of the oil, 9.428304 · 0.02 of the NaOH, 212.041019 · 0.001 of the methanol
      'direct.waterShare': '0.556229', // (4.161683 + 1.400607) / 1000 · 100
      'direct.soap': '24.660431', // 81 · (282.468 + 22.98977 − 1.008) / 1000
      'direct.oilLost': '47.540339', // 81 · 282.468 / 1000 + 1.0 · 24.660431
      'direct.ester': '960.461416', // 3 · 1101.829778 · 0.98 · (282.46849 + 14.027) / 1000
      'direct.glycerol': '99.442473', // 1101.829778 · 0.98 · 92.094 / 1000
    });
  });

  it('the acid step', () => {
    expectAbout(reading, {
      'pass1.acidMass': '22.842', // 81 · 282 / 1000
      'pass1.methanolPure': '103.81608', // 40 · 81 · 32.042 / 1000, below 15 % FFA
      'pass1.methanol': '103.92', // 103.81608 / 0.999
      'pass1.methanolVolume': '131.328194', // 103.92 / 0.7913
      'pass1.sulfuricPure': '2.2842', // 10 % of 22.842
      'pass1.sulfuric': '2.379375', // 2.2842 / 0.96
      'pass1.sulfuricVolume': '1.296309', // 2.379375 / 1.8355
      // (103.92 · 0.001 + 2.379375 · 0.04 + 1000 · 0.001) · 1000 / 18.015 / 81
      'pass1.waterPerAcid': '0.821740',
      'pass1.equilibrium.slow': '0.977466', // s = 2 · 41 + 0.821740; 2 · 2 · 40 / (s + √(s² − 4 · 1 · 2 · 40))
      'pass1.rate.slow': '0.024792', // 0.032 · 2^0.35 / 1.821740^0.83
      'pass1.conversion.slow': '0.764066', // 0.977466 · (1 − exp(−0.024792 · 60 / 0.977466))
      'pass1.ffaLeft.slow': '0.538920', // 81 · (1 − 0.764066) · 282 / 1000 / 10
      'pass1.equilibrium.fast': '0.994214',
      'pass1.rate.fast': '0.193685',
      'pass1.ffaLeft.fast': '0.013235',
    });
  });

  it('the base step after it', () => {
    expectAbout(reading, {
      'pretreated.acidLeft': '19.110639', // 81 · (1 − 0.764066…)
      'pretreated.methanolLeft': '317.811064', // a tenth of 3240 − 61.889361
      'pretreated.waterLeft': '12.845028', // a tenth of 66.560922 + 61.889361
      'pretreated.sulfuricLeft': '0.22842',
      // 1000 − 1 + 61.889361 · 0.014027 + 317.811064 · 0.032042 + 12.845028 · 0.018015 + 0.22842
      'pretreated.mass': '1010.511247',
      'twoStep.basePure': '6.063067', // 0.6 % of it
      'twoStep.extraPure': '0.950677', // (19.110639 + 2 · 0.22842 / 0.098072) · 39.99677 / 1000
      'twoStep.catalyst': '7.156882', // (6.063067 + 0.950677) / 0.98
    });
  });

  it('the route: 2.28 % is at or below 3.0 %', () => {
    expect(reading.route.verdict).toBe('direct');
    expect(reading.problems).toEqual([]);
    expect(reading.notices).toEqual([]);
    expect(reading.runs).toEqual(['counted', 'counted']);
  });
});

describe('the result', () => {
  it('is JSON that comes back as it was', () => {
    for (const result of [readLot(WORKED), readLot({ version: 1 }), readLot(null), readLot({ version: 1, runs: [{ sample: figure('x g') }] })]) {
      expect(JSON.parse(JSON.stringify(result))).toStrictEqual(result);
    }
  });

  it('holds figures as decimal text, never as binary numbers', () => {
    const numbers: string[] = [];
    JSON.stringify(readLot(WORKED), (key, value: unknown) => {
      if (typeof value === 'number') numbers.push(key);
      return value;
    });
    expect([...new Set(numbers)].sort()).toEqual(['pass', 'runs', 'version']); // a count each
    // 0.1 · 3 is 0.3 and not 0.30000000000000004
    const thrice = read(lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('1 g', '0.0', '0.3')] }));
    expect(thrice.readings['acidContent']?.value).toBe('0.03');
  });

  it('is the same for the same entry, and changes nothing in it', () => {
    const entry = JSON.stringify(WORKED);
    const first = readLot(WORKED);
    expect(readLot(JSON.parse(entry))).toEqual(first);
    expect(JSON.stringify(WORKED)).toBe(entry);
  });

  it('lists each reading after those that it rests on', () => {
    const keys = Object.keys(read(WORKED).readings);
    const at = (key: string): number => keys.indexOf(key);
    expect(at('run1.acidContent')).toBeLessThan(at('acidContent'));
    expect(at('acidContent')).toBeLessThan(at('direct.acid'));
    expect(at('direct.extraPure')).toBeLessThan(at('direct.catalyst'));
    expect(at('pass1.acidLeft.slow')).toBeLessThan(at('twoStep.catalyst'));
  });

  it('names amounts in the charges that are among the readings', () => {
    const { charges, readings } = read(certified('20'));
    const lines = [...charges.direct, ...charges.twoStep].flatMap((step) => step.lines.flatMap(({ mass, volume }) => [mass, volume]));
    for (const key of lines) if (key !== undefined) expect([key, readings[key]?.value !== undefined]).toEqual([key, true]);
  });
});

describe('only the readings wanted', () => {
  const only = ['acidValue', 'freeFattyAcid', 'direct.catalyst', 'direct.methanol'];

  it('are the same as among all of them, and no others', () => {
    const all = read(WORKED);
    const few = readLot(WORKED, undefined, { only }) as LotReading;
    expect(Object.keys(few.readings)).toEqual(only);
    for (const key of only) expect(few.readings[key]).toEqual(all.readings[key]);
    expect(few.route).toEqual(all.route);
  });

  it('may rest on the number of passes, whatever else is asked for', () => {
    const sour = certified('20');
    for (const key of ['twoStep.catalyst', 'pretreated.mass']) {
      expect((readLot(sour, undefined, { only: [key] }) as LotReading).readings[key]).toEqual(read(sour).readings[key]);
    }
  });

  it('say what is missing and what was refused', () => {
    const few = readLot(lot({ figures: { oilAmount: '-5 kg' } }), undefined, { only }) as LotReading;
    expect(few.readings['acidValue']?.missing).toContain('titrantStrength');
    expect(few.problems).toEqual([{ code: 'not-above-zero', quantity: 'oilAmount', params: { bound: '0', unit: 'kg' } }]);
  });
});

describe('runs', () => {
  const strength = { titrantStrength: '0.1 mol/L' };
  const contents = (runs: Parameters<typeof lot>[0]['runs']) => read(lot({ figures: strength, runs: runs ?? [] }));

  it('are averaged, the acid contents and not the titres', () => {
    // 0.1 · 4 / 5 = 0.08, 0.1 · 4 / 4 = 0.1, 0.1 · 4.8 / 4 = 0.12: mean 0.1; titres and portions together would give 0.0985
    const reading = contents([run('5 g', '0', '4'), run('4 g', '0', '4'), run('4 g', '0', '4.8')]);
    expect(reading.readings['acidContent']?.value).toBe('0.1');
    expect(reading.notices).toEqual([]);
  });

  it('of which there is one is reported and remarked on', () => {
    const reading = contents([run('5 g', '0', '4')]);
    expect(reading.readings['acidContent']?.value).toBe('0.08');
    expect(reading.notices).toEqual([{ code: 'one-run', quantity: 'acidValue' }]);
  });

  it('that are still being typed do not count', () => {
    const reading = contents([run('5 g', '0', '4'), { sample: figure('4 g'), start: figure('4 mL') }, {}]);
    expect(reading.runs).toEqual(['counted', 'incomplete', 'empty']);
    expect(reading.readings['acidContent']?.value).toBe('0.08');
    expect(reading.notices).toContainEqual({ code: 'run-incomplete', quantity: 'run2.end', params: { run: '2' } });
  });

  it('of which the first is unfinished say what is missing', () => {
    const reading = contents([{ sample: figure('5 g'), start: figure('0 mL') }]);
    expect(reading.readings['acidValue']?.missing).toEqual(['run1.end']);
    expect(reading.problems).toEqual([]);
  });

  it('that are struck out do not count, and keep their own readings', () => {
    const reading = contents([run('5 g', '0', '4'), { ...run('5 g', '0', '9'), struck: 'overshot' }]);
    expect(reading.runs).toEqual(['counted', 'struck']);
    expect(reading.readings['acidContent']?.value).toBe('0.08');
    expect(reading.readings['run2.acidContent']?.value).toBe('0.18');
    expect(reading.notices).toEqual([{ code: 'one-run', quantity: 'acidValue' }]);
  });

  it('that are all struck out give no result', () => {
    const reading = contents([{ ...run('5 g', '0', '9'), struck: 'overshot' }]);
    expect(reading.readings['acidValue']?.value).toBeUndefined();
    expect([...(reading.readings['acidValue']?.missing ?? [])].sort()).toEqual(['run2.end', 'run2.sample', 'run2.start']);
    expect(reading.route.verdict).toBe('not-known');
  });

  it('that are struck out for no stated reason are struck out all the same', () => {
    expect(contents([run('5 g', '0', '4'), { ...run('5 g', '0', '9'), struck: '' }]).runs).toEqual(['counted', 'struck']);
  });
});

describe('a certificate', () => {
  it('takes the place of a titration', () => {
    const reading = read(lot({
      figures: { certificateAcidValue: '4.5441 mg/g', oilAmount: '1000 kg' }, options: { acidKnownFrom: 'certificate-acid-value', catalyst: 'NaOH' },
      runs: [run('5 g', '0', '9')], // not looked at
    }));
    expectAbout(reading, { acidContent: '0.081', 'direct.catalyst': '9.428304' }); // as in the worked lot
    expect(reading.notices).toEqual([]);
  });

  it('may give FFA', () => {
    expectAbout(read(certified('2.2842', { options: { catalyst: 'NaOH' } })), { acidContent: '0.081', acidValue: '4.5441', 'direct.catalyst': '9.428304' });
  });
});

describe('a titration after the acid step', () => {
  const after = (runs: Parameters<typeof lot>[0]['retestRuns']) => read({ ...WORKED, retestRuns: runs ?? [] });

  it('takes the place of the estimate, and mineral acid is not counted twice', () => {
    const reading = after([run('5.000 g', '0.00', '1.00')]);
    expectAbout(reading, {
      'retest.acidContent': '0.02', // 0.1 · 1.00 / 5.000
      'retest.acidValue': '1.122',
      'twoStep.acid': '20.210225', // 0.02 · 1010.511247
      'twoStep.mineralPure': '0',
      'twoStep.extraPure': '0.808344', // 20.210225 · 39.99677 / 1000
    });
    expect(numberIn(reading, 'pretreated.sulfuricLeft')).toBeGreaterThan(0); // it is there, but the titration has counted it
    // what was predicted stays to be compared with
    expectAbout(reading, { 'pretreated.ffaLeft.slow': '0.538920' });
  });

  it('does so only when a run is complete', () => {
    for (const runs of [[], [{ sample: figure('5 g') }], [{ ...run('5 g', '0', '1'), struck: 'spilt' }]]) {
      expectAbout(after(runs), { 'twoStep.acid': '19.110639' });
    }
  });

  it('rests on the estimate while the chosen kind of certificate has no figure, whatever another one says', () => {
    const reading = read(certified('20', { figures: { 'retest.certificateAcidValue': '1.0 mg/g' }, options: { 'retest.acidKnownFrom': 'certificate-ffa' } }));
    expect(numberIn(reading, 'twoStep.acid')).toBe(numberIn(read(certified('20')), 'pretreated.acidLeft'));
  });

  it('may be known from a certificate', () => {
    const reading = read(certified('20', { figures: { 'retest.certificateFfa': '0.50 %' }, options: { 'retest.acidKnownFrom': 'certificate-ffa' } }));
    expect(numberIn(reading, 'twoStep.acid') / numberIn(reading, 'pretreated.mass')).toBeCloseTo(5 / 282, 12);
  });
});

describe('amounts', () => {
  it('by volume and temperature', () => {
    // (920 − 0.64 · (35 − 15)) kg/m³ · 1.2 m³ = 907.2 · 1.2
    expectAbout(read(certified('2', { figures: { oilAmount: '1200 L', oilTemperature: '35 °C' } })), { oilMass: '1088.64', oilVolume: '1200' });
    expectAbout(read(certified('2', { figures: { oilAmount: '1.2 m³', oilTemperature: '35 °C' } })), { oilMass: '1088.64' });
  });

  it('in US units', () => {
    // 2000 lb · 0.45359237; 250 US gal · 3.785411784 L at 68 °F, which is 20 °C: 946.352946 L · 0.9168
    expectAbout(read(certified('2', { figures: { oilAmount: '2000 lb' } })), { oilMass: '907.18474' });
    const reading = read(certified('2', { figures: { oilAmount: '250 US gal', oilTemperature: '68 °F' } }));
    expect(reading.readings['oilTemperature']?.value).toBe('20');
    expectAbout(reading, { oilVolume: '946.352946', oilMass: '867.616381' });
  });

  it('are the same charge whatever the unit', () => {
    const charge = (oilAmount: string): string => valueIn(read(certified('2', { figures: { oilAmount } })), 'direct.catalyst').toFixed(20);
    expect(charge('1 t')).toBe(charge('1000 kg'));
    expect(charge('1000000 g')).toBe(charge('1000 kg'));
  });

  it('scale with the batch', () => {
    const one = read(certified('7', { figures: { oilAmount: '1 kg' } }));
    const many = read(certified('7', { figures: { oilAmount: '850 kg' } }));
    for (const key of ['direct.catalyst', 'direct.methanol', 'pass1.sulfuric', 'twoStep.catalyst', 'twoStep.ester']) {
      expect(valueIn(many, key).div(valueIn(one, key)).minus(850).abs().lt('1e-25')).toBe(true);
    }
  });
});

describe('the site', () => {
  it('stands where the lot says nothing, and the lot before the site', () => {
    const profile = site({ figures: { 'NaOH.assay': '97 %', methanolRatio: '7 mol/mol' }, options: { catalyst: 'NaOH', referenceAcid: 'palmitic' } });
    const reading = read(certified('2', { figures: { methanolRatio: '6.5 mol/mol' } }), profile);
    expectAbout(reading, { catalystAssay: '97', methanolRatio: '6.5', referenceAcidMolarMass: '256' });
    expect(['NaOH.assay', 'methanolRatio', 'conversion'].map((key) => reading.readings[key]?.from)).toEqual(['site', 'entry', 'default']);
  });
});

describe('notices', () => {
  it('remark on coconut oil counted as oleic acid', () => {
    const coconut = { glyceridesBy: 'profile', fat: 'coconut' };
    expect(read(certified('2', { options: coconut })).notices).toEqual([{ code: 'lauric-on-other-basis', quantity: 'referenceAcid' }]);
    expect(read(certified('2', { options: { ...coconut, referenceAcid: 'lauric' } })).notices).toEqual([]);
  });

  it('remark on a target that three passes do not reach', () => {
    const { notices, route } = read(certified('20'), site({ figures: { pretreatmentTarget: '0.001 %' } }));
    expect(notices.map(({ code, quantity }) => [code, quantity])).toContainEqual(['target-not-reached', 'pretreatmentTarget']);
    expect(route.reasons.map(({ code }) => code)).toContain('pretreatment-misses-target');
  });
});
