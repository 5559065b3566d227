import { database } from './connect';
import { insideTransaction } from './transaction-context';

/**
 * Opens the one transaction of a command. Only services call it; a nested call is a mistake, because Sequelize would
 * open a second, independent transaction.
 */
export async function inTransaction<T>(work: () => Promise<T>): Promise<T> {
  if (insideTransaction()) throw new Error('A transaction is open already');
  return await database().transaction(work);
}

/** Throws unless a transaction is open: the guard of steps that must not stand alone. */
export function requireTransaction(): void {
  if (!insideTransaction()) throw new Error('This step belongs inside a transaction');
}
