import { showNumber } from '../../exchange/number-format.js';
import type { WriteFigure } from '../../formula/working-text.js';
import { workingFigure } from '../../lot/working.js';

/** Figures with their units as a working shows them, in the page's language. */
export const figureWriter = (tag: string): WriteFigure => (value, unit) => workingFigure(value, unit).replace(/^[-\d.]+/, (digits) => showNumber(digits, tag));
