import {
  auditList,
  auditQuery,
  clinicPatch,
  clinicResponse,
  invitationIssued,
  program,
  programCreate,
  programList,
  programPatch,
  staffUser,
  staffUserCreated,
  userCreate,
  userList,
  userPatch,
} from '@slighthill/shared/contracts/clinic';
import { cursorQuery, idParams } from '@slighthill/shared/contracts/common';
import { z } from 'zod';
import { notFound } from '../errors/app-error';
import { defineRoute, Reply, type Route } from '../http/define-route';
import type { RequestContext } from '../http/request-context';
import { Clinic } from '../models/clinic';
import { presentAuditEvent, presentClinic, presentProgram, presentStaffUser } from '../presenters/clinic';
import { findProgram, findStaffUser, listAuditEvents, listPrograms, listStaffUsers } from '../queries/clinic-lists';
import type { IssuedLink } from '../services/invitations';
import { addProgram, updateClinic, updateProgram } from '../services/manage-clinic';
import { followInBackground } from '../services/follow-in-background';
import { addUser, inviteAgain, updateUser } from '../services/manage-users';

const page = z.strictObject(cursorQuery);

const userAnswer = async (context: RequestContext, id: string) =>
  presentStaffUser((await findStaffUser(context.actor, id))!);
const programAnswer = async (context: RequestContext, id: string) =>
  presentProgram((await findProgram(context.actor, id))!);
const presentLink = (link: IssuedLink) => ({ path: link.path, expiresAt: link.expiresAt.toISOString() });

export const clinicRoutes: Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/clinic',
    contract: { summary: 'The clinic and its default rules', response: clinicResponse },
    access: 'clinic:manage',
    audit: 'clinic.read',
    handler: async ({ context }) => {
      const clinic = await Clinic.findByPk(context.actor.clinicId);
      if (!clinic) throw notFound();
      return { clinic: presentClinic(clinic) };
    },
  }),
  defineRoute({
    method: 'patch',
    path: '/api/clinic',
    contract: { summary: 'Change the clinic or its default rules', body: clinicPatch, response: clinicResponse },
    access: 'clinic:manage',
    audit: 'clinic.change',
    handler: async ({ context, body }) => {
      const { clinic, rulesChanged } = await updateClinic(context, body);
      // records and trends follow at once; the summaries in lists are worked out again behind the answer
      if (rulesChanged) followInBackground(clinic);
      return { clinic: presentClinic(clinic) };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/users',
    contract: { summary: 'The clinic\u2019s staff', query: page, response: userList },
    access: 'users:manage',
    audit: 'user.list',
    handler: async ({ context, query }) => await listStaffUsers(context.actor, query, presentStaffUser),
  }),
  defineRoute({
    method: 'post',
    path: '/api/users',
    contract: { summary: 'Add a member of staff', body: userCreate, response: staffUserCreated, status: 201 },
    access: 'users:manage',
    audit: 'user.create',
    handler: async ({ context, body }) => {
      const { user, link, isNew } = await addUser(context, body);
      const answer = { user: await userAnswer(context, user.id), invitation: link && presentLink(link) };
      return new Reply(isNew ? 201 : 200, answer);
    },
  }),
  defineRoute({
    method: 'patch',
    path: '/api/users/:id',
    contract: {
      summary: 'Change a member of staff, their roles or access',
      params: idParams,
      body: userPatch,
      response: z.object({ user: staffUser }),
    },
    access: 'users:manage',
    audit: 'user.change',
    handler: async ({ context, params, body }) => {
      context.authorizeRow('users:manage', await findStaffUser(context.actor, params.id), 'This person');
      await updateUser(context, params.id, body);
      return { user: await userAnswer(context, params.id) };
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/users/:id/invitation',
    contract: {
      summary: 'A new single-use link to choose a password',
      params: idParams,
      response: z.object({ invitation: invitationIssued }),
      status: 201,
    },
    access: 'users:manage',
    audit: 'user.invite',
    handler: async ({ context, params }) => {
      context.authorizeRow('users:manage', await findStaffUser(context.actor, params.id), 'This person');
      return { invitation: presentLink(await inviteAgain(context, params.id)) };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/programs',
    contract: { summary: 'Programs a patient can be enrolled in', query: page, response: programList },
    access: 'programs:read',
    audit: 'program.list',
    handler: async ({ context, query }) => await listPrograms(context.actor, query, presentProgram),
  }),
  defineRoute({
    method: 'post',
    path: '/api/programs',
    contract: { summary: 'Add a program', body: programCreate, response: z.object({ program }), status: 201 },
    access: 'programs:manage',
    audit: 'program.create',
    handler: async ({ context, body }) => {
      const { row, isNew } = await addProgram(context, body);
      return new Reply(isNew ? 201 : 200, { program: await programAnswer(context, row.id) });
    },
  }),
  defineRoute({
    method: 'patch',
    path: '/api/programs/:id',
    contract: {
      summary: 'Change or retire a program',
      params: idParams,
      body: programPatch,
      response: z.object({ program }),
    },
    access: 'programs:manage',
    audit: 'program.change',
    handler: async ({ context, params, body }) => {
      context.authorizeRow('programs:manage', await findProgram(context.actor, params.id), 'This program');
      await updateProgram(context, params.id, body);
      return { program: await programAnswer(context, params.id) };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/audit-events',
    contract: { summary: 'Who saw or changed what, newest first', query: auditQuery, response: auditList },
    access: 'audit:read',
    audit: 'audit.read',
    handler: async ({ context, query }) => {
      const list = await listAuditEvents(context.actor, query, presentAuditEvent);
      // the trail names patients, so reading it is an event as well
      context.audit.showsPatients(...list.items.flatMap((event) => event.patients.map((patient) => patient.id)));
      return list;
    },
  }),
];
