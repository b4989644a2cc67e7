import { beside, script } from './beside.js';

/**
 * A worker for Monte Carlo, from a file of its own that nothing loads before: beside the script file, or
 * where the build of the page puts it. There is no worker from a `blob:`, so `script-src 'self'` suffices.
 *
 * @throws where the page does not let it start: from a file, from another origin, by its policy. A page
 *   can also refuse later, by an `error` event at the worker.
 */
export function startWorker(): Worker {
  if (script === undefined) return new Worker(new URL('../../monte-carlo-worker.ts', import.meta.url), { type: 'module' });
  return new Worker(beside('esterway-worker.min.js'));
}
