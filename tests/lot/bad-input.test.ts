import { isDeepStrictEqual } from 'node:util';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { DEFAULT_FIGURES, DEFAULT_OPTIONS, readLot } from '../../src/core.js';
import type { LotReading } from '../../src/core.js';
import { KNOWN_KEYS } from '../../src/lot/keys.js';
import { certified, lot, read, run, valueIn } from './lot.js';

/** A lot with one thing wrong, everything else as it should be. */
const GOOD = { oilAmount: '1000 kg', titrantStrength: '0.1 mol/L' };
const withFigures = (figures: Record<string, string>, options: Record<string, string> = {}) =>
  lot({ figures: { ...GOOD, ...figures }, options, runs: [run('5.00 g', '0.00', '4.00')] });
const withRun = (sample: string, start: string, end: string, figures: Record<string, string> = {}, options: Record<string, string> = {}) =>
  lot({ figures: { ...GOOD, ...figures }, options, runs: [run(sample, start, end)] });
const codes = ({ problems }: LotReading) => problems.map(({ code, quantity }) => `${code} at ${quantity}`);
const faults = (entry: unknown, site?: unknown) => {
  const result = readLot(entry, site);
  return 'faults' in result ? result.faults.map(({ code, path, in: where }) => `${code} at ${where}: ${path}`) : [];
};

describe('a figure that is none', () => {
  // an entry holds canonical decimal text; whatever else was typed is for the field to ask about, and here it is refused
  it.each([
    '', ' ', 'abc', 'NaN', 'Infinity', '-Infinity', '8.4.0', '8,40', '1,500', '1 500', '1\'500', '1_500', '.5', '5.', '+5', '--5', '−5', '5-', '1e5', '1E-3', '0x10',
    '5 kg', '5%', '٥', '５', '½', '5\n', '\t5', 'null', 'undefined', '1000000000.0.0',
  ])('%j', (text) => {
    const entry = lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('5.00 g', '0.00', '4.00')] });
    const reading = read({ ...entry, figures: { ...entry.figures, oilAmount: { text, unit: 'kg' } } });
    expect(codes(reading)).toEqual(['not-a-number at oilAmount']);
    expect(reading.readings['acidValue']?.value).toBe('4.488'); // what does not rest on it is read
    expect(reading.readings['direct.catalyst']?.problem).toMatchObject({ code: 'not-a-number', quantity: 'oilAmount', params: { typed: text } });
  });

  it.each(['sample', 'start', 'end'] as const)('in a run: its %s', (cell) => {
    const reading = read({ ...withFigures({}), runs: [{ ...run('5.00 g', '0.00', '4.00'), [cell]: { text: 'x', unit: cell === 'sample' ? 'g' : 'mL' } }] });
    expect(codes(reading)).toEqual([`not-a-number at run1.${cell}`]);
    expect(reading.readings['oilMass']?.value ?? reading.readings['direct.feedMass']?.value).toBe('1000');
  });

  it('keeps the doubt that the field had about it', () => {
    const reading = read({ ...withFigures({}), figures: { ...withFigures({}).figures, oilAmount: { typed: '1,500', doubt: 'ambiguous', unit: 'kg' } } });
    expect(reading.problems).toEqual([{ code: 'ambiguous', quantity: 'oilAmount', params: { typed: '1,500' } }]);
  });

  it('of more digits than can be computed with', () => {
    const forty = '1'.repeat(40);
    expect(read(withFigures({ oilAmount: `${forty} kg` })).problems).toEqual([
      { code: 'too-many-digits', quantity: 'oilAmount', params: { typed: forty, digits: '40', most: '34' } },
    ]);
    expect(codes(read(withFigures({ oilAmount: `0.${forty} kg` })))).toEqual(['too-many-digits at oilAmount']);
    // 34 are taken as they are, and zeros in front count for nothing
    expect(read(withFigures({ oilAmount: `${'0'.repeat(40)}1000 kg` })).readings['oilMass']?.value).toBe('1000');
    expect(read(withFigures({ oilAmount: `1.${'3'.repeat(33)} kg` })).readings['oilMass']?.value).toBe(`1.${'3'.repeat(33)}`);
  });

  it('of hundreds of digits', () => {
    expect(codes(read(withFigures({ oilAmount: `${'9'.repeat(200)} kg` })))).toEqual(['too-many-digits at oilAmount']);
    expect(codes(read(withFigures({ oilAmount: `${'9'.repeat(5000)} kg` })))).toEqual(['not-a-number at oilAmount']);
  });
});

