import { expect as expectPage } from '@open-wc/testing';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { EsterwayBook } from '../../src/elements/book/book.js';
import { deBook as german } from '../../src/locales/de-book.js';
import { enBook } from '../../src/locales/en-book.js';
import { clearAway, delivery, filled, kept, newName, placeBook, rowNames, rows, until } from './tools/books.js';
import { button, click, controls, deep, emulate, enter, focusedName, input, nameOf, press, settled, words } from './tools/page.js';
import { de, fill } from './tools/texts.js';

const passes = (element: Element) => expectPage(element).to.be.accessible();
/** Chooses a file to restore. */
async function restore(element: EsterwayBook, text: string): Promise<void> {
  const field = element.shadowRoot!.querySelector<HTMLInputElement>('input[type=file]')!;
  const chosen = new DataTransfer();
  chosen.items.add(new File([text], 'book.json'));
  field.files = chosen.files;
  field.dispatchEvent(new Event('change'));
  await settled();
}
const openWhole = (element: EsterwayBook): Promise<void> => click(controls(element).find((one) => words(one) === enBook.whole)!);

beforeEach(newName);
afterEach(clearAway);

describe('the whole book', () => {
  const exported = async (element: EsterwayBook): Promise<{ readonly text: string; readonly file: string }> => {
    const blobs: Blob[] = [];
    vi.spyOn(URL, 'createObjectURL').mockImplementation((blob) => (blobs.push(blob as Blob), '#'));
    const files: string[] = [];
    vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function (this: HTMLAnchorElement) {
      files.push(this.download);
    });
    await openWhole(element);
    await click(button(element, enBook.export));
    await vi.waitFor(() => expect(files).toHaveLength(1));
    await until(element, fill(enBook.exported, { count: '3', file: files[0]! }));
    return { text: await blobs[0]!.text(), file: files[0]! };
  };
  test('goes into a file, and from there into another book', async () => {
    await filled();
    const element = await placeBook();
    const { text, file } = await exported(element);
    expect(file).toMatch(new RegExp(`^book-test-[\\d-]+-\\d{4}-\\d\\d-\\d\\d\\.json$`));
    expect((JSON.parse(text) as { records: unknown[] }).records).toHaveLength(3);
    element.remove();
    newName();
    const other = await placeBook();
    await openWhole(other);
    await restore(other, text);
    await until(other, fill(enBook.restored, { added: '3', already: '0' }));
    expect(rowNames(other)).toEqual(['HK-3', 'HK-2', 'HK-1']);
    await restore(other, text.replace('"name":"HK-1"', '"name":"forged"'));
    await until(other, fill(enBook.different, { count: '1' }));
    expect(rowNames(other)).toEqual(['HK-3', 'HK-2', 'HK-1']);
    await restore(other, text.replace('"version":1', '"version":2'));
    await until(other, enBook.faults['newer-version']);
    await restore(other, 'a shopping list');
    await until(other, enBook.faults['not-json']);
  });
});

describe('what goes wrong', () => {
  test('a disk that is full is said, what was typed stays, and later it is kept', async () => {
    const element = await placeBook();
    await enter(element, enBook.by, 'M. Lenz');
    // as the database hands the browser's QuotaExceededError on
    const full = Object.assign(new Error('QuotaExceededError'), { name: 'indexed_db_went_bad', reason: 'QuotaExceededError' });
    const put = vi.spyOn(element['book']!['store'], 'put').mockRejectedValue(full);
    await click(button(element, enBook.keep));
    await until(element, enBook.faults['storage-full']);
    expect([input(element, enBook.by).value, element.entry.name, rows(element).length]).toEqual(['M. Lenz', 'HK-0417', 0]);
    put.mockRestore();
    await click(button(element, enBook.keep));
    await until(element, kept('HK-0417', '1'));
  });

  test('a browser that keeps nothing is said; allowed, it opens', async () => {
    const there = vi.spyOn(window, 'indexedDB', 'get').mockReturnValue(undefined as never);
    const element = await placeBook();
    expect(words(element)).toContain(enBook.faults['no-storage']);
    await passes(element);
    there.mockRestore();
    await click(button(element, enBook.again));
    await until(element, enBook.empty);
  });

  test('so is one that refuses to open it, at once or after a while', async () => {
    const denied = new DOMException('denied', 'SecurityError');
    const there = vi.spyOn(IDBFactory.prototype, 'open').mockImplementation(() => {
      throw denied;
    });
    expect(words(await placeBook())).toContain(enBook.faults['no-storage']);
    there.mockImplementation(() => {
      const request = new EventTarget() as unknown as IDBOpenDBRequest & { error: DOMException };
      Object.defineProperty(request, 'error', { value: denied });
      setTimeout(() => request.onerror?.(Object.defineProperty(new Event('error'), 'target', { value: request })));
      return request;
    });
    newName();
    expect(words(await placeBook())).toContain(enBook.faults['no-storage']);
  });
});

describe('on every page', () => {
  const full = async (lang = 'en'): Promise<EsterwayBook> => {
    await filled();
    const element = await placeBook({ ...delivery('HK-2', '9', 'Snack fryers', '2026-03-04') }, lang);
    await click(rows(element)[0]!);
    const texts = lang === 'de' ? german : enBook;
    await until(element, texts.amendThis);
    await click(button(element, texts.keep));
    await until(element, texts.leave);
    for (const one of deep(element)) if (one.localName === 'details') (one as HTMLDetailsElement).open = true;
    await settled();
    return element;
  };

  test('axe finds nothing, in the dark neither', async () => {
    const element = await full();
    await passes(element);
    document.documentElement.style.colorScheme = 'light dark';
    await emulate({ 'prefers-color-scheme': 'dark' });
    await passes(element);
  });

  test('in German, with commas', async () => {
    const element = await full('de');
    const text = words(element);
    expect(text).toContain('FFA 30,0 %');
    expect(text).toContain(german.states['two-step']);
    expect(text).toContain(fill(german.change, { field: de.fields.certificateFfa, before: '8 %', after: '9 %' }));
    await passes(element);
  });

  test.each([270, 320, 700])('nothing is wider than %i px, and targets keep 44 px', async (width) => {
    const element = await full('de');
    element.style.inlineSize = `${width}px`;
    await settled();
    const { left, right } = element.getBoundingClientRect();
    for (const one of deep(element)) {
      if (one.closest('.unseen') || !one.checkVisibility()) continue;
      const box = one.getBoundingClientRect();
      if (box.width === 0) continue;
      expect([one.localName, one.className, box.right <= right + 0.5 && box.left >= left - 0.5]).toEqual([one.localName, one.className, true]);
    }
    for (const one of controls(element)) expect([nameOf(one), one.getBoundingClientRect().height >= 43.5]).toEqual([nameOf(one), true]);
  });

  test('keys lead through it: a row opens and closes by Enter', async () => {
    await filled();
    const element = await placeBook();
    input(element, enBook.by).focus();
    await press('{Enter}');
    expect(focusedName()).toBe(enBook.search);
    rows(element)[0]!.focus();
    await press('{Enter}');
    await until(element, enBook.amendThis);
    expect(rows(element)[0]!.getAttribute('aria-expanded')).toBe('true');
    await press('{Enter}');
    expect(words(element)).not.toContain(enBook.amendThis);
  });
});
