import type { AddressInfo } from 'node:net';
import { resolve } from 'node:path';
import { createServer, preview } from 'vite';

const root = resolve(import.meta.dirname, '../..');

export interface Site {
  /** With a slash at the end. */
  readonly url: string;
  close(): Promise<void>;
}

/** The pages of demo/ with their sources, as `npm start` serves them but without reloading on a change. */
export async function startDemo(): Promise<Site> {
  const server = await createServer({
    configFile: resolve(root, 'vite.config.ts'),
    mode: 'development',
    logLevel: 'warn',
    cacheDir: resolve(root, 'node_modules/.cache/vite-demo'),
    server: { host: '127.0.0.1', port: 0, watch: null },
  });
  await server.listen();
  return { url: addressOf(server.httpServer), close: () => server.close() };
}

export interface StaticSite {
  /** A folder of the project; '.' serves built files and test pages together. */
  readonly folder: string;
  /** Response headers, a content security policy say. */
  readonly headers?: Record<string, string>;
}

/** Files as they lie, with nothing added to them: for built files and for pages with a strict policy. */
export async function startStatic({ folder, headers = {} }: StaticSite): Promise<Site> {
  const server = await preview({
    configFile: false,
    root,
    appType: 'mpa',
    logLevel: 'error', // it warns that a build would overwrite the folder; none runs
    build: { outDir: resolve(root, folder) },
    preview: { host: '127.0.0.1', port: 0, headers },
  });
  return { url: addressOf(server.httpServer), close: () => server.close() };
}

function addressOf(server: { address(): AddressInfo | string | null } | null): string {
  const address = server?.address();
  if (!address || typeof address === 'string') throw new Error('the server has no port');
  return `http://127.0.0.1:${address.port}/`;
}
