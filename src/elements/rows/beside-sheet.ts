import { html, nothing } from 'lit';
import type { ReactiveControllerHost, TemplateResult } from 'lit';
import { counted } from '../../exchange/sheet-host/sheet-host.js';
import type { FilledCells, SheetBlock, SheetHost, SheetSelection } from '../../exchange/sheet-host/sheet-host.js';
import type { enRows } from '../../locales/en-rows.js';
import type { Widened } from '../../locales/en.js';
import { fill } from '../../locales/fill.js';

/** What is needed of the element that stands beside a sheet. */
export interface BesideHost {
  words(): Widened<typeof enRows>;
  sheet(): SheetHost | undefined;
  /** What is written beside the rows that were read. */
  block(): SheetBlock;
  /** Takes in what was read. */
  take(text: string, said: string): void;
  say(text: string): void;
}

/** Reads the selection of the sheet around the page, and writes beside it; filled cells are asked about. */
export class BesideSheet {
  #selection: SheetSelection | undefined;
  /** What the block would be written over, until a person has said what to do. */
  #filled: FilledCells | undefined;

  constructor(
    private readonly element: ReactiveControllerHost & HTMLElement,
    private readonly host: BesideHost,
  ) {}

  /** No question is open any more. */
  reset(): void {
    this.#filled = undefined;
  }

  /** What stands there now did not come from the sheet. */
  forget(): void {
    this.#selection = undefined;
  }

  action(): TemplateResult | typeof nothing {
    if (!this.host.sheet() || !this.#selection) return nothing;
    return html`<button class="action" part="action" type="button" @click=${() => void this.#begin()}>${this.host.words().beside}</button>`;
  }

  question(): TemplateResult | typeof nothing {
    const words = this.host.words();
    const filled = this.#filled;
    if (!filled) return nothing;
    const answer = (text: string, press: () => void): TemplateResult => html`<button class="action" part="action" type="button" @click=${press}>${text}</button>`;
    return html`<div class="gate" role="alertdialog" aria-label=${words.beside}>
      <p>${fill(words.filled, { count: String(filled.count), first: filled.first.map(({ address, text }) => fill(words.filledCell, { address, text })).join(', ') })}</p>
      <div class="actions">${answer(words.cancel, () => this.#put(undefined))} ${answer(words.onlyBlanks, () => void this.#write('blanks'))} ${answer(words.replace, () => void this.#write('replace'))}</div>
    </div>`;
  }

  async read(): Promise<void> {
    await this.#trying(async (sheet) => {
      const selection = await sheet.read();
      const words = this.host.words();
      if (!selection?.cells.length) return this.host.say(words.nothingSelected);
      const quoted = (cell: string): string => (/["\t\r\n]/.test(cell) ? `"${cell.replace(/"/g, '""')}"` : cell);
      const { rows, blank } = counted(selection);
      this.host.take(selection.cells.map((row) => row.map(quoted).join('\t')).join('\n'), fill(words.fromSelection, { address: selection.address, rows: String(rows), blank: String(blank) }));
      this.#selection = selection;
    });
  }

  async #begin(): Promise<void> {
    const selection = this.#selection;
    if (!selection) return;
    await this.#trying(async (sheet) => {
      const filled = await sheet.wouldOverwrite(this.host.block(), selection);
      if (filled.count) this.#put(filled);
      else await this.#write('blanks');
    });
  }

  async #write(over: 'blanks' | 'replace'): Promise<void> {
    const selection = this.#selection;
    this.#put(undefined);
    if (!selection) return;
    await this.#trying(async (sheet) => {
      const { address, cells } = await sheet.write(this.host.block(), selection, over);
      const words = this.host.words();
      this.host.say(`${fill(words.written, { cells: String(cells), address })} ${sheet.undo === 'one-step' ? words.undoable : words.notUndoable}`);
    });
  }

  #put(filled: FilledCells | undefined): void {
    this.#filled = filled;
    this.element.requestUpdate();
  }

  /** What a sheet cannot do it says itself. */
  async #trying(what: (sheet: SheetHost) => Promise<void>): Promise<void> {
    const sheet = this.host.sheet();
    if (!sheet) return;
    try {
      await what(sheet);
    } catch (error) {
      this.host.say(error instanceof Error ? error.message : String(error));
    }
  }
}
