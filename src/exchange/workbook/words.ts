import { deWorkbook } from '../../locales/de-workbook.js';
import { de } from '../../locales/de.js';
import { enWorkbook } from '../../locales/en-workbook.js';
import { en } from '../../locales/en.js';
import type { Texts, Widened } from '../../locales/en.js';
import { fill } from '../../locales/fill.js';
import { fieldLabel, quantityName } from '../../locales/quantity-name.js';

/** What the workbook says, and the names of the quantities. */
export interface WorkbookWords {
  readonly texts: Texts;
  readonly own: Widened<typeof enWorkbook>;
}

/** English where the language, by its BCP 47 tag, is none of those spoken. */
export const workbookWords = (language: string): WorkbookWords => (/^de\b/i.test(language) ? { texts: de, own: deWorkbook } : { texts: en, own: enWorkbook });

const capital = (name: string): string => name.charAt(0).toUpperCase() + name.slice(1);

/** The name of a quantity as the head of its row. */
export const rowName = (key: string, { texts }: WorkbookWords): string => capital(quantityName(key, texts));

/** The name of a choice as the head of its row: its label, or what it says where no person makes it. */
export function choiceName(key: string, { texts, own }: WorkbookWords): string {
  const [, priced] = /^priced\.(.+)$/.exec(key) ?? [];
  if (priced) {
    const routes: Readonly<Record<string, string>> = own.ofRoute;
    return capital(fill(own.priced, { name: routes[priced] ?? quantityName(priced, texts) }));
  }
  const base = key.replace('retest.', '');
  const decided = (own.decided as Readonly<Record<string, string>>)[base];
  if (decided === undefined) return fieldLabel(key, texts);
  return capital(base === key ? decided : fill(own.retest, { name: decided }));
}
