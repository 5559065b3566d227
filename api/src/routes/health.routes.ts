import { z } from 'zod';
import { selectRow } from '../db/query';
import { defineRoute, type Route } from '../http/define-route';

const healthy = z.object({ status: z.literal('ok') });

export const healthRoutes: Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/health',
    contract: { summary: 'Whether the API is alive', response: healthy },
    access: 'public',
    audit: 'health.read',
    handler: async () => ({ status: 'ok' as const }),
  }),
  defineRoute({
    method: 'get',
    path: '/api/health/ready',
    contract: { summary: 'Whether the API can reach its database', response: healthy },
    access: 'public',
    audit: 'health.ready',
    handler: async () => {
      await selectRow('select 1 as one');
      return { status: 'ok' as const };
    },
  }),
];
