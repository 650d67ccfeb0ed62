import type { Reporter, TestModule } from 'vitest/node';

/** Ends the run with `N passed, N failed`, counted from the tests that ran; a file that could not be loaded counts as failed. */
export class ClosingLineReporter implements Reporter {
  onTestRunEnd(modules: readonly TestModule[]): void {
    let passed = 0;
    let failed = 0;
    for (const module of modules) {
      for (const test of module.children.allTests()) {
        if (test.result().state === 'passed') passed++;
        else failed++;
      }
      if (module.errors().length > 0) failed++;
    }
    console.log(`\n${passed} passed, ${failed} failed`);
  }
}
