import { constant } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import type { Quantity } from '../formula/quantity.js';
import { gramPerLitre, gramPerMillilitre, gramPerMole, one, percent } from '../formula/units.js';
import { ATOMIC_WEIGHTS, METHANOL_SOLUBILITY, PRACTICE, STOICHIOMETRY } from './sources.js';
import { M_HYDROGEN, M_KOCH3, M_KOH, M_NAOCH3, M_NAOH, M_POTASSIUM, M_SODIUM } from './substances.js';

// The catalyst as it is bought: which alkali, how pure, what the rest is.

const PRODUCTS = ['KOH', 'NaOH', 'KOCH3', 'NaOCH3', 'KOCH3-solution', 'NaOCH3-solution'] as const;
/** A catalyst product: a solid, or a solution in methanol. */
export type CatalystProduct = (typeof PRODUCTS)[number];
export const CATALYST_PRODUCTS: readonly CatalystProduct[] = PRODUCTS;

export const catalyst = choice('catalyst', PRODUCTS);

/** A site value that each product has for itself, e.g. `KOH.assay`. */
export const perProduct = <Product extends CatalystProduct>(products: readonly Product[], make: (product: Product) => Quantity): Readonly<Record<Product, Quantity>> =>
  Object.fromEntries(products.map((product) => [product, make(product)])) as Record<Product, Quantity>;

const percentLimits = [limit('above', '0', 'not-above-zero'), limit('atMost', '100', 'above-100-percent')];

export const productAssay = perProduct(PRODUCTS, (product) =>
  quantity({ key: `${product}.assay`, symbol: 'w', unit: percent, digits: { decimals: 1 }, limits: percentLimits }));

/** Pure catalyst as a share of the oil's mass that drives the reaction; spent acid comes on top. */
export const productBaseLoad = perProduct(PRODUCTS, (product) =>
  quantity({
    key: `${product}.baseLoad`, symbol: 'x', unit: percent, digits: { decimals: 2 },
    limits: [limit('atLeast', '0', 'negative'), limit('atMost', '10', 'out-of-range')],
  }));

export const solutionDensity = perProduct(['KOCH3-solution', 'NaOCH3-solution'] as const, (product) =>
  quantity({
    key: `${product}.density`, symbol: 'ρ_cat', unit: gramPerMillilitre, digits: { decimals: 3 },
    limits: [limit('atLeast', '0.7', 'out-of-range'), limit('atMost', '1.5', 'out-of-range')],
  }));

/** How much of it a litre of methanol dissolves. */
export const productSolubility = perProduct(['KOH', 'NaOH', 'KOCH3', 'NaOCH3'] as const, (product) =>
  quantity({
    key: `${product}.solubility`, symbol: 'γ_sat', unit: gramPerLitre, digits: { significant: 2 },
    limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '1000', 'out-of-range')],
  }));

const byAlkali = (parts: { KOH: Expression; NaOH: Expression; KOCH3: Expression; NaOCH3: Expression }): Expression =>
  catalyst.of({ ...parts, 'KOCH3-solution': parts.KOCH3, 'NaOCH3-solution': parts.NaOCH3 });

export const catalystMolarMass = quantity({
  key: 'catalystMolarMass', symbol: 'M_cat', unit: gramPerMole, cites: [ATOMIC_WEIGHTS], digits: { decimals: 3 },
  is: byAlkali({ KOH: M_KOH, NaOH: M_NAOH, KOCH3: M_KOCH3, NaOCH3: M_NAOCH3 }),
});

export const catalystAssay = quantity({
  key: 'catalystAssay', symbol: 'w', unit: percent, cites: [PRACTICE], digits: { decimals: 1 },
  is: catalyst.of(productAssay),
});

export const catalystBaseLoad = quantity({
  key: 'catalystBaseLoad', symbol: 'x', unit: percent, cites: [PRACTICE], digits: { decimals: 2 },
  is: catalyst.of(productBaseLoad),
});

export const catalystSolubility = quantity({
  key: 'catalystSolubility', symbol: 'γ_sat', unit: gramPerLitre, cites: [METHANOL_SOLUBILITY], digits: { significant: 2 },
  is: byAlkali(productSolubility),
});

const share = (percentText: string): Expression => constant(percentText, percent);

/** Share of a product's remainder that is methanol: all of it in a solution, none in a solid. */
export const methanolInRest = quantity({
  key: 'methanolInRest', symbol: 'w_MeOH', unit: percent, cites: [PRACTICE],
  is: catalyst.of({
    KOH: share('0'), NaOH: share('0'), KOCH3: share('0'), NaOCH3: share('0'),
    'KOCH3-solution': share('100'), 'NaOCH3-solution': share('100'),
  }),
});

/** Share of a product's remainder that is counted as water: all of it in a solid hydroxide (in truth some is carbonate). */
export const waterInRest = quantity({
  key: 'waterInRest', symbol: 'w_H2O', unit: percent, cites: [PRACTICE],
  is: byAlkali({ KOH: share('100'), NaOH: share('100'), KOCH3: share('0'), NaOCH3: share('0') }),
});

/** Water made by each mole of catalyst that meets an acid, or that turns into methoxide: one for a hydroxide, none for a methoxide. */
export const waterPerCatalyst = quantity({
  key: 'waterPerCatalyst', symbol: 'ν_H2O', unit: one, cites: [STOICHIOMETRY], digits: { decimals: 0 },
  is: byAlkali({ KOH: constant('1'), NaOH: constant('1'), KOCH3: constant('0'), NaOCH3: constant('0') }),
});

/** What an acid gains when this catalyst turns it into soap: the metal for a hydrogen. */
export const soapGain = quantity({
  key: 'soapGain', symbol: 'ΔM_soap', unit: gramPerMole, cites: [ATOMIC_WEIGHTS], digits: { decimals: 3 },
  is: byAlkali({
    KOH: M_POTASSIUM.minus(M_HYDROGEN), NaOH: M_SODIUM.minus(M_HYDROGEN),
    KOCH3: M_POTASSIUM.minus(M_HYDROGEN), NaOCH3: M_SODIUM.minus(M_HYDROGEN),
  }),
});
