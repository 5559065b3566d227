import { idParams, voidBody } from '@slighthill/shared/contracts/common';
import {
  fileEntryAmendBody,
  fileEntryCreate,
  fileEntryDetail,
  fileEntryList,
  fileEntryListQuery,
  fileEntryResponse,
  holdReleaseBody,
} from '@slighthill/shared/contracts/file-entry';
import { defineRoute, Reply, type Route } from '../http/define-route';
import { loadPatient, showEntry } from '../http/load';
import type { RequestContext } from '../http/request-context';
import { fileChangeAbility, fileEntryAbilities } from '../policies/entry-abilities';
import { presentFileEntry } from '../presenters/file-entry';
import { findFileEntry, listFileEntries } from '../queries/file-entries';
import { historyOf } from '../queries/history-of';
import { amendFileEntry } from '../services/amend-file-entry';
import { recordFileEntry } from '../services/record-file-entry';
import { releaseHold } from '../services/release-hold';
import { voidEntry } from '../services/void-entry';

async function detail(context: RequestContext, id: string) {
  const row = showEntry(context, 'file:read', 'file-entry', await findFileEntry(context.actor, id));
  return {
    entry: presentFileEntry(row),
    history: await historyOf(context.actor, 'file-entry', id),
    abilities: fileEntryAbilities(context.actor, row),
  };
}

/** Judges the entry as it stands and, when its details change, as it would become. */
async function authorizeChange(context: RequestContext, id: string, details?: Record<string, unknown>): Promise<void> {
  const row = await findFileEntry(context.actor, id);
  showEntry(context, 'file:write', 'file-entry', row);
  if (!row) return;
  context.authorize(fileChangeAbility(row.kind, row.details));
  if (details) context.authorize(fileChangeAbility(row.kind, details));
}

export const fileEntriesRoutes: Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/patients/:id/file-entries',
    contract: {
      summary: 'The record\u2019s file: diagnoses, exacerbations, oxygen, medicines, smoking, safety holds',
      params: idParams,
      query: fileEntryListQuery,
      response: fileEntryList,
    },
    access: 'file:read',
    audit: 'file-entry.list',
    handler: async ({ context, params, query }) => {
      const patient = await loadPatient(context, params.id, 'file:read');
      return await listFileEntries(context.actor, patient.id, query, presentFileEntry);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/patients/:id/file-entries',
    contract: {
      summary: 'Add an entry to the file',
      params: idParams,
      body: fileEntryCreate,
      response: fileEntryResponse,
      status: 201,
    },
    access: 'file:write',
    audit: 'file-entry.create',
    handler: async ({ context, params, body }) => {
      const patient = await loadPatient(context, params.id, 'file:write');
      // anyone on the staff may raise a hold; only an order of this clinic is reserved
      if (body.kind === 'oxygen-order') context.authorize(fileChangeAbility(body.kind, body.details));
      const { row, isNew } = await recordFileEntry(context, patient, body);
      const found = (await findFileEntry(context.actor, row.id))!;
      return new Reply(isNew ? 201 : 200, { entry: presentFileEntry(found) });
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/file-entries/:id',
    contract: { summary: 'An entry of the file with its history', params: idParams, response: fileEntryDetail },
    access: 'file:read',
    audit: 'file-entry.read',
    handler: async ({ context, params }) => await detail(context, params.id),
  }),
  defineRoute({
    method: 'post',
    path: '/api/file-entries/:id/amend',
    contract: {
      summary: 'Change an entry of the file with a reason',
      params: idParams,
      body: fileEntryAmendBody,
      response: fileEntryDetail,
    },
    access: 'file:write',
    audit: 'file-entry.amend',
    handler: async ({ context, params, body }) => {
      await authorizeChange(context, params.id, body.details);
      await amendFileEntry(context, params.id, body);
      return await detail(context, params.id);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/file-entries/:id/void',
    contract: {
      summary: 'Take an entry of the file out of use',
      params: idParams,
      body: voidBody,
      response: fileEntryDetail,
    },
    access: 'file:write',
    audit: 'file-entry.void',
    handler: async ({ context, params, body }) => {
      await authorizeChange(context, params.id);
      await voidEntry(context, 'file-entry', params.id, body);
      return await detail(context, params.id);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/file-entries/:id/release',
    contract: {
      summary: 'Release a safety hold with a reason',
      params: idParams,
      body: holdReleaseBody,
      response: fileEntryDetail,
    },
    access: 'holds:release',
    audit: 'file-entry.release',
    handler: async ({ context, params, body }) => {
      showEntry(context, 'holds:release', 'file-entry', await findFileEntry(context.actor, params.id));
      await releaseHold(context, params.id, body.version, body.reason);
      return await detail(context, params.id);
    },
  }),
];
