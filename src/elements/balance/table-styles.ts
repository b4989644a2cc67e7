import { css } from 'lit';

/** The balance of a step as a table, and the layers that it leaves. */
export const tableStyles = css`
  .steps {
    display: grid;
    grid-template-columns: repeat(auto-fill, minmax(min(100%, 250px), 1fr));
    gap: 14px 28px;
    align-items: start;
    margin-block-start: 12px;
  }
  table {
    inline-size: 100%;
    border-collapse: collapse;
    /* figures get what they need, names break where they may */
    table-layout: fixed;
    font-size: 0.93em;
  }
  thead th:first-child {
    inline-size: 34%;
  }
  caption {
    font-weight: 650;
    color: var(--_amber);
    text-align: start;
  }
  th {
    font-weight: 400;
    text-align: start;
    vertical-align: baseline;
    overflow-wrap: anywhere;
    hyphens: auto;
  }
  thead th {
    color: var(--_quiet);
  }
  thead th + th,
  td {
    text-align: end;
    vertical-align: baseline;
  }
  td,
  th {
    padding: 3px 0;
    padding-inline: 6px 0;
    border-block-end: 1px solid var(--_faint);
  }
  th:first-child {
    padding-inline: 0;
  }
  tfoot th,
  tfoot td {
    font-weight: 650;
    border-block: 1px solid var(--_rule);
  }
  /* in a narrow column a unit may stand below a long figure */
  td .figure,
  dd .figure {
    white-space: normal;
  }
  .stream {
    display: block;
    color: var(--_quiet);
    font-size: 0.86em;
    line-height: 1.2;
  }
  dl {
    display: grid;
    grid-template-columns: minmax(0, 1fr) auto auto;
    gap: 4px 10px;
    margin-block: 6px;
    font-size: 0.93em;
  }
  dt {
    color: var(--_quiet);
    overflow-wrap: anywhere;
  }
  dd {
    text-align: end;
  }
  @media print {
    table {
      break-inside: avoid;
    }
  }
`;
