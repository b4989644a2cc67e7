import { cellFormula } from '../formula/cell-formula.js';
import type { AddressOf } from '../formula/cell-formula.js';
import { shownText } from '../formula/digits.js';
import { parts } from '../formula/expression.js';
import type { Expression } from '../formula/expression.js';
import type { Findings } from '../formula/plan.js';
import { isKnown } from '../formula/reading.js';
import type { Sheet } from '../formula/sheet.js';
import type { Source } from '../formula/source.js';
import { figuresMath, generalMath, symbolMath } from '../formula/working-mathml.js';
import type { MathNode } from '../formula/working-mathml.js';
import { figuresText, generalText, settledBranch } from '../formula/working-text.js';
import type { WriteFigure } from '../formula/working-text.js';
import { DEFAULT_FIGURES } from './defaults.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { fieldOf } from './keys.js';
import { lotRun } from './lot-run.js';

/** A figure opened to its formula, for a second person with a calculator. */
export interface Working {
  readonly key: string;
  readonly symbol: { readonly text: string; readonly math: MathNode };
  readonly unit: string;
  /** Undefined for an input. */
  readonly formula?: {
    readonly general: { readonly text: string; readonly math: MathNode };
    readonly figures: { readonly text: string; readonly math: MathNode };
  };
  /** Written by `write`, with its unit; undefined while it is not known. */
  readonly result?: string;
  readonly sources: readonly Source[];
  /** The quantities that the formula names and that took part, to open next. */
  readonly rests: readonly string[];
}

/** A figure as the working shows it: six significant digits, enough to reproduce any rounded result by hand. */
export const workingFigure: WriteFigure = (value, unit) => {
  const text = shownText(value, { significant: 6 });
  const short = text.includes('.') ? text.replace(/\.?0+$/, '') : text;
  return unit.symbol ? `${short} ${unit.symbol}` : short;
};

/**
 * The working of one quantity of a lot.
 *
 * @param write how figures are written, for the page's language
 * @throws SheetFault for a key that no quantity has
 */
export function working(entry: LotEntry, site: SiteProfile, key: string, write: WriteFigure = workingFigure): Working {
  const { sheet, findings, givens } = lotRun(entry, site);
  const quantity = sheet.quantity(key);
  const outcome = findings.outcome(key);
  const touched = new Set(findings.touched());
  const standing = quantity.is || givens.origin(key) !== 'default' ? undefined : DEFAULT_FIGURES[fieldOf(key)];
  return {
    key,
    symbol: { text: quantity.symbol, math: { tag: 'math', content: [symbolMath(quantity.symbol)] } },
    unit: quantity.unit.symbol,
    ...(quantity.is && {
      formula: {
        general: { text: generalText(quantity, sheet, findings, write), math: generalMath(quantity, sheet, findings, write) },
        figures: { text: figuresText(quantity, sheet, findings, write), math: figuresMath(quantity, sheet, findings, write) },
      },
    }),
    ...(isKnown(outcome) && { result: write(outcome, quantity.unit, quantity) }),
    sources: standing ? [standing.source] : quantity.cites,
    rests: quantity.is ? [...new Set(namesTaken(quantity.is, sheet, findings))].filter((name) => touched.has(name)) : [],
  };
}

/** What a formula names on the branches that are taken, in reading order; of a threshold also what it compares. */
function namesTaken({ node }: Expression, sheet: Sheet, findings: Findings): string[] {
  if (node.op === 'named') return [node.key];
  const taken = node.op === 'choice' || node.op === 'threshold' ? settledBranch(node, sheet, findings) : undefined;
  const read = taken ? [...(node.op === 'threshold' ? [node.left, node.right] : []), taken] : parts(node);
  return read.flatMap((part) => namesTaken(part, sheet, findings));
}

/**
 * The formula of a quantity as the text of a spreadsheet cell, over the cells where its inputs stand.
 *
 * @returns undefined for an input
 * @throws SheetFault for a key that no quantity has
 */
export function cellFormulaOf(entry: LotEntry, site: SiteProfile, key: string, addressOf: AddressOf): string | undefined {
  const { sheet } = lotRun(entry, site);
  const { is } = sheet.quantity(key);
  return is && cellFormula(is, sheet, addressOf);
}
