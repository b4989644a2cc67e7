import { afterEach } from 'vitest';

// before Lit loads: keep its "dev mode" notice out of the test output
const page = globalThis as { litIssuedWarnings?: Set<string> };
(page.litIssuedWarnings ??= new Set()).add('dev-mode');

const { fixtureCleanup } = await import('@open-wc/testing');
afterEach(() => {
  fixtureCleanup();
});
