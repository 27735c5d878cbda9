import { copyFile, mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { openDatabase, type Database } from '#server/db/database.ts'

/** A folder of this test file's own; `remove` deletes it with everything inside. */
export async function temporaryFolder() {
  const path = await mkdtemp(join(tmpdir(), 'sinewright-test-'))
  return { path, remove: () => rm(path, { recursive: true, force: true }) }
}

let base: Promise<string> | null = null

/** An empty database with every migration applied, made once per test file and copied from then on. */
async function migratedBase(): Promise<string> {
  const { path } = await temporaryFolder()
  const file = join(path, 'base.sqlite')
  process.once('exit', () => void rm(path, { recursive: true, force: true }))
  const database = await openDatabase(file)
  await database.close()
  return file
}

/** A real, migrated, empty SQLite file and its open database. */
export async function createTestDatabase(): Promise<{
  database: Database
  file: string
  remove(): Promise<void>
}> {
  base ??= migratedBase()
  const folder = await temporaryFolder()
  const file = join(folder.path, 'test.sqlite')
  await copyFile(await base, file)
  const database = await openDatabase(file)
  return {
    database,
    file,
    async remove() {
      await database.close()
      await folder.remove()
    },
  }
}
