import { deWorkbook } from '../../locales/de-workbook.js';
import { de } from '../../locales/de.js';
import { enWorkbook } from '../../locales/en-workbook.js';
import { en } from '../../locales/en.js';
import type { Texts, Widened } from '../../locales/en.js';

/** What the workbook says, and the names of the quantities. */
export interface WorkbookWords {
  readonly texts: Texts;
  readonly own: Widened<typeof enWorkbook>;
}

/** English where the language, by its BCP 47 tag, is none of those spoken. */
export const workbookWords = (language: string): WorkbookWords => (/^de\b/i.test(language) ? { texts: de, own: deWorkbook } : { texts: en, own: enWorkbook });
