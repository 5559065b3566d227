import { z } from 'zod';
import { calendarDate } from './common';

/** What a patient sees first; no severity words, z-scores or percent predicted. */
export const meHome = z.object({
  givenName: z.string(),
  clinic: z.object({ name: z.string(), phone: z.string().nullable() }),
  program: z.object({ name: z.string(), startOn: calendarDate, plannedSessions: z.int(), weeks: z.int() }).nullable(),
});

export type MeHome = z.infer<typeof meHome>;
