import { constant, greatest, least, named, nearest } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { quantity } from '../formula/quantity.js';
import type { Quantity, QuantityDefinition } from '../formula/quantity.js';
import { kilogram, litre, milligram, percent } from '../formula/units.js';
import { acidMolarMass } from './acidity.js';
import { waterDensity } from './after-reaction.js';
import { passFlows, reactionFlows, retestFlows, settlingFlows } from './balance-steps.js';
import type { Flow, StepFlows } from './balance-steps.js';
import { catalystAssay, methanolInRest, waterInRest, waterPerCatalyst } from './catalyst.js';
import { methanolAssay, methanolDensity } from './methanol.js';
import { neutralisingAssay } from './neutralising.js';
import { insolubles, oilDensity, oilMass, waterContent } from './oil.js';
import { carryOver, sulfuricAssay, sulfuricDensity } from './pretreatment.js';
import type { RouteName } from './route-name.js';
import { PRACTICE, STOICHIOMETRY } from './sources.js';
import { M_METHANOL, M_METHYLENE, M_SULFURIC, M_WATER } from './substances.js';

// Masses of the balance that no charge needs. They stand in the sheet of a lot only where a balance was asked for.

type More = Partial<QuantityDefinition>;

const make = (name: string, symbol: string, is: Expression, more: More = {}): Quantity =>
  quantity({ key: `balance.${name}`, symbol, unit: kilogram, cites: [STOICHIOMETRY], ...more, is });
const bySite = { cites: [PRACTICE, STOICHIOMETRY] };

const all = (): Expression => constant('100', percent);
const ofSubstance = (amount: Expression, molarMass: Expression): Expression => amount.times(molarMass).in(kilogram);
const part = (mass: Expression, share: Expression): Expression => mass.times(share).in(kilogram);
/** What a product holds beside its active substance. */
const rest = (mass: Expression, assay: Expression): Expression => part(mass, all().minus(assay));
const litres = (mass: Expression, density: Expression): Expression => mass.per(density).in(litre);
const sum = (flows: readonly Flow[]): Expression => flows.map(({ key }) => named(key)).reduce((left, right) => left.plus(right));

/** Substances of the oil as it came, which are also those of it that no pass changes. */
function oilParts(): readonly Quantity[] {
  return [
    make('glycerides', 'm_TG', ofSubstance(named('direct.glycerideAmount'), named('glycerideMolarMass'))),
    make('freeAcid', 'm_FFA', ofSubstance(named('acidAmount'), acidMolarMass)),
    make('water', 'm_H2O,oil', part(oilMass, waterContent)),
    make('insolubles', 'm_ins', part(oilMass, insolubles)),
  ];
}

/** What goes in altogether, what comes out, and how far they are apart, to a millionth of a milligram. */
function totals({ in: into, out, totals: keys }: StepFlows): readonly Quantity[] {
  const total = (key: string, symbol: string, is: Expression): Quantity => quantity({ key, symbol, unit: kilogram, cites: [STOICHIOMETRY], is });
  const [left, right] = [named(keys.in), named(keys.out)];
  const apart = greatest(left, right).minus(least(left, right)).in(milligram);
  return [
    ...(keys.in.startsWith('balance.') ? [total(keys.in, 'm_in', sum(into))] : []),
    total(keys.out, 'm_out', sum(out)),
    total(keys.difference, 'Δm', nearest(apart, constant('0.000001', milligram)).in(kilogram)),
  ];
}

