import { Rational } from './rational.js';
import { BASE_DIMENSIONS, Unit } from './unit.js';

// The units of the trade. Scales are exact by definition (SI Brochure; NIST SP 811 for the US ones).

const base = (dimension: (typeof BASE_DIMENSIONS)[number], symbol: string): Unit =>
  new Unit(symbol, BASE_DIMENSIONS.map((name) => (name === dimension ? 1 : 0)), Rational.one);

export const one = new Unit('', BASE_DIMENSIONS.map(() => 0), Rational.one);
export const percent = one.scaled('0.01', '%');
export const milligramPerKilogram = one.scaled('1e-6', 'mg/kg');

export const kilogram = base('mass', 'kg');
export const gram = kilogram.scaled('0.001', 'g');
export const milligram = gram.scaled('0.001', 'mg');
export const tonne = kilogram.scaled('1000', 't');
export const pound = kilogram.scaled('0.45359237', 'lb');

const metre = base('length', 'm');
export const cubicMetre = metre.power(3, 'm³');
export const litre = cubicMetre.scaled('0.001', 'L');
export const millilitre = litre.scaled('0.001', 'mL');
export const gallonUS = litre.scaled('3.785411784', 'US gal');

export const mole = base('amount', 'mol');
export const millimole = mole.scaled('0.001', 'mmol');

const second = base('time', 's');
export const minute = second.scaled('60', 'min');
export const hour = minute.scaled('60', 'h');
/** For the age of a solution. */
export const day = hour.scaled('24', 'd');
export const perMinute = one.per(minute, '/min');

export const kelvin = base('temperature', 'K');
/** As a difference a degree Celsius is a kelvin; the zero counts only where a typed figure is converted. */
export const degreeCelsius = new Unit('°C', kelvin.dimension, Rational.one, Rational.of('273.15'));
export const degreeFahrenheit = new Unit('°F', kelvin.dimension, Rational.of('5/9'), Rational.of('459.67').times(Rational.of('5/9')));
export const perDegree = one.per(kelvin, '/°C');

const joule = kilogram.times(metre.power(2)).per(second.power(2), 'J');
export const joulePerMole = joule.per(mole);
export const joulePerMoleKelvin = joule.per(mole.times(kelvin), 'J/(mol·K)');
export const kilojoule = joule.scaled('1000', 'kJ');
export const kilojoulePerMole = kilojoule.per(mole);
export const kilojoulePerKilogramKelvin = kilojoule.per(kilogram.times(kelvin), 'kJ/(kg·K)');
export const kilowattHour = joule.scaled('3600000', 'kWh');
export const kilowattHourPerTonne = kilowattHour.per(tonne);

/** The money of the site, whatever it is: the page shows the site's own word for it. */
export const currency = base('money', '¤');
export const currencyPerKilogram = currency.per(kilogram);
export const currencyPerTonne = currency.per(tonne);
/** Of a deduction for each per cent. */
export const currencyPerTonnePerPercent = currencyPerTonne.per(percent, '¤/t per %');
export const currencyPerLitre = currency.per(litre);
export const currencyPerHour = currency.per(hour);
export const currencyPerKilowattHour = currency.per(kilowattHour);

export const molePerLitre = mole.per(litre);
export const gramPerLitre = gram.per(litre);
export const gramPerMole = gram.per(mole);
export const gramPerMillilitre = gram.per(millilitre);
export const kilogramPerCubicMetre = kilogram.per(cubicMetre);
export const kilogramPerCubicMetreDegree = kilogramPerCubicMetre.per(kelvin, 'kg/(m³·°C)');
export const gramPerMillilitreDegree = gramPerMillilitre.per(kelvin, 'g/(mL·°C)');
export const millimolePerGram = millimole.per(gram);
export const molePerKilogram = mole.per(kilogram);
export const milligramPerGram = milligram.per(gram);
export const gramPerKilogram = gram.per(kilogram);
export const gramPerHundredGram = gram.per(gram.scaled('100', '100 g'));
export const molePerMole = mole.per(mole);
export const kilogramPerKilogram = kilogram.per(kilogram);
export const kilogramPerTonne = kilogram.per(tonne);

/** Every unit in which a figure may be typed, by its symbol as it stands in a lot entry. */
export const TYPED_UNITS: ReadonlyMap<string, Unit> = new Map(
  [
    one, percent, milligramPerKilogram, kilogram, gram, milligram, tonne, pound, litre, millilitre, gallonUS,
    cubicMetre, minute, hour, day, kelvin, degreeCelsius, degreeFahrenheit, molePerLitre, gramPerLitre, gramPerMole,
    gramPerMillilitre, kilogramPerCubicMetre, milligramPerGram, gramPerHundredGram, molePerMole,
    kilogramPerKilogram, perDegree, perMinute, joulePerMole, kilogramPerCubicMetreDegree, gramPerMillilitreDegree,
    kilojoulePerMole, kilojoulePerKilogramKelvin, kilowattHourPerTonne, currency, currencyPerKilogram, currencyPerTonne, currency.per(pound),
    currencyPerLitre, currencyPerTonnePerPercent, currency.per(gallonUS), currencyPerHour, currencyPerKilowattHour,
  ].map((unit) => [unit.symbol, unit]),
);
