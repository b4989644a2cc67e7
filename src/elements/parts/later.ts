import { css, html, nothing } from 'lit';
import { property, state } from 'lit/decorators.js';
import { GuestElement } from './guest.js';
import { LanguageController } from './language.js';
import { loadParts } from './late-parts.js';
import type { LateParts } from './late-parts.js';
import { sectionStyles } from './section-styles.js';
import { boxes, buttons, tokens } from './styles.js';

/** A part that is folded to a line until a person opens it; its code is fetched then, and only then is anything computed. */
export class LaterElement extends GuestElement {
  static override styles = [
    tokens,
    buttons,
    boxes,
    sectionStyles,
    css`
      :host {
        background: transparent;
        container-type: normal;
      }
      @media print {
        :host {
          display: none;
        }
      }
    `,
  ];

  /** The line it is folded to. */
  @property() label = '';
  /** The group of parts that it needs. */
  @property() needs: LateParts = 'more';
  /** What stands in it once it is open. */
  @property({ attribute: false }) content: () => unknown = () => nothing;

  @state() private opened = false;
  @state() private fetched: 'not yet' | 'there' | 'failed' = 'not yet';

  readonly #language = new LanguageController(this);

  protected override render(): unknown {
    const { texts } = this.#language;
    return html`<details @toggle=${this.onToggle}>
      <summary>${this.label}</summary>
      ${this.opened && this.fetched === 'there' ? this.content() : nothing}
      ${this.opened && this.fetched === 'failed' ? html`<p class="gate" role="alert">${texts.panel.partMissing}</p>` : nothing}
    </details>`;
  }

  private onToggle(event: Event): void {
    this.opened = (event.target as HTMLDetailsElement).open;
    if (!this.opened || this.fetched === 'there') return;
    loadParts(this.needs).then(
      () => (this.fetched = 'there'),
      () => (this.fetched = 'failed'),
    );
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-later': LaterElement;
  }
}