describe('a figure beyond what can be', () => {
  it.each([
    ['no mass', withRun('0 g', '0', '4'), 'not-above-zero at run1.sample'],
    ['a negative mass', withRun('-5 g', '0', '4'), 'not-above-zero at run1.sample'],
    ['a negative start', withRun('5 g', '-1', '4'), 'negative at run1.start'],
    ['an end below the start', withRun('5 g', '4.00', '3.99'), 'end-below-start at run1.end'],
    ['an end at the start', withRun('5 g', '4.00', '4.00'), 'titre-not-above-blank at run1.end'],
    ['a titre below the blank', withRun('5 g', '0', '0.10', { blank: '0.15 mL' }, { blankPolicy: 'blank-subtracted' }), 'titre-not-above-blank at run1.end'],
    ['a titre equal to the blank', withRun('5 g', '0', '0.15', { blank: '0.15 mL' }, { blankPolicy: 'blank-subtracted' }), 'titre-not-above-blank at run1.end'],
    ['a negative blank', withRun('5 g', '0', '4', { blank: '-0.1 mL' }, { blankPolicy: 'blank-subtracted' }), 'negative at blank'],
    ['a thousand million of kilograms', withFigures({ oilAmount: '1000000000 kg' }), 'out-of-range at oilAmount'],
    ['a titrant of nothing', withFigures({ titrantStrength: '0 mol/L' }), 'not-above-zero at titrantStrength'],
    ['a titrant stronger than any', withFigures({ titrantStrength: '100 mol/L' }), 'out-of-range at titrantStrength'],
    ['FFA above 100 %', withRun('0.1 g', '0', '4'), 'ffa-above-100 at run1.sample'],
    ['water above 100 %', withFigures({ waterContent: '101 %' }), 'above-100-percent at waterContent'],
    ['negative water', withFigures({ waterContent: '-0.1 %' }), 'negative at waterContent'],
    ['nothing but water', withFigures({ waterContent: '99 %' }), 'nothing-left-as-glyceride at waterContent'],
    ['an acid step above the boiling point', withFigures({ pretreatmentTemperature: '70 °C' }), 'above-boiling-point at pretreatmentTemperature'],
    ['methanol too little to react', withFigures({ methanolRatio: '2.9 mol/mol' }), 'below-stoichiometric at methanolRatio'],
    ['an assay of nothing', withFigures({ 'KOH.assay': '0 %' }), 'not-above-zero at KOH.assay'],
    ['a temperature below all', withFigures({ oilTemperature: '-300 °C' }), 'out-of-range at oilTemperature'],
  ])('%s', (_, entry, problem) => {
    expect(codes(read(entry))).toContain(problem);
    expect(codes(read(entry)).length).toBe(1);
  });

  it('FFA above 100 % on a certificate', () => {
    expect(codes(read(certified('100.1')))).toEqual(['ffa-above-100 at certificateFfa']);
    const acidValue = lot({ figures: { ...GOOD, certificateAcidValue: '250 mg/g' }, options: { acidKnownFrom: 'certificate-acid-value' } }); // 199 is 100 %
    expect(codes(read(acidValue))).toEqual(['ffa-above-100 at certificateAcidValue']);
  });

  it('more acid than the saponification value allows', () => {
    // 95 % FFA as oleic acid is 3.369 mmol/g or 189 mg/g; with SV 185 nothing is left for glycerides
    expect(codes(read(certified('95', { figures: { saponificationValue: '185 mg/g' } })))).toContain('acid-above-saponification at saponificationValue');
  });

  it('tells its bound', () => {
    expect(read(withFigures({ waterContent: '101 %' })).problems).toEqual([
      { code: 'above-100-percent', quantity: 'waterContent', params: { bound: '100', unit: '%' } },
    ]);
  });

  it('leaves the other run readable', () => {
    const reading = read(lot({ figures: GOOD, runs: [run('5 g', '0', '4'), run('-5 g', '0', '4')] }));
    expect(reading.readings['run1.acidValue']?.value).toBe('4.488');
    expect(reading.readings['acidValue']?.problem?.quantity).toBe('run2.sample');
    expect(codes(reading)).toEqual(['not-above-zero at run2.sample']);
  });
});

