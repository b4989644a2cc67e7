import { css, html, nothing } from 'lit';
import type { PropertyValues } from 'lit';
import { property, query, state } from 'lit/decorators.js';
import { decimalMark, fieldText, showNumber } from '../../exchange/number-format.js';
import { readNumber } from '../../exchange/number-text.js';
import type { Figure } from '../../lot/figure.js';
import type { Texts } from '../../locales/en.js';
import { fieldStyles } from './field-styles.js';
import { moveFocus } from './focus-order.js';
import { GuestElement } from './guest.js';
import { LanguageController } from './language.js';
import { inMoney } from './money.js';
import { tokens } from './styles.js';

/** A person typed in a figure field; the figure is undefined when the field was emptied. */
export class FigureInputEvent extends Event {
  static readonly type = 'figure-input';
  constructor(readonly figure: Figure | undefined) {
    super(FigureInputEvent.type);
  }
}

/** Text with tabs or line breaks was pasted into a figure field, as from a sheet. */
export class FigurePasteEvent extends Event {
  static readonly type = 'figure-paste';
  constructor(readonly rows: readonly (readonly string[])[]) {
    super(FigurePasteEvent.type, { cancelable: true });
  }
}

/**
 * A figure with its unit, typed as text. Point and comma are both understood; a figure that could
 * mean two things is asked about. What was typed is never deleted.
 */
export class FigureField extends GuestElement {
  static override styles = [
    tokens,
    fieldStyles,
    css`
      :host([cell]) input {
        padding: 0;
        font-size: 1em;
      }
    `,
  ];

  /** Says what the figure is. */
  @property({ attribute: false }) label = '';
  @property({ attribute: false }) figure: Figure | undefined;
  /** What holds while the field is empty: a site value. */
  @property({ attribute: false }) standing: Figure | undefined;
  /** Symbols of the units offered; the first one stands until another is chosen. */
  @property({ attribute: false }) units: readonly string[] = [];
  /** How the site writes its money, in units of price. */
  @property({ attribute: false }) money = '';
  /** What is wrong, as a sentence with its remedy. */
  @property({ attribute: false }) problem: string | undefined;
  @property({ attribute: false }) note: string | undefined;
  /** In a table: the label is only spoken, and unit and problem stand elsewhere. */
  @property({ type: Boolean, reflect: true }) cell = false;

  @query('input') private readonly input!: HTMLInputElement | null;
  /** The text while it is being typed; the figure is shown by the language again on leaving. */
  @state() private draft: string | undefined;
  @state() private typing = false;
  #unit: string | undefined;
  #sent: Figure | undefined;
  readonly #language = new LanguageController(this);

