import { searchKey } from '@slighthill/shared/search-key';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { queriesOf } from '../testing/count-queries';
import { spirometryBody, walkBody } from '../testing/factories/bodies';
import { makeClinic, type TestClinic } from '../testing/factories/clinic';
import { makePatient } from '../testing/factories/patient';
import {
  addBodySize,
  addEnrollment,
  addFileEntry,
  addMeasurement,
  addPatient,
  addSpirometry,
  fileBody,
  phq9Body,
} from '../testing/factories/scene';
import { startTestServer, type Client, type TestServer } from '../testing/server';

let server: TestServer;
let own: TestClinic;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeClinic(server);
});
afterAll(() => server.close());

interface Item {
  id: string;
}

/** Follows the cursor to the end; more pages than rows would mean it goes in circles. */
async function allPages<T extends Item>(client: Client, path: string, limit: number): Promise<T[][]> {
  const pages: T[][] = [];
  let cursor: string | null = null;
  do {
    const joint = path.includes('?') ? '&' : '?';
    const response = await client.get(`${path}${joint}limit=${limit}${cursor ? `&cursor=${cursor}` : ''}`);
    expect(response.status).toBe(200);
    pages.push(response.body.items as T[]);
    cursor = response.body.nextCursor as string | null;
    expect(pages.length).toBeLessThan(60);
  } while (cursor);
  return pages;
}

describe('the list of patients', () => {
  const people = [
    ['Álvaro', 'Núñez', '1950-01-31'],
    ['Alvaro', 'Nunez', '1951-02-01'],
    ['Nunez', 'Alvaro', '1952-03-02'],
    ['Zoë', 'Ångström', '1953-04-03'],
    ['Mary Ann', 'van der Berg', '1954-05-04'],
    ['Mary', 'Annand', '1955-06-05'],
    ['Berg', 'Maryson', '1956-07-06'],
    ["D'Arcy", "O'Neil", '1957-08-07'],
    ['Li', 'Li', '1958-09-08'],
    ['Per%cent', 'Under_score', '1959-10-09'],
  ] as const;
  const ids = new Map<string, string>();
  let client: Client;
  const named = (...names: string[]) => names.map((name) => ids.get(name)!);

  beforeAll(async () => {
    const clinic = await makeClinic(server);
    client = clinic.as.coordinator;
    for (const [givenName, familyName, birthDate] of people) {
      const recordNumber = `R-${familyName.length}${givenName.length}-${birthDate.slice(2, 4)}`;
      const { id } = await makePatient(clinic.clinic.id, { givenName, familyName, birthDate, recordNumber });
      ids.set(`${givenName} ${familyName}`, id);
    }
    // many of one name: the id alone tells them apart
    for (let i = 0; i < 7; i += 1) await makePatient(clinic.clinic.id, { givenName: 'Same', familyName: 'Same' });
  });

  it.each([1, 4, 100])('gives every patient once, by name, %d a page', async (limit) => {
    const pages = await allPages<Item & { givenName: string; familyName: string }>(client, '/api/patients', limit);
    const rows = pages.flat();
    expect(rows).toHaveLength(people.length + 7 + 1);
    expect(new Set(rows.map((row) => row.id)).size).toBe(rows.length);
    expect(pages.slice(0, -1).every((page) => page.length === limit)).toBe(true);
    const keys = rows.map((row) => `${searchKey(row.familyName)}\u0000${searchKey(row.givenName)}\u0000${row.id}`);
    expect(keys).toEqual([...keys].sort());
  });

  const searches: [string, string[]][] = [
    ['nunez', ['Alvaro Nunez', 'Álvaro Núñez', 'Nunez Alvaro']],
    ['NÚÑ', ['Alvaro Nunez', 'Álvaro Núñez', 'Nunez Alvaro']],
    ['alvaro nunez', ['Alvaro Nunez', 'Álvaro Núñez', 'Nunez Alvaro']],
    ['Nunez, Alvaro', ['Alvaro Nunez', 'Álvaro Núñez', 'Nunez Alvaro']],
    ['angstrom', ['Zoë Ångström']],
    ['zoe a', ['Zoë Ångström']],
    ['mary ann', ['Mary Annand']],
    ['mary ann van der', ['Mary Ann van der Berg']],
    ['van der berg mary', ['Mary Ann van der Berg']],
    ['berg', ['Berg Maryson']],
    ["o'n", ["D'Arcy O'Neil"]],
    ['li', ['Li Li']],
    ['R-88-57', []],
    ['r-66-57', ["D'Arcy O'Neil"]],
    ['1953-04-03', ['Zoë Ångström']],
    ['4/3/1953', ['Zoë Ångström']],
    ['04/03/1953', ['Zoë Ångström']],
    ['%', []],
    ['_', []],
    ['per%', ['Per%cent Under_score']],
    ['nobody', []],
  ];
  it.each(searches)('finds with %s', async (search, expected) => {
    const found = (await allPages(client, `/api/patients?search=${encodeURIComponent(search)}`, 50)).flat();
    expect(new Set(found.map((row) => row.id))).toEqual(new Set(named(...expected)));
  });

  it.each(['same', 'same same'])(
    'pages through a search for %s without gap or repeat across its ways to match',
    async (search) => {
      const whole = (await allPages(client, `/api/patients?search=${search}`, 50)).flat().map((row) => row.id);
      const paged = (await allPages(client, `/api/patients?search=${search}`, 2)).flat().map((row) => row.id);
      expect(paged).toEqual(whole);
      expect(new Set(paged).size).toBe(7);
      expect(paged).toHaveLength(7);
    },
  );

  it('refuses a cursor that was not made here', async () => {
    for (const cursor of ['x', 'W10', Buffer.from('[1,2,3,{}]').toString('base64url')]) {
      const response = await client.get(`/api/patients?cursor=${cursor}`);
      expect(response.status).toBe(422);
      expect(response.body.errors[0].path).toBe('cursor');
    }
    for (const limit of ['0', '101', 'x']) await client.get(`/api/patients?limit=${limit}`).expect(422);
    await client.get('/api/patients?sort=name').expect(422);
  });
});

