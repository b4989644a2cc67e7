// Published results of esterifying the acid of an oil with methanol and sulfuric acid, as far as they carry enough
// conditions to be computed: start, methanol, acid, temperature and time. Bases are converted as the collection they were
// taken from does it: oil 875 g/mol and 0.915 g/mL, methanol 0.791 g/mL, sulfuric acid 1.84 g/mL; converted figures are
// good to about 5 %. A range of a condition is taken at its middle.
//
// Left out, because something is missing:
// - Jayasinghe et al. 2014, jatropha, plain and emulsified: no time in the text that was read;
// - Hazrat et al. 2022, waste cooking oil: no start; Hayyan et al. 2010, sludge palm oil: no start, another acid;
// - sludge palm oil of Sarawak, 79.87 %: no temperature, water from 1.3 to 10 %;
// - Wang et al. 2006 and 2007, waste cooking oil: 95 °C, above the boiling point, and one of them with ferric sulfate;
// - Zhang et al. 2012, Zanthoxylum: ferric sulfate, no start, no temperature;
// - Prateepchaikul et al. 2007, mixed crude palm oil: no figure for start or result;
// - Lucena et al. 2008, oleic acid: 100 °C, no time;
// - Jansri et al. 2011, mixed crude palm oil: the time is only "minutes".

export interface PublishedPoint {
  readonly source: string;
  /** `found`: read in an excerpt; `memory`: recalled from the named paper. */
  readonly mark: 'found' | 'memory';
  readonly start: { readonly acidValue: number } | { readonly ffa: number };
  readonly methanol: { readonly perAcid: number } | { readonly perOil: number } | { readonly volume: number } | { readonly mass: number };
  readonly acid: { readonly ofAcid: number } | { readonly ofOil: number } | { readonly volume: number };
  readonly celsius: number;
  readonly minutes: number;
  /** What was left: a figure, or only a limit that it was below. */
  readonly left: { readonly acidValue: number } | { readonly ffaBelow: number } | { readonly acidValueBelow: number };
  /** Mol of methanol a mol of acid and per cent of acid on the FFA, as the collection prints them: a check on the conversions. */
  readonly printed: { readonly perAcid: number; readonly ofAcid: number };
}

