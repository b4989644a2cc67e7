import { Decimal } from '../../formula/decimal.js';
import { gallonUS, kilogram, litre, pound } from '../../formula/units.js';
import type { CheckedFigure, Slip, SlipCode } from '../slips.js';

/** Slips with the figure as it is written down: decimal point, per cent, units. */
export function writingSlips({ run, site, entry, key }: CheckedFigure): readonly Slip[] {
  const unit = run.sheet.quantity(key).unit.symbol;
  const oil = (entry.figures['oilAmount'] ?? site.figures['oilAmount'])?.unit;
  const off = (code: SlipCode, by: Decimal): Slip[] => [by, new Decimal(1).div(by)].map((factor) => ({ code, topic: 'result', factor }));
  const one = new Decimal(1);
  return [
    ...off('tenfold', new Decimal(10)),
    ...off('per-cent-as-fraction', new Decimal(100)),
    ...off('thousandfold', new Decimal(1000)),
    // also where the oil itself was measured in the other unit
    ...(unit === kilogram.symbol || oil === pound.symbol ? off('pounds-and-kilograms', kilogram.convert(one, pound)) : []),
    ...(unit === litre.symbol || oil === gallonUS.symbol ? off('gallons-and-litres', gallonUS.convert(one, litre)) : []),
  ];
}
