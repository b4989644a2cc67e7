import { constant, named } from '../formula/expression.js';
import type { Expression, Operand } from '../formula/expression.js';
import { choice, quantity } from '../formula/quantity.js';
import type { Choice, Quantity, QuantityDefinition } from '../formula/quantity.js';
import { currency, currencyPerTonne, kilogram, kilogramPerTonne } from '../formula/units.js';
import { acidMolarMass } from './acidity.js';
import { passes } from './after-pretreatment.js';
import { oilMass } from './oil.js';
import * as price from './prices.js';
import type { RouteName } from './route-name.js';
import { COSTING, STOICHIOMETRY } from './sources.js';
import { M_METHYLENE } from './substances.js';

// What a route costs, a batch and a tonne of oil. A part without its price is not known; the totals count the parts that have one.

/** A price or rate, and whether it is given: what has none is left out of the totals. */
interface Rate {
  readonly rate: Quantity;
  readonly given: Choice<'yes' | 'no'>;
}
const counted = (rate: Quantity): Rate => ({ rate, given: choice(`priced.${rate.key}`, ['yes', 'no']) });

const base = {
  oil: counted(price.oilPrice), methanol: counted(price.methanolPrice), catalyst: counted(price.catalystPrice), neutralising: counted(price.neutralisingPrice),
  lowerLayer: counted(price.lowerLayerPrice), energy: counted(price.energyBaseRate), time: counted(price.timeBaseRate),
};
const twoStep = {
  ...base, sulfuric: counted(price.sulfuricPrice), drawnOff: counted(price.drawnOffPrice), energyPasses: counted(price.energyPassRate), timePasses: counted(price.timePassRate),
};
type Part = keyof typeof twoStep;
/** The rate that each part of a route's outlay needs. */
const RATES: Readonly<Record<RouteName, Readonly<Partial<Record<Part, Rate>>>>> = { direct: base, twoStep };
const LOST = counted(price.esterPrice);

/** Keys of the rates of a route's outlay, and of that of the ester it loses. */
export const outlayRates = (route: RouteName): readonly string[] => Object.values(RATES[route]).map(({ rate }) => rate.key);
export const LOST_RATE = LOST.rate.key;

/** Whether any rate of a route's outlay is given. */
const anyGiven = { direct: choice('priced.direct', ['yes']), twoStep: choice('priced.twoStep', ['yes']) };
export const pricedChoices: readonly Choice[] = [...Object.values(twoStep), LOST].map(({ given }): Choice => given).concat(Object.values(anyGiven));

const NOTHING = constant('0', currency);
const whenGiven = ({ given }: Rate, part: Expression): Expression => given.of({ yes: part, no: NOTHING });
const timesPasses = (each: (pass: 1 | 2 | 3) => Expression): Expression =>
  passes.of({ 1: each(1), 2: each(1).plus(each(2)), 3: each(1).plus(each(2)).plus(each(3)) });
const ofPasses = (name: string): Expression => timesPasses((pass) => named(`pass${pass}.${name}`));

/** Ester that all glycerides at the expected conversion, and all of the free acid, could give: the same by either route. */
export const esterPossible = quantity({
  key: 'cost.esterPossible', symbol: 'm_E,max', unit: kilogram, cites: [STOICHIOMETRY],
  is: named('direct.esterMade').plus(named('acidAmount').times(acidMolarMass.plus(M_METHYLENE)).in(kilogram)),
});

/** The cost of a route. */
export function routeCost(route: RouteName): readonly Quantity[] {
  const make = (name: string, symbol: string, is: Operand, more: Partial<QuantityDefinition> = {}): Quantity =>
    quantity({ key: `cost.${route}.${name}`, symbol, unit: currency, cites: [COSTING], digits: { decimals: 2 }, ...more, is });
  const of = (name: string): Expression => named(`${route}.${name}`);
  const after = (name: string): Expression => named(`after.${route}.${name}`);
  const money = (amount: Expression, rate: Quantity): Expression => amount.times(rate).in(currency);
  const two = route === 'twoStep';
  const kilograms = { unit: kilogram, cites: [STOICHIOMETRY], digits: { significant: 4 } };

  const methanolUsed = make('methanolUsed', 'm_M', two ? of('methanol').plus(ofPasses('methanol')) : of('methanol'), kilograms);
  const esterLost = make('esterLost', 'm_E,lost', esterPossible.minus(after('ester')), kilograms);
  // by what goes in and what stays: nothing else leaves the vessel
  const sulfuricUsed = make('sulfuricUsed', 'm_S', ofPasses('sulfuric'), kilograms);
  const drawnOffMass = make('drawnOffMass', 'm_off', oilMass.plus(ofPasses('methanol')).plus(sulfuricUsed).minus(named('pretreated.mass')), kilograms);

  const parts: Readonly<Record<Part, Operand>> = {
    oil: money(oilMass, price.oilPrice),
    methanol: money(methanolUsed, price.methanolPrice),
    catalyst: money(of('catalyst'), price.catalystPrice),
    neutralising: money(after('acid'), price.neutralisingPrice),
    lowerLayer: money(after('lowerMass'), price.lowerLayerPrice),
    energy: money(oilMass, price.energyBaseRate),
    time: price.timeBaseRate,
    sulfuric: money(sulfuricUsed, price.sulfuricPrice),
    drawnOff: money(drawnOffMass, price.drawnOffPrice),
    energyPasses: money(oilMass, price.energyPassRate).times(timesPasses(() => constant('1'))),
    timePasses: price.timePassRate.times(timesPasses(() => constant('1'))),
  };
  const rates = Object.entries(RATES[route]) as [Part, Rate][];
  const outlays = rates.map(([part, rate]) => ({ rate, part: make(part, `K_${part}`, parts[part]) }));
  const outlay = make('outlay', 'K_out', anyGiven[route].of({
    yes: outlays.map(({ rate, part }) => whenGiven(rate, part)).reduce((sum, part) => sum.plus(part)),
  }));
  const lost = make('lost', 'K_lost', money(esterLost, price.esterPrice));
  const total = make('total', 'K', outlay.plus(whenGiven(LOST, lost)));
  return [
    methanolUsed, esterLost, ...(two ? [sulfuricUsed, drawnOffMass] : []), ...outlays.map(({ part }) => part), outlay, lost, total,
    make('perTonne', 'K/m_oil', total.per(oilMass).in(currencyPerTonne), { unit: currencyPerTonne }),
    make('yield', 'Y', after('ester').per(oilMass).in(kilogramPerTonne), { unit: kilogramPerTonne, cites: [STOICHIOMETRY], digits: { significant: 4 } }),
    make('perTonneOfEster', 'K_out/m_E', outlay.per(after('ester')).in(currencyPerTonne), { unit: currencyPerTonne }),
  ];
}

/** What the acid step adds to the cost of a tonne of oil; below zero it pays. */
export const costDifference = quantity({
  key: 'cost.difference', symbol: 'ΔK', unit: currencyPerTonne, cites: [COSTING], digits: { decimals: 2 },
  is: named('cost.twoStep.perTonne').minus(named('cost.direct.perTonne')),
});
