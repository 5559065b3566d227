import type { ClientRateLimitInfo, Options, Store } from 'express-rate-limit';
import { execute, selectRow } from '../db/query';

/** Counts in PostgreSQL, so that limits hold across restarts of the API and between processes. */
export class RateLimitStore implements Store {
  readonly localKeys = false;
  readonly prefix: string;
  private windowMs = 60_000;

  constructor(prefix: string) {
    this.prefix = prefix;
  }

  init(options: Options): void {
    this.windowMs = options.windowMs;
  }

  async increment(key: string): Promise<ClientRateLimitInfo> {
    const row = await selectRow<{ hits: number; resetsAt: Date }>(
      `insert into rate_limits as r (key, hits, resets_at)
       values ($key, 1, now() + $windowMs::double precision * interval '1 millisecond')
       on conflict (key) do update set
         hits = case when r.resets_at <= now() then 1 else r.hits + 1 end,
         resets_at = case when r.resets_at <= now() then excluded.resets_at else r.resets_at end
       returning hits, resets_at as "resetsAt"`,
      { key: this.prefix + key, windowMs: this.windowMs },
    );
    return { totalHits: row?.hits ?? 1, resetTime: row?.resetsAt };
  }

  async decrement(key: string): Promise<void> {
    await execute('update rate_limits set hits = greatest(hits - 1, 0) where key = $key', { key: this.prefix + key });
  }

  async resetKey(key: string): Promise<void> {
    await execute('delete from rate_limits where key = $key', { key: this.prefix + key });
  }
}

/** Counters whose window has passed say nothing any more. */
export async function deleteExpiredLimits(now: Date): Promise<void> {
  await execute('delete from rate_limits where resets_at <= $now', { now });
}
