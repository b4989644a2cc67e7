import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cellFormula } from '../../src/formula/cell-formula.js';
import { Decimal } from '../../src/formula/decimal.js';
import { sensitivities } from '../../src/formula/derivative.js';
import type { Expression} from '../../src/formula/expression.js';
import { constant } from '../../src/formula/expression.js';
import { Plan } from '../../src/formula/plan.js';
import type { Findings } from '../../src/formula/plan.js';
import { Quantity, quantity } from '../../src/formula/quantity.js';
import { isKnown, Missing } from '../../src/formula/reading.js';
import { Sheet, SheetFault } from '../../src/formula/sheet.js';
import { figuresMath, generalMath } from '../../src/formula/working-mathml.js';
import { figuresText, generalText } from '../../src/formula/working-text.js';
import { given, onlyDigits } from './given.js';
import { countLeaves, randomSheet, withLeaf } from './random-sheet.js';
import type { RandomSheet } from './random-sheet.js';
import { Wide, readCell, readMath, readText } from './read-back.js';
import type { Meaning } from './read-back.js';
import { RoundingOf } from './rounding.js';

// One formula, five readings: whatever expression is drawn, they must tell the same figure.

const RUNS = { numRuns: 300, seed: 20_240_611 } as const;

interface Evaluated extends RandomSheet {
  readonly sheet: Sheet;
  readonly plan: Plan;
  readonly findings: Findings;
  readonly rounding: RoundingOf;
  /** The results that have a figure of which at least some digits are sure. */
  readonly sure: readonly string[];
}

function evaluate(drawn: RandomSheet): Evaluated {
  const { entries, results, values, options, symbols } = drawn;
  const sheet = Sheet.define(entries);
  const plan = new Plan(sheet, results);
  const findings = plan.evaluate(given(values, options));
  const rounding = new RoundingOf(sheet, findings);
  const sure = results.filter((key) => isKnown(findings.outcome(key)) && Number.isFinite(rounding.quantity(key).error));
  return { entries, results, values, options, symbols, sheet, plan, findings, rounding, sure };
}

const figureOf = (findings: Findings, key: string): Wide => new Wide(findings.outcome(key) as Decimal);

/** Fails unless `read` is the figure of the result, to all digits that rounding leaves sure. */
function agree({ findings, rounding }: Evaluated, key: string, read: Wide | undefined, written: string): void {
  const value = figureOf(findings, key);
  const { error } = rounding.quantity(key);
  const off = read?.minus(value).abs();
  if (!off || off.gt(error)) expect.fail(`${key} is ${value.toString()}, but ${written} gives ${String(read)}; rounding explains ${error}`);
}

/** Runs a check over the random sheets and counts the figures it compared, for a check that skips all proves nothing. */
function overSheets(check: (evaluated: Evaluated) => number): number {
  let compared = 0;
  fc.assert(
    fc.property(randomSheet, (drawn) => {
      compared += check(evaluate(drawn));
    }),
    RUNS,
  );
  return compared;
}

const address = (key: string): string => key.replace('input', 'B').replace('result', 'C').replace('route', 'D1').replace('grade', 'D2');

