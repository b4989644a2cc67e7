import { css, svg } from 'lit';
import type { TemplateResult } from 'lit';

/** A line of the diagram, from top to bottom: what the batch begins with, what joins it, a step, what leaves it, what is left. */
export interface FlowRow {
  readonly kind: 'start' | 'in' | 'step' | 'out' | 'end';
  readonly name: string;
  /** In words, with its unit; a step has none. */
  readonly amount?: string;
  /** kg */
  readonly mass?: number;
}

/** As wide as the narrowest column leaves, so that words there are no smaller than they are drawn. */
export const WIDTH = 218;
const LEFT = 4;
/** Of the widest place of the batch. */
const WIDEST = 52;
/** Where streams come in from the side, and where their words begin. */
const SIDE = 84;
const WORDS = 94;
const BEND = 6;
const STEP_HEIGHT = 26;

/** A row with its place and widths. */
interface Placed extends FlowRow {
  readonly top: number;
  readonly height: number;
  /** Of what runs through the row, at the left. */
  readonly trunk: number;
  /** Of what joins or leaves. */
  readonly branch: number;
}

/** The rows one below the other, widths in proportion to mass. */
export function placed(rows: readonly FlowRow[]): readonly Placed[] {
  const change = ({ kind, mass = 0 }: FlowRow): number => (kind === 'start' || kind === 'in' ? mass : kind === 'out' ? -mass : 0);
  let [most, now] = [0, 0];
  for (const row of rows) most = Math.max(most, (now += change(row)));
  const scale = most ? WIDEST / most : 0;
  let [top, mass] = [2, 0];
  return rows.map((row) => {
    const before = mass;
    mass += change(row);
    const branch = row.kind === 'in' || row.kind === 'out' ? (row.mass ?? 0) * scale : 0;
    // what joins runs beside what is there already; what leaves has gone from it
    const trunk = (row.kind === 'in' ? before : Math.max(mass, 0)) * scale;
    const height = row.kind === 'step' ? STEP_HEIGHT : Math.max(36, branch + 20);
    const place = { ...row, top, height, trunk, branch };
    top += height;
    return place;
  });
}

/** Draws the rows; for the height of the picture see {@link heightOf}. */
export const flowDiagram = (rows: readonly Placed[]): TemplateResult => svg`${rows.map(drawn)}`;

export const heightOf = (rows: readonly Placed[]): number => rows.reduce((end, { top, height }) => Math.max(end, top + height), 0) + 4;

function drawn(row: Placed): TemplateResult {
  const { kind, name, top, height, trunk } = row;
  if (kind === 'step') {
    return svg`<rect class="step" x="1" y=${top} width=${WIDTH - 2} height=${height} /><text class="name middle" x=${WIDTH / 2} y=${top + height / 2 + 4}>${name}</text>`;
  }
  return svg`${kind === 'end' ? arrowDown(row) : svg`<rect class="inside" x=${LEFT} y=${top} width=${n(trunk)} height=${height} /><path class="edge" d="M${LEFT} ${top} v${height} M${n(LEFT + trunk)} ${top} v${height}" />`}
    ${kind === 'in' ? svg`<path class="joins" d=${joining(row)} />` : null}${kind === 'out' ? svg`<path class="leaves" d=${leaving(row)} />` : null}${words(row)}`;
}

const n = (length: number): string => length.toFixed(1);

/** A stream must be seen, however small. */
const seen = (branch: number): number => Math.max(branch, 1.5);
/** Where the middle of a stream from or to the side lies. */
const middle = ({ top, height }: Placed): number => top + height / 2;

function words(row: Placed): TemplateResult {
  const y = middle(row);
  return svg`<text class="name" x=${WORDS} y=${n(y - 3)}>${row.name}</text><text x=${WORDS} y=${n(y + 11)}>${row.amount ?? ''}</text>`;
}

/** From the side, bent downwards beside the batch. */
function joining(row: Placed): string {
  const width = seen(row.branch);
  const [left, y, bottom] = [LEFT + row.trunk, middle(row), row.top + row.height];
  const right = left + width;
  const [high, low] = [y - width / 2, y + width / 2];
  return `M${SIDE} ${n(high)} H${n(right + BEND)} Q${n(left)} ${n(high)} ${n(left)} ${n(low + BEND)} V${n(bottom)} H${n(right)} V${n(low + BEND)} Q${n(right)} ${n(low)} ${n(right + BEND)} ${n(low)} H${SIDE} Z`;
}

/** Bent from the batch to the side, with a point where it goes. */
function leaving(row: Placed): string {
  const width = seen(row.branch);
  const [left, y, { top }] = [LEFT + row.trunk, middle(row), row];
  const right = left + width;
  const [high, low] = [y - width / 2, y + width / 2];
  const end = SIDE - 4;
  return `M${n(left)} ${n(top)} V${n(high - BEND)} Q${n(left)} ${n(low)} ${n(right + BEND)} ${n(low)} H${end} V${n(low + 3)} L${SIDE + 4} ${n(y)} L${end} ${n(high - 3)} V${n(high)} H${n(right + BEND)} Q${n(right)} ${n(high)} ${n(right)} ${n(high - BEND)} V${n(top)} Z`;
}

/** What is left, ending in a point. */
function arrowDown({ top, height, trunk }: Placed): TemplateResult {
  const [left, right, shoulder] = [LEFT, LEFT + trunk, top + height - 12];
  const line = `M${left} ${top} V${n(shoulder)} H${n(left - 3)} L${n((left + right) / 2)} ${n(top + height)} L${n(right + 3)} ${n(shoulder)} H${n(right)} V${top}`;
  return svg`<path class="inside" d=${line} /><path class="edge" d=${line} />`;
}

/** The outline of what leaves is broken, that of what joins is not: no meaning by colour alone. */
export const flowStyles = css`
  .flow {
    display: block;
    inline-size: 100%;
    max-inline-size: 268px;
    block-size: auto;
    margin-block: 8px;
    direction: ltr;
  }
  .flow text {
    font: 12px var(--_font);
    fill: var(--_ink);
  }
  .flow .name {
    font-weight: 650;
  }
  .flow .middle {
    text-anchor: middle;
  }
  .flow .inside {
    fill: var(--_oil);
  }
  .flow .edge {
    fill: none;
    stroke: var(--_amber);
    stroke-width: 1;
  }
  .flow .step {
    fill: var(--_paper);
    stroke: var(--_glass);
    stroke-width: 1.2;
  }
  .flow .joins {
    fill: var(--_faint);
    stroke: var(--_glass);
    stroke-width: 1;
  }
  .flow .leaves {
    fill: var(--_oil);
    stroke: var(--_amber);
    stroke-width: 1;
    stroke-dasharray: 4 2;
  }
  @media print {
    .flow {
      break-inside: avoid;
    }
  }
  @media (forced-colors: active) {
    .flow text {
      fill: CanvasText;
    }
    .flow .inside,
    .flow .step,
    .flow .joins,
    .flow .leaves {
      fill: Canvas;
    }
    .flow .edge,
    .flow .step,
    .flow .joins,
    .flow .leaves {
      stroke: CanvasText;
    }
  }
`;
