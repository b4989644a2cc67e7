import { decimal } from './decimal.js';
import type { Decimal } from './decimal.js';
import { Expression, operand } from './expression.js';
import type { Operand } from './expression.js';
import type { Source } from './source.js';
import type { Unit } from './unit.js';

/** A bound that a value must keep; a value beyond it is refused with `code`. */
export interface Limit {
  readonly is: 'above' | 'atLeast' | 'below' | 'atMost';
  /** A figure in the quantity's unit, or a quantity of the same unit. */
  readonly bound: Decimal | Quantity;
  readonly code: string;
  /** Key of the input at whose field the problem stands; the quantity itself when left out. */
  readonly at: string | undefined;
}

export const limit = (is: Limit['is'], bound: string | Quantity, code: string, at?: string): Limit => ({
  is, bound: typeof bound === 'string' ? decimal(bound) : bound, code, at,
});

/**
 * How a value is shown: a fixed number of decimals, or of significant digits, or a number of
 * decimals that depends on the size of the value, as methods prescribe.
 */
export type Digits =
  | { readonly decimals: number }
  | { readonly significant: number }
  | { readonly bands: readonly { readonly below?: string; readonly decimals: number }[] };

export interface QuantityDefinition {
  /** Unique in its sheet; the name under which readings list it. */
  readonly key: string;
  /** As in the general formula; `_` starts a subscript: `V_0`. */
  readonly symbol: string;
  readonly unit: Unit;
  /** Its formula. A quantity without one is an input. */
  readonly is?: Operand;
  readonly cites?: readonly Source[];
  readonly limits?: readonly Limit[];
  readonly digits?: Digits;
}

/** A named figure with a unit: an input, or a formula over other quantities. Usable in formulas as it is. */
export class Quantity extends Expression {
  readonly key: string;
  readonly symbol: string;
  readonly unit: Unit;
  readonly is: Expression | undefined;
  readonly cites: readonly Source[];
  readonly limits: readonly Limit[];
  readonly digits: Digits;

  constructor(definition: QuantityDefinition) {
    super({ op: 'named', key: definition.key });
    this.key = definition.key;
    this.symbol = definition.symbol;
    this.unit = definition.unit;
    this.is = definition.is === undefined ? undefined : operand(definition.is);
    this.cites = definition.cites ?? [];
    this.limits = definition.limits ?? [];
    this.digits = definition.digits ?? { significant: 4 };
  }
}

export const quantity = (definition: QuantityDefinition): Quantity => new Quantity(definition);

/** An input that takes one of a few named options. */
export class Choice<Option extends string = string> {
  constructor(
    readonly key: string,
    readonly options: readonly Option[],
  ) {}

  /** The formula that stands for each option; every option needs one. */
  of(cases: Readonly<Record<Option, Operand>>): Expression {
    const expressions = Object.fromEntries(
      Object.entries<Operand>(cases).map(([option, value]) => [option, operand(value)]),
    );
    return new Expression({ op: 'choice', by: this.key, cases: expressions });
  }
}

export const choice = <const Option extends string>(key: string, options: readonly Option[]): Choice<Option> =>
  new Choice(key, options);

/** Whether `value` keeps a limit of the given kind. */
export function keeps(is: Limit['is'], value: Decimal, bound: Decimal): boolean {
  const order = value.cmp(bound);
  switch (is) {
    case 'above':
      return order > 0;
    case 'atLeast':
      return order >= 0;
    case 'below':
      return order < 0;
    case 'atMost':
      return order <= 0;
  }
}