describe('the lists of a record', () => {
  let patientId: string;

  beforeAll(async () => {
    patientId = await addPatient(own);
    await addEnrollment(own, patientId);
    for (let i = 0; i < 4; i += 1) {
      // the same instant over and over: the id alone tells them apart
      await addSpirometry(own, patientId, spirometryBody());
      await addMeasurement(own, patientId, walkBody(300 + i, '2026-06-10T15:00:00Z'));
      await addBodySize(own, patientId, { takenAt: '2026-06-10T15:00:00Z' });
      await addFileEntry(own, patientId, fileBody('exacerbation', { steroid: true }));
    }
  });

  it.each([
    ['tests', 12],
    ['spirometry-tests', 4],
    ['measurements', 4],
    ['body-sizes', 8],
    ['file-entries', 5],
  ])('%s: every row once, newest first', async (kind, count) => {
    const path = `/api/patients/${patientId}/${kind}`;
    const whole = (await allPages(own.as.therapist, path, 100)).flat();
    expect(whole).toHaveLength(count);
    for (const limit of [1, 3]) {
      const paged = (await allPages(own.as.therapist, path, limit)).flat();
      expect(paged.map((row) => row.id)).toEqual(whole.map((row) => row.id));
    }
    const at = (row: object) =>
      String(Object.entries(row).find(([key]) => /^(at|takenAt|performedAt|on)$/.test(key))![1]);
    expect(whole.map(at)).toEqual(whole.map(at).sort().reverse());
  });

  it('a row that arrives while paging shifts nothing', async () => {
    const path = `/api/patients/${patientId}/measurements`;
    const first = await own.as.therapist.get(`${path}?limit=2`);
    await addMeasurement(own, patientId, walkBody(400, '2026-06-14T15:00:00Z'));
    const second = await own.as.therapist.get(`${path}?limit=2&cursor=${first.body.nextCursor as string}`);
    const ids = [...first.body.items, ...second.body.items].map((row: Item) => row.id);
    expect(new Set(ids).size).toBe(4);
  });

  it('the trail and the staff list page the same way', async () => {
    const { administrator } = own.as;
    const ids = (pages: Item[][]) => pages.flat().map((row) => row.id);
    const trail = `/api/audit-events?patient=${patientId}`;
    const whole = ids(await allPages(administrator, trail, 100));
    // reading the trail is an event of its own, so the second reading starts with what the first one added
    const paged = ids(await allPages(administrator, trail, 7));
    expect(paged.filter((id) => BigInt(id) <= BigInt(whole[0]!))).toEqual(whole);
    expect(new Set(paged).size).toBe(paged.length);
    expect(whole.map(BigInt)).toEqual(whole.map(BigInt).sort((x, y) => (x > y ? -1 : 1)));
    const staff = ids(await allPages(administrator, '/api/users', 1));
    expect(new Set(staff)).toEqual(
      new Set(
        [own.users.administrator, own.users.coordinator, own.users.therapist, own.users.pulmonologist].map(
          (user) => user.id,
        ),
      ),
    );
  });
});

