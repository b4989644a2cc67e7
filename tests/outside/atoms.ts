import { expect } from 'vitest';
import { Decimal } from '../../src/formula/decimal.js';

// Amounts of substances counted in atoms. The fatty chains are atoms of their own: A for the acyl groups of the glycerides,
// B for those of the free acid, because a mean acid has no whole number of carbons.

/** Wide enough that the sums of this file add no rounding of their own. */
const Wide = Decimal.clone({ precision: 60 });
export type Wide = Decimal;
export const wide = (value: Decimal | string | number): Wide => new Wide(value.toString());

/** IUPAC conventional atomic weights, g/mol (found). */
export const WEIGHT: Readonly<Record<string, string>> = { C: '12.011', H: '1.008', O: '15.999', K: '39.0983', Na: '22.98977', S: '32.06' };
export type Atoms = Readonly<Record<string, number>>;

export const SPECIES = {
  triglyceride: { C: 3, H: 5, O: 3, A: 3 }, freeAcid: { B: 1, O: 1, H: 1 }, ester: { A: 1, O: 1, C: 1, H: 3 }, esterOfFreeAcid: { B: 1, O: 1, C: 1, H: 3 },
  glycerol: { C: 3, H: 8, O: 3 }, water: { H: 2, O: 1 }, methanol: { C: 1, H: 4, O: 1 }, sulfuricAcid: { H: 2, S: 1, O: 4 },
} as const;
/** What the catalyst is, and what it becomes. */
export const ALKALI = {
  KOH: { base: { K: 1, O: 1, H: 1 }, metal: 'K', hydroxide: true }, NaOH: { base: { Na: 1, O: 1, H: 1 }, metal: 'Na', hydroxide: true },
  KOCH3: { base: { K: 1, O: 1, C: 1, H: 3 }, metal: 'K', hydroxide: false }, NaOCH3: { base: { Na: 1, O: 1, C: 1, H: 3 }, metal: 'Na', hydroxide: false },
} as const;

/** Amounts of substances, mol, with what has a mass but no composition, g. */
export class Stock {
  readonly #atoms = new Map<string, Wide>();
  inert = wide(0);

  constructor(private readonly weight: (element: string) => Wide) {}

  add(amount: Wide, atoms: Atoms): this {
    for (const [element, count] of Object.entries(atoms)) this.#atoms.set(element, this.of(element).plus(amount.times(count)));
    return this;
  }

  addInert(grams: Wide): this {
    this.inert = this.inert.plus(grams);
    return this;
  }

  of(element: string): Wide {
    return this.#atoms.get(element) ?? wide(0);
  }

  /** g */
  get mass(): Wide {
    return [...this.#atoms].reduce((sum, [element, amount]) => sum.plus(amount.times(this.weight(element))), this.inert);
  }

  expectSame(other: Stock): void {
    expectSame(this.mass, other.mass);
    expectSame(this.inert, other.inert);
    for (const element of [...Object.keys(WEIGHT), 'A', 'B']) expectSame(this.of(element), other.of(element));
  }
}

/** To 25 digits: of 34 that are computed with, a long chain of formulas spoils a few. */
export function expectSame(left: Wide, right: Wide): void {
  const size = Wide.max(left.abs(), right.abs(), '1e-9');
  if (left.minus(right).abs().gt(size.times('1e-25'))) expect(left.toString()).toBe(right.toString());
}
