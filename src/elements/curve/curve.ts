import { css, html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { property, state } from 'lit/decorators.js';
import { live } from 'lit/directives/live.js';
import type { CurveRefusal } from '../../decision/titration-curve/codes.js';
import type { CurveKind } from '../../decision/titration-curve/points.js';
import { readCurve } from '../../decision/titration-curve/titration-curve.js';
import type { CurveReading } from '../../decision/titration-curve/titration-curve.js';
import { readCurveText } from '../../exchange/curve-text.js';
import type { CurveText, LineFault } from '../../exchange/curve-text.js';
import { decimalMark } from '../../exchange/number-format.js';
import { Decimal } from '../../formula/decimal.js';
import { deCurve } from '../../locales/de-curve.js';
import type { Widened } from '../../locales/en.js';
import { enCurve } from '../../locales/en-curve.js';
import { MOST_RUNS } from '../../lot/check.js';
import type { RunEntry } from '../../lot/entry.js';
import { fieldStyles } from '../parts/field-styles.js';
import type { OptionInputEvent } from '../parts/option-field.js';
import { plotStyles } from '../parts/plot.js';
import { SectionElement } from '../parts/section.js';
import { curveStyles } from './plot.js';
import { curveFigure, curveResult, put } from './result.js';

const TEXTS = { en: enCurve, de: deCurve };
/** Lines told one by one; with more of them the columns are wrong, not the lines. */
const MOST_FAULTS = 5;
const MOST_MEGABYTES = 5;

/**
 * Reads the end point of a titration curve, for oils too dark for an indicator: points pasted or dropped
 * from a recorder, the curve drawn, the end point by its inflection with Gran's method as a check, and
 * given to a run as its end.
 *
 * @element esterway-curve
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {boolean} retest - serves the titration after the acid step, in place of that of the oil as it came
 *
 * @fires {EsterwayChangeEvent} esterway-change - a person gave the end point to a run (only where the element holds the lot itself)
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart result - the end point and what it rests on
 * @csspart action - the button that gives it to a run
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 */
export class EsterwayCurve extends SectionElement {
  static override styles = [
    ...SectionElement.styles,
    fieldStyles,
    plotStyles,
    curveStyles,
    css`
      textarea {
        display: block;
        inline-size: 100%;
        min-block-size: 8em;
        margin-block: 2px 8px;
        padding: 6px;
        border: 1.5px solid var(--_glass);
        border-radius: 0;
        background: transparent;
        color: inherit;
        font: inherit;
        tab-size: 6;
        resize: vertical;
      }
      textarea:focus,
      textarea.over {
        border-color: var(--_pink);
        background: var(--_pink-soft);
      }
      .result > *,
      .give,
      .fields {
        margin-block-start: 8px;
      }
      .give .small {
        margin-block-end: 4px;
      }
      .problem {
        overflow-wrap: anywhere;
      }
      @media print {
        textarea {
          display: none;
        }
      }
    `,
  ];

  @property({ type: Boolean, reflect: true }) retest = false;

  /** As pasted; kept whatever is made of it. */
  @state() private text = '';
  /** As chosen; else as the heading has it, else as the figures look. */
  @state() private chosenKind: CurveKind | undefined;
  /** Place of the run in its list. */
  @state() private chosenRun: number | undefined;
  /** What went wrong with a file. */
  @state() private said = '';
  /** The run that was fed last, and the end it got. */
  @state() private fed: { readonly index: number; readonly end: string } | undefined;
  @state() private over = false;

  #pasted: CurveText = { points: [], faults: [] };
  #kind: CurveKind = 'pH';
  #curve: CurveReading | CurveRefusal | undefined;
  #readFor = '';

  protected override get heading(): string {
    return this.retest ? this.words.ofRetest : this.words.heading;
  }

  protected override get summary(): string {
    this.read();
    if (!this.#curve) return '';
    return 'refused' in this.#curve ? this.words.none : put(this.words.summary, { end: this.number(curveFigure(this.#curve.endPoint)) });
  }

  private get words(): Widened<typeof enCurve> {
    return this.textsOf(TEXTS);
  }

  private get list(): 'runs' | 'retestRuns' {
    return this.retest ? 'retestRuns' : 'runs';
  }

  /** The run that is fed: the one chosen, else the first that has no end. */
  private get run(): number {
    const runs = this.desk.entry[this.list];
    const open = runs.findIndex(({ end, struck }) => !end && struck === undefined);
    return Math.min(this.chosenRun ?? (open < 0 ? runs.length : open), runs.length, MOST_RUNS - 1);
  }

  /** Reads the text anew where it, its kind or the language is another. */
  private read(): void {
    const mark = decimalMark(this.languageTag);
    const readFor = `${mark}${this.chosenKind ?? ''}:${this.text}`;
    if (readFor === this.#readFor) return;
    this.#readFor = readFor;
    this.#pasted = readCurveText(this.text, mark);
    const { points, kind } = this.#pasted;
    this.#kind = this.chosenKind ?? kind ?? (points.every(({ reading }) => reading >= 0 && reading <= 14) ? 'pH' : 'potential');
    this.#curve = this.text.trim() ? readCurve(points, this.#kind) : undefined;
  }

  protected override body(): unknown {
    this.read();
    const { words: texts, texts: { field } } = this;
    const runs = Array.from({ length: Math.min(this.desk.entry[this.list].length + 1, MOST_RUNS) }, (_, at) => {
      const words = at < this.desk.entry[this.list].length ? field.run : texts.newRun;
      return [String(at), put(words, { run: String(at + 1) })] as const;
    });
    return html`
      <label class="no-print" for="points">${texts.points}</label>
      <textarea
        id="points"
        class=${this.over ? 'over' : ''}
        aria-describedby="hint faults"
        autocomplete="off"
        spellcheck="false"
        .value=${live(this.text)}
        @input=${this.onInput}
        @dragover=${this.onDrag}
        @dragleave=${this.onDrag}
        @drop=${this.onDrop}
      ></textarea>
      <p class="note no-print" id="hint">${texts.hint}</p>
      <div id="faults">${this.faults()}</div>
      <div class="fields no-print">
        <esterway-option
          exportparts="line: field-line, input: field-input"
          .label=${texts.kind}
          .options=${Object.entries(texts.kinds)}
          .value=${this.#kind}
          @option-input=${({ option }: OptionInputEvent) => (this.chosenKind = option as CurveKind)}
        ></esterway-option>
        <esterway-option
          class="wide"
          exportparts="line: field-line, input: field-input"
          .label=${texts.run}
          .options=${runs}
          .value=${String(this.run)}
          @option-input=${({ option }: OptionInputEvent) => (this.chosenRun = Number(option))}
        ></esterway-option>
      </div>
      <div class="result" part="result">${curveResult(this.#curve, { texts, tag: this.languageTag, kind: this.#kind })}</div>
      ${this.give()}
      <p class="note" role="status">${this.said || this.done()}</p>
    `;
  }

  // -- what was made of it --------------------------------------------------

  /** The lines that could not be read, each with its reason. */
  private faults(): unknown {
    const { faults, points } = this.#pasted;
    if (!faults.length) return nothing;
    const { line, moreLines, otherLines } = this.words;
    const told = faults.slice(0, MOST_FAULTS).map((fault) => html`<p class="problem">${put(line, { line: String(fault.line), problem: this.faultText(fault) })}</p>`);
    const more = faults.length > MOST_FAULTS ? put(moreLines, { lines: String(faults.length - MOST_FAULTS) }) : '';
    return html`${told} <p class="note">${more} ${points.length ? otherLines : nothing}</p>`;
  }

  private faultText({ code, typed }: LineFault): string {
    const short = typed.replace(/\s+/g, ' ');
    const params = { typed: short.length > 40 ? `${short.slice(0, 39)}…` : short };
    const own = (this.words.lines as Readonly<Record<string, string>>)[code];
    return own ? put(own, params) : this.problemText({ code, quantity: 'curve', params });
  }

  // -- giving it to a run ---------------------------------------------------

  private give(): TemplateResult | typeof nothing {
    const curve = this.#curve;
    if (!curve || 'refused' in curve) return nothing;
    const { use, willBe, replaces } = this.words;
    const run = String(this.run + 1);
    const there = this.desk.entry[this.list][this.run]?.end;
    const { start, end } = filled(this.desk.entry[this.list][this.run], curve);
    const before = there && 'text' in there && there.text !== end ? there.text : undefined;
    const typed = (text: string): string => this.number(text);
    return html`<div class="give no-print">
      <p class="small">
        ${put(willBe, { run, start: typed(start), end: typed(end) })} ${before === undefined ? nothing : put(replaces, { before: typed(before) })}
      </p>
      <button class="action main" part="action" type="button" @click=${() => this.use(curve)}>${put(use, { run })}</button>
    </div>`;
  }

  private use(curve: CurveReading): void {
    const index = this.run;
    const there = this.desk.entry[this.list][index];
    const { start, end } = filled(there, curve);
    this.chosenRun = index;
    this.fed = { index, end };
    // both cells, so that it is a step of its own that can be taken back
    this.edit({
      kind: 'cells',
      list: this.list,
      cells: [{ index, cell: 'start', figure: there?.start ?? { text: start, unit: 'mL' } }, { index, cell: 'end', figure: { text: end, unit: 'mL' } }],
    });
  }

  /** What was last done, as long as it stands. */
  private done(): string {
    const { index, end } = this.fed ?? { index: -1, end: '' };
    const there = this.desk.entry[this.list][index]?.end;
    return there && 'text' in there && there.text === end ? put(this.words.used, { run: String(index + 1), end: this.number(end) }) : '';
  }

  // -- text coming in -------------------------------------------------------

  private take(text: string): void {
    this.text = text;
    this.said = '';
    this.fed = undefined;
  }

  private onInput(event: InputEvent): void {
    this.take((event.target as HTMLTextAreaElement).value);
  }

  private onDrag(event: DragEvent): void {
    this.over = event.type === 'dragover' && !!event.dataTransfer?.types.includes('Files');
    if (this.over) event.preventDefault();
  }

  private async onDrop(event: DragEvent): Promise<void> {
    this.over = false;
    const file = event.dataTransfer?.files[0];
    if (!file) return; // dragged text is the field's own to take
    event.preventDefault();
    if (file.size > MOST_MEGABYTES * 1e6) this.said = put(this.words.tooLarge, { most: String(MOST_MEGABYTES) });
    else this.take(await file.text());
  }
}

/**
 * Start and end that a run gets. A burette that stood above zero when the curve began was read itself
 * where the curve begins no lower; else the curve counts from its start.
 */
function filled(run: RunEntry | undefined, { endPoint, points }: CurveReading): { readonly start: string; readonly end: string } {
  const start = run?.start && 'text' in run.start ? run.start.text : '0.00';
  const counted = (points[0]?.volume ?? 0) < Number(start);
  return { start, end: counted ? new Decimal(curveFigure(endPoint)).plus(start).toFixed(2) : curveFigure(endPoint) };
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-curve': EsterwayCurve;
  }
}
