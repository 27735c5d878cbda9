import type { Migration } from '#server/db/migrations/migration.ts'

/** The record's bytes stand in a table of their own, so that lists of runs never read them. */
export const runs: Migration = {
  name: '20261201100200-runs',
  up: [
    `CREATE TABLE runs (
      id INTEGER PRIMARY KEY AUTOINCREMENT,
      design_id INTEGER NOT NULL REFERENCES designs (id),
      author_id INTEGER NOT NULL REFERENCES people (id),
      title TEXT NOT NULL COLLATE NOCASE,
      note TEXT NOT NULL DEFAULT '',
      engine_version TEXT NOT NULL,
      inputs JSON NOT NULL,
      figures JSON NOT NULL,
      modes JSON NOT NULL,
      unsettled TEXT,
      sample_interval DOUBLE NOT NULL CHECK (sample_interval > 0),
      samples INTEGER NOT NULL CHECK (samples >= 1),
      columns JSON NOT NULL,
      created_at DATETIME NOT NULL
    )`,
    'CREATE INDEX runs_of_design ON runs (design_id, created_at)',
    'CREATE INDEX runs_of_author ON runs (author_id)',
    'CREATE INDEX runs_by_date ON runs (created_at)',
    'CREATE INDEX runs_by_title ON runs (title)',
    `CREATE TABLE run_records (
      run_id INTEGER PRIMARY KEY REFERENCES runs (id) ON DELETE CASCADE,
      bytes BLOB NOT NULL
    )`,
  ],
  down: ['DROP TABLE run_records', 'DROP TABLE runs'],
}
