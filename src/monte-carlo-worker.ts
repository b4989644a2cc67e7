// Computes a Monte Carlo check off the page's thread. One order a worker: to cancel it, end the worker.

import { balanceFormulas } from './chemistry/balance.js';
import { addFormulas } from './chemistry/lot-formulas.js';
import { monteCarloSlices } from './lot/monte-carlo.js';
import type { MonteCarloOrder, MonteCarloReport } from './lot/monte-carlo.js';

// a figure of the balance can be asked for like any other
addFormulas(balanceFormulas);

const report = (said: MonteCarloReport): void => self.postMessage(said);

self.addEventListener('message', ({ data }: MessageEvent<MonteCarloOrder>) => {
  try {
    const slices = monteCarloSlices(data);
    for (;;) {
      const { done, value } = slices.next();
      if (done) return report({ result: value });
      report({ done: value });
    }
  } catch (error) {
    report({ error: String(error) });
  }
});
