import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { constant, exponential, greatest, least, logarithm, whereBelow } from '../../src/formula/expression.js';
import type { Expression } from '../../src/formula/expression.js';
import { choice, limit, quantity } from '../../src/formula/quantity.js';
import { Refused } from '../../src/formula/reading.js';
import type { Outcome } from '../../src/formula/reading.js';
import {
  gram, gramPerLitre, gramPerMole, kilogram, litre, milligram, milligramPerGram, millilitre, millimolePerGram, molePerKilogram, molePerLitre, one, percent, pound,
} from '../../src/formula/units.js';
import { figuresMath, generalMath, mathMarkup, symbolMath } from '../../src/formula/working-mathml.js';
import type { MathNode } from '../../src/formula/working-mathml.js';
import { figuresText, generalText } from '../../src/formula/working-text.js';
import { evaluated, onlyDigits, withUnit } from './given.js';
import { randomSheet } from './random-sheet.js';

const x = quantity({ key: 'x', symbol: 'x', unit: one });
const z = quantity({ key: 'z', symbol: 'z', unit: one });
const route = choice('route', ['acid', 'base']);

const c = quantity({ key: 'c', symbol: 'c', unit: molePerLitre });
const v = quantity({ key: 'v', symbol: 'V', unit: millilitre });
const v0 = quantity({ key: 'v0', symbol: 'V_0', unit: millilitre });
const m = quantity({ key: 'm', symbol: 'm', unit: gram });
const content = quantity({ key: 'content', symbol: 'b', unit: millimolePerGram, is: c.times(v.minus(v0)).per(m) });
const molarMass = constant('56.1', gramPerMole, { symbol: 'M_KOH' });
const acidValue = quantity({ key: 'acidValue', symbol: 'AV', unit: milligramPerGram, is: content.times(molarMass) });
const titration = [c, v, v0, m, content, acidValue];
const typed = { c: '0.1', v: '5.37', v0: '0.12', m: '2.5' };

interface Written {
  readonly general: string;
  readonly figures: string;
}

/** Both lines of a formula over x, z and the route. */
function lines(is: Expression, values: Readonly<Record<string, string | Outcome>> = { x: '4', z: '-3' }, options: Readonly<Record<string, string>> = {}, unit = one): Written {
  return linesOf('y', [x, z, route, quantity({ key: 'y', symbol: 'y', unit, is })], values, options);
}

function linesOf(key: string, entries: Parameters<typeof evaluated>[0], values: Readonly<Record<string, string | Outcome>>, options: Readonly<Record<string, string>> = {}): Written {
  const { sheet, findings } = evaluated(entries, values, options);
  const asked = [sheet.quantity(key), sheet, findings, withUnit] as const;
  return { general: generalText(...asked), figures: figuresText(...asked) };
}

describe('formulas as a handbook prints them', () => {
  it('the acid content of a titration', () => {
    expect(linesOf('content', titration, typed)).toEqual({
      general: 'c · (V − V_0) / m',
      figures: '0.1 mol/L · (5.37 mL − 0.12 mL) / 2.5 g',
    });
  });

  it('a formula over a formula, and a constant by its symbol', () => {
    expect(linesOf('acidValue', titration, typed)).toEqual({ general: 'b · M_KOH', figures: '0.21 mmol/g · 56.1 g/mol' });
  });

  it('an input has no formula', () => {
    expect(linesOf('v0', titration, typed)).toEqual({ general: 'V_0', figures: 'V_0' });
  });

  it('a rate after Arrhenius', () => {
    const is = constant('2.5e3', one, { symbol: 'A' }).times(exponential(x.per(z)));
    expect(lines(is)).toEqual({ general: 'A · exp(x / z)', figures: '2500 · exp(4 / (−3))' });
  });

  it('a loss held between bounds', () => {
    expect(lines(greatest('0', least(x, '10').minus(z)))).toEqual({ general: 'max(0; min(x; 10) − z)', figures: 'max(0; min(4; 10) − (−3))' });
  });
});

