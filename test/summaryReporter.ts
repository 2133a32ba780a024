import type { Reporter, SerializedError, TestModule } from 'vitest/node';

/** Ends a test run with one plain line, such as `tests: 312 passed, 0 failed`. */
export default class SummaryReporter implements Reporter {
  onTestRunEnd(modules: readonly TestModule[], errors: readonly SerializedError[]): void {
    const counts = { passed: 0, failed: errors.length, skipped: 0 };
    for (const module of modules) {
      // A file or a suite that could not be set up fails without any of its tests having failed.
      counts.failed += module.errors().length;
      for (const suite of module.children.allSuites()) counts.failed += suite.errors().length;
      for (const test of module.children.allTests()) {
        const { state } = test.result();
        counts[state === 'passed' || state === 'failed' ? state : 'skipped'] += 1;
      }
    }
    // At the very end of the process, behind whatever other reporters have to say.
    process.once('exit', (status) => {
      const skipped = counts.skipped > 0 ? `, ${counts.skipped} skipped` : '';
      // A run can fail before its first test, as when the pages cannot be built.
      const broken = status !== 0 && counts.failed === 0 ? ', the run itself failed' : '';
      process.stdout.write(`tests: ${counts.passed} passed, ${counts.failed} failed${skipped}${broken}\n`);
    });
  }
}
