import { constant } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { choice, quantity } from '../formula/quantity.js';
import type { Choice, Quantity, QuantityDefinition } from '../formula/quantity.js';
import { kilogram, mole } from '../formula/units.js';
import { acidMolarMass, freeFattyAcidLike } from './acidity.js';
import type { BaseFeed } from './base-charge.js';
import { PACES } from './esterification.js';
import { oilMass, waterContent } from './oil.js';
import type { Pass } from './pretreatment.js';
import { PRACTICE, STOICHIOMETRY } from './sources.js';
import { M_METHANOL, M_METHYLENE, M_SULFURIC, M_WATER } from './substances.js';

/** How many passes the acid step takes; decided on what each pass is predicted to leave. */
export const passes = choice('passes', ['1', '2', '3']);
/** Whether the base step rests on the prediction or on a titration after the acid step. */
export const baseStepAcidFrom = choice('baseStepAcidFrom', ['estimate', 'retest']);

/** The oil after the acid step, and what the base step finds in it. */
export interface Pretreated {
  readonly feed: BaseFeed;
  readonly all: readonly (Quantity | Choice)[];
}

/**
 * The oil as it leaves the last pass, its drawn-off layer gone.
 *
 * @param acidAmount free fatty acid of the untreated batch, mol
 * @param retestContent acid content titrated after pretreatment; it counts the sulfuric acid left too
 */
export function afterPretreatment(through: readonly [Pass, Pass, Pass], acidAmount: Expression, retestContent: Quantity): Pretreated {
  const last = (of: (pass: Pass) => Quantity): Expression => passes.of({ 1: of(through[0]), 2: of(through[1]), 3: of(through[2]) });
  const make = (name: string, symbol: string, is: Expression, more: Partial<QuantityDefinition> = {}): Quantity =>
    quantity({ key: `pretreated.${name}`, symbol, unit: mole, cites: [STOICHIOMETRY], ...more, is });

  const acidLeft = make('acidLeft', 'n_left', last((pass) => pass.acid.slow));
  const ffaLeft = PACES.map((pace) => make(`ffaLeft.${pace}`, `FFA_left,${pace}`, last((pass) => pass.ffa[pace]), freeFattyAcidLike));
  const methanolLeft = make('methanolLeft', 'n_M,left', last((pass) => pass.methanolCarried.slow), { cites: [PRACTICE] });
  const waterLeft = make('waterLeft', 'n_W,left', last((pass) => pass.waterCarried.slow), { cites: [PRACTICE] });
  const sulfuricLeft = make('sulfuricLeft', 'm_S,left', last((pass) => pass.sulfuricCarried), { unit: kilogram, cites: [PRACTICE] });

  const kilograms = (amount: Expression): Expression => amount.in(kilogram);
  const mass = make('mass', 'm_pre',
    oilMass
      .minus(kilograms(waterContent.times(oilMass)))
      .plus(kilograms(acidAmount.minus(acidLeft).times(M_METHYLENE)))
      .plus(kilograms(methanolLeft.times(M_METHANOL)))
      .plus(kilograms(waterLeft.times(M_WATER)))
      .plus(sulfuricLeft), { unit: kilogram });

  const ester = make('ester', 'm_E', kilograms(acidAmount.minus(acidLeft).times(acidMolarMass.plus(M_METHYLENE))), { unit: kilogram });

  return {
    feed: {
      mass,
      acid: baseStepAcidFrom.of({ estimate: acidLeft, retest: retestContent.times(mass) }),
      sulfuricAcid: baseStepAcidFrom.of({ estimate: sulfuricLeft.per(M_SULFURIC).in(mole), retest: constant('0', mole) }),
      water: kilograms(waterLeft.times(M_WATER)),
      ester,
    },
    all: [passes, baseStepAcidFrom, acidLeft, ...ffaLeft, methanolLeft, waterLeft, sulfuricLeft, mass, ester],
  };
}
