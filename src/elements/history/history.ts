import { css, html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { property, state } from 'lit/decorators.js';
import { shownText } from '../../formula/digits.js';
import { Decimal } from '../../formula/decimal.js';
import { deHistory } from '../../locales/de-history.js';
import { enHistory } from '../../locales/en-history.js';
import type { Widened } from '../../locales/en.js';
import { fill } from '../../locales/fill.js';
import { FEWEST_LOTS, HISTORY_FIGURES, expectedOf, sourceHistory } from '../../lot/history.js';
import type { HistoryFigure, HistoryPoint, SourceHistory } from '../../lot/history.js';
import type { OptionInputEvent } from '../parts/option-field.js';
import { plotStyles } from '../parts/plot.js';
import { SectionElement } from '../parts/section.js';
import { historyCharts } from './chart.js';

const TEXTS = { en: enHistory, de: deHistory };
const DIGITS = { bands: [{ below: '10', decimals: 2 }, { decimals: 1 }] } as const;

/**
 * The lots of a source over time: a chart of individuals and moving range with the lots that signal, in words too, and the acid
 * value to plan the next titration with.
 *
 * @element esterway-history
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {boolean} bare - leaves the heading out
 *
 * @fires {EsterwayChangeEvent} esterway-change - a person took the expected acid value over (only where the element holds the lot itself)
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart action - a button
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 */
export class EsterwayHistory extends SectionElement {
  static override styles = [
    ...SectionElement.styles,
    plotStyles,
    css`
      p,
      li {
        margin-block: 5px;
      }
      table {
        inline-size: 100%;
        border-collapse: collapse;
        font-variant-numeric: tabular-nums;
      }
      th,
      td {
        padding: 3px 0 3px 6px;
        padding-inline: 6px 0;
        border-block-end: 1px solid var(--_faint);
        text-align: end;
        font-weight: 400;
        overflow-wrap: anywhere;
      }
      th:first-child,
      td:first-child {
        padding-inline: 0;
        text-align: start;
      }
      .plot .lot {
        fill: var(--_ink);
      }
      .plot .out {
        fill: var(--_paper);
        stroke: var(--_pink);
        stroke-width: 2;
      }
      @media (forced-colors: active) {
        .plot .lot {
          fill: CanvasText;
        }
        .plot .out {
          fill: Canvas;
          stroke: Highlight;
        }
      }
    `,
  ];

  /** The lots of the source, in any order, as the intake book gives them. */
  @property({ attribute: false }) points: readonly HistoryPoint[] = [];
  /** Whose they are. */
  @property() source = '';

  @state() private shown: HistoryFigure = 'freeFattyAcid';
  #read: { readonly of: unknown; readonly figure: HistoryFigure; readonly is: SourceHistory } | undefined;

  private get words(): Widened<typeof enHistory> {
    return this.textsOf(TEXTS);
  }

  protected override get heading(): string {
    return fill(this.words.title, { source: this.source || this.words.noSource });
  }

  private get history(): SourceHistory {
    if (this.#read?.of !== this.points || this.#read.figure !== this.shown) this.#read = { of: this.points, figure: this.shown, is: sourceHistory(this.points, this.shown) };
    return this.#read.is;
  }

  protected override body(): unknown {
    const { words, history, shown } = this;
    if (!this.points.length) return html`<p class="quiet">${words.empty}</p>`;
    const { points, without, undated } = history;
    return html`
      ${this.bare ? html`<h3>${this.heading}</h3>` : nothing}
      <div class="fields no-print">
        <esterway-option
          exportparts="line: field-line, input: field-input" .label=${words.figure} .options=${HISTORY_FIGURES.map((figure) => [figure, words.figures[figure]] as const)} .value=${shown}
          @option-input=${({ option }: OptionInputEvent) => (this.shown = option as HistoryFigure)}
        ></esterway-option>
      </div>
      ${historyCharts(history, { label: this.label, write: (value) => this.number(String(value)) }, { label: this.rangeLabel, write: (value) => this.number(String(value)) })}
      ${this.sentences()}
      ${without ? html`<p class="quiet small">${fill(words.without, { lots: String(without) })}</p>` : nothing}
      ${undated ? html`<p class="quiet small">${fill(words.undated, { lots: String(undated) })}</p>` : nothing}
      ${this.expected()}
      ${points.length
        ? html`<details>
            <summary>${words.table}</summary>
            <table>
              <thead><tr>${Object.values(words.heads).map((head, i) => html`<th scope="col">${head}${i > 1 ? `, ${words.units[shown]}` : ''}</th>`)}</tr></thead>
              <tbody>${points.map((point) => html`<tr><td>${this.dateWords(point.date)}</td><td>${point.name ?? ''}</td><td>${this.figureText(point.value)}</td><td>${point.range === undefined ? '–' : this.figureText(point.range)}</td></tr>`)}</tbody>
            </table>
          </details>`
        : nothing}
      <p class="quiet small">${words.method}</p>
    `;
  }

  private get figures(): Readonly<Record<string, string>> {
    const { limits, points } = this.history;
    const text = (value: string | undefined): string => (value === undefined ? '' : this.figureText(value));
    return { lots: String(points.length), unit: this.words.units[this.shown], centre: text(limits?.centre), lower: text(limits?.lower), upper: text(limits?.upper) };
  }

  private get label(): string {
    return fill(this.history.limits ? this.words.plot : this.words.plotFew, this.figures);
  }

  private get rangeLabel(): string {
    const { limits } = this.history;
    return limits ? fill(this.words.rangePlot, { mean: this.figureText(limits.meanRange), upper: this.figureText(limits.rangeUpper), unit: this.words.units[this.shown] }) : '';
  }

  private sentences(): unknown {
    const { words, history, shown } = this;
    const { points, limits, signals } = history;
    const [only] = points;
    if (!only) return nothing;
    if (!limits) {
      const one = points.length === 1 ? fill(words.one, { value: this.figureText(only.value), unit: words.units[shown], date: this.dateWords(only.date) }) : '';
      return html`<p>${one} ${fill(words.few, { lots: String(points.length), fewest: String(FEWEST_LOTS) })}</p>`;
    }
    const day = (place: number): string => this.dateWords(points[place]?.date ?? '');
    return html`
      <p>${fill(words.centre, this.figures)}</p>
      <div role="status">
        ${signals.length
          ? html`<ul class="gate">${signals.map(({ rule, direction, from, to }) => html`<li>${fill(words.rules[rule][direction], { from: day(from), to: day(to) })}</li>`)}</ul><p>${words.ask}</p>`
          : html`<p>${words.steady}</p>`}
      </div>
    `;
  }

  private expected(): TemplateResult | typeof nothing {
    const { words } = this;
    const found = expectedOf(this.points);
    if (!found) return nothing;
    const value = this.number(found.acidValue);
    const taken = this.desk.entry.figures['expectedAcidValue'];
    const stands = taken && 'text' in taken && taken.text === found.acidValue && taken.unit === 'mg/g';
    return html`
      <p>${fill(words.expected, { value, lots: String(found.lots) })}</p>
      <button class="action no-print" part="action" type="button" ?disabled=${stands} @click=${() => this.plan(found.acidValue)}>${fill(words.plan, { value })}</button>
      <p class="quiet small" role="status">${stands ? fill(words.planned, { value }) : ''}</p>
    `;
  }

  private plan(acidValue: string): void {
    this.edit({ kind: 'figure', key: 'expectedAcidValue', figure: { text: acidValue, unit: 'mg/g' } });
  }

  private figureText(value: string): string {
    return this.number(shownText(new Decimal(value), DIGITS));
  }

  private dateWords(date: string): string {
    const time = Date.parse(`${date.slice(0, 10)}T00:00:00Z`);
    return Number.isNaN(time) ? date || this.words.noDate : new Intl.DateTimeFormat(this.languageTag, { day: 'numeric', month: 'short', year: 'numeric', timeZone: 'UTC' }).format(time);
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-history': EsterwayHistory;
  }
}
