import { constant, greatest, least, whereBelow } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import type { Quantity } from '../formula/quantity.js';
import { gram, milligramPerGram, millilitre, percent } from '../formula/units.js';
import { METHOD_KOH, acidValueLike } from './acidity.js';
import { buretteCapacity } from './equipment.js';
import { CD_3D_PORTIONS, D664_PORTIONS, D974_PORTIONS, ISO_660, PRACTICE } from './sources.js';
import { sampleDensity, titrantConcentration } from './titration.js';

// How much oil to weigh in for an expected acid value, and the titre that follows.

/** The method whose table of portions holds. */
export const portionTable = choice('portionTable', ['iso-660', 'd664', 'd974']);

/** What the oil is expected to have, from its source's last lots or by its looks. */
export const expectedAcidValue = quantity({
  key: 'expectedAcidValue', symbol: 'AV_exp', ...acidValueLike,
  limits: [limit('above', '0', 'not-above-zero'), limit('atMost', '935', 'out-of-range')],
});

/** A line of a table: up to this acid value, mg/g, a portion of this mass, g; the end itself belongs to the next line, where not `included`. The last line has no end. */
export type PortionLine = readonly [portion: string, end?: string, included?: 'included'];

/** Portion by acid value; ISO 660, table 1, and AOCS Cd 3d-63 have the same masses. */
export const PORTIONS = {
  'iso-660': [['20', '1'], ['10', '4'], ['2.5', '15'], ['0.5', '75'], ['0.1']],
  'd664': [['20', '1'], ['5', '5'], ['1', '20'], ['0.25', '100'], ['0.1']],
  'd974': [['20', '3', 'included'], ['2', '25', 'included'], ['0.2']],
} as const satisfies Readonly<Record<string, readonly PortionLine[]>>;

function byTable([line, ...rest]: readonly PortionLine[]): Expression {
  if (!line) throw new RangeError('a table ends with a line for all that is left');
  const [mass, end, included] = line;
  const portion = constant(mass, gram);
  if (end === undefined) return portion;
  const bound = constant(end, milligramPerGram);
  return included ? whereBelow(bound, expectedAcidValue, byTable(rest), portion) : whereBelow(expectedAcidValue, bound, portion, byTable(rest));
}

const planned = (name: string, symbol: string, is: Expression, cites = [ISO_660]): Quantity =>
  quantity({ key: `planned.${name}`, symbol, unit: gram, digits: { significant: 3 }, cites, is });

export const tablePortion = planned('tablePortion', 'm_table', portionTable.of({
  'iso-660': byTable(PORTIONS['iso-660']), d664: byTable(PORTIONS.d664), d974: byTable(PORTIONS.d974),
}), [CD_3D_PORTIONS, D664_PORTIONS, D974_PORTIONS]);

/** The titre is to lie between these shares of the burette: enough drops to count, and room for a sourer oil. */
const part = (share: string): Expression => constant(share, percent, { source: PRACTICE }).times(buretteCapacity).in(millilitre);
/** The portion that takes so much titrant: m = 56.1 · c · V / AV. */
const takes = (titre: Expression): Expression => METHOD_KOH.times(titrantConcentration).times(titre).per(expectedAcidValue).in(gram);

export const leastPortion = planned('leastPortion', 'm_least', takes(part('20')), [ISO_660, PRACTICE]);
export const mostPortion = planned('mostPortion', 'm_most', takes(part('80')), [ISO_660, PRACTICE]);
export const portion = planned('portion', 'm_plan', least(greatest(tablePortion, leastPortion), mostPortion));
/** The same portion by volume, for those who measure it out. */
export const portionVolume = quantity({
  key: 'planned.portionVolume', symbol: 'V_s,plan', unit: millilitre, digits: { significant: 3 }, cites: [ISO_660], is: portion.per(sampleDensity),
});
export const plannedTitre = quantity({
  key: 'planned.titre', symbol: 'V_plan', unit: millilitre, digits: { decimals: 1 }, cites: [ISO_660],
  is: expectedAcidValue.times(portion).per(METHOD_KOH.times(titrantConcentration)).in(millilitre),
});
