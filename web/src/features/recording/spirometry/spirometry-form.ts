import { heightMethods } from '@slighthill/shared/contracts/common';
import { z } from 'zod';

export const rowCount = 8;

const blowRow = z.object({
  fev1: z.string(),
  fvc: z.string(),
  pef: z.string(),
  fef2575: z.string(),
  time: z.string(),
  fev1Used: z.boolean(),
  fvcUsed: z.boolean(),
  reason: z.string(),
});

const bestRow = z.object({ fev1: z.string(), fvc: z.string(), pef: z.string(), fef2575: z.string() });

const testSet = z.object({
  entry: z.enum(['maneuvers', 'best']),
  rows: z.array(blowRow).length(rowCount),
  best: bestRow,
});

/** `given` in a new test opens both sets; the other words say what one test is. */
export const formStates = ['given', 'before', 'after', 'none', 'unknown'] as const;
export type FormState = (typeof formStates)[number];

/**
 * What the form holds: every number as it was typed, so that a draft gives back exactly that. The schema is for
 * drafts; what is sent is held to the API's own contract.
 */
export const spirometryForm = z.object({
  ids: z.object({ visit: z.string(), before: z.string(), after: z.string() }),
  performedAt: z.string(),
  heightCm: z.string(),
  heightMethod: z.enum(heightMethods),
  weightKg: z.string(),
  state: z.enum(formStates),
  drug: z.string(),
  doseMcg: z.string(),
  minutesSinceDose: z.string(),
  ownHoursAgo: z.string(),
  before: testSet,
  after: testSet,
  withFef: z.boolean(),
  note: z.string(),
  /** Keys of the questions answered with "it is right". */
  answered: z.array(z.string()),
  /** Only when a test is amended. */
  amendReason: z.string(),
});

export type BlowRow = z.infer<typeof blowRow>;
export type BestRow = z.infer<typeof bestRow>;
export type TestSet = z.infer<typeof testSet>;
export type SpirometryForm = z.infer<typeof spirometryForm>;
export type SetName = 'before' | 'after';

export const emptyRow = (): BlowRow => ({
  fev1: '',
  fvc: '',
  pef: '',
  fef2575: '',
  time: '',
  fev1Used: true,
  fvcUsed: true,
  reason: '',
});

export const emptySet = (): TestSet => ({
  entry: 'maneuvers',
  rows: Array.from({ length: rowCount }, emptyRow),
  best: { fev1: '', fvc: '', pef: '', fef2575: '' },
});

export const emptySpirometryForm = (performedAt: string, newId: () => string): SpirometryForm => ({
  ids: { visit: newId(), before: newId(), after: newId() },
  performedAt,
  heightCm: '',
  heightMethod: 'measured',
  weightKg: '',
  state: 'given',
  drug: '',
  doseMcg: '',
  minutesSinceDose: '',
  ownHoursAgo: '',
  before: emptySet(),
  after: emptySet(),
  withFef: false,
  note: '',
  answered: [],
  amendReason: '',
});
