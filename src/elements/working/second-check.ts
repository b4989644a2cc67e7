import { css, html, nothing } from 'lit';
import type { PropertyValues } from 'lit';
import { property, state } from 'lit/decorators.js';
import { keyed } from 'lit/directives/keyed.js';
import type { RouteName } from '../../chemistry/route-name.js';
import { Decimal } from '../../formula/decimal.js';
import { shownText } from '../../formula/digits.js';
import { deSecondCheck } from '../../locales/de-second-check.js';
import { enSecondCheck } from '../../locales/en-second-check.js';
import { fill } from '../../locales/fill.js';
import { quantityName } from '../../locales/quantity-name.js';
import type { Figure } from '../../lot/figure.js';
import { secondCheck } from '../../lot/second-check.js';
import type { Check, FoundSlip, NamedSlip } from '../../lot/second-check.js';
import type { FigureInputEvent } from '../parts/figure-field.js';
import type { OptionInputEvent } from '../parts/option-field.js';
import { printAlone } from '../parts/print.js';
import { SectionElement } from '../parts/section.js';

const TEXTS = { en: enSecondCheck, de: deSecondCheck };

/** Units in which an amount worked out by hand is typed; in any other unit there is only the figure's own. */
const UNITS: Readonly<Record<string, readonly string[]>> = { kg: ['kg', 'g', 'lb'], L: ['L', 'mL', 'US gal'] };

/** A second person's own figure against the tool's, and the sheet to work it out on. Stands in the working. */
export class SecondCheckElement extends SectionElement {
  static override styles = [
    ...SectionElement.styles,
    css`
      :host {
        background: transparent;
      }
      .own {
        display: flex;
        flex-wrap: wrap;
        align-items: end;
        gap: 8px 12px;
      }
      .own > :first-child {
        flex: 1 1 9em;
        max-inline-size: 16em;
      }
      .said:empty {
        display: none;
      }
      .said {
        margin-block: 8px;
      }
      .said li {
        margin-block: 6px;
        padding-inline-start: 9px;
        border-inline-start: 3px solid var(--_rule);
      }
      .paper {
        margin-block-start: 14px;
      }
    `,
  ];

  /** Key of the figure that is checked; empty for none. */
  @property() of = '';

  @state() private typed: Figure | undefined;
  /** What was said to the figure as it stands; nothing while it is being typed. */
  @state() private check: Check | undefined;
  @state() private route: RouteName | undefined;
  #checkedFor: unknown;

  protected override heading = '';

