import { html, nothing } from 'lit';
import type { ReactiveController, ReactiveControllerHost, TemplateResult } from 'lit';
import { live } from 'lit/directives/live.js';
import { decimalMark, showNumber } from '../../exchange/number-format.js';
import { readNumber } from '../../exchange/number-text.js';
import { Decimal } from '../../formula/decimal.js';
import { isKnown } from '../../formula/reading.js';
import { TYPED_UNITS } from '../../formula/units.js';
import { fill } from '../../locales/fill.js';
import type { Widened } from '../../locales/en.js';
import type { enBlend } from '../../locales/en-blend.js';
import { ITEM_FIGURES, MOST_ITEMS, isEmpty } from '../../lot/blend-stock.js';
import type { ItemFigure, StockItem } from '../../lot/blend-stock.js';
import { readFigure } from '../../lot/figure.js';
import type { Figure } from '../../lot/figure.js';
import { FigureField, readFigureText } from '../parts/figure-field.js';
import type { FigureInputEvent, FigurePasteEvent } from '../parts/figure-field.js';
import { moveFocus } from '../parts/focus-order.js';

/** What the table needs of the section around it. */
export interface StockTableHost {
  items(): readonly StockItem[];
  words(): Widened<typeof enBlend>;
  tag(): string;
  /** The unit of each column. */
  units(): Readonly<Record<ItemFigure, string>>;
  /** A unit with the name of the site's money put in. */
  money(unit: string): string;
  problemAt(field: string): string | undefined;
  change(items: readonly StockItem[]): void;
  remove(row: number): void;
}

const COLUMNS = ['name', ...ITEM_FIGURES] as const;
type Column = (typeof COLUMNS)[number];

/** The stock as a small sheet: Enter goes on, the arrows change the row, rows can be pasted. Narrow, a row takes three lines. */
export class StockTable implements ReactiveController {
  readonly #host: ReactiveControllerHost & HTMLElement;
  readonly #section: StockTableHost;
  /** Which row's removal is open. */
  #open: number | undefined;
  /** The cell being typed in, `0.mass`: what is wrong with it is said when it is left. */
  #typing = '';

  constructor(host: ReactiveControllerHost & HTMLElement, section: StockTableHost) {
    this.#host = host;
    this.#section = section;
    host.addController(this);
  }

  hostDisconnected(): void {
    this.#open = undefined;
  }

  render(): TemplateResult {
    const { columns, row, stock, hint } = this.#section.words();
    const items = this.#section.items();
    const units = this.#section.units();
    // one empty row at the end to type the next lot in
    const rows = items.length < MOST_ITEMS ? [...items, {}] : items;
    const label = (key: ItemFigure): TemplateResult => html`${columns[key]} <span class="unit">${this.#section.money(units[key])}</span>`;
    return html`
      <table class="stock" @keydown=${{ handleEvent: (event: KeyboardEvent) => this.#onKeydown(event, rows), capture: true }} @focusout=${this.#onLeave}>
        <caption class="unseen">
          ${stock}
        </caption>
        <thead>
          <tr>
            <th scope="col"><span class="unseen">${row}</span></th>
            <th scope="col">${columns.name}</th>
            ${ITEM_FIGURES.map((key) => html`<th scope="col">${label(key)}</th>`)}
          </tr>
        </thead>
        <tbody>
          ${rows.map((item, index) => this.#row(item, index))}
        </tbody>
      </table>
      <p class="note no-print">${fill(hint, { columns: COLUMNS.map((column) => columns[column]).join(', ') })}</p>
    `;
  }

