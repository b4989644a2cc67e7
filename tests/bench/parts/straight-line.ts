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

/** A figure as it is written, parsed. */
const F = (text: string): { text: string; value: Decimal } => ({ text, value: D(text) });
// the default figures are parsed once, as readLot does
const SITE = {
  sampleDensity: F('0.917'), standardisationTemperature: F('20'), oilTemperature: F('20'), typicalOilDensity: F('920'),
  saponificationValue: F('190'), insolubles: F('0.05'), directLimit: F('3.0'), pretreatmentLimit: F('40'), pretreatmentTarget: F('1.0'),
  waterLimitBase: F('0.10'), waterLimitAcid: F('0.50'), cleanOilFfa: F('0.5'), assay: F('90'), baseLoad: F('1.0'), methanolAssay: F('99.9'),
  methanolTemperature: F('20'), methanolRatio: F('6'), conversion: F('98'), entrainedEster: F('1.0'), pretreatmentTemperature: F('60'),
  pretreatmentTime: F('60'), sulfuricAssay: F('96'), sulfuricDensity: F('1.8355'), carryOver: F('10'), loadExponent: F('0.35'),
  waterExponent: F('0.83'), activationEnergy: F('48000'), equilibriumSlow: F('2'), equilibriumFast: F('8'), rateSlow: F('0.032'), rateFast: F('0.25'),
  balanceLinearity: F('0.002'), dropVolume: F('0.05'), thermometerTolerance: F('0.5'), titrantLabelTolerance: F('0.5'),
};
const [ROOT_2, ROOT_3, ROOT_6, OF_95, OF_TWO, REPEATABILITY, MEAN_RANGE, BURETTE] = [TWO.sqrt(), THREE.sqrt(), D('6').sqrt(), D('1.96'), D('2.8'), D('0.117'), D('1.128'), D('0.1')];

