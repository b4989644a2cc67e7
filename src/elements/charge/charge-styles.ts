import { css } from 'lit';

/** Steps with their amounts: number, what, mass; below it how and the volume. */
export const chargeStyles = css`
  ol {
    counter-reset: line;
  }
  li {
    counter-increment: line;
    display: grid;
    grid-template-columns: 1.4em 1fr auto;
    gap: 0 6px;
    padding-block: 6px;
    border-block-end: 1px solid var(--_faint);
  }
  li::before {
    content: counter(line);
    color: var(--_quiet);
  }
  .mass {
    text-align: end;
    font-weight: 650;
  }
  .what {
    overflow-wrap: anywhere;
  }
  .how {
    grid-column: 2;
    color: var(--_quiet);
    font-size: 0.9em;
  }
  .spread {
    display: block;
    color: var(--_quiet);
    font-size: 0.9em;
    white-space: nowrap;
  }
  .volume {
    grid-column: 3;
    color: var(--_quiet);
    font-size: 0.9em;
    text-align: end;
  }
  .plain {
    grid-column: 2 / -1;
  }
  dl {
    display: grid;
    grid-template-columns: 1fr auto;
    gap: 4px 10px;
    font-size: 0.94em;
  }
  dt {
    color: var(--_quiet);
  }
  dd {
    text-align: end;
  }
  .care ul {
    margin-block-start: 3px;
    font-size: 0.92em;
  }
  .care li {
    display: list-item;
    margin-inline-start: 1.1em;
    padding: 1px 0;
    border: 0;
    list-style: disc;
  }
  .care li::before {
    content: none;
  }
  @media print {
    li,
    .care,
    .gate,
    dl {
      break-inside: avoid;
    }
  }
`;
