import type { ChosenParts } from './parts';
import type { ProjectCounts, TestSummary } from './summary-reporter';

/** Adds up the steps and the tests. A project that was asked for and ran no test failed: silence is not a pass. */
export function tally(
  steps: { label: string; passed: boolean }[],
  summary: TestSummary,
  chosen: ChosenParts,
): ProjectCounts {
  const total: ProjectCounts = { passed: 0, failed: 0 };
  for (const step of steps) total[step.passed ? 'passed' : 'failed']++;
  for (const counts of Object.values(summary)) {
    total.passed += counts.passed;
    total.failed += counts.failed;
  }
  for (const project of chosen.projects) {
    const counts = summary[project];
    if (!counts || counts.passed + counts.failed === 0) total.failed++;
  }
  return total;
}
