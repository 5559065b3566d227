import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startTestServer, type TestServer } from '../testing/server';
import { allRoutes } from './all-routes';

let server: TestServer;

beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

interface Operation {
  operationId: string;
  summary: string;
  security: object[];
  parameters: { name: string; in: string; required: boolean; schema: object }[];
  requestBody?: { content: Record<string, { schema: object }> };
  responses: Record<string, { description: string; content?: Record<string, { schema: object }> }>;
}
interface Document {
  openapi: string;
  info: { title: string; version: string };
  paths: Record<string, Record<string, Operation>>;
  components: { schemas: Record<string, object>; securitySchemes: Record<string, object> };
}

const routes = allRoutes({ sessions: {} as never, clock: { now: () => new Date() } });

async function read(): Promise<Document> {
  const response = await server.anonymous.get('/api/openapi.json').expect(200);
  expect(response.headers['content-type']).toMatch(/^application\/json/);
  return response.body as Document;
}

describe('the description of the API', () => {
  it('is OpenAPI 3.1.0 and holds every route, and nothing else', async () => {
    const document = await read();
    expect(document.openapi).toBe('3.1.0');
    expect(document.info).toMatchObject({ title: 'Slighthill', version: expect.any(String) });
    const described = Object.entries(document.paths).flatMap(([path, methods]) =>
      Object.keys(methods).map((method) => `${method} ${path}`),
    );
    const expected = routes.map((route) => `${route.method} ${route.path.replace(/:(\w+)/g, '{$1}')}`);
    expect(described.sort()).toEqual(expected.sort());
  });

  it('says of each operation what the contract says', async () => {
    const document = await read();
    const ids: string[] = [];
    for (const route of routes) {
      const operation = document.paths[route.path.replace(/:(\w+)/g, '{$1}')]![route.method]!;
      ids.push(operation.operationId);
      expect(operation.summary.length).toBeGreaterThan(0);
      const inPath = [...route.path.matchAll(/:(\w+)/g)].map((match) => match[1]);
      const declared = operation.parameters.filter((parameter) => parameter.in === 'path');
      expect(declared.map((parameter) => parameter.name).sort()).toEqual([...inPath].sort());
      expect(declared.every((parameter) => parameter.required)).toBe(true);
      expect(operation.requestBody !== undefined).toBe(route.contract.body !== undefined);
      expect(operation.security).toEqual(route.access === 'public' ? [] : [{ session: [] }]);
      const success = route.contract.response === null ? '204' : String(route.contract.status ?? 200);
      expect(operation.responses[success]!.content !== undefined).toBe(route.contract.response !== null);
      if (route.access !== 'public') expect(operation.responses).toHaveProperty('401');
    }
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('refers only to what it holds', async () => {
    const document = await read();
    const references = [...JSON.stringify(document).matchAll(/"\$ref":"#\/components\/schemas\/(\w+)"/g)];
    expect(references.length).toBeGreaterThan(0);
    for (const [, name] of references) expect(document.components.schemas).toHaveProperty(name!);
    expect(JSON.stringify(document)).not.toMatch(/"\$ref":"(?!#\/components\/schemas\/)/);
    expect(document.components.schemas.Problem).toMatchObject({
      type: 'object',
      required: expect.arrayContaining(['type']),
    });
  });

  it('names the ranges a client needs', async () => {
    const document = await read();
    const { schema } = document.paths['/api/predictions']!.post!.requestBody!.content['application/json']!;
    expect(schema).toMatchObject({ properties: { ageYears: { type: 'number', minimum: 18, maximum: 100 } } });
  });
});
