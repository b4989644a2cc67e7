import type { DecimalMark } from './number-text.js';

const MINUS = '\u2212';

/** Between groups of three digits: a narrow no-break space, so that point and comma only ever mark decimals. */
const GAP = '\u202f';

/** Whole parts shorter than this stay in one piece. */
const LEAST_GROUPED = 5;

const marks = new Map<string, DecimalMark>();

/**
 * The decimal mark of a language, by its BCP 47 tag: `,` for `de`, `.` for `en`.
 * A point where the tag is invalid (`en-US@posix`) or its language unknown; never throws.
 */
export function decimalMark(language: string): DecimalMark {
  let mark = marks.get(language);
  if (!mark) marks.set(language, (mark = findMark(language)));
  return mark;
}

function findMark(language: string): DecimalMark {
  try {
    // for an unknown language Intl would take that of the browser, and the page would read otherwise from desk to desk
    if (Intl.NumberFormat.supportedLocalesOf(language).length === 0) return '.';
    const parts = new Intl.NumberFormat(language, { numberingSystem: 'latn' }).formatToParts(0.5);
    return parts.find(({ type }) => type === 'decimal')?.value === ',' ? ',' : '.';
  } catch {
    return '.';
  }
}

/**
 * Canonical decimal text as people read it: `-12345.60` is `−12 345,60` in German. The decimal mark is that of
 * `language`; groups are those of ISO 80000-1 in every language. Digits and trailing zeros stay, however many.
 * Text that is not canonical comes back as it is.
 */
export function showNumber(text: string, language: string): string {
  const match = /^(-?)(\d+)(?:\.(\d+))?$/.exec(text);
  if (!match) return text;
  const [, minus, whole = '', fraction] = match;
  return (minus ? MINUS : '') + grouped(whole) + (fraction ? decimalMark(language) + fraction : '');
}

/** Canonical decimal text as it stands in a field to be edited: no groups, a minus that every keyboard has. */
export function fieldText(text: string, language: string): string {
  return text.replace('.', decimalMark(language));
}

function grouped(whole: string): string {
  if (whole.length < LEAST_GROUPED) return whole;
  const head = whole.length % 3 || 3;
  return whole.slice(0, head) + whole.slice(head).replace(/\d{3}/g, `${GAP}$&`);
}
