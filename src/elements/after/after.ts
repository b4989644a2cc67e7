import { css, html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { acidProduct } from '../../chemistry/neutralising.js';
import type { RouteName } from '../../chemistry/route-name.js';
import { Decimal } from '../../formula/decimal.js';
import { deAfter } from '../../locales/de-after.js';
import { enAfter } from '../../locales/en-after.js';
import { fill } from '../../locales/fill.js';
import { DEFAULT_FIGURES } from '../../lot/defaults.js';
import { FurtherReadings } from '../parts/further-readings.js';

const TEXTS = { en: enAfter, de: deAfter };
const ROUTES = ['direct', 'twoStep'] as const;
/** Below this distance from the boiling point of methanol the caution is a warning, °C. */
const NEAR_BOILING = 10;

/**
 * After the reaction: hold and settle, the heat of making the methoxide, the acid to neutralise the
 * catalyst left (and, apart, what splitting the soap would take), the layers to expect, and the checks
 * of the product.
 *
 * @element esterway-after
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {boolean} bare - leaves the heading out
 * @attr {'metric' | 'us'} units - units in which amounts are shown
 *
 * @fires {EsterwayOpenEvent} esterway-open - a person wants to see how a figure was worked out
 * @fires {EsterwayChangeEvent} esterway-change - a person changed the lot (only where the element holds it itself)
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart figure - a figure that opens its working
 * @csspart caution - the caution
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 */
export class EsterwayAfter extends FurtherReadings {
  static override styles = [
    ...FurtherReadings.styles,
    css`
      dl {
        display: grid;
        grid-template-columns: 1fr auto auto;
        gap: 4px 12px;
      }
      dt {
        color: var(--_quiet);
      }
      dd {
        text-align: end;
      }
      p {
        margin-block: 6px;
      }
    `,
  ];

  protected override get heading(): string {
    return this.textsOf(TEXTS).title;
  }

  protected override get further(): readonly string[] {
    const after = ['acid', 'acidVolume', 'splitAcid', 'splitVolume', 'upperMass', 'upperVolume', 'lowerMass', 'lowerVolume', 'lowerShare'];
    return [
      ...ROUTES.flatMap((route) => [...after.map((name) => `after.${route}.${name}`), `heat.${route}.rise`, `heat.${route}.reached`, `heat.${route}.margin`]),
      'reactionTemperature', 'reactionTime', 'settlingTime', 'after.productAcidValue', 'productAcidLimit', 'after.catalystFound', 'after.soapFound',
    ];
  }

  protected override body(): unknown {
    const texts = this.textsOf(TEXTS);
    const route = this.recommended;
    const words = (key: string): string => this.amountWords(key) ?? '–';
    const known = this.reading(`after.${route}.acid`)?.value !== undefined;
    return html`
      <p>${fill(texts.hold, { temperature: words('reactionTemperature'), time: words('reactionTime'), settling: words('settlingTime') })}</p>
      ${this.heat(route)}
      <div class="fields">${this.optionField('neutralisingAcid', true)} ${this.acidFields()}</div>
      ${known
        ? html`<h3>${texts.neutralise}</h3>
            <dl>${this.pair(this.optionText('neutralisingAcid'), `after.${route}.acid`, `after.${route}.acidVolume`)} ${this.pair(texts.split, `after.${route}.splitAcid`, `after.${route}.splitVolume`)}</dl>
            <div class="care" part="caution" role="note">${texts.care}</div>
            <h3>${texts.layers}</h3>
            <dl>${this.pair(texts.upper, `after.${route}.upperMass`, `after.${route}.upperVolume`)} ${this.pair(texts.lower, `after.${route}.lowerMass`, `after.${route}.lowerVolume`)}</dl>
            <p class="quiet small">${texts.lower}: ${fill(texts.share, { share: words(`after.${route}.lowerShare`) })}</p>`
        : html`<p class="quiet">${this.whyUnknown(`after.${route}.acid`)}</p>`}
      ${this.product()}
    `;
  }

  private pair(name: string, mass: string, volume: string): TemplateResult {
    return html`<dt>${name}</dt><dd>${this.figure(mass)}</dd><dd>${this.aboveZero(volume) ? this.figure(volume) : nothing}</dd>`;
  }

  /** Assay and density of the acid in use. */
  private acidFields(): unknown {
    const product = acidProduct(this.option('neutralisingAcid'));
    return ['assay', 'strength', 'density'].map((name) => `${product}.${name}`).filter((key) => key in DEFAULT_FIGURES)
      .map((key) => this.figureField(key, [DEFAULT_FIGURES[key]?.unit ?? '']));
  }

  private heat(route: RouteName): unknown {
    const texts = this.textsOf(TEXTS);
    const margin = this.reading(`heat.${route}.margin`)?.value;
    if (margin === undefined) return this.reading(`${route}.catalyst`)?.value === undefined ? nothing : html`<p class="quiet">${texts.heatUnknown}</p>`;
    const plain = (key: string): string => this.number(this.reading(`heat.${route}.${key}`)?.shown ?? '–');
    const near = new Decimal(margin).lt(NEAR_BOILING);
    return html`<p class=${near ? 'gate' : 'quiet'}>${fill(near ? texts.boils : texts.heat, { rise: plain('rise'), reached: plain('reached') })}</p>`;
  }

  /** The acid value of the product against its limit, and soap and catalyst by the two-indicator titration. */
  private product(): unknown {
    const texts = this.textsOf(TEXTS);
    const titrated = this.option('productAcidFrom') === 'titration';
    const [value, limit] = [this.reading('after.productAcidValue'), this.reading('productAcidLimit')];
    const good = value?.value !== undefined && limit?.value !== undefined ? new Decimal(value.value).lte(limit.value) : undefined;
    const words = { value: this.amountWords('after.productAcidValue') ?? '–', limit: this.amountWords('productAcidLimit') ?? '–' };
    return html`
      <details class="no-print">
        <summary>${texts.product}</summary>
        <div class="fields">
          ${this.optionField('productAcidFrom', true)}
          ${titrated
            ? html`${this.figureField('productSample', ['g'])} ${this.figureField('productTitre', ['mL'])} ${this.figureField('productBlank', ['mL'])}`
            : this.figureField('productAcidTyped', ['mg/g'])}
        </div>
        ${good === undefined ? html`<p class="quiet">${this.whyUnknown('after.productAcidValue')}</p>` : html`<p class=${good ? '' : 'gate'}>${fill(good ? texts.productGood : texts.productBad, words)}</p>`}
      </details>
      <details class="no-print">
        <summary>${texts.soap}</summary>
        <p class="quiet small">${texts.soapHow}</p>
        <div class="fields">
          ${this.figureField('soapSample', ['g'])} ${this.figureField('soapTitrantStrength', ['mol/L'])}
          ${['phenolphthaleinTitre', 'phenolphthaleinBlank', 'bromophenolTitre', 'bromophenolBlank'].map((key) => this.figureField(key, ['mL']))}
        </div>
        <dl>${this.one('after.catalystFound')} ${this.one('after.soapFound')}</dl>
      </details>
    `;
  }

  private one(key: string): TemplateResult {
    return html`<dt>${this.fieldLabel(key)}</dt><dd></dd><dd>${this.figure(key)}</dd>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-after': EsterwayAfter;
  }
}
