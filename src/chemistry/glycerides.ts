import { constant } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { choice, quantity, limit } from '../formula/quantity.js';
import type { Quantity } from '../formula/quantity.js';
import { gramPerMole, molePerKilogram, percent } from '../formula/units.js';
import { acidMolarMass } from './acidity.js';
import { FATS, FAT_PROFILE, meanAcidMolarMass } from './fats.js';
import type { Fat } from './fats.js';
import { insolubles, saponificationValue, waterContent } from './oil.js';
import { GLYCERIDE_MASS, HANDBOOK_PROFILES, SAPONIFICATION } from './sources.js';
import { M_GLYCERYL, M_KOH } from './substances.js';

/** What the amount of glycerides is worked out from. */
export const glyceridesBy = choice('glyceridesBy', ['saponification-value', 'profile']);
export const fat = choice('fat', FATS);

const profileMolarMass = quantity({
  key: 'profileAcidMolarMass', symbol: 'M_prof', unit: gramPerMole, cites: [HANDBOOK_PROFILES], digits: { decimals: 1 },
  is: fat.of(Object.fromEntries(FATS.map((name) => [name, meanAcidMolarMass(FAT_PROFILE[name])])) as Record<Fat, Expression>),
});

/** The glycerides of a lot, all counted as triglycerides. */
export interface Glycerides {
  /** Amount per mass of oil, mol/kg. */
  readonly content: Quantity;
  /** Mean molar mass of a triglyceride, g/mol. */
  readonly molarMass: Quantity;
  /** Mean molar mass of the fatty acids in them, g/mol. */
  readonly acidMolarMass: Quantity;
  readonly all: readonly Quantity[];
}

/**
 * From the saponification value, n/m = (SV − AV)/(3 · M_KOH), or from a named fat's profile,
 * n/m = (1 − acid − water − insolubles)/M_TG. In both the mass of glycerides is what is left of
 * the oil, so that every balance closes.
 */
export function glycerides(acidContent: Quantity): Glycerides {
  const share = quantity({
    key: 'glycerideShare', symbol: 'w_TG', unit: percent, cites: [GLYCERIDE_MASS],
    is: constant('100', percent).minus(acidMolarMass.times(acidContent).in(percent)).minus(waterContent).minus(insolubles),
    limits: [limit('above', '0', 'nothing-left-as-glyceride', 'waterContent')],
  });
  const molarMassByProfile = constant('3').times(profileMolarMass).plus(M_GLYCERYL);
  const content = quantity({
    key: 'glycerideContent', symbol: 'b_TG', unit: molePerKilogram, cites: [SAPONIFICATION, GLYCERIDE_MASS],
    is: glyceridesBy.of({
      // the saponification value spends one KOH a free acid, and three a triglyceride
      'saponification-value': saponificationValue.minus(M_KOH.times(acidContent)).per(constant('3').times(M_KOH)),
      profile: share.per(molarMassByProfile).in(molePerKilogram),
    }),
    limits: [limit('above', '0', 'acid-above-saponification', 'saponificationValue')],
  });
  const molarMass = quantity({
    key: 'glycerideMolarMass', symbol: 'M_TG', unit: gramPerMole, cites: [GLYCERIDE_MASS], digits: { decimals: 1 },
    is: glyceridesBy.of({ 'saponification-value': share.per(content).in(gramPerMole), profile: molarMassByProfile }),
  });
  const meanAcid = quantity({
    key: 'glycerideAcidMolarMass', symbol: 'M_FA', unit: gramPerMole, cites: [GLYCERIDE_MASS], digits: { decimals: 1 },
    is: molarMass.minus(M_GLYCERYL).per('3'),
  });
  return { content, molarMass, acidMolarMass: meanAcid, all: [profileMolarMass, share, content, molarMass, meanAcid] };
}
