import type { Limit } from '../../formula/quantity.js';
import { Quantity } from '../../formula/quantity.js';
import type { Unit } from '../../formula/unit.js';
import { TYPED_UNITS } from '../../formula/units.js';
import { literal } from './cells.js';

/** Where a figure and the sign of its unit stand. */
export interface FigureCells {
  readonly figure: string;
  readonly unit: string;
}

/** The figure of a cell in `to`, by the sign of the unit beside it; an error where it is no number or the unit does not fit. */
export function inUnit({ figure, unit }: FigureCells, to: Unit): string {
  const fitting = [...TYPED_UNITS.values()].filter((from) => from.sameDimension(to));
  const ownFirst = [...fitting.filter((from) => from.symbol === to.symbol), ...fitting.filter((from) => from.symbol !== to.symbol)];
  const byUnit = ownFirst.reduceRight((rest, from) => `IF(${unit}=${literal(from.symbol)},${converted(figure, from, to)},${rest})`, 'NA()');
  return `IF(ISNUMBER(${figure}),${byUnit},NA())`;
}

/** As `Unit.convert` has it, by whole factors. */
function converted(figure: string, from: Unit, to: Unit): string {
  const ratio = from.ratioTo(to);
  const shift = from.zero.minus(to.zero).per(to.scale);
  if (shift.over === 0n) return `${figure}${ratio.over === 1n ? '' : `*${ratio.over}`}${ratio.under === 1n ? '' : `/${ratio.under}`}`;
  return `(${figure}*${ratio.over * shift.under}+(${shift.over * ratio.under}))/${ratio.under * shift.under}`;
}

const SIGNS: Readonly<Record<Limit['is'], string>> = { above: '>', atLeast: '>=', below: '<', atMost: '<=' };

/** A formula that comes to an error where its value breaks a limit; a bound that is not known refuses nothing. */
export function withinLimits(is: string, limits: readonly Limit[], addressOf: (key: string) => string): string {
  return limits.reduceRight((rest, { is: kind, bound }) => {
    if (!(bound instanceof Quantity)) return `IF(${is}${SIGNS[kind]}${bound.toString()},${rest},NA())`;
    const cell = addressOf(bound.key);
    return `IF(ISNUMBER(${cell}),IF(${is}${SIGNS[kind]}${cell},${rest},NA()),${rest})`;
  }, is);
}
