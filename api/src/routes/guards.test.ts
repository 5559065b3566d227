import { abilities, roles, type Role } from '@slighthill/shared/permissions';
import express from 'express';
import fc from 'fast-check';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { pino } from 'pino';
import { z } from 'zod';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { selectRow } from '../db/query';
import { defineRoute, type Route } from '../http/define-route';
import { errorHandler } from '../http/error-handler';
import type { RequestContext } from '../http/request-context';
import { mountRoutes } from '../http/mount-routes';
import { Patient } from '../models/patient';
import type { Actor } from '../policies/actor';
import { can, visibleTo } from '../policies/policy';
import { makeClinic, makeUser, type TestClinic } from '../testing/factories/clinic';
import { makePatient } from '../testing/factories/patient';
import { addEnrollment, addPatient } from '../testing/factories/scene';
import { Client, startTestServer, type TestServer } from '../testing/server';
import { allRoutes } from './all-routes';

let server: TestServer;
let own: TestClinic;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
});
afterAll(() => server.close());

const actorOf = (clinicId: string, held: readonly Role[]): Actor => ({
  userId: '4f6f1c0e-0000-4000-8000-000000000001',
  displayName: 'Test person',
  roles: held,
  patientId: null,
  clinicId,
  clinic: { timeZone: 'America/Denver' } as Actor['clinic'],
});

describe('policies', () => {
  it('finds with visibleTo exactly the rows that can(read) allows', async () => {
    const clinics = [own, await makeClinic(server), await makeClinic(server)].map((made) => made.clinic.id);
    for (const clinicId of clinics) for (let i = 0; i < 4; i += 1) await makePatient(clinicId);
    const all = await Patient.findAll({ where: { clinicId: clinics } });
    const readers: readonly Role[] = ['coordinator', 'therapist', 'pulmonologist'];
    await fc.assert(
      fc.asyncProperty(
        fc.constantFrom(...clinics),
        fc.uniqueArray(fc.constantFrom(...roles), { minLength: 1 }),
        async (clinicId, held) => {
          const actor = actorOf(clinicId, held);
          const allowed = all.filter((row) => can(actor, 'patients:read', row)).map((row) => row.id);
          const mayRead = held.some((role) => readers.includes(role));
          const found = mayRead
            ? await Patient.findAll({ where: { id: all.map((row) => row.id), ...visibleTo(actor) } })
            : [];
          expect(found.map((row) => row.id).sort()).toEqual(allowed.sort());
          expect(allowed.length > 0).toBe(mayRead);
        },
      ),
      { seed: 20260615, numRuns: 40 },
    );
  });

  it('keeps an owned row to its owner', () => {
    const actor = actorOf(own.clinic.id, ['therapist']);
    expect(can(actor, 'drafts:own', { clinicId: own.clinic.id, ownerId: actor.userId })).toBe(true);
    expect(can(actor, 'drafts:own', { clinicId: own.clinic.id, ownerId: own.users.therapist.id })).toBe(false);
  });

  it('adds up the abilities of several roles', async () => {
    const both = await server.signedIn((await makeUser(own.clinic.id, ['administrator', 'pulmonologist'])).id);
    const abilitiesOf = async (client: Client) => (await client.get('/api/auth/me')).body.user.abilities as string[];
    const expected = new Set([
      ...(await abilitiesOf(own.as.administrator)),
      ...(await abilitiesOf(own.as.pulmonologist)),
    ]);
    expect(await abilitiesOf(both)).toEqual(abilities.filter((ability) => expected.has(ability)));
    await both.get('/api/users').expect(200);
    await both.get(`/api/patients/${own.users.patient.patientId!}/trends`).expect(200);
    await both.post('/api/patients', {}).expect(403);
  });
});

