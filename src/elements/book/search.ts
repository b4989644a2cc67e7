import { html } from 'lit';
import type { TemplateResult } from 'lit';
import type { Book } from '../../book/book.js';
import type { BookQuery } from '../../book/catalogue.js';
import type { Problem } from '../../formula/reading.js';
import type { Figure } from '../../lot/figure.js';
import type { FigureInputEvent } from '../parts/figure-field.js';
import type { OptionInputEvent } from '../parts/option-field.js';
import { stateWords } from './book-words.js';
import type { BookTongue } from './book-words.js';
import { textLine } from './text-line.js';

/** What a person typed to find lots by. */
export interface Search {
  readonly text?: string;
  readonly source?: string;
  readonly state?: string;
  readonly from?: string;
  readonly to?: string;
  readonly ffaFrom?: Figure;
  readonly ffaTo?: Figure;
}

/** The search as the book takes it; a figure that is in doubt does not count yet. */
export function queryOf({ ffaFrom, ffaTo, ...rest }: Search): BookQuery {
  return { ...rest, ...(ffaFrom && 'text' in ffaFrom && { ffaFrom: ffaFrom.text }), ...(ffaTo && 'text' in ffaTo && { ffaTo: ffaTo.text }) };
}

/** The fields of the search; what is emptied goes. */
export function searchFields(search: Search, book: Book, tongue: BookTongue, problemText: (problem: Problem) => string, change: (search: Search) => void): TemplateResult {
  const { words } = tongue;
  const put = (key: keyof Search, value: Figure | string | undefined): void => {
    const { [key]: _, ...rest } = search;
    change(value ? { ...rest, [key]: value } : rest);
  };
  const choice = (key: 'source' | 'state', values: readonly string[], wordsOf: (value: string) => string): TemplateResult => html`<esterway-option
    exportparts="line: field-line, input: field-input"
    .label=${words[key]}
    .options=${[['', words.any], ...values.map((value) => [value, wordsOf(value)])]}
    .value=${search[key] ?? ''}
    @option-input=${({ option }: OptionInputEvent) => put(key, option)}
  ></esterway-option>`;
  const day = (key: 'from' | 'to', problem?: string): TemplateResult => textLine({ id: key, label: words[key], type: 'date', value: search[key] ?? '', typed: (text) => put(key, text), problem });
  const share = (key: 'ffaFrom' | 'ffaTo'): TemplateResult => {
    const figure = search[key];
    const problem = figure && 'doubt' in figure ? problemText({ code: figure.doubt, quantity: key, params: { typed: figure.typed } }) : undefined;
    return html`<esterway-figure
      exportparts="line: field-line, input: field-input, problem"
      .label=${words[key]}
      .figure=${figure}
      .units=${['%']}
      .problem=${problem}
      @figure-input=${({ figure: typed }: FigureInputEvent) => put(key, typed)}
    ></esterway-figure>`;
  };
  const reversed = search.from && search.to && search.from > search.to ? words.daysReversed : undefined;
  return html`
    <div class="fields">${textLine({ id: 'text', label: words.search, type: 'search', wide: true, placeholder: words.searchHint, value: search.text ?? '', typed: (text) => put('text', text) })}</div>
    <details>
      <summary>${words.narrow}</summary>
      <div class="fields">
        ${choice('source', book.sources(), (source) => source)} ${choice('state', book.states(), (state) => stateWords(state, tongue))} ${day('from')} ${day('to', reversed)}
        ${share('ffaFrom')} ${share('ffaTo')}
      </div>
    </details>
  `;
}
