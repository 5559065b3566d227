import type { Problem } from '@slighthill/shared/errors';
import request, { type Response } from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { patientBody, spirometryBody, walkBody } from '../testing/factories/bodies';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { addPatient, addSpirometry, fileBody, phq9Body } from '../testing/factories/scene';
import { refused as refusedIn } from '../testing/refused';
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

const refused = (send: () => Promise<Response>, status: number) => refusedIn(own.clinic.id, send, status);
const post = (path: string, body: object) => async () =>
  await own.as.coordinator.post(`/api/patients/${patientId}${path}`, body);
const message = (problem: Problem, path: string) => problem.errors?.find((error) => error.path === path)?.message;

const blow = (fev1: unknown, fvc: unknown, more: object = {}) => ({ fev1, fvc, ...more });
const maneuvers = (...blows: object[]) => spirometryBody({ best: null, maneuvers: blows });

describe('spirometry', () => {
  const cases: [string, object, string, RegExp][] = [
    ['a negative FEV1', spirometryBody({ best: blow(-1.3, 2.7) }), 'best.fev1', /FEV1/],
    ['a negative FVC in a maneuver', maneuvers(blow(1.3, -2.7)), 'maneuvers.0.fvc', /FVC/],
    ['FEV1 above FVC', spirometryBody({ best: blow(2.8, 2.7) }), 'best.fev1', /FEV1 cannot be more than FVC/],
    [
      'FEV1 above FVC in one maneuver',
      maneuvers(blow(1.3, 2.7), blow(2.8, 2.7)),
      'maneuvers.1.fev1',
      /FEV1 cannot be more than FVC/,
    ],
    ['text for a volume', spirometryBody({ best: blow('1.32', 2.78) }), 'best.fev1', /must be a number/],
    ['a volume missing', spirometryBody({ best: { fev1: 1.32 } }), 'best.fvc', /must be a number/],
    ['a height of 65', spirometryBody({ heightCm: 65 }), 'heightCm', /65 looks like inches: that is 165.1 cm/],
    ['a height of 1.74', spirometryBody({ heightCm: 1.74 }), 'heightCm', /looks like meters: that is 174 cm/],
    ['no height', spirometryBody({ heightCm: undefined }), 'heightCm', /Height must be a number/],
    ['a weight of 4 kg', spirometryBody({ weightKg: 4 }), 'weightKg', /Weight/],
    ['a future instant', spirometryBody({ performedAt: '2026-06-15T16:05:01Z' }), 'performedAt', /future/],
    ['an instant without a zone', spirometryBody({ performedAt: '2026-06-10T15:00:00' }), 'performedAt', /time zone/],
    ['a day before the patient was 18', spirometryBody({ performedAt: '1977-03-01T18:00:00Z' }), 'performedAt', /18/],
    ['both best values and maneuvers', spirometryBody({ maneuvers: [blow(1.3, 2.7)] }), 'maneuvers', /either/],
    ['neither', spirometryBody({ best: null }), 'maneuvers', /either/],
    ['nine maneuvers', maneuvers(...Array.from({ length: 9 }, () => blow(1.3, 2.7))), 'maneuvers', /eight/],
    ['a fourth decimal of a liter', spirometryBody({ best: blow(1.3205, 2.78) }), 'best.fev1', /decimals/],
    ['an unknown field', spirometryBody({ fev1Percent: 44 }), 'fev1Percent', /not known/],
    ['an unknown field in a maneuver', maneuvers(blow(1.3, 2.7, { fev6: 2.5 })), 'maneuvers.0.fev6', /not known/],
    ['an unknown state', spirometryBody({ bronchodilator: 'post' }), 'bronchodilator', /bronchodilator/],
    ['an id that is none', spirometryBody({ id: 'abc' }), 'id', /id/],
  ];

  it.each(cases)('refuses %s', async (_name, body, path, words) => {
    const problem = await refused(post('/spirometry-tests', body), 422);
    expect(message(problem, path)).toMatch(words);
  });

  it('refuses a pair as a whole when one test of it is wrong', async () => {
    const good = spirometryBody({ bronchodilator: 'before' });
    const bad = spirometryBody({ best: blow(3, 2) });
    const problem = await refused(post('/spirometry-tests', { tests: [good, bad] }), 422);
    expect(message(problem, 'tests.1.best.fev1')).toMatch(/FEV1/);
    const late = spirometryBody({ performedAt: '2026-07-01T15:00:00Z' });
    const future = await refused(post('/spirometry-tests', { tests: [good, late] }), 422);
    expect(message(future, 'tests.1.performedAt')).toMatch(/future/);
  });

  it('takes an instant up to five minutes ahead, for clocks that differ', async () => {
    const response = await post('/spirometry-tests', spirometryBody({ performedAt: '2026-06-15T16:05:00Z' }))();
    expect(response.status).toBe(201);
  });

  it('refuses bad changes of a stored test', async () => {
    const { id } = await addSpirometry(own, patientId);
    const amend = (changes: object) => async () =>
      await own.as.therapist.post(`/api/spirometry-tests/${id}/amend`, {
        version: 1,
        reason: 'Typed wrong',
        ...changes,
      });
    expect(message(await refused(amend({ best: blow(3, 2) }), 422), 'best.fev1')).toMatch(/FEV1/);
    expect(message(await refused(amend({ heightCm: 65 }), 422), 'heightCm')).toMatch(/inches/);
    expect(message(await refused(amend({ performedAt: '2027-01-01T00:00:00Z' }), 422), 'performedAt')).toMatch(
      /future/,
    );
    expect(message(await refused(amend({ reason: ' ' }), 422), 'reason')).toMatch(/reason/);
  });
});

