import { css } from 'lit';

/** The book: a row a lot, two lines high; what is in it opens below its row. */
export const bookStyles = css`
  .actions {
    display: flex;
    flex-wrap: wrap;
    gap: 8px;
    margin-block: 8px;
  }
  .fields {
    margin-block: 8px;
  }
  .lots > li {
    border-block-start: 1px solid var(--_rule);
  }
  .lots > li:last-child {
    border-block-end: 1px solid var(--_rule);
  }
  .row {
    display: grid;
    grid-template-columns: 1fr auto;
    gap: 0 10px;
    inline-size: 100%;
    min-block-size: var(--_target);
    padding: 6px 0;
    background: none;
    border: 0;
    text-align: start;
  }
  .row:hover {
    background: var(--_faint);
  }
  .row > * {
    min-inline-size: 0;
    overflow-wrap: anywhere;
  }
  .row > :nth-child(2n) {
    text-align: end;
  }
  .row b {
    font-weight: 650;
  }
  .lot {
    padding: 0 0 10px 10px;
    padding-inline: 10px 0;
    border-inline-start: 3px solid var(--_glass);
    margin-block-end: 8px;
  }
  .versions > li {
    padding-block: 6px;
  }
  .versions > li + li {
    border-block-start: 1px solid var(--_faint);
  }
  .changes {
    margin-block: 2px 4px;
    padding-inline-start: 12px;
  }
  .changes li {
    list-style: '– ';
    overflow-wrap: anywhere;
  }
  .more {
    inline-size: 100%;
    margin-block-start: 8px;
  }
  p {
    overflow-wrap: anywhere;
  }
  @media print {
    .row {
      min-block-size: 0;
    }
  }
`;
