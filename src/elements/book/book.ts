import { html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { property, state } from 'lit/decorators.js';
import type { Book, Kept } from '../../book/book.js';
import type { BookFound } from '../../book/catalogue.js';
import type { LotRecord } from '../../book/record.js';
import type { BookRefused } from '../../book/refusal.js';
import { sameJson } from '../../book/same.js';
import { deBook } from '../../locales/de-book.js';
import { enBook } from '../../locales/en-book.js';
import { fill } from '../../locales/fill.js';
import type { LotEntry } from '../../lot/entry.js';
import { EsterwayUndoEvent } from '../parts/events.js';
import { fieldStyles } from '../parts/field-styles.js';
import { SectionElement } from '../parts/section.js';
import { lotName, momentWords, refusalWords } from './book-words.js';
import type { BookTongue } from './book-words.js';
import { EsterwayKeptEvent } from './events.js';
import { judgedState } from './judged-state.js';
import { onceAFrame } from './once-a-frame.js';
import { lotRow } from './row.js';
import { saveFile } from './save-file.js';
import { queryOf, searchFields } from './search.js';
import type { Search } from './search.js';
import { borrowBook } from './shared-books.js';
import type { BookLoan } from './shared-books.js';
import { bookStyles } from './styles.js';
import { textLine } from './text-line.js';
import { changeList, versionList } from './versions.js';
import { wholeBook } from './whole-book.js';

const TEXTS = { en: enBook, de: deBook };
/** Lots shown at first, and further ones at a press. */
const PAGE = 20;

/** Where something is said: at the keeping, at the list, or at the whole book. */
type Place = 'keep' | 'list' | 'whole';

/**
 * The intake book, in a database of the browser: keeps the lot on the bench, finds lots again, puts one back on the bench, amends
 * one with a reason while its earlier versions stay, exports and restores the whole. It is opened when the element is put on a page.
 *
 * @element esterway-book
 * @attr {string} name - name of the database, `esterway-book` when left out
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {boolean} bare - leaves the heading out
 *
 * @fires {EsterwayKeptEvent} esterway-kept - a person kept a lot, or amended one
 * @fires {EsterwayChangeEvent} esterway-change - a person put a kept lot on the bench (only where the element holds the lot itself)
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart action - a button
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 */
export class EsterwayBook extends SectionElement {
  static override styles = [...SectionElement.styles, fieldStyles, bookStyles];

  /** Name of the database. */
  @property() name = 'esterway-book';
  /** Says what becomes of a delivery, as a word: by the limits of the site, unless set otherwise. */
  @property({ attribute: false }) stateOf = judgedState;

  @state() private book: Book | undefined;
  @state() private refused: BookRefused | undefined;
  @state() private said: { readonly at: Place; readonly text: string } | undefined;
  @state() private problem: { readonly at: Place; readonly text: string } | undefined;
  @state() private search: Search = {};
  @state() private shown = PAGE;
  @state() private by = '';
  /** The lot of the book that is being amended, as it stood when this began. */
  @state() private amending: LotRecord | undefined;
  @state() private reason = '';
  /** The lot whose versions are open. */
  @state() private opened: { readonly lot: string; readonly newest: string; readonly versions: readonly LotRecord[] } | undefined;
  /** What was put on the bench, as long as it lies there. */
  @state() private laid: { readonly entry: LotEntry; readonly text: string } | undefined;
  @state() private busy = false;

  #loan: BookLoan | undefined;
  #unwatch: (() => void) | undefined;
  #found: BookFound | undefined;
  #foundFor: readonly unknown[] | undefined;

  override connectedCallback(): void {
    super.connectedCallback();
    void this.borrow();
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.giveBack();
  }

  protected override willUpdate(): void {
    if (this.#borrowed !== undefined && this.#borrowed !== this.name) void this.borrow();
  }

  protected override get heading(): string {
    return this.words.heading;
  }

  protected override get summary(): string {
    return this.book ? fill(this.words.summary, { count: this.number(String(this.book.size)) }) : '';
  }

  private get words(): BookTongue['words'] {
    return this.textsOf(TEXTS);
  }

  private get tongue(): BookTongue {
    return { words: this.words, texts: this.texts, tag: this.languageTag };
  }

  // -- opening --------------------------------------------------------------

  #borrowed: string | undefined;

  private async borrow(): Promise<void> {
    this.giveBack();
    this.#borrowed = this.name;
    const loan = (this.#loan = borrowBook(this.name, (entry, site) => this.stateOf(entry, site)));
    const book = await loan.book;
    if (this.#loan !== loan) return;
    if ('refused' in book) return void (this.refused = book);
    this.book = book;
    this.#unwatch = book.watch(onceAFrame(() => this.onCameIn()));
  }

  private giveBack(): void {
    this.#unwatch?.();
    this.#loan?.giveBack();
    this.#loan = this.#unwatch = this.#borrowed = this.#found = undefined;
    this.book = this.refused = this.opened = this.amending = undefined;
  }

  /** Something came in, from here or another window. */
  private onCameIn(): void {
    this.requestUpdate();
    const { opened: open, book } = this;
    if (open && book?.newestOf(open.lot)?.id !== open.newest) void this.openLot(open.lot);
  }

  private get found(): BookFound {
    const { book, search, shown } = this;
    const key = [search, shown, book?.revision] as const;
    if (!this.#found || key.some((part, i) => part !== this.#foundFor?.[i])) {
      this.#found = book?.find({ ...queryOf(search), limit: shown }) ?? { total: 0, lots: [] };
      this.#foundFor = key;
    }
    return this.#found;
  }

  // -- the page -------------------------------------------------------------

  protected override body(): unknown {
    const { words, book, refused } = this;
    if (refused) {
      return html`<div class="gate" role="alert"><p>${refusalWords(refused, this.tongue)}</p></div>
        <div class="actions"><button class="action" part="action" type="button" @click=${this.borrow}>${words.again}</button></div>`;
    }
    if (!book) return html`<p class="quiet" role="status">${words.opening}</p>`;
    return html`
      ${book.lost ? html`<div class="gate" role="alert"><p>${words.lost} ${refusalWords(book.lost, this.tongue)}</p></div>` : nothing}
      ${book.unread ? html`<p class="gate small">${fill(words.unread, { count: String(book.unread) })}</p>` : nothing}
      <div class="no-print">${this.keeping()} ${this.told('keep')}</div>
      ${book.size ? this.list(book) : html`<p class="quiet">${words.empty}</p>`}
      <details class="no-print">
        <summary>${words.whole}</summary>
        ${wholeBook(this.tongue, { empty: book.size === 0, busy: this.busy, save: () => void this.export(), restore: (file) => void this.restore(file) })} ${this.told('whole')}
      </details>
    `;
  }

  /** What was done or could not be done, where it was asked for. */
  private told(at: Place): TemplateResult {
    const { said, problem } = this;
    return html`
      ${problem?.at === at ? html`<div class="gate" role="alert"><p>${problem.text}</p></div>` : nothing}
      <p class="note" role="status">${said?.at === at ? said.text : ''}</p>
    `;
  }

  private keeping(): TemplateResult {
    const { words, amending } = this;
    const by = textLine({ id: 'by', label: words.by, value: this.by, typed: (text) => (this.by = text) });
    if (amending) return html`${this.amendment(amending, by)}`;
    return html`
      <div class="fields">${by}</div>
      <div class="actions"><button class="action main" id="keep" part="action" type="button" ?disabled=${this.busy} @click=${this.keep}>${words.keep}</button></div>
    `;
  }

  private amendment(record: LotRecord, by: TemplateResult): TemplateResult {
    const { words, tongue, desk } = this;
    const number = String(record.number);
    const same = sameJson(record.entry, desk.entry) && sameJson(record.site, desk.site);
    return html`
      <p>${same ? fill(words.same, { number }) : fill(words.inBook, { name: lotName(record, tongue), number, kept: momentWords(record.keptAt, tongue) })}</p>
      ${changeList(record, desk, tongue)}
      <div class="fields">${textLine({ id: 'reason', wide: true, label: words.reason, value: this.reason, typed: (text) => (this.reason = text) })} ${by}</div>
      <div class="actions">
        <button class="action main" part="action" type="button" ?disabled=${this.busy || same} @click=${() => this.amend(record)}>${fill(words.amend, { number: String(record.number + 1) })}</button>
        <button class="action" part="action" type="button" ?disabled=${this.busy || same} @click=${this.keepAnother}>${words.another}</button>
        <button class="action" part="action" type="button" @click=${this.leaveIt}>${words.leave}</button>
      </div>
    `;
  }

  private list(book: Book): TemplateResult {
    const { words, found, tongue, laid } = this;
    return html`
      <div class="no-print">${searchFields(this.search, book, tongue, (problem) => this.problemText(problem), (search) => this.find(search))}</div>
      <p class="small quiet" role="status">
        ${found.total ? fill(words.found, { shown: this.number(String(found.lots.length)), total: this.number(String(found.total)) }) : words.noneFound}
      </p>
      ${this.told('list')}
      ${laid && laid.entry === this.desk.entry
        ? html`<p class="note" role="status">${laid.text}</p>
            <div class="actions no-print"><button class="action" part="action" type="button" @click=${() => this.dispatchEvent(new EsterwayUndoEvent())}>${words.undo}</button></div>`
        : nothing}
      <ol class="lots" aria-label=${words.list}>
        ${found.lots.map((lot) => html`<li>${lotRow(lot, this.opened?.lot === lot.lot, this.tongue, () => this.toggle(lot.lot))} ${this.opened?.lot === lot.lot ? this.details(this.opened.versions) : nothing}</li>`)}
      </ol>
      ${found.total > found.lots.length ? html`<button class="action more no-print" part="action" type="button" @click=${() => (this.shown += PAGE)}>${words.more}</button>` : nothing}
    `;
  }

  private details(versions: readonly LotRecord[]): TemplateResult {
    const { words, tongue } = this;
    const newest = versions.at(-1);
    const source = newest?.summary.source;
    return html`<div class="lot">
      ${versionList(versions, tongue, (version) => this.layOnBench(version))}
      ${newest ? html`<div class="actions no-print"><button class="action" part="action" type="button" @click=${() => this.beginAmending(newest)}>${words.amendThis}</button></div>` : nothing}
      ${source !== undefined && this.book
        ? html`<esterway-history bare .source=${source} .points=${this.book.history(source)}></esterway-history>`
        : nothing}
    </div>`;
  }

  // -- what a person does ---------------------------------------------------

  /** One thing at a time; what came of it is said where it was asked for. */
  private async doing(at: Place, what: (book: Book) => Promise<string | BookRefused>): Promise<boolean> {
    const { book } = this;
    if (!book || this.busy) return false;
    this.busy = true;
    this.said = this.problem = undefined;
    const outcome = await what(book);
    this.busy = false;
    if (typeof outcome === 'string') this.said = { at, text: outcome };
    else this.problem = { at, text: refusalWords(outcome, this.tongue) };
    return typeof outcome === 'string';
  }

  private async keep(): Promise<void> {
    const { entry } = this.desk;
    const { book } = this;
    const { name, source, date } = entry;
    const alike = name ? book?.find({ text: name }).lots.find(({ summary }) => summary.name === name && summary.source === source && summary.date === date) : undefined;
    const versions = alike && (await book?.versions(alike.lot));
    const newest = versions && !('refused' in versions) ? versions.at(-1) : undefined;
    if (newest && !(sameJson(newest.entry, entry) && sameJson(newest.site, this.desk.site))) return this.beginAmending(newest);
    await this.doing('keep', async (open) => this.keptWords(await open.keep(entry, this.desk.site, this.keeper)));
  }

  private async keepAnother(): Promise<void> {
    const { entry, site } = this.desk;
    if (await this.doing('keep', async (book) => this.keptWords(await book.keep(entry, site, this.keeper)))) this.leaveIt();
  }

  private async amend(record: LotRecord): Promise<void> {
    const { entry, site } = this.desk;
    const done = await this.doing('keep', async (book) => {
      const kept = await book.amend(record.lot, entry, site, { reason: this.reason, onto: record.id, ...this.keeper });
      if ('refused' in kept && kept.refused === 'amended-meanwhile') {
        const versions = await book.versions(record.lot);
        if (!('refused' in versions)) this.amending = versions.at(-1);
      }
      return this.keptWords(kept);
    });
    if (done) this.leaveIt();
    else this.focusOn('reason');
  }

  private get keeper(): { readonly by?: string } {
    const by = this.by.trim();
    return by ? { by } : {};
  }

  private keptWords(kept: Kept | BookRefused): string | BookRefused {
    if ('refused' in kept) return kept;
    const { record: { lot, number }, unchanged } = kept;
    if (!unchanged) {
      // asks the browser not to clear the book when it needs room; it may say no
      void navigator.storage?.persist?.().catch(() => false);
      this.dispatchEvent(new EsterwayKeptEvent(lot, number));
    }
    return fill(unchanged ? this.words.unchanged : this.words.kept, { name: lotName(kept.record, this.tongue), number: String(number) });
  }

  private beginAmending(record: LotRecord): void {
    this.said = this.problem = undefined;
    this.amending = record;
    this.focusOn('reason');
  }

  private readonly leaveIt = (): void => {
    this.amending = undefined;
    this.reason = '';
    this.focusOn('keep');
  };

  /** Puts the focus where the work goes on, since what had it is no longer there. */
  private focusOn(id: string): void {
    void this.updateComplete.then(() => this.shadowRoot?.getElementById(id)?.focus());
  }

  private find(search: Search): void {
    this.search = search;
    this.shown = PAGE;
  }

  private toggle(lot: string): void {
    if (this.opened?.lot === lot) this.opened = undefined;
    else void this.openLot(lot);
  }

  private async openLot(lot: string): Promise<void> {
    const versions = await this.book?.versions(lot);
    if (!versions) return;
    if ('refused' in versions) {
      this.opened = undefined;
      this.problem = { at: 'list', text: refusalWords(versions, this.tongue) };
    } else this.opened = { lot, versions, newest: versions.at(-1)?.id ?? '' };
  }

  private layOnBench(version: LotRecord): void {
    const { words } = this;
    const other = sameJson(version.site, this.desk.site) ? '' : ` ${words.otherSite}`;
    this.laid = { entry: version.entry, text: fill(words.opened, { number: String(version.number), name: lotName(version, this.tongue) }) + other };
    this.edit({ kind: 'replace', entry: version.entry });
  }

  private async export(): Promise<void> {
    await this.doing('whole', async (book) => {
      const exported = await book.exportBook();
      if ('refused' in exported) return exported;
      const file = `${this.name}-${new Date().toISOString().slice(0, 10)}.json`;
      saveFile(file, exported.text);
      return fill(this.words.exported, { count: this.number(String(book.size)), file });
    });
  }

  private async restore(file: File): Promise<void> {
    const text = await file.text();
    await this.doing('whole', async (book) => {
      const told = (done: number, all: number): void => {
        this.said = { at: 'whole', text: fill(this.words.restoring, { done: this.number(String(done)), all: this.number(String(all)) }) };
      };
      const restored = await book.restore(text, told);
      if ('refused' in restored) return restored;
      const { added, already, different } = restored;
      const sentence = fill(this.words.restored, { added: this.number(String(added)), already: this.number(String(already)) });
      return different ? `${sentence} ${fill(this.words.different, { count: this.number(String(different)) })}` : sentence;
    });
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-book': EsterwayBook;
  }
}
