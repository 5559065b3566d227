import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { patientBody, walkBody } from '../testing/factories/bodies';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { addPatient, fileBody } from '../testing/factories/scene';
import { startTestServer, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;
let patientId: string;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
  patientId = await addPatient(own);
});
afterAll(() => server.close());

describe('a character the database cannot keep', () => {
  const odd = 'Le\u0000land';
  it('in a name, a note, a detail, a draft or a search is bad input, not a fault', async () => {
    const { coordinator, administrator } = own.as;
    const answers = [
      await coordinator.post('/api/patients', patientBody({ givenName: odd })),
      await coordinator.post(`/api/patients/${patientId}/measurements`, { ...walkBody(310), note: odd }),
      await coordinator.post(
        `/api/patients/${patientId}/file-entries`,
        fileBody('diagnosis', { diagnosisGroup: 'ild', description: odd }),
      ),
      await coordinator.put('/api/drafts/patient/new', { content: { givenName: odd } }),
      await coordinator.get(`/api/patients?search=${encodeURIComponent(odd)}`),
      await administrator.post('/api/users', { displayName: odd, email: 'odd@clinic.test', roles: ['therapist'] }),
      await server.anonymous.post('/api/auth/sign-in', { email: odd, password: odd }),
      await server.anonymous.post('/api/auth/invitation/look-up', { token: odd }),
    ];
    expect(answers.map((answer) => answer.status)).toEqual([422, 422, 422, 422, 422, 422, 422, 422]);
  });

  it('half of a surrogate pair is kept out or kept readable', async () => {
    const answer = await own.as.coordinator.post('/api/patients', patientBody({ givenName: 'Le\ud83dland' }));
    expect([201, 422]).toContain(answer.status);
  });
});

describe('a cursor somebody made up', () => {
  const made = (...key: unknown[]) => Buffer.from(JSON.stringify(key)).toString('base64url');
  const uuid = '4f6f1c0e-0000-4000-8000-000000000000';
  const at = '2026-06-10T15:00:00.000Z';
  it.each([
    ['patients', '/api/patients', [made(0, 'a', 'b', 'not-an-id'), made('a', 'a', 'a', uuid)]],
    ['tests', 'tests', [made('yesterday', uuid), made(at, 'x'), made(null, uuid), made(at, null), made(1, uuid)]],
    ['spirometry-tests', 'spirometry-tests', [made('x', 'y')]],
    ['measurements', 'measurements', [made('x', 'y')]],
    ['body-sizes', 'body-sizes', [made('x', 'y')]],
    ['file-entries', 'file-entries', [made('2026-06-99', uuid), made('x', 'y')]],
    ['users', '/api/users', [made('a', 'y'), made(null, uuid)]],
    ['programs', '/api/programs', [made('a', 'y')]],
    ['audit events', '/api/audit-events', [made('x'), made('99999999999999999999'), made(1.5), made(null)]],
  ])('of %s is bad input, not a fault', async (_name, path, cursors) => {
    const client = /users|programs|audit/.test(path) ? own.as.administrator : own.as.coordinator;
    const address = path.startsWith('/') ? path : `/api/patients/${patientId}/${path}`;
    for (const cursor of cursors) {
      const answer = await client.get(`${address}?cursor=${cursor}`);
      expect([Buffer.from(cursor, 'base64url').toString(), answer.status]).toEqual([expect.any(String), 422]);
      expect(answer.body.errors).toEqual([{ path: 'cursor', message: 'Not a cursor of this list' }]);
    }
  });
});

describe('addresses and queries nobody would type', () => {
  it.each([
    '/api/patients/%E0%A4%A',
    '/api/patients/..%2f..%2fetc',
    '/api/patients/%00',
    '/api/%',
    '/api/patients?search[]=a',
  ])('are answered in order: %s', async (path) => {
    const answer = await own.as.coordinator.get(path);
    expect([400, 404, 422]).toContain(answer.status);
    expect(answer.headers['content-type']).toMatch(/^application\/problem\+json/);
  });

  it('a birth date that was corrected to under 18 is refused', async () => {
    const answer = await own.as.coordinator.patch(`/api/patients/${patientId}`, {
      version: 1,
      birthDate: '2010-01-01',
    });
    expect(answer.body.errors).toEqual([{ path: 'birthDate', message: 'The patient must be 18 or over' }]);
  });
});
