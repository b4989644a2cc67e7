import { afterEach, expect, test, vi } from 'vitest';
import { clipboardHost } from '../../src/exchange/sheet-host/clipboard-host.js';

const WORDS = { place: 'the clipboard', barred: 'This page may not use the clipboard. Paste the rows into the box.' };

afterEach(() => {
  vi.restoreAllMocks();
});

test('what was copied is read, headings first, and it is said where from', async () => {
  vi.spyOn(navigator.clipboard, 'readText').mockResolvedValue('Lot\tFFA\nA\t2.1\n');
  expect(await clipboardHost(document, WORDS).read()).toEqual({ address: 'the clipboard', cells: [['Lot', 'FFA'], ['A', '2.1']] });
  vi.spyOn(navigator.clipboard, 'readText').mockResolvedValue('');
  expect(await clipboardHost(document, WORDS).read()).toBeUndefined();
});

test('a block is copied as text and table, guarded, with blank places kept', async () => {
  const write = vi.spyOn(navigator.clipboard, 'write').mockResolvedValue();
  const host = clipboardHost(document, WORDS);
  const selection = { address: 'the clipboard', cells: [['A']] };
  expect(await host.wouldOverwrite([['x']], selection)).toEqual({ count: 0, first: [] });
  expect(await host.write([['accepted', null, '=1+1']], selection, 'blanks')).toEqual({ address: 'the clipboard', cells: 2 });
  expect(await (await write.mock.calls[0]![0][0]!.getType('text/plain')).text()).toBe("accepted\t\t'=1+1\r\n");
  expect(host.undo).toBe('none');
});

test('where the page bars the clipboard, it says so, for the person', async () => {
  vi.spyOn(navigator.clipboard, 'readText').mockRejectedValue(new Error('NotAllowed'));
  vi.spyOn(navigator.clipboard, 'write').mockRejectedValue(new Error('NotAllowed'));
  vi.spyOn(document, 'execCommand').mockReturnValue(false);
  const host = clipboardHost(document, WORDS);
  await expect(host.read()).rejects.toThrow(WORDS.barred);
  await expect(host.write([['x']], { address: '', cells: [] }, 'blanks')).rejects.toThrow(WORDS.barred);
});