describe('the interpreters agree on random sheets', { timeout: 60_000 }, () => {
  it('leaves nearly every figure sure to thirty digits, so that agreement means something', () => {
    let sharp = 0;
    const sure = overSheets(({ sure, findings, rounding }) => {
      sharp += sure.filter((key) => figureOf(findings, key).abs().times(1e-30).gte(rounding.quantity(key).error)).length;
      return sure.length;
    });
    expect(sure).toBeGreaterThan(2 * RUNS.numRuns);
    expect(sharp / sure).toBeGreaterThan(0.97);
  });

  it('evaluation and cell formulas, each cell computed from the cells before it', () => {
    const compared = overSheets((evaluated) => {
      const { sheet, sure, results, values, options, findings } = evaluated;
      const cells: Record<string, Meaning> = {};
      for (const [key, option] of Object.entries(options)) cells[address(key)] = option;
      for (const [key, text] of Object.entries(values)) cells[address(key)] = new Wide(text);
      for (const key of results) {
        const formula = cellFormula(sheet.quantity(key).is!, sheet, address);
        if (!sure.includes(key)) {
          // a comparison can rest on a figure of which few digits are sure, and still be sure itself
          if (isKnown(findings.outcome(key))) cells[address(key)] = figureOf(findings, key);
          continue;
        }
        const cell = readCell(formula, cells);
        agree(evaluated, key, cell, `=${formula}`);
        cells[address(key)] = cell!;
      }
      return sure.length;
    });
    expect(compared).toBeGreaterThan(2 * RUNS.numRuns);
  });

  it('evaluation and the line of text, with figures and with symbols', () => {
    const compared = overSheets((evaluated) => {
      const { sheet, sure, findings } = evaluated;
      for (const key of sure) {
        const asked = [sheet.quantity(key), sheet, findings, onlyDigits] as const;
        const figures = figuresText(...asked);
        agree(evaluated, key, readText(figures, {}), figures);
        const general = generalText(...asked);
        agree(evaluated, key, readText(general, meanings(evaluated)), general);
      }
      return sure.length;
    });
    expect(compared).toBeGreaterThan(2 * RUNS.numRuns);
  });

  it('evaluation and MathML, with figures and with symbols', () => {
    const compared = overSheets((evaluated) => {
      const { sheet, sure, findings } = evaluated;
      for (const key of sure) {
        const asked = [sheet.quantity(key), sheet, findings, onlyDigits] as const;
        const figures = figuresMath(...asked);
        agree(evaluated, key, readMath(figures, {}), JSON.stringify(figures));
        const general = generalMath(...asked);
        agree(evaluated, key, readMath(general, meanings(evaluated)), JSON.stringify(general));
      }
      return sure.length;
    });
    expect(compared).toBeGreaterThan(2 * RUNS.numRuns);
  });

  it('derivatives and difference quotients', () => {
    const STEP = new Decimal('1e-12');
    const compared = overSheets(({ plan, sure, findings, rounding, values, options, sheet }) => {
      let count = 0;
      for (const key of sure) {
        const { error, corner } = rounding.quantity(key);
        if (corner < 1e-6) continue; // no derivative at a corner of least, greatest or a threshold
        const found = sensitivities(plan, findings, key) as ReadonlyMap<string, Decimal>;
        expect([...found.keys()].every((input) => !sheet.quantity(input).is)).toBe(true);
        const cone = new Plan(sheet, [key]);
        for (const input of Object.keys(values)) {
          const at = new Decimal(values[input]!);
          const step = at.isZero() ? STEP : at.abs().times(STEP);
          const shifted = (to: Decimal): Decimal => {
            const outcome = cone.evaluate(given({ ...values, [input]: to.toString() }, options)).outcome(key);
            if (!isKnown(outcome)) expect.fail(`${key} is not known a step beside ${input} = ${at.toString()}`);
            return outcome;
          };
          const exact = found.get(input) ?? new Decimal(0);
          const quotient = shifted(at.plus(step)).minus(shifted(at.minus(step))).div(step.times(2));
          const size = (findings.outcome(key) as Decimal).div(step).abs();
          const tolerance = exact.abs().times(1e-9).plus(new Decimal(error).div(step).times(10)).plus(size.times(1e-28));
          if (quotient.minus(exact).abs().gt(tolerance)) {
            expect.fail(`d ${key} / d ${input} is ${exact.toString()}, but the difference quotient is ${quotient.toString()}`);
          }
          count++;
        }
      }
      return count;
    });
    expect(compared).toBeGreaterThan(5 * RUNS.numRuns);
  });

  it('sensitivities and gaps: without an input that a figure moves with, that input is named as missing', () => {
    const compared = overSheets(({ plan, sure, findings, values, options }) => {
      let count = 0;
      for (const key of sure) {
        const inputs = [...(sensitivities(plan, findings, key) as ReadonlyMap<string, Decimal>).keys()];
        for (const input of inputs) {
          const outcome = plan.evaluate(given({ ...values, [input]: new Missing([input]) }, options)).outcome(key);
          expect(outcome).toEqual(new Missing([input]));
          count++;
        }
      }
      return count;
    });
    expect(compared).toBeGreaterThan(2 * RUNS.numRuns);
  });
});

/** Every symbol of a sheet with what it stands for. */
function meanings({ sheet, findings, symbols }: Evaluated): Record<string, Wide> {
  const names: Record<string, Wide> = {};
  for (const [symbol, text] of Object.entries(symbols)) names[symbol] = new Wide(text);
  for (const [key, { symbol }] of sheet.quantities) {
    const outcome = findings.outcome(key);
    if (isKnown(outcome)) names[symbol] = new Wide(outcome);
  }
  return names;
}

describe('units of random sheets', { timeout: 60_000 }, () => {
  it('refuses a sheet when the unit of one leaf is a thousand times as large', () => {
    let changed = 0;
    fc.assert(
      fc.property(randomSheet, fc.nat(), (drawn, where) => {
        const results = drawn.entries.filter((entry): entry is Quantity => entry instanceof Quantity && entry.is !== undefined);
        const victim = results[where % results.length]!;
        const leaves = countLeaves(victim.is!);
        if (!leaves) return;
        const beside: Quantity[] = [];
        const is = withLeaf(victim.is!, where % leaves, (leaf) => {
          changed++;
          return scaledLeaf(leaf, drawn, beside);
        });
        const entries = drawn.entries.map((entry) => (entry === victim ? quantity({ ...victim, is }) : entry));
        expect(() => Sheet.define([...entries, ...beside])).toThrow(SheetFault);
        // with the leaf back in its place, the rebuilt formula balances
        const same = withLeaf(victim.is!, -1, (leaf) => leaf);
        expect(() => Sheet.define(drawn.entries.map((entry) => (entry === victim ? quantity({ ...victim, is: same }) : entry)))).not.toThrow();
      }),
      RUNS,
    );
    expect(changed).toBeGreaterThan(0.9 * RUNS.numRuns);
  });

  it('refuses a sheet when the unit stated for one result is a thousand times as large', () => {
    fc.assert(
      fc.property(randomSheet, fc.nat(), (drawn, where) => {
        const victim = drawn.results[where % drawn.results.length]!;
        const entries = drawn.entries.map((entry) =>
          entry instanceof Quantity && entry.key === victim ? quantity({ ...entry, is: entry.is!, unit: entry.unit.scaled('1000', 'k') }) : entry,
        );
        expect(() => Sheet.define(entries)).toThrow(SheetFault);
      }),
      RUNS,
    );
  });
});

/** The same leaf in a unit a thousand times as large; a named one becomes a quantity of its own. */
function scaledLeaf({ node }: Expression, drawn: RandomSheet, beside: Quantity[]): Expression {
  if (node.op === 'constant') return constant(node.constant.text, node.constant.unit.scaled('1000', 'k'));
  const was = drawn.entries.find((entry): entry is Quantity => entry instanceof Quantity && node.op === 'named' && entry.key === node.key)!;
  const larger = quantity({ key: 'larger', symbol: 'z', unit: was.unit.scaled('1000', 'k') });
  beside.push(larger);
  return larger;
}
