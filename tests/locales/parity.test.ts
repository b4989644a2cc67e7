import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { balanceFormulas } from '../../src/chemistry/balance.js';
import { addFormulas, lotFormulas } from '../../src/chemistry/lot-formulas.js';
import { CAUTIONS } from '../../src/decision/charge.js';
import { REASON_CODES } from '../../src/decision/route.js';
import { NUMBER_DOUBTS } from '../../src/exchange/number-text.js';
import { DEFAULT_FIGURES, DEFAULT_OPTIONS } from '../../src/lot/defaults.js';
import { KNOWN_KEYS, fieldOf } from '../../src/lot/keys.js';
import { NOTICE_CODES } from '../../src/lot/lot-reading.js';
import { deBalanceQuantities } from '../../src/locales/de-balance-quantities.js';
import { de } from '../../src/locales/de.js';
import { enBalanceQuantities } from '../../src/locales/en-balance-quantities.js';
import { en } from '../../src/locales/en.js';
import { fill } from '../../src/locales/fill.js';
import type { Texts } from '../../src/locales/en.js';
import { addQuantityNames, fieldLabel, fieldName, quantityName } from '../../src/locales/quantity-name.js';

/** Texts that come with a part of their own, by the name of the file that they share in both languages. */
const files = readdirSync(new URL('../../src/locales/', import.meta.url)).filter((file) => /^(?:en|de)-/.test(file));
const modules = await Promise.all(files.map(async (file) => [file, (await import(`../../src/locales/${file.replace('.ts', '')}.ts`)) as Readonly<Record<string, unknown>>] as const));
const partsOf = (language: string) =>
  Object.fromEntries(modules.flatMap(([file, module]) => (file.startsWith(`${language}-`) ? [[file.slice(3), { ...module }] as const] : [])));
const whole = (texts: Texts, language: 'en' | 'de') => ({ texts, parts: partsOf(language) });

const languages: Readonly<Record<string, Texts>> = { en, de };
addFormulas(balanceFormulas);
addQuantityNames(en, enBalanceQuantities);
addQuantityNames(de, deBalanceQuantities);
const two = { runs: 2, counted: [0, 1] };
const sheet = lotFormulas({ lot: two, retest: { runs: 1, counted: [0] }, titrant: two });

/** Every text of a language by its path, `problems.ambiguous`. */
function textsOf(part: unknown, path = ''): [string, string][] {
  if (typeof part === 'string') return [[path, part]];
  return Object.entries(part as object).flatMap(([key, inner]) => textsOf(inner, path ? `${path} › ${key}` : key));
}

const slots = (text: string): string[] => [...text.matchAll(/\{(\w+)\}/g)].map(([, name]) => name!).sort();
const word = (record: unknown, key: string): unknown => (record as Record<string, unknown>)[key];

describe('German says what English says', () => {
  // exports differ by the language's mark alone: `enCurve`, `deCurve`
  const german = new Map(textsOf(whole(de, 'de')).map(([path, text]) => [path.replace(/ › de(?=[A-Z])/, ' › en'), text]));
  const english = textsOf(whole(en, 'en'));

  it('the same keys, lists as long as each other', () => {
    expect([...german.keys()]).toEqual(english.map(([path]) => path));
  });

  it('the same figures and words are put into each sentence', () => {
    for (const [path, text] of english) expect([path, slots(german.get(path)!)]).toEqual([path, slots(text)]);
  });

  it('everything is translated but signs and words that are alike', () => {
    const alike = english.filter(([path, text]) => /\p{L}{4}/u.test(text.replace(/\{\w+\}/g, '')) && german.get(path) === text).map(([path]) => path);
    expect(alike.map((path) => path.replace('texts › ', ''))).toEqual([
      'sections › titration', 'fields › start', 'options › titrantAlkali › NaOH', 'options › portionTable › d664', 'options › portionTable › d974', 'charge › forRun › methanol',
      'parts › rows.ts › enRows › heads › methanol', 'parts › rows.ts › enRows › heads › problem',
    ]);
  });
});

