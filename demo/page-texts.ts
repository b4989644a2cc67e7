import { german } from './german.ts';
import type { Language } from './settings.ts';

/** Sentences with a figure in them. */
const SENTENCES = {
  en: { event: 'Change event:', ffa: 'FFA {ffa} %', noFfa: 'FFA not known', faults: 'not a lot', stray: 'On the bench, not in the list: {lot}.', untitled: 'a new lot' },
  de: { event: 'Change-Ereignis:', ffa: 'FFA {ffa} %', noFfa: 'FFA nicht bekannt', faults: 'keine Partie', stray: 'Auf dem Arbeitsplatz, nicht in der Liste: {lot}.', untitled: 'eine neue Partie' },
} as const;

export const sentence = (lang: Language, key: keyof (typeof SENTENCES)['en'], word = ''): string =>
  SENTENCES[lang][key].replace(/\{\w+\}/, word);

const english = new Map<Element, string>();

/** Puts the page's own texts into a language; the English ones are those it came with. */
export function writeTexts(lang: Language): void {
  for (const element of document.querySelectorAll<HTMLElement>('[data-text], [data-label]')) {
    const { text, label } = element.dataset;
    const now = text === undefined ? element.ariaLabel : element.textContent;
    if (!english.has(element)) english.set(element, now ?? '');
    const words = (lang === 'de' ? german[text ?? label ?? ''] : undefined) ?? english.get(element) ?? '';
    if (text === undefined) element.ariaLabel = words;
    else element.textContent = words;
  }
}

/** A day in words. */
export function dayWords(day: string, lang: Language): string {
  const format = new Intl.DateTimeFormat(lang === 'en' ? 'en-GB' : lang, { dateStyle: 'full', timeZone: 'UTC' });
  return format.format(new Date(`${day}T00:00:00Z`));
}

/** Decimal text with all its digits, as a language writes it. */
export function figureWords(text: string, lang: Language): string {
  const decimals = text.split('.')[1]?.length ?? 0;
  const digits = { minimumFractionDigits: decimals, maximumFractionDigits: decimals, useGrouping: false };
  return new Intl.NumberFormat(lang, digits).format(Number(text));
}
