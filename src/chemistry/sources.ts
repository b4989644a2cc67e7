import { source } from '../formula/source.js';

// The documents that the formulas and figures of this folder come from.

export const ATOMIC_WEIGHTS = source('IUPAC conventional atomic weights', 'found');
export const ISO_660 = source('ISO 660, Animal and vegetable fats and oils: acid value and acidity', 'memory');
export const ISO_660_REFERENCE_ACIDS = source('ISO 660, table of reference acids: oleic 282, palmitic 256, lauric 200, erucic 338', 'memory');
export const ISO_660_DIGITS = source('ISO 660, expression of results', 'memory');
export const EN_14104 = source('EN 14104, Fatty acid methyl esters: acid value', 'found');
export const EN_14104_TEMPERATURE = source('EN 14104, note on ethanolic titrant: 0.0011 per °C', 'found');
export const WATER_EXPANSION = source('Volume expansion of water, 2.1e-4 per °C (Eurachem/CITAC QUAM, example A2)', 'memory');
export const AOCS_CA_5A = source('AOCS Ca 5a-40, Free fatty acids', 'found');
export const AOCS_CD_3D = source('AOCS Cd 3d-63, Acid value: the blank is subtracted', 'memory');
export const SAPONIFICATION = source('Definition of the saponification value: mg KOH per g of fat, three ester bonds a glyceride', 'derived');
export const GLYCERIDE_MASS = source('Mass of a triglyceride: three fatty acids and glycerol less three waters', 'derived');
export const HANDBOOK_PROFILES = source('Handbook mean fatty acid compositions of fats and oils', 'memory');
export const OIL_EXPANSION = source('JAOCS 76 (1999) 1415, after Noureddini et al. 1992: −0.00064 g/cm³ per °C', 'found');
export const LUND = source('Lund’s equation, sg 15/15 = 0.8475 + 0.00030 SV + 0.00014 IV (JAOCS 76 (1999) 1415)', 'found');
export const WATER_DENSITY = source('Density of water at 15 °C, 999.1 kg/m³', 'memory');
export const METHANOL_DENSITY = source('Density of methanol, 0.7913 g/mL at 20 °C, −0.00094 g/(mL·°C)', 'memory');
export const STOICHIOMETRY = source('Stoichiometry of the reaction', 'derived');
export const METHANOL_RATIO = source('Freedman, Pryde, Mounts 1984, JAOCS 61:1638: 6 mol of methanol a mol of oil', 'found');
export const NREL_PRETREATMENT = source('Van Gerpen et al. 2004, NREL/SR-510-36244, and Chai et al. 2014, Fuel Process. Technol. 125:106', 'memory');
export const ESTERIFICATION_EQUILIBRIUM = source('Equilibrium of esterification; Jansri et al. 2011, Fuel Process. Technol. 92:1543', 'memory');
export const ESTERIFICATION_RATE = source('Berrios et al. 2007, Fuel 86:2383: first order in the acid', 'memory');
export const WATER_INHIBITION = source('Liu, Lotero, Goodwin 2006, J. Mol. Catal. A 245:132: rate falls with water to the power 0.83', 'found');
export const GAS_CONSTANT = source('SI: molar gas constant', 'definition');
export const QUAM = source('Eurachem/CITAC Guide, Quantifying Uncertainty in Analytical Measurement (QUAM), example A2', 'found');
export const GUM_SHAPES = source('JCGM 100 (GUM), 4.3: standard uncertainty of a rectangular or triangular distribution', 'memory');
export const ISO_385 = source('ISO 385:2005, Burettes: maximum permissible errors', 'memory');
export const ISO_5725_6 = source('ISO 5725-6:1994, 4 and 5: critical range of test results', 'memory');
export const MEAN_RANGE = source('ISO 7870-2: factors d2 of the mean range of samples from a normal distribution', 'memory');
export const D664_USED = source('ASTM D664, repeatability of used oils, buffer end point: 0.117 · X', 'found');
export const D664_FRESH = source('ASTM D664, repeatability of fresh oils: 0.044 · (X + 1)', 'found');
export const MEDIAN_SPREAD = source('Standard error of the median of normal results, √(π/2) times that of the mean', 'derived');
export const METHANOL_SOLUBILITY = source('Handbook solubilities in methanol near 25 °C: KOH 55, NaOH 24 g/100 mL, methoxides about a third by mass', 'memory');
export const PRACTICE = source('Common practice, no source', 'practice');
