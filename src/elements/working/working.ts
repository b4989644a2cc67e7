import { css, html, nothing } from 'lit';
import type { PropertyValues } from 'lit';
import { property } from 'lit/decorators.js';
import { guard } from 'lit/directives/guard.js';
import type { Decimal } from '../../formula/decimal.js';
import type { Unit } from '../../formula/unit.js';
import { quantityName } from '../../locales/quantity-name.js';
import type { ReadingJson } from '../../lot/lot-reading.js';
import { readLot } from '../../lot/read-lot.js';
import { uncertainty } from '../../lot/uncertainty.js';
import { working, workingFigure } from '../../lot/working.js';
import type { Working } from '../../lot/working.js';
import { SectionElement } from '../parts/section.js';
import { budgetStyles, budgetView } from './budget.js';
import { mathElement } from './math.js';
import type { SecondCheckElement } from './second-check.js';

/**
 * The working of one figure: its formula, the figures in it, the result, the source, and what it
 * rests on, to open next. For a second person with a calculator.
 *
 * @element esterway-working
 * @attr {string} of - key of the quantity that is open
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {'metric' | 'us'} units - units in which amounts are shown
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart formula - the general formula
 * @csspart figures - the formula with its figures
 *
 * @cssprop --esterway-faint - the ruled lines under the working
 */
export class EsterwayWorking extends SectionElement {
  static override styles = [
    ...SectionElement.styles,
    budgetStyles,
    css`
      .pick {
        display: block;
        inline-size: 100%;
        min-block-size: var(--_target);
        padding: 0 2px;
        background: transparent;
        border: 0;
        border-block-end: 1.5px solid var(--_glass);
      }
      option,
      optgroup {
        background: var(--_paper);
        color: var(--_ink);
      }
      .sheet {
        margin-block: 8px;
        line-height: 1.8;
      }
      .name {
        font-weight: 650;
      }
      .formula {
        overflow-x: auto;
        padding-block: 4px;
      }
      math {
        math-style: normal;
        font-size: 1.15em;
      }
      .figures,
      .outcome {
        overflow-wrap: anywhere;
      }
      .outcome b {
        font-size: 1.1em;
      }
      .full {
        overflow-wrap: anywhere;
      }
      ul.rests {
        display: flex;
        flex-wrap: wrap;
        gap: 0 14px;
      }
      .rests button {
        min-block-size: var(--_target);
      }
      .back {
        margin-block-end: 4px;
      }
    `,
  ];

  /** Key of the quantity that is open; empty for none. */
  @property({ reflect: true }) of = '';

  /** The figures opened one after the other, to step back through. */
  #trail: string[] = [];
  /** Kept, so that what was typed in it stays while it is folded. */
  #secondCheck: SecondCheckElement | undefined;

  protected override get heading(): string {
    return this.texts.sections.working;
  }

  protected override get summary(): string {
    return this.of ? quantityName(this.of, this.texts) : '';
  }

