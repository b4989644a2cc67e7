import type { ReactiveController, ReactiveControllerHost } from 'lit';
import { de } from '../../locales/de.js';
import { en } from '../../locales/en.js';
import type { Texts } from '../../locales/en.js';

/** The languages the elements speak. */
export const LANGUAGES: Readonly<Record<string, Texts>> = { en, de };

/** Follows the nearest `lang`, through shadow roots; English where it is none of the spoken languages. */
export class LanguageController implements ReactiveController {
  readonly #host: ReactiveControllerHost & HTMLElement;
  readonly #observer = typeof MutationObserver === 'undefined' ? undefined : new MutationObserver(() => this.#look());
  #tag = 'en';

  constructor(host: ReactiveControllerHost & HTMLElement) {
    this.#host = host;
    host.addController(this);
  }

  /** The language tag that figures and dates are written by. */
  get tag(): string {
    return this.#tag;
  }

  get texts(): Texts {
    return LANGUAGES[this.#tag.split('-')[0] ?? ''] ?? en;
  }

  hostConnected(): void {
    for (const element of ancestors(this.#host)) this.#observer?.observe(element, { attributes: true, attributeFilter: ['lang'] });
    this.#look();
  }

  hostDisconnected(): void {
    this.#observer?.disconnect();
  }

  #look(): void {
    let tag = '';
    for (const element of ancestors(this.#host)) if (!tag) tag = element.getAttribute('lang') ?? '';
    tag = usable(tag);
    if (tag === this.#tag) return;
    this.#tag = tag;
    this.#host.requestUpdate();
  }
}

/** A tag that no format of the browser refuses: pages also write `de_DE` or `en-US@posix`. */
function usable(tag: string): string {
  try {
    return Intl.getCanonicalLocales(tag.replaceAll('_', '-'))[0] ?? 'en';
  } catch {
    const language = /^[a-z]*/i.exec(tag)?.[0].toLowerCase() ?? '';
    return Object.hasOwn(LANGUAGES, language) ? language : 'en';
  }
}

/** The element and everything around it, out through shadow roots. */
function* ancestors(from: Element): Generator<Element> {
  let element: Element | null = from;
  while (element) {
    yield element;
    const root: Node = element.getRootNode();
    element = element.assignedSlot ?? element.parentElement ?? (root instanceof ShadowRoot ? root.host : null);
  }
}
