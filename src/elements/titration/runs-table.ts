import { css, html, nothing } from 'lit';
import type { CSSResult, ReactiveController, ReactiveControllerHost, TemplateResult } from 'lit';
import { decimalMark, showNumber } from '../../exchange/number-format.js';
import { readNumber } from '../../exchange/number-text.js';
import { fill } from '../../locales/fill.js';
import type { Texts } from '../../locales/en.js';
import type { CellEdit, Edit, RunCell } from '../../lot/edit.js';
import type { RunEntry } from '../../lot/entry.js';
import type { Figure } from '../../lot/figure.js';
import type { RunList } from '../../lot/keys.js';
import { runState } from '../../lot/runs.js';
import { FigureField, readFigureText } from '../parts/figure-field.js';
import type { FigureInputEvent, FigurePasteEvent } from '../parts/figure-field.js';

/** What the table needs of the section around it. */
export interface RunsTableHost {
  runs(): readonly RunEntry[];
  texts(): Texts;
  tag(): string;
  /** A figure without its unit. */
  figure(key: string): TemplateResult;
  problemAt(field: string): string | undefined;
  edit(edit: Edit): void;
}

const CELLS: readonly RunCell[] = ['sample', 'start', 'end'];
const MOST_RUNS = 20;
const PREFIXES = { runs: '', retestRuns: 'retest.', titrantRuns: 'titrant.' } as const;
const CAPTIONS = {
  runs: ({ runs }: Texts) => runs.caption, retestRuns: ({ runs }: Texts) => runs.ofRetest, titrantRuns: ({ runs }: Texts) => runs.ofTitrant,
} as const;

/** The runs as a small sheet: Enter goes on, the arrows change the row, rows can be pasted. */
export class RunsTable implements ReactiveController {
  static readonly styles: CSSResult = css`
    table {
      inline-size: 100%;
      margin-block-start: 10px;
      border-collapse: collapse;
      table-layout: fixed;
    }
    th {
      padding: 0 2px 3px;
      border-block-end: 1px solid var(--_rule);
      color: var(--_quiet);
      font-weight: 400;
      font-size: 0.86em;
      text-align: end;
      vertical-align: bottom;
    }
    th:first-child,
    td:first-child {
      inline-size: 2.4em;
      text-align: start;
    }
    th:last-child,
    td:last-child {
      inline-size: 3.4em;
    }
    td {
      padding: 0 2px;
      text-align: end;
    }
    .titrantRuns th:first-child {
      inline-size: 1.5em;
    }
    .titrantRuns th:last-child {
      inline-size: 5em;
    }
    @container (max-width: 290px) {
      th,
      td {
        padding-inline: 1px;
      }
      th:last-child {
        inline-size: 3.1em;
      }
    }
    .run {
      inline-size: 100%;
      min-block-size: var(--_target);
      padding: 0;
      background: none;
      border: 0;
      text-align: start;
      text-decoration: underline dotted 1px var(--_glass);
      text-underline-offset: 0.25em;
    }
    tr.struck esterway-figure,
    tr.struck .figure {
      opacity: 0.75;
      text-decoration: line-through;
    }
    td.said {
      padding: 2px 0 6px;
      text-align: start;
    }
    .problem {
      padding-inline-start: 7px;
      border-inline-start: 3px solid var(--_pink);
      color: var(--_pink);
      font-size: 0.92em;
    }
    @media print {
      .run {
        min-block-size: 0;
        text-decoration: none;
      }
    }
    .strike {
      display: flex;
      flex-wrap: wrap;
      gap: 6px;
    }
    .hint {
      margin-block-start: 4px;
      color: var(--_quiet);
      font-size: 0.86em;
    }
  `;

  readonly #host: ReactiveControllerHost & HTMLElement;
  readonly #section: RunsTableHost;
  /** Which run's striking out is open. */
  #open: number | undefined;
  /** The cell being typed in, `0.end`: what is wrong with it is said when it is left. */
  #typing = '';

  constructor(host: ReactiveControllerHost & HTMLElement, section: RunsTableHost) {
    this.#host = host;
    this.#section = section;
    host.addController(this);
  }

  hostDisconnected(): void {
    this.#open = undefined;
  }

  render(list: RunList, sampleUnit: 'g' | 'mL'): TemplateResult {
    const texts = this.#section.texts();
    const runs = this.#section.runs();
    // one empty row at the end to type the next run in
    const rows = runs.length < MOST_RUNS ? [...runs, {}] : runs;
    return html`
      <table class=${list} @keydown=${{ handleEvent: (event: KeyboardEvent) => this.#onKeydown(event, rows), capture: true }} @focusout=${this.#onLeave}>
        <caption class="unseen">
          ${CAPTIONS[list](texts)}
        </caption>
        <thead>
          <tr>
            <th scope="col">${texts.runs.run}</th>
            <th scope="col">${list === 'titrantRuns' ? texts.runs.standard : texts.fields.sample} <span class="unit">${sampleUnit}</span></th>
            <th scope="col">${texts.fields.start} <span class="unit">mL</span></th>
            <th scope="col">${texts.fields.end} <span class="unit">mL</span></th>
            <th scope="col">${list === 'titrantRuns' ? html`c <span class="unit">mol/L</span>` : texts.runs.acidValue}</th>
          </tr>
        </thead>
        <tbody>
          ${rows.map((run, index) => this.#row(list, run, index, sampleUnit))}
        </tbody>
      </table>
      ${list === 'runs' ? html`<p class="hint no-print">${texts.runs.hint}</p>` : nothing}
    `;
  }

