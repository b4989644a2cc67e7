// What can be worked out from deliveries and from lots in stock; knows no page.

export { blendedLot, readBlend, stockItemOf } from './lot/blend.js';
export type { BlendFound, BlendPart, BlendRefused } from './lot/blend.js';
export { EMPTY_STOCK } from './lot/blend-stock.js';
export type { BlendStock, StockItem, StockLimits } from './lot/blend-stock.js';
export { expectedOf, sourceHistory } from './lot/history.js';
export type { Expected, HistoryPoint, SourceHistory } from './lot/history.js';
export { triage } from './lot/triage.js';
export type { RetestAdvice, Settlement, Triage } from './lot/triage.js';
export type { DeliveryState, TriageReason } from './decision/triage.js';
