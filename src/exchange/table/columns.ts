import { TYPED_UNITS } from '../../formula/units.js';
import { columnOf, plainHeading } from './header.js';
import { isFigureKey, isTextKey, runColumn, usualUnit } from './meanings.js';
import type { ColumnKey } from './meanings.js';
import type { Table } from './table.js';

/** What a column is taken for. Without a key it is left alone. */
export interface ColumnUse {
  readonly header: string;
  readonly key?: ColumnKey;
  /** The unit of its figures; none for a text. */
  readonly unit?: string;
}

/** The columns of a table, from left to right. */
export type Columns = readonly ColumnUse[];

/** What a person made of columns, by their headings, kept for the next sheet of the same kind. A key of `''` leaves a column alone. */
export interface ColumnMemory {
  readonly version: 1;
  readonly columns: Readonly<Record<string, { readonly key: string; readonly unit?: string }>>;
}

export const EMPTY_MEMORY: ColumnMemory = { version: 1, columns: {} };

/** What each column is by its heading, and by what was made of the same heading before. A meaning is given to one column only, the first. */
export function recogniseColumns({ header, rows }: Table, memory: ColumnMemory = EMPTY_MEMORY): Columns {
  const width = rows.reduce((most, row) => Math.max(most, row.length), header?.length ?? 0);
  const taken = new Set<string>();
  return Array.from({ length: width }, (_, i): ColumnUse => {
    const heading = header?.[i]?.trim() ?? '';
    const found = heading ? (remembered(heading, memory) ?? columnOf(heading)) : {};
    if (!found.key || taken.has(found.key)) return { header: heading };
    taken.add(found.key);
    return columnUse(heading, found.key, found.unit);
  });
}

/** A column taken for something, in a unit that fits it. */
export function columnUse(header: string, key: ColumnKey | undefined, unit?: string): ColumnUse {
  if (!key) return { header };
  if (isTextKey(key)) return { header, key };
  return { header, key, unit: unit !== undefined && fits(unit, key) ? unit : usualUnit(key) };
}

/** Whether a column of that meaning can be in that unit: a portion by mass or by volume, an amount of oil too. */
function fits(unit: string, key: ColumnKey): boolean {
  const [given, usual] = [TYPED_UNITS.get(unit), TYPED_UNITS.get(usualUnit(key))];
  if (!given || !usual) return false;
  const other = key === 'oilAmount' ? 'L' : key === 'titrantStrength' ? 'g/L' : runColumn(key)?.part === 'sample' ? 'mL' : undefined;
  return given.sameDimension(usual) || (other !== undefined && given.sameDimension(TYPED_UNITS.get(other) ?? usual));
}

/** Adds what a person made of a column to what is kept. */
export function remember(memory: ColumnMemory, { header, key, unit }: ColumnUse): ColumnMemory {
  const name = plainHeading(header);
  if (!name) return memory;
  return { version: 1, columns: { ...memory.columns, [name]: { key: key ?? '', ...(unit !== undefined && { unit }) } } };
}

function remembered(heading: string, { columns }: ColumnMemory): { readonly key?: ColumnKey; readonly unit?: string } | undefined {
  const name = plainHeading(heading);
  const kept = Object.hasOwn(columns, name) ? columns[name] : undefined;
  if (!kept) return undefined;
  if (kept.key === '') return {};
  const known = isTextKey(kept.key) || isFigureKey(kept.key) || runColumn(kept.key) !== undefined;
  // the heading's own unit is nearer than the one of the sheet before
  const { unit = kept.unit } = columnOf(heading);
  return known ? { key: kept.key as ColumnKey, ...(unit !== undefined && { unit }) } : undefined;
}
