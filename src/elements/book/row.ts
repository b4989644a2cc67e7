import { html } from 'lit';
import type { TemplateResult } from 'lit';
import { dayOf } from '../../book/catalogue.js';
import type { CatalogueEntry } from '../../book/catalogue.js';
import { dayWords, figureWords, lotName, stateWords } from './book-words.js';
import type { BookTongue } from './book-words.js';

/** A lot in two lines: name and FFA, day and source and state; pressed, its versions open below it. */
export function lotRow(lot: CatalogueEntry, open: boolean, tongue: BookTongue, toggle: () => void): TemplateResult {
  const { source, state, freeFattyAcid } = lot.summary;
  return html`<button class="row" type="button" aria-expanded=${open ? 'true' : 'false'} @click=${toggle}>
    <b>${lotName(lot, tongue)}</b><span>${freeFattyAcid === undefined ? '' : figureWords(lot, tongue)[0]}</span>
    <span class="small quiet">${[dayWords(dayOf(lot), tongue), source].filter(Boolean).join(' · ')}</span><span class="small">${stateWords(state, tongue)}</span>
  </button>`;
}
