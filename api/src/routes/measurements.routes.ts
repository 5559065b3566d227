import { cursorQuery, idParams, voidBody } from '@slighthill/shared/contracts/common';
import {
  bodySizeAmendBody,
  bodySizeCreate,
  bodySizeDetail,
  bodySizeList,
  bodySizeResponse,
  measurementAmendBody,
  measurementCreate,
  measurementDetail,
  measurementList,
  measurementListQuery,
  measurementResponse,
  testList,
} from '@slighthill/shared/contracts/measurement';
import { z } from 'zod';
import { defineRoute, Reply, type Route } from '../http/define-route';
import { loadPatient, showEntry } from '../http/load';
import type { RequestContext } from '../http/request-context';
import { entryAbilities } from '../policies/entry-abilities';
import { presentBodySize } from '../presenters/body-size';
import { presentMeasurement } from '../presenters/measurement';
import { presentTestListItem } from '../presenters/test-list-item';
import { findBodySize, listBodySizes } from '../queries/body-sizes';
import { historyOf } from '../queries/history-of';
import { listTests } from '../queries/list-tests';
import { findMeasurement, listMeasurements } from '../queries/measurements';
import { amendBodySize } from '../services/amend-body-size';
import { amendMeasurement } from '../services/amend-measurement';
import { recordBodySize } from '../services/record-body-size';
import { recordMeasurement } from '../services/record-measurement';
import { voidEntry } from '../services/void-entry';

const page = z.strictObject(cursorQuery);

async function measurementAnswer(context: RequestContext, id: string) {
  const row = showEntry(context, 'tests:read', 'measurement', await findMeasurement(context.actor, id));
  const isOwnEntry = row.sourceKind === 'measurement' && row.sourceId === row.id;
  return {
    measurement: presentMeasurement(row),
    history: await historyOf(context.actor, 'measurement', id),
    abilities: isOwnEntry ? entryAbilities(context.actor, 'tests:write', row) : [],
  };
}

async function bodySizeAnswer(context: RequestContext, id: string) {
  const row = showEntry(context, 'tests:read', 'body-size', await findBodySize(context.actor, id));
  return {
    bodySize: presentBodySize(row),
    history: await historyOf(context.actor, 'body-size', id),
    abilities: row.sourceKind === 'body-size' ? entryAbilities(context.actor, 'tests:write', row) : [],
  };
}

const authorizeMeasurement = async (context: RequestContext, id: string) =>
  showEntry(context, 'tests:write', 'measurement', await findMeasurement(context.actor, id));
const authorizeBodySize = async (context: RequestContext, id: string) =>
  showEntry(context, 'tests:write', 'body-size', await findBodySize(context.actor, id));

export const measurementsRoutes: Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/patients/:id/tests',
    contract: {
      summary: 'Spirometry tests, single results and body sizes together, newest first',
      params: idParams,
      query: page,
      response: testList,
    },
    access: 'tests:read',
    audit: 'test.list',
    handler: async ({ context, params, query }) => {
      const patient = await loadPatient(context, params.id, 'tests:read');
      return await listTests(context.actor, patient.id, query, presentTestListItem);
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/patients/:id/measurements',
    contract: {
      summary: 'Results entered as one number, newest first',
      params: idParams,
      query: measurementListQuery,
      response: measurementList,
    },
    access: 'tests:read',
    audit: 'measurement.list',
    handler: async ({ context, params, query }) => {
      const patient = await loadPatient(context, params.id, 'tests:read');
      return await listMeasurements(context.actor, patient.id, query, presentMeasurement);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/patients/:id/measurements',
    contract: {
      summary: 'Record a result that is one number',
      params: idParams,
      body: measurementCreate,
      response: measurementResponse,
      status: 201,
    },
    access: 'tests:write',
    audit: 'measurement.create',
    handler: async ({ context, params, body }) => {
      const patient = await loadPatient(context, params.id, 'tests:write');
      const { row, isNew } = await recordMeasurement(context, patient, body);
      const found = (await findMeasurement(context.actor, row.id))!;
      return new Reply(isNew ? 201 : 200, { measurement: presentMeasurement(found) });
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/measurements/:id',
    contract: { summary: 'A result with its history', params: idParams, response: measurementDetail },
    access: 'tests:read',
    audit: 'measurement.read',
    handler: async ({ context, params }) => await measurementAnswer(context, params.id),
  }),
  defineRoute({
    method: 'post',
    path: '/api/measurements/:id/amend',
    contract: {
      summary: 'Change a result with a reason',
      params: idParams,
      body: measurementAmendBody,
      response: measurementDetail,
    },
    access: 'tests:write',
    audit: 'measurement.amend',
    handler: async ({ context, params, body }) => {
      await authorizeMeasurement(context, params.id);
      await amendMeasurement(context, params.id, body);
      return await measurementAnswer(context, params.id);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/measurements/:id/void',
    contract: {
      summary: 'Take a result out of trends, flags and summaries',
      params: idParams,
      body: voidBody,
      response: measurementDetail,
    },
    access: 'tests:write',
    audit: 'measurement.void',
    handler: async ({ context, params, body }) => {
      await authorizeMeasurement(context, params.id);
      await voidEntry(context, 'measurement', params.id, body);
      return await measurementAnswer(context, params.id);
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/patients/:id/body-sizes',
    contract: {
      summary: 'Heights and weights, newest first',
      params: idParams,
      query: page,
      response: bodySizeList,
    },
    access: 'tests:read',
    audit: 'body-size.list',
    handler: async ({ context, params, query }) => {
      const patient = await loadPatient(context, params.id, 'tests:read');
      return await listBodySizes(context.actor, patient.id, query, presentBodySize);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/patients/:id/body-sizes',
    contract: {
      summary: 'Record a height, a weight or both',
      params: idParams,
      body: bodySizeCreate,
      response: bodySizeResponse,
      status: 201,
    },
    access: 'tests:write',
    audit: 'body-size.create',
    handler: async ({ context, params, body }) => {
      const patient = await loadPatient(context, params.id, 'tests:write');
      const { row, isNew } = await recordBodySize(context, patient, body);
      const found = (await findBodySize(context.actor, row.id))!;
      return new Reply(isNew ? 201 : 200, { bodySize: presentBodySize(found) });
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/body-sizes/:id',
    contract: { summary: 'A height and weight with their history', params: idParams, response: bodySizeDetail },
    access: 'tests:read',
    audit: 'body-size.read',
    handler: async ({ context, params }) => await bodySizeAnswer(context, params.id),
  }),
  defineRoute({
    method: 'post',
    path: '/api/body-sizes/:id/amend',
    contract: {
      summary: 'Change a height or weight with a reason',
      params: idParams,
      body: bodySizeAmendBody,
      response: bodySizeDetail,
    },
    access: 'tests:write',
    audit: 'body-size.amend',
    handler: async ({ context, params, body }) => {
      await authorizeBodySize(context, params.id);
      await amendBodySize(context, params.id, body);
      return await bodySizeAnswer(context, params.id);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/body-sizes/:id/void',
    contract: {
      summary: 'Take a height and weight out of use',
      params: idParams,
      body: voidBody,
      response: bodySizeDetail,
    },
    access: 'tests:write',
    audit: 'body-size.void',
    handler: async ({ context, params, body }) => {
      await authorizeBodySize(context, params.id);
      await voidEntry(context, 'body-size', params.id, body);
      return await bodySizeAnswer(context, params.id);
    },
  }),
];
