import { chromium, type Browser, type BrowserContextOptions, type Page } from 'playwright';
import { chromiumArgs, chromiumPath, pageDefaults } from './browser.ts';

export async function openBrowser(): Promise<Browser> {
  const executablePath = await chromiumPath();
  return chromium.launch({ ...(executablePath ? { executablePath } : {}), args: chromiumArgs });
}

/** A page in a context of its own: nothing kept from another test. Close it with `page.context().close()`. */
export async function openPage(browser: Browser, options: BrowserContextOptions = {}): Promise<Page> {
  const context = await browser.newContext({ ...pageDefaults, ...options });
  return context.newPage();
}
