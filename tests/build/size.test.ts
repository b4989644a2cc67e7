import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { built } from '../tools/built.ts';
import { budgets, gzipBytes } from '../tools/sizes.ts';

const text = (path: string): string => readFileSync(built(path), 'utf8');

describe('what a page has to load', () => {
  it.each(budgets.map(({ name, most, file }) => [name, most, file] as const))('%s: at most %i bytes after gzip', (_, most, file) => {
    expect(gzipBytes(built(file))).toBeLessThanOrEqual(most);
  });

  it('the script file asks for nothing else and evaluates no text', () => {
    const wrong = /\bimport\s*[("'{*]|\brequire\(|\beval\(|\bnew Function\(/.exec(text('dist/browser/esterway.min.js'));
    expect(wrong?.[0]).toBeUndefined();
  });

  it('the notices of what the script file holds lie beside it', () => {
    const { sources } = JSON.parse(text('dist/browser/esterway.min.js.map')) as { sources: string[] };
    const packages = sources.flatMap((source) => /.*\/node_modules\/((?:@[^/]+\/)?[^/]+)\//.exec(source)?.[1] ?? []);
    expect(packages).toContain('decimal.js');
    for (const name of new Set(packages)) {
      expect(text('dist/browser/LICENSES.md')).toContain(`## ${name} -`);
    }
    expect(text('dist/browser/esterway.min.js').slice(0, 200)).toContain('LICENSES.md');
  });
});

describe('built code', () => {
  const scripts = () =>
    readdirSync(built('dist'), { recursive: true, encoding: 'utf8' }).filter((file) => /^(esm|browser)\/.*\.js$/.test(file));

  it('has no decorator left that a browser cannot read', () => {
    expect(scripts()).toContain('esm/index.js');
    const raw = /@(?:customElement|property|state|query\w*|consume|provide|eventOptions)\(|^\s*@[a-zA-Z]+\(/m;
    for (const file of scripts()) {
      expect(raw.exec(text(`dist/${file}`))?.[0], file).toBeUndefined();
    }
  });
});
