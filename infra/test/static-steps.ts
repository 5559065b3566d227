import path from 'node:path';
import { projectRoot } from '../lib/project-paths';

/** One check that is not a test: it passes or fails as a whole. */
export interface StaticStep {
  group: 'types' | 'lint' | 'imports' | 'format';
  label: string;
  script: string;
  args: string[];
}

const bin = (...parts: string[]) => path.join(projectRoot, 'node_modules', ...parts);
const config = (name: string) => `infra/config/${name}`;

/** What `npm run check` runs, one by one. */
export const staticSteps: StaticStep[] = [
  ...['shared', 'api', 'web', 'infra', 'e2e'].map((workspace): StaticStep => ({
    group: 'types',
    label: `Types of ${workspace}`,
    script: bin('typescript', 'bin', 'tsc'),
    args: ['-p', workspace],
  })),
  {
    group: 'lint',
    label: 'Lint rules',
    script: bin('eslint', 'bin', 'eslint.js'),
    args: ['--config', config('eslint.config.mjs'), '--max-warnings', '0', '.'],
  },
  {
    group: 'imports',
    label: 'Import directions',
    script: bin('dependency-cruiser', 'bin', 'dependency-cruise.mjs'),
    args: ['--config', config('dependency-cruiser.cjs'), 'shared/src', 'api/src', 'web/src', 'infra', 'e2e'],
  },
  {
    group: 'format',
    label: 'Formatting',
    script: bin('prettier', 'bin', 'prettier.cjs'),
    args: ['--config', config('prettier.json'), '--ignore-path', config('prettierignore'), '--check', '.'],
  },
];
