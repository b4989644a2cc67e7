// Opening a figure to how it came about: for a second person, or for a sheet. Needs no page.

export { cellFormulaOf, working, workingFigure } from './lot/working.js';
export type { Working } from './lot/working.js';
export { uncertainties, uncertainty } from './lot/uncertainty.js';
export type { Budget, BudgetLine } from './lot/uncertainty.js';
export { secondCheck } from './lot/second-check.js';
export type { Check, FoundSlip, NamedSlip } from './lot/second-check.js';
export type { SlipCode } from './lot/slips.js';
export { mathMarkup } from './formula/working-mathml.js';
export type { MathNode } from './formula/working-mathml.js';
