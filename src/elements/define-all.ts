import { EsterwayCharge } from './charge/charge.js';
import { EsterwayLot } from './lot/lot.js';
import { EsterwayPanel } from './panel/panel.js';
import { FigureField } from './parts/figure-field.js';
import { LaterElement } from './parts/later.js';
import { OptionField } from './parts/option-field.js';
import { EsterwayRoute } from './route/route.js';
import { EsterwaySite } from './site/site.js';
import { EsterwaySiteValues } from './site/site-values.js';
import { EsterwayTitration } from './titration/titration.js';
import { EsterwayWorking } from './working/working.js';

/** Holders first: what stands inside them finds them ready. */
const ELEMENTS: readonly (readonly [tag: string, element: CustomElementConstructor])[] = [
  ['esterway-figure', FigureField],
  ['esterway-option', OptionField],
  ['esterway-later', LaterElement],
  ['esterway-site', EsterwaySite],
  ['esterway-panel', EsterwayPanel],
  ['esterway-lot', EsterwayLot],
  ['esterway-titration', EsterwayTitration],
  ['esterway-route', EsterwayRoute],
  ['esterway-charge', EsterwayCharge],
  ['esterway-working', EsterwayWorking],
  ['esterway-site-values', EsterwaySiteValues],
];

/**
 * Registers every element. A tag that is taken already stays as it is, with a warning: a second
 * copy of this file on a page does no harm.
 */
export function defineEsterway(registry: CustomElementRegistry = customElements): void {
  const taken = ELEMENTS.filter(([tag]) => registry.get(tag));
  // eslint-disable-next-line no-console -- whoever runs the page wants to know
  if (taken.length) console.warn(`Esterway: ${taken.map(([tag]) => `<${tag}>`).join(', ')} already registered; the first copy stays.`);
  for (const [tag, element] of ELEMENTS) if (!registry.get(tag)) registry.define(tag, element);
}
