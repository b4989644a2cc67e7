import type { LotEntry } from '../../../src/core.js';

/** A small generator of repeatable figures (a linear congruence), so that every run reads the same lots. */
function* draws(seed: number): Generator<number, never> {
  for (let state = seed; ; ) {
    state = (state * 1664525 + 1013904223) % 2 ** 32;
    yield state / 2 ** 32;
  }
}

const figure = (text: string, unit: string): { text: string; unit: string } => ({ text, unit });

/**
 * Lots as a week at a plant brings them: a batch by mass, two weighed runs, water measured.
 *
 * @param most highest FFA, %
 */
export function lots(count: number, most: number, seed = 7): LotEntry[] {
  const draw = draws(seed);
  const between = (low: number, high: number, decimals: number): string => (low + (high - low) * draw.next().value).toFixed(decimals);
  return Array.from({ length: count }, (_, index): LotEntry => {
    const ffa = 0.3 + (most - 0.3) * draw.next().value;
    const run = (): LotEntry['runs'][number] => {
      const sample = between(2, 5, 2);
      const start = between(0, 2, 2);
      // V = FFA · m · 10 / (282 · c), read to a drop either way
      const titre = (ffa * Number(sample) * 10) / (282 * 0.1) + 0.02 * draw.next().value;
      return { sample: figure(sample, 'g'), start: figure(start, 'mL'), end: figure((Number(start) + titre).toFixed(2), 'mL') };
    };
    return {
      version: 1,
      name: `lot ${index + 1}`,
      figures: {
        oilAmount: figure(between(200, 2000, 0), 'kg'),
        titrantStrength: figure('0.1000', 'mol/L'),
        titrationTemperature: figure('22', '°C'),
        waterContent: figure(between(0.03, 0.2, 2), '%'),
      },
      options: {},
      runs: [run(), run()],
      retestRuns: [],
    };
  });
}
