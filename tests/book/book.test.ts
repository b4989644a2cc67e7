import { describe, expect, it } from 'vitest';
import { readRecord } from '../../src/book/record.js';
import { EMPTY_LOT, EMPTY_SITE } from '../../src/core.js';
import type { SiteProfile } from '../../src/core.js';
import { figure, lot, run } from '../lot/lot.js';
import { clock, delivery, done, inMemory, keep, newName, open, refused, textOf } from './books.js';

const SITE: SiteProfile = { ...EMPTY_SITE, figures: { directLimit: figure('2 %') } };

describe('keeping', () => {
  it('a lot as it was typed, with the site values in force and what was found', async () => {
    const book = await open();
    const entry = { ...lot({ figures: { oilAmount: '900 kg', waterContent: '800 mg/kg', titrantStrength: '0.1023 mol/L', blank: '0.05 mL' }, options: { blankPolicy: 'blank-subtracted' }, runs: [run('2.504 g', '0.00', '3.72'), run('2.497 g', '3.72', '7.44')] }), name: 'HK-0417', source: 'Hafenküche', date: '2026-03-01' };
    const { record, unchanged } = done(await book.keep(entry, SITE, { by: 'M. Lenz' }));
    expect(unchanged).toBe(false);
    expect(record).toMatchObject({
      version: 1, number: 1, keptAt: '2026-03-02T08:01:00.000Z', by: 'M. Lenz', entry, site: SITE,
      summary: { name: 'HK-0417', source: 'Hafenküche', date: '2026-03-01', acidValue: '8.4', freeFattyAcid: '4.23', water: '0.08', route: 'two-step', state: 'two-step' },
    });
    expect(done(await book.versions(record.lot))).toEqual([record]);
    expect(readRecord(record)).toBe(record);
  });

  it('water that only a usual value stands for is not noted; a judge says what becomes of a delivery', async () => {
    const book = await open(undefined, { stateOf: ({ name }) => `judged ${name}` });
    const { summary } = (await keep(book, delivery('A', '1.2'))).record;
    expect(summary).not.toHaveProperty('water');
    expect(summary).toMatchObject({ route: 'direct', state: 'judged A' });
    expect(book.states()).toEqual(['judged A']);
  });

  it('the same lot twice is noticed, also by another bench’s order of keys; a lot that differs in a digit is another', async () => {
    const book = await open();
    const first = await keep(book, delivery('A', '1.20'));
    const { name, ...rest } = delivery('A', '1.20');
    expect(await book.keep({ ...rest, name } as typeof first.record.entry, EMPTY_SITE)).toEqual({ record: first.record, unchanged: true });
    expect((await keep(book, delivery('A', '1.2'))).unchanged).toBe(false);
    expect(done(await book.keep(delivery('A', '1.20'), SITE)).unchanged).toBe(false);
    expect(book.size).toBe(3);
  });

  it('what cannot be kept is refused with a code, and the book stays as it was', async () => {
    const book = await open();
    expect(refused(await book.keep(EMPTY_LOT, EMPTY_SITE))).toBe('empty-lot');
    expect(refused(await book.keep({ ...EMPTY_LOT, options: { catalyst: 'KOH' } }, EMPTY_SITE))).toBe('empty-lot');
    expect(refused(await book.keep({ ...EMPTY_LOT, figures: { nonsense: figure('1 kg') } }, EMPTY_SITE))).toBe('unreadable-lot');
    expect(book.size).toBe(0);
  });

  it('survives closing: opened again, everything is there', async () => {
    const name = newName();
    const book = await open(name);
    const { record } = await keep(book, delivery('A', '1.2'));
    await book.close();
    const again = await open(name);
    expect(again.find().lots.map(({ id }) => id)).toEqual([record.id]);
    expect(done(await again.versions(record.lot))).toEqual([record]);
  });
});

