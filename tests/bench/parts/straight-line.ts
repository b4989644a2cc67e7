import { Decimal } from '../../../src/formula/decimal.js';
import { shownText } from '../../../src/formula/digits.js';
import type { LotEntry } from '../../../src/core.js';

// The lot of the benchmark, read the shortest way there is: the same decimal arithmetic in the same
// order, written out by hand for one fixed case (two weighed runs, a weighed batch, KOH, one pass
// of the acid step, default site). What readLot takes longer is the price of formulas kept as data.

/** A figure as a reading gives it. */
export type Figures = Record<string, { value: string; shown: string }>;

const D = (text: string): Decimal => new Decimal(text);
const [ZERO, ONE, TWO, THREE, FOUR, FIVE, TEN, HUNDRED] = [D('0'), D('1'), D('2'), D('3'), D('4'), D('5'), D('10'), D('100')];
const [THOUSAND, TEN_THOUSAND, HUNDRED_THOUSAND] = [D('1000'), D('10000'), D('100000')];

const M_METHANOL = D('32.042');
const M_WATER = D('18.015');
const M_GLYCEROL = D('92.094');
const M_KOH = D('56.1053');
const M_SULFURIC = D('98.072');
const M_METHYLENE = D('14.027');
const M_GLYCERYL = D('38.049');
const M_OLEIC = D('282.468');
const SOAP_GAIN = D('39.0983').minus(D('1.008'));
const OLEIC_BY_METHOD = D('282');
const KOH_BY_METHOD = D('56.1');
const [ALCOHOLIC, OIL_SLOPE, METHANOL_AT_20, METHANOL_SLOPE] = [D('0.0011'), D('0.64'), D('0.7913'), D('0.00094')];
const [GAS, KELVIN_60, KELVIN_0, FIFTEEN, TWENTY, FORTY] = [D('8.314462618'), D('333.15'), D('273.15'), D('15'), D('20'), D('40')];

// the default figures are parsed once, as readLot does
const SITE = {
  sampleDensity: D('0.917'), standardisationTemperature: D('20'), oilTemperature: D('20'), typicalOilDensity: D('920'),
  saponificationValue: D('190'), insolubles: D('0.05'), directLimit: D('3.0'), pretreatmentLimit: D('40'), pretreatmentTarget: D('1.0'),
  waterLimitBase: D('0.10'), waterLimitAcid: D('0.50'), cleanOilFfa: D('0.5'), assay: D('90'), baseLoad: D('1.0'), methanolAssay: D('99.9'),
  methanolTemperature: D('20'), methanolRatio: D('6'), conversion: D('98'), entrainedEster: D('1.0'), pretreatmentTemperature: D('60'),
  pretreatmentTime: D('60'), sulfuricAssay: D('96'), sulfuricDensity: D('1.8355'), carryOver: D('10'), loadExponent: D('0.35'),
  waterExponent: D('0.83'), activationEnergy: D('48000'), equilibriumSlow: D('2'), equilibriumFast: D('8'), rateSlow: D('0.032'), rateFast: D('0.25'),
};

