import { css, html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { property } from 'lit/decorators.js';
import type { RouteName } from '../../chemistry/route-name.js';
import type { ChargeLine, ChargeStep } from '../../decision/charge.js';
import { deChargeSheet } from '../../locales/de-charge-sheet.js';
import { fill } from '../../locales/fill.js';
import { enChargeSheet } from '../../locales/en-charge-sheet.js';
import { working } from '../../lot/working.js';
import type { Working } from '../../lot/working.js';
import { figureWriter } from '../parts/figure-writer.js';
import { printAlone } from '../parts/print.js';
import { ReasonWords } from '../parts/reason-words.js';
import { ChargeLines } from './charge-lines.js';
import { chargeStyles } from './charge-styles.js';

const TEXTS = { en: enChargeSheet, de: deChargeSheet };

/** The charge on paper: one page a step, to be weighed by, ticked off, checked by a second person and signed. */
export class ChargeSheet extends ChargeLines {
  static override styles = [
    ...ChargeLines.styles,
    chargeStyles,
    css`
      :host {
        --_size: 13px;
        padding: 0;
        background: #fff;
        color: #000;
        color-scheme: light;
      }
      .page {
        break-after: page;
        break-inside: avoid;
      }
      .page:last-child {
        break-after: auto;
      }
      .head {
        display: flex;
        justify-content: space-between;
        align-items: baseline;
        border-block-end: 2px solid #000;
        padding-block-end: 3px;
      }
      h1 {
        font-size: 1.5em;
        font-weight: 700;
      }
      .facts {
        display: grid;
        grid-template-columns: repeat(4, auto);
        gap: 1px 14px;
        margin-block: 6px;
        font-size: 0.95em;
      }
      .facts dt {
        color: #444;
      }
      .facts dd {
        text-align: start;
        overflow-wrap: anywhere;
      }
      .route {
        margin-block: 4px 6px;
      }
      .amounts {
        inline-size: 100%;
        border-collapse: collapse;
      }
      .amounts th {
        padding: 2px 6px;
        border-block-end: 1px solid #000;
        font-weight: 400;
        font-size: 0.88em;
        text-align: start;
      }
      .amounts td {
        padding: 4px 6px;
        border-block-end: 1px solid #bbb;
        vertical-align: top;
      }
      .amounts .right {
        text-align: end;
        white-space: nowrap;
      }
      .amounts b {
        font-size: 1.2em;
      }
      .box {
        display: block;
        inline-size: 1.2em;
        block-size: 1.2em;
        border: 1.4px solid #000;
      }
      .blank {
        inline-size: 7.5em;
      }
      .small {
        font-size: 0.86em;
      }
      .care {
        margin-block: 6px;
        padding: 4px 8px;
        border-color: #000;
        font-size: 0.88em;
      }
      .care b {
        color: #000;
      }
      .formulas {
        margin-block-start: 4px;
        font-size: 0.82em;
        line-height: 1.35;
        overflow-wrap: anywhere;
      }
      .formulas h2 {
        font-size: 1.1em;
        font-weight: 700;
      }
      .signatures {
        display: grid;
        grid-template-columns: 1fr 1fr;
        gap: 0 30px;
        margin-block: 18px 6px;
      }
      .signatures p {
        border-block-start: 1px solid #000;
        padding-block-start: 2px;
        font-size: 0.88em;
      }
    `,
  ];

  readonly #reasons = new ReasonWords({ texts: () => this.texts, tag: () => this.languageTag, reading: (key) => this.reading(key) });

  /** The route to print; the one that follows for the lot where it is left out. */
  @property() route: RouteName | undefined;

  /** Prints it, and nothing else of the page it is made on. */
  print(lang: string): Promise<void> {
    const { name } = this.entry;
    return printAlone(this, { title: [this.textsOf(TEXTS).title, name].filter(Boolean).join(' '), lang });
  }

  override get looked(): RouteName {
    return this.route ?? this.recommended;
  }

  protected override get heading(): string {
    return this.textsOf(TEXTS).title;
  }

  protected override body(): unknown {
    const steps = this.lot?.charges[this.looked] ?? [];
    return steps.map((step, i) => this.page(step, i, steps));
  }

  protected override figure(key: string): TemplateResult {
    return html`${this.amountWords(key) ?? '–'}`;
  }

  protected override render(): unknown {
    return this.lot ? this.body() : nothing;
  }

  private page(step: ChargeStep, index: number, all: readonly ChargeStep[]): TemplateResult {
    const texts = this.textsOf(TEXTS);
    const { entry, site } = this.desk;
    return html`<section class="page">
      <div class="head">
        <h1>${this.titleOf(step, all)}</h1>
        <span>${[site.name, entry.name, fill(texts.pageOf, { page: String(index + 1), pages: String(all.length) })].filter(Boolean).join(' · ')}</span>
      </div>
      ${this.facts()}
      <p class="route">${this.why()}</p>
      <table class="amounts">
        <thead>
          <tr><th>${texts.done}</th><th>${texts.what}</th><th class="right">${texts.amount}</th><th>${texts.charged}</th></tr>
        </thead>
        <tbody>${step.lines.map((line) => this.row(line, step))}</tbody>
      </table>
      ${this.cautionsOf(step)} ${this.formulas(step)}
      <div class="signatures">
        <p>${texts.chargedBy}: ${texts.signature}</p>
        <p>${texts.checkedBy}: ${texts.signature}</p>
      </div>
      <p class="small">${texts.defer}</p>
    </section>`;
  }

  private facts(): TemplateResult {
    const texts = this.textsOf(TEXTS);
    const { entry } = this.desk;
    const { result } = this.texts;
    const prefix = this.hasRetest ? 'retest.' : '';
    const counted = this.lot?.replicates[prefix ? 'retest' : 'lot'];
    const pm = (key: string): string => [this.amountWords(key), this.plusMinus(key)].filter(Boolean).join(' ');
    const measured = (key: string): string => (key in entry.figures ? (this.amountWords(key) ?? '–') : texts.notMeasured);
    const rows: readonly (readonly [string, unknown])[] = [
      [texts.source, entry.source ?? '–'], [texts.date, entry.date ?? '–'],
      [texts.oil, [this.amountWords('oilMass'), this.amountWords('oilVolume')].filter(Boolean).join(' · ')], [texts.water, measured('waterContent')],
      [result.acidValue, pm('acidValue')], [fill(result.ffa, { acid: this.optionText('referenceAcid') }), pm('freeFattyAcid')],
      [texts.titrated, counted?.runs ? this.runs(prefix) : texts.certificate], [texts.insolubles, measured('insolubles')],
      ...(prefix ? [[this.texts.charge.retestTitle, pm('retest.acidValue')], ['FFA', pm('retest.freeFattyAcid')]] as const : []),
    ];
    return html`<dl class="facts">${rows.map(([name, value]) => html`<dt>${name}</dt><dd>${value}</dd>`)}</dl>`;
  }

  /** The verdict with its reasons; and, where another route is charged, that it is. */
  private why(): TemplateResult {
    const { texts, lot } = this;
    const { verdict = 'not-known', safe, reasons = [] } = lot?.route ?? {};
    const gate = this.looked === this.recommended ? '' : `${texts.charge[this.looked]}: ${texts.charge.notThisRoute}`;
    return html`<b>${[texts.verdicts[verdict], safe && texts.verdicts[safe]].filter(Boolean).join('. ')}.</b> ${reasons.map((reason) => this.#reasons.sentence(reason)).join(' ')} <b>${gate}</b>`;
  }

  /** The runs as they were read. */
  private runs(prefix: '' | 'retest.'): string {
    const { desk, lot } = this;
    const list = prefix ? 'retestRuns' : 'runs';
    const cell = (run: number, name: string): string => this.number(this.reading(`${prefix}run${run}.${name}`)?.shown ?? '–');
    const unit = this.option('sampleTakenBy') === 'volume' ? 'mL' : 'g';
    const sample = unit === 'g' ? 'weighedMass' : 'sampleVolume';
    return desk.entry[list].flatMap((_, i) => {
      const struck = lot?.[list][i] === 'struck';
      const words = `${cell(i + 1, sample)} ${unit}: ${cell(i + 1, 'buretteStart')} – ${cell(i + 1, 'buretteEnd')} mL`;
      return lot?.[list][i] === 'counted' || struck ? [struck ? `(${words})` : words] : [];
    }).join('; ');
  }

  private row(line: ChargeLine, step: ChargeStep): TemplateResult {
    const texts = this.textsOf(TEXTS);
    const given = this.dispensedKey(line, step);
    const volume = this.volumeOf(line);
    const exact = [line.mass && this.amountWords(line.mass), volume].filter(Boolean).join(' · ');
    const amount = !line.mass
      ? nothing
      : given
        ? html`<b>${this.figure(given)}</b><div class="small">${texts.exactly} ${exact}</div>`
        : html`<b>${this.figure(line.mass)}</b><div class="small">${volume}</div>`;
    const timed = line.what === 'settle' || line.what === 'mix-methoxide';
    return html`<tr>
      <td><span class="box"></span></td>
      <td>${this.instruction(line, step)} ${line.mass ? html`<div class="small">${this.how(line, step)}${this.dispensed(line, step)}</div>` : nothing}</td>
      <td class="right">${amount}</td>
      <td class="blank small">${timed ? texts.hold : nothing}</td>
    </tr>`;
  }

  private volumeOf({ volume }: ChargeLine): string | undefined {
    return volume && this.aboveZero(volume) ? this.amountWords(volume) : undefined;
  }

  private cautionsOf({ cautions: codes }: ChargeStep): TemplateResult {
    const { cautions } = this.texts;
    return html`<div class="care"><b>${cautions.title}</b> ${codes.filter((code) => code !== 'defer').map((code) => cautions[code]).join(' ')}</div>`;
  }

  /** Each amount with its formula and the figures in it, to be worked out once more. */
  private formulas({ lines }: ChargeStep): TemplateResult {
    const { entry, site } = this.desk;
    const write = figureWriter(this.languageTag);
    const opened = new Map<string, Working>();
    // with what an amount is worked out from, two steps back
    const open = (key: string, back: number): void => {
      const shown = opened.get(key) ?? working(entry, site, key, write);
      // a figure handed on under another name, or one that is nothing, is nothing to work out
      if (!shown.formula || shown.formula.figures.text === shown.result || Number(this.reading(key)?.value) === 0) return;
      opened.set(key, shown);
      if (back) shown.rests.forEach((rest) => open(rest, back - 1));
    };
    for (const { what, mass } of lines) if (mass && !what.endsWith('oil') && this.known(mass)) open(mass, 2);
    const inOrder = Object.keys(this.lot?.readings ?? {}).flatMap((key) => opened.get(key) ?? []);
    const line = ({ symbol, formula, result }: Working): unknown =>
      formula && html`<p>${subscripted(`${symbol.text} = ${formula.general.text}`)} = ${formula.figures.text} = <b>${result}</b></p>`;
    return html`<div class="formulas">
      <h2>${this.textsOf(TEXTS).check}</h2>
      ${inOrder.map(line)}
    </div>`;
  }
}

/** `V_0` as it is set, its subscript below the line. */
const subscripted = (text: string): unknown => text.split(/_([^\s()^;]+)/).map((piece, i) => (i % 2 ? html`<sub>${piece}</sub>` : piece));

declare global {
  interface HTMLElementTagNameMap {
    'esterway-charge-sheet': ChargeSheet;
  }
}
