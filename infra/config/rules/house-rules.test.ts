import { Linter } from 'eslint';
import { describe, expect, it } from 'vitest';
import { houseRules } from './house-rules.mjs';

function messages(code: string): string[] {
  const rules = Object.fromEntries(Object.keys(houseRules.rules).map((name) => [`house/${name}`, 'error' as const]));
  return new Linter().verify(code, [{ plugins: { house: houseRules }, rules }]).map(({ ruleId }) => ruleId ?? 'fatal');
}

describe('theme-colors-only', () => {
  it.each([
    "const a = 'flex bg-red-500'",
    "const a = 'hover:text-slate-700/50'",
    'const a = `p-2 border-t-zinc-200`',
    "const a = '#1f6f5c'",
    "const a = 'bg-[#fff]'",
  ])('refuses %s', (code) => {
    expect(messages(code)).toEqual(['house/theme-colors-only']);
  });

  it.each([
    "const a = 'bg-band-mild text-ink-soft'",
    "const a = '#main-content'",
    "const a = '/welcome#token'",
    "const a = 'grid-cols-12 p-400'",
  ])('lets %s pass', (code) => {
    expect(messages(code)).toEqual([]);
  });
});

describe('no-skipped-tests', () => {
  it.each(['it', 'test', 'describe'])('refuses skipped and focused %s', (name) => {
    expect(messages(`${name}.skip('x', f); ${name}.only('x', f)`)).toHaveLength(2);
    expect(messages(`${name}.each([1])('x', f); ${name}('x', f)`)).toEqual([]);
  });
});

describe('disable-needs-reason', () => {
  it('asks for a reason beside a switched-off rule', () => {
    expect(messages('// eslint-disable-next-line eqeqeq\nvar a = b == c')).toContain('house/disable-needs-reason');
    expect(
      messages('// eslint-disable-next-line eqeqeq -- null and undefined are one here\nvar a = b == c'),
    ).not.toContain('house/disable-needs-reason');
  });
});
