import { css } from 'lit';

export const rowsStyles = css`
  textarea {
    box-sizing: border-box;
    inline-size: 100%;
    min-block-size: 7em;
    margin-block: 2px 8px;
    padding: 6px;
    border: 1.5px solid var(--_glass);
    border-radius: 0;
    background: transparent;
    color: inherit;
    font: inherit;
    tab-size: 8;
    white-space: pre;
    resize: vertical;
  }
  textarea:focus,
  textarea.over {
    border-color: var(--_pink);
    background: var(--_pink-soft);
  }
  .actions {
    display: flex;
    flex-wrap: wrap;
    gap: 8px;
    margin-block: 8px;
  }
  .columns {
    display: grid;
    grid-template-columns: minmax(0, 1.7fr) minmax(0, 1fr);
    gap: 8px 12px;
    align-items: end;
  }
  .only {
    padding-block-end: 8px;
    color: var(--_quiet);
    font-size: 0.9em;
  }
  p {
    margin-block: 5px;
    overflow-wrap: anywhere;
  }
  .note {
    color: var(--_quiet);
    font-size: 0.92em;
  }
  .row {
    padding-block: 6px;
    border-block-end: 1px solid var(--_faint);
  }
  .row p {
    margin-block: 0;
  }
  .top {
    display: flex;
    flex-wrap: wrap;
    gap: 0 8px;
    justify-content: space-between;
  }
  .top b {
    min-inline-size: 0;
    overflow-wrap: anywhere;
  }
  dl {
    display: grid;
    grid-template-columns: 1fr auto;
    gap: 2px 12px;
  }
  dd {
    text-align: end;
  }
  progress {
    inline-size: 100%;
    accent-color: var(--_glass);
  }
  @media print {
    textarea {
      display: none;
    }
  }
`;
