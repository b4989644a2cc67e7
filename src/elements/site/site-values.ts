import { css, html } from 'lit';
import { DEFAULT_FIGURES, DEFAULT_OPTIONS } from '../../lot/defaults.js';
import { SiteSectionElement } from '../parts/site-section.js';

type Group = 'limits' | 'catalyst' | 'methanol' | 'acidStep' | 'prediction' | 'oil' | 'bench' | 'equipment' | 'vessel';

/** Keys of a group, choices first, in the order a site would set them. */
const GROUPS: Readonly<Record<Group, readonly string[]>> = {
  limits: ['acidProofEquipment', 'directLimit', 'pretreatmentLimit', 'pretreatmentTarget', 'waterLimitBase', 'waterLimitAcid', 'batchWaterLimit', 'soapLimit', 'cleanOilFfa'],
  catalyst: ['catalyst'],
  methanol: ['methanolRatio', 'methanolAssay', 'methanolTemperature', 'conversion', 'entrainedEster'],
  acidStep: [
    'pretreatmentMethanolBasis', 'pretreatmentAcidBasis', 'pretreatmentMethanolPerAcid', 'pretreatmentMethanolPerOil', 'pretreatmentMethanolShare',
    'pretreatmentAcidOfAcid', 'pretreatmentAcidOfOil', 'pretreatmentAcidShare', 'pretreatmentTemperature', 'pretreatmentTime', 'sulfuricAssay',
    'sulfuricDensity', 'carryOver',
  ],
  prediction: Object.keys(DEFAULT_FIGURES).filter((key) => key.startsWith('esterification.')),
  oil: ['glyceridesBy', 'fat', 'oilDensityBy', 'saponificationValue', 'iodineValue', 'typicalOilDensity', 'measuredOilDensity', 'waterContent', 'insolubles', 'oilTemperature'],
  bench: ['titrantAlkali', 'titrantSolvent', 'blankPolicy', 'sampleTakenBy', 'referenceAcid', 'standardisationTemperature', 'sampleDensity', 'temperatureCorrected', 'repeatabilityBy', 'runsAreDear', 'portionTable'],
  equipment: [
    'burette', 'dropVolume', 'balanceLinearity', 'standardBalanceLinearity', 'sampleVolumeTolerance', 'sampleDensityTolerance', 'thermometerTolerance', 'temperatureSpread',
    'titrantLabelTolerance', 'titrantWeighingTolerance', 'khpPurityTolerance', 'standardisationRepeatability', 'certificateTolerance', 'oilAmountTolerance',
    'catalystAssayTolerance', 'sulfuricAssayTolerance', 'saponificationTolerance',
  ],
  vessel: ['vesselVolume', 'vesselFill', 'methanolStep', 'catalystStep', 'sulfuricStep'],
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
export class EsterwaySiteValues extends SiteSectionElement {
  static override styles = [
    ...SiteSectionElement.styles,
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
        <div class="fields">${this.keysOf(group).map((key) => (key in DEFAULT_OPTIONS ? this.siteOptionField(key) : this.siteFigureField(key)))}</div>
      `)}
    `;
  }

  /** A group shows what the options in force need: the product in use, own figures where they count. */
  private keysOf(group: Group): readonly string[] {
    const keys = GROUPS[group];
    switch (group) {
      case 'catalyst': {
        const product = this.siteOption('catalyst');
        return [...keys, ...['assay', 'baseLoad', 'density', 'solubility'].map((name) => `${product}.${name}`).filter((key) => key in DEFAULT_FIGURES)];
      }
      case 'bench': {
        const own = { typed: ['repeatabilityTyped'], 'typed-share': ['repeatabilityShare'] }[this.siteOption('repeatabilityBy')] ?? [];
        return keys.flatMap((key) => (key === 'repeatabilityBy' ? [key, ...own] : [key]));
      }
      case 'equipment':
        return keys.flatMap((key) => (key === 'burette' && this.siteOption(key) === 'other' ? [key, 'buretteCapacityTyped', 'buretteToleranceTyped'] : [key]));
      default:
        return keys;
    }
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-site-values': EsterwaySiteValues;
  }
}
