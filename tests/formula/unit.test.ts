import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { Decimal } from '../../src/formula/decimal.js';
import { Rational } from '../../src/formula/rational.js';
import { Unit } from '../../src/formula/unit.js';
import * as units from '../../src/formula/units.js';
import { TYPED_UNITS } from '../../src/formula/units.js';

const scaleOf = (unit: Unit): string => unit.scale.toString();
const converted = (figure: string, from: Unit, to: Unit): string => from.convert(new Decimal(figure), to).toString();

describe('scales are exact', () => {
  it.each([
    // NIST SP 811 (2008) appendix B.8: pound (avoirdupois), by its footnote exactly 4.535 923 7 E−01 kg
    ['pound', units.pound, '0.45359237'],
    // NIST SP 811 appendix B.8: gallon (US) 3.785 412 E−03 m³; exactly 231 cubic inches of 2.54 cm
    ['US gallon', units.gallonUS, '0.003785411784'],
    // SI Brochure (2019) table 8: 1 L = 10⁻³ m³; 1 t = 10³ kg; 1 min = 60 s; 1 h = 3600 s
    ['litre', units.litre, '0.001'],
    ['tonne', units.tonne, '1000'],
    ['minute', units.minute, '60'],
    ['hour', units.hour, '3600'],
    // SI Brochure table 7: milli is 10⁻³; the kilogram, not the gram, is the base unit
    ['gram', units.gram, '0.001'],
    ['milligram', units.milligram, '0.000001'],
    ['millilitre', units.millilitre, '0.000001'],
    ['millimole', units.millimole, '0.001'],
    // SI Brochure section 5.4.7: 1 % is the number 0.01
    ['percent', units.percent, '0.01'],
    ['mg/kg', units.milligramPerKilogram, '0.000001'],
    ['g/(100 g)', units.gramPerHundredGram, '0.01'],
    // SI Brochure table 4: J = kg m² s⁻²
    ['J/mol', units.joulePerMole, '1'],
    ['J/(mol·K)', units.joulePerMoleKelvin, '1'],
    ['g/mL', units.gramPerMillilitre, '1000'],
    // SI Brochure table 7: kilo is 10³; an hour of a kilowatt is 3 600 000 J
    ['kJ/mol', units.kilojoulePerMole, '1000'],
    ['kWh', units.kilowattHour, '3600000'],
    ['¤/t', units.currencyPerTonne, '0.001'],
    // NIST SP 811 appendix B.8: an interval of 1 °F is 5/9 K
    ['°F', units.degreeFahrenheit, '5/9'],
  ])('%s', (_, unit, scale) => {
    expect(scaleOf(unit)).toBe(Rational.of(scale).toString());
  });

  it('a US gallon is 231 cubic inches of 25.4 mm', () => {
    expect(units.gallonUS.scale.equals(Rational.of('231').times(Rational.of('0.0254').power(3)))).toBe(true);
  });

  it('a joule is a kilogram square metre per square second', () => {
    const [length, mass, time, amount, temperature, money] = units.joulePerMole.dimension;
    expect([length, mass, time, amount, temperature, money]).toEqual([2, 1, -2, -1, 0, 0]);
  });
});