describe('amending', () => {
  it('writes a further version; the earlier ones stay as they were', async () => {
    const book = await open();
    const { record: first } = await keep(book, delivery('A', '1.2'));
    const { record: second } = done(await book.amend(first.lot, delivery('A', '12'), EMPTY_SITE, { reason: ' figure misread ', by: 'K.' }));
    expect(second).toMatchObject({ lot: first.lot, number: 2, reason: 'figure misread', by: 'K.', summary: { freeFattyAcid: '12.0' } });
    expect(done(await book.versions(first.lot))).toEqual([first, second]);
    expect(book.find()).toMatchObject({ total: 1, lots: [{ id: second.id, number: 2 }] });
    expect(second.id > first.id).toBe(true);
  });

  it('asks for a reason, knows its lots, and notices that nothing changed', async () => {
    const book = await open();
    const { record } = await keep(book, delivery('A', '1.2'));
    expect(refused(await book.amend(record.lot, delivery('A', '2'), EMPTY_SITE, { reason: '  ' }))).toBe('reason-missing');
    expect(refused(await book.amend('20260302T080000000Z-aaaaaa-aaaa', delivery('A', '2'), EMPTY_SITE, { reason: 'x' }))).toBe('unknown-lot');
    expect(refused(await book.versions('nothing'))).toBe('unknown-lot');
    expect(await book.amend(record.lot, record.entry, EMPTY_SITE, { reason: 'x' })).toEqual({ record, unchanged: true });
  });

  it('is refused where another has amended it meanwhile; done all the same at two places, both versions stand', async () => {
    const name = newName();
    const [here, there] = [await open(name), await open(name)];
    const { record } = await keep(here, delivery('A', '1.2'));
    done(await there.amend(record.lot, delivery('A', '2'), EMPTY_SITE, { reason: 'there', onto: record.id }));
    expect(await here.amend(record.lot, delivery('A', '3'), EMPTY_SITE, { reason: 'here', onto: record.id })).toEqual({ refused: 'amended-meanwhile', params: { number: '2' } });
    await Promise.all([here.amend(record.lot, delivery('A', '4'), EMPTY_SITE, { reason: 'at once' }), there.amend(record.lot, delivery('A', '5'), EMPTY_SITE, { reason: 'at once' })]);
    const versions = done(await here.versions(record.lot));
    expect(versions).toHaveLength(4);
    expect(versions.map(({ entry }) => entry.figures['certificateFfa'])).toEqual(expect.arrayContaining([figure('4 %'), figure('5 %')]));
    expect(done(await there.versions(record.lot))).toEqual(versions);
  });
});

describe('finding', () => {
  const filled = async () => {
    const book = await open(undefined, { now: clock('2026-03-05T08:00:00.000Z') });
    await keep(book, delivery('HK-1', '1.20', 'Hafenküche', '2026-03-01'));
    await keep(book, delivery('HK-2', '4.0', 'Hafenküche', '2026-03-03'));
    await keep(book, delivery('C-1', '30', 'Canteen', '2026-03-02'));
    await keep(book, delivery('C-2', '0.4', 'Canteen', 'early March'));
    return book;
  };
  const names = ({ lots }: { lots: readonly { readonly summary: { readonly name?: string } }[] }) => lots.map(({ summary }) => summary.name);

  it('by source, days, state, FFA and words, the newest first', async () => {
    const book = await filled();
    expect(names(book.find())).toEqual(['C-2', 'C-1', 'HK-2', 'HK-1']);
    expect(names(book.find({ source: 'Hafenküche' }))).toEqual(['HK-2', 'HK-1']);
    expect(names(book.find({ from: '2026-03-02', to: '2026-03-03' }))).toEqual(['C-1', 'HK-2']);
    // no date that can be read: the day of keeping
    expect(names(book.find({ from: '2026-03-05' }))).toEqual(['C-2']);
    expect(names(book.find({ ffaFrom: '1.2', ffaTo: '4.00' }))).toEqual(['HK-2', 'HK-1']);
    expect(names(book.find({ state: 'direct' }))).toEqual(['C-2', 'HK-1']);
    expect(names(book.find({ text: 'KUCHE 2' }))).toEqual(['HK-2']);
    expect(names(book.find({ text: 'hk canteen' }))).toEqual([]);
    expect(book.find({ limit: 1, skip: 1 })).toMatchObject({ total: 4, lots: [{ summary: { name: 'C-1' } }] });
    expect(book.sources()).toEqual(['Canteen', 'Hafenküche']);
  });

  it('by who kept it and why, and by what it is now, not what it was', async () => {
    const book = await filled();
    const [{ lot: id = '' } = {}] = book.find({ text: 'hk-1' }).lots;
    done(await book.amend(id, delivery('HK-1b', '9', 'Kantine', '2026-03-01'), EMPTY_SITE, { reason: 'Wrong supplier', by: 'Lenz' }));
    expect(names(book.find({ text: 'supplier lenz' }))).toEqual(['HK-1b']);
    expect(names(book.find({ source: 'Hafenküche' }))).toEqual(['HK-2']);
    expect(book.sources()).toEqual(['Canteen', 'Hafenküche', 'Kantine']);
  });

  it('the history of a source, the oldest delivery first', async () => {
    const book = await filled();
    expect(book.history('Hafenküche').map(({ date, freeFattyAcid, acidValue }) => [date, freeFattyAcid, acidValue])).toEqual([['2026-03-01', '1.20', '2.4'], ['2026-03-03', '4.00', '8.0']]);
    expect(book.history('Canteen').map(({ date }) => date)).toEqual(['2026-03-02', '2026-03-05']);
    expect(book.history('nobody')).toEqual([]);
  });
});

