/** What is selected in a sheet: its address in the sheet's own words, and its cells as text. */
export interface SheetSelection {
  /** Such as `Deliveries!B2:F40`. */
  readonly address: string;
  readonly cells: readonly (readonly string[])[];
}

/** Cells to write: a text, or `null` for a cell that is left as it is. */
export type SheetBlock = readonly (readonly (string | null)[])[];

/** Cells that a block would be written over. */
export interface FilledCells {
  readonly count: number;
  /** The first few, to be shown. */
  readonly first: readonly { readonly address: string; readonly text: string }[];
}

/** What was written, and where. */
export interface WrittenBlock {
  readonly address: string;
  readonly cells: number;
}

/**
 * The sheet around the panel, as far as the panel needs it. A page hands one in for the sheet that it has; the elements know this
 * port and no sheet. What cannot be done is thrown as an `Error` whose message is for the person.
 */
export interface SheetHost {
  /** Whether what was written can be taken back in the sheet, as one step. */
  readonly undo: 'one-step' | 'none';
  /** What is selected now; undefined where nothing is. */
  read(): Promise<SheetSelection | undefined>;
  /** What a block beside a selection, from its first row on and right of its last column, would be written over. */
  wouldOverwrite(block: SheetBlock, beside: SheetSelection): Promise<FilledCells>;
  /** Writes it there: into blank cells only, or over what is there. As one step, where the sheet has steps. */
  write(block: SheetBlock, beside: SheetSelection, over: 'blanks' | 'replace'): Promise<WrittenBlock>;
  /** Tells of each new selection, but never of what was written by this port. Returns what stops it. */
  follow(listener: (selection: SheetSelection) => void): () => void;
}

/** A selection in figures: rows, and cells that are blank. */
export function counted({ cells }: SheetSelection): { readonly rows: number; readonly blank: number } {
  return { rows: cells.length, blank: cells.reduce((sum, row) => sum + row.filter((cell) => cell.trim() === '').length, 0) };
}
