import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readLot } from '../../src/core.js';
import type { LotEntry, LotReading, SiteProfile } from '../../src/core.js';
import { certified, lot, read, run, site } from './lot.js';

const settling = ({ route }: LotReading): { code: string; runs?: string } | undefined => {
  const reason = route.reasons.find(({ code }) => code.endsWith('-settle'));
  return reason && { code: reason.code, ...reason.params };
};

/** So many runs alike, of 2.5 g with 0.1 mol/L. */
const alike = (count: number, titre: string, blank = ''): LotEntry =>
  lot({
    figures: { titrantStrength: '0.1 mol/L', ...(blank && { blank }) },
    options: blank ? { blankPolicy: 'blank-subtracted' } : {},
    runs: Array.from({ length: count }, () => run('2.5 g', '0', titre)),
  });

describe('the number of further runs', () => {
  it('is the one that does settle it, and one fewer does not, when they come out at the mean', () => {
    let told = 0;
    fc.assert(
      fc.property(
        fc.record({
          runs: fc.integer({ min: 1, max: 4 }),
          titre: fc.integer({ min: 200, max: 600 }).map((hundredths) => (hundredths / 100).toFixed(2)),
          repeatability: fc.integer({ min: 10, max: 80 }).map((hundredths) => `${(hundredths / 100).toFixed(2)} mg/g`),
          drop: fc.constantFrom('0.03 mL', '0.1 mL'),
          blank: fc.constantFrom('', '0.15 mL'),
          above: fc.double({ min: 1.001, max: 1.06, noNaN: true }),
        }),
        ({ runs, titre, repeatability, drop, blank, above }) => {
          // FFA = 282 · 0.1 · V / (10 · 2.5)
          const limit = ((282 * 0.1 * (Number(titre) - (blank ? 0.15 : 0))) / 25) * above;
          const profile = site({ figures: { repeatabilityTyped: repeatability, dropVolume: drop, directLimit: `${limit.toFixed(4)} %` }, options: { repeatabilityBy: 'typed', burette: 'A-10' } });
          const { code, runs: further } = settling(read(alike(runs, titre, blank), profile)) ?? {};
          const verdict = (more: number): string => read(alike(runs + more, titre, blank), profile).route.verdict;
          if (code === 'more-runs-settle') {
            told++;
            expect([verdict(Number(further) - 1), verdict(Number(further))]).toEqual(['too-close', 'direct']);
          } else if (code) expect(verdict(12 - runs)).toBe('too-close');
        },
      ),
      { numRuns: 150, seed: 20_260_312 },
    );
    expect(told).toBeGreaterThan(20);
  });

  it('is none where the drop of the one blank is what is left', () => {
    const profile = site({
      figures: { repeatabilityTyped: '0.01 mg/g', dropVolume: '0.1 mL', directLimit: '1.16 %', buretteToleranceTyped: '0.001 mL', buretteCapacityTyped: '25 mL', titrantLabelTolerance: '0.01 %' },
      options: { repeatabilityBy: 'typed', burette: 'other' },
    });
    // 282 · 0.1 · 1.00 / 25 is 1.128 %; the blank’s 0.05/√3 mL alone are 0.0326 %, times 1.645 0.054 %
    const reading = read(alike(2, '1.20', '0.2 mL'), profile);
    expect(settling(reading)).toEqual({ code: 'no-runs-settle', source: 'u.blankEndPoint' });
  });

  it('is not named for a certificate', () => {
    expect(settling(read(certified('3.05')))).toEqual({ code: 'no-runs-settle', source: 'u.certificate' });
  });
});

describe('a route without a guard band', () => {
  const near = alike(2, '2.64'); // 2.978 %

  it.each<[string, SiteProfile]>([
    ['a figure of the equipment is refused', site({ figures: { dropVolume: '0 mL' } })],
    ['a figure of the equipment is missing', site({ options: { burette: 'other' } })],
  ])('says so, where %s', (_, profile) => {
    expect(read(near).route.verdict).toBe('too-close');
    const { route, uncertainties, readings } = read(near, profile);
    expect(uncertainties['freeFattyAcid']).toBeUndefined();
    expect(readings['freeFattyAcid']?.shown).toBe('2.98');
    expect(route.verdict).toBe('direct');
    expect(route.reasons[0]).toEqual({ code: 'no-guard-band', params: {} });
  });

  it('is none where the guard band is known, or the FFA is not', () => {
    for (const entry of [near, certified('8'), lot({})]) expect(read(entry).route.reasons.map(({ code }) => code)).not.toContain('no-guard-band');
  });
});

describe('a list, which asks for a few figures only', () => {
  const standard: SiteProfile = { ...site({ figures: { khpBlank: '0.05 mL' }, options: { titrantKnownFrom: 'standardised' } }), titrantRuns: [run('0.5012 g', '0', '24.50'), run('0.4987 g', '0', '24.40')] };
  const noStrength = { ...alike(2, '2.64'), figures: {} };

  it.each<[string, LotEntry, SiteProfile]>([
    ['weighed runs', alike(3, '2.64'), site({})],
    ['runs that differ', lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('2.5 g', '0', '2.2'), run('2.5 g', '0', '3.1'), run('2.5 g', '0', '2.8')] }), site({})],
    ['a blank', alike(2, '2.84', '0.2 mL'), site({})],
    ['a portion by volume', lot({ figures: { titrantStrength: '4 g/L' }, options: { sampleTakenBy: 'volume', titrantAlkali: 'NaOH' }, runs: [run('1.0 mL', '0', '0.98')] }), site({})],
    ['a certificate', certified('3.05'), site({})],
    ['a standardised titrant', noStrength, standard],
  ])('has the same route, for %s', (_, entry, profile) => {
    const few = readLot(entry, profile, { only: ['acidValue'] });
    expect('route' in few && few.route).toEqual(read(entry, profile).route);
  });
});
