// What belongs to deliveries and the stock: classes, and their registration. The panel fetches them by itself when a person opens one;
// a page that uses one alone imports this.

import { defineIntake } from './elements/define-intake.js';

defineIntake();

export { EsterwayBlend } from './elements/blend/blend.js';
export { EsterwayStockChangeEvent } from './elements/blend/events.js';
export { EsterwayTriage } from './elements/triage/triage.js';
export { defineIntake } from './elements/define-intake.js';
