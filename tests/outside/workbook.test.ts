import { read as readBook, utils } from '@e965/xlsx';
import { describe, expect, it } from 'vitest';
import { EMPTY_LOT, EMPTY_SITE, readLot } from '../../src/core.js';
import type { LotEntry, SiteProfile } from '../../src/core.js';
import { workbookOf } from '../../src/exchange/workbook/workbook.js';
import { Decimal } from '../../src/formula/decimal.js';
import { isKnown } from '../../src/formula/reading.js';
import { lotRun } from '../../src/lot/lot-run.js';
import { lot, run } from '../lot/lot.js';
import { hasOffice, recalculated } from './office.js';
import { PLANT, randomLots } from './random-lots.js';

const office = hasOffice();
if (!office) process.stdout.write('The workbooks are not worked out anew: soffice is not on this machine.\n');

const MADE: readonly (readonly [lots: readonly LotEntry[], site: SiteProfile])[] = [
  [randomLots(26, 11), EMPTY_SITE],
  [randomLots(24, 12), PLANT],
  [[
    // figures missing, refused, of another kind; runs that lie apart
    EMPTY_LOT,
    lot({ figures: { oilAmount: '-4 kg', titrantStrength: '0.1 mol/L' }, runs: [run('5 g', '0', '3')] }),
    lot({ figures: { oilAmount: '4 mL', waterContent: '4 kg', titrantStrength: '0.1 mol/L', blank: '0.2 mL' }, runs: [run('5 g', '0', '3')] }),
    lot({ figures: { oilAmount: '100 kg', titrantStrength: '0.1 mol/L' }, runs: [run('5 g', '3', '1')] }),
    lot({ figures: { oilAmount: '100 kg', titrantStrength: '0.1 mol/L' }, runs: [run('5 g', '0', '3'), run('5 g', '0', '5'), run('5 g', '0', '3.1')] }),
    { ...EMPTY_LOT, figures: { oilAmount: { typed: '1,500', doubt: 'ambiguous', unit: 'kg' } }, runs: [{ sample: { text: '5', unit: 'g' } }] },
  ], EMPTY_SITE],
];

interface Row { readonly key: string; readonly values: readonly unknown[] }

/** The rows of the working by key, and the lots' values in order. */
function workingIn(bytes: Uint8Array): Row[] {
  const { Sheets } = readBook(bytes, { type: 'array' });
  const rows = utils.sheet_to_json<unknown[]>(Sheets['Working']!, { header: 1, raw: true, blankrows: true });
  return rows.slice(1).map((row) => ({ key: String(row[1]), values: row.slice(6) }));
}

const DIGITS = 12;

/** Whether a figure of a sheet agrees with an exact one; what a double leaves of nothing counts as nothing. */
function agrees(found: unknown, exact: Decimal): boolean {
  if (typeof found !== 'number') return false;
  return new Decimal(found).minus(exact).abs().lte(exact.abs().times(`1e-${DIGITS}`).plus('1e-18'));
}

describe.skipIf(!office)('a workbook worked out by LibreOffice', () => {
  const worked = office ? recalculated(MADE.map(([lots, site]) => workbookOf(lots, site).bytes)).map(workingIn) : [];

  it(`comes to the readings of every lot, to ${DIGITS} digits, and shows no error`, () => {
    const differing: string[] = [];
    let compared = 0;
    MADE.forEach(([lots, site], book) => lots.forEach((entry, at) => {
      const reading = readLot(entry, site);
      if ('faults' in reading) throw new Error(JSON.stringify(reading.faults));
      const { findings, sheet } = lotRun(entry, site);
      const rows = worked[book]!;
      for (const { key, values } of rows) {
        const found = values[at];
        const where = `${book}.${at} ${key}: ${String(found)}`;
        if (sheet.choices.has(key) && (!/averageBy|runsAgree/.test(key) || sheet.quantities.has(key.replace(/averageBy|runsAgree/, 'runRange')))) {
          const option = findings.option(key);
          const expected = typeof option === 'string' ? option : 'not known';
          if (found !== expected) differing.push(`${where}, not ${expected}`);
          continue;
        }
        if (!sheet.quantities.has(key)) {
          if (found !== undefined) differing.push(`${where}, not empty`);
          continue;
        }
        // what no reading has is in the sheet all the same
        const value = reading.readings[key]?.value;
        const outcome = value === undefined ? findings.outcome(key) : new Decimal(value);
        compared++;
        if (isKnown(outcome) ? !agrees(found, outcome) : found !== 'not known') differing.push(`${where}, not ${isKnown(outcome) ? outcome.toString() : JSON.stringify(outcome)}`);
      }
      // nothing that was read is left out of the sheet
      const keys = new Set(rows.map(({ key }) => key));
      for (const key of Object.keys(reading.readings)) if (!keys.has(key)) differing.push(`${book}.${at} ${key} has no row`);
    }));
    console.log(compared, differing.length);
    expect(differing.slice(0, 60)).toEqual([]);
    expect(compared).toBeGreaterThan(20_000);
  });
}, 120_000);
