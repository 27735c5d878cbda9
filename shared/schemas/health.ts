/** Answer of `GET /api/health`, which anybody may ask. */
export interface Health {
  status: 'ok'
  /** Of the server. */
  version: string
  database: 'ok'
  /** `demo` when the data is invented and the demo accounts exist. */
  mode: 'demo' | 'production'
}
