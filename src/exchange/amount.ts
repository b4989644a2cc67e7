import { Decimal } from '../formula/decimal.js';
import { shownText } from '../formula/digits.js';
import type { Unit } from '../formula/unit.js';
import { degreeCelsius, degreeFahrenheit, gallonUS, gram, kilogram, litre, millilitre, pound } from '../formula/units.js';

/** Units in which amounts are shown; what is typed always keeps its own. */
export type UnitSystem = 'metric' | 'us';

/** A figure as text and its unit, fit for a scale or a meter. */
export interface Amount {
  readonly text: string;
  readonly unit: string;
}

/** Enough for any scale; whole digits are never rounded away. */
const DIGITS = { significant: 4 } as const;

/** Units to show a quantity in, largest first; the last one takes all that is left. */
const LADDER: Readonly<Record<UnitSystem, ReadonlyMap<string, readonly Unit[]>>> = {
  metric: new Map([[kilogram.symbol, [kilogram, gram]], [litre.symbol, [litre, millilitre]]]),
  us: new Map([[kilogram.symbol, [pound, gram]], [litre.symbol, [gallonUS, millilitre]], [degreeCelsius.symbol, [degreeFahrenheit]]]),
};
/** Below this the next smaller unit is easier to read off. */
const LEAST: Readonly<Record<UnitSystem, number>> = { metric: 1, us: 0.1 };
const BY_SYMBOL: ReadonlyMap<string, Unit> = new Map([kilogram, litre, degreeCelsius].map((unit) => [unit.symbol, unit]));

/**
 * An amount in the unit a person would read off: grams below a kilogram, pounds and gallons in US
 * units. Any other unit stays as it is, with the digits it was reported with.
 *
 * @param value decimal text, in `unit`
 * @param shown the reported text, in `unit`
 */
export function amountIn(value: string, shown: string, unit: string, system: UnitSystem): Amount {
  const ladder = LADDER[system].get(unit);
  const from = BY_SYMBOL.get(unit);
  if (!ladder || !from) return { text: shown, unit };
  const figure = new Decimal(value);
  const fitting = ladder.map((to) => ({ to, converted: from.convert(figure, to) }));
  const chosen = fitting.find(({ converted }) => converted.abs().gte(LEAST[system])) ?? fitting.at(figure.isZero() ? 0 : -1);
  if (!chosen) return { text: shown, unit };
  const digits = chosen.to === degreeFahrenheit ? { decimals: 0 } : DIGITS;
  const text = shownText(chosen.converted, digits);
  // 900 kg were charged, not 900.0
  return { text: chosen.converted.eq(text) ? chosen.converted.toString() : text, unit: chosen.to.symbol };
}
