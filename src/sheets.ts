// What reads sheets and writes for them: classes, and their registration. The panel fetches them by itself when a person opens them; a page
// that uses one alone imports this.

import { defineSheets } from './elements/define-sheets.js';

defineSheets();

export { EsterwayResults } from './elements/results/results.js';
export { EsterwayRows } from './elements/rows/rows.js';
export { EsterwayColumnsChangeEvent } from './elements/rows/events.js';
export { defineSheets } from './elements/define-sheets.js';
export type { ColumnMemory } from './exchange/table/columns.js';
export { clipboardHost } from './exchange/sheet-host/clipboard-host.js';
export type { ClipboardWords } from './exchange/sheet-host/clipboard-host.js';
export type { FilledCells, SheetBlock, SheetHost, SheetSelection, WrittenBlock } from './exchange/sheet-host/sheet-host.js';
