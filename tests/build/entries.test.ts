import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import { describe, expect, it } from 'vitest';
import { built, importsOf, moduleGraph } from '../tools/built.ts';

const root = resolve(import.meta.dirname, '../..');

/** Imports a built file in a Node of its own, without any of the test runner's help. */
function exportsInNode(path: string): string[] {
  const program = `console.log(JSON.stringify(Object.keys(await import(${JSON.stringify(pathToFileURL(built(path)).href)}))))`;
  return JSON.parse(execFileSync(process.execPath, ['--input-type=module', '-e', program], { encoding: 'utf8' })) as string[];
}

describe('public entries', () => {
  it('every file that package.json names is built', () => {
    const manifest = JSON.parse(readFileSync(resolve(root, 'package.json'), 'utf8')) as { exports: object };
    const named = JSON.stringify(manifest.exports).match(/\.\/dist\/[^"]+/g) ?? [];
    expect(named.length).toBeGreaterThan(5);
    expect(named.filter((path) => !existsSync(resolve(root, path)))).toEqual([]);
  });

  it.each(['core', 'working', 'stock', 'balance', 'index'])('%s can be imported where there is no page', (name) => {
    expect(exportsInNode(`dist/esm/${name}.js`)).not.toEqual([]);
  });

  it.each(['core', 'working', 'stock', 'balance'])('%s knows neither page nor Lit', (name) => {
    for (const [file, text] of moduleGraph(`dist/esm/${name}.js`)) {
      const packages = importsOf(text).filter((specifier) => !specifier.startsWith('.'));
      expect(packages.filter((used) => !['decimal.js', 'simple-statistics', 'yalps'].includes(used)), file).toEqual([]);
      const code = text.replace(/\/\*[\s\S]*?\*\/|^\s*\/\/.*$/gm, '');
      expect(/\b(?:HTMLElement|customElements)\b|\b(?:document|window)\./.exec(code)?.[0], file).toBeUndefined();
    }
  });

  it('only the entry that says so registers elements', () => {
    for (const [file, text] of moduleGraph('dist/esm/index.js')) {
      expect(text.includes('customElements.define('), file).toBe(false);
    }
  });
});
