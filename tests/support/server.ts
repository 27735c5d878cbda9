import { join } from 'node:path'
import { createCompute } from '#server/compute/index.ts'
import type { Config } from '#server/config.ts'
import type { AppContext } from '#server/context.ts'
import { createLog } from '#server/http/request-log.ts'
import { runServer } from '#server/run-server.ts'
import { createAgent, type Agent } from '#tests/support/agent.ts'
import { createTestClock, type TestClock } from '#tests/support/clock.ts'
import { createTestDatabase } from '#tests/support/database.ts'
import { createFactories, testBcryptCost } from '#tests/support/factories.ts'
import type { Role } from '#shared/roles.ts'

/** Configuration of a test server: demo mode, a free port, limits out of the way, quick hashes. */
function testConfig(databaseFile: string, changes: Partial<Config> = {}): Config {
  return {
    mode: 'demo',
    host: '127.0.0.1',
    port: 0,
    databaseFile,
    sessionSecret: 'a secret that only the tests of this server know',
    logLevel: 'silent',
    trustProxy: 0,
    clientDirectory: join(databaseFile, '..', 'client'),
    bcryptCost: testBcryptCost,
    rates: { failedSignInsPerQuarterHour: 1_000_000, requestsPerMinute: 1_000_000 },
    ...changes,
  }
}

export interface TestServer extends ReturnType<typeof createFactories> {
  url: string
  context: AppContext
  clock: TestClock
  /** Lines that the server logged, when started with `logLevel` other than silent. */
  logged: string[]
  /** A signed-out client. */
  agent(): Agent
  /** A client signed in as a new person of that role. */
  signInAs(role: Role): Promise<Agent>
  /** Stops the server and removes its files. */
  close(): Promise<void>
}

export interface TestServerOptions {
  config?: Partial<Config>
  /** Parts of the context to replace, such as a fake `compute`. */
  context?: Partial<Pick<AppContext, 'compute'>>
}

/** A real HTTP server on a free port with a migrated, empty SQLite file of its own. */
export async function startTestServer(options: TestServerOptions = {}): Promise<TestServer> {
  const { database, file, remove } = await createTestDatabase()
  const config = testConfig(file, options.config)
  const clock = createTestClock()
  const logged: string[] = []
  const log = createLog(config, { write: (line) => void logged.push(line) })
  const context: AppContext = { config, database, compute: createCompute(), log, clock, ...options.context }
  const server = await runServer(context)
  const factories = createFactories(database, clock)
  return {
    ...factories,
    url: server.url,
    context,
    clock,
    logged,
    agent: () => createAgent(server.url),
    async signInAs(role) {
      const agent = createAgent(server.url)
      await agent.signIn(await factories.createPerson(role))
      return agent
    },
    async close() {
      await server.stop()
      await remove()
    },
  }
}
