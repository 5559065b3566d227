import type { Sequelize } from 'sequelize';

const hookName = 'lazy-commits';
const statement = 'set synchronous_commit = off';

interface Connection {
  query(text: string): Promise<unknown>;
}

/**
 * While `work` runs, a commit does not wait for the disk. Nothing is at risk but the tail of a load that a power cut
 * interrupts, and such a load is made again from the start. Connections opened meanwhile keep the setting until closed.
 */
export async function withLazyCommits<T>(sequelize: Sequelize, work: () => Promise<T>): Promise<T> {
  const relax = async (connection: unknown) => void (await (connection as Connection).query(statement));
  sequelize.addHook('afterConnect', hookName, relax);
  try {
    // the connection that is open already
    await sequelize.query(statement);
    return await work();
  } finally {
    sequelize.removeHook('afterConnect', hookName);
  }
}
