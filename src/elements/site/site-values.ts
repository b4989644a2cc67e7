import { css, html } from 'lit';
import type { TemplateResult } from 'lit';
import { DEFAULT_FIGURES, DEFAULT_OPTIONS } from '../../lot/defaults.js';
import { fill } from '../../locales/en.js';
import { fieldLabel } from '../../locales/quantity-name.js';
import type { FigureInputEvent } from '../parts/figure-field.js';
import type { OptionInputEvent } from '../parts/option-field.js';
import { SectionElement } from '../parts/section.js';

type Group = 'limits' | 'catalyst' | 'methanol' | 'acidStep' | 'prediction' | 'oil' | 'bench';

/** Keys of a group, choices first, in the order a site would set them. */
const GROUPS: Readonly<Record<Group, readonly string[]>> = {
  limits: ['acidProofEquipment', 'directLimit', 'pretreatmentLimit', 'pretreatmentTarget', 'waterLimitBase', 'waterLimitAcid', 'cleanOilFfa'],
  catalyst: ['catalyst'],
  methanol: ['methanolRatio', 'methanolAssay', 'methanolTemperature', 'conversion', 'entrainedEster'],
  acidStep: [
    'pretreatmentMethanolBasis', 'pretreatmentAcidBasis', 'pretreatmentMethanolPerAcid', 'pretreatmentMethanolPerOil', 'pretreatmentMethanolShare',
    'pretreatmentAcidOfAcid', 'pretreatmentAcidOfOil', 'pretreatmentAcidShare', 'pretreatmentTemperature', 'pretreatmentTime', 'sulfuricAssay',
    'sulfuricDensity', 'carryOver',
  ],
  prediction: Object.keys(DEFAULT_FIGURES).filter((key) => key.startsWith('esterification.')),
  oil: ['glyceridesBy', 'fat', 'oilDensityBy', 'saponificationValue', 'iodineValue', 'typicalOilDensity', 'measuredOilDensity', 'waterContent', 'insolubles', 'oilTemperature'],
  bench: ['titrantAlkali', 'titrantSolvent', 'blankPolicy', 'sampleTakenBy', 'referenceAcid', 'titrantStrength', 'standardisationTemperature', 'sampleDensity'],
};

/** Units of figures that have no usual value. */
const UNIT_OF: Readonly<Record<string, readonly string[]>> = {
  titrantStrength: ['mol/L', 'g/L'], iodineValue: [''], measuredOilDensity: ['kg/m³'],
};

/**
 * What a site has decided once, for every lot: limits, catalyst, methods. A usual value stands, in
 * italics and with its source, until the site types its own.
 *
 * @element esterway-site-values
 * @attr {boolean} folded - folds the section to its one-line summary
 *
 * @fires {EsterwaySiteChangeEvent} esterway-site-change - a person changed a site value (only where the element holds the lot itself)
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 */
export class EsterwaySiteValues extends SectionElement {
  static override styles = [
    ...SectionElement.styles,
    css`
      .fields {
        grid-template-columns: repeat(auto-fill, minmax(min(100%, 11em), 1fr));
      }
      .note {
        color: var(--_quiet);
        font-size: 0.92em;
      }
      @media print {
        .body {
          display: none;
        }
      }
    `,
  ];

  protected override get heading(): string {
    return this.texts.sections.site;
  }

  protected override get summary(): string {
    return this.desk.site.name ?? '';
  }

  protected override body(): unknown {
    const { site } = this.texts;
    if (this.folded) return '';
    return html`
      <p class="note">${site.note}</p>
      ${(Object.keys(GROUPS) as Group[]).map((group) => html`
        <h3>${site.groups[group]}</h3>
        <div class="fields">${this.keysOf(group).map((key) => (key in DEFAULT_OPTIONS ? this.siteOption(key) : this.siteFigure(key)))}</div>
      `)}
    `;
  }

  /** The catalyst group shows the product in use: its assay, its base load, and the density of a solution. */
  private keysOf(group: Group): readonly string[] {
    if (group !== 'catalyst') return GROUPS[group];
    const product = this.siteOptionValue('catalyst');
    return [...GROUPS.catalyst, ...['assay', 'baseLoad', 'density'].map((name) => `${product}.${name}`).filter((key) => key in DEFAULT_FIGURES)];
  }

  private siteOptionValue(key: string): string {
    return this.desk.site.options[key] ?? DEFAULT_OPTIONS[key] ?? '';
  }

  private siteOption(key: string): TemplateResult {
    return html`<esterway-option
      exportparts="line: field-line, input: field-input"
      .label=${(this.texts.choices as Readonly<Record<string, string>>)[key] ?? key}
      .options=${this.optionWords(key)}
      .value=${this.siteOptionValue(key)}
      @option-input=${(event: OptionInputEvent) => this.editSite({ kind: 'option', key, option: event.option })}
    ></esterway-option>`;
  }

  private siteFigure(key: string): TemplateResult {
    const { texts } = this;
    const usual = DEFAULT_FIGURES[key];
    const note = usual && fill(texts.site.source, { title: usual.source.title, mark: texts.marks[usual.source.mark] });
    return html`<esterway-figure
      exportparts="line: field-line, input: field-input"
      .label=${fieldLabel(key, texts)}
      .figure=${this.desk.site.figures[key]}
      .standing=${usual}
      .units=${usual ? [usual.unit] : (UNIT_OF[key] ?? [''])}
      .problem=${key in this.desk.entry.figures ? undefined : this.problemAt(key)}
      .note=${usual?.source.mark === 'practice' ? texts.marks.practice : note}
      @figure-input=${(event: FigureInputEvent) => this.editSite({ kind: 'figure', key, figure: event.figure })}
    ></esterway-figure>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-site-values': EsterwaySiteValues;
  }
}
