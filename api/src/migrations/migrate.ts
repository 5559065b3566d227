import { QueryTypes, type Sequelize } from 'sequelize';
import { Umzug, type UmzugStorage } from 'umzug';
import { migrations } from './index';

const lockKey = 4_310_001;

/**
 * Runs every pending migration in one transaction behind an advisory lock: a failure leaves nothing behind, and two
 * processes at once run each migration once. Returns the names that ran.
 */
export async function migrate(sequelize: Sequelize): Promise<string[]> {
  return await sequelize.transaction(async (transaction) => {
    await sequelize.query('select pg_advisory_xact_lock($1)', { bind: [lockKey], transaction });
    await sequelize.query(
      'create table if not exists schema_migrations (name text primary key, ran_at timestamptz not null default now())',
      { transaction },
    );
    const storage: UmzugStorage = {
      async executed() {
        const rows = await sequelize.query<{ name: string }>('select name from schema_migrations order by name', {
          type: QueryTypes.SELECT,
          transaction,
        });
        return rows.map((row) => row.name);
      },
      async logMigration({ name }) {
        await sequelize.query('insert into schema_migrations (name) values ($1)', { bind: [name], transaction });
      },
      async unlogMigration({ name }) {
        await sequelize.query('delete from schema_migrations where name = $1', { bind: [name], transaction });
      },
    };
    const umzug = new Umzug({
      logger: undefined,
      storage,
      migrations: migrations.map((migration) => ({
        name: migration.name,
        async up() {
          await sequelize.query(migration.sql, { transaction });
        },
      })),
    });
    return (await umzug.up()).map((migration) => migration.name);
  });
}
