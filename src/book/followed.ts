import { lineOf } from './catalogue.js';
import type { CatalogueLine } from './catalogue.js';
import { VERSION_ID } from './ids.js';
import { isMissing } from './store.js';
import type { Store, StoredChange } from './store.js';

/** Lines in one sheet of the index. */
const SHEET = 1000;
const INDEX_VERSION = 1;

/** A stretch of the catalogue as it was read from the documents: never copied to another book, and made anew where it does not fit. */
interface IndexSheet {
  readonly version: typeof INDEX_VERSION;
  readonly since: number | string;
  readonly until: number | string;
  readonly lines: readonly CatalogueLine[];
}

const sheetId = (number: number): string => `_local/catalogue-${number}`;

/**
 * Reads every document once, in the order they came in, and follows those that come in later: from here, another tab or another bench.
 * Since documents never change, what was read of them is laid down in sheets of a thousand lines, so that a large book opens without
 * being read through. Gives back what ends it.
 *
 * @param told called with what was found: often while reading, then for each document that comes in
 * @param lost called when the store can be followed no longer
 */
export async function follow(store: Store, told: (lines: readonly CatalogueLine[]) => void, lost: (fault: unknown) => void): Promise<() => void> {
  let { since, sheets } = await readSheets(store, told);
  let pending: CatalogueLine[] = [];
  let start = since;
  /** Whether sheets still go down: not after one that another tab laid otherwise, nor on a full disk. */
  let laying = true;

  const take = (changes: readonly StoredChange[]): void => {
    const lines = changes.flatMap((change) => lineOfChange(change) ?? []);
    told(lines);
    pending.push(...lines);
    since = changes.at(-1)?.seq ?? since;
    if (!laying || pending.length < SHEET) return;
    const sheet = { _id: sheetId(sheets), version: INDEX_VERSION, since: start, until: since, lines: pending };
    sheets += 1;
    start = since;
    pending = [];
    store.put(sheet).catch(() => (laying = false));
  };

  for (;;) {
    const { results } = await store.changes({ since, limit: SHEET, include_docs: true });
    if (!results.length) break;
    take(results);
  }
  const feed = store.changes({ since, live: true, include_docs: true });
  feed.on('change', (change) => take([change]));
  feed.on('error', lost);
  return () => feed.cancel();
}

async function readSheets(store: Store, told: (lines: readonly CatalogueLine[]) => void): Promise<{ since: number | string; sheets: number }> {
  let since: number | string = 0;
  for (let sheets = 0; ; sheets++) {
    const sheet = await sheetAt(store, sheets);
    if (!sheet || sheet.version !== INDEX_VERSION || sheet.since !== since) return { since, sheets };
    told(sheet.lines);
    since = sheet.until;
  }
}

async function sheetAt(store: Store, number: number): Promise<IndexSheet | undefined> {
  try {
    return (await store.get(sheetId(number))) as unknown as IndexSheet;
  } catch (fault) {
    if (isMissing(fault)) return undefined;
    throw fault;
  }
}

function lineOfChange({ id, deleted, doc }: StoredChange): CatalogueLine | undefined {
  if (!VERSION_ID.test(id)) return undefined;
  if (deleted) return { id, gone: true };
  return doc && lineOf(doc);
}
