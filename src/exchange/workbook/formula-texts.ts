import { strictCellFormula } from '../../formula/cell-formula.js';
import type { Quantity } from '../../formula/quantity.js';
import type { Sheet } from '../../formula/sheet.js';
import { columnName } from './cells.js';
import { withinLimits } from './figure-formula.js';

/** Stands for the column of a lot; no formula holds it. */
const COLUMN = '\0';

/** The formulas of the computed quantities over the cells of a column. Lots with the same runs share them, so each is written once. */
export class FormulaTexts {
  readonly #written = new Map<Sheet, Map<string, string>>();

  /** @param rowOf the row of a quantity or a choice, from 0 */
  constructor(private readonly rowOf: ReadonlyMap<string, number>) {}

  of({ key, is, limits }: Quantity, sheet: Sheet, column: number): string | undefined {
    if (!is) return undefined;
    let ofSheet = this.#written.get(sheet);
    if (!ofSheet) this.#written.set(sheet, (ofSheet = new Map<string, string>()));
    let written = ofSheet.get(key);
    if (written === undefined) {
      const addressOf = (name: string): string => COLUMN + String((this.rowOf.get(name) ?? 0) + 1);
      ofSheet.set(key, (written = withinLimits(strictCellFormula(is, sheet, addressOf), limits, addressOf)));
    }
    return written.replaceAll(COLUMN, columnName(column));
  }
}
