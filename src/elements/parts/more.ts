import { runBeside, script } from './beside.js';

type More = typeof import('../define-more.js');

let loading: Promise<void> | undefined;

/**
 * Fetches and registers the elements that a page seldom needs, once. They stand in a file of their
 * own, so that a page loads them only when a person asks for one.
 *
 * @throws where the file cannot be had; the next call tries again
 */
export function loadMore(): Promise<void> {
  loading ??= fetched().then(
    ({ defineMore }) => defineMore(),
    (fault: unknown) => {
      loading = undefined;
      throw fault;
    },
  );
  return loading;
}

async function fetched(): Promise<More> {
  if (script === undefined) return import('../define-more.js');
  await runBeside('esterway-more.min.js');
  const { more } = (globalThis as { esterwayParts?: { more?: More } }).esterwayParts ?? {};
  if (!more) throw new Error('esterway-more.min.js did not run');
  return more;
}