  #row(list: RunList, run: RunEntry, index: number, sampleUnit: string): TemplateResult {
    const texts = this.#section.texts();
    const key = `${PREFIXES[list]}run${index + 1}`;
    const number = String(index + 1);
    const state = runState(run);
    const left = CELLS.filter((cell) => `${index}.${cell}` !== this.#typing);
    const problems = left.map((cell) => this.#section.problemAt(`${key}.${cell}`)).filter((text) => text !== undefined);
    const open = this.#open === index;
    return html`
      <tr class=${state}>
        <td>
          ${state === 'empty'
            ? number
            : html`<button class="run" type="button" aria-expanded=${open ? 'true' : 'false'}
                aria-label=${fill(state === 'struck' ? texts.runs.restore : texts.runs.strike, { run: number })} @click=${() => this.#toggle(list, index, run)}>${number}</button>`}
        </td>
        ${CELLS.map(
          (cell) => html`<td>
            <esterway-figure
              cell
              data-row=${index}
              data-cell=${cell}
              .label=${fill(texts.field.cellOf, { run: number, cell: texts.fields[cell] })}
              .figure=${run[cell]}
              .units=${[cell === 'sample' ? sampleUnit : 'mL']}
              .problem=${this.#section.problemAt(`${key}.${cell}`)}
              @figure-input=${(event: FigureInputEvent) => this.#onInput(event, list, index, cell)}
              @figure-paste=${(event: FigurePasteEvent) => this.#onPaste(event, list, index, cell, sampleUnit)}
            ></esterway-figure>
          </td>`,
        )}
        <td>${state === 'empty' || state === 'incomplete' ? nothing : this.#section.figure(`${key}.${list === 'titrantRuns' ? 'concentration' : 'acidValue'}`)}</td>
      </tr>
      ${problems.length || open || run.struck !== undefined
        ? html`<tr>
            <td class="said" colspan="5">
              ${[...new Set(problems)].map((text) => html`<p class="problem">${text}</p>`)} ${left.map((cell) => this.#meanings(list, index, cell, run[cell]))}
              ${run.struck !== undefined ? html`<p class="quiet small">${fill(texts.runs.struck, { reason: run.struck })}</p>` : nothing}
              ${open ? this.#reasons(list, index) : nothing}
            </td>
          </tr>`
        : nothing}
    `;
  }

  /** A run is struck out with a reason; it stays in sight. */
  #reasons(list: RunList, index: number): TemplateResult {
    const { runs } = this.#section.texts();
    return html`
      <p class="small">${runs.strikeReason}</p>
      <div class="strike">
        ${[...runs.strikeReasons, runs.otherReason].map(
          (reason) => html`<button class="action" type="button" @click=${() => this.#strike(list, index, reason)}>${reason}</button>`,
        )}
      </div>
    `;
  }

  #toggle(list: RunList, index: number, run: RunEntry): void {
    if (run.struck !== undefined) return this.#strike(list, index, undefined);
    this.#open = this.#open === index ? undefined : index;
    this.#host.requestUpdate();
  }

  #strike(list: RunList, index: number, reason: string | undefined): void {
    this.#open = undefined;
    this.#section.edit({ kind: 'strike', list, index, reason });
    this.#host.requestUpdate();
  }

  /** For a figure that could mean two things: both, to choose from. */
  #meanings(list: RunList, index: number, cell: RunCell, figure: Figure | undefined): unknown {
    if (!figure || !('doubt' in figure)) return nothing;
    const tag = this.#section.tag();
    const read = readNumber(figure.typed, decimalMark(tag));
    if (!('doubt' in read) || !read.readings) return nothing;
    return html`<div class="strike">
      ${read.readings.map(
        (text) => html`<button class="action" type="button" @click=${() => this.#put(list, [{ index, cell, figure: { text, unit: figure.unit } }])}>${showNumber(text, tag)}</button>`,
      )}
    </div>`;
  }

  #onInput({ figure }: FigureInputEvent, list: RunList, index: number, cell: RunCell): void {
    this.#typing = `${index}.${cell}`;
    this.#put(list, [{ index, cell, figure }]);
  }

  readonly #onLeave = (): void => {
    if (!this.#typing) return;
    this.#typing = '';
    this.#host.requestUpdate();
  };

  #put(list: RunList, cells: readonly CellEdit[]): void {
    this.#section.edit({ kind: 'cells', list, cells });
  }

  #onPaste(event: FigurePasteEvent, list: RunList, index: number, cell: RunCell, sampleUnit: string): void {
    event.preventDefault();
    const mark = decimalMark(this.#section.tag());
    const first = CELLS.indexOf(cell);
    const cells = event.rows.flatMap((row, down) =>
      row.flatMap((typed, right): CellEdit[] => {
        const into = CELLS[first + right];
        if (!into || index + down >= MOST_RUNS) return [];
        return [{ index: index + down, cell: into, figure: readFigureText(typed, mark, into === 'sample' ? sampleUnit : 'mL') }];
      }),
    );
    this.#put(list, cells);
  }

  #onKeydown(event: KeyboardEvent, rows: readonly RunEntry[]): void {
    const field = event.target;
    if (!(field instanceof FigureField)) return;
    const row = Number(field.dataset['row']);
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      const next = this.#cell(row + (event.key === 'ArrowDown' ? 1 : -1), field.dataset['cell'] ?? '');
      if (!next) return;
      event.preventDefault();
      next.focus();
    } else if (event.key === 'Enter' && !event.shiftKey && row === rows.length - 1 && runState(rows[row] ?? {}) === 'empty') {
      // the empty row at the end: the runs are done
      event.preventDefault();
      event.stopPropagation();
      this.#cell(row, 'end')?.leave(1);
    }
  }

  #cell(row: number, cell: string): FigureField | null {
    return this.#host.shadowRoot?.querySelector<FigureField>(`[data-row='${row}'][data-cell='${cell}']`) ?? null;
  }
}
