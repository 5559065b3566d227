import { createApp } from '@slighthill/api/app';
import { readEnv } from '@slighthill/api/config/env';
import { connectDatabase } from '@slighthill/api/db/connect';
import { defineRoute } from '@slighthill/api/http/define-route';
import { trendMeasurementsSql, trendPersonSql } from '@slighthill/api/queries/trend-source';
import { systemClock } from '@slighthill/api/time/system-clock';
import { idParams } from '@slighthill/shared/contracts/common';
import pg from 'pg';
import { z } from 'zod';
import { positional } from './positional';

/**
 * The real application with one route more: behind the same sign-in and audit it runs the statements of the trend
 * endpoint with the bare driver and returns their rows. It is what the trend endpoint is measured against.
 */
const env = readEnv();
connectDatabase(env.DATABASE_URL, { poolSize: env.DATABASE_POOL });
const pool = new pg.Pool({ connectionString: env.DATABASE_URL, max: env.DATABASE_POOL });

const bareRows = defineRoute({
  method: 'get',
  path: '/api/bench/patients/:id/rows',
  contract: { summary: 'The rows of the trend endpoint', params: idParams, response: z.any() },
  access: 'trends:read',
  audit: 'bench.rows',
  handler: async ({ context, params }) => {
    const { clinicId, clinic } = context.actor;
    const bind = { patientId: params.id, clinicId };
    const run = async (sql: string, values: Record<string, unknown>) =>
      (await pool.query(...positional(sql, values))).rows as Record<string, unknown>[];
    const person = await run(trendPersonSql, bind);
    const clinicOfRow = person[0]?.clinicId;
    context.authorizeRow('trends:read', clinicOfRow ? { clinicId: String(clinicOfRow) } : null, 'This patient');
    context.audit.showsPatients(params.id);
    const measures = ['fev1', 'fvc', 'fev1fvc', 'tlc', 'sixMinuteWalkDistance', 'cat'];
    const rows = await run(trendMeasurementsSql, { ...bind, timeZone: clinic.timeZone, measures });
    return { person, rows };
  },
});

const { express } = createApp({ clock: systemClock, webDist: env.WEB_DIST, extraRoutes: [bareRows] });
express.listen(env.PORT, env.HOST);
