import { limit, quantity } from '../formula/quantity.js';
import type { Quantity } from '../formula/quantity.js';
import { gram, millilitre, millimolePerGram } from '../formula/units.js';
import { acidValueLike, acidValueOf, freeFattyAcidLike, freeFattyAcidOf, greatestAcidContent } from './acidity.js';
import { EN_14104, EN_14104_TEMPERATURE, ISO_660 } from './sources.js';
import { correctedBlank, sampleDensity, sampleTakenBy, titrantConcentration, volumeFactor } from './titration.js';

/** One run of a titration: a portion, two burette readings, and what follows from them. */
export interface TitrationRun {
  readonly acidContent: Quantity;
  readonly all: readonly Quantity[];
}

/**
 * The quantities of one run.
 *
 * @param prefix of its keys, e.g. `run1.` or `retest.run1.`
 * @param mark subscript of its symbols, e.g. `1` or `r1`
 */
export function titrationRun(prefix: string, mark: string): TitrationRun {
  const weighedMass = quantity({
    key: `${prefix}weighedMass`, symbol: `m_w${mark}`, unit: gram, digits: { significant: 4 },
    limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '1000', 'out-of-range')],
  });
  const sampleVolume = quantity({
    key: `${prefix}sampleVolume`, symbol: `V_s${mark}`, unit: millilitre,
    limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '1000', 'out-of-range')],
  });
  const sampleMass = quantity({
    key: `${prefix}sampleMass`, symbol: `m_${mark}`, unit: gram, cites: [ISO_660],
    is: sampleTakenBy.of({ weighing: weighedMass, volume: sampleVolume.times(sampleDensity) }),
  });
  const { titre, all: readings } = buretteReadings(prefix, mark);
  const correctedTitre = quantity({
    key: `${prefix}correctedTitre`, symbol: `V′_${mark}`, unit: millilitre, cites: [EN_14104_TEMPERATURE], digits: { decimals: 3 },
    is: titre.times(volumeFactor),
  });
  const netTitre = quantity({
    key: `${prefix}netTitre`, symbol: `V_net${mark}`, unit: millilitre, cites: [ISO_660, EN_14104], digits: { decimals: 3 },
    is: correctedTitre.minus(correctedBlank),
    limits: [limit('above', '0', 'titre-not-above-blank', `${prefix}buretteEnd`)],
  });
  const acidContent = quantity({
    key: `${prefix}acidContent`, symbol: `b_${mark}`, unit: millimolePerGram, cites: [ISO_660, EN_14104],
    is: titrantConcentration.times(netTitre).per(sampleMass),
    limits: [limit('atMost', greatestAcidContent, 'ffa-above-100', sampleMass.key)],
  });
  const acidValue = quantity({ key: `${prefix}acidValue`, symbol: `AV_${mark}`, ...acidValueLike, is: acidValueOf(acidContent) });
  const freeFattyAcid = quantity({ key: `${prefix}freeFattyAcid`, symbol: `FFA_${mark}`, ...freeFattyAcidLike, is: freeFattyAcidOf(acidContent) });
  return {
    acidContent,
    all: [weighedMass, sampleVolume, sampleMass, ...readings, correctedTitre, netTitre, acidContent, acidValue, freeFattyAcid],
  };
}

/** The two readings of a burette, and the titre between them. */
export function buretteReadings(prefix: string, mark: string): { readonly titre: Quantity; readonly all: readonly Quantity[] } {
  const burette = (end: 'Start' | 'End', symbol: string): Quantity =>
    quantity({
      key: `${prefix}burette${end}`, symbol, unit: millilitre, digits: { decimals: 2 },
      limits: [limit('atLeast', '0', 'negative'), limit('atMost', '1000', 'out-of-range')],
    });
  const start = burette('Start', `V_start${mark}`);
  const end = burette('End', `V_end${mark}`);
  const titre = quantity({
    key: `${prefix}titre`, symbol: `V_${mark}`, unit: millilitre, cites: [ISO_660], digits: { decimals: 2 },
    is: end.minus(start),
    limits: [limit('atLeast', '0', 'end-below-start', end.key)],
  });
  return { titre, all: [start, end, titre] };
}
