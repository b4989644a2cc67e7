import { constant } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { percent } from '../formula/units.js';
import { FATTY_ACID } from './fatty-acids.js';
import type { FattyAcid } from './fatty-acids.js';
import { molarMassOf } from './molar-mass.js';
import { HANDBOOK_PROFILES } from './sources.js';

/** Mass percent of each fatty acid in the acids of a fat. */
export type Profile = Readonly<Partial<Record<FattyAcid, string>>>;

/**
 * Mean fatty acid compositions of the named fats, mass %; handbook means recalled from memory.
 * The C20–24 acids of peanut oil are counted as behenic, the C8–10 acids of coconut as 8 + 6.
 */
export const FAT_PROFILE = {
  rapeseed: { palmitic: '4', stearic: '2', oleic: '62', linoleic: '20', linolenic: '9', gondoic: '2' },
  sunflower: { palmitic: '6', stearic: '5', oleic: '23', linoleic: '64' },
  'high-oleic-sunflower': { palmitic: '4', stearic: '4', oleic: '82', linoleic: '9' },
  soya: { palmitic: '11', stearic: '4', oleic: '24', linoleic: '53', linolenic: '7' },
  maize: { palmitic: '11', stearic: '2', oleic: '28', linoleic: '57', linolenic: '1' },
  cottonseed: { myristic: '1', palmitic: '23', palmitoleic: '1', stearic: '2.5', oleic: '18', linoleic: '53' },
  peanut: { palmitic: '11', stearic: '3', oleic: '47', linoleic: '32', behenic: '6' },
  palm: { myristic: '1', palmitic: '44', stearic: '4.5', oleic: '39', linoleic: '10.5' },
  'palm-olein': { myristic: '1', palmitic: '40', stearic: '4', oleic: '43', linoleic: '11.5' },
  tallow: { myristic: '3', palmitic: '25', palmitoleic: '3', stearic: '20', oleic: '42', linoleic: '3' },
  lard: { myristic: '2', palmitic: '26', palmitoleic: '3', stearic: '14', oleic: '44', linoleic: '10' },
  coconut: { caprylic: '8', capric: '6', lauric: '47', myristic: '18', palmitic: '9', stearic: '3', oleic: '7', linoleic: '2' },
} as const satisfies Record<string, Profile>;

export type Fat = keyof typeof FAT_PROFILE;
export const FATS = Object.keys(FAT_PROFILE) as readonly Fat[];

/** Mean molar mass of a fat's acids: total mass over total amount, so that shares need not add up to 100 %. */
export function meanAcidMolarMass(profile: Profile): Expression {
  const shares = Object.entries(profile) as readonly [FattyAcid, string][];
  const mass = (text: string): Expression => constant(text, percent, { source: HANDBOOK_PROFILES });
  const sum = (terms: readonly Expression[]): Expression => terms.reduce((all, term) => all.plus(term));
  return sum(shares.map(([, text]) => mass(text))).per(
    sum(shares.map(([acid, text]) => mass(text).per(molarMassOf(FATTY_ACID[acid], acid)))),
  );
}