describe('single results', () => {
  const at = '2026-06-10T15:00:00Z';
  const cases: [string, object, string][] = [
    ['an unknown measure', { ...walkBody(310), measure: 'happiness' }, 'measure'],
    ['text for a number', { ...walkBody(310), value: '310' }, 'value'],
    ['a negative distance', walkBody(-1), 'value'],
    ['a distance beyond the absolute range', walkBody(5000), 'value'],
    ['a PHQ-9 without its ninth answer', { measure: 'phq9', takenAt: at, value: 4 }, 'item9'],
    ['a ninth answer of 4', phq9Body(4), 'item9'],
    ['a ninth answer beside another measure', { ...walkBody(310), item9: 0 }, 'item9'],
    ['an undeclared condition', { ...walkBody(310), conditions: { shoes: 'new' } }, 'conditions.shoes'],
    ['a future day', walkBody(310, '2026-06-16T15:00:00Z'), 'takenAt'],
    ['a height of 65', { ...walkBody(310), heightCm: 65 }, 'heightCm'],
    ['half an mMRC grade', { measure: 'mmrc', takenAt: at, value: 1.5 }, 'value'],
    ...['fev1', 'fvc', 'fev1fvc', 'pef', 'fef2575', 'rvtlc', 'bmi', 'bode'].map((measure): [string, object, string] => [
      `${measure} entered by itself`,
      { measure, takenAt: at, value: 2 },
      'measure',
    ]),
  ];
  it.each(cases)('refuses %s', async (_name, body, path) => {
    const problem = await refused(post('/measurements', body), 422);
    expect(problem.errors!.map((error) => error.path)).toContain(path);
  });

  it('takes a result of a patient whose height was never measured, without one', async () => {
    const unmeasured = await addPatient(own);
    const response = await own.as.therapist.post(`/api/patients/${unmeasured}/measurements`, walkBody(310));
    expect(response.body.measurement).toMatchObject({ heightCm: null, heightCarried: false });
    const trends = await own.as.therapist.get(`/api/patients/${unmeasured}/trends?measures=sixMinuteWalkDistance`);
    const [point] = trends.body.series[0].points;
    expect(point).toMatchObject({ value: 310, percentPredicted: null });
    expect(JSON.stringify(trends.body.series[0])).toMatch(/height/i);
  });

  it('refuses a body size with neither height nor weight, and one of 65 cm', async () => {
    const takenAt = at;
    expect((await refused(post('/body-sizes', { takenAt }), 422)).errors).toHaveLength(1);
    const inches = await refused(post('/body-sizes', { takenAt, heightCm: 65 }), 422);
    expect(message(inches, 'heightCm')).toMatch(/inches/);
  });

  it('refuses file entries of no kind, with foreign details, or in the future', async () => {
    await refused(post('/file-entries', fileBody('mood', {})), 422);
    const wrong = await refused(post('/file-entries', fileBody('smoking', { status: 'often' })), 422);
    expect(message(wrong, 'details.status')).toBeDefined();
    const late = await refused(
      post('/file-entries', fileBody('smoking', { status: 'never' }, { on: '2026-06-16' })),
      422,
    );
    expect(message(late, 'on')).toMatch(/future/);
  });
});

