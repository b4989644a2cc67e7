import { css, html } from 'lit';
import { LotElement } from '../parts/base.js';

/**
 * Holds the site profile and the lot for the elements inside it, so that several sections anywhere
 * on a page share one lot. It shows nothing itself.
 *
 * @element esterway-site
 * @attr {'metric' | 'us'} units - units in which amounts are shown
 *
 * @fires {EsterwayChangeEvent} esterway-change - a person changed the lot; it carries the entry and the reading
 * @fires {EsterwaySiteChangeEvent} esterway-site-change - a person changed a site value; keep it and set it again next time
 *
 * @slot - the sections, or a panel, and anything else
 */
export class EsterwaySite extends LotElement {
  static override styles = css`
    :host {
      display: contents;
    }
  `;

  protected override render(): unknown {
    return html`<slot></slot>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-site': EsterwaySite;
  }
}
