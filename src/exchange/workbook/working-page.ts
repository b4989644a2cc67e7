import type { Quantity } from '../../formula/quantity.js';
import { isKnown } from '../../formula/reading.js';
import type { Outcome } from '../../formula/reading.js';
import { fill } from '../../locales/fill.js';
import { fieldOf } from '../../lot/keys.js';
import type { LotRun } from '../../lot/lot-run.js';
import { address, formula, literal, text } from './cells.js';
import type { Cell, SheetPage, SheetRow } from './cells.js';
import { inUnit, withinLimits } from './figure-formula.js';
import { FormulaTexts } from './formula-texts.js';
import type { LotsPage } from './lots-page.js';
import { isDecided, optionFormula } from './option-formula.js';
import type { LotCells } from './option-formula.js';
import { choicesIn } from './rows-needed.js';
import type { SitePage } from './site-page.js';
import { choiceName, rowName } from './words.js';
import type { WorkbookWords } from './words.js';

/** A lot in the working, by its column. */
export interface WorkedLot {
  readonly name: string;
  readonly run: LotRun;
  /** Keys of the readings that it has. */
  readonly touched: ReadonlySet<string>;
}

const HEADS = 1;
/** Name, key, symbol, unit, source; then what stands for the site; then a column a lot. */
const SITE_COLUMN = 5;

/** The sheet of the formulas: a row a quantity or a choice, each below those it rests on. */
export function workingPage(keys: readonly string[], lots: readonly WorkedLot[], site: LotRun, typed: LotsPage, standing: SitePage, words: WorkbookWords): SheetPage {
  const { heads, sheets } = words.own;
  const rowOf = new Map(keys.map((key, at) => [key, at + HEADS]));
  const addressIn = (column: number) => (key: string): string => address(column, rowOf.get(key) ?? 0);
  const formulas = new FormulaTexts(rowOf);
  const columns = lots.map((lot, at): LotColumn => new LotColumn(lot, SITE_COLUMN + 1 + at, formulas, {
    working: addressIn(SITE_COLUMN + 1 + at),
    figure: (field) => typed.figure(field, at),
    option: (key) => typed.option(key, at),
    siteFigure: (field) => standing.figure(field),
    siteOption: (key) => standing.option(key),
  }, words.own.notKnown));
  const siteColumn = new SiteColumn(site, standing, addressIn(SITE_COLUMN), words.own.notKnown);
  const shown = shownKeys(lots);
  const row = (key: string): SheetRow => ({
    cells: [...describe(key, lots, words), siteColumn.cell(key), ...columns.map((column) => column.cell(key, siteColumn))],
    hidden: !shown.has(key),
  });
  const head = [heads.name, heads.key, heads.symbol, heads.unit, heads.source, heads.site, ...lots.map(({ name }) => name)];
  return {
    name: sheets.working,
    rows: [{ cells: head.map((of) => text(of, 'head')) }, ...keys.map(row)],
    widths: [44, 28, 12, 12, 30, 14, 16],
    frozen: { columns: 1, rows: HEADS },
  };
}

/** What some lot has, and the choices that it turns on. */
function shownKeys(lots: readonly WorkedLot[]): ReadonlySet<string> {
  return new Set(lots.flatMap(({ touched, run: { sheet } }) => [...touched].flatMap((key) => [key, ...choicesIn(sheet, key)])));
}

function describe(key: string, lots: readonly WorkedLot[], words: WorkbookWords): readonly Cell[] {
  const quantity = lots.map(({ run: { sheet } }) => sheet.quantities.get(key)).find((one) => one !== undefined);
  const sources = quantity?.cites.map(({ title, mark }) => fill(words.texts.site.source, { title, mark: words.texts.marks[mark] })) ?? [];
  return [text(quantity ? rowName(key, words) : choiceName(key, words)), text(key, 'quiet'), text(quantity?.symbol ?? ''), text(quantity?.unit.symbol ?? ''), text(sources.join('; '), 'quiet')];
}

/** A formula that shows a word where it comes to no figure. */
const orNotKnown = (is: string, notKnown: string): string => `IFERROR(${is},${literal(notKnown)})`;
const cached = (outcome: Outcome, notKnown: string) => (isKnown(outcome) ? outcome : notKnown);

/** The figures that stand for every lot, brought to the units of the formulas once. */
class SiteColumn {
  constructor(private readonly run: LotRun, private readonly standing: SitePage, private readonly addressOf: (key: string) => string, private readonly notKnown: string) {}

  address(key: string): string | undefined {
    return this.standing.figure(fieldOf(key)) ? `$${this.addressOf(key)}` : undefined;
  }

  cell(key: string): Cell {
    const quantity = this.run.sheet.quantities.get(key);
    const cells = quantity && !quantity.is ? this.standing.figure(fieldOf(key)) : undefined;
    if (!quantity || !cells) return undefined;
    const is = withinLimits(inUnit(cells, quantity.unit), quantity.limits, this.addressOf);
    return formula(orNotKnown(is, this.notKnown), cached(this.run.findings.outcome(key), this.notKnown), 'quiet');
  }
}

class LotColumn {
  constructor(
    private readonly lot: WorkedLot,
    private readonly column: number,
    private readonly formulas: FormulaTexts,
    private readonly cells: LotCells,
    private readonly notKnown: string,
  ) {}

  cell(key: string, site: SiteColumn): Cell {
    const { run } = this.lot;
    const { sheet, findings } = run;
    if (sheet.choices.has(key)) {
      if (!isDecided(key, run)) return undefined;
      const option = findings.option(key);
      return formula(orNotKnown(optionFormula(key, this.cells, run), this.notKnown), typeof option === 'string' ? option : this.notKnown);
    }
    const quantity = sheet.quantities.get(key);
    if (!quantity) return undefined;
    return formula(orNotKnown(this.figure(quantity, site), this.notKnown), cached(findings.outcome(key), this.notKnown));
  }

  private figure(quantity: Quantity, site: SiteColumn): string {
    const computed = this.formulas.of(quantity, this.lot.run.sheet, this.column);
    if (computed !== undefined) return computed;
    const standing = site.address(quantity.key);
    const typed = this.cells.figure(fieldOf(quantity.key));
    if (!typed) return standing ?? 'NA()';
    const given = withinLimits(inUnit(typed, quantity.unit), quantity.limits, this.cells.working);
    return standing ? `IF(${typed.figure}="",${standing},${given})` : given;
  }
}
