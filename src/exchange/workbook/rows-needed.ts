import { walk } from '../../formula/expression.js';
import { namesIn } from '../../formula/sheet.js';
import type { Sheet } from '../../formula/sheet.js';
import { optionRestsOn } from './option-formula.js';

/**
 * The quantities and choices that the wanted ones may rest on, whatever option is taken, each after those it rests
 * on. Lots with other runs have other formulas under the same keys: all of them count.
 */
export function rowsNeeded(sheets: readonly Sheet[], wanted: Iterable<string>): readonly string[] {
  const restsOn = (key: string): ReadonlySet<string> => new Set(sheets.flatMap((sheet) => restsOnIn(sheet, key)));
  const known = (key: string): boolean => sheets.some(({ quantities, choices }) => quantities.has(key) || choices.has(key));
  const done = new Set<string>();
  const begun = new Set<string>();
  const visit = (key: string): void => {
    if (begun.has(key) || !known(key)) return;
    begun.add(key);
    for (const other of restsOn(key)) visit(other);
    done.add(key);
  };
  for (const key of wanted) visit(key);
  return [...done];
}

function restsOnIn(sheet: Sheet, key: string): readonly string[] {
  if (sheet.choices.has(key)) return optionRestsOn(key);
  const quantity = sheet.quantities.get(key);
  return quantity ? [...choicesIn(sheet, key), ...namesIn(quantity)] : [];
}

/** The choices that a formula turns on. */
export function choicesIn(sheet: Sheet, key: string): readonly string[] {
  const by = new Set<string>();
  const { is } = sheet.quantity(key);
  if (is) walk(is, (node) => node.op === 'choice' && by.add(node.by));
  return [...by];
}
