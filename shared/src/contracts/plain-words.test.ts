import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { checkConditions } from './conditions';
import { between } from './common';
import { programCreate } from './clinic';
import { measurementCreate, type MeasurementInput } from './measurement';
import { spirometryTestCreate } from './spirometry-test';

const said = (schema: z.ZodType, input: unknown): string[] =>
  (schema.safeParse(input).error?.issues ?? []).map((issue) => `${issue.path.join('.')}: ${issue.message}`);

describe('problems a schema has no words for', () => {
  it.each<[z.ZodType, unknown, string]>([
    [z.number(), '3', ': Must be a number'],
    [z.coerce.number(), 'x', ': Must be a number'],
    [z.number(), undefined, ': This field is missing'],
    [z.int(), 1.5, ': Must be a whole number'],
    [z.boolean(), 'true', ': Must be yes or no'],
    [z.string(), 7, ': Must be text'],
    [z.array(z.string()), 'a', ': Must be a list'],
    [z.strictObject({}), 'a', ': Must be an object with named fields'],
    [z.number().max(3), 4, ': Must be 3 or less'],
    [z.number().min(1), 0, ': Must be 1 or more'],
    [z.number().positive(), 0, ': Must be more than 0'],
    [z.string().max(1), 'abc', ': Use at most 1 character'],
    [z.string().min(1), '', ': This field is missing'],
    [z.array(z.string()).max(2), ['a', 'b', 'c'], ': Give at most 2'],
    [z.enum(['a', 'b']), 'c', ': Must be one of a, b'],
    [z.iso.date(), 'May', ': Enter a date as YYYY-MM-DD'],
    [between('Weeks', 1, 104), 0, ': Weeks must be 1 or more'],
    [between('Weight', 20, 350, 'kg'), 4, ': Weight must be 20 kg or more'],
  ])('are said plainly (%#)', (schema, input, message) => {
    expect(said(schema, input)).toEqual([message]);
  });

  it('names a unit once', () => {
    const program = {
      name: 'Course',
      plannedSessions: 0,
      weeks: 8,
      sessionsPerDay: 9,
      sessionsPerWeek: 3,
      sessionKinds: ['exercise'],
    };
    expect(said(programCreate, program)).toEqual([
      'plannedSessions: Sessions must be 1 or more',
      'sessionsPerDay: Sessions a day must be 4 or less',
    ]);
  });
});

describe('comparison conditions', () => {
  it.each([
    [{ courseM: 5 }, null],
    [{ courseM: 100 }, null],
    [{ courseM: 4 }, 'Course length must be 5 to 100 m'],
    [{ courseM: 101 }, 'Course length must be 5 to 100 m'],
    [{ courseM: true }, 'Course length must be a number'],
    [{ walks: 10 }, null],
    [{ walks: 0 }, 'Number of walks must be 1 to 10'],
    [{ walks: 1.5 }, 'Number of walks must be a whole number'],
    [{ oxygenLpm: 60 }, null],
    [{ oxygenLpm: 0.5 }, null],
    [{ oxygenLpm: 61 }, 'Oxygen during the test must be 0 to 60 L/min'],
    [{ oxygenLpm: -1 }, 'Oxygen during the test must be 0 to 60 L/min'],
    [{ aid: 'skis' }, 'Walking aid must be one of none, cane, crutches, walker, rollator, other'],
    [{ shoes: 'new' }, '6-minute walk distance has no condition "shoes"'],
  ])('%o of a 6-minute walk: %s', (conditions, message) => {
    const found = checkConditions('sixMinuteWalkDistance', conditions as Record<string, number | boolean | string>);
    expect(found.map((error) => error.message)).toEqual(message === null ? [] : [message]);
  });
});

// Nine answers of 0 to 3: the other eight add up to 24 at most (PHQ-9; Kroenke 2001, J Gen Intern Med 16:606).
describe('a PHQ-9 total and its ninth answer', () => {
  const phq9 = (value: number, item9: MeasurementInput['item9']) =>
    said(measurementCreate, { measure: 'phq9', takenAt: '2026-06-10T15:00:00Z', value, item9 });

  it.each<[number, MeasurementInput['item9'], string | null]>([
    [0, 0, null],
    [24, '0', null],
    [25, 0, 'With 0 as the ninth answer the PHQ-9 total is at most 24'],
    [3, 3, null],
    [2, '3', 'The PHQ-9 total cannot be less than its ninth answer, 3'],
    [27, 3, null],
    [27, 2, 'With 2 as the ninth answer the PHQ-9 total is at most 26'],
    [24, 'not-answered', null],
    [25, 'not-answered', 'Without the ninth answer the PHQ-9 total is at most 24'],
    [28, 3, 'PHQ-9 depression score must be 0 to 27'],
  ])('%d with %s', (value, item9, message) => {
    expect(phq9(value, item9)).toEqual(message === null ? [] : [`value: ${message}`]);
  });

  it('asks for an answer there is', () => {
    const five = { measure: 'phq9', takenAt: '2026-06-10T15:00:00Z', value: 9, item9: 5 };
    expect(said(measurementCreate, five)).toEqual(['item9: Enter 0, 1, 2, 3 or not answered']);
  });
});

describe('a test without bronchodilator', () => {
  const test = (changes: object) =>
    said(spirometryTestCreate, {
      performedAt: '2026-06-10T15:00:00Z',
      heightCm: 170,
      bronchodilator: 'none',
      best: { fev1: 1.3, fvc: 2.7 },
      ...changes,
    });

  it('has no drug, dose or time since it', () => {
    expect(test({ drug: 'Albuterol', doseMcg: 400, minutesSinceDose: 15 })).toEqual([
      'drug: No bronchodilator was given, so there is no drug',
      'doseMcg: No bronchodilator was given, so there is no dose',
      'minutesSinceDose: No bronchodilator was given, so there is no time since it',
    ]);
  });

  it('may follow a dose taken at home, and says nothing against a drug where the state is not known', () => {
    expect(test({ ownBronchodilatorHoursAgo: 5, drug: '' })).toEqual([]);
    expect(test({ bronchodilator: 'unknown', drug: 'Albuterol' })).toEqual([]);
  });
});
