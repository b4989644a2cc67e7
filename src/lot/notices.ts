import { atOrBelow } from '../decision/compare.js';
import { MOST_PASSES } from '../decision/passes.js';
import type { Findings } from '../formula/plan.js';
import { isKnown } from '../formula/reading.js';
import type { RunCell } from './edit.js';
import type { LotEntry, RunEntry, SiteProfile } from './entry.js';
import type { Notice } from './lot-reading.js';
import type { LotRun } from './lot-run.js';
import { implausibilities } from './plausibility.js';
import { runState } from './runs.js';

/** What a careful colleague would remark on a lot whose figures are all acceptable. */
export function noticesOn(entry: LotEntry, site: SiteProfile, run: LotRun, passes: number | undefined, today: string | undefined): readonly Notice[] {
  const { givens, findings } = run;
  const notices: Notice[] = [];
  if (givens.chosen('acidKnownFrom') === 'titration') {
    const states = entry.runs.map(runState);
    states.forEach((state, index) => {
      if (state === 'incomplete' && states.includes('counted')) {
        notices.push({ code: 'run-incomplete', quantity: `run${index + 1}.${unfilled(entry.runs[index] ?? {})}`, params: { run: String(index + 1) } });
      }
    });
    if (states.filter((state) => state === 'counted').length === 1) notices.push({ code: 'one-run', quantity: 'acidValue' });
  }
  const missed = missedTarget(findings, passes);
  if (missed) notices.push({ code: 'target-not-reached', quantity: 'pretreatmentTarget', params: missed });
  return [...notices, ...implausibilities(entry, site, run, today)];
}

/** The first cell that a run still lacks. */
const unfilled = (run: RunEntry): RunCell => (['sample', 'start', 'end'] as const).find((cell) => !run[cell]) ?? 'end';

/** What even the most passes are expected to leave, where that is above the target. */
export function missedTarget(findings: Findings, passes: number | undefined): Readonly<Record<'left' | 'target' | 'passes', string>> | undefined {
  if (passes !== MOST_PASSES) return undefined;
  const left = findings.outcome(`pass${MOST_PASSES}.ffaLeft.slow`);
  const target = findings.outcome('pretreatmentTarget');
  if (!isKnown(left) || !isKnown(target) || atOrBelow(left, target)) return undefined;
  return { left: left.toString(), target: target.toString(), passes: String(passes) };
}
