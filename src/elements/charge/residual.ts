import { css, html, svg } from 'lit';
import type { TemplateResult } from 'lit';
import { METHANOL_BOILS_AT } from '../../chemistry/methanol.js';
import { showNumber } from '../../exchange/number-format.js';
import { Decimal } from '../../formula/decimal.js';
import { shownText } from '../../formula/digits.js';
import { deResidual } from '../../locales/de-residual.js';
import { enResidual } from '../../locales/en-residual.js';
import { fill } from '../../locales/fill.js';
import { residualSeries } from '../../lot/residual-series.js';
import type { ResidualPass } from '../../lot/residual-series.js';
import { LotElement } from '../parts/base.js';
import { plotStyles, ticks } from '../parts/plot.js';
import { tokens } from '../parts/styles.js';

const TEXTS = { en: enResidual, de: deResidual };
const WIDTH = 260;
const HEIGHT = 150;
const LEFT = 30;
const TOP = 8;
const BOTTOM = 24;

/** The predicted residual acid over the passes of the acid step, as a band against the target. Stands in the charge. */
export class ResidualPlot extends LotElement {
  static override styles = [
    tokens,
    plotStyles,
    css`
      p {
        margin-block: 4px 0;
        font-size: 0.94em;
      }
    `,
  ];

  protected override render(): unknown {
    const texts = this.textsOf(TEXTS);
    const { entry, site } = this.desk;
    const series = residualSeries(entry, site);
    const target = this.reading('pretreatmentTarget');
    if (!series || target?.value === undefined) return html`<p class="quiet">${texts.lacking}</p>`;
    const first = series[0]?.points[0];
    const last = series.at(-1)?.points.at(-1);
    const time = endOf(series);
    const words = {
      start: this.share(first?.slow ?? 0), slow: this.share(last?.slow ?? 0), fast: this.share(last?.fast ?? 0), time: this.write(time, 0),
      target: showNumber(target.shown ?? target.value, this.languageTag), passes: String(series.length), boiling: showNumber(METHANOL_BOILS_AT, this.languageTag),
    };
    const reached = reaches(series, Number(target.value));
    return html`
      ${this.plot(series, Number(target.value), fill(series.length > 1 ? texts.labelPasses : texts.label, words))}
      <p>${fill(series.length > 1 ? texts.labelPasses : texts.label, words)} ${reached === undefined ? fill(texts.later, words) : fill(texts.sooner, { reached: this.write(reached, 0) })}</p>
      <p class="quiet">${texts.estimate}</p>
    `;
  }

  private write(value: number, decimals: number): string {
    return showNumber(shownText(new Decimal(value.toPrecision(12)), { decimals }), this.languageTag);
  }

  private share(value: number): string {
    return this.write(value, value < 10 ? 2 : 1);
  }

  private plot(series: readonly ResidualPass[], target: number, label: string): TemplateResult {
    const time = endOf(series);
    const most = Math.max(...series.flatMap(({ points }) => points.map(({ slow }) => slow)), target * 1.2);
    const x = (minutes: number): string => (LEFT + (minutes / time) * (WIDTH - LEFT - 6)).toFixed(1);
    const y = (share: number): string => (TOP + (1 - share / most) * (HEIGHT - TOP - BOTTOM)).toFixed(1);
    const line = (pass: Timed, end: 'slow' | 'fast'): string => pass.points.map((point) => `${x(pass.from + point.minutes)} ${y(point[end])}`).join(' L');
    const passes = timed(series);
    const { target: words } = this.textsOf(TEXTS);
    return html`<svg class="plot" viewBox="0 0 ${WIDTH} ${HEIGHT}" role="img" aria-label=${label}>
      ${passes.map((pass) => svg`<path class="band" d="M${line(pass, 'slow')} L${line({ ...pass, points: [...pass.points].reverse() }, 'fast')} Z" />`)}
      ${ticks(most, 4).map((share) => svg`<path class="grid" d="M${LEFT} ${y(share)} H${WIDTH - 6}" /><text class="end" x=${LEFT - 4} y=${Number(y(share)) + 4}>${this.write(share, share % 1 ? 1 : 0)}</text>`)}
      ${ticks(time, 4).map((minutes) => svg`<text class="middle" x=${x(minutes)} y=${HEIGHT - 10}>${this.write(minutes, 0)}</text>`)}
      <text class="end" x=${WIDTH - 6} y=${HEIGHT - 1}>min</text><text x="0" y="8">%</text>
      ${passes.slice(1).map(({ from }) => svg`<path class="grid" d="M${x(from)} ${TOP} V${HEIGHT - BOTTOM}" />`)}
      ${passes.map((pass) => svg`<path class="line" d="M${line(pass, 'slow')}" /><path class="line broken" d="M${line(pass, 'fast')}" />`)}
      <path class="limit" d="M${LEFT} ${y(target)} H${WIDTH - 6}" /><text class="limit-words end" x=${WIDTH - 8} y=${Number(y(target)) - 3}>${words}</text>
      <path class="axis" d="M${LEFT} ${TOP} V${HEIGHT - BOTTOM} H${WIDTH - 6}" />
    </svg>`;
  }
}

/** A pass with the time at which it begins. */
type Timed = ResidualPass & { readonly from: number };

function timed(series: readonly ResidualPass[]): readonly Timed[] {
  let from = 0;
  return series.map((pass) => {
    const begun = { ...pass, from };
    from += pass.points.at(-1)?.minutes ?? 0;
    return begun;
  });
}

const endOf = (series: readonly ResidualPass[]): number => timed(series).reduce((end, { from, points }) => Math.max(end, from + (points.at(-1)?.minutes ?? 0)), 0);

/** When the cautious end comes to the target, between two points; undefined where it does not. */
function reaches(series: readonly ResidualPass[], target: number): number | undefined {
  for (const { from, points } of timed(series)) {
    for (const [i, point] of points.entries()) {
      const before = points[i - 1];
      if (point.slow > target) continue;
      if (!before) return from + point.minutes;
      return from + before.minutes + ((before.slow - target) / (before.slow - point.slow)) * (point.minutes - before.minutes);
    }
  }
  return undefined;
}
