import { AsyncLocalStorage } from 'node:async_hooks';
import { Sequelize } from 'sequelize';

const storage = new AsyncLocalStorage<Map<string, unknown>>();

/**
 * Lets every query made inside a transaction join it without being handed it. A query that stayed outside would
 * survive a rollback and could starve the pool. Set once, before the first connection.
 */
export function useTransactionContext(): void {
  Sequelize.useCLS({
    bind: (fn: unknown) => fn,
    get: (key: string) => storage.getStore()?.get(key),
    set: (key: string, value: unknown) => storage.getStore()?.set(key, value),
    run: (fn: () => unknown) => storage.run(new Map(), fn),
  } as never);
}

interface OpenTransaction {
  connection: { query(text: string, values: unknown[]): Promise<{ rows: unknown[] }> };
}

/** The open transaction, for the one reader that goes round the ORM. */
export const currentTransaction = (): OpenTransaction | undefined =>
  storage.getStore()?.get('transaction') as OpenTransaction | undefined;

export const insideTransaction = (): boolean => currentTransaction() !== undefined;
