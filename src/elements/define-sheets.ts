import { EsterwayResults } from './results/results.js';
import { EsterwayRows } from './rows/rows.js';

const ELEMENTS: readonly (readonly [tag: string, element: CustomElementConstructor])[] = [
  ['esterway-rows', EsterwayRows],
  ['esterway-results', EsterwayResults],
];

/** Registers what reads sheets and writes for them. A tag that is taken already stays as it is. */
export function defineSheets(registry: CustomElementRegistry = customElements): void {
  for (const [tag, element] of ELEMENTS) if (!registry.get(tag)) registry.define(tag, element);
}
