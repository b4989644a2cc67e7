import { afterEach, describe, expect, it, vi } from 'vitest';
import { userEvent } from 'vitest/browser';
import { copyRows, selectedText } from '../../src/exchange/clipboard.js';
import type { Copied } from '../../src/exchange/clipboard.js';
import type { Rows } from '../../src/exchange/results/table-text.js';

const ROWS: Rows = [[{ kind: 'text', text: '=1+1' }, { kind: 'number', text: '-3.10' }]];
const TSV = '\'=1+1\t-3,10\r\n';

/** Copies from a press of a button, as browsers ask for. */
async function copied(): Promise<Copied> {
  const button = document.createElement('button');
  button.textContent = 'Copy';
  document.body.append(button);
  const done = new Promise<Copied>((resolve, reject) => button.addEventListener('click', () => void copyRows(ROWS, ',', document).then(resolve, reject)));
  await userEvent.click(button);
  button.remove();
  return done;
}

afterEach(() => void vi.restoreAllMocks());

describe('copying rows', () => {
  it('puts text and table on the clipboard together', async () => {
    const write = vi.spyOn(navigator.clipboard, 'write').mockResolvedValue(undefined);
    expect(await copied()).toEqual({ how: 'clipboard' });
    const [item] = write.mock.calls[0]![0];
    expect(await (await item!.getType('text/plain')).text()).toBe(TSV);
    expect(await (await item!.getType('text/html')).text()).toContain('<td align="right">-3,10</td>');
  });

  it('takes the copy event where the page may not write', async () => {
    vi.spyOn(navigator.clipboard, 'write').mockRejectedValue(new DOMException('no', 'NotAllowedError'));
    const held: Record<string, string> = {};
    vi.spyOn(DataTransfer.prototype, 'setData').mockImplementation((type, text) => void (held[type] = text));
    expect(await copied()).toEqual({ how: 'event' });
    expect([held['text/plain'], held['text/html']?.includes('<table>')]).toEqual([TSV, true]);
  });

  it('leaves the text to copy by hand where nothing else does, in a box that selects it whole', async () => {
    vi.spyOn(navigator.clipboard, 'write').mockRejectedValue(new Error('no'));
    const refused = vi.spyOn(document, 'execCommand' as never) as unknown as { mockReturnValue(value: boolean): void };
    refused.mockReturnValue(false);
    const result = await copied();
    expect(result).toEqual({ how: 'by-hand', text: TSV });
    const box = selectedText(TSV, 'Results', document);
    document.body.append(box);
    box.focus();
    expect([box.readOnly, box.selectionStart, box.selectionEnd, box.ariaLabel]).toEqual([true, 0, box.value.length, 'Results']);
    box.remove();
  });
});
