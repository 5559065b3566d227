import { draftBody, draftParams, draftResponse } from '@slighthill/shared/contracts/draft';
import { defineRoute, type Route } from '../http/define-route';
import type { RequestContext } from '../http/request-context';
import { Draft } from '../models/draft';
import { Patient } from '../models/patient';
import { visibleTo } from '../policies/policy';
import { discardDraft, saveDraft } from '../services/save-draft';

/** Drafts are their owner's alone; one about a patient needs a patient the owner may see. */
async function authorizeDraft(context: RequestContext, subject: string): Promise<void> {
  context.authorizeOwn('drafts:own');
  if (subject === 'new') return;
  const row = await Patient.findOne({
    where: { id: subject, ...visibleTo(context.actor) },
    attributes: ['id', 'clinicId'],
  });
  context.authorizeRow('drafts:own', row, 'This patient');
}

const present = (row: Draft) => ({
  content: row.content,
  savedAt: row.savedAt.toISOString(),
  expiresAt: row.expiresAt.toISOString(),
});

export const draftsRoutes: Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/drafts/:form/:subject',
    contract: { summary: 'One\u2019s own unfinished form', params: draftParams, response: draftResponse },
    access: 'drafts:own',
    audit: 'draft.read',
    handler: async ({ context, params }) => {
      await authorizeDraft(context, params.subject);
      const row = await Draft.findOne({ where: { ownerId: context.actor.userId, ...params } });
      const isCurrent = row !== null && row.expiresAt.getTime() > context.clock.now().getTime();
      return { draft: isCurrent ? present(row) : null };
    },
  }),
  defineRoute({
    method: 'put',
    path: '/api/drafts/:form/:subject',
    contract: { summary: 'Keep an unfinished form', params: draftParams, body: draftBody, response: draftResponse },
    access: 'drafts:own',
    audit: 'draft.save',
    handler: async ({ context, params, body }) => {
      await authorizeDraft(context, params.subject);
      return { draft: present(await saveDraft(context, params, body.content)) };
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/drafts/:form/:subject',
    contract: { summary: 'Throw an unfinished form away', params: draftParams, response: null },
    access: 'drafts:own',
    audit: 'draft.discard',
    handler: async ({ context, params }) => {
      await authorizeDraft(context, params.subject);
      await discardDraft(context, params);
    },
  }),
];
