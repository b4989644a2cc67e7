import { constant, named } from '../formula/expression.js';
import { Choice, Quantity, quantity } from '../formula/quantity.js';
import { Sheet } from '../formula/sheet.js';
import { kilogram, mole } from '../formula/units.js';
import * as acceptance from './acceptance.js';
import * as acid from './acidity.js';
import { afterPretreatment } from './after-pretreatment.js';
import * as after from './after-reaction.js';
import { baseCharge, conversion, entrainedEster } from './base-charge.js';
import * as catalystProduct from './catalyst.js';
import * as cost from './cost.js';
import * as esterification from './esterification.js';
import { fat, glycerides, glyceridesBy } from './glycerides.js';
import * as heat from './heat.js';
import { acidity, alkaliPerLitreOfOil } from './lot-acidity.js';
import * as methanol from './methanol.js';
import * as neutralising from './neutralising.js';
import * as oil from './oil.js';
import * as pretreatment from './pretreatment.js';
import * as prices from './prices.js';
import * as productCheck from './product-check.js';
import * as dispensing from './dispensing.js';
import * as equipment from './equipment.js';
import * as replicate from './replicates.js';
import { titrationRun } from './run.js';
import type { TitrationRun } from './run.js';
import * as settlement from './settlement.js';
import * as standard from './standardisation.js';
import * as site from './site-limits.js';
import { STOICHIOMETRY } from './sources.js';
import * as titration from './titration.js';
import * as titrationPlan from './titration-plan.js';

/** How many runs a titration has, and which of them count (by index from 0). */
export interface RunPlan {
  readonly runs: number;
  readonly counted: readonly number[];
}

/** The runs of the titrations that a lot rests on: of the oil as it came, after pretreatment, and of the titrant. */
export interface LotRuns {
  readonly lot: RunPlan;
  readonly retest: RunPlan;
  readonly titrant: RunPlan;
}

/** Which titration: that of the oil as it came, that after pretreatment, or the standardisation of the titrant. */
export type RunPrefix = '' | 'retest.' | 'titrant.';

/** Key of a quantity of a run: `run1.titre`, `retest.run2.buretteEnd`; runs count from 1. */
export const runKey = (prefix: RunPrefix, index: number, name: string): string => `${prefix}run${index + 1}.${name}`;

/** Every formula of a lot with the given runs. The same runs give the same sheet, built once. */
export function lotFormulas(of: LotRuns): Sheet {
  const id = [of.lot, of.retest, of.titrant].map(({ runs, counted }) => `${runs}:${counted.join()}`).join('|');
  let sheet = sheets.get(id);
  if (!sheet) {
    if (sheets.size >= MOST_SHEETS) sheets.clear();
    sheets.set(id, (sheet = build(of)));
  }
  return sheet;
}

/**
 * Adds formulas that come with a part fetched by itself; they stand in every sheet from then on. What is read without asking
 * for them stays as it is.
 */
export function addFormulas(group: () => readonly Quantity[]): void {
  if (added.has(group)) return;
  added.add(group);
  sheets.clear();
}

const added = new Set<() => readonly Quantity[]>();
const sheets = new Map<string, Sheet>();
/** Far more combinations of runs than a site meets; a bound for pages that stay open for months. */
const MOST_SHEETS = 64;