export const ONE_PASS: readonly PublishedPoint[] = [
  {
    source: 'Zhang and Jiang 2008, Bioresour. Technol. 99:8995, Zanthoxylum seed oil', mark: 'found', start: { acidValue: 45.51 },
    methanol: { perOil: 24 }, acid: { ofOil: 2 }, celsius: 60, minutes: 80, left: { acidValue: 1.16 }, printed: { perAcid: 34, ofAcid: 8.7 },
  },
  {
    source: 'Li et al. 2012, Energies 5(8):2683, waste cooking oil', mark: 'found', start: { acidValue: 68.81 },
    methanol: { volume: 20 }, acid: { volume: 0.4 }, celsius: 50, minutes: 300, left: { acidValue: 3.76 }, printed: { perAcid: 4.4, ofAcid: 2.3 },
  },
  {
    source: 'Tiwari, Kumar, Raheman 2007, Biomass Bioenergy 31:569, jatropha', mark: 'found', start: { ffa: 14 },
    methanol: { volume: 28 }, acid: { volume: 1.43 }, celsius: 60, minutes: 88, left: { ffaBelow: 1 }, printed: { perAcid: 15, ofAcid: 20 },
  },
  {
    source: 'Hayyan et al. 2011, Fuel Process. Technol. (10.1016/j.fuproc.2010.12.011), sludge palm oil', mark: 'found', start: { ffa: 23.2 },
    methanol: { perOil: 8 }, acid: { ofOil: 0.75 }, celsius: 60, minutes: 60, left: { ffaBelow: 2 }, printed: { perAcid: 11, ofAcid: 3.2 },
  },
  {
    source: 'Alptekin and Canakci 2010, Fuel 89:4035, chicken fat', mark: 'found', start: { ffa: 13.45 },
    methanol: { perAcid: 40 }, acid: { ofAcid: 20 }, celsius: 60, minutes: 80, left: { ffaBelow: 1 }, printed: { perAcid: 40, ofAcid: 20 },
  },
  {
    source: 'Eur. J. Lipid Sci. Technol. (10.1002/ejlt.201200273), jatropha', mark: 'found', start: { ffa: 8 },
    methanol: { perAcid: 60 }, acid: { ofAcid: 5 }, celsius: 60, minutes: 60, left: { acidValueBelow: 1 }, printed: { perAcid: 60, ofAcid: 5 },
  },
  {
    // 40 to 50 °C, 20 to 30 min
    source: 'Ramadhas et al. 2005, Fuel 84:335, rubber seed', mark: 'memory', start: { ffa: 17 },
    methanol: { perOil: 6 }, acid: { volume: 0.5 }, celsius: 45, minutes: 25, left: { ffaBelow: 2 }, printed: { perAcid: 11, ofAcid: 6 },
  },
  {
    source: 'Ghadge and Raheman 2006, Bioresour. Technol. 97:379, mahua', mark: 'memory', start: { ffa: 19 },
    methanol: { volume: 32 }, acid: { volume: 1.24 }, celsius: 60, minutes: 75.6, left: { ffaBelow: 1 }, printed: { perAcid: 13, ofAcid: 13 },
  },
  {
    // 1 to 2 % of acid
    source: 'Veljković et al. 2006, Fuel 85:2671, tobacco seed, 18 : 1', mark: 'memory', start: { acidValue: 35 },
    methanol: { perOil: 18 }, acid: { ofOil: 1.5 }, celsius: 60, minutes: 25, left: { ffaBelow: 2 }, printed: { perAcid: 33, ofAcid: 8.5 },
  },
  {
    source: 'Veljković et al. 2006, Fuel 85:2671, tobacco seed, 13 : 1', mark: 'memory', start: { acidValue: 35 },
    methanol: { perOil: 13 }, acid: { ofOil: 1.5 }, celsius: 60, minutes: 50, left: { ffaBelow: 2 }, printed: { perAcid: 23.8, ofAcid: 8.5 },
  },
  {
    source: 'Berchmans and Hirata 2008, Bioresour. Technol. 99:1716, jatropha', mark: 'memory', start: { ffa: 15 },
    methanol: { mass: 60 }, acid: { ofOil: 1 }, celsius: 50, minutes: 60, left: { ffaBelow: 1 }, printed: { perAcid: 35, ofAcid: 6.7 },
  },
  {
    // 55 to 65 °C, 1 to 2 h, below 0.5 to 1 %: the stricter of the two
    source: 'Chai et al. 2014, Fuel Process. Technol. 125:106, used cooking oil', mark: 'memory', start: { ffa: 5 },
    methanol: { perAcid: 40 }, acid: { ofAcid: 10 }, celsius: 60, minutes: 90, left: { ffaBelow: 0.5 }, printed: { perAcid: 40, ofAcid: 10 },
  },
  {
    // "a few per cent" of FFA, taken as 5
    source: 'Berrios et al. 2007, Fuel 86:2383, sunflower oil with oleic acid', mark: 'memory', start: { ffa: 5 },
    methanol: { perAcid: 60 }, acid: { ofAcid: 5 }, celsius: 60, minutes: 120, left: { acidValueBelow: 1 }, printed: { perAcid: 60, ofAcid: 5 },
  },
  {
    // 65 °C, which is above the boiling point that the model allows: 64.6 °C
    source: 'Sahoo et al. 2007, Fuel 86:448, polanga', mark: 'memory', start: { acidValue: 44 },
    methanol: { perOil: 6 }, acid: { volume: 0.65 }, celsius: 64.6, minutes: 240, left: { acidValueBelow: 4 }, printed: { perAcid: 8.75, ofAcid: 5.9 },
  },
  {
    source: 'Patil and Deng 2009, Fuel 88:1302, jatropha', mark: 'memory', start: { ffa: 14 },
    methanol: { perOil: 6 }, acid: { ofOil: 0.5 }, celsius: 40, minutes: 120, left: { ffaBelow: 1 }, printed: { perAcid: 14, ofAcid: 3.6 },
  },
];

/**
 * RSC Adv. 2023 (d3ra06912e), found: oleic acid alone, methanol 12 : 1, H2SO4 0.7 mol/L, room temperature, 30 min in a
 * homogeniser at 4000 rpm, 96.1 ± 0.4 % turned. "Room" is taken as 25 °C and the 0.7 mol/L as of the whole mixture:
 * 12 · 32.04 / 0.791 + 282.5 / 0.895 = 802 mL, 0.56 mol, 55.0 g, 19.5 % of the acid.
 */
export const HOMOGENISER = { start: { ffa: 100 }, methanol: { perAcid: 12 }, acid: { ofAcid: 19.5 }, celsius: 25, minutes: 30, turned: 0.961 } as const;

/** Acid content at the start, mol/kg. */
export const acidAtStart = ({ start }: Pick<PublishedPoint, 'start'>): number => ('ffa' in start ? start.ffa / 28.2 : start.acidValue / 56.1);

/** Mol of methanol a mol of acid, from the basis that was published. */
export function methanolPerAcid(point: Pick<PublishedPoint, 'start' | 'methanol'>): number {
  const { methanol } = point;
  if ('perAcid' in methanol) return methanol.perAcid;
  if ('perOil' in methanol) return methanol.perOil / 0.875 / acidAtStart(point);
  const grams = 'volume' in methanol ? (methanol.volume * 10 * 0.791) / 0.915 : methanol.mass * 10; // a kilogram of oil
  return grams / 32.042 / acidAtStart(point);
}

/** Sulfuric acid in per cent of the FFA, from the basis that was published. */
export function acidOfAcid(point: Pick<PublishedPoint, 'start' | 'acid'>): number {
  const { acid } = point;
  if ('ofAcid' in acid) return acid.ofAcid;
  const percentOfOil = 'ofOil' in acid ? acid.ofOil : (acid.volume * 1.84) / 0.915;
  return (percentOfOil / (28.2 * acidAtStart(point))) * 100;
}
