import { constant } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import type { Digits, QuantityDefinition } from '../formula/quantity.js';
import { gramPerMole, milligramPerGram, millimolePerGram, percent } from '../formula/units.js';
import { FATTY_ACID } from './fatty-acids.js';
import { molarMassOf } from './molar-mass.js';
import { ATOMIC_WEIGHTS, ISO_660, ISO_660_DIGITS, ISO_660_REFERENCE_ACIDS } from './sources.js';

/** The acid that free fatty acid is counted as. */
export const referenceAcid = choice('referenceAcid', ['oleic', 'palmitic', 'lauric', 'erucic', 'linoleic', 'stearic', 'other']);

export const otherAcidMolarMass = quantity({
  key: 'otherAcidMolarMass', symbol: 'M_other', unit: gramPerMole,
  limits: [limit('atLeast', '60', 'out-of-range'), limit('atMost', '500', 'out-of-range')],
});

const method = (text: string): Expression => constant(text, gramPerMole, { source: ISO_660_REFERENCE_ACIDS });
const exact = (acid: keyof typeof FATTY_ACID): Expression => molarMassOf(FATTY_ACID[acid], acid);

/** The molar mass by which the methods count free fatty acid: rounded for the acids that ISO 660 lists. */
export const referenceAcidMolarMass = quantity({
  key: 'referenceAcidMolarMass', symbol: 'M_ref', unit: gramPerMole, cites: [ISO_660_REFERENCE_ACIDS],
  is: referenceAcid.of({
    oleic: method('282'), palmitic: method('256'), lauric: method('200'), erucic: method('338'),
    linoleic: exact('linoleic'), stearic: exact('stearic'), other: otherAcidMolarMass,
  }),
});

/** The true molar mass of the same acid, for masses of acid, soap and ester: no method's rounding enters a balance. */
export const acidMolarMass = quantity({
  key: 'acidMolarMass', symbol: 'M_acid', unit: gramPerMole, cites: [ATOMIC_WEIGHTS],
  is: referenceAcid.of({
    oleic: exact('oleic'), palmitic: exact('palmitic'), lauric: exact('lauric'), erucic: exact('erucic'),
    linoleic: exact('linoleic'), stearic: exact('stearic'), other: otherAcidMolarMass,
  }),
});

/** Acid content of an oil that is nothing but the reference acid: no true result lies above. */
export const greatestAcidContent = quantity({
  key: 'greatestAcidContent', symbol: 'b_max', unit: millimolePerGram, cites: [ISO_660],
  is: constant('100', percent).per(referenceAcidMolarMass).in(millimolePerGram),
});

/** Molar mass of KOH as the methods print it; used for acid values, never for a dose. */
export const METHOD_KOH = constant('56.1', gramPerMole, { source: ISO_660 });

/** Acid value from acid content: AV = 56.1 · b. 0.050 mmol/g is 2.805 mg/g. */
export const acidValueOf = (acidContent: Expression): Expression => METHOD_KOH.times(acidContent);

/** FFA from acid content: FFA = M_ref · b / 10. 0.050 mmol/g is 1.41 % as oleic acid. */
export const freeFattyAcidOf = (acidContent: Expression): Expression => referenceAcidMolarMass.times(acidContent).in(percent);

/** Acid content from a certificate's acid value. */
export const fromAcidValue = (acidValue: Expression): Expression => acidValue.per(METHOD_KOH);

/** Acid content from a certificate's free fatty acid. */
export const fromFreeFattyAcid = (freeFattyAcid: Expression): Expression => freeFattyAcid.in(milligramPerGram).per(referenceAcidMolarMass);

export const ACID_VALUE_DIGITS: Digits = { bands: [{ below: '1', decimals: 2 }, { below: '100', decimals: 1 }, { decimals: 0 }] };
/** Two decimals up to 10 %, so that a result never looks equal to a limit that it misses. */
export const FFA_DIGITS: Digits = { bands: [{ below: '10', decimals: 2 }, { decimals: 1 }] };

/** What acid values share: unit, method, ISO 660's digits. */
export const acidValueLike = { unit: milligramPerGram, cites: [ISO_660, ISO_660_DIGITS], digits: ACID_VALUE_DIGITS } satisfies Partial<QuantityDefinition>;
/** What shares of free fatty acid have in common. */
export const freeFattyAcidLike = { unit: percent, cites: [ISO_660, ISO_660_REFERENCE_ACIDS], digits: FFA_DIGITS } satisfies Partial<QuantityDefinition>;
