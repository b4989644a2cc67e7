import type { ResultCell } from '../../exchange/results/row.js';
import { numberCell, textCell } from '../../exchange/results/row.js';
import type { WorkedRow } from '../../exchange/table/worked-rows.js';
import type { enRows } from '../../locales/en-rows.js';
import type { enTriage } from '../../locales/en-triage.js';
import type { Widened } from '../../locales/en.js';

/** The words of a row of results. */
export interface ResultTongue {
  readonly words: Widened<typeof enRows>;
  readonly states: Widened<typeof enTriage>['shortStates'];
  /** Why something of the row is not known, in a sentence; empty where all is. */
  readonly why: (row: WorkedRow) => string;
}

const COLUMNS = ['row', 'name', 'freeFattyAcid', 'plusMinus', 'acidValue', 'state', 'route', 'catalyst', 'methanol', 'problem'] as const;

/** The headings of results. */
export const resultHeadings = ({ words }: ResultTongue): readonly ResultCell[] => COLUMNS.map((column) => textCell(words.heads[column]));

/** A row of results as cells, figures with a point. */
export function resultCells(row: WorkedRow, { words, states, why }: ResultTongue): readonly ResultCell[] {
  return [
    numberCell(String(row.row)), textCell(row.name), numberCell(row.freeFattyAcid), numberCell(row.plusMinus), numberCell(row.acidValue),
    textCell(row.state && states[row.state]), textCell(row.route && words.routes[row.route]), numberCell(row.catalyst), numberCell(row.methanol), textCell(why(row)),
  ];
}