describe('the number of statements a list takes', () => {
  it('does not grow with its rows', async () => {
    const clinic = await makeClinic(server);
    const { coordinator, therapist, administrator } = clinic.as;
    const patientId = await addPatient(clinic, { familyName: 'Grown' });
    await addEnrollment(clinic, patientId);
    const fill = async () => {
      const another = await addPatient(clinic, { familyName: 'Grown' });
      await addEnrollment(clinic, another);
      await addSpirometry(clinic, patientId, {
        best: null,
        maneuvers: [
          { fev1: 1.3, fvc: 2.7 },
          { fev1: 1.2, fvc: 2.6 },
        ],
      });
      await addMeasurement(clinic, patientId, phq9Body(1));
      await addBodySize(clinic, patientId);
      await addFileEntry(clinic, patientId);
    };
    const kinds = ['tests', 'spirometry-tests', 'measurements', 'body-sizes', 'file-entries', 'enrollments', 'trends'];
    const reads: [string, Client, string][] = [
      ['patients', coordinator, '/api/patients'],
      ['search', coordinator, '/api/patients?search=grown'],
      ['record', therapist, `/api/patients/${patientId}`],
      ...kinds.map((kind): [string, Client, string] => [kind, therapist, `/api/patients/${patientId}/${kind}`]),
      ['trail', administrator, '/api/audit-events'],
      ['programs', administrator, '/api/programs'],
    ];
    const counts = async () => {
      const found: Record<string, number> = {};
      for (const [name, client, path] of reads)
        found[name] = (await queriesOf(server, () => client.get(path).expect(200))).length;
      return found;
    };
    await fill();
    const few = await counts();
    for (let i = 0; i < 5; i += 1) await fill();
    const many = await counts();
    expect(many).toEqual(few);
    // the session, the rows (with those beside them) and the audit event
    for (const [name, count] of Object.entries(many)) expect([name, count >= 2 && count <= 6]).toEqual([name, true]);
  });

  it('of a write does not grow with the results that carry a height', async () => {
    const patientId = await addPatient(own);
    await addBodySize(own, patientId, { takenAt: '2026-01-10T15:00:00Z' });
    const record = async () =>
      (await queriesOf(server, () => addBodySize(own, patientId, { takenAt: '2026-01-11T15:00:00Z' }))).length;
    await addMeasurement(own, patientId);
    await record();
    const few = await record();
    for (let i = 0; i < 6; i += 1) await addMeasurement(own, patientId);
    await record();
    expect(await record()).toBe(few);
  });
});
