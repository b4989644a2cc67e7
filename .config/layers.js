/**
 * The order of the folders in src: each may import itself and those listed for it, nothing else.
 * `values` may be imported in full, `types` only with `import type`.
 */
const below = ['formula', 'chemistry', 'decision', 'lot'];
const folders = {
  formula: { values: [] },
  chemistry: { values: ['formula'] },
  decision: { values: ['formula', 'chemistry'] },
  lot: { values: ['formula', 'chemistry', 'decision'] },
  exchange: { values: [...below, 'locales'] },
  book: { values: below },
  locales: { values: [], types: [...below, 'exchange', 'book'], packages: false },
  elements: { values: [...below, 'exchange', 'book', 'locales'] },
};

/** Files that stand in src itself. */
const entries = {
  core: { values: below },
  working: { values: below },
  stock: { values: below },
  balance: { values: below },
  'monte-carlo-worker': { values: below },
  index: { values: [...Object.keys(folders), 'core', 'working'] },
  more: { values: Object.keys(folders) },
  intake: { values: Object.keys(folders) },
  define: { values: [...Object.keys(folders), 'core', 'index'] },
};

/** What knows no page: no DOM, no Lit. */
export const pageless = [...below.map((folder) => `src/${folder}/**/*.ts`), 'src/core.ts', 'src/working.ts', 'src/stock.ts', 'src/balance.ts'];

/** @param {string} path with forward slashes, below src */
function roomOf(path) {
  const [first, ...rest] = path.split('/');
  return rest.length > 0 ? first : first.replace(/\.[jt]s$/, '');
}

/** @type {import('eslint').Rule.RuleModule} */
const order = {
  meta: {
    type: 'problem',
    schema: [],
    messages: {
      upward: '{{from}} must not import {{to}}: it stands above or beside it.',
      typesOnly: '{{from}} may import only types from {{to}}.',
      lit: '{{from}} knows no page: it must not import {{to}}.',
      packages: '{{from}} may import no package ({{to}}).',
      outside: 'Nothing in src imports from outside src ({{to}}).',
      self: 'Inside src, import the file itself, not {{to}}.',
      unknown: 'src/{{from}} has no place in the order of folders (.config/layers.js).',
    },
  },
  create(context) {
    const file = context.filename.replaceAll('\\', '/');
    const start = file.lastIndexOf('/src/') + '/src/'.length;
    const source = file.slice(0, start);
    const from = roomOf(file.slice(start));
    const allowed = folders[from] ?? entries[from];

    /** @returns {string | undefined} the message to report */
    function fault(specifier, typeOnly) {
      if (/^esterway(\/|$)/.test(specifier)) return ['self', specifier];
      if (!specifier.startsWith('.')) {
        if (below.includes(from) || from === 'core' || from === 'working') {
          return /^(lit|lit-.*|@lit|@lit-labs)(\/|$)/.test(specifier) ? ['lit', specifier] : undefined;
        }
        return allowed.packages === false ? ['packages', specifier] : undefined;
      }
      const target = new URL(specifier, `file://${encodeURI(file)}`);
      const path = decodeURI(target.pathname);
      if (!path.startsWith(source)) return ['outside', specifier];
      const to = roomOf(path.slice(source.length));
      if (to === from || allowed.values.includes(to)) return undefined;
      if (allowed.types?.includes(to)) return typeOnly ? undefined : ['typesOnly', to];
      return ['upward', to];
    }

    function check(node, source, typeOnly) {
      if (source?.type !== 'Literal' || typeof source.value !== 'string') return;
      const found = fault(source.value, typeOnly);
      if (found) context.report({ node, messageId: found[0], data: { from, to: found[1] } });
    }

    if (!allowed) {
      return { Program: (node) => context.report({ node, messageId: 'unknown', data: { from } }) };
    }
    return {
      ImportDeclaration: (node) => check(node, node.source, node.importKind === 'type'),
      ExportNamedDeclaration: (node) => check(node, node.source, node.exportKind === 'type'),
      ExportAllDeclaration: (node) => check(node, node.source, node.exportKind === 'type'),
      ImportExpression: (node) => check(node, node.source, false),
      TSImportType: (node) => check(node, node.source ?? node.argument?.literal, true),
      TSExternalModuleReference: (node) => check(node, node.expression, false),
    };
  },
};

export const layers = { meta: { name: 'layers' }, rules: { order } };
