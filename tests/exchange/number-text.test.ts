import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fieldText, showNumber } from '../../src/exchange/number-format.js';
import { NUMBER_DOUBTS, readNumber } from '../../src/exchange/number-text.js';
import type { DecimalMark, NumberDoubt } from '../../src/exchange/number-text.js';

const seeded = { seed: 20240607, numRuns: 2000 };
const MARKS: readonly DecimalMark[] = ['.', ','];
const CANONICAL = /^-?(?:0|[1-9]\d*)(?:\.\d+)?$/;

describe('a figure that reads the same in every language', () => {
  const figures: readonly [typed: string, text: string][] = [
    // digits as typed
    ['8', '8'],
    ['8.40', '8.40'],
    ['8,40', '8.40'],
    ['0,5', '0.5'],
    ['12,34', '12.34'],
    ['1,2345', '1.2345'],
    ['1.2345', '1.2345'],
    ['1234,567', '1234.567'],
    ['100', '100'],
    ['0', '0'],
    ['0.000', '0.000'],
    // open ends and leading zeros
    ['.5', '0.5'],
    [',5', '0.5'],
    ['.500', '0.500'],
    ['5.', '5'],
    ['5,', '5'],
    ['007', '7'],
    ['00.5', '0.5'],
    ['000', '0'],
    // no one groups behind a zero
    ['0.500', '0.500'],
    ['0,500', '0.500'],
    ['012,500', '12.500'],
    ['00.125', '0.125'],
    // signs
    ['+5', '5'],
    ['-5', '-5'],
    ['\u22125', '-5'],
    ['\u20135', '-5'],
    ['\u20105', '-5'],
    ['\u20115', '-5'],
    ['\uff0d5', '-5'],
    ['-,5', '-0.5'],
    ['-0', '0'],
    ['\u22120,00', '0.00'],
    // a mark that comes twice groups
    ['1,234,567', '1234567'],
    ['1.234.567', '1234567'],
    ['-12.345.678', '-12345678'],
    // of two marks the last is for decimals
    ['1.234,5', '1234.5'],
    ['1,234.5', '1234.5'],
    ['1,234.567', '1234.567'],
    ['1.234.567,890', '1234567.890'],
    ['1,234.', '1234'],
    // spaces and apostrophes group
    ['1 234', '1234'],
    ['1 234,5', '1234.5'],
    ['1 234,567', '1234.567'],
    ['1\u00a0234.5', '1234.5'],
    ['12\u202f345\u202f678,90', '12345678.90'],
    ['1\u2009234', '1234'],
    ["1'234.5", '1234.5'],
    ['1\u2019234\u2019567,5', '1234567.5'],
    // around the figure
    ['  8.4\t', '8.4'],
    ['\n8,4\r\n', '8.4'],
    ['\u00a08.4\u3000', '8.4'],
    ['\u200e-8.4', '-8.4'],
    ['\u202d8.4\u202c', '8.4'],
    // other digits
    ['\uff18\uff0e\uff14', '8.4'],
    ['\u0668,\u0664', '8.4'],
    ['\u06f8.\u06f4\u06f0', '8.40'],
    // as many digits as can be computed with
    ['1234567890123456789012345678901234', '1234567890123456789012345678901234'],
    ['0.001234567890123456789012345678901234', '0.001234567890123456789012345678901234'],
    [`0,${'0'.repeat(60)}1`, `0.${'0'.repeat(60)}1`],
  ];

  it.each(figures)('%j is %s', (typed, text) => {
    for (const mark of MARKS) expect(readNumber(typed, mark)).toEqual({ text });
  });
});

