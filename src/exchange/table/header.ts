import { TYPED_UNITS } from '../../formula/units.js';
import { meaningOf } from './meanings.js';
import type { ColumnKey } from './meanings.js';

/** Splits off the headings: the first row, where a cell of it is a known heading, or none of it is a figure while later rows have some. */
export function headed(rows: readonly (readonly string[])[]): { readonly header?: readonly string[]; readonly body: readonly (readonly string[])[] } {
  const [first = [], ...rest] = rows;
  const figures = (row: readonly string[]): number => row.filter((cell) => /^[-+]?[\d.,'\s]*\d[\d.,'\s]*%?$/.test(cell.trim())).length;
  const known = first.some((cell) => columnOf(cell).key !== undefined);
  const plain = figures(first) === 0 && rest.slice(0, 20).some((row) => figures(row) > 0);
  return (known && figures(first) <= first.length / 2) || plain ? { header: first, body: rest } : { body: rows };
}

/** A heading taken apart: `FFA [%]` is the free fatty acid in per cent. */
export function columnOf(heading: string): { readonly key?: ColumnKey; readonly unit?: string } {
  const { name, unit } = parted(heading);
  const key = meaningOf(name);
  return { ...(key && { key }), ...(unit !== undefined && { unit }) };
}

/** The heading in lower case, its spaces and dots evened out, without its unit. */
export const plainHeading = (heading: string): string => parted(heading).name;

function parted(heading: string): { readonly name: string; readonly unit?: string } {
  const text = heading.replace(/\s+/g, ' ').trim();
  const inBrackets = /^(.*?)\s*[[(]([^[\]()]*(?:\([^()]*\))?[^[\]()]*)[\])]\s*$/.exec(text);
  const behindComma = /^(.*?)(?:,| in )\s*([^,]+)$/.exec(text);
  const behind = /^(.*?)\s([^\s,]+(?: KOH\/g)?)$/.exec(text);
  for (const [, name = '', symbol = ''] of [inBrackets, behindComma, behind].filter((found) => found !== null)) {
    const unit = unitOf(symbol);
    if (unit !== undefined) return { name: even(name), unit };
  }
  return { name: even(inBrackets && !unitOf(inBrackets[2] ?? '') ? `${inBrackets[1]} ${inBrackets[2]}` : text) };
}

const even = (name: string): string => name.toLowerCase().replace(/[._:/\\-]+/g, ' ').replace(/\s+/g, ' ').trim();

/** Other ways in which people write the units that an entry knows. */
const WRITTEN: Readonly<Record<string, string>> = {
  'mg koh/g': 'mg/g', 'mgkoh/g': 'mg/g', 'mg koh g-1': 'mg/g', ppm: 'mg/kg', '% m/m': '%', '%m/m': '%', 'm%': '%', 'wt%': '%', 'wt-%': '%', 'gew%': '%', 'gew.-%': '%', 'g/100g': 'g/100 g', 'ma%': '%', 'ma.-%': '%',
  ml: 'mL', cm3: 'mL', l: 'L', ltr: 'L', liter: 'L', litre: 'L', litres: 'L', liters: 'L', m3: 'm³', cbm: 'm³', gal: 'US gal', gallons: 'US gal', to: 't', tonnes: 't', tonnen: 't', tons: 't', kilogram: 'kg', lbs: 'lb', gramm: 'g',
  c: '°C', '°c': '°C', degc: '°C', 'grad c': '°C', f: '°F', '°f': '°F', 'mol/l': 'mol/L', m: 'mol/L', n: 'mol/L', 'g/l': 'g/L', 'g/ml': 'g/mL', 'kg/m3': 'kg/m³', 'mg/kg': 'mg/kg',
};

function unitOf(symbol: string): string | undefined {
  const text = symbol.trim();
  if (text === '') return undefined;
  if (TYPED_UNITS.has(text)) return text;
  return WRITTEN[text.toLowerCase()];
}
