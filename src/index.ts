// The classes of the elements, for pages that register them themselves. Nothing is registered here.

export { EsterwayCharge } from './elements/charge/charge.js';
export { EsterwayLot } from './elements/lot/lot.js';
export { EsterwayPanel } from './elements/panel/panel.js';
export { EsterwayRoute } from './elements/route/route.js';
export { EsterwaySite } from './elements/site/site.js';
export { EsterwaySiteValues } from './elements/site/site-values.js';
export { EsterwayTitration } from './elements/titration/titration.js';
export { EsterwayWorking } from './elements/working/working.js';
export { defineEsterway } from './elements/define-all.js';
export type { EsterwayBlend } from './elements/blend/blend.js';
export type { EsterwayStockChangeEvent } from './elements/blend/events.js';
export type { BlendStock, StockItem, StockLimits } from './lot/blend-stock.js';
export type { EsterwayBalance } from './elements/balance/balance.js';
export type { EsterwayTriage } from './elements/triage/triage.js';
export type { EsterwayCurve } from './elements/curve/curve.js';
export type { EsterwayTitrant } from './elements/titrant/titrant.js';
export { EsterwayChangeEvent, EsterwayOpenEvent, EsterwaySiteChangeEvent } from './elements/parts/events.js';
export type { UnitSystem } from './exchange/amount.js';
export * from './core.js';
export * from './working.js';
