import type { ColumnMemory } from '../../exchange/table/columns.js';

/** A person corrected what a column is. The page may keep `columnMemory` and set it again next time. */
export class EsterwayColumnsChangeEvent extends Event {
  static readonly type = 'esterway-columns-change';
  constructor(readonly columnMemory: ColumnMemory) {
    super(EsterwayColumnsChangeEvent.type, { bubbles: true, composed: true });
  }
}

declare global {
  interface HTMLElementEventMap {
    'esterway-columns-change': EsterwayColumnsChangeEvent;
  }
}
