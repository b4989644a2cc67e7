// npm run bench [-- NAME…]: bundles each tests/bench/*.ts and runs it under Node, one after the other.
import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { basename, join, resolve } from 'node:path';
import { build } from 'vite';

const root = resolve(import.meta.dirname, '../..');
const folder = join(root, 'tests/bench');
const outDir = join(root, 'node_modules/.cache/bench');

const wanted = process.argv.slice(2);
const found = existsSync(folder) ? readdirSync(folder).filter((file) => file.endsWith('.ts')) : [];
const chosen = found.filter((file) => wanted.length === 0 || wanted.some((name) => file.includes(name)));
if (chosen.length === 0) console.log('No benchmark of that name in tests/bench.');

for (const file of chosen) {
  const name = basename(file, '.ts');
  await build({
    root,
    configFile: false,
    logLevel: 'warn',
    publicDir: false,
    build: {
      ssr: join(folder, file),
      target: 'node20',
      outDir,
      emptyOutDir: false,
      minify: false,
      rolldownOptions: { output: { entryFileNames: `${name}.mjs` } },
    },
  });
  console.log(`\n# ${name}`);
  const run = spawnSync(process.execPath, ['--expose-gc', join(outDir, `${name}.mjs`)], { cwd: root, stdio: 'inherit' });
  if (run.status !== 0) process.exitCode = 1;
}
