import { writeFileSync } from 'node:fs';
import type { Reporter, SerializedError, TestModule } from 'vitest/node';

export interface ProjectCounts {
  passed: number;
  failed: number;
}

export type TestSummary = Record<string, ProjectCounts>;

function addModule(counts: ProjectCounts, module: TestModule): void {
  for (const test of module.children.allTests()) {
    const { state } = test.result();
    if (state === 'passed') counts.passed++;
    // A skipped test proves nothing; it is not let through as if it had passed.
    else counts.failed++;
  }
  // A file that cannot be loaded, or whose hooks fail, has no failed test to count.
  const hasFailedTest = [...module.children.allTests('failed')].length > 0;
  if (module.state() === 'failed' && !hasFailedTest) counts.failed++;
}

/**
 * Counts tests per project. With a file to write to (set by `npm test`, which adds its other steps) the counts go
 * there, otherwise the last line of the run says them.
 */
export class SummaryReporter implements Reporter {
  onTestRunEnd(modules: readonly TestModule[], errors: readonly SerializedError[]): void {
    const summary: TestSummary = {};
    for (const module of modules) {
      const counts = (summary[module.project.name] ??= { passed: 0, failed: 0 });
      addModule(counts, module);
    }
    if (errors.length > 0) summary['outside tests'] = { passed: 0, failed: errors.length };
    const file = process.env.SLIGHTHILL_TEST_SUMMARY;
    if (file) {
      writeFileSync(file, JSON.stringify(summary));
      return;
    }
    const total = (key: keyof ProjectCounts) => Object.values(summary).reduce((sum, counts) => sum + counts[key], 0);
    process.once('exit', () => process.stdout.write(`${total('passed')} passed, ${total('failed')} failed\n`));
  }
}
