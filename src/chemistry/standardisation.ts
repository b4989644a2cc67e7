import { constant, whereBelow } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { limit, quantity } from '../formula/quantity.js';
import type { Quantity } from '../formula/quantity.js';
import { gram, gramPerMole, millilitre, molePerLitre, percent } from '../formula/units.js';
import { dropVolume, ofNearlyAll, rectangular, standardisationRepeatability, temperatureSpread } from './equipment.js';
import { RANGE_FACTORS, factorOf, meanOf, rangeOfRuns } from './replicates.js';
import { buretteReadings } from './run.js';
import { ATOMIC_WEIGHTS, GUM_SHAPES, ISO_5725_6, PRACTICE, QUAM } from './sources.js';
import { M_KHP } from './substances.js';
import { titrantExpansion } from './titration.js';

// The strength of the titrant against potassium hydrogen phthalate (KHP), which one mole of alkali neutralises mole for mole.

export const khpPurity = quantity({
  key: 'khpPurity', symbol: 'P_KHP', unit: percent, digits: { decimals: 2 },
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '100', 'above-100-percent')],
});
export const khpMolarMass = quantity({
  key: 'khpMolarMass', symbol: 'M_KHP', unit: gramPerMole, cites: [ATOMIC_WEIGHTS], is: M_KHP, digits: { decimals: 3 },
});
/** Titre of the water alone. */
export const khpBlank = quantity({
  key: 'khpBlank', symbol: 'V_0,KHP', unit: millilitre, digits: { decimals: 2 },
  limits: [limit('atLeast', '0', 'negative'), limit('atMost', '1000', 'out-of-range')],
});
/** A blank of nothing was not titrated, and has no end point to overshoot. */
export const khpBlankEndPointDoubt = quantity({
  key: 'u.khpBlankEndPoint', symbol: 'u_end,0,KHP', unit: millilitre, cites: [GUM_SHAPES, PRACTICE], digits: { significant: 2 },
  is: whereBelow(constant('0', millilitre), khpBlank, rectangular(dropVolume.per('2')), constant('0', millilitre)),
});

/** One weighed portion of KHP and the titrant it took. */
export interface StandardisationRun {
  readonly titre: Quantity;
  readonly concentration: Quantity;
  readonly all: readonly Quantity[];
}

/**
 * The quantities of one run: c = 1000 · m · P / (M · (V − V0)).
 * 0.3888 g of pure KHP that takes 18.64 mL makes 0.1021 mol/L.
 *
 * @param prefix of its keys, e.g. `titrant.run1.`
 * @param mark subscript of its symbols
 */
export function standardisationRun(prefix: string, mark: string): StandardisationRun {
  const portion = quantity({
    key: `${prefix}portion`, symbol: `m_${mark}`, unit: gram, digits: { significant: 5 },
    limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '100', 'out-of-range')],
  });
  const { titre, all } = buretteReadings(prefix, mark);
  const netTitre = quantity({
    key: `${prefix}netTitre`, symbol: `V_net${mark}`, unit: millilitre, cites: [QUAM], digits: { decimals: 3 },
    is: titre.minus(khpBlank),
    limits: [limit('above', '0', 'titre-not-above-blank', `${prefix}buretteEnd`)],
  });
  const concentration = quantity({
    key: `${prefix}concentration`, symbol: `c_${mark}`, unit: molePerLitre, cites: [QUAM], digits: { significant: 5 },
    is: portion.times(khpPurity).per(khpMolarMass.times(netTitre)).in(molePerLitre),
    limits: [limit('atMost', '20', 'out-of-range', `${prefix}portion`)],
  });
  return { titre, concentration, all: [portion, ...all, netTitre, concentration] };
}

/**
 * The mean over the runs that count, which titrations use, and what the scatter of each and
 * the temperature of the room leave in doubt about it.
 */
export function standardised(runs: readonly StandardisationRun[]): readonly Quantity[] {
  const concentration = quantity({
    key: 'titrant.concentration', symbol: 'c_KHP', unit: molePerLitre, cites: [QUAM], digits: { significant: 5 }, is: meanOf(runs.map((run) => run.concentration)),
  });
  const titre = quantity({
    key: 'titrant.meanTitre', symbol: 'V_KHP', unit: millilitre, cites: [QUAM], digits: { decimals: 2 }, is: meanOf(runs.map((run) => run.titre)),
  });
  const scatter = quantity({
    key: 'u.khpRepeatability', symbol: 'u_rep,c', unit: molePerLitre, cites: [QUAM], digits: { significant: 2 },
    is: concentration.times(standardisationRepeatability).in(molePerLitre),
  });
  const temperature = quantity({
    key: 'u.khpTemperature', symbol: 'u_t,KHP', unit: millilitre, cites: [QUAM], digits: { significant: 2 },
    is: titre.times(titrantExpansion).times(ofNearlyAll(temperatureSpread)),
  });
  return [concentration, titre, scatter, temperature, ...rangeOf(runs.map((run) => run.concentration), concentration)];
}

/** How far the runs lie apart, and how far they may. */
function rangeOf(runs: readonly Quantity[], mean: Quantity): readonly Quantity[] {
  if (runs.length < 2) return [];
  const like = (key: string, symbol: string, is: Expression): Quantity =>
    quantity({ key: `titrant.${key}`, symbol, unit: molePerLitre, cites: [ISO_5725_6], digits: { significant: 2 }, is });
  return [
    like('range', 'R_c', rangeOfRuns(runs)),
    like('criticalRange', 'CR_c', constant(factorOf(RANGE_FACTORS, runs.length), undefined, { source: ISO_5725_6 }).times(mean.times(standardisationRepeatability).in(molePerLitre))),
  ];
}