describe('brackets stand only where the order of operations needs them', () => {
  it.each<[string, Expression, string]>([
    ['sum of sums', x.plus(z.plus(x)), 'x + z + x'],
    ['sum of differences', x.plus(z.minus(x)), 'x + z − x'],
    ['difference of sums', x.minus(z.plus(x)), 'x − (z + x)'],
    ['difference of differences', x.minus(z.minus(x)), 'x − (z − x)'],
    ['difference on the left', x.minus(z).minus(x), 'x − z − x'],
    ['difference of a product', x.minus(z.times(x)), 'x − z · x'],
    ['product of sums', x.plus(z).times(x.minus(z)), '(x + z) · (x − z)'],
    ['product of products', x.times(z.times(x)), 'x · z · x'],
    ['product of quotients', x.times(z.per(x)), 'x · z / x'],
    ['quotient of products', x.times(z).per(x), 'x · z / x'],
    ['quotient by a product', x.per(z.times(x)), 'x / (z · x)'],
    ['quotient by a quotient', x.per(z.per(x)), 'x / (z / x)'],
    ['quotient of a quotient', x.per(z).per(x), 'x / z / x'],
    ['quotient of sums', x.plus(z).per(x.plus('1')), '(x + z) / (x + 1)'],
    ['quotient by a power', x.per(z.power('2')), 'x / z^2'],
    ['power of a sum', x.plus(z).power('2'), '(x + z)^2'],
    ['power of a product', x.times(z).power('2'), '(x · z)^2'],
    ['power of a power', x.power('2').power('3'), '(x^2)^3'],
    ['power to a power', x.power(z.power('2')), 'x^(z^2)'],
    ['power to a sum', x.power(z.plus('1')), 'x^(z + 1)'],
    ['negative exponent', x.power('-2'), 'x^(−2)'],
    ['function of a sum', logarithm(x.plus('5')), 'ln(x + 5)'],
    ['power of a function', exponential(x).power('2'), 'exp(x)^2'],
    ['negative constant on the right', x.plus('-2'), 'x + (−2)'],
    ['negative constant on the left', constant('-2').times(x), '(−2) · x'],
    ['negative constant alone', constant('-2'), '−2'],
    ['negative constant in a function', least('-2', x), 'min(−2; x)'],
  ])('%s', (_, is, general) => {
    expect(lines(is).general).toBe(general);
  });

  it('round a negative figure that is put in', () => {
    expect(lines(x.minus(z)).figures).toBe('4 − (−3)');
    expect(lines(z.power('2')).figures).toBe('(−3)^2');
    expect(lines(x.power(z)).figures).toBe('4^(−3)');
    expect(lines(z).figures).toBe('−3');
  });

  it('round a figure with its unit in a power, whose exponent would seem to be the unit’s', () => {
    const side = quantity({ key: 'side', symbol: 'a', unit: kilogram });
    const square = quantity({ key: 'square', symbol: 'y', unit: kilogram.power(2), is: side.power('2') });
    expect(linesOf('square', [side, square], { side: '3' })).toEqual({ general: 'a^2', figures: '(3 kg)^2' });
    expect(linesOf('square', [side, square], { side: '-3' }).figures).toBe('(−3 kg)^2');
    const { sheet, findings } = evaluated([side, square], { side: '3' });
    expect(markup(figuresMath(square, sheet, findings, withUnit))).toBe(
      '<msup><mrow><mo>(</mo><mrow><mn>3</mn><mtext> kg</mtext></mrow><mo>)</mo></mrow><mn>2</mn></msup>',
    );
  });
});

