import { css, svg } from 'lit';
import type { TemplateResult } from 'lit';

/** What the scale shows; figures as plain numbers, for drawing only. */
export interface ScaleReading {
  /** FFA, %; undefined while it is not known. */
  readonly ffa: number | undefined;
  /** Expanded uncertainty of it, %. */
  readonly expanded?: number;
  readonly directLimit: number;
  readonly pretreatmentLimit: number;
  /** Words at the two marks. */
  readonly directMark: string;
  readonly pretreatmentMark: string;
  /** The same as a sentence, for those who do not see it. */
  readonly label: string;
  readonly write: (value: number) => string;
}

const TOP = 10;
const LENGTH = 168;
const LEFT = 44;
const RIGHT = 66;

/** The top of the scale: a round figure above the limit and the result, with five to eight major marks. */
export function scaleOf(ffa: number | undefined, directLimit: number): { readonly most: number; readonly step: number } {
  const reach = Math.max(directLimit * 1.6, (ffa ?? 0) * 1.2, 1);
  const step = [0.2, 0.5, 1, 2, 5, 10, 20].find((width) => reach / width <= 8) ?? 25;
  return { most: Math.ceil(reach / step) * step, step };
}

/** A burette: graduated from 0 at the top downwards, the result a meniscus, the site's limits as marks. */
export function buretteScale(reading: ScaleReading): TemplateResult {
  const { ffa, directLimit, pretreatmentLimit, write } = reading;
  const { most, step } = scaleOf(ffa, directLimit);
  const y = (value: number): number => TOP + (Math.min(Math.max(value, 0), most) / most) * LENGTH;
  const majors = Array.from({ length: Math.round(most / step) + 1 }, (_, i) => i * step);
  const minors = Array.from({ length: Math.round(most / step) * 5 }, (_, i) => (i * step) / 5);
  const level = ffa === undefined ? undefined : y(ffa);
  return svg`
    <svg class="burette" part="scale" viewBox="0 0 100 214" role="img" aria-label=${reading.label}>
      ${level === undefined ? '' : svg`
        <path class="oil" d="M${LEFT + 1} ${level} q${(RIGHT - LEFT - 2) / 2} 6 ${RIGHT - LEFT - 2} 0 V188 q0 5 -4 7 l-3 2 v9 h-8 v-9 l-3 -2 q-4 -2 -4 -7 Z" />`}
      <path class="glass" d="M${LEFT} ${TOP - 6} V188 q0 6 5 8 l3 2 v10 h6 v-10 l3 -2 q5 -2 5 -8 V${TOP - 6}" />
      ${minors.map((value) => svg`<path class="tick" d="M${RIGHT} ${y(value)} h-5" />`)}
      ${majors.map((value, i) => svg`
        <path class="tick" d="M${RIGHT} ${y(value)} h-9" />
        <text x=${RIGHT + 5} y=${y(value) + 4}>${write(value)}${i === majors.length - 1 ? ' %' : ''}</text>`)}
      ${ffa === undefined || reading.expanded === undefined ? '' : svg`<path class="spread" d="M${LEFT + 5} ${y(ffa - reading.expanded)} H${RIGHT - 5} M${(LEFT + RIGHT) / 2} ${y(ffa - reading.expanded)} V${y(ffa + reading.expanded)} M${LEFT + 5} ${y(ffa + reading.expanded)} H${RIGHT - 5}" />`}
      ${mark(y(directLimit), reading.directMark)}
      ${pretreatmentLimit < most ? mark(y(pretreatmentLimit), reading.pretreatmentMark) : ''}
      ${level === undefined ? '' : svg`<path class="meniscus" d="M${LEFT + 1} ${level} q${(RIGHT - LEFT - 2) / 2} 6 ${RIGHT - LEFT - 2} 0" />`}
    </svg>
  `;
}

/** A limit: a broken line across the tube, its words on the left, one above the line and the rest below. */
function mark(at: number, words: string): TemplateResult {
  const [first = '', ...rest] = words.split(' ');
  return svg`
    <path class="limit" d="M2 ${at} H${RIGHT}" />
    <text class="limit-words" x="0" y=${at - 4}>${first}</text>
    <text class="limit-words" x="0" y=${at + 13}>${rest.join(' ')}</text>
  `;
}

export const buretteStyles = css`
  .burette {
    inline-size: 100px;
    block-size: auto;
    overflow: visible;
    direction: ltr;
  }
  .burette text {
    font: 11px var(--_font);
    fill: var(--_quiet);
  }
  .burette .glass {
    fill: none;
    stroke: var(--_glass);
    stroke-width: 1.4;
  }
  .burette .tick {
    stroke: var(--_glass);
    stroke-width: 1;
  }
  .burette .oil {
    fill: var(--_oil);
  }
  .burette .meniscus {
    fill: none;
    stroke: var(--_pink);
    stroke-width: 2.4;
  }
  .burette .spread {
    fill: none;
    stroke: var(--_ink);
    stroke-width: 1.6;
  }
  .burette .limit {
    stroke: var(--_amber);
    stroke-width: 1.6;
    stroke-dasharray: 4 2;
  }
  .burette .limit-words {
    fill: var(--_amber);
  }
  @media (forced-colors: active) {
    .burette text,
    .burette .limit-words {
      fill: CanvasText;
    }
    .burette .glass,
    .burette .tick,
    .burette .limit {
      stroke: CanvasText;
    }
    .burette .oil {
      fill: none;
    }
    .burette .spread {
      stroke: CanvasText;
    }
    .burette .meniscus {
      stroke: Highlight;
    }
  }
`;
