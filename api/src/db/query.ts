import { QueryTypes } from 'sequelize';
import { database } from './connect';

type Bind = Record<string, unknown>;

/** Runs a hand-written SELECT (or a write with RETURNING) with named `$parameters`; joins an open transaction. */
export async function selectRows<T extends object>(sql: string, bind: Bind = {}): Promise<T[]> {
  return await database().query<T>(sql, { type: QueryTypes.SELECT, bind: withoutUndefined(bind) });
}

export async function selectRow<T extends object>(sql: string, bind: Bind = {}): Promise<T | null> {
  return (await selectRows<T>(sql, bind))[0] ?? null;
}

/** Runs a statement whose rows nobody reads. */
export async function execute(sql: string, bind: Bind = {}): Promise<void> {
  await database().query(sql, { bind: withoutUndefined(bind), raw: true });
}

/** Sequelize refuses undefined in a bind; for SQL it means null. */
function withoutUndefined(bind: Bind): Bind {
  return Object.fromEntries(Object.entries(bind).map(([key, value]) => [key, value ?? null]));
}
