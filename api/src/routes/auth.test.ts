import request from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { hashPassword } from '../auth/passwords';
import { execute, selectRow, selectRows } from '../db/query';
import type { User } from '../models/user';
import { makeClinic, makeUser, type TestClinic } from '../testing/factories/clinic';
import { makePatient } from '../testing/factories/patient';
import { newId } from '../testing/factories/scene';
import { Client, startTestServer, type TestServer } from '../testing/server';
import type { Role } from '@slighthill/shared/permissions';

let server: TestServer;
let own: TestClinic;
let passwordHash: string;
const password = 'a slight hill at dawn';
const minute = 60_000;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
  passwordHash = await hashPassword(password);
});
afterAll(() => server.close());
// Failed tries of one address add up over files of a worker; each test starts from none.
beforeEach(() => execute('delete from rate_limits'));

const account = (roles: Role[] = ['therapist'], extra: Partial<User> = {}) =>
  makeUser(own.clinic.id, roles, { passwordHash, ...extra });
const signIn = (email: string, secret = password) =>
  server.anonymous.post('/api/auth/sign-in', { email, password: secret });
const clientOf = (response: request.Response) =>
  new Client(server.base, (response.headers['set-cookie'] as unknown as string[])[0]!.split(';')[0]!);

describe('signing in', () => {
  it('opens a session whose cookie is HttpOnly and SameSite, and keeps its token only as a hash', async () => {
    const user = await account();
    const response = await signIn(`  ${user.email.toUpperCase()} `);
    expect(response.status).toBe(200);
    expect(response.body.user).toMatchObject({ id: user.id, idleSeconds: 900, firstPath: '/patients' });
    expect(response.text).not.toContain(passwordHash);
    const [cookie] = response.headers['set-cookie'] as unknown as string[];
    expect(cookie).toMatch(/; HttpOnly/);
    expect(cookie).toMatch(/; SameSite=Lax/i);
    expect(cookie).toMatch(/; Path=\//);
    const token = cookie!.split(';')[0]!.split('=')[1]!;
    const sessions = await selectRows('select to_jsonb(s) as row from auth_sessions s where user_id = $id', {
      id: user.id,
    });
    expect(sessions).toHaveLength(1);
    expect(JSON.stringify(sessions)).not.toContain(token);
    await clientOf(response).get('/api/auth/me').expect(200);
    const audit = await selectRow(
      `select outcome from audit_events where actor_id = $id and action = 'account.sign-in'`,
      {
        id: user.id,
      },
    );
    expect(audit).toEqual({ outcome: 'done' });
  });

  it('answers a wrong password, an unknown account, one without a password and a disabled one alike', async () => {
    const known = await account();
    const invited = await account(['therapist'], { passwordHash: null });
    const disabled = await account(['therapist'], { disabledAt: server.clock.now() });
    const answers = [
      await signIn(known.email, 'not the password'),
      await signIn(`${newId()}@clinic.test`),
      await signIn(invited.email),
      await signIn(disabled.email),
    ];
    for (const answer of answers) {
      expect(answer.status).toBe(401);
      expect(answer.body).toEqual(answers[0]!.body);
      expect(answer.headers['set-cookie']).toBeUndefined();
    }
    expect(answers[0]!.body.type).toBe('/problems/wrong-credentials');
  });

  it('takes about as long for an unknown account as for a wrong password', async () => {
    const timed = async (email: () => Promise<string>) => {
      const taken: number[] = [];
      for (let i = 0; i < 9; i += 1) {
        const address = await email();
        const startedAt = process.hrtime.bigint();
        await signIn(address, 'not the password');
        taken.push(Number(process.hrtime.bigint() - startedAt));
      }
      return taken.sort((a, b) => a - b)[4]!;
    };
    await signIn(`${newId()}@clinic.test`);
    const known = await timed(async () => (await account()).email);
    const unknown = await timed(async () => `${newId()}@clinic.test`);
    // without the same work an unknown account would answer several times faster; the bound leaves room for a busy machine
    expect(unknown / known).toBeGreaterThan(0.4);
    expect(unknown / known).toBeLessThan(2.5);
  });

  it('stops after ten failures of one account, says how long, and leaves others alone', async () => {
    const [user, neighbor] = [await account(), await account()];
    for (let i = 0; i < 10; i += 1) expect((await signIn(user.email, 'wrong')).status).toBe(401);
    const stopped = await signIn(user.email.toUpperCase());
    expect(stopped.status).toBe(429);
    expect(stopped.body.type).toBe('/problems/too-many-requests');
    const wait = Number(stopped.headers['retry-after']);
    expect(wait).toBeGreaterThan(0);
    expect(wait).toBeLessThanOrEqual(900);
    expect((await signIn(neighbor.email)).status).toBe(200);
  });

  it('stops an address that fails for many accounts', async () => {
    await signIn(`${newId()}@clinic.test`);
    await execute(`update rate_limits set hits = 99 where key like 'sign-in-address:%'`);
    expect((await signIn(`${newId()}@clinic.test`)).status).toBe(401);
    expect((await signIn((await account()).email)).status).toBe(429);
  });

  it('does not count successes as failures', async () => {
    const user = await account();
    for (let i = 0; i < 12; i += 1) expect((await signIn(user.email)).status).toBe(200);
  });

  it('asks for both fields', async () => {
    const empty = await server.anonymous.post('/api/auth/sign-in', {});
    expect(empty.status).toBe(422);
    expect(empty.body.errors.map((error: { path: string }) => error.path)).toEqual(['email', 'password']);
  });
});

describe('a session', () => {
  it('of staff goes idle after 15 minutes, with a type of its own', async () => {
    const client = await server.signedIn((await account()).id);
    server.clock.advance(15 * minute - 1);
    await client.get('/api/auth/me').expect(200);
    server.clock.advance(15 * minute);
    const idle = await client.get('/api/patients');
    expect(idle.status).toBe(401);
    expect(idle.body.type).toBe('/problems/session-idle');
    const after = await client.get('/api/patients');
    expect(after.body.type).toBe('/problems/not-signed-in');
  });

  it('is not kept open by background requests, and is by activity', async () => {
    const [idle, busy] = [await server.signedIn((await account()).id), await server.signedIn((await account()).id)];
    for (let i = 0; i < 3; i += 1) {
      server.clock.advance(4 * minute);
      await idle.get('/api/auth/me').set('X-Background', '1').expect(200);
      await busy.post('/api/auth/activity').expect(204);
    }
    server.clock.advance(3 * minute);
    expect((await idle.get('/api/auth/me').set('X-Background', '1')).body.type).toBe('/problems/session-idle');
    await busy.get('/api/auth/me').expect(200);
  });

  it('ends after 12 hours however busy, and a patient\u2019s does not go idle before that', async () => {
    const staff = await server.signedIn((await account()).id);
    const { id: patientId } = await makePatient(own.clinic.id);
    const patient = await server.signedIn((await account(['patient'], { patientId })).id);
    for (let i = 0; i < 72; i += 1) {
      server.clock.advance(10 * minute);
      await staff.post('/api/auth/activity').expect(204);
    }
    await patient.get('/api/me/home').expect(200);
    server.clock.advance(1);
    for (const client of [staff, patient])
      expect((await client.get('/api/auth/me')).body.type).toBe('/problems/not-signed-in');
  });

  it('ends on sign-out, and the cookie is taken back', async () => {
    const client = await server.signedIn((await account()).id);
    const neighbor = await server.signedIn((await account()).id);
    const out = await client.post('/api/auth/sign-out');
    expect(out.status).toBe(204);
    expect(String(out.headers['set-cookie'])).toMatch(/slighthill=; .*Max-Age=0/);
    await client.get('/api/auth/me').expect(401);
    await neighbor.get('/api/auth/me').expect(200);
  });

  it('ends at once with new roles or a disabled account, not with a new name', async () => {
    const user = await account();
    const client = await server.signedIn(user.id);
    const administrator = await server.signedIn(own.users.administrator.id);
    const patch = (body: object) => administrator.patch(`/api/users/${user.id}`, body);
    await patch({ version: 1, displayName: 'New name' }).expect(200);
    await client.get('/api/auth/me').expect(200);
    await patch({ version: 2, roles: ['coordinator'] }).expect(200);
    await client.get('/api/auth/me').expect(401);
    const again = await server.signedIn(user.id);
    await again.post('/api/patients', {}).expect(422);
    await patch({ version: 3, disabled: true }).expect(200);
    await again.get('/api/auth/me').expect(401);
    expect((await signIn(user.email)).status).toBe(401);
    await patch({ version: 4, disabled: false }).expect(200);
    expect((await signIn(user.email)).status).toBe(200);
  });

  it('keeps an administrator from locking the own account out', async () => {
    const administrator = await server.signedIn(own.users.administrator.id);
    const path = `/api/users/${own.users.administrator.id}`;
    for (const change of [{ disabled: true }, { roles: ['therapist'] }])
      await administrator.patch(path, { version: 1, ...change }).expect(409);
  });

  it.each([
    'slighthill=%E0%A4%A',
    'slighthill=',
    'slighthill=;;;',
    '%=%',
    `slighthill=${'x'.repeat(3000)}`,
    'slighthill="',
  ])('that cannot be read is no session: %s', async (cookie) => {
    const response = await new Client(server.base, cookie).get('/api/auth/me');
    expect(response.status).toBe(401);
    expect(response.body.type).toBe('/problems/not-signed-in');
  });
});

describe('writes from elsewhere', () => {
  it.each([
    ['https://elsewhere.test', 403],
    ['null', 403],
    ['', 403],
    [undefined, 403],
  ])('with the origin %s are refused', async (origin, status) => {
    const client = await server.signedIn((await account(['coordinator'])).id);
    for (const method of ['post', 'put', 'patch', 'delete'] as const) {
      const call = request(server.base)[method]('/api/drafts/patient/new').set('Cookie', client.cookie!);
      const response = await (origin === undefined ? call : call.set('Origin', origin)).send({ content: {} });
      expect(response.status).toBe(status);
      expect(response.body.type).toBe('/problems/foreign-origin');
    }
    const read = request(server.base).get('/api/auth/me').set('Cookie', client.cookie!);
    await (origin === undefined ? read : read.set('Origin', origin)).expect(200);
  });

  it('covers signing in as well', async () => {
    const user = await account();
    const response = await request(server.base).post('/api/auth/sign-in').send({ email: user.email, password });
    expect(response.status).toBe(403);
    expect(response.headers['set-cookie']).toBeUndefined();
  });
});
