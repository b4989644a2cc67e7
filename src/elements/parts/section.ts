import { html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { property } from 'lit/decorators.js';
import type { RouteName } from '../../chemistry/route-name.js';
import { chargedRoute } from '../../decision/route.js';
import { amountIn } from '../../exchange/amount.js';
import { showNumber } from '../../exchange/number-format.js';
import { Decimal } from '../../formula/decimal.js';
import type { Problem } from '../../formula/reading.js';
import { fill } from '../../locales/fill.js';
import { fieldLabel, fieldName } from '../../locales/quantity-name.js';
import { DEFAULT_FIGURES, DEFAULT_OPTIONS } from '../../lot/defaults.js';
import type { Figure } from '../../lot/figure.js';
import type { Notice } from '../../lot/lot-reading.js';
import { LotElement } from './base.js';
import { EsterwayEditEvent, EsterwayOpenEvent } from './events.js';
import { faultsBox } from './faults.js';
import type { FigureInputEvent } from './figure-field.js';
import { groupsFields } from './focus-order.js';
import type { OptionInputEvent } from './option-field.js';
import { sectionStyles } from './section-styles.js';
import { boxes, buttons, tokens } from './styles.js';

/** A section of the panel: a heading that folds it to one line, and what all sections write in the same way. */
export abstract class SectionElement extends LotElement {
  static override styles = [tokens, buttons, boxes, sectionStyles];

  /** Folded to its heading and a one-line summary. */
  @property({ type: Boolean, reflect: true }) folded = false;

  /** Without heading, inside another section. */
  @property({ type: Boolean, reflect: true }) bare = false;

  constructor() {
    super();
    groupsFields(this);
  }

  /** The heading's words. */
  protected abstract get heading(): string;
  /** What the section knows, on one line; nothing where it says no more than its heading. */
  protected get summary(): string {
    return '';
  }

  /** What is folded away. */
  protected abstract body(): unknown;

  protected override render(): unknown {
    // a document that cannot be read is for the section around it to say
    if (this.bare) return this.lot ? html`<div part="body">${this.body()}</div>` : nothing;
    const { reading } = this.desk;
    const faults = 'faults' in reading ? reading : undefined;
    return html`
      <div class="section" part="section" role="group" aria-labelledby="heading">
        <h2>
          <button class="fold" part="heading" type="button" aria-expanded=${this.folded ? 'false' : 'true'} aria-controls="body" @click=${this.onFold}>
            <span class="mark" aria-hidden="true">▾</span><b id="heading">${this.heading}</b>
            <span class="summary">${faults ? '' : this.summary}</span>
          </button>
        </h2>
        <div class="body" id="body" part="body" ?hidden=${this.folded}>${faults ? faultsBox(faults, this.texts) : this.body()}</div>
      </div>
    `;
  }

  private onFold(): void {
    this.folded = !this.folded;
  }

  // -- fields ---------------------------------------------------------------

  /** A field for a figure of the lot. */
  protected figureField(key: string, units: readonly string[], label = this.fieldLabel(key)): TemplateResult {
    const { entry } = this.desk;
    return html`<esterway-figure
      exportparts="line: field-line, input: field-input, problem"
      .label=${label}
      .figure=${entry.figures[key]}
      .standing=${this.standing(key)}
      .units=${units}
      .money=${this.desk.site.currency ?? ''}
      .problem=${this.problemAt(key)}
      @figure-input=${(event: FigureInputEvent) => this.edit({ kind: 'figure', key, figure: event.figure })}
    ></esterway-figure>`;
  }

  /** A field for an option of the lot. */
  protected optionField(key: string, wide = false): TemplateResult {
    return this.choiceField(key, this.option(key), wide, this.problemAt(key), (option) => this.edit({ kind: 'option', key, option }));
  }

  protected choiceField(key: string, option: string, wide: boolean, problem: string | undefined, choose: (option: string) => void): TemplateResult {
    return html`<esterway-option
      class=${wide ? 'wide' : ''}
      exportparts="line: field-line, input: field-input"
      .label=${(this.texts.choices as Readonly<Record<string, string>>)[key] ?? key}
      .options=${this.optionWords(key)}
      .value=${option}
      .problem=${problem}
      @option-input=${(event: OptionInputEvent) => choose(event.option)}
    ></esterway-option>`;
  }

  protected editSite(edit: ConstructorParameters<typeof EsterwayEditEvent>[0]): void {
    this.dispatchEvent(new EsterwayEditEvent(edit, true));
  }

  protected fieldLabel(key: string): string {
    return fieldLabel(key, this.texts);
  }

  protected optionWords(key: string): readonly (readonly [string, string])[] {
    const all = this.texts.options as Readonly<Record<string, Readonly<Record<string, string>>>>;
    return Object.entries(all[key] ?? all[key.replace('retest.', '')] ?? {});
  }

  /** The option in force: the lot's, else the site's, else the usual one. */
  protected option(key: string): string {
    const { entry, site } = this.desk;
    return entry.options[key] ?? site.options[key] ?? DEFAULT_OPTIONS[key] ?? '';
  }

  /** The words of an option, of the one in force when none is named. */
  protected optionText(key: string, option = this.option(key)): string {
    return this.optionWords(key).find(([value]) => value === option)?.[1] ?? option;
  }

  /** What stands while the lot does not say: the site's figure, else the usual one. */
  protected standing(key: string): Figure | undefined {
    return this.desk.site.figures[key] ?? DEFAULT_FIGURES[key];
  }

  /** The route that the lot is charged by, unless a person looks at the other. */
  protected get recommended(): RouteName {
    const route = this.lot?.route;
    return route ? chargedRoute(route) : 'direct';
  }

  // -- sentences ------------------------------------------------------------

  /** The problem that stands at a field, as a sentence. */
  protected problemAt(field: string): string | undefined {
    const problem = this.lot?.problems.find(({ quantity }) => quantity === field);
    return problem && this.problemText(problem);
  }

  protected problemText({ code, params }: Problem): string {
    const sentences = this.texts.problems as Readonly<Record<string, string>>;
    const bound = params?.['bound'];
    return fill(sentences[code] ?? this.texts.problems.other, {
      code, ...params, ...(bound !== undefined && { bound: this.number(roundText(bound)) }),
    });
  }

  /** The remarks that stand at some of the fields, as boxes. */
  protected noticesAt(at: (field: string) => boolean): readonly TemplateResult[] {
    const said = this.lot?.notices.filter(({ code, quantity }) => at(quantity) && !IN_PASSING.includes(code)) ?? [];
    return said.map((notice) => html`<p class="gate">${this.noticeText(notice)}</p>`);
  }

  protected noticeText({ code, params = {} }: Notice): string {
    const words = Object.entries(params).map(([name, value]) => [name, /^-?[\d.]+$/.test(value) ? this.number(roundText(value)) : value]);
    return fill(this.texts.notices[code], Object.fromEntries(words) as Record<string, string>);
  }

  /** The expanded uncertainty of a result, `± 0.4 mg/g`; undefined while it is not known. */
  protected plusMinus(key: string): string | undefined {
    const shown = this.lot?.uncertainties[key]?.shown;
    const unit = this.reading(key)?.unit;
    return shown === undefined ? undefined : fill(this.texts.result.plusMinus, { expanded: `${this.number(shown)}\u00a0${this.inMoney(unit ?? '')}`.trim() });
  }

  /** Why a figure is not known, as a sentence. */
  protected whyUnknown(key: string): string {
    const reading = this.reading(key);
    const { result } = this.texts;
    if (reading?.problem) return fill(result.blocked, { field: this.fieldLabelIn(reading.problem.quantity) });
    if (reading?.missing?.length) return fill(result.needs, { fields: this.fieldList(reading.missing) });
    return result.notKnown;
  }

  /** Fields in words, in the order they are typed, the run named once: `run 1: sample, start, end`. */
  private fieldList(fields: readonly string[]): string {
    const order = (field: string): number => ['sample', 'start', 'end'].indexOf(field.split('.').at(-1) ?? '');
    const names = [...fields].sort((a, b) => order(a) - order(b)).map((field) => this.fieldLabelIn(field));
    const group = (name: string | undefined): string => name?.match(/^.*: /)?.[0] ?? '';
    return names.map((name, i) => (group(name) && group(name) === group(names[i - 1]) ? name.slice(group(name).length) : name)).join(', ');
  }

  private fieldLabelIn(field: string): string {
    return fieldName(field, this.texts);
  }

  /** Canonical decimal text in the page's language. */
  protected number(text: string): string {
    return showNumber(text, this.languageTag);
  }

  // -- figures --------------------------------------------------------------

  /** A known amount as plain words, e.g. `172.8 kg`; undefined while it is not known. */
  protected amountWords(key: string): string | undefined {
    const reading = this.reading(key);
    if (reading?.value === undefined || reading.shown === undefined) return undefined;
    const { text, unit } = amountIn(reading.value, reading.shown, reading.unit, this.desk.units);
    return unit ? `${this.number(text)}\u00a0${this.inMoney(unit)}` : this.number(text);
  }

  /** Whether an amount is known and more than nothing. */
  protected aboveZero(key: string): boolean {
    return Number(this.reading(key)?.value ?? 0) > 0;
  }

  /** A figure that opens its working when pressed; a dash with the reason while it is not known. */
  protected figure(key: string, withUnit = true): TemplateResult {
    const reading = this.reading(key);
    if (reading?.value === undefined || reading.shown === undefined) {
      return html`<span class="figure quiet" title=${this.whyUnknown(key)}>–<span class="unseen">${this.whyUnknown(key)}</span></span>`;
    }
    const { text, unit } = amountIn(reading.value, reading.shown, reading.unit, this.desk.units);
    return html`<button class="open figure" part="figure" type="button" title=${this.texts.result.openWorking} @click=${() => this.open(key)}>${this.number(text)}${unit && withUnit ? html` <span class="unit">${this.inMoney(unit)}</span>` : nothing}</button>`;
  }

  protected open(key: string): void {
    this.dispatchEvent(new EsterwayOpenEvent(key));
  }
}

/** Remarks that a section makes in the line under its result. */
const IN_PASSING: readonly string[] = ['one-run', 'run-incomplete', 'target-not-reached'];

/** Bounds can be results with 34 digits; a sentence needs four. */
const roundText = (text: string): string => new Decimal(text).toSignificantDigits(4).toString();
