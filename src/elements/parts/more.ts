import type * as defineMore from '../define-more.js';
import { runBeside, script } from './beside.js';

type More = typeof defineMore;

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
  const there = (): More | undefined => (globalThis as { esterwayParts?: { more?: More } }).esterwayParts?.more;
  // a page may have loaded it by a tag of its own
  if (!there()) await runBeside('esterway-more.min.js');
  const more = there();
  if (!more) throw new Error('esterway-more.min.js did not run');
  return more;
}
