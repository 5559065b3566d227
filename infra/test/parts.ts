import { UserError } from '../lib/user-error';

export const staticParts = ['types', 'lint', 'imports', 'format'] as const;
export const testProjects = ['shared', 'api', 'web', 'infra', 'e2e'] as const;

export type StaticPart = (typeof staticParts)[number];
export type TestProjectName = (typeof testProjects)[number];

export interface ChosenParts {
  steps: StaticPart[];
  projects: TestProjectName[];
}

/** What to run: everything, or what `--only api,lint` names. */
export function chooseParts(args: string[]): ChosenParts {
  if (args.length === 0) return { steps: [...staticParts], projects: [...testProjects] };
  const [flag = '', list = ''] = args[0]?.startsWith('--only=') ? ['--only', args[0].slice(7)] : args;
  const names = list.split(',').filter(Boolean);
  const known: readonly string[] = [...staticParts, ...testProjects];
  const unknown = names.filter((name) => !known.includes(name));
  if (flag !== '--only' || names.length === 0 || unknown.length > 0) {
    throw new UserError(`Usage: npm test, or npm test -- --only api,lint with any of: ${known.join(', ')}.`);
  }
  return {
    steps: staticParts.filter((name) => names.includes(name)),
    projects: testProjects.filter((name) => names.includes(name)),
  };
}
