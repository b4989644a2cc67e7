import { existsSync, readFileSync } from 'node:fs';
import { relative, resolve } from 'node:path';

const root = resolve(import.meta.dirname, '../..');

/** Full path of a file that the build makes; says so when it was not made. */
export function built(path: string): string {
  const file = resolve(root, path);
  if (!existsSync(file)) throw new Error(`${relative(root, file)} is missing: run "npm run build" first`);
  return file;
}

/** A built ES module and all modules of the project that it imports, directly or not: path and text. */
export function moduleGraph(path: string): Map<string, string> {
  const found = new Map<string, string>();
  const waiting = [built(path)];
  for (let file = waiting.pop(); file; file = waiting.pop()) {
    if (found.has(file)) continue;
    const text = readFileSync(file, 'utf8');
    found.set(file, text);
    for (const specifier of importsOf(text)) {
      if (specifier.startsWith('.')) waiting.push(resolve(file, '..', specifier));
    }
  }
  return found;
}

/** What a built module imports, as written. */
export function importsOf(text: string): string[] {
  const statements = /^\s*(?:import|export)\b[^'"`;]*?from\s*["']([^"']+)["']|^\s*import\s*["']([^"']+)["']|\bimport\(\s*["']([^"']+)["']/gm;
  return Array.from(text.matchAll(statements), (match) => (match[1] ?? match[2] ?? match[3])!);
}
