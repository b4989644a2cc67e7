import { sgg } from 'ml-savitzky-golay-generalized';
import { describe, expect, it } from 'vitest';
import { slopes } from '../../src/decision/titration-curve/derivatives.js';
import { nernstSlope } from '../../src/decision/titration-curve/gran.js';
import type { GranLine } from '../../src/decision/titration-curve/gran.js';
import type { CurvePoint } from '../../src/decision/titration-curve/points.js';
import { readCurve } from '../../src/decision/titration-curve/titration-curve.js';
import type { CurveReading } from '../../src/decision/titration-curve/titration-curve.js';
import { seededRandom } from '../../src/formula/random.js';
import { dosedSteps, evenSteps, titratedPH } from './titrated.ts';
import type { Titrated } from './titrated.ts';

// End points against the equivalence point that the amounts fix: V_e = (strong + weak) · volume / base.

const END = 10;
/** Titrated with a base ten times as strong, so that 100 mL take 10 mL. */
const acid = (weak: number, pKa: number): Titrated => ({ weak, pKa, volume: 100, base: 10 * weak });

const curve = (titrated: Titrated, volumes: readonly number[], noise = 0, seed = 1): CurvePoint[] => {
  const random = seededRandom(seed);
  return volumes.map((volume) => ({ volume, reading: titratedPH(titrated, volume) + noise * random.error('normal') }));
};

function read(...[points, kind, options]: [readonly CurvePoint[], ('pH' | 'potential')?, { initialVolume: number }?]): CurveReading {
  const found = readCurve(points, kind ?? 'pH', options);
  if ('refused' in found) throw new Error(found.refused.code);
  return found;
}

const ACIDS = [3.8, 4.8, 6.5].flatMap((pKa) => [0.001, 0.01, 0.05].map((weak) => [pKa, weak] as const));

describe('the inflection of a weak acid', () => {
  // Without noise what is left is the interpolation between two points, by symmetry within a quarter of a step of them.
  it.each(ACIDS)('pKa %d, %d mol/L: within a quarter of an even step', (pKa, weak) => {
    for (const steps of [20, 60, 300]) {
      expect(Math.abs(read(curve(acid(weak, pKa), evenSteps(15, steps))).endPoint - END)).toBeLessThan((0.25 * 15) / steps);
    }
  });

  it.each(ACIDS)('pKa %d, %d mol/L: uneven steps, within a quarter of the narrow ones', (pKa, weak) => {
    expect(Math.abs(read(curve(acid(weak, pKa), dosedSteps(END))).endPoint - END)).toBeLessThan(0.025);
  });

  // Noise σ moves the zero of the second derivative by about σ over the slope there; 0.03 pH on a step that rises 2 pH
  // and more within one step of 0.1 or 0.25 mL is far below a quarter of it, as without noise.
  it.each(ACIDS)('pKa %d, %d mol/L: with noise of 0.03 pH, the same', (pKa, weak) => {
    for (const seed of [1, 2, 3, 4, 5]) {
      expect(Math.abs(read(curve(acid(weak, pKa), dosedSteps(END), 0.03, seed)).endPoint - END)).toBeLessThan(0.03);
      expect(Math.abs(read(curve(acid(weak, pKa), evenSteps(15, 60), 0.03, seed)).endPoint - END)).toBeLessThan(0.0625);
    }
  });

  it('lies before the equivalence point of an acid so weak that no sharp step is left, by 1 % and no more', () => {
    // Roller 1928, J. Am. Chem. Soc. 50:1 (from memory): the inflection falls short of equivalence as Ka·C nears Kw
    const { endPoint } = read(curve(acid(0.001, 8), evenSteps(15, 300)));
    expect(endPoint).toBeLessThan(END);
    expect(endPoint).toBeGreaterThan(END * 0.99);
  });

  it('of 100 000 noisy points is that of the few', () => {
    expect(Math.abs(read(curve(acid(0.01, 4.8), evenSteps(15, 100_000), 0.1)).endPoint - END)).toBeLessThan(0.01);
  });
});

describe('a potential', () => {
  it.each([[1, 'rising'], [-1, 'falling']])('with sign %d, %s, gives the end point of the pH', (sign) => {
    const points = curve(acid(0.01, 4.8), evenSteps(15, 60));
    const potential = points.map(({ volume, reading }) => ({ volume, reading: sign * nernstSlope() * (reading - 7) + 12.3 }));
    const [inPH, inMV] = [read(points), read(potential, 'potential')];
    expect(inMV.endPoint).toBeCloseTo(inPH.endPoint, 8);
    expect((inMV.gran!.acid as GranLine).endPoint).toBeCloseTo((inPH.gran!.acid as GranLine).endPoint, 8);
  });

  it('changes by 59.16 mV for a unit of pH at 25 °C, by 58.17 mV at 20 °C', () => {
    // any table of the Nernst slope; from memory
    expect(nernstSlope().toFixed(2)).toBe('59.16');
    expect(nernstSlope(20).toFixed(2)).toBe('58.17');
  });
});

