import { css, html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { property, state } from 'lit/decorators.js';
import { GOALS, MASS_RULES, SHARES } from '../../decision/blend/stock.js';
import type { Goal, MassRule, Share } from '../../decision/blend/stock.js';
import { isKnown } from '../../formula/reading.js';
import type { Problem } from '../../formula/reading.js';
import { kilogram, percent } from '../../formula/units.js';
import { deBlend } from '../../locales/de-blend.js';
import { enBlend } from '../../locales/en-blend.js';
import { fill } from '../../locales/fill.js';
import type { Widened } from '../../locales/en.js';
import { DEFAULT_STEP, EMPTY_STOCK, MOST_ITEMS, checkBlendStock, isEmpty, standingLimit } from '../../lot/blend-stock.js';
import type { BlendStock, ItemFigure, StockItem, StockLimits } from '../../lot/blend-stock.js';
import { blendedLot, readBlend, stockItemOf } from '../../lot/blend.js';
import type { BlendFound } from '../../lot/blend.js';
import type { Fault } from '../../lot/check.js';
import type { LotEntry, SiteProfile } from '../../lot/entry.js';
import { readFigure } from '../../lot/figure.js';
import type { Figure } from '../../lot/figure.js';
import { EsterwayUndoEvent } from '../parts/events.js';
import { fieldStyles } from '../parts/field-styles.js';
import type { FigureInputEvent } from '../parts/figure-field.js';
import type { OptionInputEvent } from '../parts/option-field.js';
import { SectionElement } from '../parts/section.js';
import { EsterwayStockChangeEvent } from './events.js';
import { blendRefused, blendResult, massText, resultStyles } from './result.js';
import type { BlendTongue } from './result.js';
import { stockStyles } from './stock-styles.js';
import { StockTable } from './stock-table.js';

const POUND: Figure = { text: '1', unit: 'lb' };
const TEXTS = { en: enBlend, de: deBlend };

/**
 * Blends what is in stock so that a sour lot keeps a limit: lots and tanks to type, the limits of the blend, and what to take of
 * each, by least cost or to use up most sour oil; what holds the blend back, or what would make one possible. The blend can be
 * made the lot.
 *
 * @element esterway-blend
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {boolean} bare - leaves the heading out
 *
 * @fires {EsterwayStockChangeEvent} esterway-stock-change - a person changed the stock; keep it and set `stock` again next time
 * @fires {EsterwayChangeEvent} esterway-change - a person made the blend the lot (only where the element holds the lot itself)
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart result - the blend, or why there is none
 * @csspart action - a button
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 */
export class EsterwayBlend extends SectionElement {
  static override styles = [
    ...SectionElement.styles,
    fieldStyles,
    stockStyles,
    resultStyles,
    css`
      .actions {
        display: flex;
        flex-wrap: wrap;
        gap: 8px;
        margin-block: 8px;
      }
      .result > * {
        margin-block-start: 6px;
      }
      .said {
        margin-block-end: 6px;
      }
      .fields {
        margin-block-start: 4px;
      }
    `,
  ];

  #stock: BlendStock = EMPTY_STOCK;
  #faults: readonly Fault[] = [];
  #read: ReturnType<typeof readBlend> | undefined;
  #readFor: readonly [BlendStock, SiteProfile, Figure] | undefined;
  /** What was removed last, to be put back. */
  @state() private removed: { readonly row: number; readonly item: StockItem } | undefined;
  /** The lot that the blend was made. */
  @state() private made: LotEntry | undefined;
  @state() private said = '';

  readonly #table = new StockTable(this, {
    items: () => this.#stock.items,
    words: () => this.words,
    tag: () => this.languageTag,
    units: () => this.columnUnits,
    money: (unit) => this.inMoney(unit),
    problemAt: (field) => this.stockProblem(field),
    change: (items) => this.put({ items }),
    remove: (row) => this.removeRow(row),
  });

  /** What is in stock, the limits of the blend and the goal: a document that a page can keep. */
  @property({ attribute: false })
  set stock(stock: BlendStock | undefined) {
    if (stock === this.#stock) return;
    const checked = checkBlendStock(stock ?? EMPTY_STOCK);
    this.#faults = 'items' in checked ? [] : checked;
    this.#stock = 'items' in checked ? checked : EMPTY_STOCK;
    this.removed = undefined;
    this.said = '';
    this.requestUpdate();
  }
  get stock(): BlendStock {
    return this.#stock;
  }

  protected override get heading(): string {
    return this.words.heading;
  }

  protected override get summary(): string {
    const { found } = this;
    if (this.#stock.items.length === 0) return '';
    return found ? fill(this.words.summary, { mass: massText(found.mass, this.tongue), ffa: this.number(Number(found.shares.freeFattyAcid).toFixed(2)) }) : this.words.none;
  }

  private get words(): Widened<typeof enBlend> {
    return this.textsOf(TEXTS);
  }

  private get columnUnits(): Readonly<Record<ItemFigure, string>> {
    const mass = this.desk.units === 'us' ? 'lb' : 'kg';
    return { mass, leastMass: mass, freeFattyAcid: '%', water: '%', insolubles: '%', cost: `¤/${mass}` };
  }

  private get standingStep(): Figure {
    return this.desk.units === 'us' ? POUND : DEFAULT_STEP;
  }

  // -- what comes of it -----------------------------------------------------

  /** Solves anew where the stock, the site or the units are others. */
  private get read(): ReturnType<typeof readBlend> {
    const { site } = this.desk;
    const { standingStep } = this;
    if (!this.#read || this.#readFor?.[0] !== this.#stock || this.#readFor[1] !== site || this.#readFor[2] !== standingStep) {
      this.#read = readBlend(this.#stock, site, standingStep);
      this.#readFor = [this.#stock, site, standingStep];
    }
    return this.#read;
  }

  private get found(): BlendFound | undefined {
    const { read } = this;
    return 'parts' in read ? read : undefined;
  }

  private get problems(): readonly Problem[] {
    const { read } = this;
    return 'problems' in read ? read.problems : [];
  }

  private get tongue(): BlendTongue {
    const { limits, items } = this.#stock;
    const { words } = this;
    const inForce: Partial<Record<Share | 'mass', string>> = {};
    for (const key of [...SHARES, 'mass'] as const) {
      const given = limits[key] ?? (key === 'freeFattyAcid' ? standingLimit(this.desk.site) : undefined);
      const value = given && readFigure(given, key === 'mass' ? kilogram : percent, key);
      if (given && value && isKnown(value)) inForce[key] = 'text' in given && value.eq(given.text) ? given.text : value.toString();
    }
    return {
      words, tag: this.languageTag, us: this.desk.units === 'us', currency: this.desk.site.currency, limits: inForce, rule: limits.massRule ?? 'at-least',
      lot: (item) => items[item]?.name || `${words.row} ${item + 1}`,
    };
  }

  private stockProblem(field: string): string | undefined {
    const problem = this.problems.find(({ quantity }) => quantity === field);
    if (!problem) return undefined;
    const own = (this.words.problems as Readonly<Record<string, string>>)[problem.code];
    const column = field.split('.').at(-1) as ItemFigure;
    return own ? fill(own, { field: this.words.columns[column] }) : this.problemText(problem);
  }

  // -- the page -------------------------------------------------------------

  protected override body(): unknown {
    const { words, read } = this;
    if (this.#faults.length) return this.unreadable();
    return html`
      ${this.#table.render()}
      <div class="actions no-print">
        <button class="action" part="action" type="button" ?disabled=${this.#stock.items.length >= MOST_ITEMS} @click=${this.addBench}>${words.fromBench}</button>
        ${this.removed ? html`<button class="action" part="action" type="button" @click=${this.putBack}>${words.putBack}</button>` : nothing}
      </div>
      <p class="note said no-print" role="status">${this.said}</p>
      <h3>${words.limits}</h3>
      <div class="fields">
        ${SHARES.map((share) => this.limitField(share, ['%', 'mg/kg'], share === 'freeFattyAcid' ? words.direct : words.noLimit))}
        ${this.limitField('mass', this.desk.units === 'us' ? ['lb', 'kg', 't'] : ['kg', 't', 'lb'], words.noLimit)}
        ${this.#stock.limits.mass ? this.choice(words.massRule, MASS_RULES, words.massRules, this.#stock.limits.massRule ?? 'at-least', (massRule: MassRule) => this.put({ limits: { ...this.#stock.limits, massRule } })) : nothing}
        ${this.limitField('step', this.desk.units === 'us' ? ['lb', 'kg', 'g'] : ['kg', 'g', 'lb'])}
        ${this.choice(words.goal, GOALS, words.goals, this.#stock.goal, (goal: Goal) => this.put({ goal }), this.#stock.goal === 'use-sour' ? words.sourIs : words.priceNote)}
      </div>
      <div class="result" part="result">
        <h3>${words.result}</h3>
        ${this.leftOut()}
        ${this.#stock.items.every(isEmpty)
          ? html`<p class="quiet">${words.empty}</p>`
          : 'parts' in read ? html`${blendResult(read, this.tongue)} ${this.use(read)}` : 'refused' in read ? blendRefused(read, this.tongue) : html`<p class="quiet">${words.putRight}</p>`}
      </div>
    `;
  }

  private unreadable(): TemplateResult {
    const sentences: Readonly<Record<string, string>> = this.texts.faults;
    return html`<div class="gate fault" role="alert">
      <b>${this.words.unreadable}</b>
      ${this.#faults.map(({ code, path, found = '' }) => html`<p>${fill(sentences[code] ?? code, { path, found })}</p>`)}
    </div>`;
  }

  private limitField(key: Share | 'mass' | 'step', units: readonly string[], note?: string): TemplateResult {
    return html`<esterway-figure
      exportparts="line: field-line, input: field-input, problem"
      .label=${this.words.limit[key]}
      .figure=${this.#stock.limits[key]}
      .standing=${key === 'freeFattyAcid' ? standingLimit(this.desk.site) : key === 'step' ? this.standingStep : undefined}
      .units=${units}
      .problem=${this.stockProblem(`limits.${key}`)}
      .note=${this.#stock.limits[key] ? undefined : note}
      @figure-input=${({ figure }: FigureInputEvent) => this.putLimit(key, figure)}
    ></esterway-figure>`;
  }

  private choice<Word extends string>(label: string, all: readonly Word[], words: Readonly<Record<Word, string>>, value: Word, choose: (word: Word) => void, note?: string): TemplateResult {
    return html`<esterway-option
      class=${note === undefined ? '' : 'wide'}
      exportparts="line: field-line, input: field-input"
      .label=${label}
      .options=${all.map((word) => [word, words[word]])}
      .value=${value}
      .note=${note}
      @option-input=${({ option }: OptionInputEvent) => choose(option as Word)}
    ></esterway-option>`;
  }

  private leftOut(): TemplateResult | typeof nothing {
    const rows = [...new Set(this.problems.flatMap(({ quantity }) => /^items\.(\d+)\./.exec(quantity)?.[1] ?? []))].map(Number);
    return rows.length ? html`<p class="small quiet">${fill(this.words.leftOut, { rows: rows.map((row) => this.tongue.lot(row)).join(', ') })}</p>` : nothing;
  }

  private use(found: BlendFound): TemplateResult {
    const { words } = this;
    const stands = this.made !== undefined && this.desk.entry === this.made;
    return html`
      <div class="actions no-print">
        <button class="action main" part="action" type="button" @click=${() => this.makeLot(found)}>${words.use}</button>
        ${stands ? html`<button class="action" part="action" type="button" @click=${this.undo}>${words.undo}</button>` : nothing}
      </div>
      <p class="note no-print" role="status">${stands ? words.used : ''}</p>
    `;
  }

  // -- what a person does ---------------------------------------------------

  private put(change: Partial<BlendStock>): void {
    this.#stock = { ...this.#stock, ...change };
    this.said = '';
    this.requestUpdate();
    this.dispatchEvent(new EsterwayStockChangeEvent(this.#stock));
  }

  private putLimit(key: keyof StockLimits, figure: Figure | undefined): void {
    const { [key]: _, ...limits } = this.#stock.limits;
    this.put({ limits: figure ? { ...limits, [key]: figure } : limits });
  }

  private addBench(): void {
    const item = stockItemOf(this.desk.entry, this.desk.site);
    if (!isEmpty(item)) this.put({ items: [...this.#stock.items, item] });
    if (!item.mass || !item.freeFattyAcid) this.said = this.words.benchEmpty;
  }

  private removeRow(row: number): void {
    const item = this.#stock.items[row];
    if (!item) return;
    this.put({ items: this.#stock.items.filter((_, other) => other !== row) });
    this.removed = { row, item };
    this.said = fill(this.words.removed, { row: String(row + 1) });
  }

  private putBack(): void {
    const { removed } = this;
    if (!removed) return;
    this.removed = undefined;
    const { items } = this.#stock;
    this.put({ items: [...items.slice(0, removed.row), removed.item, ...items.slice(removed.row)] });
  }

  private makeLot(found: BlendFound): void {
    this.made = blendedLot(found, this.desk.entry);
    this.edit({ kind: 'replace', entry: this.made });
  }

  private undo(): void {
    this.dispatchEvent(new EsterwayUndoEvent());
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-blend': EsterwayBlend;
  }
}
