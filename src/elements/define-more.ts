import { EsterwayAfter } from './after/after.js';
import { EsterwayBalance } from './balance/balance.js';
import { ChargeSheet } from './charge/charge-sheet.js';
import { ResidualPlot } from './charge/residual.js';
import { EsterwayCost } from './cost/cost.js';
import { EsterwayCurve } from './curve/curve.js';
import { EsterwayTitrant } from './titrant/titrant.js';
import { PlanElement } from './titration/plan.js';
import { CheckSheetElement } from './working/check-sheet.js';
import { SecondCheckElement } from './working/second-check.js';
import { SimulationElement } from './working/simulation.js';

const ELEMENTS: readonly (readonly [tag: string, element: CustomElementConstructor])[] = [
  ['esterway-titrant', EsterwayTitrant],
  ['esterway-curve', EsterwayCurve],
  ['esterway-after', EsterwayAfter],
  ['esterway-cost', EsterwayCost],
  ['esterway-plan', PlanElement],
  ['esterway-residual', ResidualPlot],
  ['esterway-charge-sheet', ChargeSheet],
  ['esterway-simulation', SimulationElement],
  ['esterway-second-check', SecondCheckElement],
  ['esterway-check-sheet', CheckSheetElement],
  ['esterway-balance', EsterwayBalance],
];

/** Registers the parts of the batch that a page seldom needs. A tag that is taken already stays as it is. */
export function defineMore(registry: CustomElementRegistry = customElements): void {
  for (const [tag, element] of ELEMENTS) if (!registry.get(tag)) registry.define(tag, element);
}
