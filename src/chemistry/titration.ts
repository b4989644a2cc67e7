import { constant, named } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import {
  day, degreeCelsius, gram, gramPerLitre, gramPerMillilitre, gramPerMole, litre, millilitre, molePerLitre, one, perDegree, percent,
} from '../formula/units.js';
import { AOCS_CD_3D, EN_14104_TEMPERATURE, ISO_660, STOICHIOMETRY, WATER_EXPANSION } from './sources.js';
import { M_KOH, M_NAOH } from './substances.js';

// What all runs of a titration share: the titrant, the blank and the temperature.

/** How the portions are measured out. */
export const sampleTakenBy = choice('sampleTakenBy', ['weighing', 'volume']);
/** Neutralised solvent has no blank; otherwise the blank is subtracted. Both at once under-reports. */
export const blankPolicy = choice('blankPolicy', ['solvent-neutralised', 'blank-subtracted']);
export const titrantAlkali = choice('titrantAlkali', ['KOH', 'NaOH']);
export const titrantSolvent = choice('titrantSolvent', ['alcoholic', 'aqueous']);
/** How the titrant's strength is known. A strength typed for a lot is taken as from a label. */
export const titrantKnownFrom = choice('titrantKnownFrom', ['label', 'weighing', 'standardised']);
/** Whether the temperature was read at the titration and the site corrects for it; without, volumes are taken as they are. */
export const temperatureTaken = choice('temperatureTaken', ['no', 'yes']);
/** Whether the strength is given in mol/L or in g/L; follows the unit typed. */
export const titrantStrengthBy = choice('titrantStrengthBy', ['amount', 'mass']);

export const sampleDensity = quantity({
  key: 'sampleDensity', symbol: 'ρ_s', unit: gramPerMillilitre, digits: { decimals: 3 },
  limits: [limit('atLeast', '0.5', 'out-of-range'), limit('atMost', '1.5', 'out-of-range')],
});

export const titrantMolarity = quantity({
  key: 'titrantMolarity', symbol: 'c_M', unit: molePerLitre,
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '20', 'out-of-range')],
});
export const titrantMassStrength = quantity({
  key: 'titrantMassStrength', symbol: 'γ', unit: gramPerLitre,
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '1000', 'out-of-range')],
});

export const titrantMolarMass = quantity({
  key: 'titrantMolarMass', symbol: 'M_t', unit: gramPerMole, cites: [STOICHIOMETRY], digits: { decimals: 3 },
  is: titrantAlkali.of({ KOH: M_KOH, NaOH: M_NAOH }),
});

/** Alkali weighed into a volumetric flask, for a titrant that was not standardised. */
export const titrantWeighedMass = quantity({
  key: 'titrantWeighedMass', symbol: 'm_t', unit: gram,
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '10000', 'out-of-range')],
});
export const titrantWeighedAssay = quantity({
  key: 'titrantWeighedAssay', symbol: 'w_t', unit: percent, digits: { decimals: 1 },
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '100', 'above-100-percent')],
});
export const titrantFlaskVolume = quantity({
  key: 'titrantFlaskVolume', symbol: 'V_flask', unit: litre,
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '1000', 'out-of-range')],
});

/** Equals the normality for NaOH and KOH. 1 g/L of NaOH is 0.0250 mol/L. */
export const titrantConcentration = quantity({
  key: 'titrantConcentration', symbol: 'c', unit: molePerLitre, cites: [ISO_660],
  is: titrantKnownFrom.of({
    label: titrantStrengthBy.of({ amount: titrantMolarity, mass: titrantMassStrength.per(titrantMolarMass) }),
    weighing: titrantWeighedMass.times(titrantWeighedAssay).per(titrantMolarMass.times(titrantFlaskVolume)).in(molePerLitre),
    standardised: named('titrant.concentration'),
  }),
});

export const titrationTemperature = quantity({
  key: 'titrationTemperature', symbol: 't', unit: degreeCelsius, digits: { decimals: 1 },
  limits: [limit('atLeast', '-20', 'out-of-range'), limit('atMost', '80', 'out-of-range')],
});
export const standardisationTemperature = quantity({
  key: 'standardisationTemperature', symbol: 't_0', unit: degreeCelsius, digits: { decimals: 1 },
  limits: [limit('atLeast', '-20', 'out-of-range'), limit('atMost', '80', 'out-of-range')],
});

export const titrantExpansion = quantity({
  key: 'titrantExpansion', symbol: 'β', unit: perDegree, cites: [EN_14104_TEMPERATURE, WATER_EXPANSION],
  is: titrantSolvent.of({
    alcoholic: constant('0.0011', perDegree, { source: EN_14104_TEMPERATURE }),
    aqueous: constant('0.00021', perDegree, { source: WATER_EXPANSION }),
  }),
});

/** What a volume read at the titration's temperature would be at the temperature of standardisation. */
export const volumeFactor = quantity({
  key: 'volumeFactor', symbol: 'f_t', unit: one, cites: [EN_14104_TEMPERATURE], digits: { decimals: 5 },
  is: temperatureTaken.of({
    no: constant('1'),
    yes: constant('1').minus(titrantExpansion.times(titrationTemperature.minus(standardisationTemperature))),
  }),
});

/** Age up to which a standardised titrant is used. */
export const titrantAgeLimit = quantity({
  key: 'titrantAgeLimit', symbol: 't_max', unit: day, digits: { decimals: 0 },
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '3650', 'out-of-range')],
});

/** Titre of the solvent alone. */
export const blank = quantity({
  key: 'blank', symbol: 'V_0', unit: millilitre, digits: { decimals: 2 },
  limits: [limit('atLeast', '0', 'negative'), limit('atMost', '1000', 'out-of-range')],
});

export const correctedBlank = quantity({
  key: 'correctedBlank', symbol: 'V_0′', unit: millilitre, cites: [AOCS_CD_3D, ISO_660], digits: { decimals: 3 },
  is: blankPolicy.of({ 'solvent-neutralised': constant('0', millilitre), 'blank-subtracted': blank.times(volumeFactor) }),
});
