import type { Expression, Operand } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import type { Quantity } from '../formula/quantity.js';
import { gramPerLitre, gramPerMillilitre, gramPerMole, one, percent } from '../formula/units.js';
import { sulfuricAssay, sulfuricDensity } from './pretreatment.js';
import { ATOMIC_WEIGHTS, DISSOCIATION, STOICHIOMETRY } from './sources.js';
import { M_ACETIC, M_CITRIC, M_HYDROCHLORIC, M_PHOSPHORIC, M_SULFURIC } from './substances.js';

// The acid that neutralises what is left of the catalyst: which one, how strong it is bought, how much alkali it takes.

/** The acid, and for phosphoric acid the salt that it is taken to. Sulfuric acid is that of the acid step. */
export const neutralisingAcid = choice('neutralisingAcid', [
  'acetic', 'acetic-80', 'vinegar', 'phosphoric-dihydrogen', 'phosphoric-monohydrogen', 'citric', 'sulfuric', 'hydrochloric',
]);

const ASSAYED = ['acetic', 'acetic-80', 'phosphoric', 'citric', 'hydrochloric'] as const;
const LIQUID = ['acetic', 'acetic-80', 'vinegar', 'phosphoric', 'hydrochloric'] as const;
/** Acids as bought, but for sulfuric acid, which is that of the acid step. */
export const ACID_PRODUCTS = ['acetic', 'acetic-80', 'vinegar', 'phosphoric', 'citric', 'hydrochloric'] as const;
type Product = (typeof ACID_PRODUCTS)[number];

/** The product that is bought for an option of `neutralisingAcid`, whatever salt it is taken to. */
export const acidProduct = (option: string): string => option.replace(/-(di|mono)hydrogen$/, '');

/** A site value that each product has for itself, e.g. `phosphoric.assay`. */
export const perAcid = <const Name extends Product>(products: readonly Name[], make: (product: Name) => Quantity): Readonly<Record<Name, Quantity>> =>
  Object.fromEntries(products.map((product) => [product, make(product)])) as Record<Name, Quantity>;

/** One formula for each acid, whatever salt it is taken to. */
export const byAcid = ({ phosphoric, ...others }: Readonly<Record<Product | 'sulfuric', Operand>>): Expression =>
  neutralisingAcid.of({ ...others, 'phosphoric-dihydrogen': phosphoric, 'phosphoric-monohydrogen': phosphoric });

/** Pure acid in the product; citric acid counts as free of water of crystallisation, of which the monohydrate holds 91.4 %. */
export const acidAssay = perAcid(ASSAYED, (product) =>
  quantity({
    key: `${product}.assay`, symbol: 'w_a', unit: percent, digits: { decimals: 1 },
    limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '100', 'above-100-percent')],
  }));
/** Acetic acid in a litre of vinegar. */
export const vinegarStrength = quantity({
  key: 'vinegar.strength', symbol: 'γ_a', unit: gramPerLitre,
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '500', 'out-of-range')],
});
export const acidDensity = perAcid(LIQUID, (product) =>
  quantity({
    key: `${product}.density`, symbol: 'ρ_a', unit: gramPerMillilitre, digits: { decimals: 3 },
    limits: [limit('atLeast', '0.9', 'out-of-range'), limit('atMost', '2', 'out-of-range')],
  }));

export const neutralisingMolarMass = quantity({
  key: 'neutralisingMolarMass', symbol: 'M_a', unit: gramPerMole, cites: [ATOMIC_WEIGHTS], digits: { decimals: 3 },
  is: byAcid({
    acetic: M_ACETIC, 'acetic-80': M_ACETIC, vinegar: M_ACETIC, phosphoric: M_PHOSPHORIC, citric: M_CITRIC, sulfuric: M_SULFURIC, hydrochloric: M_HYDROCHLORIC,
  }),
});

export const neutralisingAssay = quantity({
  key: 'neutralisingAssay', symbol: 'w_a', unit: percent, digits: { decimals: 1 },
  is: byAcid({ ...acidAssay, vinegar: vinegarStrength.per(acidDensity.vinegar).in(percent), sulfuric: sulfuricAssay }),
});

/** Moles of alkali that a mole of the acid takes up on the way to its salt. */
export const neutralisingEquivalents = quantity({
  key: 'neutralisingEquivalents', symbol: 'ν_a', unit: one, cites: [STOICHIOMETRY], digits: { decimals: 0 },
  is: neutralisingAcid.of({
    acetic: '1', 'acetic-80': '1', vinegar: '1', 'phosphoric-dihydrogen': '1', 'phosphoric-monohydrogen': '2', citric: '3', sulfuric: '2', hydrochloric: '1',
  }),
});

/**
 * Moles of alkali and soap that a mole of the acid takes up where it is sour enough to split soap: there phosphoric and
 * citric acid give off no more than their first proton. Acetic acid is hardly stronger than the fatty acid and splits
 * soap in part only.
 */
export const splittingEquivalents = quantity({
  key: 'splittingEquivalents', symbol: 'ν_s', unit: one, cites: [DISSOCIATION], digits: { decimals: 0 },
  is: byAcid({ acetic: '1', 'acetic-80': '1', vinegar: '1', phosphoric: '1', citric: '1', sulfuric: '2', hydrochloric: '1' }),
});

/** Volume of a mass of the acid as bought, L; nothing for a solid. */
export const acidVolumeOf = (volume: (density: Expression) => Expression, solid: Expression): Expression => byAcid({
  ...(Object.fromEntries(LIQUID.map((product) => [product, volume(acidDensity[product])])) as Record<(typeof LIQUID)[number], Expression>),
  citric: solid, sulfuric: volume(sulfuricDensity),
});
