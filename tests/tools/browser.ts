import { existsSync, mkdirSync, mkdtempSync, renameSync, rmSync } from 'node:fs';
import { join, resolve } from 'node:path';

/** Flags for a browser that tests alone use: it runs as any user and asks nothing of the network. */
export const chromiumArgs = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** Without a locale, headless Chromium may report a language tag that `Intl` refuses. */
export const pageDefaults = { locale: 'en-US', timezoneId: 'UTC' };

/** The version of @sparticuz/chromium in package.json. */
const packaged = '147.0.0';

/**
 * Where a headless Chromium lies, or undefined for the one that Playwright keeps:
 * 1. $CHROMIUM_PATH; 2. on Linux x64 the one in an npm package, unpacked once under node_modules/.cache;
 * 3. the system's own.
 */
export async function chromiumPath(): Promise<string | undefined> {
  if (process.env.CHROMIUM_PATH) return process.env.CHROMIUM_PATH;
  if (process.platform === 'linux' && process.arch === 'x64') return unpacked();
  return existsSync('/usr/bin/chromium') ? '/usr/bin/chromium' : undefined;
}

async function unpacked(): Promise<string> {
  const cache = resolve(import.meta.dirname, '../../node_modules/.cache');
  const folder = join(cache, `chromium-${packaged}`);
  const file = join(folder, 'chromium');
  if (existsSync(file)) return file;

  mkdirSync(cache, { recursive: true });
  const fresh = mkdtempSync(join(cache, 'chromium-'));
  const before = process.env.TMPDIR;
  process.env.TMPDIR = fresh; // the package unpacks into the folder for temporary files, and takes what it finds there
  try {
    await (await import('@sparticuz/chromium')).default.executablePath();
    renameSync(fresh, folder); // at once, so that a second run never sees half a file
  } catch (error) {
    if (!existsSync(file)) throw error;
  } finally {
    if (before === undefined) delete process.env.TMPDIR;
    else process.env.TMPDIR = before;
    rmSync(fresh, { recursive: true, force: true });
  }
  return file;
}
