// What reads sheets and writes for them: classes, and their registration. The panel fetches them by itself when a person opens them; a page
// that uses one alone imports this.

import { defineSheets } from './elements/define-sheets.js';

defineSheets();

export { EsterwayRows } from './elements/rows/rows.js';
export { EsterwayColumnsChangeEvent } from './elements/rows/events.js';
export { defineSheets } from './elements/define-sheets.js';
