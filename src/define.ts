// Registers all elements.

import { defineEsterway } from './elements/define-all.js';

defineEsterway();

export * from './index.js';
