import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { cdp } from 'vitest/browser';
import { openBook } from '../../src/book/book.js';
import type { Book } from '../../src/book/book.js';
import { browserStore } from '../../src/book/browser-store.js';
import type { EsterwayBook } from '../../src/elements/book/book.js';
import { defineBook } from '../../src/elements/define-book.js';
import { EMPTY_SITE } from '../../src/index.js';
import type { EsterwaySite, LotEntry } from '../../src/index.js';
import { deBook as german } from '../../src/locales/de-book.js';
import { enBook } from '../../src/locales/en-book.js';
import { button, choose, click, controls, deep, emulate, enter, find, focusedName, input, nameOf, place, press, settled, words } from './tools/page.js';
import { certified, clean, figure, site, sour } from './tools/lots.js';
import { de, en, fill, plainSpaces } from './tools/texts.js';

defineBook();

let names = 0;
let name = '';
const elsewhere: Book[] = [];
beforeEach(() => (name = `book-test-${Date.now()}-${++names}`));
afterEach(async () => {
  document.documentElement.style.colorScheme = '';
  vi.restoreAllMocks();
  await emulate();
  for (const book of elsewhere.splice(0)) await book.close();
  indexedDB.deleteDatabase(`_pouch_${name}`);
});

/** Waits for what the database answers. */
async function until(element: Element, text: string): Promise<void> {
  await vi.waitFor(() => expect(words(element)).toContain(plainSpaces(text)), { timeout: 8000, interval: 20 });
  await settled();
}
const ready = async (element: Element, opening = enBook.opening): Promise<void> => {
  await vi.waitFor(() => expect(words(element)).not.toContain(opening), { timeout: 8000, interval: 20 });
  await settled();
};

async function placeBook(entry: LotEntry = sour, lang = 'en'): Promise<EsterwayBook> {
  const element = await place<EsterwayBook>(html`<esterway-book lang=${lang} name=${name} .entry=${entry}></esterway-book>`);
  await ready(element, lang === 'de' ? german.opening : enBook.opening);
  return element;
}

/** The same database as another tab has it open. */
async function openElsewhere(): Promise<Book> {
  const book = await openBook(name, { store: browserStore });
  if ('refused' in book) throw new Error(JSON.stringify(book));
  elsewhere.push(book);
  return book;
}

const delivery = (of: string, ffa: string, source = 'Canteen', date = '2026-03-02'): LotEntry => ({ ...certified(ffa), name: of, source, date });
async function filled(): Promise<void> {
  const book = await openElsewhere();
  for (const entry of [delivery('HK-1', '1.2'), delivery('HK-2', '8', 'Snack fryers', '2026-03-04'), delivery('HK-3', '30', 'Canteen', '2026-03-06')]) await book.keep(entry, EMPTY_SITE, { by: 'Lenz' });
}
const rows = (element: Element): HTMLElement[] => controls(element).filter((one) => one.matches('.row'));
const rowNames = (element: Element): string[] => rows(element).map((row) => words(row.querySelector('b')!));
const kept = (of: string, number: string): string => fill(enBook.kept, { name: of, number });
const passes = (element: Element) => expectPage(element).to.be.accessible();

