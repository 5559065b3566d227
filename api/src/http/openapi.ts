import { errorTable } from '@slighthill/shared/errors';
import { problem } from '@slighthill/shared/contracts/common';
import { z } from 'zod';
import type { Route, RouteContract } from './define-route';

type Json = Record<string, unknown>;

const schemaOf = (schema: z.ZodType, io: 'input' | 'output'): Json => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as Json;
  return rest;
};

/** Describes the routes as OpenAPI 3.1, from the same contracts that validate requests and answers. */
export function openApiDocument(routes: readonly Route[]): Json {
  const paths: Record<string, Json> = {};
  for (const route of routes) {
    const path = route.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method]: operationOf(route) };
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Slighthill', version: '1', description: 'Supports licensed staff; it does not diagnose.' },
    paths,
    components: {
      schemas: { Problem: schemaOf(problem, 'output') },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'slighthill' } },
    },
  };
}

function operationOf(route: Route): Json {
  const { contract } = route;
  const success = String(contract.response === null ? 204 : (contract.status ?? 200));
  const json = (schema: Json) => ({ 'application/json': { schema } });
  return {
    summary: contract.summary,
    operationId: route.audit.replace(/[.-](\w)/g, (_all, letter: string) => letter.toUpperCase()),
    security: route.access === 'public' ? [] : [{ session: [] }],
    parameters: [...parametersOf(contract, 'path'), ...parametersOf(contract, 'query')],
    ...(contract.body ? { requestBody: { required: true, content: json(schemaOf(contract.body, 'input')) } } : {}),
    responses: {
      [success]: {
        description: 'Done',
        ...(contract.response ? { content: json(schemaOf(contract.response, 'output')) } : {}),
      },
      ...problemResponses(route),
    },
  };
}

function parametersOf(contract: RouteContract, place: 'path' | 'query'): Json[] {
  const schema = place === 'path' ? contract.params : contract.query;
  if (!schema) return [];
  const { properties = {}, required = [] } = schemaOf(schema, 'input') as { properties?: Json; required?: string[] };
  return Object.entries(properties).map(([name, value]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: value,
  }));
}

function problemResponses(route: Route): Json {
  const statuses = new Set<number>();
  if (route.contract.body) for (const status of [400, 413, 422]) statuses.add(status);
  if (route.contract.query) statuses.add(422);
  if (route.access !== 'public') statuses.add(401);
  if (route.access !== 'public' && route.access !== 'signed-in') statuses.add(403);
  if (route.path.includes('/:')) statuses.add(404);
  if (route.method !== 'get' && route.contract.body) statuses.add(409);
  if (route.limits.length > 0) for (const status of [401, 429]) statuses.add(status);
  const entries = [...statuses].sort().map((status) => [
    String(status),
    {
      description: titleOf(status),
      content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
    },
  ]);
  return Object.fromEntries(entries) as Json;
}

const titleOf = (status: number): string =>
  Object.values(errorTable).find((entry) => entry.status === status)?.title ?? 'Problem';
