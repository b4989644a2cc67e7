import { resolve } from 'node:path';
import { ESLint } from 'eslint';
import tseslint from 'typescript-eslint';
import { describe, expect, it } from 'vitest';

const root = resolve(import.meta.dirname, '../..');

// the project's own rules; those that need types are off, because the planted files do not exist
const eslint = new ESLint({
  cwd: root,
  overrideConfigFile: '.config/eslint.config.js',
  overrideConfig: tseslint.configs.disableTypeChecked as never,
});

async function faults(filePath: string, code: string): Promise<(string | null)[]> {
  const [result] = await eslint.lintText(code, { filePath: resolve(root, filePath) });
  return result!.messages
    .filter(({ ruleId, fatal }) => fatal || ruleId === 'layers/order' || ruleId === 'no-restricted-globals')
    .map(({ ruleId }) => ruleId);
}

const order = ['layers/order'];

describe('the order of the folders in src', { timeout: 30_000 }, () => {
  it.each([
    ['formula reaching up', 'src/formula/planted.ts', `import { acid } from '../chemistry/acidity.js'; acid();`],
    ['lot reaching into elements', 'src/lot/planted.ts', `export { Panel } from '../elements/panel/panel.js';`],
    ['a type from above', 'src/decision/planted.ts', `import type { Lot } from '../lot/entry.js'; export type A = Lot;`],
    ['a type from above, inline', 'src/decision/planted.ts', `export type A = import('../lot/entry.js').Lot;`],
    ['an import at run time', 'src/chemistry/planted.ts', `export const a = () => import('../lot/entry.js');`],
    ['exchange and book apart', 'src/exchange/planted.ts', `export * from '../book/book.js';`],
    ['book and exchange apart', 'src/book/planted.ts', `export * from '../exchange/tsv.js';`],
    ['book without sentences', 'src/book/planted.ts', `export * from '../locales/en.js';`],
    ['locales with values from below', 'src/locales/planted.ts', `export { readLot } from '../lot/read.js';`],
    ['Lit in formula', 'src/formula/planted.ts', `import { html } from 'lit'; export const a = html\`\`;`],
    ['Lit context in lot', 'src/lot/planted.ts', `export * from '@lit/context';`],
    ['Lit in core', 'src/core.ts', `export * from 'lit/decorators.js';`],
    ['elements in core', 'src/core.ts', `export * from './elements/index.js';`],
    ['an entry used inside', 'src/elements/planted/planted.ts', `export * from '../../index.js';`],
    ['the package by its own name', 'src/elements/planted.ts', `export * from 'esterway/core';`],
    ['tests from src', 'src/elements/planted.ts', `export * from '../../tests/tools/built.ts';`],
    ['demo from src', 'src/elements/planted/planted.ts', `export * from '../../../demo/main.js';`],
    ['a folder without a place', 'src/helpers/planted.ts', `export const a = 1;`],
  ])('refuses %s', async (_, file, code) => {
    expect(await faults(file, code)).toEqual(order);
  });

  it.each([
    ['its own folder', 'src/formula/planted.ts', `export * from './unit.js';`],
    ['a folder below', 'src/lot/planted.ts', `export * from '../formula/unit.js'; export * from '../decision/route.js';`],
    ['decimal.js', 'src/formula/planted.ts', `export { Decimal } from 'decimal.js';`],
    ['everything below in elements', 'src/elements/panel/planted.ts', `
      import { LitElement } from 'lit';
      export * from '../parts/field.js';
      export * from '../../book/book.js';
      export * from '../../locales/en.js';
      export const A = LitElement;`],
    ['sentences in exchange', 'src/exchange/planted.ts', `export * from '../locales/en.js';`],
    ['types in locales', 'src/locales/planted.ts', `import type { Problem } from '../formula/reading.js'; export type A = Problem;`],
    ['layers below in core', 'src/core.ts', `export * from './lot/read.js';`],
    ['elements in the entries', 'src/define.ts', `export * from './index.js'; export * from './elements/panel/define.js';`],
    ['anything in tests', 'tests/lot/planted.ts', `export * from '../../src/lot/read.js'; export * from 'lit';`],
  ])('allows %s', async (_, file, code) => {
    expect(await faults(file, code)).toEqual([]);
  });

  it.each([
    ['document', `export const a = () => document.title;`],
    ['window', `export const a = () => window.name;`],
    ['HTMLElement', `export const a = (e: unknown) => e instanceof HTMLElement;`],
    ['customElements', `export const a = () => customElements.get('a-b');`],
  ])('refuses %s below the elements', async (_, code) => {
    expect(await faults('src/decision/planted.ts', code)).toEqual(['no-restricted-globals']);
    expect(await faults('src/elements/planted.ts', code)).toEqual([]);
  });
});