describe('a unit', () => {
  it.each([
    ['oilAmount', '1000 g/L', 'unit-does-not-fit'], ['oilAmount', '1000 °C', 'unit-does-not-fit'], ['titrantStrength', '0.1 kg', 'unit-does-not-fit'],
    ['waterContent', '0.1 g', 'unit-does-not-fit'], ['oilTemperature', '20 %', 'unit-does-not-fit'], ['waterContent', '0.1', 'none'],
    ['oilAmount', '1000 stone', 'unknown-unit'], ['titrantStrength', '0.1 N', 'unknown-unit'], ['waterContent', '0.1 percent', 'unknown-unit'],
  ])('%s in %s: %s', (field, figure, code) => {
    const reading = read(withFigures({ [field]: figure }));
    expect(codes(reading)).toEqual(code === 'none' ? [] : [`${code} at ${field}`]); // a pure 0.1 is a share too: 10 %
  });

  it('of a portion does not fit how it was taken', () => {
    expect(codes(read(withRun('5 mL', '0', '4')))).toEqual(['unit-does-not-fit at run1.sample']);
    expect(codes(read(withRun('5 g', '0', '4', {}, { sampleTakenBy: 'volume' })))).toEqual(['unit-does-not-fit at run1.sample']);
  });

  it('of a name every object has is unknown', () => {
    for (const unit of ['constructor', '__proto__', 'toString', 'hasOwnProperty']) {
      const entry = withFigures({});
      expect(codes(read({ ...entry, figures: { ...entry.figures, oilAmount: { text: '1', unit } } }))).toEqual(['unknown-unit at oilAmount']);
    }
  });
});

describe('what is missing', () => {
  it.each([
    ['titrantStrength', lot({ figures: { oilAmount: '1 kg' }, runs: [run('5 g', '0', '4')] }), 'acidValue'],
    ['oilAmount', lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('5 g', '0', '4')] }), 'direct.catalyst'],
    ['blank', withRun('5 g', '0', '4', {}, { blankPolicy: 'blank-subtracted' }), 'acidValue'],
    ['certificateFfa', lot({ figures: GOOD, options: { acidKnownFrom: 'certificate-ffa' } }), 'acidValue'],
    ['otherAcidMolarMass', withFigures({}, { referenceAcid: 'other' }), 'freeFattyAcid'],
    ['iodineValue', withFigures({}, { oilDensityBy: 'lund' }), 'oilVolume'],
    ['measuredOilDensity', withFigures({}, { oilDensityBy: 'measured' }), 'oilVolume'],
  ])('%s is named', (field, entry, key) => {
    const reading = read(entry);
    expect(reading.readings[key]?.missing).toEqual([field]);
    expect(reading.problems).toEqual([]);
  });

  it('is everything in an empty entry, and nothing is refused', () => {
    const reading = read({ version: 1 });
    expect(reading.problems).toEqual([]);
    expect(reading.route.verdict).toBe('not-known');
    expect([...(reading.readings['direct.catalyst']?.missing ?? [])].sort()).toEqual(['oilAmount', 'run1.end', 'run1.sample', 'run1.start', 'titrantStrength']);
  });
});

