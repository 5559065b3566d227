import { describe, expect, it } from 'vitest';
import { courseWords } from './course-words';

const planned = {
  status: 'planned' as const,
  programName: 'Standard course',
  startOn: '2026-06-04',
  plannedSessions: 24,
};

describe('courseWords', () => {
  it('does not say that a planned course starts on a day that has passed', () => {
    expect(courseWords(planned, '2026-06-04')).toBe('Starts Jun 4, 2026');
    expect(courseWords(planned, '2026-06-05')).toBe('Planned, Jun 4, 2026');
    expect(courseWords({ ...planned, status: 'active' }, '2026-06-05')).toBe('Since Jun 4, 2026');
    expect(courseWords(null, '2026-06-05')).toBe('Not enrolled');
  });
});
