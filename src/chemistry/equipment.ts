import { constant } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import type { Quantity } from '../formula/quantity.js';
import type { Unit } from '../formula/unit.js';
import {
  gram, gramPerMillilitre, gramPerMole, kelvin, kilogram, litre, milligramPerGram, millilitre, molePerLitre, one, percent,
} from '../formula/units.js';
import { oilVolumeGiven, weighedOil } from './oil.js';
import { GUM_SHAPES, ISO_385, PRACTICE, QUAM } from './sources.js';
import { temperatureTaken, titrantConcentration, titrantExpansion, titrantKnownFrom } from './titration.js';

// What the site's equipment leaves in doubt: tolerances as the makers state them, and the standard
// uncertainties that follow. A tolerance ±a is rectangular (a/√3), or triangular (a/√6) for glassware,
// of which most pieces lie near their nominal volume.

const tolerance = (key: string, symbol: string, unit: Unit, most: string): Quantity =>
  quantity({ key, symbol, unit, limits: [limit('above', '0', 'not-above-zero'), limit('atMost', most, 'out-of-range')], digits: { significant: 3 } });

const doubt = (key: string, symbol: string, unit: Unit, is: Expression, cites = [GUM_SHAPES]): Quantity =>
  quantity({ key: `u.${key}`, symbol: `u_${symbol}`, unit, is, cites, digits: { significant: 2 } });

const root = (digits: string): Expression => constant(digits).power('0.5');
/** Standard uncertainty of a tolerance of which any value within is as likely. */
export const rectangular = (half: Expression): Expression => half.per(root('3'));
const triangular = (half: Expression): Expression => half.per(root('6'));
/** Of a spread that is meant to hold 95 % of cases. */
export const ofNearlyAll = (spread: Expression): Expression => spread.per('1.96');

// -- the burette ------------------------------------------------------------

/** The burette by its class and capacity, or its own figures. */
export const burette = choice('burette', ['A-10', 'A-25', 'A-50', 'B-10', 'B-25', 'B-50', 'other']);
export const buretteCapacityTyped = tolerance('buretteCapacityTyped', 'V_cap', millilitre, '1000');
export const buretteToleranceTyped = tolerance('buretteToleranceTyped', 'a_site', millilitre, '10');

const volumes = (cases: Readonly<Record<'A-10' | 'A-25' | 'A-50' | 'B-10' | 'B-25' | 'B-50', string>>, other: Expression): Expression => {
  const text = (key: keyof typeof cases): Expression => constant(cases[key], millilitre, { source: ISO_385 });
  return burette.of({ 'A-10': text('A-10'), 'A-25': text('A-25'), 'A-50': text('A-50'), 'B-10': text('B-10'), 'B-25': text('B-25'), 'B-50': text('B-50'), other });
};
export const buretteCapacity = quantity({
  key: 'buretteCapacity', symbol: 'V_bur', unit: millilitre, cites: [ISO_385], digits: { decimals: 0 },
  is: volumes({ 'A-10': '10', 'A-25': '25', 'A-50': '50', 'B-10': '10', 'B-25': '25', 'B-50': '50' }, buretteCapacityTyped),
});
/** Maximum permissible error at any point of the scale. */
export const buretteTolerance = quantity({
  key: 'buretteTolerance', symbol: 'a_bur', unit: millilitre, cites: [ISO_385], digits: { significant: 2 },
  is: volumes({ 'A-10': '0.02', 'A-25': '0.03', 'A-50': '0.05', 'B-10': '0.05', 'B-25': '0.1', 'B-50': '0.1' }, buretteToleranceTyped),
});
export const buretteDoubt = doubt('burette', 'bur', millilitre, triangular(buretteTolerance), [GUM_SHAPES, QUAM]);
export const khpBuretteDoubt = doubt('khpBurette', 'bur,KHP', millilitre, triangular(buretteTolerance), [GUM_SHAPES, QUAM]);

/** The end point is passed by anything up to one drop. */
export const dropVolume = tolerance('dropVolume', 'V_drop', millilitre, '1');
const endPointOf = (key: string, mark: string): Quantity => doubt(key, `end${mark}`, millilitre, rectangular(dropVolume.per('2')), [GUM_SHAPES, PRACTICE]);
export const endPointDoubt = endPointOf('endPoint', '');
/** Of the blank: titrated once, it errs alike in every run, and further runs take nothing from it. */
export const blankEndPointDoubt = endPointOf('blankEndPoint', ',0');

// -- the portion ------------------------------------------------------------

