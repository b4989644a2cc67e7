// Ids that no two benches can both give out: the time, the bench, and chance. No key of the page's own is needed for them.

/** Digits and letters that are not taken for each other. */
const LETTERS = '0123456789abcdefghjkmnpqrstvwxyz';

export const LOT_ID = /^\d{8}T\d{9}Z-[0-9a-z]{6}-[0-9a-z]{4}$/;
export const VERSION_ID = /^\d{8}T\d{9}Z-[0-9a-z]{6}-[0-9a-z]{4}\.\d{4,}\.[0-9a-z]{8}$/;

/** Letters left to chance. */
export function randomLetters(count: number): string {
  return Array.from(crypto.getRandomValues(new Uint8Array(count)), (byte) => LETTERS[byte % LETTERS.length]).join('');
}

/** The name of a bench in ids, given once for a database. */
export const newBench = (): string => randomLetters(6);

/** `20261201T140512123Z-k3f9x2-7q4z`: sorts by the time of keeping. */
export const newLotId = (keptAt: string, bench: string): string => `${keptAt.replace(/[-:.]/g, '')}-${bench}-${randomLetters(4)}`;

/** `….0002.…`: sorts behind the earlier versions of its lot. */
export const newVersionId = (lot: string, number: number): string => `${lot}.${String(number).padStart(4, '0')}.${randomLetters(8)}`;
