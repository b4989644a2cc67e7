import { html, nothing } from 'lit';
import type { ReactiveControllerHost, TemplateResult } from 'lit';
import { copyRows } from '../../exchange/clipboard.js';
import { decimalMark } from '../../exchange/number-format.js';
import type { DecimalMark } from '../../exchange/number-text.js';
import { asCsv } from '../../exchange/results/table-text.js';
import type { Rows } from '../../exchange/results/table-text.js';
import { WORKBOOK_TYPE } from '../../exchange/workbook/office-file.js';
import { workbookOf } from '../../exchange/workbook/workbook.js';
import type { enGiving } from '../../locales/en-giving.js';
import type { Widened } from '../../locales/en.js';
import { fill } from '../../locales/fill.js';
import type { LotEntry, SiteProfile } from '../../lot/entry.js';
import type { OptionInputEvent } from './option-field.js';

/** What is needed of the element that gives results to a sheet. */
export interface GivingHost {
  words(): Widened<typeof enGiving>;
  tag(): string;
  /** Headings first. */
  rows(): Rows;
  /** The lots of a workbook, at most so many and one more. */
  lots(most: number): readonly LotEntry[];
  site(): SiteProfile;
  /** Says what was done. */
  say(text: string): void;
}

type Target = 'page' | DecimalMark;

/** A workbook of more lots is slow to open. */
const MOST_LOTS = 50;

/** Results to the clipboard, as CSV, and as a workbook, with the mark of decimals that the sheet wants. */
export class SheetGiving {
  #target: Target = 'page';
  #byHand = '';

  constructor(
    private readonly element: ReactiveControllerHost & HTMLElement,
    private readonly host: GivingHost,
  ) {}

  /** The mark of decimals in the sheet that the results go to. */
  get mark(): DecimalMark {
    return this.#target === 'page' ? decimalMark(this.host.tag()) : this.#target;
  }

  /** What is left to copy by hand belongs to the results before. */
  reset(): void {
    this.#byHand = '';
  }

  /** @param more further actions beside these */
  render(more: unknown = nothing): TemplateResult {
    const words = this.host.words();
    return html`
      <div class="fields">
        <esterway-option
          class="wide" exportparts="line: field-line, input: field-input" .label=${words.target} .options=${Object.entries(words.targets)} .value=${this.#target}
          @option-input=${({ option }: OptionInputEvent) => {
            this.#target = option as Target;
            this.element.requestUpdate();
          }}
        ></esterway-option>
      </div>
      <div class="actions">
        <button class="action" part="action" type="button" @click=${() => void this.#copy()}>${words.copy}</button>
        <button class="action" part="action" type="button" @click=${() => this.#csv()}>${words.csv}</button>
        <button class="action" part="action" type="button" @click=${() => this.#workbook()}>${words.workbook}</button>
        ${more}
      </div>
      ${this.#byHand ? html`<textarea readonly aria-label=${words.copy} .value=${this.#byHand} @focus=${(event: FocusEvent) => (event.target as HTMLTextAreaElement).select()}></textarea>` : nothing}
    `;
  }

  async #copy(): Promise<void> {
    const words = this.host.words();
    const rows = this.host.rows();
    const copied = await copyRows(rows, this.mark, this.element.ownerDocument);
    this.#byHand = copied.how === 'by-hand' ? copied.text : '';
    this.host.say(copied.how === 'by-hand' ? words.copyByHand : fill(words.copied, { rows: String(rows.length - 1) }));
    this.element.requestUpdate();
  }

  #csv(): void {
    const { mark } = this;
    this.#save(new Blob([asCsv(this.host.rows(), { mark, delimiter: mark === ',' ? ';' : ',', byteOrderMark: true })], { type: 'text/csv' }), 'esterway.csv');
  }

  #workbook(): void {
    const words = this.host.words();
    try {
      const lots = this.host.lots(MOST_LOTS);
      const { bytes } = workbookOf(lots.slice(0, MOST_LOTS), this.host.site(), { language: this.host.tag() });
      this.#save(new Blob([bytes as BlobPart], { type: WORKBOOK_TYPE }), 'esterway.xlsx');
      this.host.say(lots.length > MOST_LOTS ? fill(words.workbookMost, { most: String(MOST_LOTS) }) : '');
    } catch (error) {
      this.host.say(fill(words.workbookFailed, { error: String(error) }));
    }
  }

  #save(blob: Blob, name: string): void {
    const link = this.element.ownerDocument.createElement('a');
    link.href = URL.createObjectURL(blob);
    link.download = name;
    link.click();
    // the browser has taken it up by then
    setTimeout(() => URL.revokeObjectURL(link.href), 60_000);
  }
}