  protected override willUpdate(changed: PropertyValues<this>): void {
    if (changed.has('of') && this.of && this.#trail.at(-1) !== this.of) this.#trail.push(this.of);
  }

  protected override body(): unknown {
    const { texts, lot } = this;
    if (!lot) return nothing;
    return html`
      <label class="small quiet" for="pick">${texts.working.choose}</label>
      <select class="pick" id="pick" data-field @change=${this.onPick}>
        <option value="" ?selected=${!this.of}></option>
        ${guard([lot, this.of, texts], () => this.groups())}
      </select>
      ${this.reading(this.of) ? this.opened() : html`<p class="small quiet">${texts.working.none}</p>`}
      <esterway-later .label=${texts.working.secondCheck} .content=${() => this.secondCheck()}></esterway-later>
    `;
  }

  private secondCheck(): SecondCheckElement {
    const check = (this.#secondCheck ??= document.createElement('esterway-second-check'));
    check.of = this.of;
    return check;
  }

  /** A figure that is not read for every lot is read when it is opened. */
  protected override reading(key: string): ReadingJson | undefined {
    const { entry, site, reading } = this.desk;
    const found = super.reading(key);
    if (found || !key || 'faults' in reading) return found;
    const read = readLot(entry, site, { only: [key] });
    const asked = 'faults' in read ? undefined : read.readings[key];
    return asked?.problem?.code === 'unknown-quantity' ? undefined : asked;
  }

  /** Every reading, grouped as it is named: `run 1: titre`. */
  private groups(): unknown {
    const groups = new Map<string, [string, string][]>();
    for (const [key, { from }] of Object.entries(this.lot?.readings ?? {})) {
      if (from !== 'formula') continue;
      const name = quantityName(key, this.texts);
      const at = name.indexOf(': ');
      const group = at < 0 ? '' : name.slice(0, at);
      groups.set(group, [...(groups.get(group) ?? []), [key, at < 0 ? name : name.slice(at + 2)]]);
    }
    const options = (entries: readonly [string, string][]): unknown =>
      entries.map(([key, name]) => html`<option value=${key} ?selected=${key === this.of}>${name}</option>`);
    return [...groups].map(([group, entries]) => (group ? html`<optgroup label=${group}>${options(entries)}</optgroup>` : options(entries)));
  }

  private opened(): unknown {
    const { texts } = this;
    const { entry, site } = this.desk;
    const shown = working(entry, site, this.of, (value, unit) => this.write(value, unit));
    const reading = this.reading(this.of);
    return html`
      <div class="sheet" tabindex="-1">
        <p class="name">${quantityName(this.of, texts)}</p>
        ${shown.formula
          ? html`<div class="formula" part="formula" tabindex="0" role="group" aria-label=${`${shown.symbol.text} = ${shown.formula.general.text}`}>
                ${mathElement({ tag: 'math', content: [{ tag: 'mrow', content: [...inside(shown.symbol.math), { tag: 'mo', content: '=' }, ...inside(shown.formula.general.math)] }] })}
              </div>
              <p class="figures" part="figures">= ${this.inMoney(shown.formula.figures.text)}</p>`
          : html`<p class="figures">${texts.working.given}: ${texts.working.givenFrom[reading?.from === 'formula' ? 'none' : (reading?.from ?? 'none')]}</p>`}
        <p class="outcome">= <b>${shown.result === undefined ? this.whyUnknown(this.of) : this.inMoney(shown.result)}</b></p>
        ${reading?.value !== undefined && reading.value.length > 10
          ? html`<details>
              <summary>${texts.working.fullValue}</summary>
              <p class="small quiet full">${this.number(reading.value)} ${this.inMoney(reading.unit)}</p>
            </details>`
          : nothing}
        ${this.budget()} ${this.sources(shown)} ${this.rests(shown)}
      </div>
    `;
  }

  /** The ± with its budget, for a figure that anything measured enters. */
  private budget(): unknown {
    const { entry, site } = this.desk;
    const known = uncertainty(entry, site, this.of);
    if (!known?.budget.length) return nothing;
    const simulation = (): unknown => html`<esterway-simulation .of=${this.of}></esterway-simulation>`;
    return html`${budgetView(known, this.inMoney(this.reading(this.of)?.unit ?? ''), this.texts, this.languageTag, (key) => (this.of = key))}
      <esterway-later .label=${this.texts.budget.simulation} .content=${simulation}></esterway-later>`;
  }

  private sources({ sources }: Working): unknown {
    const { texts } = this;
    return sources.length
      ? html`<p class="small quiet">${texts.working.source}: ${sources.map(({ title, mark }, i) => html`${i ? '; ' : ''}${title} (${texts.marks[mark]})`)}</p>`
      : nothing;
  }

  private rests({ rests }: Working): unknown {
    const { texts } = this;
    return html`
      ${rests.length
        ? html`<p class="small quiet">${texts.working.rests}</p>
            <ul class="rests small">
              ${rests.map((key) => html`<li><button class="open" type="button" @click=${() => (this.of = key)}>${quantityName(key, texts)}</button></li>`)}
            </ul>`
        : nothing}
      ${this.#trail.length > 1 ? html`<button class="action back no-print" type="button" @click=${this.onBack}>${texts.working.back}</button>` : nothing}
    `;
  }

  /** A figure with its unit in the page's language. */
  private write(value: Decimal, unit: Unit): string {
    const [figure = '', ...rest] = workingFigure(value, unit).split(' ');
    return [this.number(figure), ...rest].join(' ');
  }

  /** Brings the open working into view and puts the focus on it. */
  showOpened(): void {
    const sheet = this.shadowRoot?.querySelector<HTMLElement>('.sheet');
    sheet?.focus({ preventScroll: true });
    sheet?.scrollIntoView({ block: 'nearest' });
  }

  private onPick(event: Event): void {
    this.of = (event.target as HTMLSelectElement).value;
  }

  private onBack(): void {
    this.#trail.pop();
    this.of = this.#trail.at(-1) ?? '';
  }
}

/** What stands inside a `math` element. */
const inside = ({ content }: Working['symbol']['math']) => (typeof content === 'string' ? [] : content);

declare global {
  interface HTMLElementTagNameMap {
    'esterway-working': EsterwayWorking;
  }
}
