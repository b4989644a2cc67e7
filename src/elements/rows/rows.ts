import { html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { property, state } from 'lit/decorators.js';
import { live } from 'lit/directives/live.js';
import { decimalMark } from '../../exchange/number-format.js';
import type { DecimalMark } from '../../exchange/number-text.js';
import type { ResultCell } from '../../exchange/results/row.js';
import { plainCell } from '../../exchange/results/table-text.js';
import type { SheetBlock, SheetHost } from '../../exchange/sheet-host/sheet-host.js';
import { textOfBytes } from '../../exchange/table/bytes.js';
import { EMPTY_MEMORY, remember } from '../../exchange/table/columns.js';
import type { ColumnMemory, ColumnUse } from '../../exchange/table/columns.js';
import type { DateOrder } from '../../exchange/table/dates.js';
import { isTextKey } from '../../exchange/table/meanings.js';
import { pastedText } from '../../exchange/table/pasted.js';
import { rowEntries } from '../../exchange/table/row-entry.js';
import type { RowProblem, RowReading } from '../../exchange/table/row-entry.js';
import { MOST_BYTES } from '../../exchange/table/table.js';
import type { TableFault } from '../../exchange/table/table.js';
import type { RowsSummary, WorkedRow } from '../../exchange/table/worked-rows.js';
import { deGiving } from '../../locales/de-giving.js';
import { deRows } from '../../locales/de-rows.js';
import { deTriage } from '../../locales/de-triage.js';
import { enGiving } from '../../locales/en-giving.js';
import { enRows } from '../../locales/en-rows.js';
import { enTriage } from '../../locales/en-triage.js';
import type { Widened } from '../../locales/en.js';
import { fill } from '../../locales/fill.js';
import { fieldName } from '../../locales/quantity-name.js';
import type { LotEntry } from '../../lot/entry.js';
import { fieldStyles } from '../parts/field-styles.js';
import type { OptionInputEvent } from '../parts/option-field.js';
import { SectionElement } from '../parts/section.js';
import { SheetGiving } from '../parts/sheet-giving.js';
import type { Running } from '../parts/sliced-work.js';
import { BesideSheet } from './beside-sheet.js';
import { columnName, columnsView, meaningWords } from './columns-view.js';
import { EsterwayColumnsChangeEvent } from './events.js';
import { resultCells, resultHeadings } from './result-cells.js';
import type { ResultTongue } from './result-cells.js';
import { countsView, rowView } from './results-view.js';
import { workRows } from './rows-run.js';
import { LOOKED, SheetText } from './sheet-text.js';
import { rowsStyles } from './styles.js';

const TEXTS = { en: enRows, de: deRows };
const GIVING_TEXTS = { en: enGiving, de: deGiving };
const STATE_TEXTS = { en: enTriage, de: deTriage };
/** Rows shown at once. */
const PAGE = 25;
/** Bad rows told before anything is worked out. */
const MOST_TOLD = 12;

/**
 * Reads rows of any sheet (pasted, from a file, or the selection of a sheet around it), says what was understood column by column
 * and row by row, works all rows out by the site profile, and gives the results back: to the clipboard, as CSV, as a workbook with
 * live formulas, or beside the rows.
 *
 * @element esterway-rows
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {boolean} bare - leaves the heading out
 *
 * @fires {EsterwayColumnsChangeEvent} esterway-columns-change - a person corrected what a column is; keep it and set `columnMemory` again next time
 * @fires {EsterwaySiteChangeEvent} esterway-site-change - never by itself; the site profile is only read
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart result - the results
 * @csspart action - a button
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 */
export class EsterwayRows extends SectionElement {
  static override styles = [...SectionElement.styles, fieldStyles, rowsStyles];

  /** The sheet around the page, if there is one; handed in by the page. */
  @property({ attribute: false }) host: SheetHost | undefined;
  /** What was made of columns before, as the change event gave it. */
  @property({ attribute: false }) columnMemory: ColumnMemory | undefined;

  @state() private sheet = new SheetText('', undefined);
  @state() private over = false;
  @state() private said = '';
  @state() private fault: keyof typeof enRows.faults | undefined;
  @state() private rows: readonly WorkedRow[] = [];
  @state() private summed: RowsSummary | undefined;
  @state() private stopped = false;
  @state() private from = 0;
  @state() private onlyProblems = false;
  @state() private running: Running | undefined;

  readonly #beside = new BesideSheet(this, {
    words: () => this.words,
    sheet: () => this.host,
    block: () => this.block,
    take: (text, said) => this.take(text, said),
    say: (text) => (this.said = text),
  });
  readonly #giving = new SheetGiving(this, {
    words: () => this.textsOf(GIVING_TEXTS),
    tag: () => this.languageTag,
    rows: () => this.cells,
    lots: (most) => this.lots(most),
    site: () => this.desk.site,
    say: (text) => (this.said = text),
  });

  private get words(): Widened<typeof enRows> {
    return this.textsOf(TEXTS);
  }

  protected override get heading(): string {
    return this.words.title;
  }

  protected override get summary(): string {
    const { table } = this.sheet;
    return table ? fill(this.words.size, { rows: String(table.rows.length), columns: String(this.sheet.columns.length) }) : '';
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.running?.stop();
    this.running = undefined;
  }

  private get mark(): DecimalMark {
    return this.sheet.mark(decimalMark(this.languageTag));
  }

  // -- the page -------------------------------------------------------------

  protected override body(): unknown {
    const { words, sheet } = this;
    return html`
      <div class="no-print">
        <label for="text">${words.paste}</label>
        <textarea
          id="text" data-field class=${this.over ? 'over' : ''} aria-describedby="hint said" autocomplete="off" spellcheck="false"
          .value=${live(sheet.text.length > SHOWN_TEXT ? `${sheet.text.slice(0, SHOWN_TEXT)}…` : sheet.text)} ?readonly=${sheet.text.length > SHOWN_TEXT}
          @input=${this.onInput} @paste=${this.onPaste} @dragover=${this.onDrag} @dragleave=${this.onDrag} @drop=${this.onDrop}
        ></textarea>
        <p class="note" id="hint">${words.hint}</p>
        <div class="actions">
          <input class="unseen" id="file" type="file" accept=".csv,.tsv,.txt,text/csv,text/tab-separated-values,text/plain" aria-label=${words.file} tabindex="-1" @change=${this.onFile} />
          <button class="action" part="action" type="button" @click=${this.onChooseFile}>${words.file}</button>
          ${this.host ? html`<button class="action" part="action" type="button" @click=${() => void this.#beside.read()}>${words.selection}</button>` : nothing}
          ${sheet.text ? html`<button class="action" part="action" type="button" @click=${() => this.take('')}>${words.clear}</button>` : nothing}
        </div>
      </div>
      <p class="note" id="said" role="status">${this.said}</p>
      ${this.faultText()}
      ${sheet.table ? html`${this.understood()} ${this.work()} ${this.results()}` : nothing}
    `;
  }

  private faultText(): unknown {
    const { words, sheet } = this;
    const fault: Pick<TableFault, 'params'> & { code: string } | undefined = this.fault ? { code: this.fault } : 'fault' in sheet.read && sheet.text.trim() ? sheet.read.fault : undefined;
    return fault ? html`<p class="gate" role="alert">${fill((words.faults as Readonly<Record<string, string>>)[fault.code] ?? fault.code, fault.params ?? {})}</p>` : nothing;
  }

  private understood(): unknown {
    const { words, sheet } = this;
    const { table, columns, markFound, orderFound } = sheet;
    if (!table) return nothing;
    const twice = columns.some(({ key }, i) => key && columns.findIndex((other) => other.key === key) < i);
    const { mixed } = markFound;
    const markNote = mixed ? fill(words.markMixed, { point: String(mixed.point), comma: String(mixed.comma) }) : markFound.mark ? words.markFound : words.markUnknown;
    return html`
      <h3>${words.understood}</h3>
      <p>${fill(words.size, { rows: String(table.rows.length), columns: String(columns.length) })}</p>
      ${table.warnings.map(({ code, params = {} }) => html`<p class="gate">${fill(words.warnings[code], params)}</p>`)}
      ${twice ? html`<p class="gate">${words.twice}</p>` : nothing}
      ${columnsView(columns, words, (unit) => this.inMoney(unit), (place, use) => this.correct(place, use))}
      <div class="fields">
        ${this.choice(words.mark, words.marks, this.mark, markNote, (mark) => this.again({ mark: mark as DecimalMark }))}
        ${columns.some(({ key }) => key === 'date') ? this.choice(words.order, words.orders, sheet.order, orderFound.asked === undefined ? undefined : fill(words.orderAsked, { date: orderFound.asked }), (order) => this.again({ order: order as DateOrder })) : nothing}
      </div>
      ${this.lookedAt()}
    `;
  }

  private choice(label: string, all: Readonly<Record<string, string>>, value: string, note: string | undefined, choose: (value: string) => void): TemplateResult {
    return html`<esterway-option
      class="wide" exportparts="line: field-line, input: field-input" .label=${label} .options=${Object.entries(all)} .value=${value} .note=${note}
      @option-input=${({ option }: OptionInputEvent) => choose(option)}
    ></esterway-option>`;
  }

  /** How the first row is read, and every row of the first thousand that raises a question. */
  private lookedAt(): unknown {
    const { words, sheet } = this;
    const looked = sheet.looked(this.mark);
    const first = looked.find(({ entry }) => entry);
    const bad = looked.filter(({ problems }) => problems.length);
    const rows = sheet.table?.rows.length ?? 0;
    return html`
      ${first ? html`<p class="note">${fill(words.first, { row: String(first.row), figures: this.readAs(first) })}</p>` : nothing}
      ${bad.slice(0, MOST_TOLD).map(({ row, problems }) => html`<p class="problem">${fill(words.rowSays, { row: String(row), what: problems.map((one) => this.cellProblem(one)).join(' ') })}</p>`)}
      ${bad.length > MOST_TOLD ? html`<p class="problem">${fill(words.more, { n: String(bad.length - MOST_TOLD) })}</p>` : nothing}
      ${bad.length ? nothing : html`<p class="note">${words.noProblem}</p>`}
      ${rows > LOOKED ? html`<p class="note">${fill(words.looked, { looked: String(LOOKED) })}</p>` : nothing}
    `;
  }

  private readAs({ row }: RowReading): string {
    const { table, columns } = this.sheet;
    const cells = table?.rows[row - table.firstRow] ?? [];
    return columns.flatMap(({ key, unit }, i) => {
      const cell = (cells[i] ?? '').trim();
      if (!key || !cell) return [];
      return [`${meaningWords(key, this.words)} ${cell}${unit && !isTextKey(key) && !cell.endsWith(unit) ? `\u00a0${this.inMoney(unit)}` : ''}`];
    }).join(', ');
  }

  private cellProblem({ code, column, typed }: RowProblem): string {
    const { words, sheet } = this;
    const use = sheet.columns[column];
    const own = (words.problems as Readonly<Record<string, string>>)[code];
    const sentence = own ? fill(own, { typed }) : this.problemText({ code, quantity: '', params: { typed } });
    return use ? fill(words.cellSays, { column: columnName(use, column, words), problem: sentence }) : sentence;
  }

  private work(): unknown {
    const { words, sheet, rows, running } = this;
    const all = String(sheet.table?.rows.length ?? 0);
    if (!sheet.tells) return html`<p class="gate">${words.nothingToRead}</p>`;
    const status = running ? fill(words.doing, { done: String(rows.length), rows: all }) : this.stopped ? fill(words.stopped, { done: String(rows.length), rows: all }) : this.summed ? fill(words.done, { rows: String(this.summed.rows), empty: String(this.summed.empty) }) : '';
    return html`
      <div class="actions no-print">
        ${running
          ? html`<button class="action" part="action" type="button" @click=${this.onStop}>${words.stop}</button>`
          : html`<button class="action main" part="action" type="button" @click=${this.onWork}>${fill(words.work, { rows: all })}</button>`}
      </div>
      ${running ? html`<progress max=${all} .value=${rows.length} aria-label=${words.results}></progress>` : nothing}
      <p class="note" role="status">${status}</p>
    `;
  }

  private results(): unknown {
    const { words, rows, running, summed } = this;
    if (!rows.length || running) return nothing;
    const shown = this.onlyProblems ? rows.filter((row) => this.why(row)) : rows.filter(({ state: found }) => found);
    const from = Math.min(this.from, Math.max(0, shown.length - 1));
    const page = shown.slice(from, from + PAGE);
    return html`
      <div part="result">
        <h3>${words.results}</h3>
        ${summed ? countsView(summed, this.tongue, this.texts.problems) : nothing}
        <div class="fields no-print">
          ${this.choice(words.filter, { all: words.all, problems: words.withProblem }, this.onlyProblems ? 'problems' : 'all', undefined, (which) => {
            this.onlyProblems = which === 'problems';
            this.from = 0;
          })}
        </div>
        ${page.map((row) => rowView(row, this.tongue, (text) => this.number(text)))}
        ${shown.length > PAGE
          ? html`<p class="note" role="status">${fill(words.page, { from: String(from + 1), to: String(from + page.length), of: String(shown.length) })}</p>
              <div class="actions no-print">
                <button class="action" part="action" type="button" ?disabled=${from === 0} @click=${() => (this.from = Math.max(0, from - PAGE))}>${words.back}</button>
                <button class="action" part="action" type="button" ?disabled=${from + PAGE >= shown.length} @click=${() => (this.from = from + PAGE)}>${words.next}</button>
              </div>`
          : nothing}
        ${this.give()}
      </div>
    `;
  }

  private why({ cells = [], problem, missing }: WorkedRow): string {
    const { result } = this.texts;
    const ofCells = cells.map((cell) => this.cellProblem(cell));
    const ofFigure = problem && !cells.some(({ code }) => code === problem.code) ? [`${fieldName(problem.quantity, this.texts)}: ${this.problemText(problem)}`] : [];
    const lacking = missing?.length ? [fill(result.needs, { fields: missing.map((field) => fieldName(field, this.texts)).join(', ') })] : [];
    return [...ofCells, ...ofFigure, ...lacking].join(' ');
  }

  // -- giving back ----------------------------------------------------------

  private give(): unknown {
    return html`
      <div class="no-print">
        <h3>${this.textsOf(GIVING_TEXTS).give}</h3>
        ${this.#giving.render(this.#beside.action())}
        ${this.#beside.question()}
      </div>
    `;
  }

  private get tongue(): ResultTongue {
    return { words: this.words, states: this.textsOf(STATE_TEXTS).shortStates, why: (row) => this.why(row) };
  }

  private get cells(): readonly (readonly ResultCell[])[] {
    const { tongue } = this;
    return [resultHeadings(tongue), ...this.rows.filter(({ state: found }) => found).map((row) => resultCells(row, tongue))];
  }

  /** The rows as lots, at most so many and one more. */
  private lots(most: number): readonly LotEntry[] {
    const { sheet } = this;
    const lots: LotEntry[] = [];
    if (!sheet.table) return lots;
    for (const { entry } of rowEntries(sheet.table, sheet.columns, this.mark, sheet.order)) {
      if (entry) lots.push(entry);
      if (lots.length > most) break;
    }
    return lots;
  }

  /** The results in the order of the rows that were read, their headings where the selection has some. */
  private get block(): SheetBlock {
    const { sheet, tongue } = this;
    const { mark } = this.#giving;
    const text = (cells: readonly ResultCell[]): readonly string[] => cells.slice(2).map((cell) => plainCell(cell, mark));
    const blank = resultHeadings(tongue).slice(2).map(() => null);
    const before = (sheet.table?.firstRow ?? 1) - 1;
    const head = Array.from({ length: before }, (_, i) => (i === before - 1 && sheet.table?.header ? text(resultHeadings(tongue)) : blank));
    return [...head, ...this.rows.map((row) => (row.state ? text(resultCells(row, tongue)) : blank))];
  }

  // -- what a person does ---------------------------------------------------

  /** Takes a text in; what was worked out belongs to the text before. */
  private take(text: string, said = ''): void {
    this.#beside.forget();
    this.put(new SheetText(text, this.columnMemory));
    this.said = said;
    this.fault = undefined;
  }

  private put(sheet: SheetText): void {
    this.running?.stop();
    this.running = undefined;
    this.rows = [];
    this.summed = undefined;
    this.stopped = false;
    this.from = 0;
    this.#giving.reset();
    this.#beside.reset();
    this.sheet = sheet;
  }

  private again({ chosen = this.sheet.chosen, mark = this.sheet.chosenMark, order = this.sheet.chosenOrder }: { chosen?: ReadonlyMap<number, ColumnUse>; mark?: DecimalMark | undefined; order?: DateOrder | undefined }): void {
    this.put(new SheetText(this.sheet.text, this.columnMemory, chosen, mark, order, this.sheet));
  }

  private correct(place: number, use: ColumnUse): void {
    this.again({ chosen: new Map([...this.sheet.chosen, [place, use]]) });
    if (!use.header) return;
    this.columnMemory = remember(this.columnMemory ?? EMPTY_MEMORY, use);
    this.dispatchEvent(new EsterwayColumnsChangeEvent(this.columnMemory));
  }

  private onInput(event: InputEvent): void {
    this.take((event.target as HTMLTextAreaElement).value);
  }

  /** A paste replaces what stands there: rows of two sheets are no sheet. */
  private onPaste(event: ClipboardEvent): void {
    const text = pastedText(event.clipboardData?.getData('text/plain') ?? '', event.clipboardData?.getData('text/html') ?? '');
    if (!text.trim()) return;
    event.preventDefault();
    this.take(text);
  }

  private onDrag(event: DragEvent): void {
    event.preventDefault();
    this.over = event.type === 'dragover';
  }

  private onDrop(event: DragEvent): void {
    event.preventDefault();
    this.over = false;
    const [file] = event.dataTransfer?.files ?? [];
    const text = pastedText(event.dataTransfer?.getData('text/plain') ?? '', event.dataTransfer?.getData('text/html') ?? '');
    if (file) void this.takeFile(file);
    else if (text.trim()) this.take(text);
  }

  private onChooseFile(): void {
    this.shadowRoot?.querySelector<HTMLInputElement>('#file')?.click();
  }

  private onFile(event: Event): void {
    const input = event.target as HTMLInputElement;
    const [file] = input.files ?? [];
    if (file) void this.takeFile(file);
    input.value = ''; // the same file may be chosen again
  }

  private async takeFile(file: File): Promise<void> {
    if (file.size > MOST_BYTES) {
      this.take('');
      this.put(new SheetText('', this.columnMemory));
      this.fault = 'too-large';
      return;
    }
    try {
      this.take(pastedText(textOfBytes(new Uint8Array(await file.arrayBuffer())), ''), file.name);
    } catch {
      this.fault = 'file';
    }
  }

  private onWork(): void {
    const { sheet } = this;
    const { table } = sheet;
    if (!table) return;
    this.rows = [];
    this.summed = undefined;
    this.stopped = false;
    const done: WorkedRow[] = [];
    const { site, reading } = this.desk;
    if ('faults' in reading) return;
    this.running = workRows({ table, columns: sheet.columns, mark: this.mark, dates: sheet.order, site }, sheet.text, {
      rows: (rows) => {
        done.push(...rows);
        this.rows = done;
        this.requestUpdate();
      },
      summary: (summary) => {
        this.running = undefined;
        this.rows = [...done];
        this.summed = summary;
      },
      failed: (error) => {
        this.running = undefined;
        this.said = fill(this.words.failed, { error });
      },
    });
  }

  private onStop(): void {
    this.running?.stop();
    this.running = undefined;
    this.stopped = true;
    this.rows = [...this.rows];
  }
}

/** Letters of a long text that the box shows; the rest is there, but a box of megabytes is slow. */
const SHOWN_TEXT = 200_000;

declare global {
  interface HTMLElementTagNameMap {
    'esterway-rows': EsterwayRows;
  }
}
