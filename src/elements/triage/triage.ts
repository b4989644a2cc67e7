import { css, html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import type { TriageReason } from '../../decision/triage.js';
import { Decimal } from '../../formula/decimal.js';
import { shownText } from '../../formula/digits.js';
import { deTriage } from '../../locales/de-triage.js';
import { enTriage } from '../../locales/en-triage.js';
import type { Widened } from '../../locales/en.js';
import { fill } from '../../locales/fill.js';
import { fieldName, sourceName } from '../../locales/quantity-name.js';
import { triage } from '../../lot/triage.js';
import type { RetestAdvice, Settlement, Triage } from '../../lot/triage.js';
import { fieldStyles } from '../parts/field-styles.js';
import { FurtherReadings } from '../parts/further-readings.js';

const TEXTS = { en: enTriage, de: deTriage };
const DEDUCTIONS = ['ffa', 'water', 'insolubles'] as const;
const SHARE_DIGITS = { bands: [{ below: '10', decimals: 2 }, { decimals: 1 }] } as const;

/**
 * Judges a delivery at the bay by what the site asks: accepted, for pretreatment, for blending, held for retest or declined, with the
 * reasons, what to measure again and how, and what it is paid by the site's contract.
 *
 * @element esterway-triage
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {boolean} bare - leaves the heading out
 * @attr {'metric' | 'us'} units - units in which amounts are shown
 *
 * @fires {EsterwayOpenEvent} esterway-open - a person wants to see how a figure was worked out
 * @fires {EsterwayChangeEvent} esterway-change - a person changed the lot (only where the element holds it itself)
 * @fires {EsterwaySiteChangeEvent} esterway-site-change - a person changed a site value (only where the element holds the lot itself)
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart verdict - the state of the delivery
 * @csspart caution - the caution
 * @csspart figure - a figure that opens its working
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 */
export class EsterwayTriage extends FurtherReadings {
  static override styles = [
    ...FurtherReadings.styles,
    fieldStyles,
    css`
      .state {
        display: flex;
        gap: 8px;
        align-items: baseline;
        font-size: 1.15em;
        font-weight: 650;
        line-height: 1.25;
      }
      .sign {
        flex: none;
        inline-size: 1.3em;
        text-align: center;
      }
      p,
      ul {
        margin-block: 5px;
      }
      li {
        padding-block: 2px;
      }
      dl {
        display: grid;
        grid-template-columns: 1fr auto;
        gap: 4px 12px;
      }
      dt {
        color: var(--_quiet);
      }
      dd {
        text-align: end;
      }
      .sum {
        font-weight: 650;
        color: inherit;
      }
    `,
  ];

  #read: { readonly for: unknown; readonly is: Triage | undefined } | undefined;

  private get words(): Widened<typeof enTriage> {
    return this.textsOf(TEXTS);
  }

  protected override get heading(): string {
    return this.words.title;
  }

  protected override get summary(): string {
    return this.words.shortStates[this.judged?.state ?? 'not-known'];
  }

  protected override get further(): readonly string[] {
    return ['oilPrice', 'settlement.price', 'settlement.amount', ...DEDUCTIONS.flatMap((what) => [`settlement.${what}Deduction`, `settlement.${what}Rate`]), 'arrivalTemperature', 'blendingLimit', 'acceptedWater', 'acceptedInsolubles', 'lowestArrival', 'highestArrival', 'settlement.baseFfa', 'settlement.waterAllowance', 'settlement.insolublesAllowance'];
  }

  /** Judged once for a reading. */
  private get judged(): Triage | undefined {
    const { entry, site, reading } = this.desk;
    if (this.#read?.for !== reading) {
      const judged = triage(entry, site);
      this.#read = { for: reading, is: 'faults' in judged ? undefined : judged };
    }
    return this.#read?.is;
  }

  protected override body(): unknown {
    const { words, judged } = this;
    if (!judged) return nothing;
    const temperatures = this.desk.units === 'us' ? ['°F', '°C'] : ['°C', '°F'];
    return html`
      <div role="status">
        <p class="state" part="verdict"><span class="sign" aria-hidden="true">${SIGNS[judged.state]}</span><span>${words.states[judged.state]}</span></p>
        ${judged.reasons.map((reason) => html`<p class=${reason.code === 'limit-out-of-order' ? 'gate' : ''}>${this.reasonText(reason)}</p>`)}
      </div>
      ${judged.retest.length ? html`<h3>${words.retest}</h3><ul>${judged.retest.map((advice) => html`<li>${this.adviceText(advice)}</li>`)}</ul>` : nothing}
      <div class="fields">${this.figureField('arrivalTemperature', temperatures)}</div>
      <div class="care" part="caution" role="note">${words.care}</div>
      ${this.settlement(judged)}
      <details class="no-print">
        <summary>${words.asks}</summary>
        <p class="quiet small">${words.asksNote}</p>
        <div class="fields">
          ${['blendingLimit', 'acceptedWater', 'acceptedInsolubles', 'lowestArrival', 'highestArrival'].map((key) => this.siteFigureField(key))}
          ${['waterAbove', 'insolublesAbove', 'takesOneRun', 'takesCertificate'].map((key) => this.siteOptionField(key, true))}
        </div>
      </details>
      <details class="no-print">
        <summary>${words.rates}</summary>
        <p class="quiet small">${words.contract}</p>
        <div class="fields">
          ${this.currencyField()} ${this.siteFigureField('oilPrice')}
          ${['baseFfa', 'ffaRate', 'waterAllowance', 'waterRate', 'insolublesAllowance', 'insolublesRate'].map((name) => this.siteFigureField(`settlement.${name}`))}
          ${this.siteOptionField('settledBy', true)}
        </div>
      </details>
    `;
  }

  private settlement({ settlement, unsettled }: Triage): unknown {
    const { words } = this;
    const begun = settlement ?? Object.keys(this.desk.site.figures).some((key) => key === 'oilPrice' || key.startsWith('settlement.'));
    if (!begun) return nothing;
    const lacking = unsettled.length ? fill(words.unsettled, { fields: unsettled.map((field) => fieldName(field, this.texts)).join(', ') }) : settlement ? '' : this.whyUnknown('settlement.price');
    return html`<h3>${words.settlement}</h3>${settlement ? this.paid(settlement) : nothing} ${lacking ? html`<p class="quiet">${lacking}</p>` : nothing}`;
  }

  private paid({ price, assumed, deductions }: Settlement): TemplateResult {
    const { words } = this;
    const taken = DEDUCTIONS.filter((what) => Number(deductions[what]) > 0);
    return html`
      <dl>
        <dt>${words.price}</dt><dd>${this.figure('oilPrice')}</dd>
        ${taken.map((what) => html`<dt>${fill(words.less, { what: words.deductions[what] })}</dt><dd>− ${this.figure(`settlement.${what}Deduction`)}</dd>`)}
        <dt class="sum">${words.paid}</dt><dd>${this.figure('settlement.price')}</dd>
        <dt class="sum">${words.amount}</dt><dd>${this.figure('settlement.amount')}</dd>
      </dl>
      ${price.startsWith('-') ? html`<p class="gate">${words.negative}</p>` : nothing}
      ${assumed.length ? html`<p class="gate">${fill(words.assumed, { fields: assumed.map((field) => fieldName(field, this.texts)).join(', ') })}</p>` : nothing}
    `;
  }

  private reasonText({ code, params }: TriageReason): string {
    const { words } = this;
    const states = words.shortStates as Readonly<Record<string, string>>;
    const limits = words.limits as Readonly<Record<string, string>>;
    const shown = Object.entries(params).map(([name, value]) => [name, states[value] ?? limits[value] ?? this.shareText(value, name, params)] as const);
    return fill(words.reasons[code], Object.fromEntries(shown));
  }

  /** A share with two decimals, or as many as keep it apart from its limit; a limit as it was set. */
  private shareText(value: string, name: string, params: Readonly<Record<string, string>>): string {
    const exact = new Decimal(value);
    if (/^(?:limit|before)$/.test(name)) return this.number(exact.toString());
    const other = params['limit'];
    const texts = [SHARE_DIGITS, { decimals: 2 }, { decimals: 3 }, { decimals: 4 }, { decimals: 6 }].map((digits) => shownText(exact, digits));
    return this.number(texts.find((text) => other === undefined || !new Decimal(text).eq(other)) ?? texts[0] ?? value);
  }

  private adviceText({ what, how, params }: RetestAdvice): string {
    const sentences = this.words.how[what] as Readonly<Record<string, string>>;
    const { source, ...rest } = params;
    return fill(sentences[how] ?? '', { ...rest, ...(source && { source: sourceName(source, this.texts) }) });
  }
}

/** Signs that are told apart without colour. */
const SIGNS: Readonly<Record<Triage['state'], string>> = {
  accepted: '✓', 'for-pretreatment': '✓', 'for-blending': '✓', 'held-for-retest': '…', declined: '✕', 'not-known': '?',
};

declare global {
  interface HTMLElementTagNameMap {
    'esterway-triage': EsterwayTriage;
  }
}
