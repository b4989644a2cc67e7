import { en } from './en.js';
import type { Texts } from './en.js';
export const de: Texts = en;
