import { describe, expect, it } from 'vitest';
import { lotFormulas } from '../../src/chemistry/lot-formulas.js';

describe('the formulas of a lot', () => {
  it.each([
    [{ runs: 0, counted: [] }, { runs: 0, counted: [] }],
    [{ runs: 1, counted: [0] }, { runs: 0, counted: [] }],
    [{ runs: 4, counted: [0, 2, 3] }, { runs: 2, counted: [0, 1] }],
  ])('form a closed sheet whose units balance in dimension and scale: %j %j', (lot, retest) => {
    expect(lotFormulas(lot, retest).quantities.size).toBeGreaterThan(150);
  });

  it('are built once for the same runs', () => {
    expect(lotFormulas({ runs: 2, counted: [0, 1] }, { runs: 0, counted: [] })).toBe(lotFormulas({ runs: 2, counted: [0, 1] }, { runs: 0, counted: [] }));
  });
});
