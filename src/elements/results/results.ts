import { css, html } from 'lit';
import { state } from 'lit/decorators.js';
import { resultColumns, resultHeads } from '../../exchange/results/columns.js';
import { resultRow, textCell } from '../../exchange/results/row.js';
import { deGiving } from '../../locales/de-giving.js';
import { deResults } from '../../locales/de-results.js';
import { enGiving } from '../../locales/en-giving.js';
import { enResults } from '../../locales/en-results.js';
import { SectionElement } from '../parts/section.js';
import { SheetGiving } from '../parts/sheet-giving.js';

const TEXTS = { en: enGiving, de: deGiving };
const RESULT_TEXTS = { en: enResults, de: deResults };

/**
 * Gives the lot on the bench to a sheet: its results as a row with headings, to the clipboard or as CSV, or a workbook with live formulas.
 *
 * @element esterway-results
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {boolean} bare - leaves the heading out
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart action - a button
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 */
export class EsterwayResults extends SectionElement {
  static override styles = [
    ...SectionElement.styles,
    css`
      .actions {
        display: flex;
        flex-wrap: wrap;
        gap: 8px;
        margin-block: 8px;
      }
      textarea {
        box-sizing: border-box;
        inline-size: 100%;
        min-block-size: 5em;
        border: 1.5px solid var(--_glass);
        background: transparent;
        color: inherit;
        font: inherit;
      }
      p {
        margin-block: 5px;
      }
    `,
  ];

  @state() private said = '';

  readonly #giving = new SheetGiving(this, {
    words: () => this.textsOf(TEXTS),
    tag: () => this.languageTag,
    rows: () => {
      const { entry, site, reading } = this.desk;
      const columns = resultColumns('batch');
      const words = { ...this.textsOf(RESULT_TEXTS), verdicts: this.texts.verdicts };
      return [resultHeads(columns, words).map(textCell), resultRow(entry, site, reading, columns, { words })];
    },
    lots: () => [this.desk.entry],
    site: () => this.desk.site,
    say: (text) => (this.said = text),
  });

  protected override get heading(): string {
    return this.textsOf(TEXTS).title;
  }

  protected override body(): unknown {
    const words = this.textsOf(TEXTS);
    if (this.reading('freeFattyAcid')?.value === undefined) return html`<p class="quiet">${words.nothing}</p>`;
    return html`<p class="quiet small">${words.note}</p>
      <div class="no-print">${this.#giving.render()}</div>
      <p class="quiet small" role="status">${this.said}</p>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-results': EsterwayResults;
  }
}