describe('a strong acid beside a weak one', () => {
  const mixtures = [[0.002, 0.004, 6.5], [0.005, 0.005, 6.5], [0.002, 0.008, 6.5], [0.005, 0.005, 4.8]] as const;
  it.each(mixtures)('%d and %d mol/L, pKa %d: both steps, the last one the total', (strong, weak, pKa) => {
    const [first, total] = [strong * 1000, (strong + weak) * 1000];
    const found = read(curve({ strong, weak, pKa, volume: 100, base: 0.1 }, evenSteps(total * 1.5, 75), 0.003));
    expect(found.remarks.map(({ code }) => code)).toContain('two-steps');
    expect(found.inflections).toHaveLength(2);
    expect(Math.abs(found.endPoint - total)).toBeLessThan(0.25 * 0.02 * total);
    // the first bends over where the weak acid begins to give way: sharp to a step, not to a part of one
    expect(Math.abs(found.inflections[0]!.volume - first)).toBeLessThan(0.02 * total);
    // and Gran counts the weak acid from there
    const { acid: line } = found.gran!;
    expect(Math.abs((line as GranLine).endPoint - total)).toBeLessThan(0.1);
  });

  it('stopped before the last step is refused', () => {
    const points = curve({ strong: 0.005, weak: 0.005, pKa: 6.5, volume: 100, base: 0.1 }, evenSteps(9.7, 60));
    expect(readCurve(points, 'pH')).toMatchObject({ refused: { code: 'at-edge' } });
  });
});

describe('Gran’s lines', () => {
  // the line of the acid neglects its own dissociation: 0.2 of its range below half an end point of 10 mL, below 1 % of it
  it.each([[4.8, 0.01], [4.8, 0.05], [6.5, 0.001], [6.5, 0.01], [6.5, 0.05]])('pKa %d, %d mol/L: acid within 1 %, base within 0.01 mL', (pKa, weak) => {
    const { gran } = read(curve(acid(weak, pKa), evenSteps(15, 60)), 'pH', { initialVolume: 100 });
    expect(Math.abs((gran!.acid as GranLine).endPoint - END)).toBeLessThan(0.1);
    expect(Math.abs((gran!.base as GranLine).endPoint - END)).toBeLessThan(0.01);
    expect((gran!.base as GranLine).rSquared).toBeGreaterThan(0.9999);
  });
});

describe('the derivatives', () => {
  // the library's weights are for even steps, so there the two must agree
  it.each([5, 7, 13])('at even volumes are those of the library, window %d', (window) => {
    const points = curve(acid(0.01, 4.8), evenSteps(15, 60), 0.02);
    const found = slopes(points, window, 0.02);
    const readings = points.map(({ reading }) => reading);
    const options = { windowSize: window, polynomial: 2 };
    const [first, second] = [1, 2].map((derivative) => sgg(readings, 0.25, { ...options, derivative }));
    found.forEach(({ slope, bend }, at) => {
      expect(slope).toBeCloseTo(first![at]!, 8);
      expect(bend).toBeCloseTo(second![at]!, 7);
    });
  });

  it('at uneven volumes are exact for a parabola', () => {
    const points = dosedSteps(END).map((volume) => ({ volume, reading: 3 - 0.7 * volume + 0.11 * volume ** 2 }));
    for (const { volume, slope, bend } of slopes(points, 9, 0)) {
      expect(slope).toBeCloseTo(-0.7 + 0.22 * volume, 9);
      expect(bend).toBeCloseTo(0.22, 7);
    }
  });

  it('have the standard deviation that they scatter by', () => {
    const volumes = dosedSteps(END);
    const drawn = Array.from({ length: 2000 }, (_, seed) => {
      const random = seededRandom(seed);
      return slopes(volumes.map((volume) => ({ volume, reading: random.error('normal') })), 7, 1);
    });
    for (const at of [0, 8, 20, 43]) {
      const scatter = Math.sqrt(drawn.reduce((sum, one) => sum + one[at]!.slope ** 2, 0) / drawn.length);
      // the s of 2000 normal draws is sure to 1/√4000, 1.6 %
      expect(scatter / drawn[0]![at]!.deviation).toBeGreaterThan(0.93);
      expect(scatter / drawn[0]![at]!.deviation).toBeLessThan(1.07);
    }
  });
});
