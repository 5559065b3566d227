import type { AddressInfo } from 'node:net';
import type { Server } from 'node:http';
import request from 'supertest';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { createApp } from '../app';
import { hashPassword } from '../auth/passwords';
import { makeClinic, makeUser } from '../testing/factories/clinic';
import { startTestServer, type TestServer } from '../testing/server';

let server: TestServer;
let listening: Server;
let base: string;
const publicOrigin = 'https://rehab.example.test';

beforeAll(async () => {
  server = await startTestServer();
  const { express } = createApp({ clock: server.clock, checkResponses: true, publicOrigin });
  listening = await new Promise<Server>((resolve) => {
    const opened = express.listen(0, '127.0.0.1', () => resolve(opened));
  });
  base = `http://127.0.0.1:${(listening.address() as AddressInfo).port}`;
});
afterAll(async () => {
  await new Promise((resolve) => listening.close(resolve));
  await server.close();
});

it('on a public address the cookie is Secure and bound to the host, and only that address may write', async () => {
  const clinic = await makeClinic(server);
  const password = 'a slight hill at dawn';
  const { email } = await makeUser(clinic.clinic.id, ['therapist'], { passwordHash: await hashPassword(password) });
  const signIn = (origin: string) =>
    request(base).post('/api/auth/sign-in').set('Origin', origin).send({ email, password });
  const answer = await signIn(publicOrigin);
  expect(answer.status).toBe(200);
  const [cookie] = answer.headers['set-cookie'] as unknown as string[];
  expect(cookie).toMatch(/^__Host-slighthill=[^;]+;/);
  for (const flag of [/; Secure/, /; HttpOnly/, /; SameSite=Lax/i, /; Path=\/(;|$)/]) expect(cookie).toMatch(flag);
  expect(cookie).not.toMatch(/Domain=/i);
  expect(answer.headers['strict-transport-security']).toMatch(/max-age=\d{7,}/);
  for (const origin of [base, 'https://elsewhere.test']) expect((await signIn(origin)).status).toBe(403);
  const me = await request(base).get('/api/auth/me').set('Cookie', cookie!.split(';')[0]!);
  expect(me.status).toBe(200);
  expect(me.headers['cache-control']).toBe('no-store');
});
