// Moving from field to field as on a sheet, across the shadow roots of all sections.

/** Marks an input or select that takes part in the order. */
export const FIELD = 'data-field';

/** Moves the focus from a field to the next or the one before it, within the outermost element of this library. */
export function moveFocus(from: HTMLElement, step: 1 | -1): boolean {
  const bound = outermost(from);
  const fields = [...(bound.shadowRoot ? fieldsIn(bound.shadowRoot) : []), ...fieldsIn(bound)];
  const next = fields[fields.indexOf(from) + step];
  if (!next) return false;
  next.focus();
  if (next instanceof HTMLInputElement) next.select();
  return true;
}

/** The fields below an element, in the order they are read, those that are not shown left out. */
export function* fieldsIn(root: Element | ShadowRoot): Generator<HTMLElement> {
  for (const child of root.children) {
    if (child instanceof HTMLElement && child.hasAttribute(FIELD) && child.checkVisibility()) yield child;
    if (child.shadowRoot) yield* fieldsIn(child.shadowRoot);
    yield* fieldsIn(child);
  }
}

/** Elements that group fields register here; the outermost of them bounds the order. */
const groups = new WeakSet<Element>();
export const groupsFields = (element: Element): void => void groups.add(element);

function outermost(from: Element): Element {
  let bound: Element = from;
  let element: Element | null = from;
  while (element) {
    if (groups.has(element)) bound = element;
    const root: Node = element.getRootNode();
    element = element.parentElement ?? (root instanceof ShadowRoot ? root.host : null);
  }
  return bound;
}

/** Enter in a field of plain text goes on to the next field, with Shift to the one before. */
export function onEnter(event: KeyboardEvent): void {
  if (event.key !== 'Enter' || event.isComposing) return;
  event.preventDefault();
  moveFocus(event.target as HTMLElement, event.shiftKey ? -1 : 1);
}
