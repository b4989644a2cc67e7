import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { gzipSync } from 'node:zlib';

const root = resolve(import.meta.dirname, '../..');

/** The self-contained script file. */
export const scriptFile = resolve(root, 'dist/browser/esterway.min.js');
/** What the script file fetches when a person opens a part that few need, by the group that the part is in. */
export const lateFile = (group: string): string => resolve(root, `dist/browser/esterway-${group}.min.js`);
/** What the script file fetches when Monte Carlo is asked for. */
export const workerFile = resolve(root, 'dist/browser/esterway-worker.min.js');
/** What the script file fetches when the rows of a long sheet are worked out. */
export const rowsWorkerFile = resolve(root, 'dist/browser/esterway-rows-worker.min.js');
/** `esterway/core` minified with decimal.js inside: built only to be measured. */
export const coreMeasured = resolve(root, 'node_modules/.cache/size/core.min.js');

const late = [
  { name: 'parts of the batch', file: lateFile('more'), most: 48_000 },
  { name: 'deliveries and stock', file: lateFile('intake'), most: 30_000 },
  { name: 'intake book', file: lateFile('book'), most: 50_000 },
  { name: 'sheets', file: lateFile('sheets'), most: 45_000 },
  { name: 'shared by these', file: lateFile('shared'), most: 15_000 },
] as const;
export const lateFiles: readonly string[] = late.map(({ file }) => file);

/** Most bytes after gzip. */
export const budgets = [
  { name: 'script file', file: scriptFile, most: 115_000 },
  ...late,
  { name: 'core with decimal.js', file: coreMeasured, most: 50_000 },
  { name: 'worker file', file: workerFile, most: 46_000 },
  { name: 'worker file for rows', file: rowsWorkerFile, most: 62_000 },
] as const;

export function gzipBytes(file: string): number {
  return gzipSync(readFileSync(file), { level: 9 }).length;
}

export function printSizes(): void {
  const rows = budgets
    .filter(({ file }) => existsSync(file))
    .map(({ name, file, most }) => {
      const raw = readFileSync(file).length;
      const gzip = gzipBytes(file);
      return [name, raw, gzip, most, `${Math.round((100 * gzip) / most)} %`].map(String);
    });
  const table = [['bundle', 'minified', 'gzip', 'at most', 'used'], ...rows];
  const widths = table[0]!.map((_, column) => Math.max(...table.map((row) => row[column]!.length)));
  for (const row of table) {
    console.log(row.map((cell, i) => (i ? cell.padStart(widths[i]!) : cell.padEnd(widths[i]!))).join('  '));
  }
}
