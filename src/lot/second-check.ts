import { Decimal } from '../formula/decimal.js';
import { Refused, isKnown } from '../formula/reading.js';
import type { Problem } from '../formula/reading.js';
import type { Unit } from '../formula/unit.js';
import { TYPED_UNITS } from '../formula/units.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { readFigure } from './figure.js';
import type { Figure } from './figure.js';
import { fieldOf } from './keys.js';
import { CheckedFigure } from './slips.js';
import type { Slip, SlipCode } from './slips.js';
import { acidStepSlips, catalystSlips, densitySlips, methanolSlips, mixedUpSlips } from './slips/charge.js';
import { oilSlips } from './slips/oil.js';
import { benchSlips, titrationSlips } from './slips/titration.js';
import { writingSlips } from './slips/writing.js';

/** A slip as it is named. */
export interface NamedSlip {
  readonly code: SlipCode;
  readonly params: Readonly<Record<string, string>>;
}

/** A slip that comes to the figure typed, or two made together. */
export interface FoundSlip extends NamedSlip {
  /** What the quantity comes to with it, in its unit, decimal text. */
  readonly value: string;
  readonly and?: NamedSlip;
}

/** What the tool says to a figure worked out by hand. Figures are decimal text, in the unit of the quantity. */
export type Check =
  /** Within half a unit of the last digit typed; zeros at the end of a whole number may stand for rounding to three digits. */
  | { readonly verdict: 'agrees'; readonly value: string; readonly difference: string }
  /** Not that, but within a thousandth: constants were rounded on the way. */
  | { readonly verdict: 'close'; readonly value: string; readonly difference: string }
  | {
      readonly verdict: 'differs';
      readonly value: string;
      /** The figure typed less the right one. */
      readonly difference: string;
      /** That reproduce the figure to the digits typed: single ones, or, where none does, pairs. */
      readonly slips: readonly FoundSlip[];
      /** Fewer than three digits were typed: no slip is looked for. */
      readonly tooFewDigits: boolean;
    }
  /** The figure itself is not known yet: what is missing, or what was refused. */
  | { readonly verdict: 'not-known'; readonly missing?: readonly string[]; readonly problem?: Problem }
  /** The figure typed cannot be used. */
  | { readonly verdict: 'problem'; readonly problem: Problem };

/** Digits from which a slip is named, and from which two slips together are. */
const DIGITS_FOR_A_SLIP = 3;
const DIGITS_FOR_A_PAIR = 4;
/** Up to which share of it a figure passes for rounded on the way. */
const CLOSE = new Decimal('0.001');

/**
 * Checks a figure that a second person has worked out by hand: whether it agrees with the tool's
 * own, and if not, which known slips, made on the same formulas, come to it. A figure that agrees
 * or nearly does is never called a slip.
 *
 * @param key of any quantity of the lot
 * @param typed in a unit of the quantity's dimension
 * @throws SheetFault for a key that no quantity has
 */
export function secondCheck(entry: LotEntry, site: SiteProfile, key: string, typed: Figure): Check {
  const figure = new CheckedFigure(entry, site, key);
  const { unit } = figure.run.sheet.quantity(key);
  const own = readFigure(typed, unit, key) as Decimal | Refused; // a figure that is typed is not missing
  if (own instanceof Refused) return { verdict: 'problem', problem: own.problem };
  const right = figure.outcome;
  if (!isKnown(right)) {
    return right instanceof Refused
      ? { verdict: 'not-known', problem: { ...right.problem, quantity: fieldOf(right.problem.quantity) } }
      : { verdict: 'not-known', missing: [...new Set(right.missing.map(fieldOf))] };
  }
  const { digits, decimals } = digitsTyped('text' in typed ? typed.text : '');
  const half = halfOfLastDigit(decimals, typed.unit, unit);
  const matches = (value: Decimal): boolean => value.minus(own).abs().lte(half.plus(value.abs().times(NOISE)));
  const said = { value: right.toFixed(), difference: own.minus(right).toFixed() };
  if (matches(right)) return { verdict: 'agrees', ...said };
  if (own.minus(right).abs().lte(right.abs().times(CLOSE))) return { verdict: 'close', ...said };

  const reproduces = (value: Decimal): boolean => value.isFinite() && matches(value) && value.minus(right).abs().gt(half);
  const slips = digits < DIGITS_FOR_A_SLIP ? [] : found(figure, right, digits >= DIGITS_FOR_A_PAIR, reproduces);
  return { verdict: 'differs', ...said, slips, tooFewDigits: digits < DIGITS_FOR_A_SLIP };
}

/** In the last of 34 digits two ways to the same figure may part. */
const NOISE = new Decimal('1e-28');

/**
 * How many digits of a figure say something, and how many of them are decimals (fewer than none: so
 * many zeros at the end only hold the place). Zeros at the end of a whole number may have come from
 * rounding: 12300 g is taken for three digits, never for fewer.
 */
function digitsTyped(text: string): { readonly digits: number; readonly decimals: number } {
  const [whole = '', fraction] = text.replace('-', '').split('.');
  const all = (whole + (fraction ?? '')).replace(/^0+/, '').length;
  if (fraction !== undefined) return { digits: all, decimals: fraction.length };
  const zeros = Math.max(0, Math.min(whole.length - whole.replace(/0+$/, '').length, all - DIGITS_FOR_A_SLIP));
  return { digits: all - zeros, decimals: 0 - zeros };
}

/** Half a unit of the last digit of a figure, in the unit of the quantity. */
function halfOfLastDigit(decimals: number, typedUnit: string, unit: Unit): Decimal {
  const half = new Decimal(10).pow(-decimals).div(2);
  const given = typedUnit === unit.symbol ? unit : TYPED_UNITS.get(typedUnit);
  return given ? given.ratioTo(unit).scale(half) : half;
}

/** Every slip that there is for a figure. */
const catalogue = (figure: CheckedFigure): readonly Slip[] =>
  [titrationSlips, benchSlips, oilSlips, catalystSlips, methanolSlips, acidStepSlips, densitySlips, mixedUpSlips, writingSlips].flatMap((slips) => slips(figure));

function found(figure: CheckedFigure, right: Decimal, pairs: boolean, reproduces: (value: Decimal) => boolean): readonly FoundSlip[] {
  const single = catalogue(figure).map((slip) => ({ slip, value: figure.with([slip]) }));
  const alone = single.filter(({ value }) => reproduces(value)).map(({ slip, value }): FoundSlip => ({ ...named(slip), value: value.toFixed() }));
  // two slips explain more figures than were ever written down: they are looked at only where no single one will do
  if (alone.length || !pairs) return alone;
  const telling = single.filter(({ slip, value }) => slip.topic !== 'result' && value.isFinite() && value.minus(right).abs().gt(right.abs().times(CLOSE))).map(({ slip }) => slip);
  return telling.flatMap((first, i) =>
    telling.slice(i + 1).flatMap((second): FoundSlip[] => {
      if (first.topic === second.topic) return [];
      const value = figure.with([first, second]);
      return reproduces(value) ? [{ ...named(first), value: value.toFixed(), and: named(second) }] : [];
    }),
  );
}

const named = ({ code, params = {} }: Slip): NamedSlip => ({ code, params });
