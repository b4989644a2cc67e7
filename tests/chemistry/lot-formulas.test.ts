import { describe, expect, it } from 'vitest';
import { lotFormulas } from '../../src/chemistry/lot-formulas.js';

describe('the formulas of a lot', () => {
  it.each([
    [{ runs: 0, counted: [] }, { runs: 0, counted: [] }, { runs: 0, counted: [] }],
    [{ runs: 1, counted: [0] }, { runs: 0, counted: [] }, { runs: 1, counted: [0] }],
    [{ runs: 4, counted: [0, 2, 3] }, { runs: 2, counted: [0, 1] }, { runs: 3, counted: [0, 1, 2] }],
    [{ runs: 20, counted: Array.from({ length: 20 }, (_, i) => i) }, { runs: 5, counted: [4] }, { runs: 20, counted: Array.from({ length: 20 }, (_, i) => i) }],
  ])('form a closed sheet whose units balance in dimension and scale: %j %j %j', (lot, retest, titrant) => {
    expect(lotFormulas({ lot, retest, titrant }).quantities.size).toBeGreaterThan(200);
  });

  it('are built once for the same runs', () => {
    const twoRuns = () => ({ lot: { runs: 2, counted: [0, 1] }, retest: { runs: 0, counted: [] }, titrant: { runs: 0, counted: [] } });
    expect(lotFormulas(twoRuns())).toBe(lotFormulas(twoRuns()));
  });
});
