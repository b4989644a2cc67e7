import { html, nothing } from 'lit';
import { property, query } from 'lit/decorators.js';
import { fieldStyles } from './field-styles.js';
import { moveFocus } from './focus-order.js';
import { GuestElement } from './guest.js';
import { tokens } from './styles.js';

/** A person chose an option. */
export class OptionInputEvent extends Event {
  static readonly type = 'option-input';
  constructor(readonly option: string) {
    super(OptionInputEvent.type);
  }
}

/** One of a few named options. */
export class OptionField extends GuestElement {
  static override styles = [tokens, fieldStyles];

  @property({ attribute: false }) label = '';
  /** Value and words of each option. */
  @property({ attribute: false }) options: readonly (readonly [value: string, words: string])[] = [];
  @property({ attribute: false }) value = '';
  @property({ attribute: false }) note: string | undefined;
  @property({ attribute: false }) problem: string | undefined;

  @query('select') private readonly select!: HTMLSelectElement | null;

  override render() {
    return html`
      <label for="in">${this.label}</label>
      <div class="line ${this.problem ? 'wrong' : ''}" part="line">
        <select id="in" data-field part="input" aria-describedby="said" @change=${this.onChange} @keydown=${this.onKeydown}>
          ${this.options.map(([value, words]) => html`<option value=${value} ?selected=${value === this.value}>${words}</option>`)}
        </select>
      </div>
      <div id="said">
        ${this.problem ? html`<p class="problem">${this.problem}</p>` : this.note ? html`<p class="note">${this.note}</p>` : nothing}
      </div>
    `;
  }

  protected override updated(): void {
    // an option shown before its value was set keeps the first one selected
    if (this.select && this.select.value !== this.value) this.select.value = this.value;
  }

  override focus(options?: FocusOptions): void {
    this.select?.focus(options);
  }

  private onChange(event: Event): void {
    this.dispatchEvent(new OptionInputEvent((event.target as HTMLSelectElement).value));
  }

  private onKeydown(event: KeyboardEvent): void {
    if (event.key !== 'Enter') return;
    event.preventDefault();
    moveFocus(event.target as HTMLElement, event.shiftKey ? -1 : 1);
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-option': OptionField;
  }
  interface HTMLElementEventMap {
    'option-input': OptionInputEvent;
  }
}
