import { describe, expect, it } from 'vitest';
import { LINE_DOUBTS, readCurveText } from '../../src/exchange/curve-text.js';
import { NUMBER_DOUBTS } from '../../src/exchange/number-text.js';
import { deCurve } from '../../src/locales/de-curve.js';
import { enCurve } from '../../src/locales/en-curve.js';
import { CURVE_REFUSALS, CURVE_REMARKS, GRAN_REFUSALS } from '../../src/decision/titration-curve/codes.js';
import type { CurvePoint } from '../../src/decision/titration-curve/points.js';

const point = (volume: number, reading: number): CurvePoint => ({ volume, reading });
const TWO = [point(0, 4.21), point(0.5, 4.4)];

describe('columns', () => {
  it.each([
    ['tabs', '0\t4.21\n0.5\t4.4'],
    ['semicolons', '0;4.21\n0.5;4.4'],
    ['semicolons and decimal commas', '0;4,21\n0,5;4,4'],
    ['spaces', '0 4.21\n  0.5   4.4  '],
    ['spaces and decimal commas', '0 4,21\n0,5 4,4'],
    ['commas', '0,4.21\n0.5,4.4'],
    ['commas with spaces', '0, 4.21\n0.5, 4.4'],
    ['other line ends, empty lines', '\r\n0\t4.21\r\n\r\n0.5\t4.4\r\n\r\n'],
    ['a separator at the end', '0;4.21;\n0.5;4.4;'],
    ['a minus sign of print', '0\t4.21\n0.5\t4.4'],
  ])('parted by %s', (_, text) => {
    for (const mark of ['.', ','] as const) expect(readCurveText(text, mark)).toEqual({ points: TWO, faults: [] });
  });

  it('negative readings', () => {
    expect(readCurveText('0\t−120,5\n0,5\t-98', ',').points).toEqual([point(0, -120.5), point(0.5, -98)]);
  });

  it('a comma that may be either is asked about', () => {
    expect(readCurveText('1,50\n2,60', ',')).toEqual({
      points: [], faults: [{ line: 1, code: 'which-comma', typed: '1,50' }, { line: 2, code: 'which-comma', typed: '2,60' }],
    });
    expect(readCurveText('1,50,4,21', '.').faults).toEqual([{ line: 1, code: 'one-column', typed: '1,50,4,21' }]);
  });
});

describe('decimal marks', () => {
  it('are those of the text where it is clear, else those of the page', () => {
    // 4,21 can be no thousands, so 1,234 beside it is none either
    expect(readCurveText('1,234\t4,21', '.').points).toEqual([point(1.234, 4.21)]);
    expect(readCurveText('1.234\t4.21', ',').points).toEqual([point(1.234, 4.21)]);
    expect(readCurveText('1.234\t4.211', '.').points).toEqual([point(1.234, 4.211)]);
    expect(readCurveText('1,234\t4,211', '.').faults).toEqual([{ line: 1, code: 'ambiguous', typed: '1,234' }]);
  });
});

describe('a heading', () => {
  it.each([
    ['V / mL\tpH\n', 'pH'],
    ['Volume;Potential mV\n', 'potential'],
    ['Sample HK\nV (mL)\tE (mV)\n', 'potential'],
    ['Volumen; EMK\n', 'potential'],
    ['volume\treading\n', undefined],
    ['', undefined],
  ])('%j', (heading, kind) => {
    const read = readCurveText(`${heading}0\t4.21\n0.5\t4.4`, '.');
    expect(read.points).toEqual(TWO);
    expect(read.faults).toEqual([]);
    expect(read.kind).toBe(kind);
  });

  it('may name the columns the other way round', () => {
    expect(readCurveText('pH;V mL\n4.21;0\n4.4;0.5', '.')).toEqual({ points: TWO, faults: [], kind: 'pH' });
  });
});

describe('a line that cannot be read', () => {
  it('is named with its number, and the others are used', () => {
    const text = 'V\tpH\n0\t4.21\n\n0.25\tNaN\nabc\t4.3\n0.3\t\n0.4\t4.35\t21\n0.45\t4.4 mV\n1e-1\t4\n0.5\t4.4';
    expect(readCurveText(text, '.')).toEqual({
      points: TWO,
      kind: 'pH',
      faults: [
        { line: 4, code: 'not-a-number', typed: 'NaN' },
        { line: 5, code: 'not-a-number', typed: 'abc' },
        { line: 6, code: 'one-column', typed: '0.3' },
        { line: 7, code: 'more-columns', typed: '0.4\t4.35\t21' },
        { line: 8, code: 'has-unit', typed: '4.4 mV' },
        { line: 9, code: 'exponent', typed: '1e-1' },
      ],
    });
  });

  it('text alone is all fault, nothing is nothing', () => {
    expect(readCurveText('one\ntwo words', '.').faults).toHaveLength(2);
    expect(readCurveText(' \n\t\n', '.')).toEqual({ points: [], faults: [] });
  });
});

it('takes 100 000 lines', () => {
  const text = Array.from({ length: 100_000 }, (_, i) => `${i / 1000};${i / 10_000}`).join('\n');
  expect(readCurveText(text, '.').points).toHaveLength(100_000);
});

describe.each([['en', enCurve], ['de', deCurve]] as const)('the sentences in %s', (language, texts) => {
  it('are one for each code, and no other', () => {
    expect(Object.keys(texts.refused).sort()).toEqual([...CURVE_REFUSALS].sort());
    expect(Object.keys(texts.remarks).sort()).toEqual([...CURVE_REMARKS].sort());
    expect(Object.keys(texts.gran).sort()).toEqual([...GRAN_REFUSALS].sort());
    expect(Object.keys(texts.lines).sort()).toEqual([...LINE_DOUBTS].sort());
    expect(Object.keys(texts.lines).filter((code) => (NUMBER_DOUBTS as readonly string[]).includes(code))).toEqual([]);
  });

  it('have the figures of the English ones, and the quotes of their language', () => {
    const all = (part: object): string[] => Object.values(part).flatMap((text: string | object) => (typeof text === 'string' ? [text] : all(text)));
    const slots = (text: string): string[] => [...text.matchAll(/\{\w+\}/g)].map(([slot]) => slot).sort();
    const [here, english] = [all(texts), all(enCurve)];
    expect(here.map(slots)).toEqual(english.map(slots));
    for (const text of here) expect(text).not.toMatch(language === 'de' ? /["'”]|\d\.\d/ : /["'„]|\d,\d/);
  });
});
