// The intake book with its database: class, and its registration. The panel fetches it by itself when a person opens it; a page that
// uses it alone imports this.

import { defineBook } from './elements/define-book.js';

defineBook();

export { EsterwayBook } from './elements/book/book.js';
export { EsterwayKeptEvent } from './elements/book/events.js';
export { EsterwayHistory } from './elements/history/history.js';
export { defineBook } from './elements/define-book.js';
export { openBook } from './book/book.js';
export { browserStore } from './book/browser-store.js';
