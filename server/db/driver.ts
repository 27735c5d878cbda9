import sqlite3 from 'sqlite3'

/** How long a connection waits for another process that holds the lock, milliseconds. */
const busyTimeout = 5000

/** Sequelize opens a connection for every transaction: each gets its busy timeout here. */
class PatientDatabase extends sqlite3.Database {
  constructor(file: string, mode: number, opened: (error: Error | null) => void) {
    super(file, mode, opened)
    this.configure('busyTimeout', busyTimeout)
  }
}

/** The sqlite3 module as Sequelize's `dialectModule`, with patient connections. */
export const driver = { ...sqlite3, Database: PatientDatabase }