describe('two at once', () => {
  it('what one keeps the other sees and is told of', async () => {
    const name = newName();
    const [here, there] = [await open(name), await open(name)];
    const told = new Promise<void>((done) => there.watch(done));
    await keep(here, delivery('A', '1.2'));
    await told;
    expect(there.find().lots).toEqual(here.find().lots);
  });
});

describe('the whole book', () => {
  const twoLots = async () => {
    const book = await open();
    const { record } = await keep(book, delivery('A', '1.2'));
    done(await book.amend(record.lot, delivery('A', '2'), EMPTY_SITE, { reason: 'again' }));
    await keep(book, delivery('B', '3'));
    return book;
  };

  it('goes into a file and out of it, all versions the same', async () => {
    const book = await twoLots();
    const text = await textOf(book);
    expect(JSON.parse(text)).toMatchObject({ format: 'esterway-book', version: 1, records: [{ number: 1 }, { number: 2 }, { number: 1 }] });
    const other = await open();
    expect(await other.restore(text)).toEqual({ added: 3, already: 0, different: 0 });
    expect(other.find().lots).toEqual(book.find().lots);
    const [{ lot: id = '' } = {}] = book.find({ text: 'A' }).lots;
    expect(await other.versions(id)).toEqual(await book.versions(id));
    expect(JSON.parse(await textOf(other)).records).toEqual(JSON.parse(text).records);
  });

  it('restoring adds what is not there and never overwrites', async () => {
    const book = await twoLots();
    const file = JSON.parse(await textOf(book)) as { records: { entry: { name: string } }[] };
    expect(await book.restore(JSON.stringify(file))).toEqual({ added: 0, already: 3, different: 0 });
    file.records[0]!.entry.name = 'forged';
    const before = book.find();
    expect(await book.restore(JSON.stringify(file))).toEqual({ added: 0, already: 2, different: 1 });
    expect(book.find()).toEqual(before);
    expect(await textOf(book)).not.toContain('forged');
  });

  it('more than a batch of them', async () => {
    const book = await open();
    const [template] = (JSON.parse(await textOf(await twoLots())) as { records: Record<string, unknown>[] }).records;
    const records = Array.from({ length: 2600 }, (_, i) => {
      const id = `20260101T${String(i).padStart(9, '0')}Z-aaaaaa-aaaa`;
      return { ...template, lot: id, id: `${id}.0001.aaaaaaaa` };
    });
    const file = JSON.stringify({ format: 'esterway-book', version: 1, records });
    expect(await book.restore(file)).toEqual({ added: 2600, already: 0, different: 0 });
    expect(book.size).toBe(2600);
    expect((JSON.parse(await textOf(book)) as { records: unknown[] }).records).toHaveLength(2600);
  });

  it.each([
    ['not-json', 'bad', '{'],
    ['not-a-book', 'another format', '{"version":1,"records":[]}'],
    ['newer-version', 'a newer file', '{"format":"esterway-book","version":2}'],
    ['unknown-version', 'no version', '{"format":"esterway-book"}'],
    ['damaged', 'no records', '{"format":"esterway-book","version":1}'],
  ])('%s: %s', async (code, _, text) => {
    expect(refused(await (await open()).restore(text))).toBe(code);
  });

  it('a file with one bad record is refused whole, and says which', async () => {
    const file = JSON.parse(await textOf(await twoLots())) as { records: Record<string, unknown>[] };
    const with2nd = (change: object): string => JSON.stringify({ ...file, records: file.records.map((record, i) => (i === 1 ? { ...record, ...change } : record)) });
    const book = await open();
    expect(await book.restore(with2nd({ version: 2 }))).toEqual({ refused: 'newer-version', params: { record: '2' } });
    for (const change of [{ id: 'x' }, { number: 3 }, { keptAt: 'yesterday' }, { entry: { version: 1, runs: 'none' } }, { site: null }, { summary: { route: 1 } }, { _rev: '2-a' }, { by: 4 }]) {
      expect([change, await book.restore(with2nd(change))]).toEqual([change, { refused: 'damaged', params: { record: '2' } }]);
    }
    expect(book.size).toBe(0);
  });
});