function build({ lot, retest, titrant }: LotRuns): Sheet {
  const titrated = runsOf('', lot);
  const retitrated = runsOf('retest.', retest);
  const asItCame = acidity('', titrated.result);
  const afterAcidStep = acidity('retest.', retitrated.result);
  const fats = glycerides(asItCame.acidContent);

  const acidAmount = quantity({
    key: 'acidAmount', symbol: 'n_acid', unit: mole, cites: [STOICHIOMETRY], is: asItCame.acidContent.times(oil.oilMass).in(mole),
  });
  const direct = baseCharge('direct', {
    mass: oil.oilMass,
    acid: acidAmount,
    sulfuricAcid: constant('0', mole),
    water: oil.waterContent.times(oil.oilMass).in(kilogram),
    ester: constant('0', kilogram),
  }, fats);
  const first = pretreatment.pretreatmentPass(1, acidAmount, fats, undefined);
  const second = pretreatment.pretreatmentPass(2, acidAmount, fats, first);
  const third = pretreatment.pretreatmentPass(3, acidAmount, fats, second);
  const pretreated = afterPretreatment([first, second, third], acidAmount, afterAcidStep.acidContent);
  const twoStep = baseCharge('twoStep', pretreated.feed, fats);

  return Sheet.define([
    ...members(titration), ...members(acid), ...members(oil), ...members(catalystProduct), ...members(methanol),
    ...members(esterification), ...members(pretreatment), ...members(site), ...members(equipment), ...members(replicate), ...members(standard), ...members(titrationPlan), ...members(dispensing),
    ...members(neutralising), ...members(after), ...members(productCheck), ...members(heat), ...members(prices), ...members(cost), ...members(acceptance), ...members(settlement), ...settlement.settlement(asItCame.freeFattyAcid),
    ...after.afterReaction('direct', constant('0', mole)), ...after.afterReaction('twoStep', named('pretreated.methanolLeft')),
    ...(['direct', 'twoStep'] as const).flatMap(heat.methoxideHeat), ...([1, 2, 3] as const).flatMap(heat.sulfuricAcidHeat), ...(['direct', 'twoStep'] as const).flatMap(cost.routeCost),
    ...titrated.all, ...retitrated.all, ...standardisation(titrant), ...asItCame.all, ...afterAcidStep.all, alkaliPerLitreOfOil(asItCame.acidContent),
    glyceridesBy, fat, ...fats.all, conversion, entrainedEster, acidAmount,
    ...direct, ...([1, 2, 3] as const).flatMap(dispensing.dispensedPass), ...(['direct', 'twoStep'] as const).flatMap(dispensing.dispensedBase), ...first.all, ...second.all, ...third.all, ...pretreated.all, ...twoStep, site.blendOil(asItCame.freeFattyAcid),
    ...[...added].flatMap((group) => group()),
  ]);
}

/** A titration that has not begun still names its first run, so that what is missing can be said. */
const eachRun = <Run>(prefix: RunPrefix, plan: RunPlan, make: (prefix: string, mark: string) => Run): { runs: Run[]; counted: Run[] } => {
  const letter = { '': '', 'retest.': 'r', 'titrant.': 'c' }[prefix];
  const runs = Array.from({ length: Math.max(1, plan.runs) }, (_, i) => make(runKey(prefix, i, ''), `${letter}${i + 1}`));
  const counted = runs.filter((_, index) => plan.counted.includes(index));
  return { runs, counted: counted.length ? counted : runs.slice(0, 1) };
};

function runsOf(prefix: '' | 'retest.', plan: RunPlan): { result: Quantity; all: (Quantity | Choice)[] } {
  const { runs, counted } = eachRun<TitrationRun>(prefix, plan, titrationRun);
  const { result, all } = replicate.replicates(prefix, counted.map((run) => run.acidContent));
  return { result, all: [...runs.flatMap((run) => run.all), ...all] };
}

function standardisation(plan: RunPlan): Quantity[] {
  const { runs, counted } = eachRun('titrant.', plan, standard.standardisationRun);
  return [...runs.flatMap((run) => run.all), ...standard.standardised(counted)];
}

/** The quantities and choices that a module exports, singly or as a record of them. */
function members(module: Readonly<Record<string, unknown>>): (Quantity | Choice)[] {
  return Object.values(module).flatMap((value) =>
    isEntry(value) ? [value] : typeof value === 'object' && value !== null ? Object.values(value).filter(isEntry) : [],
  );
}

const isEntry = (value: unknown): value is Quantity | Choice => value instanceof Quantity || value instanceof Choice;
