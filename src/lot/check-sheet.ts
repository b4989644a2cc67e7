import type { RouteName } from '../chemistry/route-name.js';
import { directCharge, twoStepCharge } from '../decision/charge.js';
import { walk } from '../formula/expression.js';
import type { Constant } from '../formula/expression.js';
import type { Findings } from '../formula/plan.js';
import { Missing, isKnown } from '../formula/reading.js';
import { figuresMath } from '../formula/working-mathml.js';
import type { MathNode } from '../formula/working-mathml.js';
import { figuresText } from '../formula/working-text.js';
import type { WriteFigure } from '../formula/working-text.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { lotRun } from './lot-run.js';
import { working } from './working.js';
import type { Working } from './working.js';

/** What a second person needs to work a charge out by hand. */
export interface CheckSheet {
  /** Figures to start from: what was typed, what the site or a method sets, what is predicted. */
  readonly given: readonly Working[];
  /** Named constants of the formulas. */
  readonly constants: readonly Constant[];
  /** On the way from the one to the other, each after what it rests on. */
  readonly steps: readonly Working[];
  /** Results to work out: acid value, FFA, every amount of the charge. Those not known yet are left out. */
  readonly amounts: readonly CheckedAmount[];
}

/** An amount to work out, and its formula with the figures put in: but for those that are to be worked out on the same sheet. */
export interface CheckedAmount {
  readonly working: Working;
  readonly figures: { readonly text: string; readonly math: MathNode };
}

/** What the acid step is predicted to leave is no sum for a pocket calculator. */
const PREDICTED = /^pretreated\.(acidLeft|methanolLeft|waterLeft)|^pass\d\.acidLeft/;

/** @param write how figures are written, for the page's language */
export function checkSheet(entry: LotEntry, site: SiteProfile, route: RouteName, write: WriteFigure): CheckSheet {
  const { sheet, plan, findings } = lotRun(entry, site);
  const opened = new Map<string, Working>();
  const open = (key: string): Working => {
    let found = opened.get(key);
    if (!found) opened.set(key, (found = working(entry, site, key, write)));
    return found;
  };
  const computed = (key: string): boolean => {
    const { formula, result, rests } = open(key);
    // a given figure handed on under another name is nothing to work out
    return formula !== undefined && !PREDICTED.test(key) && (formula.figures.text !== result || rests.some(computed));
  };
  const wanted = amountsOf(route, route === 'twoStep' ? Number(findings.option('passes')) || 1 : 0).filter(
    (key) => sheet.quantities.has(key) && isKnown(findings.outcome(key)) && computed(key),
  );
  const reached = new Set<string>();
  const reach = (key: string): void => {
    if (reached.has(key)) return;
    reached.add(key);
    if (computed(key)) open(key).rests.forEach(reach);
  };
  wanted.forEach(reach);
  const rest = plan.order.filter((key) => reached.has(key) && !wanted.includes(key));
  const steps = rest.filter((key) => computed(key) && open(key).formula?.general.text !== open(key).symbol.text);
  const shown = [...steps, ...wanted];
  const unseen: Findings = {
    outcome: (key) => (wanted.includes(key) ? new Missing([key]) : findings.outcome(key)), option: (key) => findings.option(key), touched: () => findings.touched(),
  };
  const constants = new Map<string, Constant>();
  for (const key of shown) {
    const general = open(key).formula?.general.text ?? '';
    const { is } = sheet.quantity(key);
    if (is) walk(is, ({ op, ...node }) => {
      const constant = op === 'constant' && 'constant' in node ? node.constant : undefined;
      if (constant?.symbol && general.split(/[^\w,]+/).includes(constant.symbol)) constants.set(constant.symbol, constant);
    });
  }
  return {
    given: rest.filter((key) => !computed(key)).map(open),
    constants: [...constants.values()],
    steps: steps.map(open),
    amounts: wanted.map((key) => ({ working: open(key), figures: { text: figuresText(sheet.quantity(key), sheet, unseen, write), math: figuresMath(sheet.quantity(key), sheet, unseen, write) } })),
  };
}

function amountsOf(route: RouteName, passes: number): readonly string[] {
  const charge = route === 'direct' ? directCharge() : twoStepCharge(passes);
  const lines = charge.flatMap(({ lines: all }) => all.flatMap(({ what, mass, volume }) => [
    ...(what === 'catalyst' ? [`${route}.baseProduct`, `${route}.extraProduct`] : []),
    ...[mass, volume].filter((key) => key !== undefined),
    ...(what === 'catalyst' ? [`${route}.catalystPerLitre`, `${route}.catalystPerKilogram`] : []),
  ]));
  return ['acidValue', 'freeFattyAcid', ...(route === 'twoStep' ? ['retest.acidValue', 'retest.freeFattyAcid'] : []), ...lines];
}
