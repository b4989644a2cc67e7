import { EsterwayBlend } from './blend/blend.js';
import { EsterwayTriage } from './triage/triage.js';

const ELEMENTS: readonly (readonly [tag: string, element: CustomElementConstructor])[] = [
  ['esterway-blend', EsterwayBlend],
  ['esterway-triage', EsterwayTriage],
];

/** Registers what belongs to deliveries and the stock. A tag that is taken already stays as it is. */
export function defineIntake(registry: CustomElementRegistry = customElements): void {
  for (const [tag, element] of ELEMENTS) if (!registry.get(tag)) registry.define(tag, element);
}
