import type { MathNode } from '../../formula/working-mathml.js';

const MATHML = 'http://www.w3.org/1998/Math/MathML';

/** A formula as elements of the page; built node by node, so that no markup is ever parsed. */
export function mathElement({ tag, content }: MathNode): Element {
  const element = document.createElementNS(MATHML, tag);
  if (typeof content === 'string') element.textContent = content;
  else element.append(...content.map(mathElement));
  return element;
}
