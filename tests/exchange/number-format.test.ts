import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimalMark, fieldText, showNumber } from '../../src/exchange/number-format.js';

const seeded = { seed: 20240607, numRuns: 1000 };

describe('decimalMark', () => {
  it.each([
    ['en', '.'], ['en-US', '.'], ['en-ZA', ','], ['de', ','], ['de-CH', '.'], ['de-AT', ','], ['fr', ','], ['es', ','],
    ['es-MX', '.'], ['pt-BR', ','], ['ja', '.'], ['hi', '.'],
    // digits are ASCII everywhere, and so is the mark among them
    ['fa', '.'], ['ar-EG', '.'], ['ar-EG-u-nu-arab', '.'], ['de-u-nu-arab', ','],
    // tags in any case; tags that are none; languages that no one knows
    ['DE-de', ','], ['en-US@posix', '.'], ['de_DE', '.'], ['', '.'], ['-', '.'], ['qaa', '.'], ['\u0000', '.'],
  ])('of %j is %s', (language, mark) => {
    expect(decimalMark(language)).toBe(mark);
    expect(decimalMark(language)).toBe(mark);
  });

  it('never throws', () => {
    fc.assert(
      fc.property(fc.string(), (language) => {
        expect(['.', ',']).toContain(decimalMark(language));
      }),
      seeded,
    );
  });
});

describe('showNumber', () => {
  it.each([
    ['0', '0', '0'],
    ['8.40', '8.40', '8,40'],
    ['-0.5', '\u22120.5', '\u22120,5'],
    ['-0.00', '\u22120.00', '\u22120,00'],
    ['1234', '1234', '1234'],
    ['1234.5678', '1234.5678', '1234,5678'],
    ['12345', '12\u202f345', '12\u202f345'],
    ['-12345.60', '\u221212\u202f345.60', '\u221212\u202f345,60'],
    ['123456', '123\u202f456', '123\u202f456'],
    ['1234567.0000000', '1\u202f234\u202f567.0000000', '1\u202f234\u202f567,0000000'],
    [
      '9007199254740993.1',
      '9\u202f007\u202f199\u202f254\u202f740\u202f993.1',
      '9\u202f007\u202f199\u202f254\u202f740\u202f993,1',
    ],
  ])('writes %s', (text, english, german) => {
    expect(showNumber(text, 'en')).toBe(english);
    expect(showNumber(text, 'en-IN')).toBe(english);
    expect(showNumber(text, 'en-US@posix')).toBe(english);
    expect(showNumber(text, 'de')).toBe(german);
    expect(showNumber(text, 'fr')).toBe(german);
  });

  it.each(['', '-', '1e-41', 'NaN', 'Infinity', '1.', '.5', '1,5', ' 1'])('leaves %j as it is', (text) => {
    expect(showNumber(text, 'de')).toBe(text);
  });

  it('keeps every digit, in groups of three', () => {
    fc.assert(
      fc.property(fc.stringMatching(/^-?(?:0|[1-9]\d{0,60})(?:\.\d{1,60})?$/), (text) => {
        const shown = showNumber(text, 'de');
        expect(shown).toMatch(/^\u2212?(?:\d{1,4}|\d{1,3}(?:\u202f\d{3})+)(?:,\d+)?$/);
        expect(shown.replaceAll('\u202f', '').replace('\u2212', '-').replace(',', '.')).toBe(text);
      }),
      seeded,
    );
  });

  it('takes text of any length', () => {
    const shown = showNumber(`${'123'.repeat(200_000)}.${'4'.repeat(200_000)}`, 'de');
    expect(shown === `${Array(200_000).fill('123').join('\u202f')},${'4'.repeat(200_000)}`).toBe(true);
  });
});

describe('fieldText', () => {
  it.each([
    ['0', '0', '0'],
    ['8.40', '8.40', '8,40'],
    ['-0.5', '-0.5', '-0,5'],
    ['-1234567.50', '-1234567.50', '-1234567,50'],
  ])('writes %s', (text, english, german) => {
    expect(fieldText(text, 'en')).toBe(english);
    expect(fieldText(text, 'de')).toBe(german);
  });
});
