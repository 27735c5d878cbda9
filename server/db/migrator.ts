import { QueryTypes, type Sequelize, type Transaction } from 'sequelize'
import { Umzug, type UmzugStorage } from 'umzug'
import { migrations } from '#server/db/migrations/index.ts'
import type { Migration } from '#server/db/migrations/migration.ts'

/**
 * Applies and reverts the schema changes of `migrations/`. Each stands in one IMMEDIATE transaction together with the
 * note that it was applied, in the table `migrations`: a process that is killed leaves both or neither, and of two
 * that start at once the second finds the work done.
 */
export function createMigrator(sequelize: Sequelize) {
  async function applied(transaction?: Transaction): Promise<string[]> {
    const table = 'CREATE TABLE IF NOT EXISTS migrations (name VARCHAR(255) NOT NULL PRIMARY KEY)'
    await sequelize.query(table, { transaction })
    const sql = 'SELECT name FROM migrations ORDER BY name'
    const rows = await sequelize.query<{ name: string }>(sql, { type: QueryTypes.SELECT, transaction })
    return rows.map(({ name }) => name)
  }

  const notes = {
    up: 'INSERT INTO migrations (name) VALUES (?)',
    down: 'DELETE FROM migrations WHERE name = ?',
  }

  /** Takes one change that way and notes it, unless another process has done so already. */
  const run = ({ name, ...migration }: Migration, way: 'up' | 'down') =>
    sequelize.transaction(async (transaction) => {
      if ((await applied(transaction)).includes(name) === (way === 'up')) return
      for (const statement of migration[way]) await sequelize.query(statement, { transaction })
      await sequelize.query(notes[way], { transaction, replacements: [name] })
    })

  const storage: UmzugStorage = {
    executed: () => applied(),
    // Noted with the change itself, above.
    logMigration: () => Promise.resolve(),
    unlogMigration: () => Promise.resolve(),
  }
  const migrator = new Umzug({
    migrations: migrations.map((migration) => ({
      name: migration.name,
      up: () => run(migration, 'up'),
      down: () => run(migration, 'down'),
    })),
    storage,
    logger: undefined,
  })
  return {
    migrator,
    /** Names of all that were applied to this database, by whatever version. */
    applied: () => applied(),
  }
}
