import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { openDatabase, type Database } from '#server/db/database.ts'

/** A folder of this test file's own; `remove` deletes it with everything inside. */
export async function temporaryFolder() {
  const path = await mkdtemp(join(tmpdir(), 'sinewright-test-'))
  return { path, remove: () => rm(path, { recursive: true, force: true }) }
}

let base: Promise<Buffer> | null = null

/** The file of an empty database with every migration applied, made once per test file and copied from then on. */
async function migratedBase(): Promise<Buffer> {
  const folder = await temporaryFolder()
  const file = join(folder.path, 'base.sqlite')
  const database = await openDatabase(file)
  await database.close()
  const bytes = await readFile(file)
  await folder.remove()
  return bytes
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
  await writeFile(file, await base)
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
