import { runBeside, script, shelf } from './beside.js';

/**
 * Groups of parts that a page seldom needs, each in a file of its own that is fetched when a person opens one of them:
 * what belongs to the batch, to deliveries and the stock, the intake book with its database, and what reads and writes sheets.
 */
const GROUPS = {
  more: async () => (await import('../define-more.js')).defineMore(),
  intake: async () => (await import('../define-intake.js')).defineIntake(),
  book: async () => (await import('../define-book.js')).defineBook(),
  sheets: async () => (await import('../define-sheets.js')).defineSheets(),
} as const;
export type LateParts = keyof typeof GROUPS;

const loading = new Map<LateParts, Promise<void>>();

/**
 * Fetches and registers a group of parts, once.
 *
 * @throws where its file cannot be had; the next call tries again
 */
export function loadParts(group: LateParts): Promise<void> {
  const under = loading.get(group) ?? (script === undefined ? GROUPS[group]() : fetched(group));
  loading.set(group, under);
  return under.catch((fault: unknown) => {
    loading.delete(group);
    throw fault;
  });
}

/** The files beside the script file register what is in them by themselves. */
async function fetched(group: LateParts): Promise<void> {
  const file = `esterway-${group}.min.js`;
  // a page may have loaded it by a tag of its own
  if (!shelf?.files[file]) await runBeside(file);
  if (!(await shelf?.files[file])) throw new Error(`${file} did not run`);
}
