import { isObject, readRecord } from './record.js';
import type { LotRecord } from './record.js';
import { refuse } from './refusal.js';
import type { BookRefused } from './refusal.js';

/** The name of the format inside a file, so that other JSON is not taken for a book. */
const FORMAT = 'esterway-book';
const FILE_VERSION = 1;

/** A whole book as text: one record a line, as it is stored, those of a newer code too. */
export function bookText(records: readonly object[], exportedAt: string): string {
  const head = JSON.stringify({ format: FORMAT, version: FILE_VERSION, exportedAt });
  return `${head.slice(0, -1)},"records":[\n${records.map((record) => JSON.stringify(record)).join(',\n')}\n]}\n`;
}

/**
 * The records of a file as they stand in it. All or none: a file of which a part cannot be read is refused as a whole,
 * before anything of it is in the book.
 */
export function readBookText(text: string): readonly LotRecord[] | BookRefused {
  let file: unknown;
  try {
    file = JSON.parse(text);
  } catch {
    return refuse('not-json');
  }
  if (!isObject(file) || file['format'] !== FORMAT) return refuse('not-a-book');
  const { version, records } = file;
  if (version !== FILE_VERSION) return refuse(typeof version === 'number' && version > FILE_VERSION ? 'newer-version' : 'unknown-version');
  if (!Array.isArray(records)) return refuse('damaged', { record: '0' });
  for (const [index, record] of records.entries()) {
    const read = readRecord(record);
    if (typeof read === 'string') return refuse(read, { record: String(index + 1) });
  }
  return records as readonly LotRecord[];
}
