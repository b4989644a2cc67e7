import { css, html, nothing } from 'lit';
import { live } from 'lit/directives/live.js';
import { fieldStyles } from '../parts/field-styles.js';
import { onEnter } from '../parts/focus-order.js';
import { SectionElement } from '../parts/section.js';

const AMOUNT_UNITS = { metric: ['kg', 't', 'L', 'lb', 'US gal'], us: ['lb', 'US gal', 'kg', 'L', 't'] } as const;
const TEMPERATURE_UNITS = { metric: ['°C', '°F'], us: ['°F', '°C'] } as const;
const SHARE_UNITS = ['%', 'mg/kg'];

/**
 * The lot: its name, source and date, how much oil there is, and how wet and dirty it is.
 *
 * @element esterway-lot
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {'metric' | 'us'} units - units in which amounts are shown
 *
 * @fires {EsterwayChangeEvent} esterway-change - a person changed the lot (only where the element holds it itself)
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 *
 * @cssprop --esterway-glass - the lines of the fields
 */
export class EsterwayLot extends SectionElement {
  static override styles = [
    ...SectionElement.styles,
    fieldStyles,
    css`
      .fold b {
        font-size: 1.15em;
      }
    `,
  ];

  protected override get heading(): string {
    return (this.lot ? this.desk.entry.name : undefined) ?? this.texts.panel.untitled;
  }

  protected override get summary(): string {
    if (!this.folded) return '';
    const { source, date } = this.desk.entry;
    const water = 'waterContent' in this.desk.entry.figures ? this.amountWords('waterContent') : undefined;
    return [source, date && this.dateWords(date), this.amountWords('oilMass'), water && `${this.texts.fields.waterContent} ${water}`]
      .filter(Boolean)
      .join(' · ');
  }

  protected override body(): unknown {
    const { texts } = this;
    const { units } = this.desk;
    return html`
      <div class="fields">
        ${this.textField('name', texts.lot.name)} ${this.textField('date', texts.lot.date, 'date')} ${this.textField('source', texts.lot.source)}
        ${this.figureField('oilAmount', AMOUNT_UNITS[units])} ${this.figureField('oilTemperature', TEMPERATURE_UNITS[units])}
        ${this.figureField('waterContent', SHARE_UNITS)} ${this.figureField('insolubles', SHARE_UNITS)}
      </div>
      ${this.noticesAt((field) => field === 'date')} ${this.kindOfOil()}
    `;
  }

  /** What the glycerides and the density are worked out from: changes seldom, so it is folded to a line. */
  private kindOfOil(): unknown {
    const glycerides = this.option('glyceridesBy');
    const density = this.option('oilDensityBy');
    const kind = glycerides === 'profile' ? this.optionText('fat') : `${this.fieldLabel('saponificationValue')} ${this.amountWords('saponificationValue') ?? '–'}`;
    return html`
      <details class="no-print">
        <summary>${[kind, this.optionText('oilDensityBy')].join(' · ')}</summary>
        <div class="fields">
          ${this.optionField('glyceridesBy', true)} ${glycerides === 'profile' ? this.optionField('fat', true) : nothing}
          ${glycerides === 'saponification-value' || density === 'lund' ? this.figureField('saponificationValue', ['mg/g']) : nothing}
          ${this.optionField('oilDensityBy', true)} ${density === 'lund' ? this.figureField('iodineValue', ['']) : nothing}
          ${density === 'measured' ? this.figureField('measuredOilDensity', ['kg/m³', 'g/mL']) : nothing}
        </div>
      </details>
    `;
  }

  /** Live: a date half typed reads as empty, and what is typed of it stays. */
  private textField(key: 'name' | 'source' | 'date', label: string, type: 'text' | 'date' = 'text'): unknown {
    return html`<div class=${key === 'source' ? 'wide' : ''}>
      <label for=${key}>${label}</label>
      <div class="line" part="field-line">
        <input
          class="words"
          id=${key}
          data-field
          part="field-input"
          type=${type}
          autocomplete="off"
          .value=${live(this.desk.entry[key] ?? '')}
          @input=${(event: InputEvent) => this.edit({ kind: 'text', key, text: (event.target as HTMLInputElement).value })}
          @keydown=${onEnter}
        />
      </div>
    </div>`;
  }

  /** A date as the language writes it; what is no date stays as it was typed. */
  private dateWords(date: string): string {
    const time = Date.parse(`${date}T00:00:00Z`);
    if (Number.isNaN(time)) return date;
    return new Intl.DateTimeFormat(this.languageTag, { day: 'numeric', month: 'short', timeZone: 'UTC' }).format(time);
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-lot': EsterwayLot;
  }
}
