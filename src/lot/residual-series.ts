import { isKnown } from '../formula/reading.js';
import type { Outcome } from '../formula/reading.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { lotRun } from './lot-run.js';

/** What a pass of the acid step leaves, from its beginning to its end. */
export interface ResidualPass {
  readonly pass: number;
  readonly points: readonly ResidualPoint[];
}

export interface ResidualPoint {
  /** Since the pass began. */
  readonly minutes: number;
  /** FFA left at the cautious and at the hopeful end of the band, %. */
  readonly slow: number;
  readonly fast: number;
}

/** Points of a pass; most of what happens, happens early. */
const STEPS = 24;

/** What a pass takes over from the one before; it does not change while the pass runs. */
const TAKEN_OVER = ['acidLeft.slow', 'acidLeft.fast', 'methanolCarried.slow', 'methanolCarried.fast', 'waterCarried.slow', 'waterCarried.fast'];

/**
 * The predicted residual over time, pass by pass, by the formulas of the lot with another duration put
 * in. Doubles, for drawing.
 *
 * @returns undefined while the prediction is not known
 */
export function residualSeries(entry: LotEntry, site: SiteProfile): readonly ResidualPass[] | undefined {
  const { plan, findings, givens } = lotRun(entry, site);
  const passes = findings.option('passes');
  const duration = findings.outcome('pretreatmentTime');
  if (typeof passes !== 'string' || !isKnown(duration)) return undefined;
  const series: ResidualPass[] = [];
  for (let pass = 1; pass <= Number(passes); pass++) {
    const fixed = pass === 1 ? [] : TAKEN_OVER.map((name): [string, Outcome] => [`pass${pass - 1}.${name}`, findings.outcome(`pass${pass - 1}.${name}`)]);
    const points: ResidualPoint[] = [];
    for (let step = 0; step <= STEPS; step++) {
      // closer together at the beginning; a time of nothing would be refused
      const minutes = duration.times(Math.max((step / STEPS) ** 2, 1e-6));
      const replaced = new Map([...fixed, ['pretreatmentTime', minutes] as const].map(([key, outcome]) => [key, () => outcome]));
      const at = plan.evaluate(givens, replaced);
      const [slow, fast] = [at.outcome(`pass${pass}.ffaLeft.slow`), at.outcome(`pass${pass}.ffaLeft.fast`)];
      if (!isKnown(slow) || !isKnown(fast)) return undefined;
      points.push({ minutes: step ? minutes.toNumber() : 0, slow: slow.toNumber(), fast: fast.toNumber() });
    }
    series.push({ pass, points });
  }
  return series;
}