  protected override willUpdate(changed: PropertyValues<this>): void {
    if (changed.has('of')) this.typed = undefined;
    // what was said stands for one figure of one lot
    if (changed.has('of') || this.#checkedFor !== this.desk.reading) this.check = undefined;
    this.#checkedFor = this.desk.reading;
  }

  protected override render(): unknown {
    return this.lot ? this.body() : nothing;
  }

  protected override body(): unknown {
    return html`${this.reading(this.of)?.from === 'formula' ? this.own() : nothing} ${this.paper()}`;
  }

  private get words(): typeof TEXTS.de {
    return this.textsOf<typeof TEXTS.de>(TEXTS);
  }

  private own(): unknown {
    const { words } = this;
    const reading = this.reading(this.of);
    if (reading?.value === undefined) return html`<p class="quiet small">${fill(words.nothingToCheck, { why: this.whyUnknown(this.of) })}</p>`;
    const { check } = this;
    return html`
      <div class="own" @focusout=${this.onCheck}>
        ${keyed(
          this.of, // a field keeps the unit chosen in it
          html`<esterway-figure
            .label=${words.own}
            .figure=${this.typed}
            .units=${this.unitsFor(reading.unit)}
            .problem=${check?.verdict === 'problem' ? this.problemText(check.problem) : undefined}
            @figure-input=${this.onInput}
          ></esterway-figure>`,
        )}
        <button class="action" type="button" ?disabled=${!this.typed} @click=${this.onCheck}>${words.check}</button>
      </div>
      <div class="said" role="status">${check && check.verdict !== 'problem' ? this.said(check) : nothing}</div>
    `;
  }

  private unitsFor(unit: string): readonly string[] {
    const shown = /^\S+\u00a0(.+)$/.exec(this.amountWords(this.of) ?? '')?.[1];
    const all = UNITS[unit] ?? [unit];
    return shown && all.includes(shown) ? [shown, ...all.filter((other) => other !== shown)] : all;
  }

  private said(check: Exclude<Check, { verdict: 'problem' }>): unknown {
    const { words } = this;
    switch (check.verdict) {
      case 'agrees':
        return html`<p><b>${words.agrees}</b></p>`;
      case 'close':
        return html`<p><b>${fill(words.close, { difference: this.difference(check.difference) })}</b></p>`;
      case 'not-known':
        return html`<p>${fill(words.nothingToCheck, { why: this.whyUnknown(this.of) })}</p>`;
      case 'differs':
        return html`<div class="gate">
          <p><b>${fill(new Decimal(check.difference).lt(0) ? words.tooLow : words.tooHigh, { difference: this.difference(check.difference) })}</b></p>
          ${this.slips(check.slips, check.tooFewDigits)}
        </div>`;
    }
  }

  private slips(slips: readonly FoundSlip[], tooFewDigits: boolean): unknown {
    const { words } = this;
    if (tooFewDigits) return html`<p>${words.tooFewDigits}</p>`;
    if (!slips.length) return html`<p>${words.noSlip}</p>`;
    return html`<p>${slips.length > 1 ? words.moreSlips : words.oneSlip}</p>
      <ul>
        ${slips.map((slip) => html`<li>${slip.and ? fill(words.pair, { first: this.slip(slip), second: this.slip(slip.and) }) : this.slip(slip)}</li>`)}
      </ul>`;
  }

  /** A slip as a sentence, with what to do. */
  private slip({ code, params }: NamedSlip): string {
    const { words, texts } = this;
    const { taken = '', average = '', basis = '', density = '', titration } = params;
    type Words = Readonly<Record<string, string>>;
    const catalysts: Words = texts.options.catalyst;
    const named: Readonly<Record<string, Words>> = {
      'other-titrant-molar-mass': texts.options.titrantAlkali, 'other-reference-acid': texts.options.referenceAcid,
      'other-methanol-basis': texts.options.pretreatmentMethanolBasis, 'other-acid-basis': texts.options.pretreatmentAcidBasis,
    };
    const sentence = fill(words.slips[code], {
      ...params,
      taken: (named[code] ?? catalysts)[taken] ?? taken,
      basis: named[code]?.[basis] ?? basis,
      average: (words.averages as Words)[average] ?? average,
      density: density && [quantityName(density, texts), this.amountWords(density)].filter(Boolean).join(', '),
    });
    return titration ? fill(words.inRetest, { slip: sentence }) : sentence;
  }

  /** How far off, without a sign, in the unit that was typed. */
  private difference(text: string): string {
    const { unit = '' } = this.reading(this.of) ?? {};
    return `${this.number(shownText(new Decimal(text).abs(), { significant: 3 }))}\u00a0${unit}`.trim();
  }

  // -- paper ----------------------------------------------------------------

  private paper(): unknown {
    const { words, texts } = this;
    if (this.reading('acidValue')?.value === undefined) return nothing;
    return html`<div class="own paper no-print">
      <esterway-option
        .label=${words.sheet.route}
        .options=${[['direct', texts.charge.direct], ['twoStep', texts.charge.twoStep]]}
        .value=${this.route ?? this.recommended}
        .note=${words.sheet.hint}
        @option-input=${(event: OptionInputEvent) => (this.route = event.option as RouteName)}
      ></esterway-option>
      <button class="action" type="button" @click=${this.onPrint}>${words.sheet.print}</button>
    </div>`;
  }

  private onInput(event: FigureInputEvent): void {
    this.typed = event.figure;
    this.check = undefined;
  }

  private onCheck(): void {
    const { entry, site } = this.desk;
    if (this.typed && !this.check) this.check = secondCheck(entry, site, this.of, this.typed);
  }

  private async onPrint(): Promise<void> {
    const sheet = document.createElement('esterway-check-sheet');
    const { entry, site } = this.desk;
    sheet.entry = entry;
    sheet.site = site;
    sheet.route = this.route ?? this.recommended;
    await printAlone(sheet, { title: [this.words.sheet.title, entry.name].filter(Boolean).join(' '), lang: this.languageTag });
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-second-check': SecondCheckElement;
  }
}
