import { html } from 'lit';
import type { TemplateResult } from 'lit';
import { fill } from '../../locales/fill.js';
import type { Texts } from '../../locales/en.js';
import type { LotFaults } from '../../lot/lot-reading.js';

/** Why a lot or a site profile cannot be read as a document, in place of what it would show. */
export function faultsBox({ faults }: LotFaults, texts: Texts): TemplateResult {
  const words: Readonly<Record<string, string>> = texts.faults;
  return html`<div class="gate fault" role="alert">
    <b>${texts.faults.title}</b>
    ${faults.map(({ code, path, found = '' }) => html`<p>${fill(words[code] ?? code, { path, found })}</p>`)}
  </div>`;
}