describe('keeping the lot on the bench', () => {
  test('is said with its number, told as an event, and there when the page is opened again', async () => {
    const element = await placeBook();
    expect(words(element)).toContain(enBook.empty);
    const told: unknown[] = [];
    element.addEventListener('esterway-kept', ({ id, version }) => told.push([typeof id, version]));
    await enter(element, enBook.by, 'M. Lenz');
    await click(button(element, enBook.keep));
    await until(element, kept('HK-0417', '1'));
    expect(told).toEqual([['string', 1]]);
    expect(rowNames(element)).toEqual(['HK-0417']);
    expect(words(rows(element)[0]!)).toContain('FFA 4.29 %');
    element.remove();
    const again = await placeBook();
    expect(rowNames(again)).toEqual(['HK-0417']);
  });

  test('twice unchanged is noticed, also after the page was opened again', async () => {
    const element = await placeBook();
    await click(button(element, enBook.keep));
    await until(element, kept('HK-0417', '1'));
    element.remove();
    const again = await placeBook();
    await click(button(again, enBook.keep));
    await until(again, fill(enBook.unchanged, { name: 'HK-0417', number: '1' }));
    expect(rows(again)).toHaveLength(1);
  });

  test('nothing on the bench is said, and nothing is opened before the element is on a page', async () => {
    const element = document.createElement('esterway-book');
    element.name = name;
    expect((await indexedDB.databases()).map((one) => one.name)).not.toContain(`_pouch_${name}`);
    document.body.append(element);
    await ready(element);
    expect((await indexedDB.databases()).map((one) => one.name)).toContain(`_pouch_${name}`);
    await click(button(element, enBook.keep));
    await until(element, enBook.faults['empty-lot']);
    element.remove();
  });
});

describe('amending', () => {
  test('a lot of that name that is otherwise now: what changed, a reason, the next version; the earlier one stays', async () => {
    const element = await placeBook();
    await click(button(element, enBook.keep));
    await until(element, kept('HK-0417', '1'));
    element.entry = { ...sour, figures: { ...sour.figures, oilAmount: figure('950 kg') }, runs: sour.runs.map((run, i) => (i ? { ...run, struck: 'spilled' } : run)) };
    await settled();
    await click(button(element, enBook.keep));
    await until(element, fill(enBook.change, { field: 'amount of oil', before: '900 kg', after: '950 kg' }));
    expect(words(element)).toContain(fill(enBook.change, { field: 'run 2: struck out', before: enBook.nothing, after: 'spilled' }));
    expect(focusedName()).toBe(enBook.reason);
    // without a reason it is asked for, and nothing is kept
    await click(button(element, fill(enBook.amend, { number: '2' })));
    await until(element, enBook.faults['reason-missing']);
    await enter(element, enBook.reason, 'weighed again');
    await click(button(element, fill(enBook.amend, { number: '2' })));
    await until(element, kept('HK-0417', '2'));
    expect(focusedName()).toBe(enBook.keep);
    await click(rows(element)[0]!);
    await until(element, 'weighed again');
    const list = [...deep(element)].find((one) => one.matches('ol.versions'))!;
    expect([...list.children].map((item) => words(item).slice(0, 9))).toEqual(['Version 1', 'Version 2']);
    expect(words(list.children[1]!)).toContain(fill(enBook.change, { field: 'amount of oil', before: '900 kg', after: '950 kg' }));
  });

  test('or it is kept as another lot, or left', async () => {
    const element = await placeBook();
    await click(button(element, enBook.keep));
    await until(element, kept('HK-0417', '1'));
    element.entry = { ...sour, figures: { ...sour.figures, oilAmount: figure('950 kg') } };
    await settled();
    await click(button(element, enBook.keep));
    await until(element, enBook.leave);
    await click(button(element, enBook.leave));
    await click(button(element, enBook.keep));
    await until(element, enBook.another);
    await click(button(element, enBook.another));
    await until(element, kept('HK-0417', '1'));
    expect(rowNames(element)).toEqual(['HK-0417', 'HK-0417']);
  });

  test('what another window amended meanwhile is shown, not written over', async () => {
    const element = await placeBook();
    await click(button(element, enBook.keep));
    await until(element, kept('HK-0417', '1'));
    await click(rows(element)[0]!);
    await until(element, enBook.amendThis);
    element.entry = { ...sour, figures: { ...sour.figures, oilAmount: figure('950 kg') } };
    await settled();
    await click(button(element, enBook.amendThis));
    await enter(element, enBook.reason, 'weighed again');
    const other = await openElsewhere();
    const [{ lot } = { lot: '' }] = other.find().lots;
    await other.amend(lot, { ...sour, figures: { ...sour.figures, waterContent: figure('0.2 %') } }, EMPTY_SITE, { reason: 'dried' });
    await click(button(element, fill(enBook.amend, { number: '2' })));
    await until(element, fill(enBook.faults['amended-meanwhile'], { number: '2' }));
    expect(input(element, enBook.reason).value).toBe('weighed again');
    expect(words(element)).toContain(fill(enBook.change, { field: 'water', before: '0.2 %', after: '0.08 %' }));
    await click(button(element, fill(enBook.amend, { number: '3' })));
    await until(element, kept('HK-0417', '3'));
  });
});

