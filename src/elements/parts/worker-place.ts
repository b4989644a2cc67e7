import { beside, script } from './beside.js';

// Workers, each from a file of its own that nothing loads before: beside the script file, or where the build of the page puts it.
// There is no worker from a `blob:`, so `script-src 'self'` suffices. A page can refuse one by throwing (from a file, from another
// origin, by its policy), and also later, by an `error` event at the worker.

/** For Monte Carlo. */
export function startMonteCarlo(): Worker {
  if (script === undefined) return new Worker(new URL('../../monte-carlo-worker.ts', import.meta.url), { type: 'module' });
  return new Worker(beside('esterway-worker.min.js'));
}

/** For the rows of a sheet. */
export function startRows(): Worker {
  if (script === undefined) return new Worker(new URL('../../rows-worker.ts', import.meta.url), { type: 'module' });
  return new Worker(beside('esterway-rows-worker.min.js'));
}
