// Everything that needs no page: reads lots in a browser, a worker or Node.

export { readLot } from './lot/read-lot.js';
export type { ReadOptions } from './lot/read-lot.js';
export type { LotFaults, LotReading, Notice, NoticeCode, ReadingJson, UncertaintyJson } from './lot/lot-reading.js';
export { EMPTY_LOT, EMPTY_SITE, FORMAT_VERSION } from './lot/entry.js';
export type { Fault } from './lot/check.js';
export type { LotEntry, RunEntry, SiteProfile } from './lot/entry.js';
export type { Figure } from './lot/figure.js';
export { DEFAULT_FIGURES, DEFAULT_OPTIONS } from './lot/defaults.js';
export type { Mark, Source } from './formula/source.js';
export type { Problem } from './formula/reading.js';
export type { Replicates } from './decision/replicates.js';
export type { Reason, Route, Verdict } from './decision/route.js';
export type { Caution, ChargeLine, ChargeStep, ChargeWhat } from './decision/charge.js';
