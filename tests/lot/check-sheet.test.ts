import { describe, expect, it } from 'vitest';
import { EMPTY_SITE } from '../../src/core.js';
import type { LotEntry } from '../../src/core.js';
import { checkSheet } from '../../src/lot/check-sheet.js';
import { secondCheck } from '../../src/lot/second-check.js';
import { workingFigure } from '../../src/lot/working.js';
import { certified, lot, read, run } from './lot.js';

const TITRATED = lot({
  figures: { oilAmount: '800 kg', titrantStrength: '0.1023 mol/L', blank: '0.12 mL' },
  options: { blankPolicy: 'blank-subtracted' },
  runs: [run('5.02 g', '0.40', '3.55'), run('4.98 g', '3.55', '6.52')],
});
const SOUR = certified('6', { figures: { oilAmount: '1000 L' } });

const sheetOf = (entry: LotEntry, route: 'direct' | 'twoStep') => checkSheet(entry, EMPTY_SITE, route, workingFigure);
const keys = (all: readonly { readonly key: string }[]): string[] => all.map(({ key }) => key);
const amounts = (entry: LotEntry, route: 'direct' | 'twoStep'): string[] => sheetOf(entry, route).amounts.map(({ working }) => working.key);

describe('the check sheet', () => {
  it('asks for acid value, FFA and every amount of the charge, in order of addition', () => {
    expect(amounts(TITRATED, 'direct')).toEqual([
      'acidValue', 'freeFattyAcid', 'oilVolume', 'direct.methanol', 'direct.methanolVolume', 'direct.baseProduct', 'direct.extraProduct', 'direct.catalyst',
      'direct.catalystPerLitre', 'direct.catalystPerKilogram',
    ]);
    const sour = amounts(SOUR, 'twoStep');
    for (const key of ['oilMass', 'pass1.methanol', 'pass1.methanolVolume', 'pass1.sulfuric', 'pass1.sulfuricVolume', 'pretreated.mass', 'twoStep.methanol', 'twoStep.catalyst']) expect(sour).toContain(key);
    expect(sour.filter((key) => key.startsWith('direct.'))).toEqual([]);
  });

  it('asks for the retest where there is one', () => {
    const retested = { ...TITRATED, retestRuns: [run('5.00 g', '0', '0.50')] };
    expect(amounts(retested, 'twoStep')).toContain('retest.acidValue');
    expect(amounts(TITRATED, 'twoStep')).not.toContain('retest.acidValue');
  });

  // but for the FFA of a certificate, which is where the sum begins
  it('gives no result of what it asks for, neither beside it nor in the formula of another', () => {
    for (const [entry, route] of [[TITRATED, 'direct'], [SOUR, 'twoStep']] as const) {
      const sheet = sheetOf(entry, route);
      const printed = [...sheet.given.map(({ result }) => result ?? ''), ...sheet.amounts.map(({ figures }) => figures.text)].join(' | ');
      for (const { working } of sheet.amounts.filter(({ working: { key } }) => entry !== SOUR || key !== 'freeFattyAcid')) expect(printed, working.key).not.toMatch(new RegExp(`(?<![\\d.])${working.result!.replaceAll('.', '\\.')}(?![\\w/])`));
    }
  });

  it('leads from the readings of the burette to each amount: all that a formula names is given, a step or an amount', () => {
    for (const [entry, route] of [[TITRATED, 'direct'], [SOUR, 'twoStep']] as const) {
      const sheet = sheetOf(entry, route);
      const known = new Set([...keys(sheet.given), ...keys(sheet.steps), ...amounts(entry, route)]);
      const symbols = new Set([...sheet.given, ...sheet.steps, ...sheet.amounts.map(({ working }) => working)].map(({ symbol }) => symbol.text));
      for (const { rests } of [...sheet.steps, ...sheet.amounts.map(({ working }) => working)]) {
        // a step of the same symbol as what it hands on is not printed
        for (const key of rests) expect([key, known.has(key) || symbols.has(read(entry).readings[key]!.symbol)]).toEqual([key, true]);
      }
    }
    const { given } = sheetOf(TITRATED, 'direct');
    for (const key of ['run1.sampleMass', 'run1.buretteStart', 'run2.buretteEnd', 'weighedOil', 'titrantConcentration']) expect(keys(given)).toContain(key);
    expect(given.every(({ result }) => result !== undefined)).toBe(true);
  });

  it('gives the molar masses that the formulas name', () => {
    const constants = Object.fromEntries(sheetOf(SOUR, 'twoStep').constants.map(({ symbol, value }) => [symbol, value.toString()]));
    // from the IUPAC conventional atomic weights: 39.0983 + 15.999 + 1.008; 12.011 + 4 · 1.008 + 15.999; 2 · 1.008 + 32.06 + 4 · 15.999
    expect(constants).toMatchObject({ M_KOH: '56.1053', M_MeOH: '32.042', M_H2SO4: '98.072' });
  });

  it('asks for nothing that is not known yet', () => {
    const begun = lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('5.00 g', '0', '3.00')] });
    expect(amounts(begun, 'direct')).toEqual(['acidValue', 'freeFattyAcid']);
    expect(amounts(lot({}), 'twoStep')).toEqual([]);
  });

  it('can be checked line by line', () => {
    for (const key of amounts(TITRATED, 'direct')) {
      const { value = '', unit } = read(TITRATED).readings[key]!;
      expect([key, secondCheck(TITRATED, EMPTY_SITE, key, { text: value.slice(0, 12), unit }).verdict]).toEqual([key, expect.stringMatching(/agrees|close/)]);
    }
  });
});
