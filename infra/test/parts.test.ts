import { describe, expect, it } from 'vitest';
import { chooseParts } from './parts';
import { tally } from './tally';

describe('chooseParts', () => {
  it('takes everything without a wish', () => {
    expect(chooseParts([]).steps).toEqual(['types', 'lint', 'imports', 'format']);
    expect(chooseParts([]).projects).toEqual(['shared', 'api', 'web', 'infra', 'e2e']);
  });

  it('takes what --only names', () => {
    expect(chooseParts(['--only', 'api,lint'])).toEqual({ steps: ['lint'], projects: ['api'] });
    expect(chooseParts(['--only=web'])).toEqual({ steps: [], projects: ['web'] });
  });

  it.each([[['--only', 'apo']], [['--only']], [['api']], [['--only=']]])('refuses %j', (args) => {
    expect(() => chooseParts(args)).toThrow(/^Usage/);
  });
});

describe('tally', () => {
  const steps = [
    { label: 'a', passed: true },
    { label: 'b', passed: false },
  ];

  it('adds steps, tests and errors outside tests', () => {
    const summary = { api: { passed: 5, failed: 1 }, 'outside tests': { passed: 0, failed: 2 } };
    expect(tally(steps, summary, { steps: [], projects: ['api'] })).toEqual({ passed: 6, failed: 4 });
  });

  it('counts a project that ran nothing as failed', () => {
    const chosen = { steps: [], projects: ['api', 'web'] as ('api' | 'web')[] };
    expect(tally([], { api: { passed: 3, failed: 0 } }, chosen)).toEqual({ passed: 3, failed: 1 });
  });
});
