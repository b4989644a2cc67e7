import { html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { changesBetween } from '../../book/changes.js';
import type { LotRecord } from '../../book/record.js';
import { fill } from '../../locales/fill.js';
import { changeWords, figureWords, lotName, momentWords, stateWords } from './book-words.js';
import type { BookTongue } from './book-words.js';

/** What two versions have otherwise, a line each. */
export function changeList(before: Pick<LotRecord, 'entry' | 'site'>, after: Pick<LotRecord, 'entry' | 'site'>, tongue: BookTongue): TemplateResult {
  return html`<ul class="changes small">
    ${changesBetween(before, after).map((change) => html`<li>${changeWords(change, tongue)}</li>`)}
  </ul>`;
}

/** The versions of a lot, the first kept first, each with what changed in it. */
export function versionList(versions: readonly LotRecord[], tongue: BookTongue, open: (version: LotRecord) => void): TemplateResult {
  const { words } = tongue;
  const [first] = versions;
  const twice = versions.find(({ number }, index) => number === versions[index - 1]?.number);
  return html`
    ${twice ? html`<p class="gate small">${fill(words.twice, { number: String(twice.number) })}</p>` : nothing}
    <ol class="versions" aria-label=${first ? fill(words.versions, { name: lotName(first, tongue) }) : nothing}>
      ${versions.map((version, index) => html`<li>${oneVersion(version, versions[index - 1], tongue)} ${openButton(version, versions, tongue, open)}</li>`)}
    </ol>
  `;
}

function oneVersion(version: LotRecord, before: LotRecord | undefined, tongue: BookTongue): TemplateResult {
  const { words } = tongue;
  const when = momentWords(version.keptAt, tongue);
  const kept = version.by === undefined ? fill(words.keptAt, { when }) : fill(words.keptAtBy, { when, by: version.by });
  return html`
    <p><b>${fill(words.version, { number: String(version.number) })}</b> <span class="small quiet">${kept}</span></p>
    <p class="small">${[...figureWords(version, tongue), stateWords(version.summary.state, tongue)].join(' · ')}</p>
    ${version.reason === undefined ? nothing : html`<p>${fill(words.quoted, { text: version.reason })}</p>`}
    ${before ? html`<p class="small quiet">${words.changed}</p>${changeList(before, version, tongue)}` : nothing}
  `;
}

function openButton(version: LotRecord, versions: readonly LotRecord[], { words }: BookTongue, open: (version: LotRecord) => void): TemplateResult {
  const label = versions.length === 1 ? words.open : fill(words.openVersion, { number: String(version.number) });
  return html`<div class="actions no-print"><button class="action" part="action" type="button" @click=${() => open(version)}>${label}</button></div>`;
}
