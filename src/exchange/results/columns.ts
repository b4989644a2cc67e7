import { MOST_PASSES } from '../../decision/passes.js';
import type { enResults } from '../../locales/en-results.js';
import type { Widened } from '../../locales/en.js';
import { fill } from '../../locales/fill.js';

/** `acidity`: what was titrated and the route; `batch`: also what to charge and to expect. */
export type ResultKind = 'acidity' | 'batch';

export type ResultWords = Widened<typeof enResults>;

/** What a column takes from a lot. */
export type ResultFrom =
  | { readonly text: 'name' | 'source' | 'date' | 'site' | 'route' | 'state' }
  | { readonly reading: string }
  /** Half the width of the interval of about 95 % round a reading. */
  | { readonly expanded: string }
  /** An amount of the acid step: empty where the lot is charged directly. */
  | { readonly acidStep: string }
  /** A quantity of the base step, without the name of its route. */
  | { readonly baseStep: string };

/** A column of a table of results. Its key never changes; a column added later stands further right. */
export interface ResultColumn {
  readonly key: string;
  /** Empty for text. */
  readonly unit: string;
  readonly head: keyof ResultWords['heads'];
  /** Number of the pass that the heading names. */
  readonly pass?: number;
  readonly from: ResultFrom;
}

const said = (key: 'name' | 'source' | 'date' | 'site' | 'route' | 'state'): ResultColumn => ({ key, unit: '', head: key, from: { text: key } });

const ACIDITY: readonly ResultColumn[] = [
  said('name'), said('source'), said('date'), said('site'),
  { key: 'acidValue', unit: 'mg/g', head: 'acidValue', from: { reading: 'acidValue' } },
  { key: 'acidValue.expanded', unit: 'mg/g', head: 'acidValueExpanded', from: { expanded: 'acidValue' } },
  { key: 'freeFattyAcid', unit: '%', head: 'freeFattyAcid', from: { reading: 'freeFattyAcid' } },
  { key: 'freeFattyAcid.expanded', unit: '%', head: 'freeFattyAcidExpanded', from: { expanded: 'freeFattyAcid' } },
  said('route'), said('state'),
];

const passes: readonly ResultColumn[] = Array.from({ length: MOST_PASSES }, (_, at) => at + 1).flatMap((pass): readonly ResultColumn[] => [
  { key: `pass${pass}.methanol`, unit: 'kg', head: 'passMethanol', pass, from: { acidStep: `pass${pass}.methanol` } },
  { key: `pass${pass}.sulfuric`, unit: 'kg', head: 'passSulfuric', pass, from: { acidStep: `pass${pass}.sulfuric` } },
]);

const BATCH: readonly ResultColumn[] = [
  ...ACIDITY,
  { key: 'oilMass', unit: 'kg', head: 'oilMass', from: { reading: 'oilMass' } },
  { key: 'oilVolume', unit: 'L', head: 'oilVolume', from: { reading: 'oilVolume' } },
  ...passes,
  { key: 'base.methanol', unit: 'kg', head: 'baseMethanol', from: { baseStep: 'methanol' } },
  { key: 'base.catalyst', unit: 'kg', head: 'baseCatalyst', from: { baseStep: 'catalyst' } },
  { key: 'base.ester', unit: 'kg', head: 'ester', from: { baseStep: 'ester' } },
  { key: 'base.glycerol', unit: 'kg', head: 'glycerol', from: { baseStep: 'glycerol' } },
];

/** The columns of a table of results, in order. */
export const resultColumns = (kind: ResultKind): readonly ResultColumn[] => (kind === 'batch' ? BATCH : ACIDITY);

/** The heading of each column, with its unit: `Acid value as KOH [mg/g]`. */
export function resultHeads(columns: readonly ResultColumn[], words: ResultWords): readonly string[] {
  return columns.map(({ head, unit, pass }) => {
    const name = fill(words.heads[head], { pass: String(pass ?? '') });
    return unit ? fill(words.head, { name, unit }) : name;
  });
}
