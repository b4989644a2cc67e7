import { ResidualPlot } from './charge/residual.js';

const ELEMENTS: readonly (readonly [tag: string, element: CustomElementConstructor])[] = [
  ['esterway-residual', ResidualPlot],
];

/** Registers the elements that a page seldom needs. A tag that is taken already stays as it is. */
export function defineMore(registry: CustomElementRegistry = customElements): void {
  for (const [tag, element] of ELEMENTS) if (!registry.get(tag)) registry.define(tag, element);
}
