import { monteCarloSlices } from '../../lot/monte-carlo.js';
import type { MonteCarlo, MonteCarloOrder, MonteCarloReport } from '../../lot/monte-carlo.js';
import { inPage, inWorker } from './sliced-work.js';
import type { Running } from './sliced-work.js';
import { startMonteCarlo } from './worker-place.js';

/** Who waits for a series of draws. */
export interface DrawingListener {
  progress(done: number): void;
  result(result: MonteCarlo): void;
  /** The page lets no worker start. */
  refused(): void;
  failed(error: string): void;
}

/** Draws beside the page's thread. */
export const drawInWorker = (order: MonteCarloOrder, listener: DrawingListener): Running =>
  inWorker<MonteCarloReport>(
    startMonteCarlo, order,
    (said) => {
      if ('done' in said) {
        listener.progress(said.done);
        return 'more';
      }
      if ('result' in said) listener.result(said.result);
      else listener.failed(said.error);
      return 'last';
    },
    () => listener.refused(),
  );

/** Draws in the page. */
export const drawInPage = (order: MonteCarloOrder, listener: DrawingListener): Running =>
  inPage(monteCarloSlices(order), {
    piece: (done) => listener.progress(done), whole: (result) => listener.result(result), failed: (error) => listener.failed(error),
  });
