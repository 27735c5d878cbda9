import { accessSync, constants, existsSync } from 'node:fs'
import { dirname } from 'node:path'
import { Sequelize, Transaction } from 'sequelize'
import { driver } from '#server/db/driver.ts'
import { createMigrator } from '#server/db/migrator.ts'
import { migrations } from '#server/db/migrations/index.ts'
import { defineModels, type Models } from '#server/db/models/index.ts'
import { WriteQueue } from '#server/db/write-queue.ts'
import { makeFolder } from '#server/make-folder.ts'
import { StartError } from '#server/start-error.ts'

/** The open database: models to read through, and one queue for everything that changes it. */
export class Database {
  readonly models: Models
  readonly #queue = new WriteQueue()
  #closed: Promise<void> | null = null

  constructor(readonly sequelize: Sequelize) {
    this.models = defineModels(sequelize)
  }

  /**
   * Runs `work` alone, in an IMMEDIATE transaction that commits when it resolves and rolls back when it rejects.
   * Pass `transaction` to every query inside; never write within a write.
   */
  write<T>(work: (transaction: Transaction) => Promise<T>): Promise<T> {
    return this.#queue.add(() => this.sequelize.transaction({ type: Transaction.TYPES.IMMEDIATE }, work))
  }

  /** Applies every migration that is still missing. */
  async migrate(): Promise<void> {
    const { migrator, applied } = createMigrator(this.sequelize)
    const newer = (await applied()).find((name) => !migrations.some((known) => known.name === name))
    if (newer !== undefined)
      throw new StartError(
        `The database was written by a newer version (migration ${newer}): start that version, or choose another DATABASE_FILE.`,
      )
    await migrator.up()
  }

  /** Rejects when the database does not answer. */
  async ping(): Promise<void> {
    await this.sequelize.query('SELECT 1')
  }

  /** Waits for the writes that were asked for, then closes the file; once, however often it is asked. */
  close(): Promise<void> {
    this.#closed ??= this.#queue.drained().then(() => this.sequelize.close())
    return this.#closed
  }
}

/**
 * Opens the database file, made when missing, with write-ahead logging and migrated to the newest schema.
 * @throws StartError with a sentence when the file cannot be written or is no database of ours
 */
export async function openDatabase(file: string): Promise<Database> {
  assertWritable(file)
  const sequelize = new Sequelize({
    dialect: 'sqlite',
    dialectModule: driver,
    storage: file,
    logging: false,
    transactionType: Transaction.TYPES.IMMEDIATE,
  })
  const database = new Database(sequelize)
  try {
    await sequelize.query('PRAGMA journal_mode = WAL')
    await database.migrate()
    return database
  } catch (error) {
    // Not awaited: a file that could not be opened never answers to being closed.
    void sequelize.close().catch(() => undefined)
    throw asStartError(error, file)
  }
}

function assertWritable(file: string): void {
  try {
    makeFolder(dirname(file))
    accessSync(existsSync(file) ? file : dirname(file), constants.W_OK)
  } catch (error) {
    throw unwritable(file, (error as NodeJS.ErrnoException).code)
  }
}

const unwritable = (file: string, code = 'unknown reason') =>
  new StartError(`The database ${file} cannot be written (${code}): choose another DATABASE_FILE.`)

/** SQLite's result code behind an error of Sequelize, or behind one of umzug that wraps it. */
function resultCode(error: unknown): string | undefined {
  const { original, cause } = error as { original?: { code?: string }; cause?: unknown }
  return original?.code ?? (cause instanceof Error ? resultCode(cause) : undefined)
}

/** SQLite's result codes (https://www.sqlite.org/rescode.html) as sentences; other errors pass unchanged. */
function asStartError(error: unknown, file: string): unknown {
  const code = resultCode(error)
  if (code === 'SQLITE_NOTADB' || code === 'SQLITE_CORRUPT')
    return new StartError(
      `The file ${file} is damaged or no SQLite database: restore it from a backup, or choose another DATABASE_FILE.`,
    )
  if (
    code === 'SQLITE_CANTOPEN' ||
    code === 'SQLITE_READONLY' ||
    code === 'SQLITE_IOERR' ||
    code === 'SQLITE_FULL'
  )
    return unwritable(file, code)
  if (code === 'SQLITE_BUSY')
    return new StartError(`The database ${file} is locked by another process: stop that one first.`)
  return error
}
