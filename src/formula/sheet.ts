import { proveUnit } from './balance.js';
import { walk } from './expression.js';
import type { Choice} from './quantity.js';
import { Quantity } from './quantity.js';
import type { Unit } from './unit.js';

/** All faults found in a set of formulas. A programmer's mistake, so it is thrown. */
export class SheetFault extends Error {
  constructor(readonly faults: readonly string[]) {
    super(faults.join('\n'));
  }
}

/** A closed set of quantities and choices: every name known, no cycle, every formula balanced in its units. */
export class Sheet {
  readonly quantities: ReadonlyMap<string, Quantity>;
  readonly choices: ReadonlyMap<string, Choice>;

  private constructor(quantities: Map<string, Quantity>, choices: Map<string, Choice>) {
    this.quantities = quantities;
    this.choices = choices;
  }

  /** @throws SheetFault naming every fault: a name taken twice, an unknown name, a cycle, a unit that does not balance. */
  static define(entries: Iterable<Quantity | Choice>): Sheet {
    const quantities = new Map<string, Quantity>();
    const choices = new Map<string, Choice>();
    const faults: string[] = [];
    for (const entry of entries) {
      if (quantities.get(entry.key) === entry || choices.get(entry.key) === entry) continue;
      if (quantities.has(entry.key) || choices.has(entry.key)) faults.push(`${entry.key}: defined twice`);
      if (entry instanceof Quantity) quantities.set(entry.key, entry);
      else choices.set(entry.key, entry);
    }
    const sheet = new Sheet(quantities, choices);
    faults.push(...unknownNames(sheet), ...cycles(sheet));
    if (!faults.length) faults.push(...unbalanced(sheet));
    if (faults.length) throw new SheetFault(faults);
    return sheet;
  }

  /** Unit of a named quantity, for the interpreters. */
  readonly unitOf = (key: string): Unit | undefined => this.quantities.get(key)?.unit;

  /** @throws SheetFault when there is none. */
  quantity(key: string): Quantity {
    const found = this.quantities.get(key);
    if (!found) throw new SheetFault([`${key}: no such quantity`]);
    return found;
  }
}

/** Keys of the quantities that a quantity's formula and limits name directly. */
export function namesIn(quantity: Quantity): ReadonlySet<string> {
  const names = new Set<string>();
  for (const { bound } of quantity.limits) if (bound instanceof Quantity) names.add(bound.key);
  if (quantity.is) walk(quantity.is, (node) => node.op === 'named' && names.add(node.key));
  return names;
}

/** Keys of the choices that a quantity's formula turns on. */
export function choicesIn({ is }: Quantity): readonly string[] {
  const names = new Set<string>();
  if (is) walk(is, (node) => node.op === 'choice' && names.add(node.by));
  return [...names];
}

function unknownNames(sheet: Sheet): string[] {
  const faults: string[] = [];
  for (const quantity of sheet.quantities.values()) {
    for (const name of namesIn(quantity)) {
      if (!sheet.quantities.has(name)) faults.push(`${quantity.key}: names ${name}, which is not in the sheet`);
    }
    for (const { at } of quantity.limits) {
      if (at !== undefined && !sheet.quantities.has(at)) faults.push(`${quantity.key}: its limit stands at ${at}, which is not in the sheet`);
    }
    if (!quantity.is) continue;
    walk(quantity.is, (node) => {
      if (node.op !== 'choice') return;
      const choice = sheet.choices.get(node.by);
      if (!choice) faults.push(`${quantity.key}: chosen by ${node.by}, which is not in the sheet`);
      else if (Object.keys(node.cases).sort().join() !== [...choice.options].sort().join()) {
        faults.push(`${quantity.key}: its cases are not the options of ${node.by}`);
      }
    });
  }
  return faults;
}

function cycles(sheet: Sheet): string[] {
  const done = new Set<string>();
  const path: string[] = [];
  const faults: string[] = [];
  const visit = (key: string): void => {
    if (done.has(key)) return;
    const quantity = sheet.quantities.get(key);
    if (!quantity) return;
    if (path.includes(key)) {
      faults.push(`a cycle: ${[...path.slice(path.indexOf(key)), key].join(' → ')}`);
      return;
    }
    path.push(key);
    namesIn(quantity).forEach(visit);
    path.pop();
    done.add(key);
  };
  [...sheet.quantities.keys()].forEach(visit);
  return faults;
}

function unbalanced(sheet: Sheet): string[] {
  const faults: string[] = [];
  for (const quantity of sheet.quantities.values()) {
    try {
      if (quantity.is) proveUnit(quantity.is, quantity.unit, sheet.unitOf);
      for (const { bound } of quantity.limits) if (bound instanceof Quantity) proveUnit(bound, quantity.unit, sheet.unitOf);
    } catch (fault) {
      faults.push(`${quantity.key}: ${(fault as Error).message}`);
    }
  }
  return faults;
}
