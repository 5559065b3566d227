import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { Interrupted, listenForInterruption } from '../lib/interruption';
import { step } from '../lib/progress';
import { projectRoot } from '../lib/project-paths';
import { runCommand } from '../lib/run-command';
import { UserError } from '../lib/user-error';
import { ensureCluster } from '../postgres/ensure-cluster';
import { ensureChromium } from './ensure-chromium';
import { chooseParts } from './parts';
import type { ChosenParts } from './parts';
import { staticSteps } from './static-steps';
import type { TestSummary } from './summary-reporter';
import { tally } from './tally';
import { withDatabase } from './test-server';

type StepResult = { label: string; passed: boolean };

async function runStaticSteps(chosen: ChosenParts, signal: AbortSignal): Promise<StepResult[]> {
  const results: StepResult[] = [];
  for (const { group, label, script, args } of staticSteps) {
    if (!chosen.steps.includes(group)) continue;
    const result = await step(label, () =>
      runCommand(process.execPath, [script, ...args], { cwd: projectRoot, signal }),
    );
    const passed = result.code === 0;
    if (!passed) console.log(`${result.output.trim()}\n  FAILED: ${label}`);
    results.push({ label, passed });
  }
  return results;
}

function readSummary(file: string): TestSummary {
  try {
    return JSON.parse(readFileSync(file, 'utf8')) as TestSummary;
  } catch {
    // The run broke off before its end: every project asked for counts as failed.
    return {};
  }
}

/** Runs the tests of the chosen projects; the second value is false when the run itself went wrong. */
async function runTests(chosen: ChosenParts, signal: AbortSignal): Promise<{ summary: TestSummary; clean: boolean }> {
  if (chosen.projects.length === 0) return { summary: {}, clean: true };
  const needsDatabase = chosen.projects.some((name) => ['api', 'infra', 'e2e'].includes(name));
  const cluster = needsDatabase
    ? await step('Throw-away database server', () => ensureCluster({ dataDir: '', throwAway: true }))
    : null;
  const folder = mkdtempSync(path.join(os.tmpdir(), 'slighthill-tests-'));
  const summaryFile = path.join(folder, 'summary.json');
  try {
    const vitest = path.join(projectRoot, 'node_modules', 'vitest', 'vitest.mjs');
    const args = [
      'run',
      '--config',
      'infra/test/vitest.config.ts',
      ...chosen.projects.flatMap((name) => ['--project', name]),
    ];
    const { code } = await runCommand(process.execPath, [vitest, ...args], {
      cwd: projectRoot,
      show: true,
      signal,
      env: {
        ...process.env,
        SLIGHTHILL_TEST_SUMMARY: summaryFile,
        // The loader's hint speaks of a later major version of the build tool.
        VITE_CONFIG_NATIVE_IGNORE_WARNING: 'true',
        ...(cluster ? { TEST_DATABASE_URL: withDatabase(cluster.url, 'postgres') } : {}),
      },
    });
    return { summary: readSummary(summaryFile), clean: code === 0 };
  } finally {
    rmSync(folder, { recursive: true, force: true });
    await cluster?.stop();
  }
}

async function runAll(signal: AbortSignal): Promise<number> {
  const chosen = chooseParts(process.argv.slice(2));
  const startedAt = Date.now();
  if (chosen.projects.includes('e2e')) process.env.CHROMIUM_PATH = await ensureChromium();
  const steps = await runStaticSteps(chosen, signal);
  const { summary, clean } = await runTests(chosen, signal);
  const total = tally(steps, summary, chosen);
  // A run that went wrong without a failed test (a teardown, say) is not passed over.
  if (!clean && total.failed === 0) total.failed++;
  for (const { label } of steps.filter(({ passed }) => !passed)) console.log(`Failed: ${label}`);
  for (const name of chosen.projects.filter((project) => !summary[project]))
    console.log(`Failed: no test of ${name} ran`);
  console.log(`Finished in ${Math.round((Date.now() - startedAt) / 1000)} s.`);
  console.log(`${total.passed} passed, ${total.failed} failed`);
  return total.failed === 0 && total.passed > 0 ? 0 : 1;
}

const signal = listenForInterruption();
try {
  process.exitCode = await runAll(signal);
} catch (error) {
  if (signal.aborted) console.error('The tests were stopped.');
  else console.error(error instanceof UserError && !(error instanceof Interrupted) ? error.message : error);
  process.exitCode = 1;
}
process.exit();
