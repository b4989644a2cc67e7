import { loadParts } from '../../../src/elements/parts/late-parts.js';
import type { LaterElement } from '../../../src/elements/parts/later.js';
import { fixture } from '@open-wc/testing';
import type { LitElement, TemplateResult } from 'lit';
import { cdp, userEvent } from 'vitest/browser';
import '../../../src/define.js';
import { plainSpaces } from './texts.js';

// What tests of the elements do with a page: find, read, type and wait, through all shadow roots.

/** All elements below a node, those in shadow roots included, in the order they are read. */
export function* deep(root: Element | ShadowRoot | Document): Generator<Element> {
  if (root instanceof Element && root.shadowRoot) yield* deep(root.shadowRoot);
  for (const child of root.children) {
    yield child;
    yield* deep(child);
  }
}

/** Waits until no element of the page has anything left to render. */
export async function settled(root: Element | Document = document): Promise<void> {
  for (;;) {
    const all = root instanceof Element ? [root, ...deep(root)] : [...deep(root)];
    const waiting = all.filter((element) => (element as LitElement).isUpdatePending) as LitElement[];
    if (!waiting.length) return;
    await Promise.all(waiting.map((element) => element.updateComplete));
  }
}

/** Puts a template on the page and waits for everything in it. */
export async function place<T extends HTMLElement>(template: TemplateResult): Promise<T> {
  const element = await fixture<T>(template);
  await settled();
  return element;
}

/** The first element of a tag, wherever it stands. */
export function find<Tag extends keyof HTMLElementTagNameMap>(root: Element | Document, tag: Tag): HTMLElementTagNameMap[Tag] {
  for (const element of deep(root)) if (element.localName === tag) return element as HTMLElementTagNameMap[Tag];
  throw new Error(`no <${tag}>`);
}

type Field = HTMLInputElement | HTMLSelectElement;

/** What a control is called: its label, else what is spoken, else its words. */
export function nameOf(control: Element): string {
  const label = (control as Field).labels?.[0] ?? control;
  const spoken = control.getAttribute('aria-label') ?? [...spokenTexts(label)].join('');
  return plainSpaces(spoken);
}

function* spokenTexts(node: Node): Generator<string> {
  if (node instanceof Text) yield node.data;
  else if (!(node instanceof Element && node.matches('[aria-hidden=true], input, select'))) for (const child of node.childNodes) yield* spokenTexts(child);
}

/** Fields and buttons that are shown, in the order they are read. */
export function controls(root: Element | Document): HTMLElement[] {
  return [...deep(root)].filter((element): element is HTMLElement => element.matches('input, select, button, summary') && element.checkVisibility());
}

export function hasField(root: Element | Document, label: string): boolean {
  return controls(root).some((control) => control.matches('input, select') && nameOf(control) === label);
}

function named<T extends Element>(root: Element | Document, selector: string, name: string): T {
  const all = controls(root).filter((control) => control.matches(selector));
  const found = all.find((control) => nameOf(control) === name);
  if (!found) throw new Error(`no ${selector} “${name}” among: ${all.map(nameOf).join(' | ')}`);
  return found as Element as T;
}

export const input = (root: Element | Document, label: string): HTMLInputElement => named(root, 'input', label);
export const select = (root: Element | Document, label: string): HTMLSelectElement => named(root, 'select', label);
export const button = (root: Element | Document, name: string): HTMLButtonElement => named(root, 'button', name);

/** What has the focus, in the innermost shadow root. */
export function focused(): Element | null {
  let element = document.activeElement;
  while (element?.shadowRoot?.activeElement) element = element.shadowRoot.activeElement;
  return element;
}

export const focusedName = (): string => {
  const element = focused();
  return element ? nameOf(element) : '';
};

/** Types a figure the short way: the text and its event at once. The keys themselves are for the tests that are about keys. */
export async function enter(root: Element | Document, label: string, text: string): Promise<void> {
  const field = input(root, label);
  field.focus();
  field.value = text;
  field.dispatchEvent(new InputEvent('input', { bubbles: true, composed: true }));
  await settled();
}

/** Chooses an option by its value. */
export async function choose(root: Element | Document, label: string, value: string): Promise<void> {
  const field = select(root, label);
  field.value = value;
  if (field.value !== value) throw new Error(`“${label}” has no option ${value}`);
  field.dispatchEvent(new Event('change', { bubbles: true }));
  await settled();
}

/** Real keys. */
export async function press(keys: string): Promise<void> {
  await userEvent.keyboard(keys);
  await settled();
}

export async function click(element: Element): Promise<void> {
  await userEvent.click(element);
  await settled();
}

/** Pastes text as a sheet puts it on the clipboard. Gives false where the element took it. */
/** Opens a part that is fetched when it is opened, by the line it is folded to. */
export async function openPart(root: Element | Document, line: string): Promise<void> {
  const summary = controls(root).find((control) => control.localName === 'summary' && words(control).startsWith(line));
  if (!summary) throw new Error(`no part “${line}”`);
  await click(summary);
  await loadParts(((summary.getRootNode() as ShadowRoot).host as LaterElement).needs);
  await settled();
}

export async function paste(field: Element, text: string): Promise<boolean> {
  const clipboardData = new DataTransfer();
  clipboardData.setData('text/plain', text);
  const left = field.dispatchEvent(new ClipboardEvent('paste', { clipboardData, bubbles: true, composed: true, cancelable: true }));
  await settled();
  return left;
}

/** The text a person reads below a node: through shadow roots and slots, hidden parts left out, white space as one space. */
export function words(root: Node): string {
  return plainSpaces([...texts(root)].join(''));
}

const INLINE = /^inline|^contents/;

function* texts(node: Node): Generator<string> {
  if (node instanceof Text) yield node.data;
  if (node instanceof Element) {
    if (node.matches('style, script, option, input')) return;
    const { display } = getComputedStyle(node);
    // what has no box of its own can still show what is in it
    if (display !== 'contents' && !node.checkVisibility({ visibilityProperty: true })) return;
    const block = !INLINE.test(display);
    if (block) yield ' ';
    if (node instanceof HTMLSlotElement) for (const assigned of node.assignedNodes()) yield* texts(assigned);
    for (const child of (node.shadowRoot ?? node).childNodes) yield* texts(child);
    if (block) yield ' ';
    return;
  }
  for (const child of node.childNodes) yield* texts(child);
}

/** Media and features as a browser would report them; everything as usual when left out. */
export async function emulate(features: Readonly<Record<string, string>> = {}, media: '' | 'print' = ''): Promise<void> {
  await cdp().send('Emulation.setEmulatedMedia', {
    media,
    features: Object.entries(features).map(([name, value]) => ({ name, value })),
  });
}

/** What is said about a field: the text of what its `aria-describedby` names. */
export function describedBy(field: Element): string {
  const ids = field.getAttribute('aria-describedby')?.split(' ') ?? [];
  const root = field.getRootNode() as ShadowRoot;
  const said = ids.map((id) => root.getElementById(id)?.querySelector('p'));
  // the sentence alone, without the buttons that may stand in it
  return plainSpaces(said.flatMap((p) => [...(p?.childNodes ?? [])]).filter((node) => node instanceof Text).map(({ data }) => data).join(''));
}
