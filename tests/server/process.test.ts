/** The process itself: how it starts, refuses to start, and stops. Bundled as for a release. */
import { once } from 'node:events'
import { statSync } from 'node:fs'
import { mkdir, writeFile } from 'node:fs/promises'
import { request as httpRequest, type IncomingMessage } from 'node:http'
import { createServer, type AddressInfo } from 'node:net'
import { join } from 'node:path'
import { text } from 'node:stream/consumers'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { openDatabase } from '#server/db/database.ts'
import { temporaryFolder } from '#tests/support/database.ts'
import { bundleServer, spawnNode, type BundledServer, type SpawnedProcess } from '#tests/support/process.ts'

const password = 'correct horse battery'
let folder: Awaited<ReturnType<typeof temporaryFolder>>
let bundle: BundledServer
let spawned: SpawnedProcess[] = []
beforeAll(async () => {
  folder = await temporaryFolder()
  bundle = await bundleServer()
})
afterEach(async () => {
  for (const { signal } of spawned) signal('SIGKILL')
  await Promise.all(spawned.map(({ ended }) => ended))
  spawned = []
})
afterAll(() => Promise.all([folder.remove(), bundle.remove()]))

const environment = (changes: Record<string, string> = {}) => ({
  ...{ NODE_ENV: 'production', SESSION_SECRET: 's'.repeat(40), PORT: '0' },
  DATABASE_FILE: join(folder.path, 'data.sqlite'),
  ...changes,
})

function start(changes?: Record<string, string>): SpawnedProcess {
  const started = spawnNode(bundle.main, environment(changes))
  spawned.push(started)
  return started
}

/** Starts and waits for the refusal: what it said on standard error. */
async function refusal(changes: Record<string, string>): Promise<string> {
  const refused = start(changes)
  expect(await refused.ended).toBe(1)
  const { stderr } = refused.output()
  expect(stderr).not.toMatch(/^\s+at |Error:/m)
  expect(stderr.trim().split('\n')).toHaveLength(1)
  return stderr.trim()
}

async function url(server: SpawnedProcess): Promise<string> {
  const [, address] = await server.printed(/Sinewright is at (\S+)/)
  return address!
}

describe('a start that cannot succeed', () => {
  it('names the taken port', async () => {
    const taken = createServer().listen(0, '127.0.0.1')
    await once(taken, 'listening')
    const { port } = taken.address() as AddressInfo
    try {
      expect(await refusal({ PORT: String(port) })).toBe(
        `Port ${port} on 127.0.0.1 is taken: stop what uses it, or set PORT to another one.`,
      )
    } finally {
      taken.close()
    }
  })

  it('names an address that is not this machine', async () => {
    // 192.0.2.0/24 is set aside for documentation (RFC 5737).
    expect(await refusal({ HOST: '192.0.2.1' })).toBe('HOST 192.0.2.1 is not an address of this machine.')
  })

  it('names a database that cannot be written', async () => {
    const file = join(folder.path, 'a-folder.sqlite')
    await mkdir(file)
    expect(await refusal({ DATABASE_FILE: file })).toBe(
      `The database ${file} cannot be written (SQLITE_CANTOPEN): choose another DATABASE_FILE.`,
    )
    expect(await refusal({ DATABASE_FILE: '/proc/nowhere/data.sqlite' })).toMatch(/cannot be written/)
  })

  it('names a database that is none', async () => {
    const file = join(folder.path, 'letter.sqlite')
    await writeFile(file, 'Dear sir or madam, '.repeat(500))
    expect(await refusal({ DATABASE_FILE: file })).toContain('is damaged or no SQLite database')
  })

  it('asks production for a secret', async () => {
    expect(await refusal({ SESSION_SECRET: 'short' })).toContain('at least 32 characters')
  })

  it('keeps the demo on this machine', async () => {
    expect(await refusal({ NODE_ENV: '', HOST: '0.0.0.0' })).toContain(
      'The demo listens on this machine only',
    )
  })
})

