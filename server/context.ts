import type { Logger } from 'pino'
import type { Clock } from '#server/clock.ts'
import type { Compute } from '#server/compute/index.ts'
import type { Config } from '#server/config.ts'
import type { Database } from '#server/db/database.ts'

/** What every part of the server is handed: nothing reaches for globals. */
export interface AppContext {
  config: Config
  database: Database
  compute: Compute
  log: Logger
  clock: Clock
}
