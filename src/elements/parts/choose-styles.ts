import { css } from 'lit';

/** Radio buttons side by side, as for the two routes. */
export const chooseStyles = css`
  .choose {
    display: flex;
    gap: 0;
    margin-block: 8px 4px;
  }
  .choose label {
    flex: 1 1 0;
    position: relative;
    display: flex;
    align-items: center;
    justify-content: center;
    min-block-size: var(--_target);
    border: 1px solid var(--_glass);
    text-align: center;
    cursor: pointer;
  }
  .choose label + label {
    border-inline-start: 0;
  }
  .choose input {
    position: absolute;
    inset: 0;
    opacity: 0;
    cursor: pointer;
  }
  .choose label:has(:checked) {
    background: var(--_faint);
    box-shadow: inset 0 -3px var(--_pink);
    font-weight: 650;
  }
  .choose label:has(:focus-visible) {
    outline: 2px solid var(--_pink);
    outline-offset: 1px;
  }
  @media (forced-colors: active) {
    .choose label:has(:checked) {
      outline: 2px solid Highlight;
      outline-offset: -2px;
    }
  }
`;
