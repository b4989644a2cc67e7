import { css, html, nothing } from 'lit';
import { property } from 'lit/decorators.js';
import { fill } from '../../locales/fill.js';
import type { BlendStock } from '../../lot/blend-stock.js';
import type { EsterwayStockChangeEvent } from '../blend/events.js';
import { ReasonWords } from '../parts/reason-words.js';
import { SectionElement } from '../parts/section.js';
import { buretteScale, buretteStyles, scaleOf } from './burette-scale.js';

/**
 * The route of a lot: the verdict in one sentence with its reasons, beside it the burette scale with
 * the result and the site's limits, and the other ways on one line each. What is in stock can be blended under it.
 *
 * @element esterway-route
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {'metric' | 'us'} units - units in which amounts are shown
 *
 * @fires {EsterwayOpenEvent} esterway-open - a person wants to see how a figure was worked out
 * @fires {EsterwayStockChangeEvent} esterway-stock-change - a person changed what is in stock; keep it and set `stock` again next time
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart verdict - the sentence that says the route
 * @csspart scale - the burette scale
 * @csspart figure - a figure that opens its working
 *
 * @cssprop --esterway-oil - the oil in the burette
 * @cssprop --esterway-glass - the glass and its graduation
 * @cssprop --esterway-amber - the limits
 * @cssprop --esterway-pink - the meniscus
 */
export class EsterwayRoute extends SectionElement {
  static override styles = [
    ...SectionElement.styles,
    buretteStyles,
    css`
      .route {
        display: grid;
        grid-template-columns: 100px 1fr;
        gap: 14px;
      }
      .verdict {
        margin-block: 2px 6px;
        font-size: 1.22em;
        font-weight: 650;
        line-height: 1.2;
        hyphens: auto;
      }
      .why {
        margin-block-end: 5px;
        font-size: 0.94em;
      }
      .other {
        display: flex;
        flex-wrap: wrap;
        justify-content: space-between;
        gap: 0 10px;
        padding-block: 6px;
        border-block-start: 1px solid var(--_rule);
        font-size: 0.92em;
      }
      .other > :last-child {
        color: var(--_quiet);
        text-align: end;
      }
      details {
        border-block-start: 1px solid var(--_rule);
      }
      summary > .quiet {
        flex: 1;
        text-align: end;
      }
      li {
        padding-block: 2px;
        color: var(--_quiet);
      }
      @container (max-width: 290px) {
        .route {
          grid-template-columns: 86px 1fr;
          gap: 8px;
        }
        .burette {
          inline-size: 86px;
        }
      }
    `,
  ];

  /** What is in stock to blend, and the limits of the blend; a page may keep it. */
  @property({ attribute: false }) stock: BlendStock | undefined;

  readonly #reasons = new ReasonWords({ texts: () => this.texts, tag: () => this.languageTag, reading: (key) => this.reading(key) });

  protected override get heading(): string {
    return this.texts.sections.route;
  }

  protected override get summary(): string {
    return this.folded ? this.verdict : '';
  }

  private get verdict(): string {
    return this.texts.verdicts[this.lot?.route.verdict ?? 'not-known'];
  }

  protected override body(): unknown {
    const route = this.lot?.route;
    const safe = route?.safe;
    return html`
      <div class="route">
        ${this.scale()}
        <div role="status">
          <p class="verdict" part="verdict">${this.verdict}</p>
          ${safe ? html`<p class="why"><b>${this.texts.verdicts[safe]}</b></p>` : nothing}
          ${route?.reasons.map((reason) => html`<p class="why">${this.#reasons.sentence(reason)}</p>`)}
          ${this.odds()}
          ${route?.verdict === 'not-known' ? html`<p class="why quiet">${this.whyUnknown('freeFattyAcid')}</p>` : nothing}
        </div>
      </div>
      ${this.others()}
      <esterway-later needs="intake" .label=${this.texts.route.delivery} .content=${delivery}></esterway-later>
      <esterway-later needs="intake" .label=${this.texts.route.fromStock} .content=${this.blend}></esterway-later>
      <details class="no-print">
        <summary>${this.texts.route.published} <span class="quiet">${this.texts.route.publishedRange}</span></summary>
        <ul>
          ${this.texts.route.publishedList.map((line) => html`<li>${line}</li>`)}
        </ul>
      </details>
    `;
  }

  /** In a close call, how likely the true figure lies on either side. */
  private odds(): unknown {
    const odds = this.lot?.route.odds;
    if (!odds) return nothing;
    const percent = (part: number): string => this.number(String(Math.min(99, Math.max(1, Math.round(part * 100)))));
    return html`<p class="why">${fill(this.texts.route.odds, { below: percent(Number(odds.below)), above: percent(1 - Number(odds.below)), limit: this.#reasons.limit(odds.limit) })}</p>`;
  }

  private scale(): unknown {
    const { texts } = this;
    const figure = (key: string): number | undefined => {
      const value = this.reading(key)?.value;
      return value === undefined ? undefined : Number(value);
    };
    const ffa = figure('freeFattyAcid');
    const directLimit = figure('directLimit') ?? 0;
    const words = {
      ffa: [this.amountPlain('freeFattyAcid'), this.plusMinus('freeFattyAcid')].filter(Boolean).join(' ').replace(/\s%$/, ''),
      limit: this.amountPlain('directLimit'),
      most: this.number(String(scaleOf(ffa, directLimit).most)),
    };
    const expanded = this.lot?.uncertainties['freeFattyAcid']?.expanded;
    return buretteScale({
      ffa,
      ...(expanded !== undefined && { expanded: Number(expanded) }),
      directLimit,
      pretreatmentLimit: figure('pretreatmentLimit') ?? 100,
      directMark: texts.route.directMark,
      pretreatmentMark: texts.route.pretreatmentMark,
      label: fill(ffa === undefined ? texts.route.scaleEmpty : texts.route.scale, words),
      write: (value) => this.number(String(Math.round(value * 10) / 10)),
    });
  }

  private readonly blend = (): unknown => html`<esterway-blend bare .stock=${this.stock} @esterway-stock-change=${this.onStock}></esterway-blend>`;

  private onStock({ stock }: EsterwayStockChangeEvent): void {
    this.stock = stock;
  }

  private amountPlain(key: string): string {
    return this.number(this.reading(key)?.shown ?? '–');
  }

  /** The ways not taken, with what they would cost. */
  private others(): unknown {
    const { texts, lot } = this;
    const verdict = lot?.route.verdict;
    if (!lot || verdict === 'not-known' || !this.reading('oilMass')?.value) return nothing;
    const { route } = texts;
    const acidSteps = lot.charges.twoStep.filter(({ step }) => step === 'acid').length;
    const mustBlend = this.aboveZero('blendOil');
    return html`
      ${verdict === 'direct'
        ? html`<p class="other"><span>${route.twoStepAllTheSame}</span><span>${fill(acidSteps === 1 ? route.onePass : route.passes, { passes: String(acidSteps) })}</span></p>`
        : html`<p class="other"><span>${route.directAllTheSame}</span><span>${this.figure('direct.soap')} ${route.soap}</span></p>`}
      ${mustBlend
        ? html`<p class="other">
            <span>${fill(route.blend, { limit: this.amountPlain('directLimit') })}</span>
            <span>${this.figure('blendOil')} ${fill(route.blendWith, { ffa: this.amountPlain('cleanOilFfa') })}</span>
          </p>`
        : nothing}
    `;
  }
}

const delivery = (): unknown => html`<esterway-triage bare></esterway-triage>`;

declare global {
  interface HTMLElementTagNameMap {
    'esterway-route': EsterwayRoute;
  }
}
