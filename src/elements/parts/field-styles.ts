import { css } from 'lit';

/** A field: a quiet label, the entry on a ruled line, its unit, and below it what is to be said about it. */
export const fieldStyles = css`
  label,
  .label {
    display: block;
    color: var(--_quiet);
    font-size: 0.9em;
    line-height: 1.3;
  }
  .line {
    /* the target is the input, without the line under it */
    box-sizing: content-box;
    display: flex;
    align-items: stretch;
    border-block-end: 1.5px solid var(--_glass);
    min-block-size: var(--_target);
  }
  .line:focus-within {
    border-block-end-color: var(--_pink);
    background: var(--_pink-soft);
  }
  .line.wrong {
    border-block-end: 2.5px double var(--_pink);
  }
  input,
  select {
    min-inline-size: 0;
    padding: 0 2px;
    background: transparent;
    border: 0;
    outline: 0;
    font-size: 1.08em;
  }
  .line input {
    flex: 1 1 auto;
    inline-size: 100%;
    text-align: end;
    direction: ltr;
  }
  .line input.words {
    text-align: start;
    direction: inherit;
  }
  input::placeholder {
    color: var(--_quiet);
    opacity: 1;
    font-style: italic;
  }
  .unit {
    align-self: center;
    flex: none;
    padding-inline: 5px 2px;
    color: var(--_quiet);
    font-size: 0.88em;
  }
  select.unit {
    align-self: stretch;
    max-inline-size: 5.2em;
    field-sizing: content;
  }
  option {
    background: var(--_paper);
    color: var(--_ink);
  }
  .line > select:only-child {
    flex: 1 1 auto;
  }
  .note {
    margin-block-start: 3px;
    font-size: 0.9em;
    color: var(--_quiet);
  }
  .problem {
    margin-block-start: 4px;
    padding-inline-start: 7px;
    border-inline-start: 3px solid var(--_pink);
    color: var(--_pink);
    font-size: 0.92em;
  }
  .problem button {
    min-block-size: var(--_target);
    margin: 4px 6px 0 0;
    padding: 0 12px;
    background: none;
    border: 1px solid var(--_pink);
    border-radius: 2px;
  }
  @media (forced-colors: active) {
    .line:focus-within {
      outline: 2px solid Highlight;
    }
    .line.wrong {
      border-block-end: 3px double Mark;
    }
  }
  @media print {
    .line {
      min-block-size: 0;
    }
    select {
      appearance: none;
    }
    ::-webkit-calendar-picker-indicator {
      display: none;
    }
  }
`;
