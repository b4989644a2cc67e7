import { fill } from '../../locales/fill.js';
import { fieldLabel } from '../../locales/quantity-name.js';
import { DEFAULT_FIGURES, DEFAULT_OPTIONS } from '../../lot/defaults.js';
import type { SiteProfile } from '../../lot/entry.js';
import type { Figure } from '../../lot/figure.js';
import { address, text, typedText } from './cells.js';
import type { SheetPage, SheetRow } from './cells.js';
import type { FigureCells } from './figure-formula.js';
import { figureCell, shortenedIn } from './lots-page.js';
import type { Shortened } from './lots-page.js';
import type { WorkbookWords } from './words.js';

/** The sheet of what stands for every lot: a row a figure or an option. */
export interface SitePage {
  readonly page: SheetPage;
  figure(field: string): FigureCells | undefined;
  option(key: string): string | undefined;
  readonly shortened: readonly Shortened[];
}

/** A figure that the formulas may ask the site for, and the unit it is usually given in. */
export interface AskedFigure {
  readonly field: string;
  readonly unit: string;
}

export function sitePage(site: SiteProfile, figures: readonly AskedFigure[], options: readonly string[], { texts, own }: WorkbookWords): SitePage {
  const { heads, sheets } = own;
  const rows: SheetRow[] = [
    { cells: [heads.name, heads.key, heads.value, heads.unit, heads.source].map((head) => text(head, 'head')) },
    { cells: [text(heads.site), text('name', 'quiet'), typedText(site.name)] },
    { cells: [text(fieldLabel('titrantDate', texts)), text('titrantDate', 'quiet'), typedText(site.titrantDate)] },
  ];
  const rowOf = new Map<string, number>();
  const shortened: Shortened[] = [];
  const add = (key: string, row: SheetRow): void => {
    rowOf.set(key, rows.length);
    rows.push(row);
  };
  for (const { field, unit } of figures) {
    const figure = siteFigure(site, field);
    const label = fieldLabel(field, texts);
    const cell = figureCell(figure);
    shortened.push(...shortenedIn(cell, `${sheets.site}, ${label}`));
    add(field, { cells: [text(label), text(field, 'quiet'), cell, typedText(figure?.unit ?? unit), text(figureSource(site, field, { texts, own }))] });
  }
  for (const key of options) {
    const option = site.options[key] ?? DEFAULT_OPTIONS[key] ?? '';
    const words = (texts.options as Readonly<Record<string, Readonly<Record<string, string>>>>)[key.replace('retest.', '')];
    add(key, { cells: [text(fieldLabel(key, texts)), text(key, 'quiet'), typedText(option), text(words?.[option] ?? ''), text(key in site.options ? own.setBySite : '')] });
  }
  const cellAt = (key: string, column: number): string | undefined => {
    const row = rowOf.get(key);
    return row === undefined ? undefined : `${sheets.site}!${address(column, row)}`;
  };
  return {
    page: { name: sheets.site, rows, widths: [44, 28, 14, 14, 60], frozen: { columns: 0, rows: 1 } },
    figure: (field) => {
      const [figure, unit] = [cellAt(field, 2), cellAt(field, 3)];
      return figure && unit ? { figure, unit } : undefined;
    },
    option: (key) => cellAt(key, 2),
    shortened,
  };
}

function siteFigure(site: SiteProfile, field: string): Figure | undefined {
  const run = cellOfRun(field);
  return run ? site.titrantRuns?.[run.index]?.[run.cell] : (site.figures[field] ?? DEFAULT_FIGURES[field]);
}

/** A field of a run of the standardisation, `titrant.run1.sample`. */
function cellOfRun(field: string): { index: number; cell: 'sample' | 'start' | 'end' } | undefined {
  const [, number, cell] = /^titrant\.run(\d+)\.(sample|start|end)$/.exec(field) ?? [];
  return number && cell ? { index: Number(number) - 1, cell: cell as 'sample' | 'start' | 'end' } : undefined;
}

function figureSource(site: SiteProfile, field: string, { texts, own }: WorkbookWords): string {
  if (field in site.figures || cellOfRun(field)) return own.setBySite;
  const source = DEFAULT_FIGURES[field]?.source;
  return source ? fill(texts.site.source, { title: source.title, mark: texts.marks[source.mark] }) : '';
}
