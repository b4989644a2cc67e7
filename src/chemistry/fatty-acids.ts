import type { Composition } from './molar-mass.js';

/** A straight-chain fatty acid with `carbons` carbon atoms and `doubleBonds` double bonds. */
const chain = (carbons: number, doubleBonds = 0): Composition => ({ C: carbons, H: 2 * carbons - 2 * doubleBonds, O: 2 });

/** The fatty acids that fats and oils are made of, by trivial name. */
export const FATTY_ACID = {
  caprylic: chain(8),
  capric: chain(10),
  lauric: chain(12),
  myristic: chain(14),
  palmitic: chain(16),
  palmitoleic: chain(16, 1),
  stearic: chain(18),
  oleic: chain(18, 1),
  linoleic: chain(18, 2),
  linolenic: chain(18, 3),
  gondoic: chain(20, 1),
  behenic: chain(22),
  erucic: chain(22, 1),
} as const satisfies Record<string, Composition>;

export type FattyAcid = keyof typeof FATTY_ACID;
