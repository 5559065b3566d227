import { pino } from 'pino';
import { createApp } from './app';
import { warmPasswords } from './auth/passwords';
import { readEnv } from './config/env';
import { connectDatabase } from './db/connect';
import { deleteExpiredLimits } from './http/rate-limit-store';
import { Clinic } from './models/clinic';
import { summariesSettled } from './services/follow-in-background';
import { deleteExpiredDrafts } from './services/save-draft';
import { systemClock } from './time/system-clock';

const sweepMs = 15 * 60_000;

async function main(): Promise<void> {
  const env = readEnv();
  const logger = pino({ level: env.LOG_LEVEL, base: null });
  const sequelize = connectDatabase(env.DATABASE_URL, { poolSize: env.DATABASE_POOL });
  if (env.NODE_ENV === 'production') await refuseDemoAccounts();
  await warmPasswords();
  const { express, sessions } = createApp({
    clock: systemClock,
    logger,
    webDist: env.WEB_DIST,
    publicOrigin: env.PUBLIC_ORIGIN,
    trustProxy: env.TRUST_PROXY,
    checkResponses: env.NODE_ENV === 'test',
  });
  const server = express.listen(env.PORT, env.HOST, (error?: Error) => {
    if (error) throw error;
    logger.info({ port: env.PORT }, 'listening');
  });

  const sweep = setInterval(() => {
    const now = systemClock.now();
    Promise.all([sessions.deleteExpired(), deleteExpiredDrafts(now), deleteExpiredLimits(now)]).catch(
      (error: unknown) => {
        logger.warn({ name: (error as Error).name }, 'the sweep of what has expired failed');
      },
    );
  }, sweepMs);
  sweep.unref();

  let stopping = false;
  const stop = () => {
    if (stopping) return;
    stopping = true;
    clearInterval(sweep);
    server.close(() => {
      summariesSettled()
        .then(() => sequelize.close())
        .then(
          () => process.exit(0),
          () => process.exit(1),
        );
    });
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), 3_000).unref();
  };
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);
}

/** A real clinic must not run with accounts whose password is printed in the README. */
async function refuseDemoAccounts(): Promise<void> {
  if ((await Clinic.count({ where: { demo: true } })) > 0)
    throw new Error('This database holds the demo accounts. Production does not start with them.');
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
