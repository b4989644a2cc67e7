import type { Reporter, SerializedError, TestModule } from 'vitest/node';

/** Closes a run with one plain line that a script can read: `N passed, N failed`. */
export default class PlainReporter implements Reporter {
  onTestRunEnd(modules: readonly TestModule[], unhandled: readonly SerializedError[]): void {
    const count = { passed: 0, failed: unhandled.length, skipped: 0 };
    for (const module of modules) {
      let failedHere = 0;
      for (const test of module.children.allTests()) {
        const { state } = test.result();
        if (state === 'passed') count.passed++;
        else if (state === 'failed') failedHere++;
        else count.skipped++;
      }
      // a file that could not be loaded, or whose setup failed, has no failed test of its own
      if (failedHere === 0 && module.state() === 'failed') failedHere = 1;
      count.failed += failedHere;
    }
    const skipped = count.skipped ? `, ${count.skipped} skipped` : '';
    console.log(`${count.passed} passed, ${count.failed} failed${skipped}`);
  }
}
