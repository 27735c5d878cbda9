/** Starts the server process, prints where it is, and stops it gracefully on SIGTERM and SIGINT. */
import type { Logger } from 'pino'
import { systemClock } from '#server/clock.ts'
import { createCompute } from '#server/compute/index.ts'
import { readConfig } from '#server/config.ts'
import { openDatabase } from '#server/db/database.ts'
import { demoAccounts, seedDemo } from '#server/db/demo/index.ts'
import { createLog } from '#server/http/request-log.ts'
import { runServer, type RunningServer } from '#server/run-server.ts'
import { endWith } from '#server/start-error.ts'

/** Longest wait for requests and writes under way when the process is told to stop, milliseconds. */
const stopTimeout = 10_000

async function start(): Promise<void> {
  // Database and secret are for this user's eyes only.
  process.umask(0o077)
  const config = readConfig(process.env)
  const log = createLog(config)
  const database = await openDatabase(config.databaseFile)
  const context = { config, database, compute: createCompute(), log, clock: systemClock }
  if (config.mode === 'demo') await seedDemo(context)
  const server = await runServer(context)
  stopOnSignal(server, log)
  process.stdout.write(`Sinewright is at ${server.url}\n`)
  if (config.mode === 'demo') process.stdout.write(demoSignIns())
}

function demoSignIns(): string {
  const lines = demoAccounts.map(
    ({ name, email, role, password }) =>
      `  ${role.padEnd(10)}  ${email.padEnd(26)}  ${password.padEnd(20)}  ${name}\n`,
  )
  return ['Demo with invented data. Sign in as one of:\n', ...lines].join('')
}

function stopOnSignal(server: RunningServer, log: Logger): void {
  let stopping = false
  const stop = (signal: NodeJS.Signals) => {
    if (stopping) process.exit(1)
    stopping = true
    log.info({ signal }, 'stopping')
    const bound = setTimeout(() => {
      log.error(`requests were still under way after ${stopTimeout / 1000} s`)
      process.exit(1)
    }, stopTimeout)
    server.stop().then(
      () => {
        clearTimeout(bound)
        process.exitCode = 0
      },
      (error: unknown) => {
        log.error({ err: error }, 'stopping failed')
        process.exit(1)
      },
    )
  }
  process.on('SIGTERM', stop)
  process.on('SIGINT', stop)
}

start().catch(endWith)
