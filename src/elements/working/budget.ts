import { css, html, nothing, svg } from 'lit';
import type { CSSResult, TemplateResult } from 'lit';
import { showNumber } from '../../exchange/number-format.js';
import { Decimal } from '../../formula/decimal.js';
import { shownText } from '../../formula/digits.js';
import { fill } from '../../locales/fill.js';
import type { Texts } from '../../locales/en.js';
import { sourceName } from '../../locales/quantity-name.js';
import type { Budget } from '../../lot/uncertainty.js';

/** Sources below this share of the variance are told together in one line. */
const LEAST_SHARE = new Decimal('0.005');

/** The ± of a figure and what it is made of, largest first: bars for the eye, figures for the calculator. */
export function budgetView({ u, expanded, budget }: Budget, unit: string, texts: Texts, tag: string, open: (key: string) => void): TemplateResult {
  const words = texts.budget;
  const figure = (value: string): string => `${showNumber(shownText(new Decimal(value), { significant: 2 }), tag)}\u00a0${unit}`.trim();
  const large = budget.filter(({ share }) => new Decimal(share).gte(LEAST_SHARE));
  const small = budget.length - large.length;
  return html`
    <div class="budget">
      <p><b>± ${figure(expanded)}</b> <span class="quiet small">${fill(words.combined, { u: figure(u) })}</span></p>
      ${large.length
        ? html`<table>
            <caption class="small quiet">
              ${words.caption}
            </caption>
            <thead class="unseen">
              <tr>
                <th scope="col">${words.source}</th>
                <th scope="col">${words.share}</th>
                <th scope="col">${words.alone}</th>
              </tr>
            </thead>
            <tbody>
              ${large.map(
                (line) => html`<tr>
                  <th scope="row"><button class="open" type="button" @click=${() => open(line.source)}>${sourceName(line.source, texts)}</button>${bar(Number(line.share))}</th>
                  <td>${showNumber(shownText(new Decimal(line.share).times(100), { decimals: 0 }), tag)}\u00a0%</td>
                  <td class="quiet">${figure(line.u)}</td>
                </tr>`,
              )}
            </tbody>
          </table>`
        : nothing}
      ${small ? html`<p class="small quiet">${fill(small === 1 ? words.oneMore : words.more, { sources: String(small) })}</p>` : nothing}
    </div>
  `;
}

const bar = (share: number): TemplateResult => svg`<svg class="bar" viewBox="0 0 100 6" preserveAspectRatio="none" aria-hidden="true"><rect class="whole" width="100" height="6" /><rect class="part" width=${Math.max(0.5, share * 100)} height="6" /></svg>`;

export const budgetStyles: CSSResult = css`
  .budget {
    margin-block: 10px 6px;
    padding-block-start: 6px;
    border-block-start: 1px solid var(--_rule);
  }
  .budget table {
    inline-size: 100%;
    border-collapse: collapse;
    font-size: 0.94em;
  }
  .budget caption {
    text-align: start;
  }
  .budget th {
    inline-size: 100%;
    font-weight: 400;
    text-align: start;
  }
  .budget th button {
    overflow-wrap: anywhere;
    hyphens: auto;
    min-block-size: var(--_target);
    text-align: start;
  }
  .budget td {
    padding-inline-start: 10px;
    text-align: end;
    white-space: nowrap;
    font-variant-numeric: tabular-nums;
  }
  .bar {
    display: block;
    inline-size: 100%;
    block-size: 6px;
    margin-block-end: 3px;
  }
  .bar .whole {
    fill: var(--_faint);
  }
  .bar .part {
    fill: var(--_glass);
  }
  tr:first-child .bar .part {
    fill: var(--_amber);
  }
  @media (forced-colors: active) {
    .bar .whole {
      fill: none;
      stroke: CanvasText;
    }
    .bar .part,
    tr:first-child .bar .part {
      fill: CanvasText;
    }
  }
`;
