import type { SpirometryTest } from '@slighthill/shared/contracts/spirometry-test';
import type { Saved } from '../record-drawer';
import { spirometryFormPath, type CheckedSpirometry } from './spirometry-request';

export type SpirometryAnswer = { test: SpirometryTest } | { tests: [SpirometryTest, SpirometryTest] };

/** One test as it is, two as a pair; their ids stay the same however often they are sent. */
export const spirometryBody = ({ tests }: CheckedSpirometry): unknown =>
  tests.length === 1 ? tests[0]!.body : { tests: tests.map(({ body }) => body) };

/** Where the server's message about a sent body belongs in the form; null for what has no field. */
export const serverPath = (path: string, { tests }: CheckedSpirometry): string | null => {
  const parts = path.split('.');
  const paired = parts[0] === 'tests';
  const test = tests[paired ? Number(parts[1]) : 0];
  const rest = paired ? parts.slice(2) : parts;
  const known =
    /^(performedAt|heightCm|heightMethod|weightKg|bronchodilator|drug|doseMcg|minutesSinceDose|ownBronchodilatorHoursAgo|best|maneuvers|note)$/;
  return test && known.test(rest[0] ?? '') ? spirometryFormPath(rest, test) : null;
};

export const savedSpirometry = (answer: SpirometryAnswer, patientId: string): Saved => {
  const tests = `/patients/${patientId}/tests`;
  return 'test' in answer
    ? { words: 'Spirometry is in Tests', to: `${tests}/spirometry-test/${answer.test.id}` }
    : { words: 'Spirometry before and after is in Tests', to: tests };
};
