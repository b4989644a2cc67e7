import { css, svg } from 'lit';
import type { TemplateResult } from 'lit';
import type { Histogram, Interval } from '../../formula/sampled.js';

/** What the drawing shows; figures for drawing only. */
export interface HistogramReading extends Histogram {
  /** The interval whose draws are filled in. */
  readonly interval: Interval;
  /** A limit, drawn where it lies within the draws. */
  readonly limit?: number | undefined;
  /** The same as a sentence, for those who do not see it. */
  readonly label: string;
  readonly write: (value: number) => string;
}

const WIDTH = 240;
const EDGE = 6;
const TOP = 8;
const BASE = 84;

/** The draws as bars on a line from the smallest to the largest; those outside the interval are left hollow. */
export function histogram({ from, to, counts, interval, limit, label, write }: HistogramReading): TemplateResult {
  const most = Math.max(...counts);
  const x = (value: number): number => EDGE + ((value - from) / (to - from)) * (WIDTH - 2 * EDGE);
  const wide = (WIDTH - 2 * EDGE) / counts.length;
  const bar = (count: number, at: number): TemplateResult => {
    const middle = from + ((at + 0.5) / counts.length) * (to - from);
    const high = (count / most) * (BASE - TOP);
    const kind = middle < interval[0] || middle > interval[1] ? 'pile beyond' : 'pile';
    return svg`<rect class=${kind} x=${EDGE + at * wide} y=${BASE - high} width=${wide} height=${high} />`;
  };
  const end = (value: number, anchor: string): TemplateResult => svg`
    <path class="end" d="M${x(value)} ${TOP + 14} V${BASE + 5}" />
    <text x=${x(value)} y=${BASE + 17} text-anchor=${anchor}>${write(value)}</text>`;
  return svg`
    <svg class="plot draws" viewBox="0 0 ${WIDTH} 106" role="img" aria-label=${label}>
      ${counts.map(bar)}
      <path class="axis" d="M0 ${BASE} H${WIDTH}" />
      ${end(interval[0], 'middle')} ${end(interval[1], 'middle')}
      ${limit === undefined || limit < from || limit > to ? '' : svg`<path class="limit" d="M${x(limit)} 0 V${BASE}" />`}
    </svg>
  `;
}

export const histogramStyles = css`
  .draws {
    margin-block: 8px 2px;
  }
  .draws .pile {
    fill: var(--_oil);
    stroke: var(--_amber);
    stroke-width: 0.8;
  }
  .draws .beyond {
    fill: none;
  }
  .draws .end {
    stroke: var(--_ink);
    stroke-width: 1.6;
  }
  .draws .limit {
    stroke: var(--_pink);
    stroke-width: 2;
    stroke-dasharray: 4 2;
  }
  @media (forced-colors: active) {
    .draws .pile {
      fill: CanvasText;
      fill-opacity: 0.3;
      stroke: CanvasText;
    }
    .draws .beyond {
      fill: none;
    }
    .draws .end {
      stroke: CanvasText;
    }
    .draws .limit {
      stroke: Highlight;
    }
  }
`;
