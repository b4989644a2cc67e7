import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MOST_POINTS, prepare } from '../../src/decision/titration-curve/points.js';
import type { CurvePoint } from '../../src/decision/titration-curve/points.js';
import { readCurve } from '../../src/decision/titration-curve/titration-curve.js';
import { seededRandom } from '../../src/formula/random.js';

/** A step of 6 pH at 5 mL, its width 0.3 mL. */
const step = (volume: number): number => 7 + 3 * Math.tanh((volume - 5) / 0.3) + 0.05 * volume;
const at = (volumes: readonly number[], reading = step): CurvePoint[] => volumes.map((volume) => ({ volume, reading: reading(volume) }));
const VOLUMES = Array.from({ length: 51 }, (_, i) => i / 5);
const POINTS = at(VOLUMES);

const codes = (found: ReturnType<typeof readCurve>): string[] => ('refused' in found ? [found.refused.code] : found.remarks.map(({ code }) => code));
const endOf = (points: readonly CurvePoint[]): number | undefined => {
  const found = readCurve(points, 'pH');
  return 'refused' in found ? undefined : found.endPoint;
};

describe('a plain step', () => {
  it('has its end where it bends over, by symmetry at 5 mL', () => {
    const found = readCurve(POINTS, 'pH');
    expect(found).toMatchObject({ by: 'inflection', window: 5, remarks: [] });
    if ('refused' in found) throw new Error(found.refused.code);
    expect(found.endPoint).toBeCloseTo(5, 6);
    expect(found.inflections).toHaveLength(1);
    // 6 pH high; its own slope of 0.05 per mL is not the step's
    expect(found.inflections[0]!.height).toBeCloseTo(6, 1);
    expect(found.inflections[0]!.reading).toBeCloseTo(7.25, 2);
  });

  it('is found at the least number of points', () => {
    expect(endOf(at([4, 4.6, 4.8, 5, 5.2, 5.4, 6]))).toBeCloseTo(5, 6);
  });
});

describe('what cannot be used', () => {
  it.each([
    ['no points', [], 'too-few', { points: 0, least: 7 }],
    ['three points', POINTS.slice(0, 3), 'too-few', { points: 3, least: 7 }],
    ['one volume ten times', Array.from({ length: 10 }, (_, i) => ({ volume: 5, reading: i })), 'too-few', { points: 1, least: 7 }],
    ['no number at all', [{ volume: NaN, reading: 3 }, { volume: 1, reading: Infinity }], 'not-finite', { points: 2 }],
    ['a flat curve', at(VOLUMES, () => 7), 'flat', { span: 0, least: 0.5 }],
    ['a span too small', at(VOLUMES, (volume) => 7 + 0.03 * volume), 'flat', { least: 0.5 }],
    ['a straight line', at(VOLUMES, (volume) => 3 + volume), 'no-step', { window: 5 }],
    ['a step not reached', at(VOLUMES.slice(0, 25)), 'at-edge', { last: 4.8 }],
    ['a step reached at the last point', at(VOLUMES.slice(0, 26)), 'at-edge', { last: 5 }],
    ['a step reached by one point', at(VOLUMES.slice(0, 27)), 'at-edge', { last: 5.2 }],
  ] as const)('%s', (_, points, code, params) => {
    expect(readCurve(points, 'pH')).toMatchObject({ refused: { code, params } });
  });

  it.each([10, 20, 50, 500, 2000])('noise alone, %d points', (count) => {
    for (let seed = 1; seed <= (count > 100 ? 5 : 20); seed++) {
      const random = seededRandom(seed);
      const noise = Array.from({ length: count }, (_, volume) => ({ volume, reading: 7 + random.error('normal') }));
      expect(codes(readCurve(noise, 'pH'))).toEqual(['no-step']);
    }
  });

  it('a potential asks for a span in mV', () => {
    expect(readCurve(POINTS, 'potential')).toMatchObject({ refused: { code: 'flat', params: { least: 20 } } });
  });

  it('never throws', () => {
    const figure = fc.oneof(fc.double(), fc.double({ min: 0, max: 14, noNaN: true }), fc.constantFrom(0, 5, 1e-300, 1e300));
    fc.assert(
      fc.property(fc.array(fc.record({ volume: figure, reading: figure }), { maxLength: 40 }), fc.constantFrom('pH' as const, 'potential' as const), (points, kind) => {
        const found = readCurve(points, kind);
        if ('refused' in found) return;
        expect(Number.isFinite(found.endPoint)).toBe(true);
        const [first, last] = [found.points[0]!.volume, found.points.at(-1)!.volume];
        expect(found.endPoint).toBeGreaterThanOrEqual(first);
        expect(found.endPoint).toBeLessThanOrEqual(last);
      }),
      { seed: 1, numRuns: 500 },
    );
  });
});

