/** One change of the schema: SQL statements forth and back, in order, applied in one transaction. */
export interface Migration {
  /** Timestamp and topic; the order of application. */
  name: string
  up: readonly string[]
  down: readonly string[]
}