/** @throws where the lot is not the case that this is written for. */
export function straightLine({ figures: typed, runs }: LotEntry): Figures {
  const out: Figures = {};
  const text = (figure: { text: string } | { typed: string } | undefined): string => {
    if (!figure || !('text' in figure)) throw new RangeError('a figure that is not there');
    return figure.text;
  };
  /** An input, shown as it was written. */
  const given = (key: string, { text: shown, value }: { text: string; value: Decimal }): Decimal => {
    out[key] = { value: value.toString(), shown };
    return value;
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
  const sampleDensity = given('sampleDensity', SITE.sampleDensity);
  const c = sig('titrantConcentration', given('titrantMolarity', F(text(typed.titrantStrength))));
  const titrantMolarMass = fix('titrantMolarMass', 3, M_KOH);
  const t0 = given('standardisationTemperature', SITE.standardisationTemperature);
  const t = given('titrationTemperature', F(text(typed.titrationTemperature)));
  const expansion = sig('titrantExpansion', ALCOHOLIC);
  const volumeFactor = fix('volumeFactor', 5, ONE.minus(expansion.times(t.minus(t0))));
  const blank = fix('correctedBlank', 3, ZERO);
  const reference = sig('referenceAcidMolarMass', OLEIC_BY_METHOD);
  const acidMolarMass = sig('acidMolarMass', M_OLEIC);
  const greatest = sig('greatestAcidContent', HUNDRED.div(reference).times(TEN));
  const masses: Decimal[] = [];
  const titres: Decimal[] = [];
  const run = (number: 1 | 2): Decimal => {
    const { sample, start, end } = runs[number - 1]!;
    const key = `run${number}.`;
    const mass = sig(`${key}sampleMass`, given(`${key}weighedMass`, F(text(sample))));
    const from = given(`${key}buretteStart`, F(text(start)));
    const titre = fix(`${key}titre`, 2, given(`${key}buretteEnd`, F(text(end))).minus(from));
    const net = fix(`${key}netTitre`, 3, fix(`${key}correctedTitre`, 3, titre.times(volumeFactor)).minus(blank));
    const content = sig(`${key}acidContent`, c.times(net).div(mass));
    masses.push(mass);
    titres.push(titre);
    if (net.lte(ZERO) || content.gt(greatest)) throw new RangeError('a run that is refused');
    av(`${key}acidValue`, KOH_BY_METHOD.times(content));
    ffa(`${key}freeFattyAcid`, reference.times(content).div(TEN));
    return content;
  };
  const contents = [run(1), run(2)] as const;
  const b = sig('acidContent', sig('titratedAcidContent', contents[0].plus(contents[1]).div(TWO)));
  av('acidValue', KOH_BY_METHOD.times(b));
  const freeFattyAcid = ffa('freeFattyAcid', reference.times(b).div(TEN));
  // how well it is known
  const meanValue = fix('meanAcidValue', 2, KOH_BY_METHOD.times(b));
  const repeatability = fix('repeatabilityLimit', 2, REPEATABILITY.times(meanValue));
  const range = fix('runRange', 2, KOH_BY_METHOD.times(Decimal.max(...contents).minus(Decimal.min(...contents))));
  const critical = fix('criticalRange', 2, OF_TWO.times(repeatability.div(OF_TWO)));
  const single = repeatability.div(OF_TWO);
  const deviation = fix('runDeviation', 2, range.lte(critical) ? single : Decimal.max(single, range.div(MEAN_RANGE)));
  const doubts = {
    scatter: sig('u.repeatability', deviation.div(KOH_BY_METHOD).times(ONE.div(ROOT_2)), 2),
    endPoint: sig('u.endPoint', given('dropVolume', SITE.dropVolume).div(TWO).div(ROOT_3), 2),
    burette: sig('u.burette', sig('buretteTolerance', BURETTE, 2).div(ROOT_6), 2),
    balance: sig('u.balance', ROOT_2.times(given('balanceLinearity', SITE.balanceLinearity).div(ROOT_3)), 2),
    temperature: sig('u.temperature', expansion.times(given('thermometerTolerance', SITE.thermometerTolerance).div(OF_95)), 2),
    titrant: sig('u.titrant', c.times(given('titrantLabelTolerance', SITE.titrantLabelTolerance)).div(HUNDRED).div(ROOT_3), 2),
  };
  sig('u.certificate', ZERO, 2);
  const perMillilitre = masses.map((mass) => c.times(volumeFactor).div(mass).div(TWO));
  const parts = [
    doubts.scatter,
    ...perMillilitre.map((slope) => slope.times(doubts.endPoint)),
    perMillilitre[0]!.plus(perMillilitre[1]!).times(doubts.burette),
    contents[0].div(masses[0]!).plus(contents[1].div(masses[1]!)).div(TWO).times(doubts.balance),
    c.times(titres[0]!.div(masses[0]!).plus(titres[1]!.div(masses[1]!))).div(TWO).times(doubts.temperature),
    b.div(c).times(doubts.titrant),
  ];
  const whole = (slope: Decimal): Decimal => TWO.times(parts.reduce((sum, part) => sum.plus(part.times(slope).pow(2)), ZERO).sqrt());
  out['± acidValue'] = { value: whole(KOH_BY_METHOD).toString(), shown: '' };
  out['± freeFattyAcid'] = { value: whole(reference.div(TEN)).toString(), shown: '' };
  out['± titrantConcentration'] = { value: TWO.times(doubts.titrant).toString(), shown: '' };

  sig('alkaliPerLitreOfOil', b.times(sampleDensity).times(titrantMolarMass), 3);

  // oil
  const oilTemperature = given('oilTemperature', SITE.oilTemperature);
  const density15 = fix('oilDensity15', 1, given('typicalOilDensity', SITE.typicalOilDensity));
  const density = fix('oilDensity', 1, density15.minus(OIL_SLOPE.times(oilTemperature.minus(FIFTEEN))));
  const oil = sig('oilMass', given('weighedOil', F(text(typed.oilAmount))));
  const oilVolume = sig('oilVolume', oil.div(density).times(THOUSAND));
  const water = given('waterContent', F(text(typed.waterContent)));
  const insolubles = given('insolubles', SITE.insolubles);
  const saponification = given('saponificationValue', SITE.saponificationValue);
  const share = sig('glycerideShare', HUNDRED.minus(acidMolarMass.times(b).div(TEN)).minus(water).minus(insolubles));
  const content = sig('glycerideContent', saponification.minus(M_KOH.times(b)).div(THREE.times(M_KOH)));
  const glyceride = fix('glycerideMolarMass', 1, share.div(content).times(TEN));
  const meanAcid = fix('glycerideAcidMolarMass', 1, glyceride.minus(M_GLYCERYL).div(THREE));
  const acidAmount = sig('acidAmount', b.times(oil));

  // catalyst, methanol and what the site says
  const assay = fix('catalystAssay', 1, given('KOH.assay', SITE.assay));
  const baseLoad = fix('catalystBaseLoad', 2, given('KOH.baseLoad', SITE.baseLoad));
  const catalystMass = fix('catalystMolarMass', 3, M_KOH);
  const methanolInRest = sig('methanolInRest', ZERO);
  const waterInRest = sig('waterInRest', HUNDRED);
  const waterPerCatalyst = fix('waterPerCatalyst', 0, ONE);
  const soapGain = fix('soapGain', 3, SOAP_GAIN);
  const methanolAssay = given('methanolAssay', SITE.methanolAssay);
  const methanolDensity = fix('methanolDensity', 4, METHANOL_AT_20.minus(METHANOL_SLOPE.times(given('methanolTemperature', SITE.methanolTemperature).minus(TWENTY))));
  const ratio = given('methanolRatio', SITE.methanolRatio);
  const conversion = given('conversion', SITE.conversion);
  const entrainment = given('entrainedEster', SITE.entrainedEster);
  const directLimit = given('directLimit', SITE.directLimit);
  given('pretreatmentLimit', SITE.pretreatmentLimit);
  const target = given('pretreatmentTarget', SITE.pretreatmentTarget);
  given('waterLimitBase', SITE.waterLimitBase);
  given('waterLimitAcid', SITE.waterLimitAcid);
  const cleanOil = given('cleanOilFfa', SITE.cleanOilFfa);
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
    put('catalystInMethanol', basePure.plus(extraPure).div(needed.div(methanolDensity)).times(THOUSAND));
    const brought = put('methanolFromCatalyst', rest.times(methanolInRest).div(TEN_THOUSAND));
    const methanol = put('methanol', Decimal.max(ZERO, needed.minus(brought).div(methanolAssay).times(HUNDRED)));
    put('batchVolume', mass.div(density).times(THOUSAND).plus(put('methanolVolume', methanol.div(methanolDensity))));
    const catalystAmount = put('catalystAmount', basePure.plus(extraPure).div(catalystMass).times(THOUSAND));
    const made = put('waterMade', catalystAmount.times(waterPerCatalyst).times(M_WATER).div(THOUSAND));
    const waterBrought = put('waterBrought', feed.water
      .plus(rest.times(waterInRest).div(TEN_THOUSAND))
      .plus(methanol.times(HUNDRED.minus(methanolAssay)).div(HUNDRED)));
    put('waterShare', put('waterInBatch', made.plus(waterBrought)).div(mass).times(HUNDRED));
    const soap = put('soap', acid.times(acidMolarMass.plus(soapGain)).div(THOUSAND));
    sig(`${route}.soapShare`, soap.div(mass).times(HUNDRED), 3);
    const acidToSoap = put('acidToSoap', acid.times(acidMolarMass).div(THOUSAND));
    put('oilLost', acidToSoap.plus(put('esterEntrained', entrainment.times(soap))));
    const esterMade = put('esterMade', THREE.times(amount).times(conversion).times(meanAcid.plus(M_METHYLENE)).div(HUNDRED_THOUSAND));
    put('ester', esterMade.plus(feed.ester));
    put('glycerol', amount.times(conversion).times(M_GLYCEROL).div(HUNDRED_THOUSAND));
  };
  base('direct', { mass: oil, acid: acidAmount, sulfuric: ZERO, water: water.times(oil).div(HUNDRED), ester: ZERO });

  // acid step
  const temperature = given('pretreatmentTemperature', SITE.pretreatmentTemperature);
  const time = given('pretreatmentTime', SITE.pretreatmentTime);
  const sulfuricAssay = given('sulfuricAssay', SITE.sulfuricAssay);
  const sulfuricDensity = given('sulfuricDensity', SITE.sulfuricDensity);
  const carryOver = given('carryOver', SITE.carryOver);
  const loadExponent = given('esterification.loadExponent', SITE.loadExponent);
  const waterExponent = given('esterification.waterExponent', SITE.waterExponent);
  const energy = given('esterification.activationEnergy', SITE.activationEnergy);
  const temperatureFactor = sig('esterification.temperatureFactor',
    energy.div(GAS).times(ONE.div(KELVIN_60).minus(ONE.div(temperature.plus(KELVIN_0)))).exp());
  const acidMass = sig('pass1.acidMass', acidAmount.times(reference).div(THOUSAND));
  if (!ffa('pass1.ffaAtStart', acidMass.div(oil).times(HUNDRED)).lt(FIFTEEN)) throw new RangeError('more acid than this is written for');
  const methanolPure = sig('pass1.methanolPure', fix('pass1.methanolRule', 0, FORTY).times(acidAmount).times(M_METHANOL).div(THOUSAND));
  const methanol = sig('pass1.methanol', methanolPure.div(methanolAssay).times(HUNDRED));
  const methanolVolume = sig('pass1.methanolVolume', methanol.div(methanolDensity));
  const sulfuricPure = sig('pass1.sulfuricPure', fix('pass1.acidRule', 0, TEN).times(acidMass).div(HUNDRED));
  const sulfuric = sig('pass1.sulfuric', sulfuricPure.div(sulfuricAssay).times(HUNDRED));
  sig('pass1.batchVolume', oilVolume.plus(methanolVolume).plus(sig('pass1.sulfuricVolume', sulfuric.div(sulfuricDensity))));
  const sulfuricPresent = sig('pass1.sulfuricPresent', sulfuricPure);
  const sulfuricCarried = sig('pass1.sulfuricCarried', carryOver.times(sulfuricPresent).div(HUNDRED));
  const freshWater = methanol.times(HUNDRED.minus(methanolAssay)).div(HUNDRED)
    .plus(sulfuric.times(HUNDRED.minus(sulfuricAssay)).div(HUNDRED)).div(M_WATER).times(THOUSAND);

  const methanolPresent = sig('pass1.methanolPresent', methanolPure.div(M_METHANOL).times(THOUSAND));
  const waterPresent = sig('pass1.waterPresent', freshWater.plus(water.times(oil).div(M_WATER).times(TEN)));
  const R = sig('pass1.methanolPerAcid', methanolPresent.div(acidAmount));
  const W = sig('pass1.waterPerAcid', waterPresent.div(acidAmount));
  const load = sig('pass1.acidLoad', sulfuricPresent.div(acidAmount.times(reference)).times(HUNDRED_THOUSAND));
  const rateFactor = sig('pass1.rateFactor', temperatureFactor.times(load.div(FIVE).pow(loadExponent)).div(ONE.plus(W).pow(waterExponent)));

  const band = (pace: string, K: Decimal, k60: Decimal): { left: Decimal; leftFfa: Decimal; methanol: Decimal; water: Decimal } => {
    const put = (name: string, value: Decimal): Decimal => sig(`pass1.${name}.${pace}`, value);
    const sum = K.times(ONE.plus(R)).plus(W);
    const root = sum.pow(TWO).minus(FOUR.times(K.minus(ONE)).times(K).times(R)).sqrt();
    const limit = put('equilibrium', TWO.times(K).times(R).div(sum.plus(root)));
    const k = put('rate', k60.times(rateFactor));
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
  const slow = band('slow', given('esterification.equilibriumSlow', SITE.equilibriumSlow), given('esterification.rateSlow', SITE.rateSlow));
  const fast = band('fast', given('esterification.equilibriumFast', SITE.equilibriumFast), given('esterification.rateFast', SITE.rateFast));
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
