import { spirometryCreateBody } from '@slighthill/shared/contracts/spirometry-test';
import { measurementCreate } from '@slighthill/shared/contracts/measurement';
import { patientCreate, patientListQuery } from '@slighthill/shared/contracts/patient';
import { describe, expect, it } from 'vitest';
import type { z } from 'zod';
import { AppError } from './app-error';
import { validate } from './validate';

function refusal(schema: z.ZodType, input: unknown, part: 'body' | 'query' = 'body') {
  try {
    validate(schema, input, part);
  } catch (error) {
    if (error instanceof AppError) return error.errors;
    throw error;
  }
  throw new Error('was not refused');
}

const walk = { measure: 'sixMinuteWalkDistance', takenAt: '2026-06-10T15:00:00Z', value: 310 };
const patient = { givenName: 'Lou', familyName: 'Hale', birthDate: '1955-02-03', sexForPrediction: 'male' };

describe('what a refused request is told', () => {
  it.each<[string, z.ZodType, unknown, string, string]>([
    ['a list for a body', measurementCreate, [1], '', 'Send one object with named fields'],
    ['a list for one of two bodies', spirometryCreateBody, [], '', 'Send one object with named fields'],
    ['a ninth answer of 5', measurementCreate, { ...walk, item9: 5 }, 'item9', 'Enter 0, 1, 2, 3 or not answered'],
    [
      'a condition that is a list',
      measurementCreate,
      { ...walk, conditions: { walks: [1] } },
      'conditions.walks',
      'Must be a number, yes or no, or one of the choices',
    ],
    [
      'a number for an e-mail address',
      patientCreate,
      { ...patient, diagnosisGroup: 'copd', email: 5 },
      'email',
      'Enter an e-mail address such as name@example.org',
    ],
    ['an unknown field', measurementCreate, { ...walk, shoes: 1 }, 'shoes', 'This field is not known here'],
  ])('%s', (_name, schema, body, path, message) => {
    expect(refusal(schema, body)).toEqual([{ path, message }]);
  });

  it.each<[string, unknown, string, string]>([
    ['a page size that is no number', { limit: 'x' }, 'limit', 'Must be a number'],
    ['a page size of 0', { limit: '0' }, 'limit', 'Must be 1 or more'],
    ['a page size of 101', { limit: '101' }, 'limit', 'Must be 100 or less'],
    ['a page size given twice', { limit: ['5', '6'] }, 'limit', 'Must be given once'],
    ['a search given twice', { search: ['hale', 'lou'] }, 'search', 'Must be given once'],
    ['an unknown field given twice', { x: ['1', '2'] }, 'x', 'This field is not known here'],
    ['a search too long', { search: 'x'.repeat(121) }, 'search', 'Use at most 120 characters'],
    ['an unknown list', { list: 'mine' }, 'list', 'Must be one of current, finished, all'],
  ])('%s', (_name, query, path, message) => {
    expect(refusal(patientListQuery, query, 'query')).toEqual([{ path, message }]);
  });
});
