import { css, html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { property } from 'lit/decorators.js';
import type { RouteName } from '../../chemistry/route-name.js';
import { symbolMath } from '../../formula/working-mathml.js';
import type { MathNode } from '../../formula/working-mathml.js';
import { deSecondCheck } from '../../locales/de-second-check.js';
import { enSecondCheck } from '../../locales/en-second-check.js';
import { fill } from '../../locales/fill.js';
import { quantityName } from '../../locales/quantity-name.js';
import { checkSheet } from '../../lot/check-sheet.js';
import type { CheckedAmount } from '../../lot/check-sheet.js';
import type { Working } from '../../lot/working.js';
import { LotElement } from '../parts/base.js';
import { figureWriter } from '../parts/figure-writer.js';
import { tokens } from '../parts/styles.js';
import { mathElement } from './math.js';

const TEXTS = { en: enSecondCheck, de: deSecondCheck };

/**
 * The check sheet on paper: what is given, the formulas on the way, and each amount with its formula and an
 * empty line. The results are left out, since who has seen one finds it again.
 */
export class CheckSheetElement extends LotElement {
  static override styles = [
    tokens,
    css`
      :host {
        --_size: 12px;
        background: #fff;
        color: #000;
        color-scheme: light;
      }
      .head {
        display: flex;
        justify-content: space-between;
        align-items: baseline;
        gap: 16px;
        padding-block-end: 3px;
        border-block-end: 2px solid #000;
      }
      h1 {
        margin: 0;
        font-size: 1.5em;
      }
      h2 {
        margin-block: 10px 3px;
        font-size: 1.1em;
        break-after: avoid;
      }
      .intro {
        margin-block: 5px;
      }
      .list {
        columns: 2;
        column-gap: 24px;
        font-size: 0.92em;
      }
      .list li {
        display: flex;
        justify-content: space-between;
        gap: 8px;
        break-inside: avoid;
      }
      .list li > :last-child {
        flex: none;
        white-space: nowrap;
      }
      math {
        math-style: normal;
      }
      .steps li {
        flex-wrap: wrap;
        align-items: center;
        padding-block: 1px;
      }
      .steps li > :last-child {
        margin-inline-start: auto;
      }
      .amount {
        display: grid;
        grid-template-columns: minmax(0, 1fr) 12em;
        gap: 2px 20px;
        padding-block: 6px 4px;
        border-block-start: 1px solid #bbb;
        break-inside: avoid;
      }
      .amount b {
        grid-column: 1 / -1;
      }
      .figures {
        /* figures alone can wrap; symbols among them are set as a formula */
        margin-block-start: 3px;
        overflow-wrap: anywhere;
        font-size: 0.92em;
      }
      .blank {
        align-self: end;
        min-block-size: 2.2em;
        border-block-end: 1.2px solid #000;
        display: flex;
        align-items: end;
        justify-content: space-between;
      }
      .signatures {
        display: grid;
        grid-template-columns: 1fr 1fr;
        gap: 0 30px;
        margin-block: 38px 8px;
      }
      .end {
        break-before: avoid;
        break-inside: avoid;
      }
      .signatures p {
        padding-block-start: 2px;
        border-block-start: 1px solid #000;
      }
      .small {
        font-size: 0.88em;
      }
    `,
  ];

  @property() route: RouteName = 'direct';

  protected override render(): unknown {
    if (!this.lot) return nothing;
    const { sheet: words } = this.textsOf<typeof TEXTS.de>(TEXTS);
    const { texts } = this;
    const { entry, site } = this.desk;
    const write = figureWriter(this.languageTag);
    const { given, constants, steps, amounts } = checkSheet(entry, site, this.route, write);
    const facts = [[words.lot, entry.name], [words.from, entry.source], [words.date, entry.date]] as const;
    return html`
      <div class="head">
        <h1>${words.title}</h1>
        <span>${[site.name, texts.charge[this.route]].filter(Boolean).join(' · ')}</span>
      </div>
      <p class="intro">${facts.map(([name, value]) => html`${name}: <b>${value ?? '____________'}</b> &emsp;`)}</p>
      <p class="intro">${fill(words.intro, { section: texts.working.secondCheck })}</p>
      <h2>${words.given}</h2>
      <ul class="list">
        ${given.map(({ key, symbol, result }) => html`<li><span>${quantityName(key, texts)}</span><span>${mathElement(symbol.math)} = ${result}</span></li>`)}
        ${constants.map(({ symbol = '', value, unit }) => html`<li><span>${words.constant}</span><span>${symbolOf(symbol)} = ${write(value, unit)}</span></li>`)}
      </ul>
      <h2>${words.steps}</h2>
      <ul class="list steps">
        ${steps.map((step) => html`<li><span>${quantityName(step.key, texts)}</span><span>${formulaOf(step)}</span></li>`)}
      </ul>
      <h2>${words.amounts}</h2>
      ${amounts.map((amount) => this.amount(amount))}
      <div class="end">
        <div class="signatures">
          <p>${words.checkedBy}</p>
          <p>${words.signature}</p>
        </div>
        <p class="small">${texts.cautions.defer}</p>
      </div>
    `;
  }

  private amount({ working, figures }: CheckedAmount): TemplateResult {
    return html`<div class="amount">
      <b>${quantityName(working.key, this.texts)}</b>
      <div>
        <div>${formulaOf(working)}</div>
        ${figures.text === working.formula?.general.text ? nothing : html`<p class="figures">${figures.text.includes('_') ? mathElement(equation([], figures.math)) : `= ${figures.text}`}</p>`}
      </div>
      <div class="blank"><span>=</span><span>${working.unit}</span></div>
    </div>`;
  }
}

const inside = ({ content }: MathNode): readonly MathNode[] => (typeof content === 'string' ? [] : content);
const equation = (left: readonly MathNode[], right: MathNode): MathNode => ({ tag: 'math', content: [{ tag: 'mrow', content: [...left, { tag: 'mo', content: '=' }, ...inside(right)] }] });
const formulaOf = ({ symbol, formula }: Working): unknown => (formula ? mathElement(equation(inside(symbol.math), formula.general.math)) : nothing);
const symbolOf = (symbol: string): Element => mathElement({ tag: 'math', content: [symbolMath(symbol)] });

declare global {
  interface HTMLElementTagNameMap {
    'esterway-check-sheet': CheckSheetElement;
  }
}