describe('one mark before three digits', () => {
  it.each<[typed: string, mark: DecimalMark, text: string]>([
    ['1.500', '.', '1.500'],
    ['1,500', ',', '1.500'],
    ['-12.345', '.', '-12.345'],
    ['123,456', ',', '123.456'],
  ])('%j with the mark %s of the page is %s', (typed, mark, text) => {
    expect(readNumber(typed, mark)).toEqual({ text });
  });

  it.each<[typed: string, mark: DecimalMark, readings: [string, string]]>([
    ['1,500', '.', ['1.500', '1500']],
    ['1.500', ',', ['1.500', '1500']],
    ['123,000', '.', ['123.000', '123000']],
    ['\u221212.345', ',', ['-12.345', '-12345']],
    ['+1,234', '.', ['1.234', '1234']],
    ['\uff11\uff0c\uff15\uff10\uff10', '.', ['1.500', '1500']],
  ])('%j where the page writes %s may be %j', (typed, mark, readings) => {
    expect(readNumber(typed, mark)).toEqual({ doubt: 'ambiguous', readings });
  });
});

describe('what is asked about', () => {
  const doubts: Partial<Record<NumberDoubt, readonly string[]>> = {
    'two-marks': [
      '8.4.0', '8,4,0', '1..2', '8.4,', '1,23,456', '1234,567,890', '0,123,456', '1.234.56', '1.234.567.', '1234.567,8',
      '1.2,3', '1,234.5.6', '1.234,567,890', '1,2.3,4', ',234.5', '0,234.5', '1 234.567,8', '8.4 8.4',
    ],
    'has-unit': [
      '8.4 mL', '8,4ml', '8.4\u00a0mL', '8.4.0 mL', '1,500 kg', '50%', '0,5 %', '5\u2030', '50\uff05', '20 °C', '20°',
      '0.1 mol/L', '0.1 mol·L⁻¹', '2.1 mg KOH/g', '0.5 g/100 g', '1 m³', '1 m3', '55 US gal', '5 min.', '0.5 % (m/m)',
      '5 µL', '3 €', '8.4 л',
    ],
    exponent: ['1e5', '1,2E+05', '1.2e-3', '-1e\u22123', '1 e5', '1.e0', '1.2.3e4'],
    'too-many-digits': [
      '12345678901234567890123456789012345',
      `1.${'0'.repeat(34)}`,
      `0,${'0'.repeat(20)}${'7'.repeat(35)}`,
      '9'.repeat(200),
    ],
    'not-a-number': [
      // marks and signs alone, doubled or out of place
      '-', '+', ',', '.', '-.', "'", '--5', '+-5', '- 5', '5-', '\u20145', "8'",
      // words, and what other programs call numbers
      'mL', 'abc', 'eight', 'e5', 'NaN', 'Infinity', '-Infinity', '0x1F', '0b11', '1_000', '12abc34', '$5',
      // more or less than one number
      '(5)', '~5', '<0.1', '±5', '5/2', '12:30', '8.4*2', '8 mL 4', '8.4 mL!', '8\t4', '8\n4',
      // malformed groups
      '1 23', '12 34,5', '1234 567', '0 500', '1  234', "1'23", "1 234'567", '1.234 567',
      // characters that only look harmless
      '8\u0000', '\u00008', '8\u0007', '8\u0085', '\ud83d\ude00', '8.4 \ud83d\udee2', '8.4\ud83d', '5\u0300',
      '\u00bd', '1\u00bd', '8\u00b2', '\u2167',
      // too long to be a figure
      '1'.repeat(201),
      `${' '.repeat(200)}8`,
    ],
  };
  const table = Object.entries(doubts).flatMap(([doubt, all]) => all.map((typed) => [typed, doubt] as const));

  it.each(table)('%j: %s', (typed, doubt) => {
    for (const mark of MARKS) expect(readNumber(typed, mark)).toEqual({ doubt });
  });

  it('has an example of every doubt', () => {
    expect([...Object.keys(doubts), 'ambiguous'].sort()).toEqual([...NUMBER_DOUBTS].sort());
  });
});

describe('an empty field', () => {
  it.each(['', ' ', '\t\r\n', '\u00a0\u202f', '\ufeff', '\u200f'])('%j is empty', (typed) => {
    for (const mark of MARKS) expect(readNumber(typed, mark)).toEqual({ empty: true });
  });
});

