import { css } from 'lit';
import type { CSSResult } from 'lit';

/** The stock as a sheet; in a narrow column a row takes three lines, each cell under its own name. */
export const stockStyles: CSSResult = css`
  .stock {
    inline-size: 100%;
    border-collapse: collapse;
    table-layout: fixed;
  }
  .stock th {
    padding: 0 4px 3px;
    border-block-end: 1px solid var(--_rule);
    color: var(--_quiet);
    font-weight: 400;
    font-size: 0.86em;
    text-align: end;
    vertical-align: bottom;
  }
  .stock th:first-child {
    inline-size: 2.2em;
    text-align: start;
  }
  .stock th:nth-child(2) {
    inline-size: 24%;
    text-align: start;
  }
  .stock td {
    padding: 0 4px;
    vertical-align: bottom;
  }
  .stock td:first-child,
  .stock th:first-child {
    padding-inline-start: 0;
  }
  .stock td.said {
    padding: 2px 0 6px;
  }
  .stock .open-row {
    inline-size: 100%;
    min-block-size: var(--_target);
    padding: 0;
    background: none;
    border: 0;
    text-align: start;
    text-decoration: underline dotted 1px var(--_glass);
    text-underline-offset: 0.25em;
  }
  .number {
    display: flex;
    align-items: center;
    min-block-size: var(--_target);
  }
  @container (max-width: 559px) {
    .stock,
    .stock tbody {
      display: block;
    }
    .stock thead {
      position: absolute;
      inline-size: 1px;
      block-size: 1px;
      overflow: hidden;
      clip-path: inset(50%);
    }
    .stock tr.item {
      display: grid;
      grid-template-columns: 2fr 10fr 12fr 12fr;
      padding-block: 2px 8px;
    }
    .stock tr.item,
    .stock tr.saying {
      border-block-end: 1px solid var(--_rule);
    }
    .stock tr.item:has(+ .saying) {
      border-block-end: 0;
    }
    .stock tr.saying,
    .stock tr.saying td {
      display: block;
    }
    .stock td {
      padding: 0 3px;
      align-self: end;
    }
    .stock td:nth-child(2) {
      grid-column: 2 / -1;
    }
    .stock td:nth-child(3n) {
      grid-column: span 2;
    }
    .stock td:nth-child(n + 3)::before {
      content: attr(data-label);
      display: block;
      margin-block-start: 4px;
      color: var(--_quiet);
      font-size: 0.86em;
      line-height: 1.2;
      text-align: end;
    }
  }
  @media print {
    .stock .open-row,
    .number {
      min-block-size: 0;
      text-decoration: none;
    }
  }
`;