describe('units made of units', () => {
  it('mL · mol/L is mmol, scale exactly one', () => {
    const made = units.millilitre.times(units.molePerLitre);
    expect(made.sameDimension(units.millimole)).toBe(true);
    expect(made.ratioTo(units.millimole).toString()).toBe('1');
  });

  it('mL · mol/L · g/mol / g is mg/g, scale exactly one', () => {
    const made = units.millilitre.times(units.molePerLitre).times(units.gramPerMole).per(units.gram);
    expect(made.sameDimension(units.milligramPerGram)).toBe(true);
    expect(made.isPure).toBe(true);
    expect(made.ratioTo(units.milligramPerGram).toString()).toBe('1');
    expect(made.ratioTo(units.percent).toString()).toBe('1/10');
  });

  it('mmol/g is mol/kg and g/mL is not kg/m³', () => {
    expect(units.millimolePerGram.ratioTo(units.molePerKilogram).toString()).toBe('1');
    expect(units.gramPerMillilitre.ratioTo(units.kilogramPerCubicMetre).toString()).toBe('1000');
  });

  it('writes the symbol of what it is made of, unless it has one of its own', () => {
    expect(units.gram.per(units.mole).symbol).toBe('g/mol');
    expect(units.kilogram.times(units.kelvin).symbol).toBe('kg·K');
    expect(units.kilogram.power(2).symbol).toBe('kg^2');
    expect(units.cubicMetre.symbol).toBe('m³');
  });

  it('a unit and its inverse cancel, also through powers', () => {
    for (const unit of TYPED_UNITS.values()) {
      const gone = unit.power(3).per(unit).times(unit.power(-2));
      expect(gone.isPure).toBe(true);
      expect(scaleOf(gone)).toBe('1');
    }
  });

  it('tells a mass from an amount', () => {
    expect(units.gram.sameDimension(units.mole)).toBe(false);
    expect(units.gram.sameDimension(units.tonne)).toBe(true);
    expect(units.gramPerMole.sameDimension(units.one)).toBe(false);
  });
});

describe('figures from one unit to another', () => {
  it.each([
    // NIST SP 811 appendix B.8: t/°C = (t/°F − 32)/1.8
    ['68', units.degreeFahrenheit, units.degreeCelsius, '20'],
    ['20', units.degreeCelsius, units.degreeFahrenheit, '68'],
    ['32', units.degreeFahrenheit, units.degreeCelsius, '0'],
    ['212', units.degreeFahrenheit, units.degreeCelsius, '100'],
    ['-40', units.degreeFahrenheit, units.degreeCelsius, '-40'],
    ['-459.67', units.degreeFahrenheit, units.kelvin, '0'],
    // SI Brochure section 2.3.1: t/°C = T/K − 273.15
    ['0', units.kelvin, units.degreeCelsius, '-273.15'],
    ['25', units.degreeCelsius, units.kelvin, '298.15'],
    ['1', units.pound, units.gram, '453.59237'],
    ['1', units.gallonUS, units.litre, '3.785411784'],
    ['3.785411784', units.litre, units.gallonUS, '1'],
    ['1.5', units.hour, units.minute, '90'],
    ['0.05', units.percent, units.milligramPerKilogram, '500'],
    ['2', units.milligramPerGram, units.percent, '0.2'],
    ['0.92', units.gramPerMillilitre, units.kilogramPerCubicMetre, '920'],
  ])('%s %o', (figure, from, to, result) => {
    expect(converted(figure, from, to)).toBe(result);
  });

  it('keeps a figure in its own unit as it is, digit for digit', () => {
    const figure = new Decimal('20.00');
    expect(units.degreeFahrenheit.convert(figure, units.degreeFahrenheit)).toBe(figure);
  });

  it('there and back gives the figure again', () => {
    const typed = [...TYPED_UNITS.values()];
    fc.assert(
      fc.property(fc.constantFrom(...typed), fc.constantFrom(...typed), fc.integer({ min: -99_999, max: 99_999 }), fc.nat({ max: 4 }), (from, to, digits, places) => {
        fc.pre(from.sameDimension(to));
        const figure = new Decimal(`${digits}e-${places}`);
        const back = to.convert(from.convert(figure, to), from);
        // the way may run over a figure without end, such as ninths
        expect(back.minus(figure).abs().lte('1e-24')).toBe(true);
      }),
      { seed: 811, numRuns: 400 },
    );
  });
});

describe('units as typed', () => {
  it('are found by the symbol they print', () => {
    for (const [symbol, unit] of TYPED_UNITS) expect(unit.symbol).toBe(symbol);
    expect(TYPED_UNITS.get('lb')).toBe(units.pound);
    expect(TYPED_UNITS.get('')).toBe(units.one);
    expect(TYPED_UNITS.get('°F')).toBe(units.degreeFahrenheit);
  });

  it('no two units of this folder share a symbol', () => {
    const all = Object.values(units).filter((unit) => unit instanceof Unit);
    expect(all.length).toBeGreaterThan(30);
    expect(new Set(all.map(({ symbol }) => symbol)).size).toBe(all.length);
  });
});

