import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { hashPassword } from '../auth/passwords';
import { execute, selectRows } from '../db/query';
import { systemClock } from '../time/system-clock';
import { createClinic } from '../services/create-clinic';
import { makeClinic, makeUser, type TestClinic } from '../testing/factories/clinic';
import { newId } from '../testing/factories/scene';
import { startTestServer, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;
const password = 'twelve chars';

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
});
afterAll(() => server.close());
beforeEach(() => execute('delete from rate_limits'));

async function invite(): Promise<{ id: string; email: string; token: string }> {
  const administrator = await server.signedIn(own.users.administrator.id);
  const email = `${newId()}@clinic.test`;
  const made = await administrator.post('/api/users', { displayName: 'New person', email, roles: ['therapist'] });
  expect(made.status).toBe(201);
  expect(made.body.user.state).toBe('invited');
  return { id: made.body.user.id as string, email, token: tokenOf(made.body.invitation.path as string) };
}
const tokenOf = (path: string) => /^\/welcome#(.{20,})$/.exec(path)![1]!;
const lookUp = (token: string) => server.anonymous.post('/api/auth/invitation/look-up', { token });
const accept = (token: string, chosen = password) =>
  server.anonymous.post('/api/auth/invitation/accept', { token, password: chosen });

describe('an invitation', () => {
  it('says whose it is, sets the password once and signs in', async () => {
    const { id, email, token } = await invite();
    const found = await lookUp(token);
    expect(found.body).toEqual({ displayName: 'New person', email, clinicName: own.clinic.name });
    const accepted = await accept(token);
    expect(accepted.body.user).toMatchObject({ id, email });
    expect(String(accepted.headers['set-cookie'])).toMatch(/slighthill=.+HttpOnly/);
    expect((await accept(token, 'another password')).status).toBe(404);
    expect((await lookUp(token)).status).toBe(404);
    expect((await server.anonymous.post('/api/auth/sign-in', { email, password })).status).toBe(200);
    const rows = await selectRows('select to_jsonb(l) as row from account_links l where user_id = $id', { id });
    expect(JSON.stringify(rows)).not.toContain(token);
  });

  it('is used once when accepted twice at once', async () => {
    const { token } = await invite();
    const answers = await Promise.all([accept(token, 'first password'), accept(token, 'second password')]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 404]);
  });

  it('runs out after 7 days', async () => {
    const { token } = await invite();
    server.clock.advance(7 * 86_400_000 - 1);
    expect((await lookUp(token)).status).toBe(200);
    server.clock.advance(1);
    expect((await lookUp(token)).status).toBe(404);
    expect((await accept(token)).status).toBe(404);
  });

  it('dies when a new one is made, and the new one ends old sessions', async () => {
    const user = await makeUser(own.clinic.id, ['therapist'], { passwordHash: await hashPassword(password) });
    const administrator = await server.signedIn(own.users.administrator.id);
    const again = async () =>
      tokenOf((await administrator.post(`/api/users/${user.id}/invitation`)).body.invitation.path);
    const first = await again();
    const second = await again();
    expect((await lookUp(first)).status).toBe(404);
    const session = await server.signedIn(user.id);
    expect((await accept(second, 'a whole new password')).status).toBe(200);
    await session.get('/api/auth/me').expect(401);
    expect((await server.anonymous.post('/api/auth/sign-in', { email: user.email, password })).status).toBe(401);
  });

  it('of a disabled account opens nothing', async () => {
    const { id, token } = await invite();
    const administrator = await server.signedIn(own.users.administrator.id);
    await administrator.patch(`/api/users/${id}`, { version: 1, disabled: true }).expect(200);
    expect((await lookUp(token)).status).toBe(404);
    expect((await accept(token)).status).toBe(404);
    await administrator.post(`/api/users/${id}/invitation`).expect(409);
  });

  it.each([
    ['elevenchars', 422],
    ['x'.repeat(201), 422],
    ['', 422],
    ['x'.repeat(200), 200],
  ])('holds the password to 12 to 200 characters: %s', async (chosen, status) => {
    const { token } = await invite();
    const answer = await accept(token, chosen);
    expect(answer.status).toBe(status);
    if (status === 422) {
      expect(answer.body.errors[0].path).toBe('password');
      expect((await lookUp(token)).status).toBe(200);
    }
  });

  it('stops guessing of links', async () => {
    for (let i = 0; i < 30; i += 1) await lookUp(`guess-${i}`).then((answer) => expect(answer.status).toBe(404));
    const stopped = await lookUp('one more');
    expect(stopped.status).toBe(429);
    expect(Number(stopped.headers['retry-after'])).toBeGreaterThan(0);
  });
});

describe('a clinic of one\u2019s own', () => {
  it('starts empty, with an administrator who comes in by a single-use link', async () => {
    const adminEmail = `${newId()}@clinic.test`;
    const input = { name: 'Far clinic', timeZone: 'America/Anchorage', adminEmail, adminName: 'Far Admin' };
    server.clock.set(systemClock.now().toISOString());
    const { invitationToken } = await createClinic(input, { clock: server.clock });
    const accepted = await accept(invitationToken);
    expect(accepted.body.user).toMatchObject({ email: adminEmail, areas: ['clinic'], firstPath: '/clinic' });
    await expect(createClinic(input, { clock: server.clock })).rejects.toThrow(/already/);
    await expect(createClinic({ ...input, timeZone: 'Mars/Base' }, { clock: server.clock })).rejects.toThrow(
      /time zone/,
    );
  });
});