describe('what is mended, and said', () => {
  it('points out of order', () => {
    const given = POINTS.toReversed();
    expect(codes(readCurve(given, 'pH'))).toEqual(['sorted']);
    expect(endOf(given)).toBe(endOf(POINTS));
    expect(given[0]).toBe(POINTS.at(-1)); // what was given stays as it was
  });

  it('a volume that comes twice', () => {
    const given = POINTS.flatMap(({ volume, reading }) => [{ volume, reading: reading - 0.1 }, { volume, reading: reading + 0.1 }]);
    expect(readCurve(given, 'pH')).toMatchObject({ remarks: [{ code: 'averaged', params: { points: 51 } }] });
    expect(endOf(given)).toBeCloseTo(5, 6);
  });

  it('points that are no number, or before zero', () => {
    const given = [...POINTS, { volume: NaN, reading: 7 }, { volume: 3, reading: NaN }, { volume: -1, reading: 7 }];
    expect(readCurve(given, 'pH')).toMatchObject({ remarks: [{ code: 'left-out', params: { points: 3 } }] });
  });

  it('too many points', () => {
    const given = at(Array.from({ length: 100_001 }, (_, i) => i / 10_000));
    const found = prepare(given, 'pH');
    if ('refused' in found) throw new Error(found.refused.code);
    expect(found.points.length).toBeLessThanOrEqual(MOST_POINTS);
    expect(found.remarks).toEqual([{ code: 'thinned', params: { points: 100_001, groups: found.points.length } }]);
    expect(endOf(given)).toBeCloseTo(5, 3);
  });

  it('steps too wide for a sure end', () => {
    expect(codes(readCurve(at([1, 2, 3, 4, 5, 6, 7, 8, 9]), 'pH'))).toContain('coarse');
  });

  it('a pH that falls, without Gran’s lines', () => {
    const found = readCurve(at(VOLUMES, (volume) => 14 - step(volume)), 'pH');
    expect(codes(found)).toEqual(['falling']);
    expect(found).not.toHaveProperty('gran');
  });
});

describe('several steps', () => {
  const steps = (...ends: number[]) => at(VOLUMES, (volume) => 4 + ends.reduce((sum, end) => sum + Math.tanh((volume - end) / 0.3), 0));
  it('two are named, three counted, the last is taken', () => {
    expect(readCurve(steps(3, 7), 'pH')).toMatchObject({ remarks: expect.arrayContaining([expect.objectContaining({ code: 'two-steps' })]) });
    expect(readCurve(steps(2, 5, 8), 'pH')).toMatchObject({ remarks: expect.arrayContaining([expect.objectContaining({ code: 'several-steps' })]) });
    expect(endOf(steps(2, 5, 8))).toBeCloseTo(8, 1);
  });
});

describe('Gran’s lines', () => {
  const granOf = (points: readonly CurvePoint[]) => {
    const found = readCurve(points, 'pH');
    return 'refused' in found ? undefined : found.gran;
  };

  it('are found where the curve is an ideal buffer: pH = pK + log V/(V_e − V)', () => {
    const ideal = at(VOLUMES.filter((volume) => volume > 0 && volume !== 5), (volume) => (volume < 5 ? 5 + Math.log10(volume / (5 - volume)) : 12 + Math.log10((volume - 5) / 5)));
    expect(granOf(ideal)).toMatchObject({ acid: { from: 1, to: 4.4 }, base: { to: 7.4 } });
    const { acid, base } = granOf(ideal)!;
    for (const line of [acid, base]) {
      expect(line).toMatchObject({ rSquared: expect.closeTo(1, 9), endPoint: expect.closeTo(5, 9) });
    }
  });

  it('are refused with a reason: not straight, too few points', () => {
    const plain = granOf(at(VOLUMES, (volume) => step(volume)))!;
    expect(plain.acid).toMatchObject({ refused: { code: expect.stringMatching(/^gran-(not-straight|outside)$/) } });
    expect(granOf(at([0, 2, 4, 4.6, 4.8, 5, 5.2, 5.4, 6, 8]))!.acid).toEqual({ refused: { code: 'gran-few', params: { points: 2, least: 4 } } });
  });

  it('that differ are said', () => {
    // a buffer that would end at 5.5 mL, and a step at 5
    const bent = at(VOLUMES.slice(1), (volume) => (volume < 5 ? 5 + Math.log10(volume / (5.5 - volume)) : 12));
    expect(codes(readCurve(bent, 'pH'))).toContain('gran-differs');
  });
});
