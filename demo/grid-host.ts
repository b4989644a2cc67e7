import type { TabulatorFull } from 'tabulator-tables';
import type { SheetBlock, SheetHost, SheetSelection } from 'esterway/sheets';

// The port to the grid of this page. Another sheet needs the same five answers: what is selected, what a block would be written over,
// writing it, telling of a new selection, and whether the sheet can take it back.

/** Columns are called as in any sheet; each is the field of its own letters. */
export const columnLetters = (count: number): readonly string[] => Array.from({ length: count }, (_, i) => (i < 26 ? '' : String.fromCharCode(64 + Math.floor(i / 26))) + String.fromCharCode(65 + (i % 26)));

/** One step back: cells and what was in them. */
type Step = readonly { readonly row: number; readonly field: string; readonly text: string }[];

export interface GridHost extends SheetHost {
  /** Takes the last block back; false where there is none. */
  takeBack(): boolean;
}

/** @param sheet what the sheet is called */
export function gridHost(grid: TabulatorFull, sheet: string, columns: readonly string[]): GridHost {
  const steps: Step[] = [];
  /** What this port wrote itself is no news. */
  let writing = false;
  const text = (row: number, field: string): string => String(grid.getRows()[row]?.getData()[field] ?? '');
  const selected = (): SheetSelection | undefined => {
    const [range] = grid.getRanges();
    if (!range) return undefined;
    const fields = range.getColumns().map((column) => column.getField()).filter((field) => columns.includes(field));
    const rows = range.getRows().map((row) => Number(row.getData()['id']) - 1);
    if (!fields.length || !rows.length) return undefined;
    return { address: `${sheet}!${fields[0]}${rows[0]! + 1}:${fields.at(-1)}${rows.at(-1)! + 1}`, cells: rows.map((row) => fields.map((field) => text(row, field))) };
  };
  /** The cells that a block beside a selection would fill. */
  const targets = (block: SheetBlock, beside: SheetSelection): readonly { readonly row: number; readonly field: string; readonly text: string }[] => {
    const [, top = '1', last = ''] = /!\w+?(\d+):([A-Z]+)\d+$/.exec(beside.address) ?? [];
    const first = columns.indexOf(last) + 1;
    const width = block.reduce((most, row) => Math.max(most, row.length), 0);
    if (first + width > columns.length) throw new Error(`The sheet ends at column ${columns.at(-1)}, and the results need ${width} columns beside ${last}. Select fewer columns.`);
    return block.flatMap((row, i) => row.flatMap((cell, j) => (cell === null ? [] : [{ row: Number(top) - 1 + i, field: columns[first + j] ?? '', text: cell }])));
  };
  const put = (cells: Step): Step => {
    writing = true;
    const before = cells.map(({ row, field }) => ({ row, field, text: text(row, field) }));
    const changed = new Map<number, Record<string, string>>();
    for (const { row, field, text: cell } of cells) changed.set(row, { ...changed.get(row), [field]: cell });
    const rows = grid.getRows();
    for (const [row, fields] of changed) void rows[row]?.update(fields);
    writing = false;
    return before;
  };
  return {
    undo: 'one-step',
    read: () => Promise.resolve(selected()),
    wouldOverwrite(block, beside) {
      const filled = targets(block, beside).filter(({ row, field }) => text(row, field) !== '');
      return Promise.resolve({ count: filled.length, first: filled.slice(0, 3).map(({ row, field }) => ({ address: `${field}${row + 1}`, text: text(row, field) })) });
    },
    write(block, beside, over) {
      const cells = targets(block, beside).filter(({ row, field }) => over === 'replace' || text(row, field) === '');
      steps.push(put(cells));
      const rows = cells.map(({ row }) => row + 1);
      const fields = cells.map(({ field }) => field);
      return Promise.resolve({ address: cells.length ? `${sheet}!${fields[0]}${Math.min(...rows)}:${fields.at(-1)}${Math.max(...rows)}` : sheet, cells: cells.length });
    },
    follow(listener) {
      const heard = (): void => {
        const selection = selected();
        if (!writing && selection) listener(selection);
      };
      const events = ['rangeAdded', 'rangeChanged'] as const;
      for (const event of events) grid.on(event, heard);
      return () => {
        for (const event of events) grid.off(event, heard);
      };
    },
    takeBack() {
      const step = steps.pop();
      if (step) put(step);
      return step !== undefined;
    },
  };
}
