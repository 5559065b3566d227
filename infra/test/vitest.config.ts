import react from '@vitejs/plugin-react';
import path from 'node:path';
import { defineConfig } from 'vitest/config';
import { SummaryReporter } from './summary-reporter';

const root = path.resolve(import.meta.dirname, '../..');
const inRoot = (...parts: string[]) => path.join(root, ...parts);

// A zone that is not UTC and changes its clock: what depends on the machine's zone shows. Set before workers start.
process.env.TZ = 'America/Los_Angeles';

export default defineConfig({
  root,
  test: {
    reporters: ['default', new SummaryReporter()],
    maxWorkers: 2,
    passWithNoTests: false,
    projects: [
      { root: inRoot('shared'), test: { name: 'shared', environment: 'node', include: ['src/**/*.test.ts'] } },
      {
        root: inRoot('api'),
        test: {
          name: 'api',
          environment: 'node',
          include: ['src/**/*.test.ts'],
          globalSetup: [inRoot('infra/test/api-setup.ts')],
          testTimeout: 15_000,
          hookTimeout: 30_000,
        },
      },
      {
        root: inRoot('web'),
        plugins: [react()],
        test: {
          name: 'web',
          environment: 'happy-dom',
          environmentOptions: { happyDOM: { url: 'http://127.0.0.1/' } },
          include: ['src/**/*.test.{ts,tsx}'],
          setupFiles: [inRoot('web/src/testing/setup.ts')],
          testTimeout: 15_000,
        },
      },
      {
        root: inRoot('infra'),
        test: {
          name: 'infra',
          environment: 'node',
          include: ['**/*.test.ts'],
          globalSetup: [inRoot('infra/test/api-setup.ts')],
          testTimeout: 120_000,
          hookTimeout: 60_000,
        },
      },
      {
        root: inRoot('e2e'),
        test: {
          name: 'e2e',
          environment: 'node',
          include: ['**/*.e2e.ts'],
          globalSetup: [inRoot('infra/test/e2e-setup.ts')],
          testTimeout: 120_000,
          hookTimeout: 120_000,
          fileParallelism: false,
          // After the others: a browser beside two busy workers measures the machine.
          sequence: { groupOrder: 1 },
        },
      },
    ],
  },
});
