import { html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { columnUse } from '../../exchange/table/columns.js';
import type { Columns, ColumnUse } from '../../exchange/table/columns.js';
import { FIGURE_UNITS, RUN_PARTS, TEXT_KEYS, isTextKey, runColumn, usualUnit } from '../../exchange/table/meanings.js';
import type { ColumnKey } from '../../exchange/table/meanings.js';
import type { enRows } from '../../locales/en-rows.js';
import type { Widened } from '../../locales/en.js';
import { fill } from '../../locales/fill.js';
import type { OptionInputEvent } from '../parts/option-field.js';

type Words = Widened<typeof enRows>;

/** Units that a column can be in, the usual one first. */
const UNITS: Readonly<Record<string, readonly string[]>> = {
  '%': ['%', 'mg/kg', 'g/100 g'], 'mg/g': ['mg/g'], kg: ['kg', 't', 'lb', 'L', 'm³', 'US gal'], '°C': ['°C', '°F'], 'mol/L': ['mol/L', 'g/L'], mL: ['mL', 'L'], g: ['g', 'mL'], '¤/t': ['¤/t', '¤/kg', '¤/L', '¤/US gal'],
};
/** Runs that a column can be of, beside those that the headings name. */
const RUNS = 4;

/** What a column is called. */
export const columnName = ({ header }: ColumnUse, place: number, words: Words): string => (header ? fill(words.headed, { header }) : fill(words.column, { n: String(place + 1) }));

/** What a column is taken for, in words. */
export function meaningWords(key: ColumnKey, words: Words): string {
  const cell = runColumn(key);
  return cell ? fill(words.parts[cell.part], { run: String(cell.run) }) : ((words.keys as Readonly<Record<string, string>>)[key] ?? key);
}

/** A line for each column: its heading, what it is taken for, and its unit; both to be corrected. */
export function columnsView(columns: Columns, words: Words, money: (unit: string) => string, change: (place: number, use: ColumnUse) => void): TemplateResult {
  const most = Math.max(RUNS, ...columns.map(({ key }) => (key && runColumn(key)?.run) || 0));
  const keys: readonly ColumnKey[] = [
    ...TEXT_KEYS, ...(Object.keys(FIGURE_UNITS) as (keyof typeof FIGURE_UNITS)[]),
    ...Array.from({ length: most }, (_, i) => RUN_PARTS.map((part): ColumnKey => `run.${i + 1}.${part}`)).flat(),
  ];
  const options = [['', words.leave] as const, ...keys.map((key) => [key, meaningWords(key, words)] as const)];
  return html`<div class="columns">
    ${columns.map((use, place) => {
      const name = columnName(use, place, words);
      const { key, unit = '' } = use;
      const units = key && !isTextKey(key) ? (UNITS[usualUnit(key)] ?? [usualUnit(key)]) : [];
      const offered = units.includes(unit) ? units : [unit, ...units];
      return html`
        <esterway-option
          exportparts="line: field-line, input: field-input"
          .label=${name}
          .options=${options}
          .value=${key ?? ''}
          @option-input=${({ option }: OptionInputEvent) => change(place, columnUse(use.header, (option || undefined) as ColumnKey | undefined))}
        ></esterway-option>
        ${offered.length > 1
          ? html`<esterway-option
              exportparts="line: field-line, input: field-input"
              .label=${fill(words.unit, { column: name })}
              .options=${offered.map((symbol) => [symbol, money(symbol)] as const)}
              .value=${unit}
              @option-input=${({ option }: OptionInputEvent) => change(place, columnUse(use.header, key, option))}
            ></esterway-option>`
          : html`<span class="only">${unit ? money(unit) : nothing}</span>`}
      `;
    })}
  </div>`;
}