describe('fractions', () => {
  const fraction = fc
    .tuple(fc.bigInt({ min: -(10n ** 12n), max: 10n ** 12n }), fc.bigInt({ min: 1n, max: 10n ** 9n }))
    .map(([over, under]) => Rational.of(`${over}/${under}`));
  const nonZero = fraction.filter((value) => value.over !== 0n);
  const same = (a: Rational, b: Rational): void => expect(a.toString()).toBe(b.toString());
  const always = { seed: 59, numRuns: 200 };

  it.each([
    ['3', '3'],
    ['0.45359237', '45359237/100000000'],
    ['5/9', '5/9'],
    ['-1e-3', '-1/1000'],
    ['1.50e3', '1500'],
    ['-0.5', '-1/2'],
    ['10/-4', '-5/2'],
    ['0/7', '0'],
    ['0.75/1.5', '1/2'],
  ])('reads %s', (text, written) => {
    expect(Rational.of(text).toString()).toBe(written);
  });

  it.each(['', '1,5', 'x', '1.', '.5', '1/', '--1', '1e', 'Infinity'])('does not read %o', (text) => {
    expect(() => Rational.of(text)).toThrow(SyntaxError);
  });

  it('has no zero denominator', () => {
    expect(() => Rational.of('1/0')).toThrow(RangeError);
    expect(() => Rational.one.per(Rational.zero)).toThrow(RangeError);
    expect(() => Rational.zero.power(-1)).toThrow(RangeError);
  });

  it('keeps the laws of arithmetic', () => {
    fc.assert(
      fc.property(fraction, fraction, fraction, (a, b, c) => {
        same(a.plus(b), b.plus(a));
        same(a.times(b), b.times(a));
        same(a.plus(b).plus(c), a.plus(b.plus(c)));
        same(a.times(b).times(c), a.times(b.times(c)));
        same(a.times(b.plus(c)), a.times(b).plus(a.times(c)));
        same(a.minus(b).plus(b), a);
        same(a.plus(Rational.zero), a);
        same(a.times(Rational.one), a);
      }),
      always,
    );
  });

  it('division undoes multiplication, a negative power inverts', () => {
    fc.assert(
      fc.property(fraction, nonZero, fc.integer({ min: -4, max: 4 }), (a, b, n) => {
        same(a.times(b).per(b), a);
        same(b.power(n).times(b.power(-n)), Rational.one);
        same(b.power(n + 1), b.power(n).times(b));
      }),
      always,
    );
  });

  it('is always in lowest terms over a positive denominator, and its text reads back', () => {
    fc.assert(
      fc.property(fraction, nonZero, (a, b) => {
        for (const value of [a, b, a.per(b), a.minus(b)]) {
          expect(value.under > 0n).toBe(true);
          expect(commonDivisor(value.over, value.under)).toBe(1n);
          expect(Rational.of(value.toString()).equals(value)).toBe(true);
        }
        expect(a.equals(b)).toBe(a.minus(b).over === 0n);
      }),
      always,
    );
  });

  it('scales a typed figure with one rounding: the nearest 34 digits to the true product', () => {
    const Wide = Decimal.clone({ precision: 120 });
    const scales = [...TYPED_UNITS.values()].map(({ scale }) => scale);
    fc.assert(
      fc.property(fc.constantFrom(...scales), fc.bigInt({ min: -(10n ** 17n), max: 10n ** 17n }), fc.nat({ max: 9 }), (scale, digits, places) => {
        const figure = new Decimal(`${digits}e-${places}`);
        const truth = new Wide(figure).times(scale.over.toString()).div(scale.under.toString());
        expect(scale.scale(figure).toString()).toBe(new Decimal(truth).toSignificantDigits(34).toString());
      }),
      { seed: 34, numRuns: 300 },
    );
    expect(Rational.of('2/3').scale(new Decimal(1)).toString()).toBe('0.6666666666666666666666666666666667');
  });
});

function commonDivisor(a: bigint, b: bigint): bigint {
  return b === 0n ? (a < 0n ? -a : a) : commonDivisor(b, a % b);
}
