import type { RecordFault } from './record.js';

/** Why the book did not do what it was asked; the sentence, with the remedy, is the locale's. */
export const BOOK_FAULTS = [
  'no-storage', 'storage-full', 'storage-failed', 'unreadable-lot', 'empty-lot', 'reason-missing', 'unknown-lot', 'amended-meanwhile',
  'not-json', 'not-a-book', 'newer-version', 'unknown-version', 'damaged',
] as const satisfies readonly (RecordFault | string)[];
export type BookFault = (typeof BOOK_FAULTS)[number];

/** The book as it was before; nothing is half done unless the params say how much. */
export interface BookRefused {
  readonly refused: BookFault;
  readonly params: Readonly<Record<string, string>>;
}

export const refuse = (refused: BookFault, params: Readonly<Record<string, string>> = {}): BookRefused => ({ refused, params });

/** What went wrong in the store. Browsers name a full disk `QuotaExceededError`; the database hands the name on in one of these parts. */
export function storageFault(fault: unknown, params: Readonly<Record<string, string>> = {}): BookRefused {
  const { name = '', reason = '', message = '' } = (fault ?? {}) as Partial<Record<'name' | 'reason' | 'message', unknown>>;
  const told = [name, reason, message].map(String);
  return told.some((text) => /quota/i.test(text)) ? refuse('storage-full', params) : refuse('storage-failed', { detail: told.filter(Boolean).join(', ').slice(0, 200), ...params });
}
