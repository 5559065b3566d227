import { cursorQuery, idParams, voidBody } from '@slighthill/shared/contracts/common';
import {
  spirometryAmendBody,
  spirometryCreateBody,
  spirometryCreated,
  spirometryTestDetail,
  spirometryTestList,
} from '@slighthill/shared/contracts/spirometry-test';
import { z } from 'zod';
import { defineRoute, Reply, type Route } from '../http/define-route';
import { loadPatient, showEntry } from '../http/load';
import type { RequestContext } from '../http/request-context';
import { entryAbilities } from '../policies/entry-abilities';
import { presentSpirometryTest } from '../presenters/spirometry-test';
import { historyOf } from '../queries/history-of';
import { findSpirometryTest, findSpirometryTests, listSpirometryTests } from '../queries/spirometry-tests';
import { amendSpirometryTest } from '../services/amend-spirometry-test';
import { recordSpirometryTest } from '../services/record-spirometry-test';
import { voidEntry } from '../services/void-entry';

async function detail(context: RequestContext, id: string) {
  const row = showEntry(context, 'tests:read', 'spirometry-test', await findSpirometryTest(context.actor, id));
  return {
    test: presentSpirometryTest(row),
    history: await historyOf(context.actor, 'spirometry-test', id),
    abilities: entryAbilities(context.actor, 'tests:write', row),
  };
}

async function authorizeChange(context: RequestContext, id: string): Promise<void> {
  showEntry(context, 'tests:write', 'spirometry-test', await findSpirometryTest(context.actor, id));
}

export const spirometryTestsRoutes: Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/patients/:id/spirometry-tests',
    contract: {
      summary: 'A patient\u2019s spirometry tests, newest first',
      params: idParams,
      query: z.strictObject(cursorQuery),
      response: spirometryTestList,
    },
    access: 'tests:read',
    audit: 'spirometry-test.list',
    handler: async ({ context, params, query }) => {
      const patient = await loadPatient(context, params.id, 'tests:read');
      return await listSpirometryTests(context.actor, patient.id, query, presentSpirometryTest);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/patients/:id/spirometry-tests',
    contract: {
      summary: 'Record one spirometry test, or a pair before and after bronchodilator',
      params: idParams,
      body: spirometryCreateBody,
      response: spirometryCreated,
      status: 201,
    },
    access: 'tests:write',
    audit: 'spirometry-test.create',
    handler: async ({ context, params, body }) => {
      const patient = await loadPatient(context, params.id, 'tests:write');
      const { row, isNew } = await recordSpirometryTest(context, patient, body);
      const ids = row.map((test) => test.id);
      const [first, second] = (await findSpirometryTests(context.actor, ids)).map(presentSpirometryTest);
      const answer = 'tests' in body ? { tests: [first!, second!] as [never, never] } : { test: first! };
      return new Reply(isNew ? 201 : 200, answer);
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/spirometry-tests/:id',
    contract: { summary: 'A spirometry test with its history', params: idParams, response: spirometryTestDetail },
    access: 'tests:read',
    audit: 'spirometry-test.read',
    handler: async ({ context, params }) => await detail(context, params.id),
  }),
  defineRoute({
    method: 'post',
    path: '/api/spirometry-tests/:id/amend',
    contract: {
      summary: 'Change a spirometry test with a reason',
      params: idParams,
      body: spirometryAmendBody,
      response: spirometryTestDetail,
    },
    access: 'tests:write',
    audit: 'spirometry-test.amend',
    handler: async ({ context, params, body }) => {
      await authorizeChange(context, params.id);
      await amendSpirometryTest(context, params.id, body);
      return await detail(context, params.id);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/spirometry-tests/:id/void',
    contract: {
      summary: 'Take a spirometry test out of trends, pattern and summaries',
      params: idParams,
      body: voidBody,
      response: spirometryTestDetail,
    },
    access: 'tests:write',
    audit: 'spirometry-test.void',
    handler: async ({ context, params, body }) => {
      await authorizeChange(context, params.id);
      await voidEntry(context, 'spirometry-test', params.id, body);
      return await detail(context, params.id);
    },
  }),
];