describe('the first administrator', () => {
  const createAdmin = (args: string[], input: string) =>
    spawnNode(bundle.createAdmin, environment(), { args, input })

  it('is made by a command, from a password on standard input, and can sign in', async () => {
    const made = createAdmin(['Ada Example', 'Ada@Company.example'], `${password}\n`)
    expect(await made.ended).toBe(0)
    expect(made.output().stdout).toBe('ada@company.example can now sign in as administrator.\n')

    const server = start()
    const answer = await fetch(`${await url(server)}/api/session`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify({ email: 'ada@company.example', password }),
    })
    expect(answer.status).toBe(200)
    expect(await answer.json()).toMatchObject({ person: { role: 'admin' }, mode: 'production' })
    expect(server.output().stdout).not.toContain('Demo')
    expect(statSync(join(folder.path, 'data.sqlite')).mode & 0o077).toBe(0)
  })

  it('is not made twice', async () => {
    const again = createAdmin(['Ada Example', 'ada@company.example'], password)
    expect(await again.ended).toBe(1)
    expect(again.output().stderr).toBe('There is already an account of ada@company.example.\n')
  })

  it.each([
    [['Ada'], password, 'Usage: create-admin'],
    [['Ada', 'ada'], password, 'This is not an e-mail address'],
    [['Ada', 'b@company.example'], 'short', 'A password needs at least 10 characters.'],
  ])('is refused with a sentence for %j', async (args, input, sentence) => {
    const refused = createAdmin(args, input)
    expect(await refused.ended).toBe(1)
    expect(refused.output().stderr).toContain(sentence)
  })
})

describe('being told to stop', () => {
  /** Begins a sign-in whose body is still under way when this resolves. */
  async function halfASignIn(address: string) {
    const body = JSON.stringify({ email: 'nobody@company.example', password })
    const headers = { 'Content-Type': 'application/json', 'Content-Length': body.length }
    const sent = httpRequest(`${address}/api/session`, { method: 'POST', headers })
    const answered = once(sent, 'response') as Promise<[IncomingMessage]>
    sent.write(body.slice(0, 10))
    // The server has the connection once it answers a later one.
    await fetch(`${address}/api/health`)
    return { finish: () => sent.end(body.slice(10)), answered }
  }

  it.each(['SIGTERM', 'SIGINT'] as const)(
    'by %s: finishes the request under way, takes no new one, and ends with 0',
    async (signal) => {
      const server = start({ LOG_LEVEL: 'info' })
      const address = await url(server)
      const request = await halfASignIn(address)
      server.signal(signal)
      await server.printed(/"stopping"/)
      await expect(fetch(`${address}/api/health`)).rejects.toThrow()
      request.finish()
      const [answer] = await request.answered
      expect(answer.statusCode).toBe(401)
      expect(JSON.parse(await text(answer))).toMatchObject({ code: 'wrong-credentials' })
      expect(await server.ended).toBe(0)
    },
  )

  it('leaves the database whole: the write-ahead log is merged and every table is readable', async () => {
    const server = start()
    await url(server)
    server.signal('SIGTERM')
    expect(await server.ended).toBe(0)
    expect(statSync(`${environment().DATABASE_FILE}-wal`, { throwIfNoEntry: false })).toBeUndefined()
    const database = await openDatabase(environment().DATABASE_FILE)
    const [rows] = await database.sequelize.query('PRAGMA integrity_check')
    expect(rows).toEqual([{ integrity_check: 'ok' }])
    await database.close()
  })

  it('twice: ends at once', async () => {
    const server = start({ LOG_LEVEL: 'info' })
    const { answered } = await halfASignIn(await url(server))
    const broken = expect(answered).rejects.toThrow()
    server.signal('SIGTERM')
    await server.printed(/"stopping"/)
    server.signal('SIGTERM')
    expect(await server.ended).toBe(1)
    await broken
  })
})
