import type { Findings } from '../formula/plan.js';
import { isKnown } from '../formula/reading.js';
import type { Unknown } from '../formula/reading.js';
import { atOrBelow } from './compare.js';

/**
 * What is made of the runs of a titration, after ISO 5725-6, 5.2.2: two runs within the repeatability
 * limit make a mean; else two more are run (one, where a run is dear), and the mean stands if the range
 * of all keeps its critical range, the median if not.
 */
export interface Replicates {
  /** `none`: nothing to judge, as with a certificate; `one`: not checked by a second; else whether their range keeps the critical range. */
  readonly state: 'none' | 'one' | 'agree' | 'differ';
  readonly runs: number;
  readonly average: 'mean' | 'median';
  /** Range of the runs and the most it may be, acid value in mg/g, decimal text. */
  readonly range?: string;
  readonly critical?: string;
  /** What to do next; `look-for-cause` when even four runs lie too far apart. */
  readonly next: 'nothing' | 'second-run' | 'one-more' | 'two-more' | 'look-for-cause';
}

/** Whether two runs or more lie within their critical range. */
export function rangeKept(findings: Findings, prefix: '' | 'retest.'): boolean | Unknown {
  const range = findings.outcome(`${prefix}runRange`);
  if (!isKnown(range)) return range;
  const critical = findings.outcome(`${prefix}criticalRange`);
  return isKnown(critical) ? atOrBelow(range, critical) : critical;
}

/** @param counted how many runs count; none where the acidity was not titrated */
export function judgeReplicates(findings: Findings, prefix: '' | 'retest.', counted: number, runsAreDear: boolean): Replicates {
  if (counted < 2) return { state: counted ? 'one' : 'none', runs: counted, average: 'mean', next: counted ? 'second-run' : 'nothing' };
  const kept = rangeKept(findings, prefix);
  if (typeof kept !== 'boolean') return { state: 'none', runs: counted, average: 'mean', next: 'nothing' };
  const text = (key: string): string => {
    const outcome = findings.outcome(prefix + key);
    return isKnown(outcome) ? outcome.toString() : '';
  };
  const figures = { range: text('runRange'), critical: text('criticalRange') };
  if (kept) return { state: 'agree', runs: counted, average: 'mean', ...figures, next: 'nothing' };
  const next = counted === 2 ? (runsAreDear ? 'one-more' : 'two-more') : counted === 3 ? 'one-more' : 'look-for-cause';
  return { state: 'differ', runs: counted, average: counted === 2 ? 'mean' : 'median', ...figures, next };
}
