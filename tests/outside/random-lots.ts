import { EMPTY_LOT, EMPTY_SITE } from '../../src/core.js';
import type { Figure, LotEntry, RunEntry, SiteProfile } from '../../src/core.js';

// Lots of every kind that a plant may meet, drawn at random from a seed: the same every time.

/** A linear congruence, as in Numerical Recipes. */
function draws(seed: number): () => number {
  let state = seed;
  return () => (state = (state * 1664525 + 1013904223) % 2 ** 32) / 2 ** 32;
}

const CATALYSTS = ['KOH', 'NaOH', 'KOCH3', 'NaOCH3', 'KOCH3-solution', 'NaOCH3-solution'];

export function randomLots(count: number, seed: number): LotEntry[] {
  const draw = draws(seed);
  const between = (low: number, high: number, decimals: number): string => (low + (high - low) * draw()).toFixed(decimals);
  const one = <T>(of: readonly T[]): T => of[Math.floor(draw() * of.length)]!;
  const sometimes = (share = 0.5): boolean => draw() < share;
  const figure = (text: string, unit: string): Figure => ({ text, unit });

  return Array.from({ length: count }, (_, index): LotEntry => {
    const options: Record<string, string> = { catalyst: CATALYSTS[index % CATALYSTS.length]! };
    const figures: Record<string, Figure> = { oilAmount: one([() => figure(between(200, 2000, 1), 'kg'), () => figure(between(300, 4000, 0), 'lb'), () => figure(between(40, 500, 1), 'US gal'), () => figure(between(200, 2000, 0), 'L'), () => figure(between(0.2, 2, 3), 't')])() };
    const set = (key: string, of: readonly string[], share = 0.4): void => void (sometimes(share) && (options[key] = one(of)));
    const give = (key: string, low: number, high: number, decimals: number, unit: string, share = 0.4): void => void (sometimes(share) && (figures[key] = figure(between(low, high, decimals), unit)));
    set('referenceAcid', ['oleic', 'palmitic', 'lauric', 'erucic', 'linoleic', 'stearic']);
    set('glyceridesBy', ['saponification-value', 'profile']);
    set('fat', ['rapeseed', 'palm', 'tallow', 'coconut', 'soya']);
    set('repeatabilityBy', ['d664-used', 'd664-fresh', 'typed', 'typed-share']);
    set('burette', ['A-10', 'A-25', 'A-50', 'B-10', 'B-25', 'B-50']);
    set('pretreatmentMethanolBasis', ['by-acidity', 'per-acid', 'per-oil', 'oil-volume']);
    set('pretreatmentAcidBasis', ['by-acidity', 'of-acid', 'of-oil', 'oil-volume']);
    set('neutralisingAcid', ['phosphoric-dihydrogen', 'acetic', 'vinegar', 'citric', 'hydrochloric']);
    set('temperatureCorrected', ['yes', 'no'], 0.2);
    give('waterContent', 0.03, 0.4, 2, '%');
    give('saponificationValue', 185, 200, 1, 'mg/g');
    give('oilTemperature', 60, 130, 0, '°F', 0.3);
    give('pretreatmentTarget', 0.5, 1.5, 2, '%', 0.3);
    give('methanolRatio', 5, 9, 1, 'mol/mol', 0.3);
    if (sometimes(0.3)) {
      options['oilDensityBy'] = 'lund';
      figures['iodineValue'] = figure(between(60, 130, 0), 'g/100 g');
    } else if (sometimes(0.3)) {
      options['oilDensityBy'] = 'measured';
      figures['measuredOilDensity'] = figure(between(0.905, 0.925, 4), 'g/mL');
    }

    const ffa = index % 2 ? 0.3 + 2.5 * draw() : 4 + 30 * draw();
    const volumetric = sometimes(0.2);
    if (volumetric) options['sampleTakenBy'] = 'volume';
    if (sometimes(0.3)) figures['titrationTemperature'] = sometimes() ? figure(between(60, 90, 0), '°F') : figure(between(15, 30, 1), '°C');
    const inGrams = sometimes(0.3);
    const alkali = one(['KOH', 'NaOH']);
    options['titrantAlkali'] = alkali;
    if (sometimes(0.8)) figures['titrantStrength'] = inGrams ? figure(between(4, 6, 2), 'g/L') : figure(between(0.09, 0.11, 4), 'mol/L');
    if (sometimes(0.4)) {
      options['blankPolicy'] = 'blank-subtracted';
      figures['blank'] = figure(between(0.02, 0.15, 2), 'mL');
    }
    const runs = (count: number, acidity: number): RunEntry[] => Array.from({ length: count }, (_, at) => {
      const sample = between(2, 5, 2);
      const start = between(0, 2, 2);
      const titre = (acidity * Number(sample) * 10) / (282 * 0.1) * (0.985 + 0.03 * draw()) + 0.3;
      const full = { sample: figure(sample, volumetric ? 'mL' : 'g'), start: figure(start, 'mL'), end: figure((Number(start) + titre).toFixed(2), 'mL') };
      return count > 2 && at === 0 && sometimes(0.3) ? { ...full, struck: 'overshot' } : full;
    });
    const certified = sometimes(0.2);
    if (certified) {
      const byFfa = sometimes();
      options['acidKnownFrom'] = byFfa ? 'certificate-ffa' : 'certificate-acid-value';
      figures[byFfa ? 'certificateFfa' : 'certificateAcidValue'] = figure(byFfa ? ffa.toFixed(2) : (2 * ffa).toFixed(2), byFfa ? '%' : 'mg/g');
    }
    const retested = ffa > 4 && sometimes();
    return {
      ...EMPTY_LOT,
      name: `Lot ${index + 1}`, source: one(['Canteen', 'Dock', 'Fryer 2']), date: '2026-02-01',
      figures, options,
      runs: certified ? [] : runs(1 + Math.floor(draw() * 4), ffa),
      retestRuns: retested ? runs(1 + Math.floor(draw() * 2), 0.9) : [],
    };
  });
}

/** An invented plant with its own limits and prices and a standardised titrant. */
export const PLANT: SiteProfile = {
  ...EMPTY_SITE,
  name: 'Plant by the weir',
  figures: {
    directLimit: { text: '2.5', unit: '%' }, 'KOH.assay': { text: '89.5', unit: '%' }, oilPrice: { text: '410', unit: '¤/t' }, methanolPrice: { text: '2.10', unit: '¤/US gal' }, esterPrice: { text: '0.95', unit: '¤/L' },
    'KOH.price': { text: '1.60', unit: '¤/kg' }, sulfuricPrice: { text: '0.40', unit: '¤/kg' }, methanolStep: { text: '0.5', unit: 'kg' }, catalystStep: { text: '50', unit: 'g' },
  },
  options: { titrantKnownFrom: 'standardised' },
  titrantRuns: [['0.5105', '0.00', '24.62'], ['0.4988', '0.10', '24.17']].map(([sample, start, end]) => ({
    sample: { text: sample!, unit: 'g' }, start: { text: start!, unit: 'mL' }, end: { text: end!, unit: 'mL' },
  })),
};
