import { describe, expect, it } from 'vitest';
import { DEFAULT_FIGURES, EMPTY_SITE } from '../../src/core.js';
import type { LotEntry } from '../../src/core.js';
import { cellFormulaOf, working, workingFigure } from '../../src/working.js';
import { one } from '../../src/formula/units.js';
import type { WriteFigure } from '../../src/formula/working-text.js';
import { onlyDigits } from '../formula/given.js';
import { readText } from '../formula/read-back.js';
import { certified, lot, read, run, site, valueIn } from './lot.js';

const TITRATED = lot({
  figures: { oilAmount: '800 kg', titrantStrength: '0.1000 mol/L', titrationTemperature: '24 °C', blank: '0.10 mL' },
  options: { blankPolicy: 'blank-subtracted' },
  runs: [run('5.02 g', '0.00', '3.10'), run('4.98 g', '3.10', '6.15')],
});
const SOUR = certified('18.4', { options: { catalyst: 'NaOCH3-solution', glyceridesBy: 'profile', fat: 'tallow' } });

/** Six significant digits as a person copies them, without the unit. */
const copied: WriteFigure = (value) => workingFigure(value, one);

// A second person with a calculator: the figures of the working, typed in as they stand (mathjs, 64 digits), give the result
// that is shown. Every figure is rounded to six digits, so the result may be off in its fifth.
const reproduces = (entry: LotEntry, key: string): void => {
  const { formula } = working(entry, EMPTY_SITE, key, copied);
  const byHand = readText(formula!.figures.text, {});
  const exact = valueIn(read(entry), key);
  if (!byHand) throw new Error(`${key}: ${formula!.figures.text}`);
  expect(byHand.minus(exact).abs().toNumber(), `${key}: ${formula!.figures.text}`).toBeLessThanOrEqual(Math.max(exact.abs().toNumber() * 2e-5, 1e-9));
};

