import { Decimal } from '../../../src/formula/decimal.js';
import { shownText } from '../../../src/formula/digits.js';

// What a list shows of a lot, worked out the shortest way there is: the same decimal arithmetic written out by hand for one fixed
// case (two weighed runs, a weighed batch, KOH, default site, direct route). What the list takes longer is the price of formulas
// kept as data, of reading cells as people write them, and of judging each row by itself.

const D = (text: string): Decimal => new Decimal(text);
const [ZERO, ONE, TWO, THREE, TEN, HUNDRED, THOUSAND] = [D('0'), D('1'), D('2'), D('3'), D('10'), D('100'), D('1000')];
const [REFERENCE, KOH, M_KOH, M_OLEIC, M_METHANOL] = [D('282'), D('56.1'), D('56.1053'), D('282.468'), D('32.042')];
const [ROOT_2, ROOT_3, ROOT_6] = [TWO.sqrt(), THREE.sqrt(), D('6').sqrt()];
const GUARD = D('1.645');
const U_END = D('0.05').div(TWO).div(ROOT_3);
const U_BURETTE = D('0.1').div(ROOT_6);
const U_BALANCE = ROOT_2.times(D('0.002').div(ROOT_3));
const U_TEMPERATURE = D('0.0011').times(D('0.5').div(D('1.96')));

export interface StraightRow {
  readonly acidValue: string;
  readonly freeFattyAcid: string;
  readonly plusMinus: string;
  readonly catalyst: string;
  readonly methanol: string;
}

/** @param cells oil, water, strength, temperature, then sample, start, end of two runs, as text with a point */
export function straightRow([oilText = '', waterText = '', strength = '', temperature = '', ...runs]: readonly string[]): StraightRow {
  const [oil, water, c] = [D(oilText), D(waterText), D(strength)];
  const factor = ONE.minus(D('0.0011').times(D(temperature).minus(D('20'))));
  const [m1, s1, e1, m2, s2, e2] = runs.map(D) as [Decimal, Decimal, Decimal, Decimal, Decimal, Decimal];
  const [v1, v2] = [e1.minus(s1), e2.minus(s2)];
  const [b1, b2] = [c.times(v1.times(factor)).div(m1), c.times(v2.times(factor)).div(m2)];
  const b = b1.plus(b2).div(TWO);
  const acidValue = KOH.times(b);
  const ffa = REFERENCE.times(b).div(TEN);
  // how well it is known
  const r = D('0.117').times(acidValue);
  const range = KOH.times(Decimal.max(b1, b2).minus(Decimal.min(b1, b2)));
  const single = r.div(D('2.8'));
  const deviation = range.lte(D('2.8').times(single)) ? single : Decimal.max(single, range.div(D('1.128')));
  const perMillilitre = [c.times(factor).div(m1).div(TWO), c.times(factor).div(m2).div(TWO)] as const;
  const parts = [
    deviation.div(KOH).times(ONE.div(ROOT_2)), perMillilitre[0].times(U_END), perMillilitre[1].times(U_END), perMillilitre[0].plus(perMillilitre[1]).times(U_BURETTE),
    b1.div(m1).plus(b2.div(m2)).div(TWO).times(U_BALANCE), c.times(v1.div(m1).plus(v2.div(m2))).div(TWO).times(U_TEMPERATURE),
    b.div(c).times(c.times(D('0.5')).div(HUNDRED).div(ROOT_3)),
  ];
  const slope = REFERENCE.div(TEN);
  const u = parts.reduce((sum, part) => sum.plus(part.times(slope).pow(2)), ZERO).sqrt();
  if (ffa.plus(GUARD.times(u)).gt(THREE)) throw new RangeError('more acid than this is written for');
  // charge of the direct route
  const base = oil.div(HUNDRED);
  const extra = b.times(oil).times(M_KOH.toDecimalPlaces(4)).div(THOUSAND);
  const catalyst = base.plus(extra).div(D('90')).times(HUNDRED);
  const content = D('190').minus(M_KOH.times(b)).div(THREE.times(M_KOH));
  const share = HUNDRED.minus(M_OLEIC.times(b).div(TEN)).minus(water).minus(D('0.05'));
  if (share.lte(ZERO)) throw new RangeError('no oil');
  const methanol = D('6').times(content.times(oil)).times(M_METHANOL).div(THOUSAND).div(D('99.9')).times(HUNDRED);
  const shownFfa = shownText(ffa, { decimals: ffa.lt(TEN) ? 2 : 1 });
  return {
    acidValue: shownText(acidValue, { decimals: acidValue.lt(ONE) ? 2 : 1 }), freeFattyAcid: shownFfa, plusMinus: shownText(u.times(TWO), { decimals: shownFfa.split('.')[1]?.length ?? 0 }),
    catalyst: shownText(catalyst, { significant: 4 }), methanol: shownText(methanol, { significant: 4 }),
  };
}
