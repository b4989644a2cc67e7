import { css, html } from 'lit';
import type { TemplateResult } from 'lit';
import { live } from 'lit/directives/live.js';
import { deTitrant } from '../../locales/de-titrant.js';
import { enTitrant } from '../../locales/en-titrant.js';
import { fieldStyles } from '../parts/field-styles.js';
import { SiteSectionElement } from '../parts/site-section.js';
import { RunsTable } from '../titration/runs-table.js';

const TEXTS = { en: enTitrant, de: deTitrant };

/**
 * The titrant of a site: its strength from a label, from weighing, or standardised on potassium
 * hydrogen phthalate with several runs and a blank. It is kept in the site profile and serves every
 * lot until it is too old.
 *
 * @element esterway-titrant
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {boolean} bare - leaves the heading out
 *
 * @fires {EsterwaySiteChangeEvent} esterway-site-change - a person changed the titrant (only where the element holds the lot itself)
 * @fires {EsterwayOpenEvent} esterway-open - a person wants to see how a figure was worked out
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart result - the strength
 * @csspart figure - a figure that opens its working
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 */
export class EsterwayTitrant extends SiteSectionElement {
  static override styles = [
    ...SiteSectionElement.styles,
    fieldStyles,
    RunsTable.styles,
    css`
      .value {
        font-size: 1.25em;
        font-weight: 600;
      }
      .note {
        margin-block-start: 6px;
        color: var(--_quiet);
        font-size: 0.92em;
      }
    `,
  ];

  readonly #table = new RunsTable(this, {
    runs: () => this.desk.site.titrantRuns ?? [],
    texts: () => this.texts,
    tag: () => this.languageTag,
    figure: (key) => this.figure(key, false),
    problemAt: (field) => this.problemAt(field),
    edit: (edit) => this.editSite(edit),
  });

  protected override get heading(): string {
    return this.texts.sections.titrant;
  }

  protected override get summary(): string {
    return [this.optionText('titrantAlkali', this.siteOption('titrantAlkali')), this.amountWords('titrantConcentration')].filter(Boolean).join(' ');
  }

  protected override body(): unknown {
    const from = this.siteOption('titrantKnownFrom');
    const texts = this.textsOf(TEXTS);
    return html`
      <div class="fields">${this.siteOptionField('titrantKnownFrom', true)} ${this.siteOptionField('titrantAlkali')} ${this.siteOptionField('titrantSolvent')}</div>
      ${from === 'standardised' ? this.standardisation() : html`<div class="fields">${this.given(from).map((key) => this.siteFigureField(key))}</div>`}
      <div class="result" part="result" role="status">
        <div class="value">${this.figure('titrantConcentration')}</div>
        <p class="small quiet">${texts.result} ${this.plusMinus('titrantConcentration') ?? `· ${this.whyUnknown('titrantConcentration')}`}</p>
      </div>
      ${this.noticesAt((field) => OF_TITRANT.test(field))}
      <p class="note">${texts.note}</p>
    `;
  }

  private given(from: string): readonly string[] {
    return from === 'weighing' ? ['titrantWeighedMass', 'titrantWeighedAssay', 'titrantFlaskVolume'] : ['titrantStrength'];
  }

  private standardisation(): TemplateResult {
    return html`
      <p class="note">${this.textsOf(TEXTS).khp}</p>
      <div class="fields">
        ${this.dateField()} ${this.siteFigureField('titrantAgeLimit')} ${this.siteFigureField('khpPurity')} ${this.siteFigureField('khpBlank')}
        ${this.siteFigureField('standardisationTemperature')}
      </div>
      ${this.#table.render('titrantRuns', 'g')}
    `;
  }

  private dateField(): TemplateResult {
    return html`<div>
      <label for="date">${this.texts.fields.titrantDate}</label>
      <div class="line" part="field-line">
        <input
          class="words"
          id="date"
          data-field
          part="field-input"
          type="date"
          .value=${live(this.desk.site.titrantDate ?? '')}
          @input=${(event: InputEvent) => this.editSite({ kind: 'text', key: 'titrantDate', text: (event.target as HTMLInputElement).value })}
        />
      </div>
    </div>`;
  }
}

/** Fields whose remarks stand under the strength. */
const OF_TITRANT = /^(?:titrantStrength|titrantDate|khpPurity)$/;

declare global {
  interface HTMLElementTagNameMap {
    'esterway-titrant': EsterwayTitrant;
  }
}