describe('a document that cannot be read', () => {
  it.each([null, undefined, 5, NaN, 'text', true, [], [1, 2], [{ version: 1 }]])('%j is no object', (entry) => {
    expect(faults(entry)).toEqual(['not-an-object at entry: ']);
  });

  it.each([
    ['a newer version', { version: 2 }, 'newer-version at entry: version'],
    ['an older version', { version: 0 }, 'unknown-version at entry: version'],
    ['no version', {}, 'unknown-version at entry: version'],
    ['a version that is text', { version: '1' }, 'unknown-version at entry: version'],
    ['a version that has no text', { version: { toString: null } }, 'unknown-version at entry: version'],
    ['a version that is not a number', { version: NaN }, 'unknown-version at entry: version'],
    ['an unknown part', { version: 1, colour: 'brown' }, 'unknown-key at entry: colour'],
    ['an unknown figure', { version: 1, figures: { colour: { text: '1', unit: '' } } }, 'unknown-key at entry: figures.colour'],
    ['a figure that is computed', { version: 1, figures: { acidValue: { text: '1', unit: 'mg/g' } } }, 'unknown-key at entry: figures.acidValue'],
    ['an unknown choice', { version: 1, options: { colour: 'brown' } }, 'unknown-key at entry: options.colour'],
    ['a choice that is decided', { version: 1, options: { passes: '2' } }, 'unknown-key at entry: options.passes'],
    ['an unknown option', { version: 1, options: { catalyst: 'LiOH' } }, 'unknown-option at entry: options.catalyst'],
    ['figures that are a list', { version: 1, figures: [] }, 'wrong-type at entry: figures'],
    ['options that are a list', { version: 1, options: [] }, 'wrong-type at entry: options'],
    ['runs that are no list', { version: 1, runs: {} }, 'wrong-type at entry: runs'],
    ['a figure that is a number', { version: 1, figures: { oilAmount: 1000 } }, 'wrong-type at entry: figures.oilAmount'],
    ['a figure whose digits are a number', { version: 1, figures: { oilAmount: { text: 1000, unit: 'kg' } } }, 'wrong-type at entry: figures.oilAmount.text'],
    ['a figure with more to it', { version: 1, figures: { oilAmount: { text: '1', unit: 'kg', note: '' } } }, 'unknown-key at entry: figures.oilAmount.note'],
    ['a figure without a unit', { version: 1, figures: { oilAmount: { text: '1' } } }, 'wrong-type at entry: figures.oilAmount.unit'],
    ['a name that is not text', { version: 1, name: 5 }, 'wrong-type at entry: name'],
    ['a name without end', { version: 1, name: 'x'.repeat(10_001) }, 'too-long at entry: name'],
    ['runs without end', { version: 1, runs: Array.from({ length: 21 }, () => ({})) }, 'too-long at entry: runs'],
    ['an unknown cell of a run', { version: 1, runs: [{ middle: { text: '1', unit: 'mL' } }] }, 'unknown-key at entry: runs.0.middle'],
  ])('%s', (_, entry, fault) => {
    expect(faults(entry)).toEqual([fault]);
  });

  it('is told of the site as well', () => {
    expect(faults({ version: 2 }, { version: 1, runs: [] })).toEqual(['newer-version at entry: version', 'unknown-key at site: runs']);
    expect(faults({ version: 1 }, null)).toEqual(['not-an-object at site: ']);
  });

  it('tells every fault at once', () => {
    expect(faults({ version: 1, figures: { a: { text: '1', unit: '' }, b: { text: '1', unit: '' } }, options: { c: 'd' } })).toHaveLength(3);
  });

  it('may be nested without end', () => {
    let nested: unknown = 1;
    for (let depth = 0; depth < 20_000; depth++) nested = [nested];
    expect(faults({ version: nested })).toEqual(['unknown-version at entry: version']);
    expect(faults({ version: 1, figures: { oilAmount: nested } })).toEqual(['wrong-type at entry: figures.oilAmount']);
  });
});

describe('names that every object has', () => {
  const parsed = (json: string): unknown => JSON.parse(json);
  it.each(['__proto__', 'constructor', 'prototype', 'toString', 'hasOwnProperty', 'valueOf'])('%s is an unknown key wherever it stands', (key) => {
    expect(faults(parsed(`{"version":1,"${key}":{"text":"1","unit":"kg"}}`))).toEqual([`unknown-key at entry: ${key}`]);
    expect(faults(parsed(`{"version":1,"figures":{"${key}":{"text":"1","unit":"kg"}}}`))).toEqual([`unknown-key at entry: figures.${key}`]);
    expect(faults(parsed(`{"version":1,"options":{"${key}":"KOH"}}`))).toEqual([`unknown-key at entry: options.${key}`]);
    expect(faults(parsed(`{"version":1,"runs":[{"${key}":{"text":"1","unit":"g"}}]}`))).toEqual([`unknown-key at entry: runs.0.${key}`]);
    expect(faults(parsed(`{"version":1,"options":{"catalyst":"${key}"}}`))).toEqual(['unknown-option at entry: options.catalyst']);
  });

  it('pollute no prototype', () => {
    readLot(parsed('{"version":1,"__proto__":{"polluted":1},"figures":{"__proto__":{"polluted":1}},"options":{"constructor":{"prototype":{"polluted":1}}}}'));
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
    expect(Object.keys(Object.prototype)).toEqual([]);
  });

  it('make no difference to an entry without any', () => {
    expect(read(Object.assign(Object.create(null) as object, { version: 1 })).problems).toEqual([]);
  });
});

