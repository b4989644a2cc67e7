import { css, svg } from 'lit';
import type { CSSResult, TemplateResult } from 'lit';
import type { Gran } from '../../decision/titration-curve/gran.js';
import type { CurveReading } from '../../decision/titration-curve/titration-curve.js';

export interface CurveWords {
  /** The same as a sentence, for those who do not see it. */
  readonly label: string;
  readonly end: string;
  /** A reading, and a volume with its unit. */
  readonly reading: (value: number) => string;
  readonly volume: (value: number) => string;
}

const [LEFT, RIGHT] = [32, 234];
/** The readings above, the derivative and Gran's lines below. */
const READINGS = { top: 12, base: 94 };
const BELOW = { top: 98, base: 126 };

/** The curve with its end point; below it the first derivative, and Gran's lines towards where they meet the axis. */
export function curvePlot({ points, slopes, inflections, endPoint, gran }: CurveReading, { label, end, reading, volume }: CurveWords): TemplateResult {
  const readings = points.map((point) => point.reading);
  const [first, last] = [points[0]?.volume ?? 0, points.at(-1)?.volume ?? 0];
  const [low, high] = [Math.min(...readings), Math.max(...readings)];
  const steepest = Math.max(...slopes.map(({ slope }) => slope));
  const x = (value: number): string => (LEFT + ((value - first) / (last - first)) * (RIGHT - LEFT)).toFixed(1);
  const within = ({ top, base }: typeof BELOW, share: number): string => (base - Math.min(1, Math.max(0, share)) * (base - top)).toFixed(1);
  const line = points.map((point) => `${x(point.volume)} ${within(READINGS, (point.reading - low) / (high - low))}`).join(' ');
  const hill = slopes.map(({ volume: at, slope }) => `${x(at)} ${within(BELOW, slope / steepest)}`).join(' ');
  const straight = (one: Gran | undefined, far: 'from' | 'to'): TemplateResult | string =>
    one && 'endPoint' in one ? svg`<path class="gran" d="M${x(one[far])} ${BELOW.top} L${x(one.endPoint)} ${BELOW.base}" />` : '';
  // the words stand where the curve does not: before a rise above it, behind it below, and the other way round for a fall
  const late = Number(x(endPoint)) > (LEFT + RIGHT) / 2;
  const rises = (readings.at(-1) ?? 0) > (readings[0] ?? 0);
  return svg`
    <svg class="plot curve" viewBox="0 0 240 142" role="img" aria-label=${label}>
      <path class="axis" d="M${LEFT} ${READINGS.top - 6} V${BELOW.base} H${RIGHT}" />
      <path class="hill" d="M${x(first)} ${BELOW.base} L${hill} L${x(last)} ${BELOW.base} Z" />
      ${straight(gran?.acid, 'from')} ${straight(gran?.base, 'to')}
      ${inflections.slice(0, -1).map((one) => svg`<path class="step" d="M${x(one.volume)} ${READINGS.top} V${BELOW.base}" />`)}
      <path class="readings" d="M${line}" />
      <path class="end" d="M${x(endPoint)} ${READINGS.top - 8} V${BELOW.base + 4}" />
      <text class="said" x=${Number(x(endPoint)) + (late ? -5 : 5)} y=${late === rises ? READINGS.top + 4 : READINGS.base - 2} text-anchor=${late ? 'end' : 'start'}>${end}</text>
      <text x=${LEFT - 4} y=${READINGS.top + 4} text-anchor="end">${reading(high)}</text>
      <text x=${LEFT - 4} y=${READINGS.base} text-anchor="end">${reading(low)}</text>
      <text x=${LEFT} y=${BELOW.base + 14} text-anchor="middle">${volume(first)}</text>
      <text x="240" y=${BELOW.base + 14} text-anchor="end">${volume(last)} mL</text>
    </svg>
  `;
}

export const curveStyles: CSSResult = css`
  .curve {
    margin-block: 10px 2px;
  }
  .curve .said {
    font-weight: 600;
    fill: var(--_pink);
  }
  .curve path {
    fill: none;
    stroke: var(--_glass);
  }
  .curve .hill {
    fill: var(--_oil);
    stroke: var(--_amber);
    stroke-width: 0.8;
  }
  .curve .readings {
    stroke: var(--_ink);
    stroke-width: 1.8;
    stroke-linejoin: round;
  }
  .curve .gran {
    stroke-width: 1.4;
    stroke-dasharray: 4 3;
  }
  .curve .step {
    stroke-dasharray: 1 3;
  }
  .curve .end {
    stroke: var(--_pink);
    stroke-width: 1.6;
  }
  @media (forced-colors: active) {
    .curve .said {
      fill: CanvasText;
    }
    .curve path,
    .curve .hill,
    .curve .readings {
      stroke: CanvasText;
    }
    .curve .hill {
      fill: CanvasText;
      fill-opacity: 0.25;
    }
    .curve .end {
      stroke: Highlight;
    }
  }
`;
