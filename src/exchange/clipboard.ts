import type { DecimalMark } from './number-text.js';
import { asHtmlTable, asTsv } from './results/table-text.js';
import type { Rows } from './results/table-text.js';

/** How rows came to the clipboard. `by-hand`: not at all; the text is for a person to copy, see {@link selectedText}. */
export type Copied = { readonly how: 'clipboard' | 'event' } | { readonly how: 'by-hand'; readonly text: string };

/**
 * Copies rows as tab-separated text and as a table at once, so that a sheet takes cells and a letter takes a table.
 * Where the page may not write the clipboard the browser's own copy command is tried. To be called from a person's action.
 */
export async function copyRows(rows: Rows, mark: DecimalMark, document: Document): Promise<Copied> {
  const flavours = { 'text/plain': asTsv(rows, mark), 'text/html': asHtmlTable(rows, mark) };
  if (await written(flavours, document)) return { how: 'clipboard' };
  if (copiedByEvent(flavours, document)) return { how: 'event' };
  return { how: 'by-hand', text: flavours['text/plain'] };
}

type Flavours = Readonly<Record<string, string>>;

async function written(flavours: Flavours, document: Document): Promise<boolean> {
  const view = document.defaultView;
  // older browsers and pages that are not secure have no clipboard to write
  const clipboard = view?.navigator.clipboard as Partial<Clipboard> | undefined;
  if (!view || !clipboard?.write || !('ClipboardItem' in view)) return false;
  try {
    const blobs = Object.fromEntries(Object.entries(flavours).map(([type, text]) => [type, new Blob([text], { type })]));
    await clipboard.write([new ClipboardItem(blobs)]);
    return true;
  } catch {
    return false;
  }
}

function copiedByEvent(flavours: Flavours, document: Document): boolean {
  let taken = false;
  const onCopy = (event: ClipboardEvent): void => {
    if (!event.clipboardData) return;
    for (const [type, text] of Object.entries(flavours)) event.clipboardData.setData(type, text);
    event.preventDefault();
    event.stopImmediatePropagation();
    taken = true;
  };
  document.addEventListener('copy', onCopy, true);
  try {
    // deprecated, yet the only way to a copy event that needs no permission
    (document as { execCommand(command: string): boolean }).execCommand('copy');
  } catch {
    taken = false;
  } finally {
    document.removeEventListener('copy', onCopy, true);
  }
  return taken;
}

/** A text box that holds the text and selects all of it when it gets the focus, for copying by hand. */
export function selectedText(text: string, label: string, document: Document): HTMLTextAreaElement {
  const box = document.createElement('textarea');
  box.readOnly = true;
  box.rows = 4;
  box.setAttribute('aria-label', label);
  box.value = text;
  box.addEventListener('focus', () => box.select());
  return box;
}
