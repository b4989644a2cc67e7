import { LitElement, adoptStyles } from 'lit';
import type { CSSResult } from 'lit';

/**
 * An element that keeps its styles in whatever document it stands. A page may move it into a frame or a window of its
 * own, and a browser drops or refuses there the style sheets that were made for another document.
 */
export abstract class GuestElement extends LitElement {
  protected override createRenderRoot(): ShadowRoot {
    const { shadowRootOptions } = this.constructor as typeof LitElement;
    const root = this.shadowRoot ?? this.attachShadow(shadowRootOptions);
    this.#adoptStyles(root);
    this.renderOptions.renderBefore ??= root.firstChild;
    return root;
  }

  adoptedCallback(): void {
    if (this.shadowRoot) this.#adoptStyles(this.shadowRoot);
  }

  #adoptStyles(root: ShadowRoot): void {
    const styles = (this.constructor as typeof LitElement).elementStyles as CSSResult[];
    const view = root.ownerDocument.defaultView;
    if (!view || view === window) adoptStyles(root, styles);
    else root.adoptedStyleSheets = styles.map((style) => sheetIn(view, style));
  }
}

const sheets = new WeakMap<Window, Map<CSSResult, CSSStyleSheet>>();

/** The sheet of a style in another window, made once for all elements that use it. */
function sheetIn(view: Window & typeof globalThis, style: CSSResult): CSSStyleSheet {
  let made = sheets.get(view);
  if (!made) sheets.set(view, (made = new Map()));
  let sheet = made.get(style);
  if (!sheet) {
    made.set(style, (sheet = new view.CSSStyleSheet()));
    sheet.replaceSync(style.cssText);
  }
  return sheet;
}