describe('conversions', () => {
  const g = quantity({ key: 'g', symbol: 'm', unit: gram });
  const written = (is: Expression, unit = one): Written => linesOf('y', [g, x, z, quantity({ key: 'y', symbol: 'y', unit, is })], { g: '5', x: '4', z: '-3' });

  it('are printed as a factor or a divisor', () => {
    expect(written(g.in(milligram), milligram)).toEqual({ general: 'm · 1000', figures: '5 g · 1000' });
    expect(written(g.in(kilogram), kilogram)).toEqual({ general: 'm / 1000', figures: '5 g / 1000' });
    expect(written(constant('7', milligramPerGram).in(percent), percent).general).toBe('7 / 10');
  });

  it('are exact where the factor is a fraction', () => {
    expect(written(constant('1', pound, { symbol: 'm_1' }).in(kilogram), kilogram).general).toBe('m_1 · 45359237 / 100000000');
    const fifths = one.scaled('5/9', '5/9');
    expect(written(constant('2', fifths, { symbol: 'k' }).in(one)).general).toBe('k · 5 / 9');
  });

  it('leave no trace where the scale stays', () => {
    expect(written(g.in(gram), gram)).toEqual({ general: 'm', figures: '5 g' });
    expect(written(constant('3', millimolePerGram, { symbol: 'b' }).in(molePerKilogram), molePerKilogram).general).toBe('b');
  });

  it('take brackets round a sum', () => {
    expect(written(g.plus(g).in(milligram), milligram).general).toBe('(m + m) · 1000');
    expect(written(g.minus(g).in(kilogram), kilogram).general).toBe('(m − m) / 1000');
    expect(written(x.per(g.in(kilogram)), one.per(kilogram)).general).toBe('x / (m / 1000)');
  });

  it('to and from per cent', () => {
    expect(written(x.per(z).in(percent), percent)).toEqual({ general: 'x / z · 100', figures: '4 / (−3) · 100 %' });
    expect(written(constant('90', percent, { symbol: 'p' }).in(one))).toEqual({ general: 'p / 100', figures: '90 % / 100 %' });
    // a hundred of something else is no per cent
    const perHundred = gram.per(litre.scaled('100', '(100 L)'), 'g/(100 L)');
    expect(written(constant('7', perHundred).in(gramPerLitre), gramPerLitre).figures).toBe('7 g/(100 L) / 100');
  });
});

describe('choices and thresholds', () => {
  const byRoute = route.of({ acid: x.plus('1'), base: x.times(z) });

  it('show the branch that was taken, as if it stood there alone', () => {
    expect(lines(byRoute, undefined, { route: 'acid' })).toEqual({ general: 'x + 1', figures: '4 + 1' });
    expect(lines(byRoute, undefined, { route: 'base' })).toEqual({ general: 'x · z', figures: '4 · (−3)' });
    expect(lines(byRoute.times('2'), undefined, { route: 'acid' }).general).toBe('(x + 1) · 2');
    expect(lines(whereBelow(x, z, '1', x.minus('1')).times('3'))).toEqual({ general: '(x − 1) · 3', figures: '(4 − 1) · 3' });
    expect(lines(whereBelow(z, x, '1', x)).general).toBe('1');
    expect(lines(whereBelow(x, '4', '1', '2')).general).toBe('2');
  });

  it('show all branches where it is not settled which', () => {
    expect(lines(byRoute).general).toBe('{route: acid → x + 1, base → x · z}');
    expect(lines(byRoute.times('2')).figures).toBe('{route: acid → 4 + 1, base → 4 · (−3)} · 2');
    expect(lines(whereBelow(x, z, x, '7').power('2'), { x: '4' })).toEqual({ general: '{x < z → x, else 7}^2', figures: '{4 < z → 4, else 7}^2' });
  });

  it('show all branches for an option that there is not, whatever its name', () => {
    for (const option of ['both', 'constructor', 'toString', '__proto__']) {
      expect(lines(byRoute, undefined, { route: option }).general).toBe('{route: acid → x + 1, base → x · z}');
    }
  });

  it('show all branches where what is compared has no value', () => {
    const all = '{x / z < 1 → 2, else 3}';
    expect(lines(whereBelow(x.per(z), '1', '2', '3'), { x: '1', z: '0' }).general).toBe(all);
    // though 1 over it would look like a figure again
    expect(lines(whereBelow(constant('1').per(x.per(z)), '1', '2', '3'), { x: '1', z: '0' }).general).toBe('{1 / (x / z) < 1 → 2, else 3}');
    expect(lines(whereBelow(logarithm(z), '1', '2', '3')).general).toBe('{ln(z) < 1 → 2, else 3}');
  });
});

