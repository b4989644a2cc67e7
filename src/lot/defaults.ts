import { source } from '../formula/source.js';
import type { Source } from '../formula/source.js';
import {
  ESTERIFICATION_EQUILIBRIUM, ESTERIFICATION_RATE, HEAT_IN_WATER, METHANOL_RATIO, METHANOL_SOLUBILITY, NREL_PRETREATMENT, PRACTICE, PRODUCT_ACID, QUAM, WATER_INHIBITION,
} from '../chemistry/sources.js';
import type { Figure } from './figure.js';

/** A figure that stands where neither the lot nor the site has one, with where it comes from. */
export type DefaultFigure = Extract<Figure, { text: string }> & { readonly source: Source };

const given = (text: string, unit: string, from: Source = PRACTICE): DefaultFigure => ({ text, unit, source: from });

const TRADE_LISTING = source('Trade listing of used cooking oil: saponification value 185–200', 'found');
const USED_OIL_DENSITY = source('Used cooking oil, 0.91–0.93 g/mL at 15–20 °C', 'memory');
const DIRECT_LIMITS = source('Kombe et al. 2013, Adv. Chem. Eng. Sci. 3:242: below 3 %; published limits run from 0.5 to 5 %', 'found');
const TARGET = source('Canakci and Van Gerpen 2001, Trans. ASAE 44:1429: below 1 % before the base step', 'found');
const ASSAYS = source('Commercial grades: KOH 85–90 %, NaOH 97–99 %, methoxides from 97 %', 'memory');
const SOLUTIONS = source('Commercial methoxide solutions: NaOCH3 30 %, 0.97 g/mL; KOCH3 32 %, about 0.99 g/mL', 'memory');
const SULFURIC = source('Sulfuric acid 96 %, 1.8355 g/mL at 20 °C', 'memory');
const QUAM_BALANCE = source('QUAM, example A2: ±0.15 mg for a balance that reads 0.1 mg, taken a little wider', 'derived');
const ACIDS = source('Handbook densities at 20 °C: acetic acid 1.049, of 80 % 1.070; phosphoric acid 85 % 1.685; hydrochloric acid 37 % 1.184 g/mL; usual grades', 'memory');
const ESTER_DENSITY = source('EN 14214: 0.860–0.900 g/mL at 15 °C; typical 0.88', 'found');
const GLYCEROL_DENSITY = source('Density of glycerol, 1.2613 g/mL at 20 °C', 'memory');
const DENSITY_OF_WATER = source('Density of water, 0.998 g/mL at 20 °C', 'memory');
const METHANOL_HEAT_CAPACITY = source('Heat capacity of methanol, 2.53 kJ/(kg·K) at 25 °C', 'memory');
const OIL_HEAT_CAPACITY = source('Heat capacity of vegetable oils, about 2.0 kJ/(kg·K)', 'memory');
const BAND = source('Ends of a band that holds the published points that carry enough conditions', 'derived');

