import { css, html, nothing, svg } from 'lit';
import type { TemplateResult } from 'lit';
import { acidProduct } from '../../chemistry/neutralising.js';
import type { RouteName } from '../../chemistry/route-name.js';
import { Decimal } from '../../formula/decimal.js';
import { shownText } from '../../formula/digits.js';
import { deCost } from '../../locales/de-cost.js';
import { enCost } from '../../locales/en-cost.js';
import { fill } from '../../locales/fill.js';
import { fieldName, quantityName } from '../../locales/quantity-name.js';
import { breakEven } from '../../lot/break-even.js';
import type { BreakEven } from '../../lot/break-even.js';
import { unpriced } from '../../lot/unpriced.js';
import { fieldStyles } from '../parts/field-styles.js';
import { FurtherReadings } from '../parts/further-readings.js';
import { plotStyles, ticks } from '../parts/plot.js';

const TEXTS = { en: enCost, de: deCost };
const ROUTES = ['direct', 'twoStep'] as const;
const PARTS = ['oil', 'methanol', 'catalyst', 'sulfuric', 'neutralising', 'drawnOff', 'lowerLayer', 'energy', 'energyPasses', 'time', 'timePasses', 'lost'] as const;
const WIDTH = 260;
const HEIGHT = 160;

/**
 * What both routes cost by the site's own prices: each part, the total a batch and a tonne of oil, the
 * yield, and the free fatty acid at which the cheaper route changes.
 *
 * @element esterway-cost
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {boolean} bare - leaves the heading out
 *
 * @fires {EsterwayOpenEvent} esterway-open - a person wants to see how a figure was worked out
 * @fires {EsterwaySiteChangeEvent} esterway-site-change - a person changed a price (only where the element holds the lot itself)
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart figure - a figure that opens its working
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 */
export class EsterwayCost extends FurtherReadings {
  static override styles = [
    ...FurtherReadings.styles,
    plotStyles,
    fieldStyles,
    css`
      table {
        inline-size: 100%;
        border-collapse: collapse;
      }
      th {
        font-weight: 400;
        text-align: start;
        overflow-wrap: anywhere;
        hyphens: auto;
      }
      thead th,
      td {
        text-align: end;
        white-space: nowrap;
      }
      thead th:first-child {
        text-align: start;
      }
      td,
      th {
        padding: 3px 0 3px 8px;
        padding-inline: 8px 0;
        border-block-end: 1px solid var(--_faint);
      }
      th:first-child {
        padding-inline: 0;
      }
      tfoot th,
      tfoot td {
        font-weight: 650;
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
    return [...ROUTES.flatMap((route) => [...PARTS, 'total', 'perTonne', 'yield'].map((part) => `cost.${route}.${part}`)), 'cost.difference'];
  }

  protected override body(): unknown {
    const texts = this.textsOf(TEXTS);
    const known = ROUTES.some((route) => this.reading(`cost.${route}.perTonne`)?.value !== undefined);
    return html`
      <details class="no-print">
        <summary>${texts.prices}</summary>
        <p class="quiet small">${texts.money}</p>
        <div class="fields">${this.currencyField()} ${this.priceFields().map((key) => this.siteFigureField(key))}</div>
      </details>
      ${known ? html`${this.table()} ${this.comparison()} ${this.plot()}` : html`<p class="quiet">${this.hasPrice ? this.whyUnknown('cost.direct.perTonne') : texts.none}</p>`}
    `;
  }

  private get hasPrice(): boolean {
    return this.priceFields().some((key) => key in this.desk.site.figures);
  }

  /** The prices that this lot's charges need, catalyst and neutralising acid as they are in use. */
  private priceFields(): readonly string[] {
    const acid = acidProduct(this.option('neutralisingAcid'));
    return [
      'oilPrice', 'esterPrice', 'methanolPrice', `${this.option('catalyst')}.price`, 'sulfuricPrice', ...(acid === 'sulfuric' ? [] : [`${acid}.price`]),
      'drawnOffPrice', 'lowerLayerPrice', 'energyPrice', 'energyBaseStep', 'energyAcidPass', 'hourPrice', 'hoursBaseStep', 'hoursAcidPass',
    ];
  }

  private table(): TemplateResult {
    const texts = this.textsOf(TEXTS);
    const cell = (route: string, part: string): unknown => (this.reading(`cost.${route}.${part}`)?.value === undefined ? '–' : this.figure(`cost.${route}.${part}`, false));
    const shown = PARTS.filter((part) => ROUTES.some((route) => this.reading(`cost.${route}.${part}`)?.value !== undefined));
    const name = (part: string): string => quantityName(`cost.twoStep.${part}`, this.texts).split(': ').at(-1) ?? part;
    const row = (label: string, part: string): TemplateResult => html`<tr><th scope="row">${label}</th>${ROUTES.map((route) => html`<td>${cell(route, part)}</td>`)}</tr>`;
    return html`<table>
      <thead><tr><th scope="col">${texts.part}, ${this.inMoney('¤')}</th><th scope="col">${texts.direct}</th><th scope="col">${texts.twoStep}</th></tr></thead>
      <tbody>${shown.map((part) => row(name(part), part))}</tbody>
      <tfoot>${row(texts.batch, 'total')} ${row(texts.perTonne, 'perTonne')} ${row(`${texts.yield}, kg`, 'yield')}</tfoot>
    </table>`;
  }

  private comparison(): unknown {
    const texts = this.textsOf(TEXTS);
    const { entry, site } = this.desk;
    const difference = this.reading('cost.difference')?.value;
    const left = unpriced(entry, site, 'twoStep');
    const amount = difference === undefined ? '' : this.number(shownText(new Decimal(difference).abs(), { decimals: 2 }));
    return html`
      ${left.length ? html`<p class="gate small">${fill(texts.unpriced, { prices: left.map((field) => fieldName(field, this.texts)).join(', ') })}</p>` : nothing}
      ${difference === undefined ? nothing : html`<p><b>${fill(difference.startsWith('-') ? texts.cheaper : texts.dearer, { difference: amount })}</b></p>`}
    `;
  }

  private plot(): unknown {
    const texts = this.textsOf(TEXTS);
    const { entry, site } = this.desk;
    const found = breakEven(entry, site);
    if (!('points' in found) || found.points.length < 2) return nothing;
    const ffa = this.reading('freeFattyAcid');
    const label = ffa?.shown === undefined ? texts.plotEmpty : fill(texts.plot, { ffa: this.number(ffa.shown) });
    return html`${this.drawing(found, ffa?.value === undefined ? undefined : Number(ffa.value), label)}
      ${this.sentences(found).map((sentence) => html`<p>${sentence}</p>`)}`;
  }

  private sentences({ crossings, cheapest }: BreakEven): readonly string[] {
    const texts = this.textsOf(TEXTS);
    const name = (route: 'direct' | 'two-step' | 'same'): string => ({ direct: texts.direct, 'two-step': texts.twoStep, same: texts.same })[route];
    if (!crossings.length) return [fill(texts.always, { route: name(cheapest) })];
    return crossings.map(({ ffa, below, above }) => fill(texts.breakEven, { ffa: this.number(ffa), below: name(below), above: name(above) }));
  }

  private drawing({ points, crossings }: BreakEven, ffa: number | undefined, label: string): TemplateResult {
    const texts = this.textsOf(TEXTS);
    const costs = points.flatMap(({ direct, twoStep }) => [direct, twoStep]);
    const [low, high] = [Math.min(...costs, 0), Math.max(...costs)];
    const widest = points.at(-1)?.ffa ?? 40;
    const x = (share: number): string => (40 + (share / widest) * (WIDTH - 48)).toFixed(1);
    const y = (cost: number): string => (10 + (1 - (cost - low) / (high - low || 1)) * (HEIGHT - 40)).toFixed(1);
    const line = (route: RouteName): string => `M${points.map((point) => `${x(point.ffa)} ${y(point[route])}`).join(' L')}`;
    const [before, last] = [points.at(-2), points.at(-1)];
    const named = (route: RouteName, words: string): unknown => {
      if (!before || !last) return nothing;
      // on the side of the line that its own slope leaves free
      const free = last[route] >= before[route] ? -4 : 12;
      return svg`<text class="end" x=${WIDTH - 8} y=${Number(y(last[route])) + free}>${words}</text>`;
    };
    return html`<svg class="plot" viewBox="0 0 ${WIDTH} ${HEIGHT}" role="img" aria-label=${label}>
      ${ticks(high, 4).map((cost) => svg`<path class="grid" d="M40 ${y(cost)} H${WIDTH - 8}" /><text class="end" x="36" y=${Number(y(cost)) + 4}>${this.number(String(cost))}</text>`)}
      ${ticks(widest, 4).map((share) => svg`<text class="middle" x=${x(share)} y=${HEIGHT - 16}>${this.number(String(share))}</text>`)}
      <text class="end" x=${WIDTH - 8} y=${HEIGHT - 3}>% FFA</text><text x="0" y="8">${this.inMoney('¤/t')}</text>
      <path class="line" d=${line('direct')} /><path class="line broken" d=${line('twoStep')} />
      ${named('direct', texts.direct)}${named('twoStep', texts.twoStep)}
      ${crossings.map((crossing) => svg`<path class="limit" d="M${x(Number(crossing.ffa))} 10 V${HEIGHT - 30}" />`)}
      ${ffa === undefined || ffa > widest ? nothing : svg`<path class="here" d="M${x(ffa)} 10 V${HEIGHT - 30}" /><text x=${Number(x(ffa)) + 3} y="18">${texts.here}</text>`}
      <path class="axis" d="M40 10 V${HEIGHT - 30} H${WIDTH - 8}" />
    </svg>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-cost': EsterwayCost;
  }
}