describe('what other code wrote', () => {
  it('a newer version is kept, counted and exported, but not shown', async () => {
    const name = newName();
    const book = await open(name);
    const { record } = await keep(book, delivery('A', '1.2'));
    const newer = { version: 2, lot: record.lot, number: 2, keptAt: record.keptAt, litmus: true };
    await inMemory(name).put({ _id: `${record.lot}.0002.zzzzzzzz`, ...newer });
    await inMemory(name).put({ _id: '_design/other', views: {} });
    const again = await open(name);
    expect([again.unread, again.size]).toEqual([1, 1]);
    expect(done(await again.versions(record.lot))).toEqual([record]);
    const text = await textOf(again);
    expect((JSON.parse(text) as { records: unknown[] }).records).toEqual([record, { id: `${record.lot}.0002.zzzzzzzz`, ...newer }]);
    expect(refused(await (await open()).restore(text))).toBe('newer-version');
  });

  it('an older one is brought up to date step by step', () => {
    const [old, steps] = [{ version: -1 }, {
      [-1]: () => ({ version: 0, id: 'x' }),
      0: () => ({ version: 1, id: '20260101T000000000Z-aaaaaa-aaaa.0001.aaaaaaaa', lot: '20260101T000000000Z-aaaaaa-aaaa', number: 1, keptAt: '2026-01-01T00:00:00.000Z', entry: EMPTY_LOT, site: EMPTY_SITE, summary: { route: 'direct', state: 'direct' } }),
    }];
    expect(readRecord(old, steps)).toMatchObject({ version: 1, number: 1, entry: EMPTY_LOT });
    expect(readRecord(old)).toBe('unknown-version');
    expect(readRecord({})).toBe('unknown-version');
    expect(readRecord(null)).toBe('damaged');
  });

  it('a document that was taken away by other means goes from the list; the version before it stands', async () => {
    const name = newName();
    const book = await open(name);
    const { record } = await keep(book, delivery('A', '1.2'));
    const { record: second } = done(await book.amend(record.lot, delivery('A', '2'), EMPTY_SITE, { reason: 'x' }));
    const store = inMemory(name);
    const told = new Promise<void>((done) => book.watch(done));
    await store.put({ ...(await store.get(second.id)), _deleted: true });
    await told;
    expect(book.find().lots.map(({ id }) => id)).toEqual([record.id]);
  });
});
