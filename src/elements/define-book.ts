import { EsterwayBook } from './book/book.js';
import { EsterwayHistory } from './history/history.js';

const ELEMENTS: readonly (readonly [tag: string, element: CustomElementConstructor])[] = [
  ['esterway-history', EsterwayHistory],
  ['esterway-book', EsterwayBook],
];

/** Registers the intake book with its database; nothing is opened by it. A tag that is taken already stays as it is. */
export function defineBook(registry: CustomElementRegistry = customElements): void {
  for (const [tag, element] of ELEMENTS) if (!registry.get(tag)) registry.define(tag, element);
}
