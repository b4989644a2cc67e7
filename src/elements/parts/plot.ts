import { css } from 'lit';

/** Round figures from 0 to `most`, about so many. */
export function ticks(most: number, about: number): readonly number[] {
  const raw = most / about;
  const power = 10 ** Math.floor(Math.log10(raw));
  const step = [1, 2, 5, 10].map((factor) => factor * power).find((width) => most / width <= about + 1) ?? raw;
  return Array.from({ length: Math.floor(most / step + 1e-9) + 1 }, (_, i) => Number((i * step).toPrecision(12)));
}

/** Plots in a narrow column: thin grid, words at the lines, no meaning by colour alone. */
export const plotStyles = css`
  .plot {
    display: block;
    inline-size: 100%;
    max-inline-size: 420px;
    block-size: auto;
    overflow: visible;
    direction: ltr;
  }
  .plot text {
    font: 10px var(--_font);
    fill: var(--_quiet);
    /* a line that runs behind words does not strike them out */
    stroke: var(--_paper);
    stroke-width: 3px;
    stroke-linejoin: round;
    paint-order: stroke;
  }
  .plot .end {
    text-anchor: end;
  }
  .plot .middle {
    text-anchor: middle;
  }
  .plot .grid {
    stroke: var(--_rule);
    stroke-width: 0.7;
  }
  .plot .axis {
    fill: none;
    stroke: var(--_glass);
    stroke-width: 1.2;
  }
  .plot .band {
    fill: var(--_oil);
  }
  .plot .line {
    fill: none;
    stroke: var(--_ink);
    stroke-width: 1.5;
  }
  .plot .broken {
    stroke-dasharray: 4 3;
  }
  .plot .limit {
    fill: none;
    stroke: var(--_amber);
    stroke-width: 1.4;
    stroke-dasharray: 6 2;
  }
  .plot .limit-words {
    fill: var(--_amber);
  }
  .plot .here {
    fill: none;
    stroke: var(--_pink);
    stroke-width: 2;
  }
  @media (forced-colors: active) {
    .plot text,
    .plot .limit-words {
      fill: CanvasText;
      stroke: Canvas;
    }
    .plot .band {
      fill: none;
    }
    .plot .line,
    .plot .axis,
    .plot .limit {
      stroke: CanvasText;
    }
    .plot .grid {
      stroke: GrayText;
    }
    .plot .here {
      stroke: Highlight;
    }
  }
`;
