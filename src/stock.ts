// What can be worked out from lots in stock; knows no page.

export { blendedLot, readBlend, stockItemOf } from './lot/blend.js';
export type { BlendFound, BlendPart, BlendRefused } from './lot/blend.js';
export { EMPTY_STOCK } from './lot/blend-stock.js';
export type { BlendStock, StockItem, StockLimits } from './lot/blend-stock.js';
