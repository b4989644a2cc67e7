import { judgeReplicates } from '../decision/replicates.js';
import type { Replicates } from '../decision/replicates.js';
import type { RunEntry } from './entry.js';
import type { LotRun } from './lot-run.js';
import { runState } from './runs.js';

/** What is made of the runs of a lot, or of those after the acid step. */
export function lotReplicates({ findings, givens }: LotRun, prefix: '' | 'retest.', runs: readonly RunEntry[]): Replicates {
  const titrated = givens.chosen(`${prefix}acidKnownFrom`) === 'titration';
  const counted = titrated ? runs.filter((run) => runState(run) === 'counted').length : 0;
  return judgeReplicates(findings, prefix, counted, givens.chosen('runsAreDear') === 'yes');
}
