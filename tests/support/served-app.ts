/** The built application as a person starts it: its own process, its own database file, a free port. */
import { spawn, type ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { mkdtemp, rm } from 'node:fs/promises'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'

export interface ServedApp {
  /** Address without a slash at the end. */
  url: string
  /** Everything that the process has printed. */
  output(): string
  databaseFile: string
  stop(signal?: NodeJS.Signals): Promise<number | null>
  /** Starts it again on the same port and database after `stop`. */
  restart(): Promise<void>
  /** Stops it and removes its database. */
  remove(): Promise<void>
}

/** A port that was free a moment ago. */
async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1')
  await once(server, 'listening')
  const address = server.address()
  server.close()
  await once(server, 'close')
  if (address === null || typeof address === 'string') throw new Error('no port')
  return address.port
}

/** Starts `dist/server/main.js` in demo mode and waits until it answers. Throws with its output when it ends first. */
export async function serveApp(environment: Record<string, string> = {}): Promise<ServedApp> {
  const folder = await mkdtemp(join(tmpdir(), 'sinewright-e2e-'))
  const databaseFile = join(folder, 'data.sqlite')
  const port = await freePort()
  const url = `http://127.0.0.1:${port}`
  let output = ''
  let child: ChildProcess

  async function start() {
    child = spawn(process.execPath, ['dist/server/main.js'], {
      env: { ...process.env, NODE_ENV: '', PORT: String(port), DATABASE_FILE: databaseFile, ...environment },
      stdio: ['ignore', 'pipe', 'pipe'],
    })
    child.stdout?.on('data', (chunk: Buffer) => (output += chunk.toString()))
    child.stderr?.on('data', (chunk: Buffer) => (output += chunk.toString()))
    for (let attempt = 0; attempt < 600; attempt++) {
      if (child.exitCode !== null) throw new Error(`the server ended with ${child.exitCode}:\n${output}`)
      const answer = await fetch(`${url}/api/health`).catch(() => null)
      if (answer?.ok) return
      await new Promise((resolve) => setTimeout(resolve, 100))
    }
    child.kill('SIGKILL')
    throw new Error(`the server did not answer within a minute:\n${output}`)
  }

  async function stop(signal: NodeJS.Signals = 'SIGTERM') {
    if (child.exitCode === null && child.signalCode === null) {
      child.kill(signal)
      await once(child, 'exit')
    }
    return child.exitCode
  }

  await start()
  return {
    url,
    output: () => output,
    databaseFile,
    stop,
    restart: start,
    async remove() {
      await stop()
      await rm(folder, { recursive: true, force: true })
    },
  }
}
