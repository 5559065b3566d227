import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeClinic, makeUser, type TestClinic } from '../testing/factories/clinic';
import {
  addBodySize,
  addEnrollment,
  addFileEntry,
  addFlag,
  addMeasurement,
  addPatient,
  addSpirometry,
  fileBody,
} from '../testing/factories/scene';
import { refused } from '../testing/refused';
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

describe('a stale version', () => {
  const writes: [string, () => Promise<{ path: string; body: object }>][] = [
    ['a patient', async () => ({ path: `/api/patients/${patientId}`, body: { phone: '555' } })],
    [
      'an enrollment',
      async () => {
        const { id } = await addEnrollment(own, await addPatient(own));
        return { path: `/api/enrollments/${id}`, body: { consentOn: '2026-03-01' } };
      },
    ],
    ['the clinic', async () => ({ path: '/api/clinic', body: { name: 'Other name' } })],
    ['a program', async () => ({ path: `/api/programs/${own.program.id}`, body: { weeks: 9 } })],
    [
      'a user',
      async () => ({
        path: `/api/users/${(await makeUser(own.clinic.id, ['therapist'])).id}`,
        body: { displayName: 'Other' },
      }),
    ],
    ...(
      [
        ['spirometry-tests', addSpirometry],
        ['measurements', addMeasurement],
        ['body-sizes', addBodySize],
        ['file-entries', addFileEntry],
      ] as const
    ).flatMap(([kind, add]): [string, () => Promise<{ path: string; body: object }>][] => [
      [
        `${kind}, amended`,
        async () => ({
          path: `/api/${kind}/${(await add(own, patientId)).id}/amend`,
          body: { reason: 'Typed wrong', note: 'x' },
        }),
      ],
      [
        `${kind}, voided`,
        async () => ({
          path: `/api/${kind}/${(await add(own, patientId)).id}/void`,
          body: { reason: 'duplicate' },
        }),
      ],
    ]),
    [
      'a hold, released',
      async () => ({
        path: `/api/file-entries/${(await addFileEntry(own, patientId, fileBody('safety-hold', { item: 'faint' }))).id}/release`,
        body: { reason: 'Cleared' },
      }),
    ],
    [
      'a flag, resolved',
      async () => ({
        path: `/api/flags/${(await addFlag(own, patientId)).id}/resolve`,
        body: { note: 'Called' },
      }),
    ],
  ];

  it.each(writes)('of %s is refused and overwrites nothing', async (_name, prepare) => {
    const { path, body } = await prepare();
    const client = /clinic|programs|users/.test(path)
      ? own.as.administrator
      : /patients|enrollments/.test(path)
        ? own.as.coordinator
        : own.as.pulmonologist;
    const method = /amend|void|release|resolve/.test(path) ? 'post' : 'patch';
    const problem = await refused(
      own.clinic.id,
      async () => await client.send(method, path, { version: 77, ...body }),
      409,
    );
    expect(problem.type).toBe('/problems/stale-version');
    for (const version of ['1', 0, 1.5, null])
      expect(
        (await refused(own.clinic.id, async () => await client.send(method, path, { ...body, version }), 422)).errors,
      ).toHaveLength(1);
  });
});
