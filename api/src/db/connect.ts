import { Sequelize } from 'sequelize';
import { initModels } from '../models/init-models';
import { useTransactionContext } from './transaction-context';

let current: Sequelize | null = null;
let prepared = false;

export interface ConnectOptions {
  poolSize?: number;
}

/** Opens the pool and binds the models to it. A process works on one database at a time. */
export function connectDatabase(url: string, options: ConnectOptions = {}): Sequelize {
  if (!prepared) {
    useTransactionContext();
    prepared = true;
  }
  const sequelize = new Sequelize(url, {
    dialect: 'postgres',
    logging: false,
    pool: { max: options.poolSize ?? 10, min: 0, acquire: 5_000, idle: 30_000 },
    dialectOptions: {
      application_name: 'slighthill',
      statement_timeout: 15_000,
      idle_in_transaction_session_timeout: 30_000,
      connectionTimeoutMillis: 5_000,
    },
    define: { underscored: true, timestamps: true, freezeTableName: true },
  });
  initModels(sequelize);
  current = sequelize;
  return sequelize;
}

export function database(): Sequelize {
  if (!current) throw new Error('The database is not connected');
  return current;
}
