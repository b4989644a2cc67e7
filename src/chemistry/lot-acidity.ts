import { constant } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import type { Choice, Quantity } from '../formula/quantity.js';
import { gramPerLitre, millimolePerGram } from '../formula/units.js';
import { acidValueLike, acidValueOf, freeFattyAcidLike, freeFattyAcidOf, fromAcidValue, fromFreeFattyAcid, greatestAcidContent } from './acidity.js';
import { certificateTolerance, rectangular } from './equipment.js';
import { GUM_SHAPES, ISO_660, PRACTICE } from './sources.js';
import { sampleDensity, titrantMolarMass } from './titration.js';

const SOURCES = ['titration', 'certificate-acid-value', 'certificate-ffa'] as const;

/** Acidity of a lot of oil: from runs of a titration, or from a certificate. */
export interface Acidity {
  readonly acidContent: Quantity;
  readonly acidValue: Quantity;
  readonly freeFattyAcid: Quantity;
  readonly all: readonly (Quantity | Choice)[];
}

/**
 * The acidity that dosing starts from. Everything downstream uses the acid content b, never a
 * rounded acid value or FFA, so that no method's constant enters a dose twice.
 *
 * @param prefix of the keys: empty for the lot as it came, `retest.` after pretreatment
 * @param titrated acid content that the runs make
 */
export function acidity(prefix: '' | 'retest.', titrated: Quantity): Acidity {
  const from = choice(`${prefix}acidKnownFrom`, SOURCES);
  const certificateAcidValue = quantity({
    key: `${prefix}certificateAcidValue`, symbol: 'AV_cert', ...acidValueLike,
    limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '935', 'out-of-range')],
  });
  const certificateFfa = quantity({
    key: `${prefix}certificateFfa`, symbol: 'FFA_cert', ...freeFattyAcidLike,
    limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '100', 'ffa-above-100')],
  });
  const acidContent = quantity({
    key: `${prefix}acidContent`, symbol: prefix ? 'b_r' : 'b', unit: millimolePerGram, cites: [ISO_660],
    is: from.of({
      titration: titrated,
      'certificate-acid-value': fromAcidValue(certificateAcidValue),
      'certificate-ffa': fromFreeFattyAcid(certificateFfa),
    }),
    limits: [limit('atMost', greatestAcidContent, 'ffa-above-100', certificateAcidValue.key)],
  });
  const acidValue = quantity({ key: `${prefix}acidValue`, symbol: prefix ? 'AV_r' : 'AV', ...acidValueLike, is: acidValueOf(acidContent) });
  const freeFattyAcid = quantity({ key: `${prefix}freeFattyAcid`, symbol: prefix ? 'FFA_r' : 'FFA', ...freeFattyAcidLike, is: freeFattyAcidOf(acidContent) });
  const byCertificate = rectangular(acidContent.times(certificateTolerance).in(millimolePerGram));
  const doubt = quantity({
    key: `${prefix}u.certificate`, symbol: prefix ? 'u_cert,r' : 'u_cert', unit: millimolePerGram, cites: [GUM_SHAPES, PRACTICE], digits: { significant: 2 },
    is: from.of({ titration: constant('0', millimolePerGram), 'certificate-acid-value': byCertificate, 'certificate-ffa': byCertificate }),
  });
  return { acidContent, acidValue, freeFattyAcid, all: [from, certificateAcidValue, certificateFfa, acidContent, acidValue, freeFattyAcid, doubt] };
}

/** The bench figure "grams of alkali per litre of oil": x mL of 1 g/L titrant a millilitre of oil is x g/L. */
export const alkaliPerLitreOfOil = (acidContent: Quantity): Quantity =>
  quantity({
    key: 'alkaliPerLitreOfOil', symbol: 'a', unit: gramPerLitre, cites: [PRACTICE],
    is: acidContent.times(sampleDensity).times(titrantMolarMass), digits: { significant: 3 },
  });
