import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { basename, join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { strFromU8, strToU8, unzipSync, zipSync } from 'fflate';

// LibreOffice without a screen, which works a workbook out anew: none of the project's code.

/** Whether the office suite is on this machine. */
export const hasOffice = (): boolean => spawnSync('soffice', ['--version'], { stdio: 'ignore' }).status === 0;

/** The same file without the results that came with its formulas, so that none can be handed back unread. */
export function withoutResults(workbook: Uint8Array): Uint8Array {
  const parts = unzipSync(workbook);
  let left = 0;
  const bare = Object.fromEntries(Object.entries(parts).map(([path, bytes]) => {
    if (!path.startsWith('xl/worksheets/')) return [path, bytes];
    const xml = strFromU8(bytes).replace(/(<c [^>]*?)(?: t="str")?>(<f>[^<]*<\/f>)<v>[^<]*<\/v>/g, (_, cell: string, formula: string) => {
      left++;
      return `${cell}>${formula}`;
    });
    return [path, strToU8(xml)];
  }));
  if (!left) throw new Error('no result was found to leave out');
  return zipSync(bare);
}

/** The workbooks as the office suite computes and saves them, in order. */
export function recalculated(workbooks: readonly Uint8Array[]): Uint8Array[] {
  const folder = mkdtempSync(join(tmpdir(), 'workbook-'));
  try {
    const files = workbooks.map((bytes, at) => {
      const file = join(folder, `book${at}.xlsx`);
      writeFileSync(file, withoutResults(bytes));
      return file;
    });
    // a profile of its own: another start of the suite on this machine would lock it
    execFileSync('soffice', [`-env:UserInstallation=${pathToFileURL(join(folder, 'profile')).href}`, '--headless', '--convert-to', 'xlsx:Calc MS Excel 2007 XML', '--outdir', join(folder, 'out'), ...files], { stdio: 'ignore' });
    return files.map((file) => readFileSync(join(folder, 'out', basename(file))));
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** The same file with another cell in place of one of a sheet, as a person would type over it. */
export function withCell(workbook: Uint8Array, sheet: number, address: string, value: string | number): Uint8Array {
  const parts = unzipSync(workbook);
  const path = `xl/worksheets/sheet${sheet}.xml`;
  const cell = new RegExp(`<c r="${address}"( s="\\d+")?[^>]*?(?:/>|>.*?</c>)`);
  const xml = strFromU8(parts[path]!);
  if (!cell.test(xml)) throw new Error(`${path} has no cell ${address}`);
  const typed = typeof value === 'number' ? `<c r="${address}"><v>${value}</v></c>` : `<c r="${address}" t="inlineStr"><is><t>${value}</t></is></c>`;
  return zipSync({ ...parts, [path]: strToU8(xml.replace(cell, typed)) });
}
