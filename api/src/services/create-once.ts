import { createHash, randomUUID } from 'node:crypto';
import { requireTransaction } from '../db/in-transaction';
import { selectRow } from '../db/query';
import { AppError } from '../errors/app-error';
import type { CommandContext } from './command-context';

export interface Created<T> {
  row: T;
  /** False when the same request had been answered before. */
  isNew: boolean;
}

interface CreateOnce<T> {
  kind: string;
  id: string | undefined;
  /** Everything the result depends on; compared by hash. */
  request: unknown;
  create: (id: string) => Promise<T>;
  find: (id: string) => Promise<T | null>;
}

/**
 * Creates under a client-made id at most once. The same id with the same request answers with the first result, with
 * another request it is refused. Concurrent calls wait for the first to commit.
 */
export async function createOnce<T>(context: CommandContext, options: CreateOnce<T>): Promise<Created<T>> {
  requireTransaction();
  if (options.id === undefined) return { row: await options.create(randomUUID()), isNew: true };
  const key = { kind: options.kind, id: options.id };
  const bodyHash = createHash('sha256').update(stableJson(options.request)).digest('hex');
  const { clinicId } = context.actor;
  const claimed = await selectRow(
    `insert into created_ids (kind, id, clinic_id, body_hash, created_at)
     values ($kind, $id, $clinicId, $bodyHash, $now) on conflict do nothing returning id`,
    { ...key, clinicId, bodyHash, now: context.clock.now() },
  );
  if (claimed) return { row: await options.create(options.id), isNew: true };
  const earlier = await selectRow<{ clinicId: string; bodyHash: string }>(
    'select clinic_id as "clinicId", body_hash as "bodyHash" from created_ids where kind = $kind and id = $id',
    key,
  );
  if (earlier?.clinicId === clinicId && earlier.bodyHash === bodyHash) {
    const row = await options.find(options.id);
    if (row) return { row, isNew: false };
  }
  throw new AppError('id-taken', 'This id was already used for something else. Nothing was stored.');
}

/** JSON with sorted keys, so that the order of fields in a request does not matter. */
function stableJson(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) => {
    if (typeof inner !== 'object' || inner === null || Array.isArray(inner)) return inner;
    return Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)));
  });
}