describe('finding', () => {
  test('by words, source, state, days and FFA; how many there are is said', async () => {
    await filled();
    const element = await placeBook();
    expect(rowNames(element)).toEqual(['HK-3', 'HK-2', 'HK-1']);
    await enter(element, enBook.search, 'lenz canteen');
    expect(rowNames(element)).toEqual(['HK-3', 'HK-1']);
    expect(words(element)).toContain(fill(enBook.found, { shown: '2', total: '2' }));
    await enter(element, enBook.search, '');
    await click(controls(element).find((one) => words(one) === enBook.narrow)!);
    await choose(element, enBook.source, 'Snack fryers');
    expect(rowNames(element)).toEqual(['HK-2']);
    await choose(element, enBook.source, '');
    await choose(element, enBook.state, 'direct');
    expect(rowNames(element)).toEqual(['HK-1']);
    await choose(element, enBook.state, '');
    await enter(element, enBook.from, '2026-03-03');
    await enter(element, enBook.to, '2026-03-05');
    expect(rowNames(element)).toEqual(['HK-2']);
    await enter(element, enBook.to, '2026-03-01');
    expect(words(element)).toContain(enBook.daysReversed);
    expect(words(element)).toContain(enBook.noneFound);
    await enter(element, enBook.from, '');
    await enter(element, enBook.to, '');
    await enter(element, enBook.ffaFrom, '8');
    expect(rowNames(element)).toEqual(['HK-3', 'HK-2']);
    await enter(element, enBook.ffaTo, 'nine');
    input(element, enBook.search).focus();
    await settled();
    expect(words(element)).toContain(fill(en.problems['not-a-number'], { typed: 'nine' }));
    expect(rowNames(element)).toEqual(['HK-3', 'HK-2']);
  });

  test('twenty at first, the others at a press', async () => {
    const book = await openElsewhere();
    for (let i = 1; i <= 23; i++) await book.keep(delivery(`L-${i}`, '1.2'), EMPTY_SITE);
    const element = await placeBook();
    expect(rows(element)).toHaveLength(20);
    expect(words(element)).toContain(fill(enBook.found, { shown: '20', total: '23' }));
    await click(button(element, enBook.more));
    expect(rows(element)).toHaveLength(23);
  });

  test('a kept lot is put on the bench, and the one before comes back', async () => {
    await filled();
    const page = await place<EsterwaySite>(html`<esterway-site .entry=${sour} .site=${site({ figures: { directLimit: '2 %' } })}><esterway-lot></esterway-lot><esterway-book name=${name}></esterway-book></esterway-site>`);
    const element = find(page, 'esterway-book');
    await ready(element);
    await click(rows(element)[1]!);
    await until(element, enBook.open);
    await click(button(element, enBook.open));
    expect(page.entry.name).toBe('HK-2');
    expect(input(find(page, 'esterway-lot'), en.lot.name).value).toBe('HK-2');
    expect(words(element)).toContain(fill(enBook.opened, { number: '1', name: 'HK-2' }));
    expect(words(element)).toContain(enBook.otherSite);
    await click(button(element, enBook.undo));
    expect(page.entry).toEqual(sour);
    expect(words(element)).not.toContain(enBook.otherSite);
  });
});

