/** Points a module of the manifest at the file that the package ships, not at its source. */
const shipped = (path) => path?.replace(/^\/?src\/(.*)\.[jt]s$/, 'dist/esm/$1.js');

export default {
  globs: ['src/elements/**/*.ts', 'src/define.ts'],
  outdir: 'dist',
  litelement: true,
  quiet: true,
  packagejson: false,
  plugins: [
    {
      // the analyzer takes the arguments of every dispatched event for events; only the documented ones are public
      name: 'documented-events',
      packageLinkPhase({ customElementsManifest }) {
        for (const { declarations = [] } of customElementsManifest.modules) {
          for (const declaration of declarations) {
            declaration.events &&= declaration.events.filter(({ name, description }) => name && description);
          }
        }
      },
    },
    {
      name: 'shipped-paths',
      packageLinkPhase({ customElementsManifest }) {
        const visit = (part) => {
          if (!part || typeof part !== 'object') return;
          for (const key of ['path', 'module']) {
            if (typeof part[key] === 'string') part[key] = shipped(part[key]);
          }
          Object.values(part).forEach(visit);
        };
        visit(customElementsManifest);
      },
    },
  ],
};