describe('PATCH that says nothing', () => {
  const targets: Record<string, () => Promise<{ path: string; table: string; id: string }>> = {
    '/api/clinic': async () => ({ path: '/api/clinic', table: 'clinics', id: own.clinic.id }),
    '/api/users/:id': async () => ({ path: '', table: 'users', id: (await makeUser(own.clinic.id, ['therapist'])).id }),
    '/api/programs/:id': async () => ({ path: '', table: 'programs', id: own.program.id }),
    '/api/patients/:id': async () => {
      const details = { email: 'leland@patient.test', phone: '555-0100', recordNumber: 'K-77' };
      return { path: '', table: 'patients', id: await addPatient(own, details) };
    },
    '/api/enrollments/:id': async () => {
      const { id } = await addEnrollment(own, await addPatient(own), { consentOn: '2026-03-01' });
      return { path: '', table: 'enrollments', id };
    },
  };
  const patches = allRoutes({ sessions: {} as never, clock: { now: () => new Date() } }).filter(
    (route) => route.method === 'patch',
  );

  it.each(patches.map((route) => route.path))('%s changes nothing', async (pattern) => {
    const { path, table, id } = await targets[pattern]!();
    const address = path || pattern.replace(':id', id);
    const row = async () => await selectRow(`select to_jsonb(t) as row from ${table} t where id = $id`, { id });
    const before = await row();
    const client = /patients|enrollments/.test(pattern) ? own.as.coordinator : own.as.administrator;
    const empty = await client.patch(address, {});
    expect(empty.status).toBe(422);
    expect(empty.body.errors).toEqual([{ path: 'version', message: 'The version is missing' }]);
    const versionOnly = await client.patch(address, { version: 1 });
    expect(versionOnly.body.errors).toBeUndefined();
    expect(versionOnly.status).toBe(200);
    expect(await row()).toEqual(before);
  });
});

describe('the guard of routes about one row', () => {
  const params = z.strictObject({ id: z.string() });
  const response = z.object({ name: z.string() });
  type Handler = (input: { context: RequestContext }) => Promise<{ name: string }>;
  const route = (handler: Handler): Route =>
    defineRoute({
      method: 'get',
      path: '/api/things/:id',
      contract: { summary: 'A thing', params, response },
      access: 'signed-in',
      audit: 'thing.read',
      handler,
    });
  const authorized =
    (clinicId: string, name: unknown = 'x'): Handler =>
    async ({ context }) => {
      context.authorizeRow('users:manage', { clinicId }, 'This thing');
      return { name: name as string };
    };

  async function answerOf(thing: Route, who: Role): Promise<number> {
    const app = express();
    mountRoutes(app, [thing], { sessions: server.sessions, clock: server.clock, limits: {}, checkResponses: true });
    app.use(errorHandler(pino({ level: 'silent' })));
    const listening = await new Promise<Server>((resolve) => {
      const opened = app.listen(0, '127.0.0.1', () => resolve(opened));
    });
    try {
      const base = `http://127.0.0.1:${(listening.address() as AddressInfo).port}`;
      return (await new Client(base, own.as[who].cookie).get('/api/things/1')).status;
    } finally {
      await new Promise((resolve) => listening.close(resolve));
    }
  }

  it('fails an answer whose row nobody authorized', async () => {
    expect(
      await answerOf(
        route(async () => ({ name: 'x' })),
        'administrator',
      ),
    ).toBe(500);
  });

  it('passes one whose row was authorized, and tells not-visible from not-allowed', async () => {
    const mine = route(authorized(own.clinic.id));
    const foreign = route(authorized('4f6f1c0e-0000-4000-8000-000000000002'));
    expect(await answerOf(mine, 'administrator')).toBe(200);
    expect(await answerOf(mine, 'therapist')).toBe(403);
    expect(await answerOf(foreign, 'administrator')).toBe(404);
  });

  it('fails an answer that breaks its contract', async () => {
    expect(await answerOf(route(authorized(own.clinic.id, 7)), 'administrator')).toBe(500);
  });
});
