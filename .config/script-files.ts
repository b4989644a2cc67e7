import { createHash } from 'node:crypto';
import type { Plugin } from 'vite';

interface Names {
  /** The script file. */
  readonly main: string;
  /** What it fetches. */
  readonly more: string;
  /** Global name of the script file's exports. */
  readonly name: string;
  /** What the second exports to be called once it is there. */
  readonly start: string;
}

interface Chunk {
  readonly type: 'chunk';
  fileName: string;
  code: string;
  readonly isEntry: boolean;
}

/**
 * Turns the two chunks of a build of ES modules into two plain scripts: the script file, and beside
 * it the parts that it fetches when a person asks for them. A plain script runs from a disk too, and
 * needs no `type="module"`. The second finds what it shares with the first in `globalThis.esterwayParts`;
 * of two copies on a page the first stays, as its elements do.
 */
export function scriptFiles({ main, more, name, start }: Names): Plugin {
  const shared = 'globalThis.esterwayParts';
  return {
    name: 'script-files',
    generateBundle: {
      order: 'post',
      handler(_, bundle) {
        const chunks = Object.values(bundle as Record<string, Chunk | { readonly type: 'asset' }>).filter((file): file is Chunk => file.type === 'chunk');
        const first = chunks.find(({ isEntry }) => isEntry);
        const second = chunks.find(({ isEntry }) => !isEntry);
        if (!first || !second || chunks.length > 2) throw new Error(`two chunks were meant, not ${chunks.map(({ fileName }) => fileName).join(', ')}`);
        // both come from one build, or the short names do not match
        const stamp = createHash('sha256').update(first.code).digest('hex').slice(0, 12);
        const exported = exportsOf(first);
        first.code = wrapped(first.code, (code) => code.replaceAll(`import("./${second.fileName}")`, 'Promise.reject()'), {
          before: `var ${name}=(()=>{"use strict";`,
          after: `;const esterway={${exported}};${shared}??={main:esterway,stamp:"${stamp}"};return esterway})();`,
        });
        const given = exportsOf(second);
        second.code = wrapped(second.code, (code) => code.replace(/import\{([^}]*)\}from"[^"]*";?/, (_, names: string) => `const{${names.replaceAll(' as ', ':')}}=${shared}.main;`), {
          before: `(()=>{"use strict";if(${shared}?.stamp!=="${stamp}")throw new Error("${more} is of another build than ${main}");`,
          after: `;(${shared}.more={${given}}).${start}()})();`,
        });
        second.code = second.code.replaceAll(second.fileName, more);
        const map = bundle[`${second.fileName}.map`];
        if (map) map.fileName = `${more}.map`;
        second.fileName = more;
      },
    },
  };
}

const EXPORTS = /export\{([^}]*)\};?/;

/** What a chunk exports, as the inside of an object. */
function exportsOf({ code, fileName }: Chunk): string {
  const [, names] = EXPORTS.exec(code) ?? [];
  if (names === undefined) throw new Error(`${fileName} exports nothing`);
  return names.split(',').map((pair) => pair.split(' as ')).map(([local = '', outer = local]) => `${outer}:${local}`).join();
}

/** Puts code into a function; a banner before it and the note on its source map stay outside. */
function wrapped(code: string, change: (code: string) => string, around: { readonly before: string; readonly after: string }): string {
  const [, banner = '', body = '', map = ''] = /^((?:\s*\/\*![^]*?\*\/\s*)?)([^]*?)(\s*\/\/# sourceMappingURL=\S+\s*)?$/.exec(code) ?? [];
  return banner + around.before + change(body.replace(EXPORTS, '')) + around.after + map;
}
