import { MOST_DIGITS } from '../formula/decimal.js';

/** What separates the decimals of a figure, in the language of the page. */
export type DecimalMark = '.' | ',';

/**
 * Why a figure was not taken as typed:
 * - `ambiguous`: one mark that may stand for decimals or for thousands (`1,500`);
 * - `two-marks`: more marks than one number can have (`8.4.0`);
 * - `has-unit`: a unit, a currency or a per cent sign behind the figure (`8.4 mL`);
 * - `exponent`: a power of ten (`1e5`);
 * - `too-many-digits`: more significant digits than can be computed with;
 * - `not-a-number`: anything else.
 */
export const NUMBER_DOUBTS = [
  'ambiguous', 'two-marks', 'has-unit', 'exponent', 'too-many-digits', 'not-a-number',
] as const;
export type NumberDoubt = (typeof NUMBER_DOUBTS)[number];

/** A figure as a lot entry stores it, or why there is none. */
export type ReadNumber =
  /** Canonical decimal text: `-`, digits, `.` and digits, without superfluous leading zeros. */
  | { readonly text: string }
  /** With an ambiguous figure come its two readings, canonical: mark for decimals, mark for thousands. */
  | { readonly doubt: NumberDoubt; readonly readings?: readonly [string, string] }
  | { readonly empty: true };

/** No figure is longer than this, in UTF-16 units; what is longer was pasted by mistake and is not looked at. */
const LONGEST = 200;

/** White space around a figure, and the marks of direction that calculators and right-to-left pages copy along. */
const EDGES = /^[\s\u061c\u200e\u200f\u202c\u202d]+|[\s\u061c\u200e\u200f\u202c\u202d]+$/g;

const EXPONENT = /^e[+-]?\d+$/i;

/** A word of a unit with its small power: `mol`, `m3`, `L⁻¹`. It holds nothing of what joins words. */
const WORD = String.raw`°?\p{L}+(?:\^?-?[123]|⁻?[¹²³])?`;
/** What may be a unit, by its looks: `mg KOH/g`, `g/100 g`, `°C`, `% (m/m)`, `€`. Linear, even where nothing fits. */
const UNIT = new RegExp(String.raw`^(?:${WORD}|[%‰٪°]|\p{Sc})(?:[ /·*(]+(?:100 ?)?${WORD})*[.)]?$`, 'u');

/** The first group of thousands; no one groups behind a zero, hence `0,500` is never five hundred. */
const FIRST_GROUP = /^[1-9]\d{0,2}$/;

/**
 * Reads a figure that a person typed or pasted. Never throws.
 *
 * Digits stay as typed, trailing zeros included: `8,40` gives `8.40`. Either decimal mark is taken where it can
 * mean nothing else; where it could mean thousands, only the page's own `mark` is taken without asking.
 */
export function readNumber(typed: string, mark: DecimalMark): ReadNumber {
  if (typed.length > LONGEST) return { doubt: 'not-a-number' };
  const plain = inPlainCharacters(typed.replace(EDGES, ''));
  if (plain === '') return { empty: true };

  const [, sign = '', run = '', tail = ''] = /^([+-]?)([\d.,' ]*)(.*)$/s.exec(plain) ?? [];
  if (!/\d/.test(run)) return { doubt: 'not-a-number' };
  if (tail !== '') return { doubt: EXPONENT.test(tail) ? 'exponent' : UNIT.test(tail) ? 'has-unit' : 'not-a-number' };

  const [whole, fraction, marks] = parts(run);
  if (whole === undefined || !/^\d*$/.test(fraction)) return { doubt: marks.length > 1 ? 'two-marks' : 'not-a-number' };
  if (significantDigits(whole + fraction) > MOST_DIGITS) return { doubt: 'too-many-digits' };

  const text = canonical(sign, whole, fraction);
  // more than three whole digits, in groups (`1 234,567`) or not, leave the mark a single meaning
  if (marks.length === 1 && marks !== mark && FIRST_GROUP.test(whole) && fraction.length === 3) {
    return { doubt: 'ambiguous', readings: [text, canonical(sign, whole + fraction, '')] };
  }
  return { text };
}

/** The same text with ASCII digits, signs and marks, one kind of space and one apostrophe. */
function inPlainCharacters(text: string): string {
  // Not NFKC: it would make 82 of 8² and 11/2 of 1½.
  return text
    .replace(/[\uff01-\uff5e]/g, (fullwidth) => String.fromCharCode(fullwidth.charCodeAt(0) - 0xfee0))
    .replace(/[\u0660-\u0669\u06f0-\u06f9]/g, (arabic) => String(arabic.charCodeAt(0) & 0xf))
    .replace(/[\u2010-\u2013\u2212]/g, '-') // hyphens, figure dash, en dash, minus sign
    .replace(/[\u00a0\u2007\u2009\u202f]/g, ' ') // no-break, figure, thin, narrow no-break space
    .replace(/\u2019/g, "'");
}

/** The whole digits (undefined where their groups are malformed), what follows the decimal mark, and all the marks. */
function parts(run: string): [whole: string | undefined, fraction: string, marks: string] {
  const figure = run.trimEnd();
  const marks = figure.replace(/[^.,]/g, '');
  const first = marks.charAt(0);
  const last = marks.charAt(marks.length - 1);
  // a number has one decimal mark at most: a mark that comes again groups
  const end = marks.length !== 1 && first === last ? figure.length : figure.lastIndexOf(last);
  const separator = marks.length > 1 ? first : figure.includes("'") ? "'" : ' ';
  return [ungrouped(figure.slice(0, end), separator), figure.slice(end + 1), marks];
}

/** The digits of `whole`, without separators; undefined if they are not in groups of three. */
function ungrouped(whole: string, separator: string): string | undefined {
  const groups = whole.split(separator);
  const wellFormed = groups.every((group, i) => (i === 0 ? FIRST_GROUP : /^\d{3}$/).test(group));
  return wellFormed || /^\d*$/.test(whole) ? groups.join('') : undefined;
}

function significantDigits(digits: string): number {
  return digits.replace(/^0+/, '').length;
}

function canonical(sign: string, whole: string, fraction: string): string {
  const figure = (whole.replace(/^0+/, '') || '0') + (fraction && `.${fraction}`);
  // a zero has no sign: a negative zero would turn up again in quotients
  return sign === '-' && /[1-9]/.test(figure) ? `-${figure}` : figure;
}
