import { isKnown } from '../formula/reading.js';
import type { Outcome, Unknown } from '../formula/reading.js';
import { atOrBelow } from './compare.js';

/** The most passes of the acid step that are ever planned. */
export const MOST_PASSES = 3;

/**
 * How many passes the acid step takes: as many as bring the slow end of the prediction to the
 * target or below, at most {@link MOST_PASSES}.
 *
 * @param ffaLeft what each pass leaves at the slow end, % FFA, by its number
 */
export function passesNeeded(ffaLeft: (pass: number) => Outcome, target: Outcome): string | Unknown {
  if (!isKnown(target)) return target;
  for (let pass = 1; pass < MOST_PASSES; pass++) {
    const left = ffaLeft(pass);
    if (!isKnown(left)) return left;
    if (atOrBelow(left, target)) return String(pass);
  }
  return String(MOST_PASSES);
}
