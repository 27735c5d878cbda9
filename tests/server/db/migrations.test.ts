import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { openDatabase } from '#server/db/database.ts'
import { createMigrator } from '#server/db/migrator.ts'
import { migrations } from '#server/db/migrations/index.ts'
import { createTestClock } from '#tests/support/clock.ts'
import { createTestDatabase, temporaryFolder } from '#tests/support/database.ts'
import { createFactories } from '#tests/support/factories.ts'

let test: Awaited<ReturnType<typeof createTestDatabase>>
beforeEach(async () => {
  test = await createTestDatabase()
})
afterEach(() => test.remove())

/** Everything in the schema but SQLite's and umzug's own tables. */
async function schema(): Promise<{ type: string; name: string; sql: string | null }[]> {
  const [rows] = await test.database.sequelize.query(
    `SELECT type, name, sql FROM sqlite_master
     WHERE name NOT LIKE 'sqlite_%' AND tbl_name <> 'migrations' ORDER BY type, name`,
  )
  return rows as Awaited<ReturnType<typeof schema>>
}

describe('the migrations', () => {
  it('stand in the order of their timestamps, each once', () => {
    const names = migrations.map(({ name }) => name)
    expect(names).toEqual([...new Set(names)].sort())
    for (const name of names) expect(name).toMatch(/^\d{14}-[a-z-]+$/)
  })

  it('lead back to nothing and forth to the same schema again', async () => {
    const { migrator } = createMigrator(test.database.sequelize)
    const before = await schema()
    expect(before.filter(({ type }) => type === 'table').map(({ name }) => name)).toEqual([
      ...['designs', 'drafts', 'people', 'projects', 'run_records', 'runs', 'sessions'],
    ])
    await migrator.down({ to: 0 })
    expect(await schema()).toEqual([])
    await migrator.up()
    expect(await schema()).toEqual(before)
    expect(await migrator.pending()).toEqual([])
  })

  it('go back one step at a time while there is data', async () => {
    const factories = createFactories(test.database, createTestClock())
    await factories.createRun()
    const { migrator } = createMigrator(test.database.sequelize)
    for (const { name } of [...migrations].reverse()) {
      const [reverted] = await migrator.down()
      expect(reverted?.name).toBe(name)
    }
    expect(await schema()).toEqual([])
  })

  it('leave nothing behind when one fails halfway, and go on from there', async () => {
    const { sequelize } = test.database
    const { migrator, applied } = createMigrator(sequelize)
    await migrator.down()
    const before = await schema()
    // The last step makes two tables; a view of the second one's name stops it after the first.
    await sequelize.query('CREATE VIEW run_records AS SELECT 1')
    await expect(migrator.up()).rejects.toThrow('run_records already exists')
    await sequelize.query('DROP VIEW run_records')
    expect(await schema()).toEqual(before)
    expect(await applied()).toEqual(migrations.slice(0, -1).map(({ name }) => name))
    await migrator.up()
    expect(await applied()).toEqual(migrations.map(({ name }) => name))
  })

  it('are noted together with the change: what cannot be noted is not changed either', async () => {
    const { sequelize } = test.database
    const { migrator } = createMigrator(sequelize)
    await migrator.down()
    const before = await schema()
    await sequelize.query(
      "CREATE TRIGGER no_note BEFORE INSERT ON migrations BEGIN SELECT RAISE(ABORT, 'no note'); END",
    )
    await expect(migrator.up()).rejects.toThrow('failed')
    expect(await schema()).toEqual(before)
    await sequelize.query('DROP TRIGGER no_note')
    await migrator.up()
    expect(await migrator.pending()).toEqual([])
  })

  it('are applied once when several processes start at once', async () => {
    const folder = await temporaryFolder()
    const file = join(folder.path, 'new.sqlite')
    const opened = await Promise.all([1, 2, 3].map(() => openDatabase(file)))
    try {
      for (const { sequelize } of opened)
        expect(await createMigrator(sequelize).applied()).toHaveLength(migrations.length)
    } finally {
      await Promise.all(opened.map((database) => database.close()))
      await folder.remove()
    }
  })

  it('match the models: every model writes and reads a row', async () => {
    const { createRun } = createFactories(test.database, createTestClock())
    const made = await createRun()
    const { Run, RunRecord, Design } = test.database.models
    const run = await Run.findByPk(made.id, {
      include: ['author', { association: 'design', include: ['project'] }],
    })
    const design = await Design.findByPk(made.designId, { include: ['draft', 'creator'] })
    expect(run!.get({ plain: true })).toMatchObject(made.get({ plain: true }))
    expect(run!.createdAt).toBeInstanceOf(Date)
    expect(run!.design!.project!.name).toMatch(/^Project/)
    expect(design!.draft!.content.circuit.supply.positive).toBe(9)
    expect((await RunRecord.findByPk(made.id))!.bytes).toBeInstanceOf(Buffer)
  })
})

describe('openDatabase', () => {
  it('refuses a database that a newer version has migrated', async () => {
    await test.database.sequelize.query("INSERT INTO migrations (name) VALUES ('29990101000000-later')")
    await expect(openDatabase(test.file)).rejects.toThrow(
      'The database was written by a newer version (migration 29990101000000-later)',
    )
  })
})
