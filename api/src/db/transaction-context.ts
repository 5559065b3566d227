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

export const insideTransaction = (): boolean => storage.getStore()?.get('transaction') !== undefined;
