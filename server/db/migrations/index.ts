import type { Migration } from '#server/db/migrations/migration.ts'
import { peopleAndSessions } from '#server/db/migrations/20261201100000-people-and-sessions.ts'
import { designs } from '#server/db/migrations/20261201100100-designs.ts'
import { runs } from '#server/db/migrations/20261201100200-runs.ts'

/** Every schema change in order. Listed by hand so that the bundle holds them; append, never change an old one. */
export const migrations: readonly Migration[] = [peopleAndSessions, designs, runs]
