import { css } from 'lit';

/** A section: the margin line of the notebook, a heading that folds it, fields in columns. */
export const sectionStyles = css`
  :host {
    background: var(--_paper);
    container-type: inline-size;
  }
  :host([bare]) {
    background: transparent;
  }
  .section {
    position: relative;
    padding: 4px 14px 14px 38px;
    padding-inline: 38px 14px;
  }
  .section::before {
    content: '';
    position: absolute;
    inset-block: 0;
    inset-inline-start: 26px;
    border-inline-start: 1px solid var(--_margin);
  }
  .fold {
    display: flex;
    flex-wrap: wrap;
    align-items: baseline;
    column-gap: 10px;
    inline-size: calc(100% + 38px);
    min-block-size: var(--_target);
    margin-inline-start: -38px;
    padding: 10px 0 6px;
    background: none;
    border: 0;
    text-align: start;
  }
  .mark {
    flex: none;
    inline-size: 26px;
    margin-inline-end: 2px;
    text-align: center;
    color: var(--_quiet);
    transition: rotate 0.12s;
  }
  .fold[aria-expanded='false'] .mark {
    rotate: -90deg;
  }
  h2 {
    font: inherit;
  }
  h2 b {
    min-inline-size: 0;
    font-weight: 650;
    overflow-wrap: anywhere;
  }
  h3 {
    margin-block: 12px 2px;
    font-size: 1em;
    font-weight: 650;
    color: var(--_amber);
  }
  .summary {
    flex: 1 1 8em;
    color: var(--_quiet);
    font-size: 0.9em;
    text-align: end;
    overflow-wrap: anywhere;
  }
  .body[hidden] {
    display: none;
  }
  .fields {
    display: grid;
    grid-template-columns: repeat(auto-fill, minmax(min(100%, 8.6em), 1fr));
    gap: 8px 12px;
    align-items: start;
  }
  .fields > .wide {
    grid-column: 1 / -1;
  }
  summary {
    display: flex;
    align-items: center;
    min-block-size: var(--_target);
    cursor: pointer;
    color: var(--_quiet);
    font-size: 0.92em;
  }
  summary::before {
    content: '▸';
    flex: none;
    inline-size: 1.2em;
  }
  details[open] > summary::before {
    content: '▾';
  }
  .unit {
    color: var(--_quiet);
    font-weight: 400;
    font-size: 0.88em;
  }
  .figure {
    white-space: nowrap;
  }
  @media (prefers-reduced-motion: reduce) {
    .mark {
      transition: none;
    }
  }
  @media print {
    .body[hidden] {
      display: block;
    }
    .mark {
      visibility: hidden;
    }
    .fold {
      min-block-size: 0;
    }
  }
`;
