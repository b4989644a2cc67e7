import type { RunPlan } from '../chemistry/lot-formulas.js';
import type { RunEntry } from './entry.js';

/** Whether a run takes part: `incomplete` while it is being typed, `struck` out with a reason. */
export type RunState = 'counted' | 'struck' | 'incomplete' | 'empty';

export function runState({ sample, start, end, struck }: RunEntry): RunState {
  if (struck !== undefined) return 'struck';
  if (sample && start && end) return 'counted';
  return sample || start || end ? 'incomplete' : 'empty';
}

/**
 * Which runs count. A run that is still being typed does not, so that the result of the others
 * stays; but when no run is complete the first unfinished one counts, so that what is missing can be said.
 * Where every run is struck out it is the next one, not begun yet: a struck run gives no result.
 */
export function runPlan(runs: readonly RunEntry[]): RunPlan {
  const states = runs.map(runState);
  const counted = states.flatMap((state, index) => (state === 'counted' ? [index] : []));
  if (counted.length) return { runs: runs.length, counted };
  const begun = states.findIndex((state) => state !== 'struck');
  return begun < 0 ? { runs: runs.length + 1, counted: [runs.length] } : { runs: runs.length, counted: [begun] };
}