describe('whatever comes', () => {
  const seeded = { seed: 20240901, numRuns: 300 };
  const sound = (result: ReturnType<typeof readLot>): void => {
    expect(isDeepStrictEqual(JSON.parse(JSON.stringify(result)), result)).toBe(true);
    if ('faults' in result) {
      expect(result.faults.length).toBeGreaterThan(0);
      return;
    }
    // every reading is known, missing or refused, and only one of the three
    const unsound = Object.entries(result.readings).filter(([, { value, shown, missing, problem }]) =>
      [value, missing, problem].filter((part) => part !== undefined).length !== 1 || (value === undefined) !== (shown === undefined)
      || (value !== undefined && !/^-?\d+(\.\d+)?(e[+-]\d+)?$/.test(value)));
    expect(unsound).toEqual([]);
  };

  it('readLot never throws on JSON', () => {
    fc.assert(fc.property(fc.jsonValue(), fc.jsonValue(), (entry, site) => {
      sound(readLot(entry, site));
    }), seeded);
  });

  it('nor on JSON that is nearly an entry', () => {
    const part = fc.oneof(fc.jsonValue({ maxDepth: 2 }), fc.constant({}), fc.constant([]));
    const entry = fc.record({ version: fc.constantFrom(1, 2, null, '1'), figures: part, options: part, runs: part, retestRuns: part, name: part, extra: part }, { requiredKeys: [] });
    fc.assert(fc.property(entry, entry, (lotEntry, site) => {
      sound(readLot(lotEntry, site));
    }), seeded);
  });

  it('nor on entries with any figures and options', () => {
    const digits = fc.oneof(
      { arbitrary: fc.integer({ min: 0, max: 20000 }).map((n) => (n / 100).toFixed(2)), weight: 6 },
      fc.constantFrom('0', '-1', '', 'x', '1e3', '0.000001', '1000000000', '99999999999999999999999999999999999999', '0'.repeat(300)),
      fc.string({ maxLength: 8 }),
    );
    const unit = fc.oneof(
      { arbitrary: fc.constantFrom('g', 'kg', 'mL', 'L', '%', 'mol/L', 'g/L', '°C', '°F', 'mg/g', '', 'mol/mol', 'lb', 'US gal', 'g/mL', 'kg/m³', 'min', 'h'), weight: 6 },
      fc.string({ maxLength: 4 }),
    );
    const anyFigure = fc.oneof({ arbitrary: fc.record({ text: digits, unit }), weight: 8 }, fc.record({ typed: fc.string(), doubt: fc.string(), unit }));
    const figures = fc.dictionary(fc.constantFrom(...KNOWN_KEYS.figures), anyFigure, { maxKeys: 12 });
    const options = fc.uniqueArray(fc.constantFrom(...KNOWN_KEYS.options.keys()), { maxLength: 8 }).chain((names) =>
      fc.tuple(...names.map((name) => fc.constantFrom(...KNOWN_KEYS.options.get(name)!))).map((chosen) => Object.fromEntries(names.map((name, i) => [name, chosen[i]!]))));
    const anyRun = fc.record({ sample: anyFigure, start: anyFigure, end: anyFigure, struck: fc.string() }, { requiredKeys: [] });
    const runs = fc.array(fc.oneof({ arbitrary: fc.constant(run('5.00 g', '0.00', '4.00')), weight: 3 }, anyRun), { maxLength: 3 });
    const start = fc.constantFrom({}, withFigures({}).figures);
    const entry = fc.record({ version: fc.constant(1), figures: fc.tuple(figures, start).map(([any, good]) => ({ ...any, ...good })), options, runs, retestRuns: runs });
    const site = fc.record({ version: fc.constant(1), figures, options });
    let read = 0;
    fc.assert(fc.property(entry, site, (lotEntry, profile) => {
      const result = readLot(lotEntry, profile);
      expect('faults' in result).toBe(false);
      sound(result);
      if ('readings' in result && result.readings['acidValue']?.value !== undefined) read++;
    }), seeded);
    expect(read).toBeGreaterThan(5); // some of them can be read to the end
  }, 60_000);

  it('nor on one bad figure anywhere in a good lot', () => {
    const bad = fc.constantFrom('', 'x', '-1', '0', '1000000000', '1'.repeat(40), 'NaN');
    // the temperature of the titration is that of the standardisation while nobody types another, so here it is typed
    const whole = { ...withFigures({}), figures: { titrationTemperature: { text: '20', unit: '°C' }, ...Object.fromEntries(Object.entries(DEFAULT_FIGURES).map(([key, { text, unit }]) => [key, { text, unit }])), ...withFigures({}).figures } };
    fc.assert(fc.property(fc.constantFrom(...Object.keys(whole.figures)), bad, (field, text) => {
      const figures: Record<string, unknown> = whole.figures;
      const reading = read({ ...whole, options: { ...DEFAULT_OPTIONS }, figures: { ...figures, [field]: { ...(figures[field] as object), text } } });
      // if anything is refused it is this very field
      for (const { quantity } of reading.problems) expect(quantity).toBe(field);
      const bench = field === 'titrantStrength' || field.endsWith('Temperature');
      expect(valueIn(reading, bench ? 'catalystAssay' : 'run1.acidContent').isFinite()).toBe(true);
    }), { seed: 4711, numRuns: 300 });
  }, 60_000);
});
