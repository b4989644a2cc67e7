import type { Decimal } from '../formula/decimal.js';

/**
 * When a chart of individuals signals, after Nelson 1984, J. Qual. Technol. 16:237 (from memory): a lot beyond three standard
 * deviations; nine lots in a row on one side of the mean; six in a row each above, or each below, the one before; two of three in a
 * row beyond two standard deviations on the same side.
 */
export const RUN_RULES = ['beyond-limits', 'nine-on-one-side', 'six-in-a-row', 'two-of-three'] as const;
export type RunRule = (typeof RUN_RULES)[number];

export interface Signal {
  readonly rule: RunRule;
  readonly direction: 'up' | 'down';
  /** Places of the first and the last lot of it, from 0. */
  readonly from: number;
  readonly to: number;
}

export interface ChartLines {
  readonly centre: Decimal;
  /** One standard deviation, as the mean moving range gives it. */
  readonly deviation: Decimal;
}

const [NINE, SIX] = [9, 6];

/** The signals of a series in order of time; a run that goes on is one signal. Where all lots are alike nothing signals. */
export function signalsIn(values: readonly Decimal[], { centre, deviation }: ChartLines): readonly Signal[] {
  if (deviation.isZero()) return [];
  const side = values.map((value) => value.cmp(centre));
  const beyond = (deviations: number) => values.map((value) => (value.minus(centre).abs().gt(deviation.times(deviations)) ? value.cmp(centre) : 0));
  const steps = values.map((value, i) => value.cmp(values[i - 1] ?? value));
  const [two, three] = [beyond(2), beyond(3)];
  return [
    ...three.flatMap((direction, i) => (direction ? [signal('beyond-limits', direction, i, i)] : [])),
    ...runs(side, NINE).map(({ direction, from, to }) => signal('nine-on-one-side', direction, from, to)),
    // six lots have five steps between them
    ...runs(steps, SIX - 1).map(({ direction, from, to }) => signal('six-in-a-row', direction, from - 1, to)),
    ...joined(two.flatMap((direction, i) => (i >= 1 && direction && [two[i - 1], two[i - 2]].includes(direction) ? [{ direction, from: two[i - 1] === direction ? i - 1 : i - 2, to: i }] : []))).map(({ direction, from, to }) => signal('two-of-three', direction, from, to)),
  ].sort((a, b) => a.to - b.to || RUN_RULES.indexOf(a.rule) - RUN_RULES.indexOf(b.rule));
}

const signal = (rule: RunRule, direction: number, from: number, to: number): Signal => ({ rule, direction: direction > 0 ? 'up' : 'down', from, to });

interface Stretch {
  readonly direction: number;
  readonly from: number;
  readonly to: number;
}

/** Stretches that share a lot are one. */
function joined(stretches: readonly Stretch[]): readonly Stretch[] {
  const found: Stretch[] = [];
  for (const one of stretches) {
    const before = found.at(-1);
    if (before?.direction === one.direction && one.from <= before.to) found[found.length - 1] = { ...before, to: one.to };
    else found.push(one);
  }
  return found;
}

/** Stretches of at least so many of the same sign, zeros left out. */
function runs(signs: readonly number[], least: number): readonly Stretch[] {
  const found: Stretch[] = [];
  let from = 0;
  for (let i = 1; i <= signs.length; i++) {
    if (signs[i] === signs[from]) continue;
    const direction = signs[from] ?? 0;
    if (direction && i - from >= least) found.push({ direction, from, to: i - 1 });
    from = i;
  }
  return found;
}