  protected override willUpdate(changed: PropertyValues<this>): void {
    // this field renders before the section hands the figure sent back: only a figure that has come can differ from it
    if (changed.has('figure') && !sameFigure(this.figure, this.#sent)) this.draft = undefined;
  }

  override render() {
    const { texts } = this.#language;
    const problem = this.typing ? undefined : this.problem;
    return html`
      <label for="in" class=${this.cell ? 'unseen' : ''}>${this.label}</label>
      <div class="line ${problem ? 'wrong' : ''}" part="line">
        <input
          id="in"
          data-field
          part="input"
          type="text"
          inputmode="decimal"
          autocomplete="off"
          spellcheck="false"
          .value=${this.shown}
          placeholder=${this.placeholder}
          aria-invalid=${problem ? 'true' : 'false'}
          aria-describedby="said"
          @input=${this.onInput}
          @keydown=${this.onKeydown}
          @paste=${this.onPaste}
          @blur=${this.settle}
        />
        ${this.cell ? nothing : this.unitPart(texts)}
      </div>
      <div id="said" class=${this.cell ? 'unseen' : ''}>
        ${problem ? html`<p class="problem" part="problem">${problem} ${this.cell ? nothing : this.readings()}</p>` : nothing}
        ${this.note && !problem ? html`<p class="note">${this.note}</p>` : nothing}
      </div>
    `;
  }

  override focus(options?: FocusOptions): void {
    this.input?.focus(options);
  }

  /** Moves on to the field after this one, or back to the one before. */
  leave(step: 1 | -1): void {
    if (this.input) moveFocus(this.input, step);
  }

  private unitPart(texts: Texts) {
    const { unit } = this;
    if (this.units.length < 2) return unit ? html`<span class="unit">${inMoney(unit, this.money)}</span>` : nothing;
    const offered = this.units.includes(unit) ? this.units : [unit, ...this.units];
    return html`<select class="unit" part="unit" aria-label=${texts.field.unitOf.replace('{label}', this.label)} @change=${this.onUnit}>
      ${offered.map((symbol) => html`<option value=${symbol} ?selected=${symbol === unit}>${inMoney(symbol, this.money)}</option>`)}
    </select>`;
  }

  /** For a figure that could mean two things: both, to choose from. */
  private readings() {
    const { figure } = this;
    if (!figure || !('doubt' in figure)) return nothing;
    const read = readNumber(figure.typed, this.mark);
    if (!('doubt' in read) || !read.readings) return nothing;
    return read.readings.map(
      (text) => html`<button type="button" @click=${() => this.send({ text, unit: this.unit })}>${showNumber(text, this.#language.tag)}</button>`,
    );
  }

  private get mark(): '.' | ',' {
    return decimalMark(this.#language.tag);
  }

  private get unit(): string {
    return this.figure?.unit ?? this.#unit ?? this.standing?.unit ?? this.units[0] ?? '';
  }

  private get shown(): string {
    return this.draft ?? (this.figure ? textOf(this.figure, this.#language.tag) : '');
  }

  private get placeholder(): string {
    return this.standing ? textOf(this.standing, this.#language.tag) : '';
  }

  private onInput(event: InputEvent): void {
    this.draft = (event.target as HTMLInputElement).value;
    this.typing = true;
    this.send(readFigureText(this.draft, this.mark, this.unit));
  }

  private onUnit(event: Event): void {
    this.#unit = (event.target as HTMLSelectElement).value;
    if (this.figure) this.send({ ...this.figure, unit: this.#unit });
    else this.requestUpdate();
  }

  private send(figure: Figure | undefined): void {
    this.#sent = figure;
    this.#unit = figure?.unit ?? this.#unit;
    this.dispatchEvent(new FigureInputEvent(figure));
  }

  private settle(): void {
    this.typing = false;
    this.draft = undefined;
  }

  private onKeydown(event: KeyboardEvent): void {
    if (event.key !== 'Enter' || event.isComposing) return;
    event.preventDefault();
    this.settle();
    moveFocus(event.target as HTMLElement, event.shiftKey ? -1 : 1);
  }

  private onPaste(event: ClipboardEvent): void {
    const text = event.clipboardData?.getData('text/plain') ?? '';
    if (!/[\t\n]/.test(text.trim())) return;
    const rows = text.replace(/\r\n?/g, '\n').replace(/\n+$/, '').split('\n').map((line) => line.split('\t'));
    if (!this.dispatchEvent(new FigurePasteEvent(rows))) event.preventDefault();
  }
}

/** What was typed, as a figure: understood, or kept with the doubt about it. Undefined when there is nothing. */
export function readFigureText(typed: string, mark: '.' | ',', unit: string): Figure | undefined {
  const read = readNumber(typed, mark);
  if ('empty' in read) return undefined;
  return 'text' in read ? { text: read.text, unit } : { typed, doubt: read.doubt, unit };
}

const textOf = (figure: Figure, tag: string): string => ('text' in figure ? fieldText(figure.text, tag) : figure.typed);

function sameFigure(a: Figure | undefined, b: Figure | undefined): boolean {
  return JSON.stringify(a) === JSON.stringify(b);
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-figure': FigureField;
  }
  interface HTMLElementEventMap {
    'figure-input': FigureInputEvent;
    'figure-paste': FigurePasteEvent;
  }
}