describe('two windows at once', () => {
  test('what a window of its own keeps appears here', async () => {
    const element = await placeBook();
    const frame = document.body.appendChild(document.createElement('iframe'));
    const modules = ['book/book', 'book/browser-store'].map((file) => JSON.stringify(new URL(`../../src/${file}.ts`, import.meta.url).href));
    // a document of its own: its own code, its own connection to the database
    frame.srcdoc = `<script type="module">
      const [{ openBook }, { browserStore }] = await Promise.all([${modules.map((one) => `import(${one})`).join(',')}]);
      const book = await openBook(${JSON.stringify(name)}, { store: browserStore });
      await book.keep(${JSON.stringify(clean)}, ${JSON.stringify(EMPTY_SITE)});
    </script>`;
    await vi.waitFor(() => expect(rowNames(element)).toEqual(['HK-0412']), { timeout: 15_000 });
    frame.remove();
  });

  test('two elements of a page share one book, and it outlives either', async () => {
    const [first, second] = [await placeBook(), await placeBook(clean)];
    await click(button(first, enBook.keep));
    await vi.waitFor(() => expect(rowNames(second)).toEqual(['HK-0417']));
    first.remove();
    await click(button(second, enBook.keep));
    await until(second, kept('HK-0412', '1'));
    // moved, it goes on
    document.body.append(second);
    await ready(second);
    expect(rowNames(second)).toEqual(['HK-0412', 'HK-0417']);
    second.remove();
  });
});

describe('the whole book', () => {
  const exported = async (element: EsterwayBook): Promise<{ readonly text: string; readonly file: string }> => {
    const blobs: Blob[] = [];
    vi.spyOn(URL, 'createObjectURL').mockImplementation((blob) => (blobs.push(blob as Blob), '#'));
    const files: string[] = [];
    vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function (this: HTMLAnchorElement) {
      files.push(this.download);
    });
    await click(controls(element).find((one) => words(one) === enBook.whole)!);
    await click(button(element, enBook.export));
    await until(element, fill(enBook.exported, { count: '3', file: files[0] ?? '?' }));
    return { text: await blobs[0]!.text(), file: files[0]! };
  };
  const restore = async (element: EsterwayBook, text: string): Promise<void> => {
    const field = element.shadowRoot!.querySelector<HTMLInputElement>('input[type=file]')!;
    const chosen = new DataTransfer();
    chosen.items.add(new File([text], 'book.json'));
    field.files = chosen.files;
    field.dispatchEvent(new Event('change'));
    await settled();
  };

  test('goes into a file, and from there into another book', async () => {
    await filled();
    const element = await placeBook();
    const { text, file } = await exported(element);
    expect(file).toMatch(new RegExp(`^${name}-\\d{4}-\\d\\d-\\d\\d\\.json$`));
    expect((JSON.parse(text) as { records: unknown[] }).records).toHaveLength(3);
    element.remove();
    name += '-b';
    const other = await placeBook();
    await click(controls(other).find((one) => words(one) === enBook.whole)!);
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
    const origin = location.origin;
    const { usage } = (await cdp().send('Storage.getUsageAndQuota' as never, { origin } as never)) as { usage: number };
    await cdp().send('Storage.overrideQuotaForOrigin' as never, { origin, quotaSize: Math.max(1, usage - 1) } as never);
    try {
      element.entry = { ...sour, source: 'x'.repeat(9000) };
      await settled();
      await click(button(element, enBook.keep));
      await until(element, enBook.faults['storage-full']);
      expect(input(element, enBook.by).value).toBe('M. Lenz');
      expect(element.entry.name).toBe('HK-0417');
      expect(rows(element)).toHaveLength(0);
    } finally {
      await cdp().send('Storage.overrideQuotaForOrigin' as never, { origin } as never);
    }
    element.entry = sour;
    await settled();
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