describe('any text', () => {
  /** Canonical text of at most 34 significant digits. A zero has no sign. */
  const canonical = fc
    .record({
      minus: fc.boolean(),
      whole: fc.stringMatching(/^(?:0|[1-9]\d{0,16})$/),
      fraction: fc.stringMatching(/^(?:\.\d{1,17})?$/),
    })
    .map(({ minus, whole, fraction }) => (minus && /[1-9]/.test(whole + fraction) ? '-' : '') + whole + fraction);
  const language = fc.constantFrom<[tag: string, mark: DecimalMark]>(
    ['en', '.'], ['de', ','], ['de-CH', '.'], ['fr', ','], ['fa', '.'],
  );

  it('comes back from a field as it was', () => {
    fc.assert(
      fc.property(canonical, language, (text, [tag, mark]) => {
        expect(readNumber(fieldText(text, tag), mark)).toEqual({ text });
      }),
      seeded,
    );
  });

  it('comes back from what is shown as it was', () => {
    fc.assert(
      fc.property(canonical, language, (text, [tag, mark]) => {
        expect(readNumber(showNumber(text, tag), mark)).toEqual({ text });
      }),
      seeded,
    );
  });

  it('loses leading zeros and a plus, nothing else', () => {
    fc.assert(
      fc.property(canonical, fc.nat(5), fc.constantFrom(...MARKS), (text, zeros, mark) => {
        const [, minus, figure = ''] = /^(-?)(.*)$/.exec(text) ?? [];
        const typed = (minus ? '\u2212' : '+') + '0'.repeat(zeros) + figure.replace('.', mark);
        expect(readNumber(typed, mark)).toEqual({ text });
      }),
      seeded,
    );
  });

  it('is never guessed in the mark of another language', () => {
    fc.assert(
      fc.property(canonical, fc.constantFrom(...MARKS), (text, mark) => {
        const result = readNumber(text.replace('.', mark === '.' ? ',' : '.'), mark);
        if (/^-?[1-9]\d{0,2}\.\d{3}$/.test(text)) {
          expect(result).toEqual({ doubt: 'ambiguous', readings: [text, text.replace('.', '')] });
        } else {
          expect(result).toEqual({ text });
        }
      }),
      seeded,
    );
  });

  it('gives canonical text, a known doubt or nothing, and never throws', () => {
    const alphabet = [...'0123456789.,-+\u2212 \u00a0\u202f\'\u2019eE%/·°*()^100mLgK\u0000\u0663\uff15²'];
    const typed = fc.oneof(
      fc.string({ unit: 'binary', maxLength: 250 }),
      fc.string({ unit: 'grapheme', maxLength: 250 }),
      fc.array(fc.integer({ min: 0, max: 0xffff }), { maxLength: 20 }).map((units) => String.fromCharCode(...units)),
      fc.string({ unit: fc.constantFrom(...alphabet), maxLength: 250 }),
      fc.string({ unit: fc.constantFrom(...'01.,-'), maxLength: 12 }),
    );
    fc.assert(
      fc.property(typed, fc.constantFrom(...MARKS), (text, mark) => {
        const result = readNumber(text, mark);
        if ('text' in result) {
          expect(result.text).toMatch(CANONICAL);
          expect(readNumber(result.text, '.')).toEqual(result);
        } else if ('doubt' in result) {
          expect(NUMBER_DOUBTS).toContain(result.doubt);
          expect(result.readings !== undefined).toBe(result.doubt === 'ambiguous');
          for (const reading of result.readings ?? []) expect(readNumber(reading, '.')).toEqual({ text: reading });
        } else {
          expect(result).toEqual({ empty: true });
          expect(text).not.toMatch(/[0-9]/);
        }
      }),
      { ...seeded, numRuns: 10_000 },
    );
  });

  it.each([
    `8${' a'.repeat(99)}!`,
    `8${' /100 a'.repeat(28)}!`,
    `8${'a'.repeat(198)}!`,
    '1 '.repeat(100),
    '1,'.repeat(100),
    `${' '.repeat(199)}!`,
    '1'.repeat(10_000_000),
  ])('takes no time when it is hopeless', (typed) => {
    // a search that grew with the square of the text or worse would not come back within the test's time
    expect(readNumber(typed, '.')).toHaveProperty('doubt');
  });
});
