import type { Migration } from '#server/db/migrations/migration.ts'

/** Who may sign in, and their sign-ins. */
export const peopleAndSessions: Migration = {
  name: '20261201100000-people-and-sessions',
  up: [
    `CREATE TABLE people (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      name TEXT NOT NULL,
      email TEXT NOT NULL COLLATE NOCASE UNIQUE,
      role TEXT NOT NULL CHECK (role IN ('technician', 'engineer', 'reviewer', 'admin')),
      password_hash TEXT NOT NULL,
      active TINYINT(1) NOT NULL DEFAULT 1,
      demo TINYINT(1) NOT NULL DEFAULT 0,
      created_at DATETIME NOT NULL,
      updated_at DATETIME NOT NULL
    )`,
    `CREATE TABLE sessions (
      id_hash TEXT PRIMARY KEY,
      person_id INTEGER NOT NULL REFERENCES people (id) ON DELETE CASCADE,
      user_agent TEXT NOT NULL DEFAULT '',
      created_at DATETIME NOT NULL,
      last_seen_at DATETIME NOT NULL,
      expires_at DATETIME NOT NULL,
      revoked_at DATETIME
    )`,
    'CREATE INDEX sessions_of_person ON sessions (person_id)',
    'CREATE INDEX sessions_by_expiry ON sessions (expires_at)',
  ],
  down: ['DROP TABLE sessions', 'DROP TABLE people'],
}