/** Linearity of the balance for portions of oil; it enters twice, for the full and the empty vessel. */
export const balanceLinearity = tolerance('balanceLinearity', 'a_bal', gram, '10');
export const balanceDoubt = doubt('balance', 'bal', gram, root('2').times(rectangular(balanceLinearity)), [QUAM, GUM_SHAPES]);
export const sampleVolumeTolerance = tolerance('sampleVolumeTolerance', 'a_Vs', millilitre, '10');
export const sampleVolumeDoubt = doubt('sampleVolume', 'Vs', millilitre, triangular(sampleVolumeTolerance));
export const sampleDensityTolerance = tolerance('sampleDensityTolerance', 'a_ρs', gramPerMillilitre, '0.5');
export const sampleDensityDoubt = doubt('sampleDensity', 'ρs', gramPerMillilitre, rectangular(sampleDensityTolerance));

// -- temperature ------------------------------------------------------------

/** Reach of the thermometer, where the temperature is read. */
export const thermometerTolerance = tolerance('thermometerTolerance', 'a_t', kelvin, '20');
/** How far the laboratory strays from the temperature of standardisation, where it is not read. */
export const temperatureSpread = tolerance('temperatureSpread', 'a_lab', kelvin, '20');
export const temperatureDoubt = doubt('temperature', 't', one,
  titrantExpansion.times(ofNearlyAll(temperatureTaken.of({ no: temperatureSpread, yes: thermometerTolerance }))), [QUAM]);

// -- the titrant ------------------------------------------------------------

export const titrantLabelTolerance = tolerance('titrantLabelTolerance', 'a_label', percent, '50');
export const titrantWeighingTolerance = tolerance('titrantWeighingTolerance', 'a_flask', percent, '50');
/** Of a strength that was not measured; a standardised one carries the doubts of its own runs. */
export const titrantDoubt = doubt('titrant', 'c', molePerLitre, rectangular(titrantKnownFrom.of({
  label: titrantConcentration.times(titrantLabelTolerance).in(molePerLitre),
  weighing: titrantConcentration.times(titrantWeighingTolerance).in(molePerLitre),
  standardised: constant('0', molePerLitre),
})), [GUM_SHAPES, PRACTICE]);

export const khpEndPointDoubt = endPointOf('khpEndPoint', ',KHP');

/** Linearity of the balance that weighs the standard. */
export const standardBalanceLinearity = tolerance('standardBalanceLinearity', 'a_KHP', gram, '1');
export const khpBalanceDoubt = doubt('khpBalance', 'KHP', gram, root('2').times(rectangular(standardBalanceLinearity)), [QUAM, GUM_SHAPES]);
export const khpPurityTolerance = tolerance('khpPurityTolerance', 'a_P', percent, '20');
export const khpPurityDoubt = doubt('khpPurity', 'P', percent, rectangular(khpPurityTolerance), [QUAM, GUM_SHAPES]);
export const khpMolarMassDoubt = doubt('khpMolarMass', 'M', gramPerMole, constant('0.0038', gramPerMole, { source: QUAM }), [QUAM]);
/** Relative standard deviation of one standardisation run. */
export const standardisationRepeatability = tolerance('standardisationRepeatability', 's_c', percent, '20');

// -- what a certificate and the batch leave in doubt -------------------------

export const certificateTolerance = tolerance('certificateTolerance', 'a_cert', percent, '100');

export const oilAmountTolerance = tolerance('oilAmountTolerance', 'a_oil', percent, '50');
export const oilMassDoubt = doubt('oilMass', 'm', kilogram, rectangular(weighedOil.times(oilAmountTolerance).in(kilogram)), [GUM_SHAPES, PRACTICE]);
export const oilVolumeDoubt = doubt('oilVolume', 'V', litre, rectangular(oilVolumeGiven.times(oilAmountTolerance).in(litre)), [GUM_SHAPES, PRACTICE]);
export const catalystAssayTolerance = tolerance('catalystAssayTolerance', 'a_w', percent, '50');
export const catalystAssayDoubt = doubt('catalystAssay', 'w', percent, rectangular(catalystAssayTolerance), [GUM_SHAPES, PRACTICE]);
export const sulfuricAssayTolerance = tolerance('sulfuricAssayTolerance', 'a_H2SO4', percent, '50');
export const sulfuricAssayDoubt = doubt('sulfuricAssay', 'H2SO4', percent, rectangular(sulfuricAssayTolerance), [GUM_SHAPES, PRACTICE]);
export const saponificationTolerance = tolerance('saponificationTolerance', 'a_SV', milligramPerGram, '50');
export const saponificationDoubt = doubt('saponification', 'SV', milligramPerGram, rectangular(saponificationTolerance), [GUM_SHAPES, PRACTICE]);
