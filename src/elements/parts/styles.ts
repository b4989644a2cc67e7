import { css } from 'lit';

/**
 * Reset of what a host inherits, and the colours of the bench notebook: paper and ink, oil amber,
 * the pink of the end point, the grey-blue of glass. Each can be set from the page by its
 * `--esterway-…` property; light or dark follows the page's `color-scheme`.
 */
export const tokens = css`
  :host {
    --_paper: var(--esterway-paper, light-dark(#fbfaf5, #182022));
    --_ink: var(--esterway-ink, light-dark(#1f2c2e, #e7ece9));
    --_quiet: var(--esterway-quiet, light-dark(#56666b, #9fb0b3));
    --_rule: var(--esterway-rule, light-dark(#d3dbdb, #354246));
    --_faint: var(--esterway-faint, light-dark(#eef2f1, #20292b));
    --_glass: var(--esterway-glass, light-dark(#4d6b7a, #9cbccb));
    --_amber: var(--esterway-amber, light-dark(#855706, #e8b95c));
    --_oil: var(--esterway-oil, light-dark(#f6e7c4, #4a3a17));
    --_pink: var(--esterway-pink, light-dark(#b3275f, #ff8fb6));
    --_pink-soft: var(--esterway-pink-soft, light-dark(#fbe3ec, #3a1f2a));
    --_margin: var(--esterway-margin, light-dark(#e9b9cb, #6b3448));
    --_size: var(--esterway-font-size, 14px);
    --_font: var(--esterway-font, system-ui, 'Segoe UI', Roboto, 'DejaVu Sans', sans-serif);
    --_target: 44px;

    display: block;
    box-sizing: border-box;
    color: var(--_ink);
    font: normal 400 var(--_size) / 1.4 var(--_font);
    font-variant-numeric: tabular-nums;
    /* the languages spoken run from left to right; a page of the other direction would write kg 900 */
    direction: ltr;
    letter-spacing: normal;
    word-spacing: normal;
    text-align: start;
    text-indent: 0;
    text-transform: none;
    text-shadow: none;
    text-align-last: auto;
    text-emphasis: none;
    white-space: normal;
    word-break: normal;
    line-break: auto;
    overflow-wrap: normal;
    hyphens: manual;
    cursor: auto;
    caret-color: auto;
    -webkit-text-fill-color: currentcolor;
    -webkit-text-stroke: 0;
    -webkit-text-size-adjust: 100%;
    text-size-adjust: 100%;
  }
  :host([hidden]) {
    display: none;
  }
  *,
  *::before,
  *::after {
    box-sizing: border-box;
  }
  p,
  h2,
  h3,
  h4,
  ol,
  ul,
  dl,
  dd,
  figure {
    margin: 0;
    padding: 0;
  }
  ol,
  ul {
    list-style: none;
  }
  button,
  select,
  input {
    font: inherit;
    color: inherit;
    letter-spacing: inherit;
    margin: 0;
    border-radius: 0;
  }
  button,
  select {
    cursor: pointer;
  }
  :focus-visible {
    outline: 2px solid var(--_pink);
    outline-offset: 1px;
  }
  .quiet {
    color: var(--_quiet);
  }
  .small {
    font-size: 0.9em;
  }
  .unseen {
    position: absolute;
    inline-size: 1px;
    block-size: 1px;
    margin: -1px;
    overflow: hidden;
    clip-path: inset(50%);
    white-space: nowrap;
  }
  @media print {
    :host {
      --_paper: #fff;
      --_ink: #000;
      --_quiet: #333;
      --_rule: #999;
      --_faint: #fff;
      --_glass: #000;
      --_amber: #000;
      --_oil: #eee;
      --_pink: #000;
      --_pink-soft: #fff;
      --_margin: #999;
      font-size: 9.5pt;
    }
    .no-print {
      display: none !important;
    }
  }
`;

/** A button with words. */
export const buttons = css`
  .action {
    min-block-size: var(--_target);
    padding: 0.5em 0.8em;
    background: none;
    border: 1px solid var(--_glass);
    border-radius: 2px;
  }
  .action:hover {
    background: var(--_faint);
  }
  .action.main {
    background: var(--_glass);
    border-color: var(--_glass);
    color: var(--_paper);
  }
  .action:disabled {
    opacity: 0.5;
    cursor: default;
  }
  .open {
    display: inline;
    padding: 0;
    border: 0;
    background: none;
    font-weight: inherit;
    text-align: inherit;
    text-decoration: underline dotted 1px;
    text-decoration-color: var(--_glass);
    text-underline-offset: 0.25em;
  }
  .open:hover {
    text-decoration-style: solid;
  }
  @media print {
    .open {
      text-decoration: none;
    }
  }
  @media (forced-colors: active) {
    .action.main {
      border-width: 2px;
    }
  }
`;

/** A box beside the text: what asks for attention (pink) and what can hurt (amber). */
export const boxes = css`
  .gate {
    margin-block: 8px;
    padding: 7px 9px;
    border-inline-start: 3px solid var(--_pink);
    background: var(--_pink-soft);
  }
  .care {
    margin-block: 8px 0;
    padding: 7px 9px;
    border: 1px solid var(--_amber);
  }
  .care b {
    color: var(--_amber);
  }
`;
