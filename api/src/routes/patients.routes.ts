import { idParams } from '@slighthill/shared/contracts/common';
import {
  duplicateCheckBody,
  duplicateList,
  enrollmentCreate,
  enrollmentList,
  enrollmentPatch,
  enrollmentResponse,
  flagResolveBody,
  flagResponse,
  patientCreate,
  patientList,
  patientListQuery,
  patientPatch,
  patientResponse,
} from '@slighthill/shared/contracts/patient';
import { searchKey } from '@slighthill/shared/search-key';
import { defineRoute, Reply, type Route } from '../http/define-route';
import { loadPatient, showEntry } from '../http/load';
import type { RequestContext } from '../http/request-context';
import { Enrollment } from '../models/enrollment';
import { Flag } from '../models/flag';
import { Patient } from '../models/patient';
import { visibleTo } from '../policies/policy';
import { presentFlag, presentPatient, presentPatientListItem } from '../presenters/patient';
import { findEnrollment, listEnrollments } from '../queries/enrollments';
import { findFlag } from '../queries/find-flag';
import { listPatients } from '../queries/list-patients';
import { findPatientDetail } from '../queries/patient-detail';
import { createPatient } from '../services/create-patient';
import { enrollPatient } from '../services/enroll-patient';
import { resolveFlag } from '../services/resolve-flag';
import { updateEnrollment } from '../services/update-enrollment';
import { updatePatient } from '../services/update-patient';
import { clinicDate } from '../time/clinic-time';

const todayOf = (context: RequestContext) => clinicDate(context.clock.now(), context.actor.clinic.timeZone);

async function patientAnswer(context: RequestContext, id: string) {
  const row = await findPatientDetail(context.actor, id);
  const patient = context.authorizeRow('patients:read', row, 'This patient');
  context.audit.showsPatients(patient.id);
  return { patient: presentPatient(patient, context.actor, todayOf(context)) };
}

export const patientsRoutes: Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/patients',
    contract: {
      summary: 'Patients by name, record number or birth date',
      query: patientListQuery,
      response: patientList,
    },
    access: 'patients:read',
    audit: 'patient.list',
    handler: async ({ context, query }) => {
      const today = todayOf(context);
      const list = await listPatients(context.actor, query, (row) => presentPatientListItem(row, today));
      context.audit.showsPatients(...list.items.map((item) => item.id));
      return list;
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/patients',
    contract: { summary: 'Add a patient', body: patientCreate, response: patientResponse, status: 201 },
    access: 'patients:write',
    audit: 'patient.create',
    handler: async ({ context, body }) => {
      const { row, isNew } = await createPatient(context, body);
      return new Reply(isNew ? 201 : 200, await patientAnswer(context, row.id));
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/patients/duplicate-check',
    contract: {
      summary: 'Patients with the same name and birth date',
      body: duplicateCheckBody,
      response: duplicateList,
    },
    access: 'patients:read',
    audit: 'patient.duplicate-check',
    handler: async ({ context, body }) => {
      const rows = await Patient.findAll({
        where: {
          ...visibleTo(context.actor),
          familyKey: searchKey(body.familyName),
          givenKey: searchKey(body.givenName),
          birthDate: body.birthDate,
        },
        order: ['createdAt', 'id'],
        limit: 10,
      });
      context.audit.showsPatients(...rows.map((row) => row.id));
      return {
        items: rows.map(({ id, givenName, familyName, birthDate, recordNumber }) => ({
          id,
          givenName,
          familyName,
          birthDate,
          recordNumber,
        })),
      };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/patients/:id',
    contract: { summary: 'A patient\u2019s record header', params: idParams, response: patientResponse },
    access: 'patients:read',
    audit: 'patient.read',
    handler: async ({ context, params }) => await patientAnswer(context, params.id),
  }),
  defineRoute({
    method: 'patch',
    path: '/api/patients/:id',
    contract: {
      summary: 'Change a patient\u2019s own data',
      params: idParams,
      body: patientPatch,
      response: patientResponse,
    },
    access: 'patients:write',
    audit: 'patient.change',
    handler: async ({ context, params, body }) => {
      await loadPatient(context, params.id, 'patients:write');
      await updatePatient(context, params.id, body);
      return await patientAnswer(context, params.id);
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/patients/:id/enrollments',
    contract: { summary: 'A patient\u2019s enrollments, newest first', params: idParams, response: enrollmentList },
    access: 'enrollments:read',
    audit: 'enrollment.list',
    handler: async ({ context, params }) => {
      const patient = await loadPatient(context, params.id, 'enrollments:read');
      return { items: await listEnrollments(context.actor, patient.id), nextCursor: null };
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/patients/:id/enrollments',
    contract: {
      summary: 'Enroll a patient in a program',
      params: idParams,
      body: enrollmentCreate,
      response: enrollmentResponse,
      status: 201,
    },
    access: 'enrollments:write',
    audit: 'enrollment.create',
    handler: async ({ context, params, body }) => {
      const patient = await loadPatient(context, params.id, 'enrollments:write');
      const { row, isNew } = await enrollPatient(context, patient, body);
      return new Reply(isNew ? 201 : 200, { enrollment: (await findEnrollment(context.actor, row.id))! });
    },
  }),
  defineRoute({
    method: 'patch',
    path: '/api/enrollments/:id',
    contract: {
      summary: 'Move an enrollment\u2019s dates or state',
      params: idParams,
      body: enrollmentPatch,
      response: enrollmentResponse,
    },
    access: 'enrollments:write',
    audit: 'enrollment.change',
    handler: async ({ context, params, body }) => {
      const row = await Enrollment.findOne({ where: { id: params.id, ...visibleTo(context.actor) } });
      showEntry(context, 'enrollments:write', 'enrollment', row);
      await updateEnrollment(context, params.id, body);
      return { enrollment: (await findEnrollment(context.actor, params.id))! };
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/flags/:id/resolve',
    contract: {
      summary: 'Close a flag with a note',
      params: idParams,
      body: flagResolveBody,
      response: flagResponse,
    },
    access: 'flags:resolve',
    audit: 'flag.resolve',
    handler: async ({ context, params, body }) => {
      const row = await Flag.findOne({ where: { id: params.id, ...visibleTo(context.actor) } });
      showEntry(context, 'flags:resolve', 'flag', row);
      const flag = await resolveFlag(context, params.id, body.version, body.note);
      const found = (await findFlag(context.actor, params.id))!;
      return { flag: { ...presentFlag({ ...found, version: flag.version }), status: flag.status } };
    },
  }),
];
