import { SequelizeStorage, Umzug } from 'umzug'
import type { Sequelize } from 'sequelize'
import { migrations } from '#server/db/migrations/index.ts'

/** Applies and reverts the schema changes of `migrations/`, each in a transaction; remembers them in `migrations`. */
export function createMigrator(sequelize: Sequelize) {
  const run = (statements: readonly string[]) =>
    sequelize.transaction(async (transaction) => {
      for (const statement of statements) await sequelize.query(statement, { transaction })
    })
  const storage = new SequelizeStorage({ sequelize, modelName: 'migration', tableName: 'migrations' })
  const migrator = new Umzug({
    migrations: migrations.map(({ name, up, down }) => ({
      name,
      up: () => run(up),
      down: () => run(down),
    })),
    storage,
    logger: undefined,
  })
  return {
    migrator,
    /** Names of all that were applied to this database, by whatever version. */
    applied: () => storage.executed(),
  }
}
