import { pricedChoices } from '../chemistry/cost.js';
import { settlementChoices } from '../chemistry/settlement.js';
import { lotFormulas } from '../chemistry/lot-formulas.js';
import type { Unit } from '../formula/unit.js';
import { currencyPerLitre, gramPerLitre, litre } from '../formula/units.js';
import type { KnownKeys } from './check.js';

// The keys of an entry. A figure stands under the key of the quantity it is an input of, but for two
// fields whose unit decides which quantity they give, and for the cells of a run.

/** Prices that may be typed by mass or by volume. */
const TWO_WAY_PRICES = ['oilPrice', 'esterPrice', 'methanolPrice'];

const FIELD_OF: Readonly<Record<string, string>> = {
  weighedOil: 'oilAmount', oilVolumeGiven: 'oilAmount', oilAmountBy: 'oilAmount', oilMass: 'oilAmount', oilVolume: 'oilAmount',
  titrantMolarity: 'titrantStrength', titrantMassStrength: 'titrantStrength', titrantStrengthBy: 'titrantStrength',
  ...Object.fromEntries(TWO_WAY_PRICES.flatMap((price) => ['By', 'ByMass', 'ByVolume'].map((end) => [price + end, price]))),
};
const CELL_OF: Readonly<Record<string, 'sample' | 'start' | 'end'>> = {
  weighedMass: 'sample', sampleVolume: 'sample', sampleMass: 'sample', portion: 'sample', buretteStart: 'start', buretteEnd: 'end',
};

/** Where a run's cells stand: `retest.run2.sample`. */
const RUN_KEY = /^((retest\.|titrant\.)?run(\d+))\.(\w+)$/;

/** The list that a run stands in, of the lot or of the site. */
export type RunList = 'runs' | 'retestRuns' | 'titrantRuns';
const LIST_OF: Readonly<Record<string, RunList>> = { 'retest.': 'retestRuns', 'titrant.': 'titrantRuns' };

/** The field at which a problem with a quantity stands, or where a missing one is typed. */
export function fieldOf(key: string): string {
  const run = RUN_KEY.exec(key);
  if (run) return `${run[1]}.${CELL_OF[run[4] ?? ''] ?? run[4]}`;
  return FIELD_OF[key] ?? key;
}

/** A quantity of a run, taken apart; undefined for any other key. */
export function runCell(key: string): { list: RunList; index: number; cell: 'sample' | 'start' | 'end' } | undefined {
  const run = RUN_KEY.exec(key);
  if (!run) return undefined;
  const [, , prefix = '', number, name = ''] = run;
  const cell = CELL_OF[name];
  return cell && { list: LIST_OF[prefix] ?? 'runs', index: Number(number) - 1, cell };
}

/** The choices that the unit of a figure settles. */
export const OPTION_BY_UNIT: Readonly<Record<string, { readonly field: string; of(unit: Unit): string }>> = {
  oilAmountBy: { field: 'oilAmount', of: (unit) => (unit.sameDimension(litre) ? 'volume' : 'mass') },
  titrantStrengthBy: { field: 'titrantStrength', of: (unit) => (unit.sameDimension(gramPerLitre) ? 'mass' : 'amount') },
  ...Object.fromEntries(TWO_WAY_PRICES.map((field) => [`${field}By`, { field, of: (unit: Unit) => (unit.sameDimension(currencyPerLitre) ? 'volume' : 'mass') }])),
};

/** The choices that are decided on results, not typed. */
const DECIDED: ReadonlySet<string> = new Set([
  'passes', 'baseStepAcidFrom', 'temperatureTaken', 'averageBy', 'retest.averageBy', 'runsAgree', 'retest.runsAgree', ...Object.keys(OPTION_BY_UNIT), ...pricedChoices.map(({ key }) => key), ...settlementChoices.map(({ key }) => key),
]);

const YES_NO = ['yes', 'no'] as const;
const WHEN_ABOVE = ['hold', 'decline'] as const;

/** Keys that an entry or a profile may hold. */
export const KNOWN_KEYS: KnownKeys = knownKeys();

function knownKeys(): KnownKeys {
  const none = { runs: 0, counted: [] };
  const sheet = lotFormulas({ lot: none, retest: none, titrant: none });
  const figures = new Set<string>();
  for (const [key, quantity] of sheet.quantities) if (!quantity.is && !RUN_KEY.test(key)) figures.add(fieldOf(key));
  const options = new Map<string, readonly string[]>([['acidProofEquipment', YES_NO], ['temperatureCorrected', YES_NO], ['runsAreDear', YES_NO], ['takesOneRun', YES_NO], ['takesCertificate', YES_NO], ['waterAbove', WHEN_ABOVE], ['insolublesAbove', WHEN_ABOVE]]);
  for (const [key, { options: known }] of sheet.choices) {
    if (!DECIDED.has(key)) options.set(key, known);
  }
  return { figures, options };
}
