import { html } from 'lit';
import { expect, vi } from 'vitest';
import { openBook } from '../../../src/book/book.js';
import type { Book } from '../../../src/book/book.js';
import { browserStore } from '../../../src/book/browser-store.js';
import type { EsterwayBook } from '../../../src/elements/book/book.js';
import { defineBook } from '../../../src/elements/define-book.js';
import { EMPTY_SITE } from '../../../src/index.js';
import type { LotEntry } from '../../../src/index.js';
import { deBook } from '../../../src/locales/de-book.js';
import { enBook } from '../../../src/locales/en-book.js';
import { certified, sour } from './lots.js';
import { controls, emulate, place, settled, words } from './page.js';
import { fill, plainSpaces } from './texts.js';

// Books in the browser's own database, one for each test.

defineBook();

let names = 0;
const elsewhere: Book[] = [];
/** The name of the test's database. */
export let name = '';

export function newName(): void {
  name = `book-test-${Date.now()}-${++names}`;
}

/** After a test: everything as it was. */
export async function clearAway(): Promise<void> {
  document.documentElement.style.colorScheme = '';
  vi.restoreAllMocks();
  await emulate();
  for (const book of elsewhere.splice(0)) await book.close();
  indexedDB.deleteDatabase(`_pouch_${name}`);
}

/** Waits for what the database answers. */
export async function until(element: Element, text: string): Promise<void> {
  await vi.waitFor(() => expect(words(element)).toContain(plainSpaces(text)), { timeout: 8000, interval: 20 });
  await settled();
}

/** Waits until the book is open, or is said not to open. */
export async function ready(element: Element): Promise<void> {
  const signs = [enBook, deBook].flatMap(({ keep, again }) => [keep, again]);
  await vi.waitFor(() => expect(controls(element).some((one) => signs.includes(words(one)))).toBe(true), { timeout: 8000, interval: 20 });
  await settled();
}

export async function placeBook(entry: LotEntry = sour, lang = 'en'): Promise<EsterwayBook> {
  const element = await place<EsterwayBook>(html`<esterway-book lang=${lang} name=${name} .entry=${entry}></esterway-book>`);
  await ready(element);
  return element;
}

/** The same database, opened beside the element. */
export async function openElsewhere(): Promise<Book> {
  const book = await openBook(name, { store: browserStore });
  if ('refused' in book) throw new Error(JSON.stringify(book));
  elsewhere.push(book);
  return book;
}

export const delivery = (of: string, ffa: string, source = 'Canteen', date = '2026-03-02'): LotEntry => ({ ...certified(ffa), name: of, source, date });

/** Three lots from two sources. */
export async function filled(): Promise<void> {
  const book = await openElsewhere();
  for (const entry of [delivery('HK-1', '1.2'), delivery('HK-2', '8', 'Snack fryers', '2026-03-04'), delivery('HK-3', '30', 'Canteen', '2026-03-06')]) await book.keep(entry, EMPTY_SITE, { by: 'Lenz' });
}

export const rows = (element: Element): HTMLElement[] => controls(element).filter((one) => one.matches('.row'));
export const rowNames = (element: Element): string[] => rows(element).map((row) => words(row.querySelector('b')!));
export const kept = (of: string, number: string): string => fill(enBook.kept, { name: of, number });
