import type { Composition } from './molar-mass.js';
import { molarMassOf } from './molar-mass.js';

/** Composition of each substance the reactions use or make; fatty acids stand in `fatty-acids.ts`. */
export const COMPOSITION = {
  methanol: { C: 1, H: 4, O: 1 },
  water: { H: 2, O: 1 },
  glycerol: { C: 3, H: 8, O: 3 },
  NaOH: { Na: 1, O: 1, H: 1 },
  KOH: { K: 1, O: 1, H: 1 },
  NaOCH3: { Na: 1, O: 1, C: 1, H: 3 },
  KOCH3: { K: 1, O: 1, C: 1, H: 3 },
  sulfuricAcid: { H: 2, S: 1, O: 4 },
  potassiumHydrogenPhthalate: { K: 1, H: 5, C: 8, O: 4 },
  aceticAcid: { C: 2, H: 4, O: 2 },
  phosphoricAcid: { H: 3, P: 1, O: 4 },
  citricAcid: { C: 6, H: 8, O: 7 },
  hydrochloricAcid: { H: 1, Cl: 1 },
} as const satisfies Record<string, Composition>;

export const M_METHANOL = molarMassOf(COMPOSITION.methanol, 'MeOH');
export const M_WATER = molarMassOf(COMPOSITION.water, 'H2O');
export const M_GLYCEROL = molarMassOf(COMPOSITION.glycerol, 'gly');
export const M_NAOH = molarMassOf(COMPOSITION.NaOH, 'NaOH');
export const M_KOH = molarMassOf(COMPOSITION.KOH, 'KOH');
export const M_NAOCH3 = molarMassOf(COMPOSITION.NaOCH3, 'NaOCH3');
export const M_KOCH3 = molarMassOf(COMPOSITION.KOCH3, 'KOCH3');
export const M_KHP = molarMassOf(COMPOSITION.potassiumHydrogenPhthalate, 'KHP');
export const M_SULFURIC = molarMassOf(COMPOSITION.sulfuricAcid, 'H2SO4');
export const M_ACETIC = molarMassOf(COMPOSITION.aceticAcid, 'HAc');
export const M_PHOSPHORIC = molarMassOf(COMPOSITION.phosphoricAcid, 'H3PO4');
export const M_CITRIC = molarMassOf(COMPOSITION.citricAcid, 'cit');
export const M_HYDROCHLORIC = molarMassOf(COMPOSITION.hydrochloricAcid, 'HCl');

/** What an acid gains when it becomes its methyl ester: CH3 for H. */
export const M_METHYLENE = molarMassOf({ C: 1, H: 2 }, 'CH2');
/** What three fatty acids gain when they become a triglyceride: glycerol less three waters, C3H2. */
export const M_GLYCERYL = molarMassOf({ C: 3, H: 2 }, 'C3H2');
/** What an acid gains when it becomes its sodium or potassium soap: the metal for H. */
export const M_HYDROGEN = molarMassOf({ H: 1 }, 'H');
export const M_SODIUM = molarMassOf({ Na: 1 }, 'Na');
export const M_POTASSIUM = molarMassOf({ K: 1 }, 'K');
