import { lotFormulas } from '../chemistry/lot-formulas.js';
import type { LotRuns } from '../chemistry/lot-formulas.js';
import { Plan } from '../formula/plan.js';
import type { Findings, Standing } from '../formula/plan.js';
import type { Sheet } from '../formula/sheet.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { LotGivens } from './givens.js';
import { DECIDED, fieldOf } from './keys.js';
import { runPlan } from './runs.js';

/** A lot under evaluation: its formulas, what was given, and what has been found. */
export interface LotRun {
  readonly runs: LotRuns;
  readonly sheet: Sheet;
  readonly plan: Plan;
  readonly givens: LotGivens;
  readonly findings: Findings;
}

/** Puts a lot's givens to the plan for the wanted quantities; all of them when none are named, and those that no lot has left out. */
export function lotRun(entry: LotEntry, site: SiteProfile, wanted?: readonly string[]): LotRun {
  const runs = { lot: runPlan(entry.runs), retest: runPlan(entry.retestRuns), titrant: runPlan(site.titrantRuns ?? []) };
  const sheet = lotFormulas(runs);
  const plan = planFor(sheet, wanted && [...wanted, ...DECIDING].filter((key) => sheet.quantities.has(key)));
  const givens = new LotGivens(sheet, entry, site);
  return { runs, sheet, plan, givens, findings: plan.evaluate(givens) };
}

/** A list of lots that all have the same fields: what rests on the site alone is worked out once for them. */
export class LotList {
  readonly #plans = new Map<Sheet, Plan>();
  readonly #standing = new Map<string, { readonly of: Plan; readonly standing: Standing }>();

  /** @param wanted as for {@link lotRun} */
  constructor(
    private readonly site: SiteProfile,
    private readonly wanted: readonly string[],
  ) {}

  run(entry: LotEntry): LotRun {
    const { site, wanted } = this;
    const runs = { lot: runPlan(entry.runs), retest: runPlan(entry.retestRuns), titrant: runPlan(site.titrantRuns ?? []) };
    const sheet = lotFormulas(runs);
    let plan = this.#plans.get(sheet);
    if (!plan) this.#plans.set(sheet, (plan = planFor(sheet, [...wanted, ...DECIDING].filter((key) => sheet.quantities.has(key)))));
    const givens = new LotGivens(sheet, entry, site);
    const id = `${Object.keys(entry.figures).sort().join()}|${JSON.stringify(entry.options)}`;
    let known = this.#standing.get(id);
    // the same fields with another number of runs have other formulas
    if (known?.of !== plan) this.#standing.set(id, (known = { of: plan, standing: plan.standing(varyingIn(entry), varyingChoicesIn(entry)) }));
    return { runs, sheet, plan, givens, findings: plan.evaluateOneOfMany(givens, known.standing) };
  }
}

const varyingIn = (entry: LotEntry) => (input: string): boolean => {
  const field = fieldOf(input);
  return field in entry.figures || /^(?:retest\.)?run\d/.test(field);
};

const varyingChoicesIn = (entry: LotEntry) => (choice: string): boolean => DECIDED.has(choice) || (choice === 'blankPolicy' && 'blank' in entry.figures);

/** What choices are decided on although no formula names it. */
const DECIDING = ['runRange', 'criticalRange', 'retest.runRange', 'retest.criticalRange'];

/** What the number of passes is decided on. */
const PASSES_DECIDED_ON = ['pretreatmentTarget', 'pass1.ffaLeft.slow', 'pass2.ffaLeft.slow'];

const plans = new WeakMap<Sheet, Map<string, Plan>>();

function planFor(sheet: Sheet, wanted: readonly string[] | undefined): Plan {
  let ofSheet = plans.get(sheet);
  if (!ofSheet) plans.set(sheet, (ofSheet = new Map()));
  const id = wanted ? wanted.join() : '*';
  let plan = ofSheet.get(id);
  if (!plan) {
    plan = new Plan(sheet, wanted ?? sheet.quantities.keys());
    if (wanted && plan.choices.includes('passes')) plan = new Plan(sheet, [...wanted, ...PASSES_DECIDED_ON]);
    ofSheet.set(id, plan);
  }
  return plan;
}
