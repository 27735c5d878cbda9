import type { Migration } from '#server/db/migrations/migration.ts'

/** Projects, designs, and the one draft of each. */
export const designs: Migration = {
  name: '20261201100100-designs',
  up: [
    `CREATE TABLE projects (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      name TEXT NOT NULL COLLATE NOCASE UNIQUE,
      created_at DATETIME NOT NULL,
      updated_at DATETIME NOT NULL
    )`,
    `CREATE TABLE designs (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      project_id INTEGER NOT NULL REFERENCES projects (id),
      name TEXT NOT NULL COLLATE NOCASE,
      created_by INTEGER NOT NULL REFERENCES people (id),
      created_at DATETIME NOT NULL,
      archived_at DATETIME
    )`,
    'CREATE INDEX designs_of_project ON designs (project_id)',
    'CREATE INDEX designs_by_name ON designs (name)',
    `CREATE TABLE drafts (
      design_id INTEGER PRIMARY KEY REFERENCES designs (id) ON DELETE CASCADE,
      version INTEGER NOT NULL CHECK (version >= 1),
      content JSON NOT NULL,
      saved_by INTEGER NOT NULL REFERENCES people (id),
      saved_at DATETIME NOT NULL
    )`,
    'CREATE INDEX drafts_by_saving ON drafts (saved_at)',
  ],
  down: ['DROP TABLE drafts', 'DROP TABLE designs', 'DROP TABLE projects'],
}
