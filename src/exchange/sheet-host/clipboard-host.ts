import { copyRows } from '../clipboard.js';
import type { DecimalMark } from '../number-text.js';
import { readTable } from '../table/read-table.js';
import type { SheetHost } from './sheet-host.js';

/** What a page says of the clipboard, in its own language. */
export interface ClipboardWords {
  /** Where cells come from and go to, such as “the clipboard”. */
  readonly place: string;
  /** Why nothing can be read or written, and what to do instead. */
  readonly barred: string;
}

/**
 * A sheet that is reached by the clipboard alone: what was copied there is read, and results are copied for pasting back. It cannot
 * see what is in the sheet, so it never warns of filled cells; the person who pastes does see them. Nothing can be taken back here.
 */
export function clipboardHost(document: Document, words: ClipboardWords, mark: DecimalMark = '.'): SheetHost {
  return {
    undo: 'none',
    async read() {
      const clipboard = document.defaultView?.navigator.clipboard as Partial<Clipboard> | undefined;
      let text: string;
      try {
        if (!clipboard?.readText) throw new Error();
        text = await clipboard.readText();
      } catch {
        throw new Error(words.barred);
      }
      const table = readTable(text);
      if ('fault' in table) return undefined;
      return { address: words.place, cells: table.header ? [table.header, ...table.rows] : table.rows };
    },
    wouldOverwrite: () => Promise.resolve({ count: 0, first: [] }),
    async write(block) {
      const rows = block.map((row) => row.map((text) => ({ kind: text ? ('text' as const) : ('empty' as const), text: text ?? '' })));
      const copied = await copyRows(rows, mark, document);
      if (copied.how === 'by-hand') throw new Error(words.barred);
      return { address: words.place, cells: block.reduce((sum, row) => sum + row.filter((text) => text !== null).length, 0) };
    },
    follow: () => () => undefined,
  };
}
