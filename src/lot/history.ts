import { controlChart, individualKey, movingRangeKey } from '../chemistry/control-chart.js';
import { signalsIn } from '../decision/run-rules.js';
import type { Signal } from '../decision/run-rules.js';
import { Decimal } from '../formula/decimal.js';
import { shownText } from '../formula/digits.js';
import { Plan } from '../formula/plan.js';
import { Missing, isKnown } from '../formula/reading.js';
import { milligramPerGram, percent } from '../formula/units.js';

/** A lot of a source as the book has it: figures as decimal text, FFA and water in %, acid value in mg/g. */
export interface HistoryPoint {
  readonly date: string;
  readonly id?: string;
  readonly name?: string;
  readonly freeFattyAcid?: string;
  readonly acidValue?: string;
  readonly water?: string;
}

export const HISTORY_FIGURES = ['freeFattyAcid', 'acidValue', 'water'] as const;
export type HistoryFigure = (typeof HISTORY_FIGURES)[number];

/** A chart of a source; places count over `points`, from 0. Values as decimal text. */
export interface SourceHistory {
  /** The lots that have the figure, in order of time; those without a date at the end. */
  readonly points: readonly (HistoryPoint & { readonly value: string; /** From the lot before. */ readonly range?: string })[];
  /** Lots without the figure, and without a date. */
  readonly without: number;
  readonly undated: number;
  /** Left out while there are too few lots for limits. */
  readonly limits?: { readonly centre: string; readonly upper: string; readonly lower: string; readonly meanRange: string; readonly rangeUpper: string };
  readonly signals: readonly Signal[];
}

/** What a next lot is expected to have, and of how many lots it is the mean. */
export interface Expected {
  /** mg/g, with as many digits as a titration is planned with. */
  readonly acidValue: string;
  readonly lots: number;
}

/** Fewer lots than this say little of how a source scatters (common practice, no source). */
export const FEWEST_LOTS = 8;
/** Lots that a chart shows, the last ones. */
export const MOST_LOTS = 60;
/** Lots whose mean is expected of the next. */
const RECENT = 10;

/** The chart of one figure over the lots of a source. Pure; never throws for bad figures, which are left out. */
export function sourceHistory(all: readonly HistoryPoint[], figure: HistoryFigure): SourceHistory {
  const known = all.flatMap((point) => {
    const value = point[figure];
    return value !== undefined && /^-?\d+(?:\.\d+)?$/.test(value) ? [{ ...point, value }] : [];
  });
  const dated = known.filter(({ date }) => isDate(date)).sort((a, b) => (a.date < b.date ? -1 : a.date > b.date ? 1 : 0));
  const undated = known.filter(({ date }) => !isDate(date));
  const points = [...dated, ...undated].slice(-MOST_LOTS);
  const rest = { without: all.length - known.length, undated: undated.length };
  if (points.length < 2) return { points, ...rest, signals: [] };

  const sheet = controlChart(points.length, figure === 'acidValue' ? milligramPerGram : percent);
  const values = points.map(({ value }) => new Decimal(value));
  const findings = new Plan(sheet, sheet.quantities.keys()).evaluate({ input: (key) => values[Number(/\d+$/.exec(key)?.[0]) - 1] ?? new Missing([key]), option: (key) => new Missing([key]) });
  const at = (key: string): Decimal => {
    const outcome = findings.outcome(key);
    if (!isKnown(outcome)) throw new RangeError(`${key} of a chart is not known`);
    return outcome;
  };
  const ranged = points.map((point, i) => (i ? { ...point, range: at(movingRangeKey(i + 1)).toString() } : point));
  if (points.length < FEWEST_LOTS) return { points: ranged, ...rest, signals: [] };
  const text = (name: string): string => at(`chart.${name}`).toString();
  return {
    points: ranged, ...rest,
    limits: { centre: text('centre'), upper: text('upper'), lower: text('lower'), meanRange: text('meanRange'), rangeUpper: text('rangeUpper') },
    signals: signalsIn(points.map((_, i) => at(individualKey(i + 1))), { centre: at('chart.centre'), deviation: at('chart.deviation') }),
  };
}

/**
 * The acid value to plan the next titration with: the mean of the last ten lots, but of none before the last shift to one side
 * began, and while they rise or fall in a row of the last three.
 */
export function expectedOf(all: readonly HistoryPoint[]): Expected | undefined {
  const { points, signals } = sourceHistory(all, 'acidValue');
  const end = points.length;
  if (!end) return undefined;
  const shifted = signals.filter(({ rule }) => rule === 'nine-on-one-side').map(({ from }) => from);
  const rising = signals.some(({ rule, to }) => rule === 'six-in-a-row' && to === end - 1);
  const from = rising ? end - 3 : Math.max(end - RECENT, 0, ...shifted);
  const recent = points.slice(from).map(({ value }) => new Decimal(value));
  const mean = recent.reduce((sum, value) => sum.plus(value)).div(recent.length);
  return { acidValue: shownText(mean, { significant: 2 }), lots: recent.length };
}

const isDate = (date: string): boolean => /^\d{4}-\d{2}-\d{2}/.test(date) && !Number.isNaN(Date.parse(date.slice(0, 10)));
