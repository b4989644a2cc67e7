import { de as german } from '../../../src/locales/de.js';
import { en as english } from '../../../src/locales/en.js';
import { fill as filled } from '../../../src/locales/fill.js';
import type { Texts } from '../../../src/locales/en.js';

export type { Texts } from '../../../src/locales/en.js';

/** Any white space as one plain space: where a line may break is not what the tests of the elements are about. */
export const plainSpaces = (text: string): string => text.replace(/\s+/g, ' ').trim();

/** A sentence with its figures, as a test compares it. */
export const fill = (...sentence: Parameters<typeof filled>): string => plainSpaces(filled(...sentence));

export const en = withPlainSpaces(english) as typeof english;
export const de = withPlainSpaces(german) as Texts;

function withPlainSpaces(texts: unknown): unknown {
  if (typeof texts === 'string') return plainSpaces(texts);
  if (Array.isArray(texts)) return texts.map(withPlainSpaces);
  return Object.fromEntries(Object.entries(texts as object).map(([key, text]) => [key, withPlainSpaces(text)]));
}
