import { mkdir, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openDatabase } from '#server/db/database.ts'
import { WriteQueue } from '#server/db/write-queue.ts'
import { createTestClock } from '#tests/support/clock.ts'
import { createTestDatabase, temporaryFolder } from '#tests/support/database.ts'
import { createFactories } from '#tests/support/factories.ts'

let test: Awaited<ReturnType<typeof createTestDatabase>>
let factories: ReturnType<typeof createFactories>
beforeAll(async () => {
  test = await createTestDatabase()
  factories = createFactories(test.database, createTestClock())
})
afterAll(() => test.remove())

const firstRow = ([rows]: [unknown[], unknown] | unknown[]) =>
  (Array.isArray(rows) ? rows[0] : rows) as Record<string, unknown>

describe('the database', () => {
  it('writes ahead (WAL)', async () => {
    expect(firstRow(await test.database.sequelize.query('PRAGMA journal_mode'))).toEqual({
      journal_mode: 'wal',
    })
  })

  it('enforces foreign keys and waits for locks, on reading and on writing connections', async () => {
    const { sequelize } = test.database
    const pragmas = ['foreign_keys', 'busy_timeout']
    const reading = await Promise.all(pragmas.map((name) => sequelize.query(`PRAGMA ${name}`)))
    const writing = await test.database.write(async (transaction) => [
      await sequelize.query('PRAGMA foreign_keys', { transaction }),
      await sequelize.query('PRAGMA busy_timeout', { transaction }),
    ])
    for (const answers of [reading, writing])
      expect(answers.map((answer) => Object.values(firstRow(answer))[0])).toEqual([1, 5000])
  })

  it('refuses a design of a project that does not exist', async () => {
    const { Design } = test.database.models
    const { id: createdBy } = await factories.createPerson('engineer')
    const orphan = { projectId: 999_999, name: 'Orphan', createdBy, createdAt: new Date() }
    await expect(
      test.database.write((transaction) => Design.create(orphan, { transaction })),
    ).rejects.toThrow('FOREIGN KEY')
  })

  it('takes back everything that a failed write did', async () => {
    const { Project } = test.database.models
    const now = new Date()
    const row = { name: 'Half-saved', createdAt: now, updatedAt: now }
    const write = test.database.write(async (transaction) => {
      await Project.create(row, { transaction })
      throw new Error('in the middle')
    })
    await expect(write).rejects.toThrow('in the middle')
    expect(await Project.count({ where: { name: 'Half-saved' } })).toBe(0)
  })

  it('loses none of forty concurrent read-modify-writes', async () => {
    const { Draft } = test.database.models
    const { id } = await factories.createDesign()
    const raise = () =>
      test.database.write(async (transaction) => {
        const draft = await Draft.findByPk(id, { transaction, rejectOnEmpty: true })
        await draft.update({ version: draft.version + 1 }, { transaction })
      })
    await Promise.all(Array.from({ length: 40 }, raise))
    expect((await Draft.findByPk(id))!.version).toBe(41)
  })

  it('can be read while somebody writes', async () => {
    const { Project } = test.database.models
    const before = await Project.count()
    await test.database.write(async (transaction) => {
      const now = new Date()
      await Project.create({ name: 'Not yet', createdAt: now, updatedAt: now }, { transaction })
      expect(await Project.count()).toBe(before)
    })
    expect(await Project.count()).toBe(before + 1)
  })
})

describe('the write queue', () => {
  it('runs one after the other, in the order of asking, past failures', async () => {
    const queue = new WriteQueue()
    const events: string[] = []
    const work = (name: string, fails: boolean) => async () => {
      events.push(`${name} begins`)
      await new Promise((resolve) => setImmediate(resolve))
      events.push(`${name} ends`)
      if (fails) throw new Error(name)
      return name
    }
    const results = await Promise.allSettled([
      ...[queue.add(work('a', false)), queue.add(work('b', true)), queue.add(work('c', false))],
    ])
    expect(events).toEqual(['a begins', 'a ends', 'b begins', 'b ends', 'c begins', 'c ends'])
    expect(results.map(({ status }) => status)).toEqual(['fulfilled', 'rejected', 'fulfilled'])
  })

  it('refuses a write inside a write rather than waiting for ever', async () => {
    const queue = new WriteQueue()
    await expect(queue.add(() => queue.add(async () => 1))).rejects.toThrow('A write inside a write')
    expect(await queue.add(async () => 2)).toBe(2)
  })

  it('is drained when the last write, asked for meanwhile too, has ended', async () => {
    const queue = new WriteQueue()
    let ended = 0
    const work = async () => {
      await new Promise((resolve) => setImmediate(resolve))
      ended += 1
    }
    const first = queue.add(work)
    void first.then(() => queue.add(work))
    await queue.drained()
    expect(ended).toBe(2)
  })
})

describe('openDatabase', () => {
  let folder: Awaited<ReturnType<typeof temporaryFolder>>
  beforeAll(async () => {
    folder = await temporaryFolder()
  })
  afterAll(() => folder.remove())

  it('makes file and folder when they are missing', async () => {
    const database = await openDatabase(join(folder.path, 'new', 'deep', 'data.sqlite'))
    await expect(database.ping()).resolves.toBeUndefined()
    await database.close()
  })

  it('says so when the file is no database', async () => {
    const file = join(folder.path, 'letter.sqlite')
    await writeFile(file, 'Dear sir or madam, '.repeat(500))
    await expect(openDatabase(file)).rejects.toThrow(`The file ${file} is damaged or no SQLite database`)
  })

  it('says so when a folder stands in the place of the file', async () => {
    const file = join(folder.path, 'folder.sqlite')
    await mkdir(file)
    await expect(openDatabase(file)).rejects.toThrow(
      `The database ${file} cannot be written (SQLITE_CANTOPEN)`,
    )
  })

  it('says so when a file stands in the place of the folder', async () => {
    await writeFile(join(folder.path, 'file'), '')
    const file = join(folder.path, 'file', 'data.sqlite')
    await expect(openDatabase(file)).rejects.toThrow(/cannot be written \((ENOTDIR|EEXIST)\)/)
  })
})