describe('figures that are not known stay symbols', () => {
  it('missing and refused alike', () => {
    const { figures } = linesOf('content', titration, { ...typed, v0: new Refused({ code: 'illegible', quantity: 'v0' }), m: '2.5' });
    expect(figures).toBe('0.1 mol/L · (5.37 mL − V_0) / 2.5 g');
    expect(linesOf('content', titration, {}).figures).toBe('c · (V − V_0) / m');
    expect(linesOf('acidValue', titration, { c: '0.1' }).figures).toBe('b · 56.1 g/mol');
  });

  it('and those that broke a limit', () => {
    const bounded = quantity({ key: 'w', symbol: 'w_1', unit: one, limits: [limit('above', '0', 'negative')] });
    expect(linesOf('y', [bounded, quantity({ key: 'y', symbol: 'y', unit: one, is: bounded.times('2') })], { w: '-1' }).figures).toBe('w_1 · 2');
  });
});

describe('MathML', () => {
  const math = (key: string, values: Record<string, string>, general = false): string => {
    const { sheet, findings } = evaluated(titration, values);
    return markup((general ? generalMath : figuresMath)(sheet.quantity(key), sheet, findings, withUnit));
  };
  const mathOf = (is: Expression, values: Readonly<Record<string, string>> = { x: '4', z: '-3' }, options: Readonly<Record<string, string>> = {}): { general: string; figures: string } => {
    const y = quantity({ key: 'y', symbol: 'y', unit: one, is });
    const { sheet, findings } = evaluated([x, z, route, y], values, options);
    return { general: markup(generalMath(y, sheet, findings, withUnit)), figures: markup(figuresMath(y, sheet, findings, withUnit)) };
  };

  it('the acid content of a titration', () => {
    expect(math('content', typed, true)).toBe(
      '<mfrac><mrow><mi>c</mi><mo>·</mo><mrow><mo>(</mo><mrow><mi>V</mi><mo>−</mo><msub><mi>V</mi><mtext>0</mtext></msub></mrow><mo>)</mo></mrow></mrow><mi>m</mi></mfrac>',
    );
    expect(math('content', typed)).toBe(
      '<mfrac><mrow><mrow><mn>0.1</mn><mtext> mol/L</mtext></mrow><mo>·</mo><mrow><mo>(</mo><mrow><mrow><mn>5.37</mn><mtext> mL</mtext></mrow><mo>−</mo>' +
        '<mrow><mn>0.12</mn><mtext> mL</mtext></mrow></mrow><mo>)</mo></mrow></mrow><mrow><mn>2.5</mn><mtext> g</mtext></mrow></mfrac>',
    );
  });

  it('a constant by its symbol, an input by its own, an unknown figure by its', () => {
    expect(math('acidValue', typed, true)).toBe('<mrow><mi>b</mi><mo>·</mo><msub><mi>M</mi><mtext>KOH</mtext></msub></mrow>');
    expect(math('acidValue', {})).toBe('<mrow><mi>b</mi><mo>·</mo><mrow><mn>56.1</mn><mtext> g/mol</mtext></mrow></mrow>');
    expect(math('v0', typed)).toBe('<msub><mi>V</mi><mtext>0</mtext></msub>');
  });

  it('needs no brackets in a fraction or an exponent, but round a base', () => {
    expect(mathOf(x.plus('1').per(x.per(z))).general).toBe('<mfrac><mrow><mi>x</mi><mo>+</mo><mn>1</mn></mrow><mfrac><mi>x</mi><mi>z</mi></mfrac></mfrac>');
    expect(mathOf(x.power(z.plus('1'))).general).toBe('<msup><mi>x</mi><mrow><mi>z</mi><mo>+</mo><mn>1</mn></mrow></msup>');
    expect(mathOf(x.power('-1')).general).toBe('<msup><mi>x</mi><mn>−1</mn></msup>');
    expect(mathOf(x.per(z).power('2')).general).toBe('<msup><mrow><mo>(</mo><mfrac><mi>x</mi><mi>z</mi></mfrac><mo>)</mo></mrow><mn>2</mn></msup>');
    expect(mathOf(x.power('2').power('3')).general).toBe('<msup><mrow><mo>(</mo><msup><mi>x</mi><mn>2</mn></msup><mo>)</mo></mrow><mn>3</mn></msup>');
  });

  it('sets a negative figure in brackets', () => {
    expect(mathOf(x.minus(z)).figures).toBe('<mrow><mn>4</mn><mo>−</mo><mrow><mo>(</mo><mn>−3</mn><mo>)</mo></mrow></mrow>');
    expect(mathOf(z.power('2')).figures).toBe('<msup><mrow><mo>(</mo><mn>−3</mn><mo>)</mo></mrow><mn>2</mn></msup>');
  });

  it('functions, conversions and the branch taken', () => {
    expect(mathOf(least(exponential(x), '2')).general).toBe(
      '<mrow><mi>min</mi><mo>(</mo><mrow><mi>exp</mi><mo>(</mo><mi>x</mi><mo>)</mo></mrow><mo>;</mo><mn>2</mn><mo>)</mo></mrow>',
    );
    const fifths = one.scaled('5/9', '5/9');
    expect(mathOf(constant('2', fifths).in(one)).general).toBe('<mfrac><mrow><mn>2</mn><mo>·</mo><mn>5</mn></mrow><mn>9</mn></mfrac>');
    const byRoute = route.of({ acid: x, base: z });
    expect(mathOf(byRoute, undefined, { route: 'base' }).general).toBe('<mi>z</mi>');
    expect(mathOf(byRoute).general).toBe(
      '<mrow><mtext>route</mtext><mo>{</mo><mtext>acid: </mtext><mi>x</mi><mo>,</mo><mtext>base: </mtext><mi>z</mi><mo>}</mo></mrow>',
    );
    expect(mathOf(whereBelow(x, z, '1', '2'), {}).general).toBe(
      '<mrow><mo>{</mo><mi>x</mi><mo>&lt;</mo><mi>z</mi><mo>→</mo><mn>1</mn><mo>,</mo><mo>≥</mo><mo>→</mo><mn>2</mn><mo>}</mo></mrow>',
    );
  });

  it('escapes what a symbol or an option may hold', () => {
    expect(mathMarkup(symbolMath('a<b_&c>'))).toBe('<msub><mi>a&lt;b</mi><mtext>&amp;c&gt;</mtext></msub>');
  });

  it('is well-formed for every formula, in the namespace of MathML', () => {
    fc.assert(
      fc.property(randomSheet, fc.boolean(), ({ entries, results, values, options }, settled) => {
        const { sheet, findings } = evaluated(entries, values, settled ? options : {});
        for (const key of results) {
          for (const write of [generalMath, figuresMath]) {
            const written = mathMarkup(write(sheet.quantity(key), sheet, findings, onlyDigits));
            expect(written.startsWith('<math xmlns="http://www.w3.org/1998/Math/MathML">')).toBe(true);
            readMarkup(written);
          }
        }
      }),
      { seed: 1998, numRuns: 60 },
    );
  });
});