/** Every default figure of a site; each can be set in the site profile, and most in a lot. */
export const DEFAULT_FIGURES: Readonly<Record<string, DefaultFigure>> = {
  sampleDensity: given('0.917', 'g/mL', USED_OIL_DENSITY),
  standardisationTemperature: given('20', '°C'),

  khpPurity: given('100', '%', QUAM),
  khpBlank: given('0', 'mL'),
  titrantWeighedAssay: given('85', '%', ASSAYS),
  titrantAgeLimit: given('30', 'd'),
  balanceLinearity: given('0.002', 'g'),
  standardBalanceLinearity: given('0.0002', 'g', QUAM_BALANCE),
  dropVolume: given('0.05', 'mL'),
  sampleVolumeTolerance: given('0.1', 'mL'),
  sampleDensityTolerance: given('0.005', 'g/mL', USED_OIL_DENSITY),
  thermometerTolerance: given('0.5', 'K'),
  temperatureSpread: given('3', 'K', QUAM),
  titrantLabelTolerance: given('0.5', '%'),
  titrantWeighingTolerance: given('3', '%'),
  khpPurityTolerance: given('0.05', '%', QUAM),
  standardisationRepeatability: given('0.2', '%'),
  repeatabilityTyped: given('0.3', 'mg/g'),
  repeatabilityShare: given('5', '%'),
  certificateTolerance: given('5', '%'),
  oilAmountTolerance: given('0.5', '%'),
  catalystAssayTolerance: given('1', '%'),
  sulfuricAssayTolerance: given('0.5', '%'),
  saponificationTolerance: given('5', 'mg/g', TRADE_LISTING),

  oilTemperature: given('20', '°C'),
  typicalOilDensity: given('920', 'kg/m³', USED_OIL_DENSITY),
  saponificationValue: given('190', 'mg/g', TRADE_LISTING),
  waterContent: given('0.10', '%'),
  insolubles: given('0.05', '%'),

  directLimit: given('3.0', '%', DIRECT_LIMITS),
  pretreatmentLimit: given('40', '%'),
  pretreatmentTarget: given('1.0', '%', TARGET),
  waterLimitBase: given('0.10', '%'),
  waterLimitAcid: given('0.50', '%'),
  batchWaterLimit: given('1.0', '%'),
  soapLimit: given('4.0', '%'),
  cleanOilFfa: given('0.5', '%'),

  'KOH.assay': given('90', '%', ASSAYS),
  'NaOH.assay': given('98', '%', ASSAYS),
  'KOCH3.assay': given('97', '%', ASSAYS),
  'NaOCH3.assay': given('98', '%', ASSAYS),
  'KOCH3-solution.assay': given('32', '%', SOLUTIONS),
  'NaOCH3-solution.assay': given('30', '%', SOLUTIONS),
  'KOH.baseLoad': given('1.0', '%'),
  'NaOH.baseLoad': given('0.6', '%'),
  'KOCH3.baseLoad': given('0.65', '%'),
  'NaOCH3.baseLoad': given('0.5', '%'),
  'KOCH3-solution.baseLoad': given('0.65', '%'),
  'NaOCH3-solution.baseLoad': given('0.5', '%'),
  'KOCH3-solution.density': given('0.99', 'g/mL', SOLUTIONS),
  'NaOCH3-solution.density': given('0.97', 'g/mL', SOLUTIONS),

  'KOH.solubility': given('550', 'g/L', METHANOL_SOLUBILITY),
  'NaOH.solubility': given('240', 'g/L', METHANOL_SOLUBILITY),
  'KOCH3.solubility': given('300', 'g/L', METHANOL_SOLUBILITY),
  'NaOCH3.solubility': given('300', 'g/L', METHANOL_SOLUBILITY),
  vesselFill: given('80', '%'),

  methanolAssay: given('99.9', '%'),
  methanolTemperature: given('20', '°C'),
  methanolRatio: given('6', 'mol/mol', METHANOL_RATIO),
  conversion: given('98', '%'),
  entrainedEster: given('1.0', 'kg/kg'),

  pretreatmentMethanolPerAcid: given('20', 'mol/mol', NREL_PRETREATMENT),
  pretreatmentMethanolPerOil: given('6', 'mol/mol'),
  pretreatmentMethanolShare: given('20', '%'),
  pretreatmentAcidOfAcid: given('5', '%', NREL_PRETREATMENT),
  pretreatmentAcidOfOil: given('1', '%'),
  pretreatmentAcidShare: given('1', '%'),
  pretreatmentTemperature: given('60', '°C'),
  pretreatmentTime: given('60', 'min'),
  sulfuricAssay: given('96', '%', SULFURIC),
  sulfuricDensity: given('1.8355', 'g/mL', SULFURIC),
  carryOver: given('10', '%'),

  reactionTemperature: given('60', '°C'),
  reactionTime: given('60', 'min'),
  settlingTime: given('24', 'h'),
  'acetic.assay': given('99.8', '%', ACIDS),
  'acetic-80.assay': given('80', '%', ACIDS),
  'phosphoric.assay': given('85', '%', ACIDS),
  'citric.assay': given('99.5', '%', ACIDS),
  'hydrochloric.assay': given('37', '%', ACIDS),
  'vinegar.strength': given('50', 'g/L'),
  'acetic.density': given('1.049', 'g/mL', ACIDS),
  'acetic-80.density': given('1.070', 'g/mL', ACIDS),
  'vinegar.density': given('1.01', 'g/mL'),
  'phosphoric.density': given('1.685', 'g/mL', ACIDS),
  'hydrochloric.density': given('1.184', 'g/mL', ACIDS),
  methanolInLower: given('60', '%'),
  esterDensity: given('0.88', 'g/mL', ESTER_DENSITY),
  glycerolDensity: given('1.2613', 'g/mL', GLYCEROL_DENSITY),
  waterDensity: given('0.998', 'g/mL', DENSITY_OF_WATER),
  saltDensity: given('2.0', 'g/mL'),
  productAcidLimit: given('0.50', 'mg/g', PRODUCT_ACID),
  productBlank: given('0', 'mL'),
  phenolphthaleinBlank: given('0', 'mL'),
  bromophenolBlank: given('0', 'mL'),

  'KOH.heatOfSolution': given('57.6', 'kJ/mol', HEAT_IN_WATER),
  'NaOH.heatOfSolution': given('44.5', 'kJ/mol', HEAT_IN_WATER),
  sulfuricHeat: given('95', 'kJ/mol', HEAT_IN_WATER),
  methanolHeatCapacity: given('2.53', 'kJ/(kg·K)', METHANOL_HEAT_CAPACITY),
  oilHeatCapacity: given('2.0', 'kJ/(kg·K)', OIL_HEAT_CAPACITY),

  'esterification.equilibriumSlow': given('2', '', ESTERIFICATION_EQUILIBRIUM),
  'esterification.equilibriumFast': given('8', '', BAND),
  'esterification.rateSlow': given('0.032', '/min', ESTERIFICATION_RATE),
  'esterification.rateFast': given('0.25', '/min', BAND),
  'esterification.loadExponent': given('0.35', '', ESTERIFICATION_RATE),
  'esterification.waterExponent': given('0.83', '', WATER_INHIBITION),
  'esterification.activationEnergy': given('48000', 'J/mol', ESTERIFICATION_RATE),
};

/** The option each choice takes where neither the lot nor the site says. */
export const DEFAULT_OPTIONS: Readonly<Record<string, string>> = {
  acidKnownFrom: 'titration',
  'retest.acidKnownFrom': 'titration',
  sampleTakenBy: 'weighing',
  blankPolicy: 'solvent-neutralised',
  titrantAlkali: 'KOH',
  titrantSolvent: 'alcoholic',
  titrantKnownFrom: 'label',
  burette: 'B-25',
  repeatabilityBy: 'd664-used',
  temperatureCorrected: 'yes',
  runsAreDear: 'no',
  portionTable: 'iso-660',
  referenceAcid: 'oleic',
  oilDensityBy: 'typical',
  glyceridesBy: 'saponification-value',
  fat: 'rapeseed',
  catalyst: 'KOH',
  pretreatmentMethanolBasis: 'by-acidity',
  pretreatmentAcidBasis: 'by-acidity',
  acidProofEquipment: 'yes',
  neutralisingAcid: 'phosphoric-dihydrogen',
  productAcidFrom: 'titration',
  takesOneRun: 'yes',
  takesCertificate: 'yes',
  waterAbove: 'hold',
  insolublesAbove: 'hold',
  settledBy: 'as-delivered',
};
