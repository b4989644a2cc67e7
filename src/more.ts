// The parts of the batch that a page seldom needs: their classes, and their registration. The others fetch them by themselves when a
// person opens one; a page that uses one alone imports this.

import { defineMore } from './elements/define-more.js';

defineMore();

export { EsterwayCurve } from './elements/curve/curve.js';
export { EsterwayAfter } from './elements/after/after.js';
export { EsterwayBalance } from './elements/balance/balance.js';
export { EsterwayCost } from './elements/cost/cost.js';
export { EsterwayTitrant } from './elements/titrant/titrant.js';
export { defineMore } from './elements/define-more.js';
