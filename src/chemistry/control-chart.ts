import { constant, greatest } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { quantity } from '../formula/quantity.js';
import type { Quantity } from '../formula/quantity.js';
import { Sheet } from '../formula/sheet.js';
import type { Unit } from '../formula/unit.js';
import { meanOf } from './replicates.js';
import { ISO_7870_2 } from './sources.js';

// Chart of individuals and moving range (ISO 7870-2): one figure a lot, and how far it lies from the one before.

/** E2 = 3/d2 and D4 of two figures, and d2 itself, as the standard prints them. */
export const INDIVIDUALS_FACTOR = '2.66';
export const RANGE_FACTOR = '3.267';
export const MEAN_RANGE_OF_TWO = '1.128';

const factor = (text: string, symbol: string): Expression => constant(text, undefined, { symbol, source: ISO_7870_2 });

/** Key of the figure of a lot, of the range from it to the one before; lots count from 1. */
export const individualKey = (lot: number): string => `chart.x${lot}`;
export const movingRangeKey = (lot: number): string => `chart.range${lot}`;

const sheets = new Map<string, Sheet>();

/** The formulas of a chart of so many lots, two or more. The same number gives the same sheet, built once. */
export function controlChart(lots: number, unit: Unit): Sheet {
  const id = `${lots} ${unit.symbol}`;
  let sheet = sheets.get(id);
  if (!sheet) sheets.set(id, (sheet = Sheet.define(formulas(lots, unit))));
  return sheet;
}

function formulas(lots: number, unit: Unit): readonly Quantity[] {
  const about = { unit, cites: [ISO_7870_2], digits: { significant: 4 } };
  const individuals = Array.from({ length: lots }, (_, i) => quantity({ ...about, key: individualKey(i + 1), symbol: `x_${i + 1}`, cites: [] }));
  const ranges = individuals.flatMap((one, i) => {
    const before = individuals[i - 1];
    return before ? [quantity({ ...about, key: movingRangeKey(i + 1), symbol: `R_${i + 1}`, is: greatest(one.minus(before), before.minus(one)) })] : [];
  });
  const centre = quantity({ ...about, key: 'chart.centre', symbol: 'x_mean', is: meanOf(individuals) });
  const meanRange = quantity({ ...about, key: 'chart.meanRange', symbol: 'R_mean', is: meanOf(ranges) });
  const reach = meanRange.times(factor(INDIVIDUALS_FACTOR, 'E_2'));
  return [
    ...individuals, ...ranges, centre, meanRange,
    quantity({ ...about, key: 'chart.deviation', symbol: 's', is: meanRange.per(factor(MEAN_RANGE_OF_TWO, 'd_2')) }),
    quantity({ ...about, key: 'chart.upper', symbol: 'UCL', is: centre.plus(reach) }),
    // a share or an acid value is never below nothing
    quantity({ ...about, key: 'chart.lower', symbol: 'LCL', is: greatest(constant('0', unit), centre.minus(reach)) }),
    quantity({ ...about, key: 'chart.rangeUpper', symbol: 'UCL_R', is: meanRange.times(factor(RANGE_FACTOR, 'D_4')) }),
  ];
}