  #row(item: StockItem, index: number): TemplateResult {
    const { cell, columns, open, remove } = this.#section.words();
    const units = this.#section.units();
    const row = String(index + 1);
    const left = ITEM_FIGURES.filter((key) => `${index}.${key}` !== this.#typing);
    // what is only missing is not said while the row is being typed
    const typingHere = this.#typing.startsWith(`${index}.`);
    const problems = typingHere && !left.some((key) => item[key] && 'doubt' in item[key]) ? [] : left.flatMap((key) => this.#section.problemAt(`items.${index}.${key}`) ?? []);
    const opened = this.#open === index;
    return html`
      <tr class="item">
        <td>
          ${isEmpty(item)
            ? html`<span class="number">${row}</span>`
            : html`<button class="open-row" type="button" aria-expanded=${opened ? 'true' : 'false'} aria-label=${fill(open, { row })} @click=${() => this.#toggle(index)}>${row}</button>`}
        </td>
        <td>
          <div class="line">
            <input
              class="words"
              data-field
              data-row=${index}
              data-cell="name"
              type="text"
              autocomplete="off"
              aria-label=${fill(cell, { row, column: columns.name })}
              placeholder=${columns.name}
              .value=${live(item.name ?? '')}
              @input=${(event: InputEvent) => this.#name(index, (event.target as HTMLInputElement).value)}
              @paste=${(event: ClipboardEvent) => this.#onNamePaste(event, index)}
            />
          </div>
        </td>
        ${ITEM_FIGURES.map(
          (key) => html`<td data-label=${`${columns[key]} ${this.#section.money(units[key])}`}>
            <esterway-figure
              cell
              exportparts="line: field-line, input: field-input"
              data-row=${index}
              data-cell=${key}
              .label=${fill(cell, { row, column: columns[key] })}
              .figure=${inUnit(item[key], units[key])}
              .units=${[units[key]]}
              .problem=${item[key] && this.#section.problemAt(`items.${index}.${key}`)}
              @figure-input=${({ figure }: FigureInputEvent) => this.#figure(index, key, figure)}
              @figure-paste=${(event: FigurePasteEvent) => this.#onPaste(event, index, key)}
            ></esterway-figure>
          </td>`,
        )}
      </tr>
      ${problems.length || opened
        ? html`<tr class="saying">
            <td class="said" colspan="8">
              ${[...new Set(problems)].map((text) => html`<p class="problem">${text}</p>`)} ${left.map((key) => this.#meanings(index, key, item[key]))}
              ${opened ? html`<button class="action no-print" part="action" type="button" @click=${() => this.#remove(index)}>${remove}</button>` : nothing}
            </td>
          </tr>`
        : nothing}
    `;
  }

  /** For a figure that could mean two things: both, to choose from. */
  #meanings(index: number, key: ItemFigure, figure: Figure | undefined): unknown {
    if (!figure || !('doubt' in figure)) return nothing;
    const tag = this.#section.tag();
    const read = readNumber(figure.typed, decimalMark(tag));
    if (!('doubt' in read) || !read.readings) return nothing;
    return read.readings.map(
      (text) => html`<button class="action no-print" part="action" type="button" @click=${() => this.#put([[index, { [key]: { text, unit: figure.unit } }]])}>${showNumber(text, tag)}</button> `,
    );
  }

  #toggle(index: number): void {
    this.#open = this.#open === index ? undefined : index;
    this.#host.requestUpdate();
  }

  #remove(index: number): void {
    this.#open = undefined;
    this.#section.remove(index);
  }

  #name(index: number, name: string): void {
    this.#typing = `${index}.name`;
    this.#put([[index, { name }]]);
  }

  #figure(index: number, key: ItemFigure, figure: Figure | undefined): void {
    this.#typing = `${index}.${key}`;
    this.#put([[index, { [key]: figure }]]);
  }

  /** Puts parts into rows; what is emptied goes, and so do empty rows at the end. */
  #put(changes: readonly (readonly [row: number, parts: Readonly<Record<string, Figure | string | undefined>>])[]): void {
    const items: StockItem[] = [...this.#section.items()];
    for (const [row, parts] of changes) {
      while (items.length <= row) items.push({});
      items[row] = Object.fromEntries(Object.entries({ ...items[row], ...parts }).filter(([, part]) => part));
    }
    while (items.length && isEmpty(items.at(-1) ?? {})) items.pop();
    this.#section.change(items);
  }

  readonly #onLeave = (event: FocusEvent): void => {
    const to = event.relatedTarget;
    const row = to instanceof HTMLElement ? to.dataset['row'] : undefined;
    // from cell to cell of a row it is still being typed
    if (!this.#typing || (row !== undefined && this.#typing.startsWith(`${row}.`))) return;
    this.#typing = '';
    this.#host.requestUpdate();
  };

  #onNamePaste(event: ClipboardEvent, index: number): void {
    const text = event.clipboardData?.getData('text/plain') ?? '';
    if (!/[\t\n]/.test(text.trim())) return;
    event.preventDefault();
    this.#paste(text.replace(/\r\n?/g, '\n').replace(/\n+$/, '').split('\n').map((line) => line.split('\t')), index, 'name');
  }

  #onPaste(event: FigurePasteEvent, index: number, key: ItemFigure): void {
    event.preventDefault();
    this.#paste(event.rows, index, key);
  }

  #paste(rows: readonly (readonly string[])[], index: number, column: Column): void {
    const mark = decimalMark(this.#section.tag());
    const units = this.#section.units();
    const first = COLUMNS.indexOf(column);
    // a heading has no figure in it
    const data = column === 'name' && rows.length > 1 && !rows[0]?.slice(1).some((cell) => /\d/.test(cell)) ? rows.slice(1) : rows;
    this.#typing = '';
    this.#put(
      data.slice(0, MOST_ITEMS - index).map((row, down) => [
        index + down,
        Object.fromEntries(
          row.flatMap((typed, right) => {
            const into = COLUMNS[first + right];
            return into ? [[into, into === 'name' ? typed.trim() : readFigureText(typed, mark, units[into])]] : [];
          }),
        ) as Readonly<Record<string, Figure | string | undefined>>,
      ]),
    );
  }

  #onKeydown(event: KeyboardEvent, rows: readonly StockItem[]): void {
    const field = event.target;
    if (!(field instanceof HTMLElement) || field.dataset['cell'] === undefined || event.isComposing) return;
    const row = Number(field.dataset['row']);
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      const next = this.#cell(row + (event.key === 'ArrowDown' ? 1 : -1), field.dataset['cell']);
      if (!next) return;
      event.preventDefault();
      next.focus();
    } else if (event.key === 'Enter' && !event.shiftKey && row === rows.length - 1 && isEmpty(rows[row] ?? {})) {
      // the empty row at the end: the stock is told
      event.preventDefault();
      event.stopPropagation();
      const last = this.#cell(row, 'leastMass');
      if (last instanceof FigureField) last.leave(1);
    } else if (event.key === 'Enter' && field.dataset['cell'] === 'name') {
      event.preventDefault();
      moveFocus(field, event.shiftKey ? -1 : 1);
    }
  }

  #cell(row: number, cell: string): HTMLElement | null {
    return this.#host.shadowRoot?.querySelector<HTMLElement>(`[data-row='${row}'][data-cell='${cell}']`) ?? null;
  }
}

/** A figure in the unit of its column, as text that can be typed over; one that cannot be read stays as it is. */
function inUnit(figure: Figure | undefined, symbol: string): Figure | undefined {
  const unit = TYPED_UNITS.get(symbol);
  if (!figure || 'doubt' in figure || figure.unit === symbol || !unit) return figure;
  const value = readFigure(figure, unit, '');
  return isKnown(value) ? { text: new Decimal(value).toSignificantDigits(12).toString(), unit: symbol } : figure;
}
