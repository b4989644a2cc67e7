import { html } from 'lit';
import type { TemplateResult } from 'lit';
import { live } from 'lit/directives/live.js';
import { fill } from '../../locales/fill.js';
import { MOST_CURRENCY } from '../../lot/check.js';
import { DEFAULT_FIGURES, DEFAULT_OPTIONS } from '../../lot/defaults.js';
import type { FigureInputEvent } from './figure-field.js';
import { onEnter } from './focus-order.js';
import { SectionElement } from './section.js';

/** Units of site figures that have no usual value, and of those that are typed in several. */
const UNITS: Readonly<Record<string, readonly string[]>> = {
  titrantStrength: ['mol/L', 'g/L'], titrantWeighedMass: ['g'], titrantFlaskVolume: ['L', 'mL'], buretteCapacityTyped: ['mL'], buretteToleranceTyped: ['mL'],
  oilPrice: ['¤/t', '¤/kg', '¤/L', '¤/US gal'], esterPrice: ['¤/t', '¤/kg', '¤/L', '¤/US gal'], methanolPrice: ['¤/kg', '¤/t', '¤/L', '¤/US gal'],
  sulfuricPrice: ['¤/kg', '¤/t'], 'vinegar.price': ['¤/L'], drawnOffPrice: ['¤/t', '¤/kg'], lowerLayerPrice: ['¤/t', '¤/kg'], energyPrice: ['¤/kWh'],
  energyBaseStep: ['kWh/t'], energyAcidPass: ['kWh/t'], hourPrice: ['¤/h'], hoursBaseStep: ['h', 'min'], hoursAcidPass: ['h', 'min'],
  ...Object.fromEntries(['blendingLimit', 'acceptedWater', 'acceptedInsolubles', 'settlement.baseFfa', 'settlement.waterAllowance', 'settlement.insolublesAllowance'].map((key) => [key, ['%', 'mg/kg']])),
  ...Object.fromEntries(['settlement.ffaRate', 'settlement.waterRate', 'settlement.insolublesRate'].map((key) => [key, ['¤/t per %']])),
  lowestArrival: ['°C', '°F'], highestArrival: ['°C', '°F'], iodineValue: [''], measuredOilDensity: ['kg/m³'], vesselVolume: ['L', 'm³', 'US gal'], methanolStep: ['L', 'mL', 'US gal'], catalystStep: ['g', 'kg', 'lb'], sulfuricStep: ['g', 'kg', 'lb'],
};

/** A section that edits the site profile: fields for its figures and options. */
export abstract class SiteSectionElement extends SectionElement {
  /** The option in force for the site: its own, else the usual one. */
  protected siteOption(key: string): string {
    return this.desk.site.options[key] ?? DEFAULT_OPTIONS[key] ?? '';
  }

  protected siteOptionField(key: string, wide = false): TemplateResult {
    return this.choiceField(key, this.siteOption(key), wide, undefined, (option) => this.editSite({ kind: 'option', key, option }));
  }

  /** The field for what the site calls its money. */
  protected currencyField(): TemplateResult {
    return html`<div>
      <label for="currency">${this.texts.fields.currency}</label>
      <div class="line" part="field-line">
        <input
          class="words"
          id="currency"
          data-field
          part="field-input"
          type="text"
          autocomplete="off"
          maxlength=${MOST_CURRENCY}
          placeholder="¤"
          .value=${live(this.desk.site.currency ?? '')}
          @input=${(event: InputEvent) => this.editSite({ kind: 'text', key: 'currency', text: (event.target as HTMLInputElement).value.trim() })}
          @keydown=${onEnter}
        />
      </div>
    </div>`;
  }

  /** A field for a figure of the site; what is usual stands in it with its source. */
  protected siteFigureField(key: string): TemplateResult {
    const { texts } = this;
    const usual = DEFAULT_FIGURES[key];
    const note = usual && fill(texts.site.source, { title: usual.source.title, mark: texts.marks[usual.source.mark] });
    return html`<esterway-figure
      exportparts="line: field-line, input: field-input"
      .label=${this.fieldLabel(key)}
      .figure=${this.desk.site.figures[key]}
      .standing=${usual}
      .units=${UNITS[key] ?? [usual?.unit ?? (key.endsWith('.price') ? '¤/kg' : '')]}
      .money=${this.desk.site.currency ?? ''}
      .problem=${key in this.desk.entry.figures ? undefined : this.problemAt(key)}
      .note=${usual?.source.mark === 'practice' ? texts.marks.practice : note}
      @figure-input=${(event: FigureInputEvent) => this.editSite({ kind: 'figure', key, figure: event.figure })}
    ></esterway-figure>`;
  }
}
