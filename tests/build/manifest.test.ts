import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { built } from '../tools/built.ts';

// The manifest is what editors and embedders read; it is made from the class comments.

interface Declaration {
  readonly tagName?: string;
  readonly description?: string;
  readonly attributes?: readonly { readonly name: string; readonly description?: string }[];
  readonly events?: readonly { readonly name: string; readonly description?: string }[];
  readonly cssParts?: readonly { readonly name: string; readonly description?: string }[];
}

const manifest = JSON.parse(readFileSync(built('dist/custom-elements.json'), 'utf8')) as { modules: { declarations?: Declaration[] }[] };
const elements = manifest.modules.flatMap(({ declarations = [] }) => declarations).filter(({ tagName }) => tagName);

describe('the manifest', () => {
  it('holds every public element', () => {
    expect(elements.map(({ tagName }) => tagName).sort()).toEqual([
      'esterway-after', 'esterway-balance', 'esterway-blend', 'esterway-book', 'esterway-charge', 'esterway-cost', 'esterway-curve', 'esterway-history', 'esterway-lot', 'esterway-panel', 'esterway-results', 'esterway-route', 'esterway-rows', 'esterway-site', 'esterway-site-values', 'esterway-titrant', 'esterway-titration', 'esterway-triage', 'esterway-working',
    ]);
  });

  it.each(elements.map((element) => [element.tagName, element] as const))('describes %s and all its public parts', (_, element) => {
    expect(element.description).toMatch(/\w{3}/);
    for (const kind of ['events', 'cssParts'] as const) for (const part of element[kind] ?? []) expect(part.description, `${kind} ${part.name}`).toMatch(/\w{3}/);
    for (const { name } of element.events ?? []) expect(name).toMatch(/^esterway-/);
  });
});