describe.each(Object.entries(languages))('%s', (language, texts) => {
  const all = textsOf(whole(texts, language as 'en' | 'de'));

  it('no text is empty, has stray space, or a brace that is no slot', () => {
    for (const [path, text] of all) {
      expect([path, text]).toEqual([path, text.trim().replace(/ {2,}/g, ' ')]);
      expect([path, text !== '' && !/[{}]/.test(text.replace(/\{\w+\}/g, ''))]).toEqual([path, true]);
    }
  });

  it('quotes and the decimal mark are those of the language', () => {
    for (const [path, text] of all) {
      const right = language === 'de' ? !/["'”]|\d\.\d/.test(text) && (text.match(/„/g) ?? []).length === (text.match(/“/g) ?? []).length : !/["'„]|\d,\d/.test(text);
      expect([path, text, right]).toEqual([path, text, true]);
    }
  });

  it('every choice that a person makes has a label, and words for each option and no other', () => {
    for (const [choice, options] of KNOWN_KEYS.options) {
      expect([choice, typeof word(texts.choices, choice)]).toEqual([choice, 'string']);
      const words = word(texts.options, choice.replace('retest.', '')) as object;
      expect([choice, Object.keys(words).sort()]).toEqual([choice, [...options].sort()]);
      expect([choice, new Set(Object.values(words)).size]).toEqual([choice, options.length]);
    }
    expect(Object.keys(texts.choices).sort()).toEqual([...KNOWN_KEYS.options.keys()].sort());
    for (const choice of sheet.choices.keys()) if (choice in DEFAULT_OPTIONS) expect(KNOWN_KEYS.options.has(choice)).toBe(true);
  });

  it('every code that a figure, a route or a charge can carry has a sentence', () => {
    const limits = [...sheet.quantities.values()].flatMap((quantity) => quantity.limits.map(({ code }) => code));
    const codes = [...limits, ...NUMBER_DOUBTS, ...refusals()];
    expect(codes.filter((code) => !(code in texts.problems))).toEqual([]);
    expect(Object.keys(texts.problems).filter((code) => code !== 'other' && !codes.includes(code))).toEqual([]);
    expect(Object.keys(texts.reasons).sort()).toEqual([...REASON_CODES].sort());
    expect(Object.keys(texts.notices).sort()).toEqual([...NOTICE_CODES].sort());
    expect(Object.keys(texts.cautions).filter((code) => code !== 'title').sort()).toEqual([...CAUTIONS].sort());
  });

  /** A few keys are plain English words, and labels say the same. */
  const isKey = (name: string, key: string): boolean => name === key && !(key in texts.fields || key in texts.choices || key in texts.quantities);

  it('every quantity has a name of its own that is not its key', () => {
    const names = [...sheet.quantities.keys()].map((key) => [quantityName(key, texts), key] as const);
    for (const [name, key] of names) expect([key, isKey(name, key) || /[{}]|undefined/.test(name)]).toEqual([key, false]);
    const byName = new Map<string, string[]>();
    for (const [name, key] of names) byName.set(name, [...(byName.get(name) ?? []), key]);
    expect([...byName.values()].filter((keys) => keys.length > 1)).toEqual([]);
  });

  it('every name that is kept is used', () => {
    const late = language === 'de' ? deBalanceQuantities : enBalanceQuantities;
    const used = new Set<string>();
    const kept = { ...texts.quantities, ...late };
    const watched = new Proxy(kept, { get: (names, key) => (used.add(String(key)), Reflect.get(names, key) as unknown) });
    for (const key of sheet.quantities.keys()) quantityName(key, { ...texts, quantities: watched });
    expect(Object.keys(kept).filter((key) => !used.has(key))).toEqual([]);
  });

  it('every figure that can be missing, refused or set for a site has a name', () => {
    const fields = [...KNOWN_KEYS.figures, ...KNOWN_KEYS.options.keys(), ...Object.keys(DEFAULT_FIGURES), ...[...sheet.quantities.keys()].map(fieldOf)];
    for (const field of fields) {
      expect([field, isKey(fieldName(field, texts), field)]).toEqual([field, false]);
      expect(fieldLabel(field, texts)).toMatch(/^\p{Lu}/u);
    }
    // what a person is told to look for is what stands at the field
    for (const [field, label] of Object.entries(texts.fields)) expect(fieldLabel(field, texts)).toBe(label);
    for (const [field, label] of Object.entries(texts.choices)) expect(fieldLabel(field, texts)).toBe(label);
  });

  it('a sentence names the option that it tells to choose', () => {
    expect(texts.problems['blank-with-neutralised-solvent']).toContain(texts.options.blankPolicy['blank-subtracted']);
    expect(texts.panel.newLotDone).toContain(texts.panel.undo);
  });
});

describe('the words of a key', () => {
  it.each([
    ['run1.netTitre', 'run 1: net titre', 'Bestimmung 1: Verbrauch abzüglich Blindwert'],
    ['retest.run12.titre', 'retest, run 12: titre', 'Nachtitration, Bestimmung 12: Verbrauch'],
    ['retest.acidContent', 'retest: acid content', 'Nachtitration: Säuregehalt'],
    ['pass2.conversion.slow', 'pass 2: conversion, cautious end', 'Durchgang 2: Umsatz, vorsichtiges Ende'],
    ['conversion', 'expected conversion', 'erwarteter Umsatz'],
    ['direct.catalyst', 'direct: catalyst to weigh', 'direkt: Katalysator, Einwaage'],
    ['twoStep.ester', 'two-step, base step: ester in all', 'zweistufig, Umesterung: Ester gesamt'],
    ['pretreated.ester', 'after the acid step: ester in the oil', 'nach der Veresterung: Ester im Öl'],
    ['pretreated.ffaLeft.fast', 'after the acid step: FFA left, hopeful end', 'nach der Veresterung: restliche FFA, günstiges Ende'],
    ['NaOCH3-solution.density', 'density of sodium methoxide in methanol', 'Dichte von Natriummethylat in Methanol'],
    ['waterContent', 'water', 'Wasser'],
    ['after.direct.acid', 'after the reaction, direct: neutralising acid to weigh', 'nach der Reaktion, direkt: Neutralisationssäure, Einwaage'],
    ['heat.pass2.riseInBatch', 'heat of mixing, pass 2: temperature rise in oil and methanol, without cooling', 'Mischungswärme, Durchgang 2: Erwärmung von Öl und Methanol, ohne Kühlung'],
    ['cost.twoStep.methanol', 'cost, two-step: methanol', 'Kosten, zweistufig: Methanol'],
    ['balance.pass2.waterDrawn', 'mass balance, pass 2: water drawn off', 'Massenbilanz, Durchgang 2: abgezogenes Wasser'],
    ['balance.twoStep.methanolUpper', 'mass balance, two-step, base step: methanol in the ester layer', 'Massenbilanz, zweistufig, Umesterung: Methanol in der Esterphase'],
    ['acetic.density', 'density of glacial acetic acid', 'Dichte von Eisessig'],
  ])('%s is a quantity', (key, english, german) => {
    expect([quantityName(key, en), quantityName(key, de)]).toEqual([english, german]);
  });

  it.each([
    ['oilAmount', 'amount of oil', 'Ölmenge'],
    ['titrantStrength', 'titrant strength', 'Maßlösung'],
    ['run1.sample', 'run 1: sample', 'Bestimmung 1: Probe'],
    ['retest.run2.end', 'retest, run 2: end', 'Nachtitration, Bestimmung 2: Ende'],
    ['retest.certificateFfa', 'free fatty acid of the retest', 'FFA der Nachtitration'],
    ['run2.titre', 'run 2: titre', 'Bestimmung 2: Verbrauch'],
    ['catalyst', 'catalyst', 'Katalysator'],
    ['KOH.assay', 'assay of potassium hydroxide', 'Gehalt von Kaliumhydroxid'],
  ])('%s is a field', (field, english, german) => {
    expect([fieldName(field, en), fieldName(field, de)]).toEqual([english, german]);
  });

  it.each(['', '.', 'run1.', 'run1', 'direct', 'direct.', 'nothing.known', 'run1.nothing', 'constructor', '__proto__', 'toString.assay', 'run1.constructor', '.slow', 'pass1.\n', 'LiOH.assay'])(
    '%j means nothing and stays as it is',
    (key) => {
      expect([quantityName(key, en), fieldName(key, de)]).toEqual([key, key]);
      expect(fieldLabel(key, de).toLowerCase()).toBe(key.toLowerCase());
    },
  );
});

describe('fill', () => {
  it('puts in what is given and leaves the rest', () => {
    expect(fill('{a} of {b}, {a}', { a: '1', b: '{a}' })).toBe('1 of {a}, 1');
    expect(fill('{a} {c}', { a: '' })).toBe(' {c}');
    expect(fill('$& {a}', { a: '$1 $&' })).toBe('$& $1 $&');
    expect(fill('none', { a: '1' })).toBe('none');
  });
});

/** Every code with which the formulas, the reading of figures and the givens refuse, as their sources have them. */
function refusals(): string[] {
  const files = ['formula/plan.ts', 'lot/figure.ts', 'lot/givens.ts'];
  const codes = files.flatMap((file) => {
    const text = readFileSync(new URL(`../../src/${file}`, import.meta.url), 'utf8');
    return [...text.matchAll(/(?:refuse\(|new Refused\(\{ code: )'([\w-]+)'/g)].map(([, code]) => code!);
  });
  expect(codes.length).toBeGreaterThan(8);
  return codes;
}
