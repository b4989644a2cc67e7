import { html, nothing, svg } from 'lit';
import type { TemplateResult } from 'lit';
import type { SourceHistory } from '../../lot/history.js';
import { ticks } from '../parts/plot.js';

const WIDTH = 260;
const LEFT = 34;
const TOP = 8;

export interface ChartWords {
  readonly label: string;
  readonly write: (value: number) => string;
}

/** Figures over the lots in order, with mean and limits; a lot that signals is a square, the others are round. */
function chart(values: readonly (number | undefined)[], lines: readonly { readonly at: number; readonly kind: 'line' | 'limit' }[], out: ReadonlySet<number>, height: number, { label, write }: ChartWords): TemplateResult {
  const most = Math.max(...values.map((value) => value ?? 0), ...lines.map(({ at }) => at)) || 1;
  const x = (i: number): number => LEFT + 6 + (values.length < 2 ? 0 : (i / (values.length - 1)) * (WIDTH - LEFT - 14));
  const y = (value: number): number => TOP + (1 - value / (most * 1.05)) * (height - TOP - 8);
  const place = (value: number): string => y(value).toFixed(1);
  const known = values.flatMap((value, i) => (value === undefined ? [] : [[i, value] as const]));
  return html`<svg class="plot" viewBox="0 0 ${WIDTH} ${height}" role="img" aria-label=${label}>
    ${ticks(most, 3).map((at) => svg`<path class="grid" d="M${LEFT} ${place(at)} H${WIDTH - 4}" /><text class="end" x=${LEFT - 4} y=${Number(place(at)) + 3}>${write(at)}</text>`)}
    ${lines.map(({ at, kind }) => svg`<path class=${kind === 'limit' ? 'limit' : 'line broken'} d="M${LEFT} ${place(at)} H${WIDTH - 4}" />`)}
    <path class="line" d=${known.map(([i, value], n) => `${n ? 'L' : 'M'}${x(i).toFixed(1)} ${place(value)}`).join(' ')} />
    ${known.map(([i, value]) => (out.has(i) ? svg`<rect class="out" x=${(x(i) - 4).toFixed(1)} y=${(y(value) - 4).toFixed(1)} width="8" height="8" />` : svg`<circle class="lot" cx=${x(i).toFixed(1)} cy=${place(value)} r="2.4" />`))}
    <path class="axis" d="M${LEFT} ${TOP} V${height - 6} H${WIDTH - 4}" />
  </svg>`;
}

/** The chart of individuals, and under it that of the moving range once there are limits. */
export function historyCharts({ points, limits, signals }: SourceHistory, individuals: ChartWords, ranges: ChartWords): TemplateResult {
  const out = new Set(signals.flatMap(({ from, to }) => Array.from({ length: to - from + 1 }, (_, i) => from + i)));
  const values = points.map(({ value }) => Number(value));
  if (!limits) return html`${values.length > 1 ? chart(values, [], out, 120, individuals) : nothing}`;
  const [centre, upper, lower, meanRange, rangeUpper] = [limits.centre, limits.upper, limits.lower, limits.meanRange, limits.rangeUpper].map(Number) as [number, number, number, number, number];
  const apart = points.map(({ range }) => (range === undefined ? undefined : Number(range)));
  const wide = new Set(apart.flatMap((range, i) => (range !== undefined && range > rangeUpper ? [i] : [])));
  return html`
    ${chart(values, [{ at: centre, kind: 'line' }, { at: upper, kind: 'limit' }, ...(lower > 0 ? [{ at: lower, kind: 'limit' as const }] : [])], out, 140, individuals)}
    ${chart(apart, [{ at: meanRange, kind: 'line' }, { at: rangeUpper, kind: 'limit' }], wide, 84, ranges)}
  `;
}