/** Markup of what stands in the `math` element. */
function markup(node: MathNode): string {
  const written = mathMarkup(node);
  readMarkup(written);
  return written.replace(/^<math xmlns="[^"]*">|<\/math>$/g, '');
}

/** How many elements each kind of element must have; the others take any number. */
const TAKES: Readonly<Record<string, number>> = { math: 1, mfrac: 2, msub: 2, msup: 2 };
const TEXT = ['mi', 'mn', 'mo', 'mtext'];

/** Fails unless the markup is well-formed and every element holds what MathML Core allows it. */
function readMarkup(text: string): void {
  const open: { tag: string; children: number; text: string }[] = [{ tag: 'document', children: 0, text: '' }];
  const parts = /<(\/?)([a-z]+)(?: xmlns="[^"<&]*")?>|((?:[^<>&]|&(?:lt|gt|amp);)+)/gy;
  let at = 0;
  for (let found = parts.exec(text); found; found = parts.exec(text)) {
    at = parts.lastIndex;
    const [, closing, tag, words] = found;
    const inner = open.at(-1)!;
    if (words !== undefined) inner.text += words;
    else if (!closing) {
      inner.children++;
      open.push({ tag: tag!, children: 0, text: '' });
    } else {
      open.pop();
      expect(tag).toBe(inner.tag);
      const holdsText = TEXT.includes(inner.tag);
      expect(inner.text.length > 0).toBe(holdsText);
      if (holdsText) expect(inner.children).toBe(0);
      else expect(inner.children).toBe(TAKES[inner.tag] ?? inner.children);
    }
  }
  expect(at).toBe(text.length);
  expect(open.map(({ tag, children }) => [tag, children])).toEqual([['document', 1]]);
}
