import { z } from 'zod';

const schema = z.object({
  NODE_ENV: z.enum(['development', 'test', 'production']).default('development'),
  DATABASE_URL: z.string().min(1),
  PORT: z.coerce.number().int().min(0).max(65535).default(4310),
  HOST: z.string().default('127.0.0.1'),
  /** Folder of the built web app; without it the API serves only /api. */
  WEB_DIST: z.string().optional(),
  /** Public address behind a proxy, for the same-origin check and secure cookies, e.g. https://rehab.example.org */
  PUBLIC_ORIGIN: z.url().optional(),
  TRUST_PROXY: z.coerce.number().int().min(0).max(5).default(0),
  LOG_LEVEL: z.enum(['silent', 'error', 'warn', 'info', 'debug']).default('info'),
  DATABASE_POOL: z.coerce.number().int().min(2).max(50).default(10),
});

export type Env = z.infer<typeof schema>;

/** The only reader of process.env in the API. */
export function readEnv(source: NodeJS.ProcessEnv = process.env): Env {
  const result = schema.safeParse(source);
  if (result.success) return requireSecureCookies(result.data);
  const problems = result.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`).join('; ');
  throw new Error(`The environment is not complete: ${problems}`);
}

/** Beyond loopback, cookies must be Secure, which needs to know the public address. */
function requireSecureCookies(env: Env): Env {
  const isLoopback = /^127\.|^::1$|^localhost$/.test(env.HOST);
  if (isLoopback || env.PUBLIC_ORIGIN?.startsWith('https://')) return env;
  throw new Error(`HOST ${env.HOST} is not loopback: set PUBLIC_ORIGIN to the https address people use.`);
}
