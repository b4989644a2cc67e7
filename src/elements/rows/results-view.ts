import { html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import type { RowsSummary, WorkedRow } from '../../exchange/table/worked-rows.js';
import { fill } from '../../locales/fill.js';
import type { ResultTongue } from './result-cells.js';

/** How many rows came to what: by state, and by problem. */
export function countsView({ states, problems }: RowsSummary, tongue: ResultTongue, sentences: Readonly<Record<string, string>>): TemplateResult {
  const { words } = tongue;
  const own = words.problems as Readonly<Record<string, string>>;
  const line = (name: string, count: number): TemplateResult => html`<dt>${name}</dt><dd>${fill(words.count, { n: String(count) })}</dd>`;
  const found = Object.entries(states).filter(([, count]) => count);
  const problem = (code: string): string => fill(code === 'missing' ? words.missing : (own[code] ?? sentences[code] ?? code), { typed: '…', unit: '…', needed: '…', bound: '…' });
  return html`
    <h4>${words.states}</h4>
    <dl>${found.map(([state, count]) => line(tongue.states[state as keyof typeof states], count))}</dl>
    ${Object.keys(problems).length ? html`<h4>${words.byProblem}</h4><dl>${Object.entries(problems).map(([code, count]) => line(problem(code), count))}</dl>` : nothing}
  `;
}

/** A row worked out: what it is called and what becomes of it, its figures, and why something is not known. */
export function rowView(row: WorkedRow, { words, states, why }: ResultTongue, number: (text: string) => string): TemplateResult {
  const { name, freeFattyAcid, plusMinus, acidValue, route, catalyst, methanol } = row;
  const figures = [
    freeFattyAcid !== undefined && `FFA ${number(freeFattyAcid)}${plusMinus === undefined ? '' : ` ± ${number(plusMinus)}`}\u00a0%`,
    acidValue !== undefined && `${number(acidValue)}\u00a0mg/g`, route && words.routes[route],
    catalyst !== undefined && methanol !== undefined && fill(words.charge, { catalyst: number(catalyst), methanol: number(methanol) }),
  ].filter(Boolean);
  const unknown = why(row);
  return html`<div class="row">
    <p class="top"><b>${row.row} ${name ? html`· ${name}` : nothing}</b><span>${row.state ? states[row.state] : ''}</span></p>
    ${figures.length ? html`<p class="note">${figures.join(' · ')}</p>` : nothing} ${unknown ? html`<p class="problem">${unknown}</p>` : nothing}
  </div>`;
}
