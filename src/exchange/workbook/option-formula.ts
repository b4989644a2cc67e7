import { outlayRates } from '../../chemistry/cost.js';
import { MOST_PASSES } from '../../decision/passes.js';
import { Refused } from '../../formula/reading.js';
import { TYPED_UNITS } from '../../formula/units.js';
import { OPTION_BY_UNIT } from '../../lot/keys.js';
import type { LotRun } from '../../lot/lot-run.js';
import { literal } from './cells.js';
import type { FigureCells } from './figure-formula.js';

/** Where the cells of one lot stand. */
export interface LotCells {
  /** The cell of a quantity or a choice in the working. */
  working(key: string): string;
  /** What was typed for the lot, where the sheet has a column for it. */
  figure(field: string): FigureCells | undefined;
  option(key: string): string | undefined;
  /** What stands for every lot. */
  siteFigure(field: string): FigureCells | undefined;
  siteOption(key: string): string | undefined;
}

/** A little more than a limit, for figures that a double holds to 15 digits. */
const BESIDES = '1.000000000001';
const atOrBelow = (value: string, bound: string): string => `${value}+0<=${bound}*${BESIDES}`;

/** Keys that the option of a choice is decided on. */
export function optionRestsOn(key: string): readonly string[] {
  if (key === 'passes') return ['pretreatmentTarget', ...Array.from({ length: MOST_PASSES - 1 }, (_, at) => `pass${at + 1}.ffaLeft.slow`)];
  const replicate = REPLICATE.exec(key);
  if (replicate) return ['runRange', 'criticalRange'].map((name) => (replicate[1] ?? '') + name);
  if (key.startsWith('priced.')) return ratesOf(key);
  return key === 'blankPolicy' ? ['blank'] : [];
}

/** Whether a lot decides on a choice: one run leaves nothing to decide about runs. */
export const isDecided = (key: string, { sheet }: LotRun): boolean => sheet.choices.has(key) && optionRestsOn(key).every((other) => sheet.quantities.has(other));

const REPLICATE = /^(retest\.)?(averageBy|runsAgree)$/;

function ratesOf(key: string): readonly string[] {
  const what = key.slice('priced.'.length);
  return what === 'direct' || what === 'twoStep' ? outlayRates(what) : [what];
}

/** The option of a choice as the formula of a cell: as typed, as it stands for the site, or decided as in the panel. */
export function optionFormula(key: string, cells: LotCells, { findings, givens }: LotRun): string {
  if (key === 'passes') {
    return Array.from({ length: MOST_PASSES - 1 }, (_, at) => at + 1).reduceRight(
      (rest, pass) => `IF(${atOrBelow(cells.working(`pass${pass}.ffaLeft.slow`), cells.working('pretreatmentTarget'))},"${pass}",${rest})`, `"${MOST_PASSES}"`,
    );
  }
  const replicate = REPLICATE.exec(key);
  if (replicate) {
    const [, prefix = '', what] = replicate;
    const kept = atOrBelow(cells.working(`${prefix}runRange`), cells.working(`${prefix}criticalRange`));
    return `IF(${kept},${what === 'averageBy' ? '"mean","median"' : '"yes","no"'})`;
  }
  if (key.startsWith('priced.')) {
    const rates = ratesOf(key);
    // a price that was refused counts, so that it is seen; a cell that is not known does not tell the one from the other
    if (rates.some((rate) => findings.outcome(rate) instanceof Refused)) return '"yes"';
    const anyKnown = `COUNT(${rates.map(cells.working).join(',')})>0`;
    return `IF(${anyKnown},"yes",${rates.length > 1 ? 'NA()' : '"no"'})`;
  }
  if (key === 'temperatureTaken') {
    const given = [cells.figure('titrationTemperature'), cells.siteFigure('titrationTemperature')].flatMap((one) => (one ? [`${one.figure}=""`] : []));
    const taken = `IF(${chosen('temperatureCorrected', cells)}="no","no","yes")`;
    return given.reduceRight((rest, empty) => `IF(${empty},${rest},${taken})`, '"no"');
  }
  if (key === 'baseStepAcidFrom') return retestFormula(cells, givens.hasRetest());
  const byUnit = OPTION_BY_UNIT[key];
  if (byUnit) return unitFormula(byUnit.of, cells.figure(byUnit.field), cells.siteFigure(byUnit.field));
  const option = known(chosen(key, cells));
  return key === 'blankPolicy' ? blankFormula(option, cells) : option;
}

/** The option given for a lot, else for the site. */
function chosen(key: string, cells: LotCells): string {
  const [typed, standing] = [cells.option(key), cells.siteOption(key) ?? '""'];
  const strength = key === 'titrantKnownFrom' ? cells.figure('titrantStrength') : undefined;
  // a strength typed for the lot is meant for it, whatever titrant the site has
  const otherwise = strength ? `IF(${strength.figure}="",${standing},"label")` : standing;
  return typed ? `IF(${typed}="",${otherwise},${typed})` : otherwise;
}

const known = (option: string): string => `IF(${option}="",NA(),${option})`;

function retestFormula(cells: LotCells, titrated: boolean): string {
  const from = chosen('retest.acidKnownFrom', cells);
  const given = (field: string): string => {
    const typed = cells.figure(field);
    return typed ? `IF(${typed.figure}="","estimate","retest")` : '"estimate"';
  };
  // whether a retest was titrated is as it was: runs are not added in a sheet
  return `IF(${from}="certificate-acid-value",${given('retest.certificateAcidValue')},IF(${from}="certificate-ffa",${given('retest.certificateFfa')},"${titrated ? 'retest' : 'estimate'}"))`;
}

function unitFormula(of: (typeof OPTION_BY_UNIT)[string]['of'], typed: FigureCells | undefined, standing: FigureCells | undefined): string {
  const by = ({ unit }: FigureCells): string => [...TYPED_UNITS.values()].reduceRight((rest, one) => (fits(one.symbol) ? `IF(${unit}=${literal(one.symbol)},"${of(one)}",${rest})` : rest), 'NA()');
  const whole = (one: FigureCells, rest: string): string => `IF(${one.figure}="",${rest},${by(one)})`;
  return [typed, standing].reduceRight((rest, one) => (one ? whole(one, rest) : rest), 'NA()');
}

/** Amounts, strengths and prices have units; the many that a figure of another kind may have only make a formula long. */
const fits = (symbol: string): boolean => /^(?:t|k?g|mg|lb|m?L|m³|US gal|mol\/L|g\/L|¤\/.*)$/.test(symbol);

/** A blank beside a neutralised solvent is a contradiction. */
function blankFormula(option: string, cells: LotCells): string {
  const typed = [cells.figure('blank'), cells.siteFigure('blank')].flatMap((one) => (one ? [`${one.figure}=""`] : []));
  const contradicts = `IF(ISNUMBER(${cells.working('blank')}),IF(${cells.working('blank')}=0,${option},NA()),NA())`;
  const checked = typed.reduceRight((rest, empty) => `IF(${empty},${rest},${contradicts})`, option);
  return `IF(${option}="solvent-neutralised",${checked},${option})`;
}
