import { monteCarloSlices } from '../../lot/monte-carlo.js';
import type { MonteCarlo, MonteCarloOrder, MonteCarloReport } from '../../lot/monte-carlo.js';
import { startWorker } from './worker-place.js';

/** Who waits for a series of draws. After `stop` nothing more is heard. */
export interface DrawingListener {
  progress(done: number): void;
  result(result: MonteCarlo): void;
  /** The page lets no worker start. */
  refused(): void;
  failed(error: string): void;
}

/** A series under way. */
export interface Drawing {
  stop(): void;
}

/** Draws beside the page's thread. */
export function drawInWorker(order: MonteCarloOrder, listener: DrawingListener): Drawing {
  let worker: Worker;
  try {
    worker = startWorker();
  } catch {
    listener.refused();
    return { stop: () => undefined };
  }
  worker.addEventListener('message', ({ data }: MessageEvent<MonteCarloReport>) => {
    if ('done' in data) return listener.progress(data.done);
    worker.terminate();
    if ('result' in data) listener.result(data.result);
    else listener.failed(data.error);
  });
  // its own mistakes come as messages: this is a file that does not load, or a policy
  worker.addEventListener('error', (event) => {
    event.preventDefault();
    worker.terminate();
    listener.refused();
  });
  worker.postMessage(order);
  return { stop: () => worker.terminate() };
}

/** Draws in the page, slice by slice, and lets it breathe in between. */
export function drawInPage(order: MonteCarloOrder, listener: DrawingListener): Drawing {
  let stopped = false;
  const slices = monteCarloSlices(order);
  const next = (): void => {
    if (stopped) return;
    try {
      const { done, value } = slices.next();
      if (done) return listener.result(value);
      listener.progress(value);
      setTimeout(next);
    } catch (error) {
      listener.failed(String(error));
    }
  };
  setTimeout(next);
  return {
    stop: () => {
      stopped = true;
    },
  };
}
