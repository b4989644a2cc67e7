import { html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import type { CurveRefusal, CurveRemark } from '../../decision/titration-curve/codes.js';
import type { Gran } from '../../decision/titration-curve/gran.js';
import type { CurveKind } from '../../decision/titration-curve/points.js';
import type { CurveReading } from '../../decision/titration-curve/titration-curve.js';
import { showNumber } from '../../exchange/number-format.js';
import { Decimal } from '../../formula/decimal.js';
import { shownText } from '../../formula/digits.js';
import { fill } from '../../locales/fill.js';
import type { Widened } from '../../locales/en.js';
import type { enCurve } from '../../locales/en-curve.js';
import { curvePlot } from './plot.js';

/** The sentences, the language tag that figures are written by, and what the electrode reads. */
export interface CurveTongue {
  readonly texts: Widened<typeof enCurve>;
  readonly tag: string;
  readonly kind: CurveKind;
}

/** Puts figures into a sentence; a unit never begins a line. */
export const put: typeof fill = (text, params) => fill(text, params).replace(/ (?=mL\b|R²)/g, '\u00a0');

/** A figure of a curve as decimal text: volumes to 0.01 mL, as a burette is read. */
export const curveFigure = (value: number, decimals = 2): string => shownText(new Decimal(String(value)), { decimals });

/** What was made of a curve: the end point, the remarks, the plot and Gran's lines; or why there is none. */
export function curveResult(curve: CurveReading | CurveRefusal | undefined, tongue: CurveTongue): TemplateResult {
  const { texts, tag, kind } = tongue;
  if (!curve || 'refused' in curve) {
    return html`<div role="status">${curve ? html`<p class="gate">${sentence(texts.refused[curve.refused.code], curve.refused, tongue)}</p>` : nothing}</div>`;
  }
  const { endPoint, points, window, inflections, remarks, gran } = curve;
  const volume = (value: number, decimals = 2): string => showNumber(curveFigure(value, decimals), tag);
  const readings = points.map(({ reading }) => reading);
  const level = (value: number): string => withUnit(readingText(value, tongue), kind);
  const [first, last] = [points[0]?.volume ?? 0, points.at(-1)?.volume ?? 0];
  const figures = {
    end: volume(endPoint), reading: level(inflections.at(-1)?.reading ?? 0), window: String(window), points: String(points.length),
    from: volume(first), to: volume(last), low: level(Math.min(...readings)), high: level(Math.max(...readings)),
  };
  return html`
    <div role="status">
      <p><b>${put(texts.end, figures)}</b></p>
      ${remarks.map((remark) => html`<p class="gate">${sentence(texts.remarks[remark.code], remark, tongue)}</p>`)}
    </div>
    ${curvePlot(curve, {
      label: put(texts.plot, figures), end: `${figures.end}\u00a0mL`, reading: (value) => readingText(value, tongue), volume: (value) => volume(value, 1),
    })}
    <p class="small quiet">${texts.legend}</p>
    <p class="small quiet">${put(texts.how, figures)}</p>
    ${gran
      ? html`<p class="small">${granText(gran.acid, texts.granAcid, texts.noGranAcid, endPoint, tongue)}</p>
          <p class="small">${granText(gran.base, texts.granBase, texts.noGranBase, endPoint, tongue)}</p>
          <p class="small quiet">${texts.granNote}</p>`
      : nothing}
  `;
}

function granText(gran: Gran, text: string, none: string, inflection: number, tongue: CurveTongue): string {
  if ('refused' in gran) return put(none, { reason: sentence(tongue.texts.gran[gran.refused.code], gran.refused, tongue) });
  const { endPoint: end, from, to, rSquared } = gran;
  return sentence(text, { code: '', params: { end, difference: Math.abs(end - inflection), from, to, rSquared } }, tongue);
}

/** Figures of a remark that are counts, not volumes. */
const COUNTS: readonly string[] = ['points', 'least', 'groups', 'steps', 'window'];

function sentence(text: string, { params }: CurveRemark<string>, tongue: CurveTongue): string {
  const words: Record<string, string> = {};
  for (const [name, value] of Object.entries(params)) words[name] = showNumber(COUNTS.includes(name) ? String(value) : curveFigure(value), tongue.tag);
  const { span, least, rSquared } = params;
  if (span !== undefined && least !== undefined) {
    words['span'] = readingText(span, tongue);
    words['least'] = tongue.kind === 'pH' ? readingText(least, tongue) : withUnit(readingText(least, tongue), tongue.kind);
  }
  // R² is not rounded up to a perfect line
  if (rSquared !== undefined) words['straight'] = showNumber(curveFigure(Math.floor(rSquared * 10_000) / 10_000, 4), tongue.tag);
  return put(text, words);
}

const readingText = (value: number, { kind, tag }: CurveTongue): string => showNumber(curveFigure(value, kind === 'pH' ? 2 : 0), tag);
const withUnit = (text: string, kind: CurveKind): string => (kind === 'pH' ? `pH\u00a0${text}` : `${text}\u00a0mV`);
