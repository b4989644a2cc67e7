import type { CatalogueEntry } from '../../book/catalogue.js';
import type { BookChange, BookText } from '../../book/changes.js';
import type { BookRefused } from '../../book/refusal.js';
import { showNumber } from '../../exchange/number-format.js';
import type { enBook } from '../../locales/en-book.js';
import type { Texts, Widened } from '../../locales/en.js';
import { fill } from '../../locales/fill.js';
import { fieldName } from '../../locales/quantity-name.js';

/** The sentences and the language of a book. */
export interface BookTongue {
  readonly words: Widened<typeof enBook>;
  readonly texts: Texts;
  readonly tag: string;
}

/** What a lot is called. */
export const lotName = ({ summary: { name } }: Pick<CatalogueEntry, 'summary'>, { words }: BookTongue): string => name ?? words.unnamed;

/** A state in words; one that this code does not know as it is. */
export const stateWords = (state: string, { words }: BookTongue): string => (Object.hasOwn(words.states, state) ? words.states[state as keyof typeof words.states] : state);

/** A day as the language writes it; what is no day stays as it was typed. */
export function dayWords(date: string, { tag }: BookTongue): string {
  const time = Date.parse(`${date}T00:00:00Z`);
  return Number.isNaN(time) ? date : new Intl.DateTimeFormat(tag, { dateStyle: 'medium', timeZone: 'UTC' }).format(time);
}

/** Day and time by the clock of the machine. */
export const momentWords = (iso: string, { tag }: BookTongue): string => new Intl.DateTimeFormat(tag, { dateStyle: 'medium', timeStyle: 'short' }).format(new Date(iso));

/** What was found of a lot, as far as it is known. */
export function figureWords({ summary: { freeFattyAcid, acidValue, water } }: Pick<CatalogueEntry, 'summary'>, { words, tag }: BookTongue): readonly string[] {
  const shown = (text: string): string => showNumber(text, tag);
  return [
    ...(freeFattyAcid === undefined ? [] : [fill(words.ffa, { ffa: shown(freeFattyAcid) })]),
    ...(acidValue === undefined ? [] : [fill(words.acidValue, { value: shown(acidValue) })]),
    ...(water === undefined ? [] : [fill(words.water, { water: shown(water) })]),
  ];
}

/** What two versions have otherwise, as a line. */
export function changeWords(change: BookChange, tongue: BookTongue): string {
  const { words } = tongue;
  const value = (text: BookText | undefined): string => (text === undefined ? words.nothing : valueWords(text, change, tongue));
  const name = nameWords(change, tongue);
  return fill(words.change, { field: change.in === 'site' ? fill(words.siteField, { field: name }) : name, before: value(change.before), after: value(change.after) });
}

function nameWords({ field }: BookChange, { words, texts }: BookTongue): string {
  const own: Readonly<Record<string, string>> = { name: texts.lot.name, source: texts.lot.source, date: texts.lot.date };
  if (field in own) return own[field] ?? field;
  const [, run] = /^(.*run\d+)\.struck$/.exec(field) ?? [];
  if (run === undefined) return fieldName(field, texts);
  const [where = ''] = fieldName(`${run}.end`, texts).split(/: (?=[^:]*$)/);
  return fill(words.struck, { run: where });
}

function valueWords(text: BookText, { field, option }: BookChange, { words, texts, tag }: BookTongue): string {
  if (typeof text !== 'string') return 'text' in text ? `${showNumber(text.text, tag)}\u00a0${text.unit}`.trim() : `${fill(words.quoted, { text: text.typed })} ${text.unit}`.trim();
  if (!option) return text;
  const all = texts.options as Readonly<Record<string, Readonly<Record<string, string>>>>;
  return (all[field] ?? all[field.replace('retest.', '')])?.[text] ?? text;
}

/** Why the book refused, with the remedy. */
export function refusalWords({ refused, params }: BookRefused, { words }: BookTongue): string {
  const { added = '0' } = params;
  const sentence = fill(words.faults[refused], { detail: '', ...params });
  return added === '0' ? sentence : `${sentence} ${fill(words.partly, { added })}`;
}