/** A pass of the acid step at the cautious end: what the oil keeps of methanol, water and sulfuric acid, and what is drawn off. */
function pass(number: 1 | 2 | 3): readonly Quantity[] {
  const of = (name: string): Expression => named(`pass${number}.${name}`);
  const present = (name: string): Expression => of(number === 1 ? name : `${name}.slow`);
  const own = (name: string, symbol: string, is: Expression, more: More = {}): Quantity => make(`pass${number}.${name}`, symbol, is, more);
  const drawn = (amount: Expression): Expression => amount.times(all().minus(carryOver));

  const methanolDrawn = own('methanolDrawn', 'm_M,off', ofSubstance(drawn(present('methanolPresent').minus(of('esterified.slow'))), M_METHANOL), bySite);
  const waterDrawn = own('waterDrawn', 'm_H2O,off', ofSubstance(drawn(present('waterPresent').plus(of('esterified.slow'))), M_WATER), bySite);
  const sulfuricDrawn = own('sulfuricDrawn', 'm_S,off', drawn(of('sulfuricPresent')).in(kilogram), bySite);
  const flows = passFlows(number);
  const oilAfter = own('oilMass', 'm_oil,off', sum(flows.out.filter(({ stream }) => stream === 'oil')), bySite);
  return [
    own('waterOfMethanol', 'm_H2O,M', rest(of('methanol'), methanolAssay)),
    own('waterOfSulfuric', 'm_H2O,S', rest(of('sulfuric'), sulfuricAssay)),
    own('freeAcid', 'm_FFA,left', ofSubstance(of('acidLeft.slow'), acidMolarMass)),
    own('ester', 'm_E', ofSubstance(named('acidAmount').minus(of('acidLeft.slow')), acidMolarMass.plus(M_METHYLENE))),
    own('methanol', 'm_M,left', ofSubstance(of('methanolCarried.slow'), M_METHANOL), bySite),
    own('water', 'm_H2O,left', ofSubstance(of('waterCarried.slow'), M_WATER), bySite),
    methanolDrawn, waterDrawn, sulfuricDrawn,
    own('drawnMass', 'm_off', methanolDrawn.plus(waterDrawn).plus(sulfuricDrawn), bySite),
    own('drawnVolume', 'V_off', litres(methanolDrawn, methanolDensity).plus(litres(waterDrawn, waterDensity)).plus(litres(sulfuricDrawn, sulfuricDensity)), { unit: litre, ...bySite }),
    oilAfter,
    own('oilVolume', 'V_oil,off', litres(oilAfter, oilDensity), { unit: litre, ...bySite }),
    ...totals(flows),
  ];
}

/** The oil that the base step of the two-step route takes over. A titration counts the sulfuric acid left among the free acid. */
function pretreated(): readonly Quantity[] {
  const own = (name: string, symbol: string, is: Expression): Quantity => make(`pretreated.${name}`, symbol, is, bySite);
  return [
    own('methanol', 'm_M,left', ofSubstance(named('pretreated.methanolLeft'), M_METHANOL)),
    own('water', 'm_H2O,left', ofSubstance(named('pretreated.waterLeft'), M_WATER)),
    own('sulfuricAcid', 'm_S,left', ofSubstance(named('twoStep.sulfuricAcid'), M_SULFURIC)),
  ];
}

/** The base step. Alkali that still drives the reaction counts as it was charged; it gives its water or methanol when it is neutralised. */
function base(route: RouteName): readonly Quantity[] {
  const of = (name: string): Expression => named(`${route}.${name}`);
  const after = (name: string): Expression => named(`after.${route}.${name}`);
  const own = (name: string, symbol: string, is: Expression, more: More = {}): Quantity => make(`${route}.${name}`, symbol, is, more);
  const restOfCatalyst = rest(of('catalyst'), catalystAssay);
  const setFree = (amount: Expression, molarMass: Expression): Expression => amount.times(molarMass).times(after('catalystLeft')).in(kilogram);
  return [
    own('methanolPure', 'm_M', part(of('methanol'), methanolAssay)),
    own('waterOfMethanol', 'm_H2O,M', rest(of('methanol'), methanolAssay)),
    own('catalystPure', 'm_cat,pure', of('basePure').plus(of('extraPure'))),
    own('waterOfCatalyst', 'm_H2O,cat', part(restOfCatalyst, waterInRest), bySite),
    own('restOfCatalyst', 'm_rest,cat', part(restOfCatalyst, all().minus(methanolInRest).minus(waterInRest)), bySite),
    own('methanolReacted', 'm_M,mix', after('methanolLeft').minus(setFree(constant('1').minus(waterPerCatalyst), M_METHANOL))),
    own('waterReacted', 'm_H2O,mix', of('waterInBatch').minus(setFree(waterPerCatalyst, M_WATER))),
    own('waterOfAcid', 'm_H2O,a', rest(after('acid'), neutralisingAssay)),
    own('methanolUpper', 'm_M,up', after('methanolLeft').minus(after('methanolLower')), bySite),
    own('esterLower', 'm_E,low', of('ester').minus(after('ester')), bySite),
    ...totals(reactionFlows(route)), ...totals(settlingFlows(route)),
  ];
}

/** Every mass and volume of the balance that is not in the sheet of a lot already. */
export const balanceFormulas = (): readonly Quantity[] => [
  ...oilParts(), ...([1, 2, 3] as const).flatMap(pass), ...pretreated(), ...totals(retestFlows(1)), ...base('direct'), ...base('twoStep'),
];
