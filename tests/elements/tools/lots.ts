import type { LotEntry } from '../../../src/core.js';
import { figure, lot, run } from '../../lot/lot.js';

export { certified, figure, lot, read, run, shownIn, site } from '../../lot/lot.js';

// Invented lots, one for each thing a panel can show.

const bench = { oilAmount: '900 kg', waterContent: '0.08 %', titrantStrength: '0.1023 mol/L' };

/** 1.1 % FFA, dry: straight to the base step. */
export const clean: LotEntry = {
  ...lot({ figures: bench, runs: [run('2.504 g', '0.00', '0.97'), run('2.497 g', '0.97', '1.94')] }),
  name: 'HK-0412', source: 'Kitchen round north', date: '2026-03-02',
};

/** 4.3 % FFA: the acid step first. */
export const sour: LotEntry = {
  ...lot({ figures: bench, runs: [run('2.504 g', '0.00', '3.72'), run('2.497 g', '3.72', '7.44')] }),
  name: 'HK-0417', source: 'Snack fryers', date: '2026-03-04',
};

/** The sour lot after the acid step, titrated again. */
export const retested: LotEntry = { ...sour, retestRuns: [run('5.012 g', '0.00', '0.62'), run('5.003 g', '0.62', '1.25')] };

/** 60 % FFA: above both routes' limits. */
export const outside: LotEntry = lot({ figures: bench, runs: [run('0.512 g', '0.00', '10.63')] });

/** Everything a hurried hand can get wrong at once. */
export const nonsense: LotEntry = {
  ...lot({ figures: { oilAmount: '-900 kg', waterContent: '180 %', blank: '0.4 mL' }, runs: [run('0 g', '9.00', '3.72'), run('2.504 g', '0.00', '99999')] }),
  figures: {
    oilAmount: figure('-900 kg'), waterContent: figure('180 %'), blank: figure('0.4 mL'), insolubles: figure('3 stone'),
    titrantStrength: { typed: 'about a tenth', doubt: 'not-a-number', unit: 'mol/L' },
    oilTemperature: { typed: '1,500', doubt: 'ambiguous', unit: '°C' },
  },
  name: 'Donaudampfschifffahrtsgesellschaftsaltspeisefettsammelstelle-0001-WITHOUT-A-BREAK',
};