describe('predictions', () => {
  const body = { referenceSet: 'gli-global-2022', sex: 'male', ageYears: 67, heightCm: 174.5, values: {} };
  const cases: [string, object, string][] = [
    ['17 years', { ageYears: 17 }, 'ageYears'],
    ['101 years', { ageYears: 101 }, 'ageYears'],
    ['65 cm', { heightCm: 65 }, 'heightCm'],
    ['220.1 cm', { heightCm: 220.1 }, 'heightCm'],
    ['a negative volume', { values: { fev1: -1 } }, 'values.fev1'],
    ['a volume of nothing', { values: { fev1: 0 } }, 'values.fev1'],
    ['text for a volume', { values: { fev1: '1.3' } }, 'values.fev1'],
    ['an unknown set', { referenceSet: 'gli-1812' }, 'referenceSet'],
    ['an unknown measure', { values: { fev9: 1 } }, 'values.fev9'],
    ['a set that needs a group, without one', { referenceSet: 'gli-2012' }, 'group'],
  ];
  it.each(cases)('refuses %s', async (_name, changes, path) => {
    const send = async () => await own.as.therapist.post('/api/predictions', { ...body, ...changes });
    const problem = await refused(send, 422);
    expect(problem.errors!.map((error) => error.path)).toContain(path);
  });

  it.each([18, 100])('answers at %d years', async (ageYears) => {
    const response = await own.as.therapist.post('/api/predictions', { ...body, ageYears });
    expect(response.status).toBe(200);
  });
});

describe('patients, staff and programs', () => {
  const create = (changes: object) => async () => await own.as.coordinator.post('/api/patients', patientBody(changes));
  const cases: [string, object, string, RegExp][] = [
    ['one who is 18 tomorrow', { birthDate: '2008-06-16' }, 'birthDate', /18/],
    ['one born in the future', { birthDate: '2027-01-01' }, 'birthDate', /future/],
    ['one of 121 years', { birthDate: '1905-06-15' }, 'birthDate', /120/],
    ['a day that does not exist', { birthDate: '1959-02-30' }, 'birthDate', /YYYY-MM-DD/],
    ['a blank name', { givenName: '   ' }, 'givenName', /missing/],
    ['an unknown diagnosis group', { diagnosisGroup: 'flu' }, 'diagnosisGroup', /diagnosis/],
    ['an e-mail that is none', { email: 'leland' }, 'email', /e-mail/],
    ['an unknown field', { race: 'x' }, 'race', /not known/],
  ];
  it.each(cases)('refuses %s', async (_name, changes, path, words) => {
    expect(message(await refused(create(changes), 422), path)).toMatch(words);
  });

  it('takes a patient on the 18th birthday, in the clinic\u2019s zone', async () => {
    expect((await create({ birthDate: '2008-06-15' })()).status).toBe(201);
  });

  it('refuses staff with the patient role, without a role or with a known e-mail', async () => {
    const add = (changes: object) => async () =>
      await own.as.administrator.post('/api/users', { displayName: 'New', email: 'x@clinic.test', ...changes });
    await refused(add({ roles: ['patient'] }), 422);
    await refused(add({ roles: [] }), 422);
    await refused(add({ roles: ['therapist'], email: own.users.therapist.email.toUpperCase() }), 409);
  });
});

describe('bodies that cannot be read', () => {
  const raw =
    (text: string, type = 'application/json') =>
    async () =>
      await request(server.base)
        .post(`/api/patients/${patientId}/measurements`)
        .set('Origin', server.base)
        .set('Cookie', own.as.therapist.cookie!)
        .set('Content-Type', type)
        .send(text);

  it.each(['{"measure": ', '[1,', '"text"', '{"a":1}}', 'null x'])('refuses broken JSON: %s', async (text) => {
    expect((await refused(raw(text), 400)).type).toBe('/problems/bad-json');
  });
  it('refuses a body over 200 kB, and says so', async () => {
    const problem = await refused(raw(JSON.stringify({ ...walkBody(310), note: 'x'.repeat(205_000) })), 413);
    expect(problem.detail).toMatch(/larger/);
  });
  it('refuses a list, an unknown character set and another kind of content', async () => {
    await refused(raw('[]'), 422);
    await refused(raw('{}', 'application/json; charset=klingon'), 400);
    await refused(raw('measure=phq9', 'application/x-www-form-urlencoded'), 422);
  });
});
