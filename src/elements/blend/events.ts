import type { BlendStock } from '../../lot/blend-stock.js';

/** A person changed what is in stock or what is wanted of it. The page may keep `stock` and set it again next time. */
export class EsterwayStockChangeEvent extends Event {
  static readonly type = 'esterway-stock-change';
  constructor(readonly stock: BlendStock) {
    super(EsterwayStockChangeEvent.type, { bubbles: true, composed: true });
  }
}

declare global {
  interface HTMLElementEventMap {
    'esterway-stock-change': EsterwayStockChangeEvent;
  }
}