describe('the working of a figure', () => {
  it.each([
    'run1.titre', 'run1.correctedTitre', 'run2.netTitre', 'run1.acidContent', 'acidContent', 'acidValue', 'freeFattyAcid', 'alkaliPerLitreOfOil', 'volumeFactor',
    'oilDensity', 'oilVolume', 'glycerideShare', 'glycerideContent', 'glycerideMolarMass', 'acidAmount',
    'direct.basePure', 'direct.acidPure', 'direct.extraPure', 'direct.catalyst', 'direct.catalystPerLitre', 'direct.methanolNeeded', 'direct.methanol', 'direct.methanolVolume',
    'direct.waterMade', 'direct.waterBrought', 'direct.waterShare', 'direct.soap', 'direct.oilLost', 'direct.ester', 'direct.glycerol', 'blendOil',
  ])('%s reproduces it from the figures shown', (key) => {
    reproduces(TITRATED, key);
  });

  it.each([
    'pass1.acidMass', 'pass1.methanolPure', 'pass1.methanol', 'pass1.sulfuric', 'pass1.sulfuricVolume', 'pass1.waterPresent', 'pass1.acidLoad', 'pass1.rateFactor',
    'pass1.equilibrium.slow', 'pass1.rate.slow', 'pass1.conversion.slow', 'pass1.ffaLeft.slow', 'pass1.equilibrium.fast', 'pass2.methanolPresent.slow',
    'esterification.temperatureFactor', 'pretreated.mass', 'twoStep.catalyst', 'twoStep.catalystVolume', 'twoStep.mineralPure', 'twoStep.methanol', 'profileAcidMolarMass',
  ])('%s of the two-step route too', (key) => {
    reproduces(SOUR, key);
  });

  it('with all digits gives every computed figure of a lot to 28 of them', () => {
    for (const entry of [TITRATED, SOUR]) {
      const reading = read(entry);
      for (const [key, { from }] of Object.entries(reading.readings)) {
        if (from !== 'formula') continue;
        const byHand = readText(working(entry, EMPTY_SITE, key, onlyDigits).formula!.figures.text, {})!;
        const exact = valueIn(reading, key);
        if (byHand.minus(exact).abs().gt(exact.abs().times('1e-28'))) expect([key, byHand.toString()]).toEqual([key, exact.toString()]);
      }
    }
  });

  it('reads as a handbook prints it', () => {
    const { symbol, unit, formula, result } = working(TITRATED, EMPTY_SITE, 'run1.acidContent');
    expect([symbol.text, unit, result]).toEqual(['b_1', 'mmol/g', '0.059498 mmol/g']);
    expect(formula?.general.text).toBe('c · V_net1 / m_1');
    expect(formula?.figures.text).toBe('0.1 mol/L · 2.9868 mL / 5.02 g'); // (3.10 − 0.10) · (1 − 0.0011 · 4)
  });

  it('shows the result in the digits of the reading, and more', () => {
    for (const key of ['acidValue', 'freeFattyAcid', 'direct.catalyst']) {
      const { result } = working(TITRATED, EMPTY_SITE, key);
      expect(Number(result?.split(' ')[0])).toBeCloseTo(valueIn(read(TITRATED), key).toNumber(), 3);
    }
  });

  it('shows only the branch that is taken', () => {
    expect(working(TITRATED, EMPTY_SITE, 'titrantExpansion').formula?.figures.text).toBe('0.0011 /°C');
    expect(working(TITRATED, EMPTY_SITE, 'oilMass').rests).toEqual(['weighedOil']);
    expect(working(certified('2', { figures: { oilAmount: '1000 L' } }), EMPTY_SITE, 'oilMass').rests).toEqual(['oilVolumeGiven', 'oilDensity']);
  });

  it('names what it rests on, to open next', () => {
    expect(working(TITRATED, EMPTY_SITE, 'acidContent').rests).toEqual(['titratedAcidContent']);
    expect(working(TITRATED, EMPTY_SITE, 'titratedAcidContent').rests).toEqual(['run1.acidContent', 'run2.acidContent']);
    expect(working(TITRATED, EMPTY_SITE, 'run1.acidContent').rests).toEqual(['titrantConcentration', 'run1.netTitre', 'run1.sampleMass']);
    expect(working(SOUR, EMPTY_SITE, 'pass1.acidRule').rests).toEqual(['pass1.ffaAtStart']); // 10 or 5 % by the FFA
    expect(working(TITRATED, EMPTY_SITE, 'oilTemperature').rests).toEqual([]);
  });

  it('can be opened down to the inputs', () => {
    const seen = new Set<string>();
    const open = (key: string): void => {
      if (seen.has(key)) return;
      seen.add(key);
      const { formula, rests } = working(TITRATED, EMPTY_SITE, key);
      if (!formula) expect(rests).toEqual([]);
      rests.forEach(open);
    };
    open('direct.catalyst');
    for (const input of ['run1.buretteEnd', 'titrantMolarity', 'weighedOil', 'KOH.baseLoad', 'KOH.assay']) expect(seen).toContain(input);
  });

  it('cites its sources; a default its own, and a figure that was typed none', () => {
    const titles = (entry: LotEntry, key: string, profile = EMPTY_SITE) => working(entry, profile, key).sources.map(({ title }) => title);
    expect(titles(TITRATED, 'run1.acidContent').join()).toMatch(/ISO 660.*EN 14104/);
    expect(titles(TITRATED, 'saponificationValue')).toEqual([DEFAULT_FIGURES['saponificationValue']!.source.title]);
    expect(titles(certified('2', { figures: { saponificationValue: '195 mg/g' } }), 'saponificationValue')).toEqual([]);
    expect(titles(TITRATED, 'saponificationValue', site({ figures: { saponificationValue: '195 mg/g' } }))).toEqual([]);
    expect(working(TITRATED, EMPTY_SITE, 'direct.basePure').sources.map(({ mark }) => mark)).toEqual(['practice']);
  });

  it('keeps the symbol of what is not known', () => {
    const begun = lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [{ sample: { text: '5', unit: 'g' } }] });
    const { formula, result } = working(begun, EMPTY_SITE, 'run1.acidContent');
    expect(result).toBeUndefined();
    expect(formula?.figures.text).toBe('0.1 mol/L · V_net1 / 5 g');
  });

  it('is refused for what no quantity is called', () => {
    expect(() => working(TITRATED, EMPTY_SITE, 'colour')).toThrow('colour');
  });
});

describe('the cell formula of a figure', () => {
  it('is the same formula over cells', () => {
    const address = (key: string): string => ({ titrantConcentration: 'B2', 'run1.netTitre': 'B3', 'run1.sampleMass': 'B4' })[key] ?? 'Z1';
    expect(cellFormulaOf(TITRATED, EMPTY_SITE, 'run1.acidContent', address)).toBe('B2*B3/B4');
    expect(cellFormulaOf(TITRATED, EMPTY_SITE, 'weighedOil', address)).toBeUndefined();
  });
});