/** @throws where the lot is not the case that this is written for. */
export function straightLine({ figures: typed, runs }: LotEntry): Figures {
  const out: Figures = {};
  const text = (figure: { text: string } | { typed: string } | undefined): string => {
    if (!figure || !('text' in figure)) throw new RangeError('a figure that is not there');
    return figure.text;
  };
  const fix = (key: string, decimals: number, value: Decimal): Decimal => {
    out[key] = { value: value.toString(), shown: shownText(value, { decimals }) };
    return value;
  };
  const sig = (key: string, value: Decimal, significant = 4): Decimal => {
    out[key] = { value: value.toString(), shown: shownText(value, { significant }) };
    return value;
  };
  const ffa = (key: string, value: Decimal): Decimal => fix(key, value.abs().lt(TEN) ? 2 : 1, value);
  const av = (key: string, value: Decimal): Decimal => fix(key, value.abs().lt(ONE) ? 2 : value.abs().lt(HUNDRED) ? 1 : 0, value);

  // titration
  const sampleDensity = fix('sampleDensity', 3, SITE.sampleDensity);
  const c = sig('titrantConcentration', sig('titrantMolarity', D(text(typed.titrantStrength))));
  const titrantMolarMass = fix('titrantMolarMass', 3, M_KOH);
  const t0 = fix('standardisationTemperature', 1, SITE.standardisationTemperature);
  const t = fix('titrationTemperature', 1, t0);
  const expansion = sig('titrantExpansion', ALCOHOLIC);
  const volumeFactor = fix('volumeFactor', 5, ONE.minus(expansion.times(t.minus(t0))));
  const blank = fix('correctedBlank', 3, ZERO);
  const reference = sig('referenceAcidMolarMass', OLEIC_BY_METHOD);
  const acidMolarMass = sig('acidMolarMass', M_OLEIC);
  const greatest = sig('greatestAcidContent', HUNDRED.div(reference).times(TEN));
  const run = (number: 1 | 2): Decimal => {
    const { sample, start, end } = runs[number - 1]!;
    const key = `run${number}.`;
    const mass = sig(`${key}sampleMass`, sig(`${key}weighedMass`, D(text(sample))));
    const from = fix(`${key}buretteStart`, 2, D(text(start)));
    const titre = fix(`${key}titre`, 2, fix(`${key}buretteEnd`, 2, D(text(end))).minus(from));
    const net = fix(`${key}netTitre`, 3, fix(`${key}correctedTitre`, 3, titre.times(volumeFactor)).minus(blank));
    const content = sig(`${key}acidContent`, c.times(net).div(mass));
    if (net.lte(ZERO) || content.gt(greatest)) throw new RangeError('a run that is refused');
    av(`${key}acidValue`, KOH_BY_METHOD.times(content));
    ffa(`${key}freeFattyAcid`, reference.times(content).div(TEN));
    return content;
  };
  const b = sig('acidContent', run(1).plus(run(2)).div(TWO));
  av('acidValue', KOH_BY_METHOD.times(b));
  const freeFattyAcid = ffa('freeFattyAcid', reference.times(b).div(TEN));
  sig('alkaliPerLitreOfOil', b.times(sampleDensity).times(titrantMolarMass), 3);

  // oil
  const oilTemperature = fix('oilTemperature', 1, SITE.oilTemperature);
  const density15 = fix('oilDensity15', 1, sig('typicalOilDensity', SITE.typicalOilDensity));
  const density = fix('oilDensity', 1, density15.minus(OIL_SLOPE.times(oilTemperature.minus(FIFTEEN))));
  const oil = sig('oilMass', sig('weighedOil', D(text(typed.oilAmount))));
  const oilVolume = sig('oilVolume', oil.div(density).times(THOUSAND));
  const water = fix('waterContent', 2, D(text(typed.waterContent)));
  const insolubles = fix('insolubles', 2, SITE.insolubles);
  const saponification = fix('saponificationValue', 1, SITE.saponificationValue);
  const share = sig('glycerideShare', HUNDRED.minus(acidMolarMass.times(b).div(TEN)).minus(water).minus(insolubles));
  const content = sig('glycerideContent', saponification.minus(M_KOH.times(b)).div(THREE.times(M_KOH)));
  const glyceride = fix('glycerideMolarMass', 1, share.div(content).times(TEN));
  const meanAcid = fix('glycerideAcidMolarMass', 1, glyceride.minus(M_GLYCERYL).div(THREE));
  const acidAmount = sig('acidAmount', b.times(oil));

  // catalyst, methanol and what the site says
  const assay = fix('catalystAssay', 1, fix('KOH.assay', 1, SITE.assay));
  const baseLoad = fix('catalystBaseLoad', 2, fix('KOH.baseLoad', 2, SITE.baseLoad));
  const catalystMass = fix('catalystMolarMass', 3, M_KOH);
  const methanolInRest = sig('methanolInRest', ZERO);
  const waterInRest = sig('waterInRest', HUNDRED);
  const waterPerCatalyst = fix('waterPerCatalyst', 0, ONE);
  const soapGain = fix('soapGain', 3, SOAP_GAIN);
  const methanolAssay = fix('methanolAssay', 1, SITE.methanolAssay);
  const methanolDensity = fix('methanolDensity', 4, METHANOL_AT_20.minus(METHANOL_SLOPE.times(fix('methanolTemperature', 1, SITE.methanolTemperature).minus(TWENTY))));
  const ratio = sig('methanolRatio', SITE.methanolRatio, 3);
  const conversion = fix('conversion', 1, SITE.conversion);
  const entrainment = sig('entrainedEster', SITE.entrainedEster);
  const directLimit = fix('directLimit', 2, SITE.directLimit);
  ffa('pretreatmentLimit', SITE.pretreatmentLimit);
  const target = ffa('pretreatmentTarget', SITE.pretreatmentTarget);
  ffa('waterLimitBase', SITE.waterLimitBase);
  ffa('waterLimitAcid', SITE.waterLimitAcid);
  const cleanOil = ffa('cleanOilFfa', SITE.cleanOilFfa);
  sig('blendOil', oil.times(freeFattyAcid.minus(directLimit)).div(directLimit.minus(cleanOil)));
  const glycerideAmount = content.times(oil);

  const base = (route: string, feed: { mass: Decimal; acid: Decimal; sulfuric: Decimal; water: Decimal; ester: Decimal }): void => {
    const put = (name: string, value: Decimal): Decimal => sig(`${route}.${name}`, value);
    const mass = put('feedMass', feed.mass);
    const acid = put('acid', feed.acid);
    const sulfuric = put('sulfuricAcid', feed.sulfuric);
    const basePure = put('basePure', baseLoad.times(mass).div(HUNDRED));
    const acidPure = put('acidPure', acid.times(catalystMass).div(THOUSAND));
    const mineralPure = put('mineralPure', TWO.times(sulfuric).times(catalystMass).div(THOUSAND));
    const extraPure = put('extraPure', acidPure.plus(mineralPure));
    put('baseProduct', basePure.div(assay).times(HUNDRED));
    put('extraProduct', extraPure.div(assay).times(HUNDRED));
    put('mineralProduct', mineralPure.div(assay).times(HUNDRED));
    const product = put('catalyst', basePure.plus(extraPure).div(assay).times(HUNDRED));
    put('catalystVolume', ZERO);
    put('catalystPerLitre', product.div(oilVolume).times(THOUSAND));
    put('catalystPerKilogram', product.div(oil).times(THOUSAND));
    const amount = put('glycerideAmount', glycerideAmount);
    const needed = put('methanolNeeded', ratio.times(amount).times(M_METHANOL).div(THOUSAND));
    const rest = product.times(HUNDRED.minus(assay));
    const brought = put('methanolFromCatalyst', rest.times(methanolInRest).div(TEN_THOUSAND));
    const methanol = put('methanol', Decimal.max(ZERO, needed.minus(brought).div(methanolAssay).times(HUNDRED)));
    put('methanolVolume', methanol.div(methanolDensity));
    const catalystAmount = put('catalystAmount', basePure.plus(extraPure).div(catalystMass).times(THOUSAND));
    const made = put('waterMade', catalystAmount.times(waterPerCatalyst).times(M_WATER).div(THOUSAND));
    const waterBrought = put('waterBrought', feed.water
      .plus(rest.times(waterInRest).div(TEN_THOUSAND))
      .plus(methanol.times(HUNDRED.minus(methanolAssay)).div(HUNDRED)));
    put('waterShare', put('waterInBatch', made.plus(waterBrought)).div(mass).times(HUNDRED));
    const soap = put('soap', acid.times(acidMolarMass.plus(soapGain)).div(THOUSAND));
    const acidToSoap = put('acidToSoap', acid.times(acidMolarMass).div(THOUSAND));
    put('oilLost', acidToSoap.plus(put('esterEntrained', entrainment.times(soap))));
    const esterMade = put('esterMade', THREE.times(amount).times(conversion).times(meanAcid.plus(M_METHYLENE)).div(HUNDRED_THOUSAND));
    put('ester', esterMade.plus(feed.ester));
    put('glycerol', amount.times(conversion).times(M_GLYCEROL).div(HUNDRED_THOUSAND));
  };
  base('direct', { mass: oil, acid: acidAmount, sulfuric: ZERO, water: water.times(oil).div(HUNDRED), ester: ZERO });

  // acid step
  const temperature = fix('pretreatmentTemperature', 1, SITE.pretreatmentTemperature);
  const time = fix('pretreatmentTime', 0, SITE.pretreatmentTime);
  const sulfuricAssay = sig('sulfuricAssay', SITE.sulfuricAssay);
  const sulfuricDensity = fix('sulfuricDensity', 3, SITE.sulfuricDensity);
  const carryOver = sig('carryOver', SITE.carryOver);
  const loadExponent = sig('esterification.loadExponent', SITE.loadExponent);
  const waterExponent = sig('esterification.waterExponent', SITE.waterExponent);
  const energy = sig('esterification.activationEnergy', SITE.activationEnergy, 5);
  const temperatureFactor = sig('esterification.temperatureFactor',
    energy.div(GAS).times(ONE.div(KELVIN_60).minus(ONE.div(temperature.plus(KELVIN_0)))).exp());
  const acidMass = sig('pass1.acidMass', acidAmount.times(reference).div(THOUSAND));
  if (!ffa('pass1.ffaAtStart', acidMass.div(oil).times(HUNDRED)).lt(FIFTEEN)) throw new RangeError('more acid than this is written for');
  const methanolPure = sig('pass1.methanolPure', fix('pass1.methanolRule', 0, FORTY).times(acidAmount).times(M_METHANOL).div(THOUSAND));
  const methanol = sig('pass1.methanol', methanolPure.div(methanolAssay).times(HUNDRED));
  sig('pass1.methanolVolume', methanol.div(methanolDensity));
  const sulfuricPure = sig('pass1.sulfuricPure', fix('pass1.acidRule', 0, TEN).times(acidMass).div(HUNDRED));
  const sulfuric = sig('pass1.sulfuric', sulfuricPure.div(sulfuricAssay).times(HUNDRED));
  sig('pass1.sulfuricVolume', sulfuric.div(sulfuricDensity));
  const sulfuricPresent = sig('pass1.sulfuricPresent', sulfuricPure);
  const sulfuricCarried = sig('pass1.sulfuricCarried', carryOver.times(sulfuricPresent).div(HUNDRED));
  const freshWater = methanol.times(HUNDRED.minus(methanolAssay)).div(HUNDRED)
    .plus(sulfuric.times(HUNDRED.minus(sulfuricAssay)).div(HUNDRED)).div(M_WATER).times(THOUSAND);

  const band = (pace: string, K: Decimal, k60: Decimal): { left: Decimal; leftFfa: Decimal; methanol: Decimal; water: Decimal } => {
    const put = (name: string, value: Decimal): Decimal => sig(`pass1.${name}.${pace}`, value);
    const methanolPresent = put('methanolPresent', methanolPure.div(M_METHANOL).times(THOUSAND));
    const waterPresent = put('waterPresent', freshWater.plus(water.times(oil).div(M_WATER).times(TEN)));
    const R = put('methanolPerAcid', methanolPresent.div(acidAmount));
    const W = put('waterPerAcid', waterPresent.div(acidAmount));
    const load = put('acidLoad', sulfuricPresent.div(acidAmount.times(reference)).times(HUNDRED_THOUSAND));
    const sum = K.times(ONE.plus(R)).plus(W);
    const root = sum.pow(TWO).minus(FOUR.times(K.minus(ONE)).times(K).times(R)).sqrt();
    const limit = put('equilibrium', TWO.times(K).times(R).div(sum.plus(root)));
    const k = put('rate', k60.times(temperatureFactor).times(load.div(FIVE).pow(loadExponent)).div(ONE.plus(W).pow(waterExponent)));
    const reached = put('conversion', limit.times(ONE.minus(ONE.div(k.times(time).div(limit).exp()))));
    const turned = put('esterified', reached.times(acidAmount));
    const left = put('acidLeft', acidAmount.minus(turned));
    return {
      left,
      leftFfa: ffa(`pass1.ffaLeft.${pace}`, left.times(reference).div(oil).div(TEN)),
      methanol: put('methanolCarried', carryOver.times(methanolPresent.minus(turned)).div(HUNDRED)),
      water: put('waterCarried', carryOver.times(waterPresent.plus(turned)).div(HUNDRED)),
    };
  };
  const slow = band('slow', sig('esterification.equilibriumSlow', SITE.equilibriumSlow), sig('esterification.rateSlow', SITE.rateSlow));
  const fast = band('fast', sig('esterification.equilibriumFast', SITE.equilibriumFast), sig('esterification.rateFast', SITE.rateFast));
  if (slow.leftFfa.gt(target)) throw new RangeError('more passes than this is written for');

  const left = sig('pretreated.acidLeft', slow.left);
  ffa('pretreated.ffaLeft.slow', slow.leftFfa);
  ffa('pretreated.ffaLeft.fast', fast.leftFfa);
  const methanolLeft = sig('pretreated.methanolLeft', slow.methanol);
  const waterLeft = sig('pretreated.waterLeft', slow.water);
  const sulfuricLeft = sig('pretreated.sulfuricLeft', sulfuricCarried);
  const esterified = acidAmount.minus(left);
  const waterLeftMass = waterLeft.times(M_WATER).div(THOUSAND);
  const mass = sig('pretreated.mass', oil
    .minus(water.times(oil).div(HUNDRED))
    .plus(esterified.times(M_METHYLENE).div(THOUSAND))
    .plus(methanolLeft.times(M_METHANOL).div(THOUSAND))
    .plus(waterLeftMass)
    .plus(sulfuricLeft));
  const ester = sig('pretreated.ester', esterified.times(acidMolarMass.plus(M_METHYLENE)).div(THOUSAND));
  base('twoStep', { mass, acid: left, sulfuric: sulfuricLeft.div(M_SULFURIC).times(THOUSAND), water: waterLeftMass, ester });
  return out;
}
