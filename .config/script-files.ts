import { createHash } from 'node:crypto';
import type { Plugin } from 'vite';

interface Names {
  /** The script file. */
  readonly main: string;
  /** Global name of the script file's exports. */
  readonly name: string;
  /** File of a late chunk, by the name of the chunk. */
  readonly fileOf: (chunk: string) => string;
}

interface Chunk {
  readonly type: 'chunk';
  readonly name: string;
  fileName: string;
  code: string;
  readonly imports: readonly string[];
  readonly isEntry: boolean;
  readonly isDynamicEntry: boolean;
}

/**
 * Turns the chunks of a build of ES modules into plain scripts: the script file, and beside it the files that it fetches when a
 * person asks for what they hold. A plain script runs from a disk too, and needs no `type="module"`.
 *
 * On `globalThis.esterwayParts` stand what the script file gives (`main`), how a file beside it is run (`run`), and a promise of what
 * each file gives (`files`): one that needs another fetches it first. Of two copies on a page the first stays, as its elements do.
 */
export function scriptFiles({ main, name, fileOf }: Names): Plugin {
  const shelf = 'globalThis.esterwayParts';
  return {
    name: 'script-files',
    generateBundle: {
      order: 'post',
      handler(_, bundle) {
        const chunks = Object.values(bundle as Record<string, Chunk | { readonly type: 'asset' }>).filter((file): file is Chunk => file.type === 'chunk');
        const first = chunks.find(({ isEntry }) => isEntry);
        if (!first) throw new Error('a script file was meant');
        const late = new Map(chunks.filter((chunk) => chunk !== first).map((chunk) => [chunk.fileName, fileOf(chunk.name)]));
        // all come from one build, or the short names do not match
        const stamp = createHash('sha256').update(first.code).digest('hex').slice(0, 12);
        for (const chunk of chunks) {
          const exported = exportsOf(chunk);
          if (chunk === first) {
            first.code = wrapped(first.code, (code) => code.replace(/import\("[^"]+"\)/g, 'Promise.reject()'), {
              before: `var ${name}=(()=>{"use strict";`,
              after: `;const esterway={${exported}};if(!${shelf}.main)${shelf}.main=esterway,${shelf}.stamp="${stamp}";return esterway})();`,
            });
            continue;
          }
          const file = fileOf(chunk.name);
          const needs = JSON.stringify(chunk.imports.flatMap((imported) => late.get(imported) ?? []));
          const start = chunk.isDynamicEntry ? `${startOf(chunk)}();` : '';
          const taken = (code: string): string =>
            code.replace(/import(?:\{([^}]*)\}from)?"\.\/([^"]*)";?/g, (_, names: string | undefined, from: string) => {
              if (!names) return '';
              const given = late.get(from);
              return `const{${names.replaceAll(' as ', ':')}}=${given ? `given["${given}"]` : 'main'};`;
            });
          chunk.code = wrapped(chunk.code, taken, {
            before:
              `(()=>{"use strict";const shelf=${shelf};if(shelf?.stamp!=="${stamp}")throw new Error("${file} is of another build than ${main}");` +
              `const needs=${needs};shelf.files["${file}"]??=Promise.all(needs.map(async(file)=>{if(!shelf.files[file])await shelf.run(file);return[file,await shelf.files[file]]})).then((all)=>{` +
              `const given=Object.fromEntries(all),main=shelf.main;`,
            after: `;${start}return{${exported}}})})();`,
          });
        }
        for (const chunk of chunks) {
          const file = late.get(chunk.fileName);
          if (!file) continue;
          chunk.code = chunk.code.replaceAll(`sourceMappingURL=${chunk.fileName}`, `sourceMappingURL=${file}`);
          const map = bundle[`${chunk.fileName}.map`];
          if (map) map.fileName = `${file}.map`;
          chunk.fileName = file;
        }
      },
    },
  };
}

const EXPORTS = /export\{([^}]*)\};?/;

/** What a chunk exports: its name inside, and outside. */
function exportPairs({ code, fileName }: Chunk): readonly (readonly [local: string, outer: string])[] {
  const [, names] = EXPORTS.exec(code) ?? [];
  if (names === undefined) throw new Error(`${fileName} exports nothing`);
  return names.split(',').map((pair) => pair.split(' as ')).map(([local = '', outer = local]) => [local, outer]);
}

/** The same, as the inside of an object. */
const exportsOf = (chunk: Chunk): string => exportPairs(chunk).map(([local, outer]) => `${outer}:${local}`).join();

/** What registers the elements of a chunk: the one function that it exports by its own name. */
function startOf(chunk: Chunk): string {
  const start = exportPairs(chunk).find(([, outer]) => /^define[A-Z]/.test(outer));
  if (!start) throw new Error(`${chunk.fileName} registers nothing`);
  return start[0];
}

/** Puts code into a function; a banner before it and the note on its source map stay outside. */
function wrapped(code: string, change: (code: string) => string, around: { readonly before: string; readonly after: string }): string {
  const [, banner = '', body = '', map = ''] = /^((?:\s*\/\*![^]*?\*\/\s*)?)([^]*?)(\s*\/\/# sourceMappingURL=\S+\s*)?$/.exec(code) ?? [];
  return banner + around.before + change(body.replace(EXPORTS, '')) + around.after + map;
}
