import { fill } from './fill.js';
import type { Texts } from './en.js';

type Words = Readonly<Record<string, string>>;

/** `retest.run1.titre`, `titrant.run1.portion`, `pass2.conversion.slow`, `direct.catalyst`: `cost.direct.total`: where, and which run or pass, and what. */
const KEY = /^(retest\.|titrant\.|after\.|heat\.|cost\.|balance\.)?(?:(run|pass)(\d+)\.|(direct\.|twoStep\.|pretreated\.|planned\.|u\.))?([^.](?:.*?[^.])?)(\.slow|\.fast)?$/;
/** A site value that each catalyst or acid has for itself: `KOH.assay`. */
const PRODUCT = /^(.+)(\.assay|\.baseLoad|\.density|\.solubility|\.heatOfSolution|\.price)$/;

const added = new WeakMap<Texts, Words>();

/** Adds names that come with a part fetched by itself. */
export function addQuantityNames(texts: Texts, names: Words): void {
  const words = namesOf(texts);
  if (!Object.keys(names).every((key) => key in words)) added.set(texts, { ...words, ...names });
}

const namesOf = (texts: Texts): Words => added.get(texts) ?? texts.quantities;

/** The name of a quantity in words, `run 1: net titre`; the key itself where it has no name. */
export function quantityName(key: string, texts: Texts): string {
  const quantities = namesOf(texts);
  return inContext(key, texts, (around, base) => around.map((part) => own(quantities, part + base)).find(Boolean) ?? own(quantities, base)) ?? labelOf(key, texts) ?? key;
}

/** The name of a source of uncertainty, as a budget lists it: `burette`. */
export function sourceName(key: string, texts: Texts): string {
  const { quantities } = texts;
  const source = key.replace('retest.', '');
  const name = own(quantities, source) ?? quantityName(key, texts);
  return source === key ? name : `${quantities['retest.']}: ${name}`;
}

/** The name of a field or a choice as a sentence puts it, `amount of oil`: its label, else the name of its quantity. */
export function fieldName(field: string, texts: Texts): string {
  return labelOf(field, texts) ?? quantityName(field, texts);
}

/** The same name as a label, with a capital. */
export function fieldLabel(field: string, texts: Texts): string {
  const name = fieldName(field, texts);
  return name.charAt(0).toUpperCase() + name.slice(1);
}

function labelOf(field: string, texts: Texts): string | undefined {
  const label = (key: string): string | undefined => own(texts.fields, key) ?? own(texts.choices, key);
  const whole = label(field);
  const inSentence = (words: string | undefined): string | undefined => words && (capitalNouns(texts) ? words : words.charAt(0).toLowerCase() + words.slice(1));
  return inSentence(whole) ?? inContext(field, texts, (_, base) => inSentence(label(base)));
}

/** A language that writes the titre with a capital does so with every noun, so its labels stay as they are. */
const capitalNouns = ({ quantities: { titre } }: Texts): boolean => titre !== titre.toLowerCase();

/** What `nameOf` finds for the last part of a key, between the words for what stands around it. */
function inContext(key: string, texts: Texts, nameOf: (around: readonly string[], base: string) => string | undefined): string | undefined {
  const quantities = namesOf(texts);
  const [, group = '', counted, n = '', part, base = '', pace] = KEY.exec(key) ?? [];
  const context = (counted && `${counted}.`) ?? part ?? '';
  const name = nameOf([group, context].filter(Boolean), base) ?? productName(base, texts);
  if (name === undefined) return undefined;
  const word = (of: string | undefined): string | undefined => (of ? own(quantities, of) : undefined);
  const around = [word(group), fill((group && context && word(group + context)) || (word(context) ?? ''), { n })].filter(Boolean).join(', ');
  const end = word(pace);
  return `${around && `${around}: `}${name}${end ? `, ${end}` : ''}`;
}

function productName(base: string, { quantities, options }: Texts): string | undefined {
  const [, product = '', name = ''] = PRODUCT.exec(base) ?? [];
  const words = own(options.catalyst, product) ?? own(quantities, `acid.${product}`);
  return words && fill(own(quantities, name) ?? '', { product: words });
}

/** A record's own entry: a key such as `constructor` names nothing. */
const own = (words: Words, key: string): string | undefined => (Object.hasOwn(words, key) ? words[key] : undefined);
