import { html } from 'lit';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { EMPTY_SITE } from '../../src/index.js';
import type { EsterwaySite } from '../../src/index.js';
import { enBook } from '../../src/locales/en-book.js';
import { clearAway, delivery, filled, kept, name, newName, openElsewhere, placeBook, ready, rowNames, rows, until } from './tools/books.js';
import { button, choose, click, controls, deep, enter, find, focusedName, input, place, settled, words } from './tools/page.js';
import { clean, figure, site, sour } from './tools/lots.js';
import { en, fill } from './tools/texts.js';

beforeEach(newName);
afterEach(clearAway);

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
    expect(words(rows(element)[0]!)).toContain(enBook.states['for-pretreatment']);
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
    const modules = ['book/book', 'book/browser-store'].map((file) => JSON.stringify(`${location.origin}/src/${file}.ts`));
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

  test('under another name there is another book', async () => {
    const element = await placeBook();
    await click(button(element, enBook.keep));
    await until(element, kept('HK-0417', '1'));
    const before = name;
    newName();
    element.name = name;
    await until(element, enBook.empty);
    element.name = before;
    await vi.waitFor(() => expect(rowNames(element)).toEqual(['HK-0417']));
    element.remove();
    indexedDB.deleteDatabase(`_pouch_${before}`);
  });
});
