import { existsSync, readFileSync, statSync } from 'node:fs'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { readConfig } from '#server/config.ts'
import { isLoopbackName } from '#server/http/loopback.ts'
import { projectRoot } from '#server/root.ts'
import { temporaryFolder } from '#tests/support/database.ts'

let folder: Awaited<ReturnType<typeof temporaryFolder>>
beforeAll(async () => {
  folder = await temporaryFolder()
})
afterAll(() => folder.remove())

const demo = (changes: NodeJS.ProcessEnv = {}) =>
  readConfig({ DATABASE_FILE: join(folder.path, 'demo.sqlite'), ...changes })
const production = (changes: NodeJS.ProcessEnv = {}) =>
  readConfig({
    ...{ NODE_ENV: 'production', SESSION_SECRET: 's'.repeat(32) },
    ...{ DATABASE_FILE: join(folder.path, 'real.sqlite') },
    ...changes,
  })

describe('readConfig in demo mode', () => {
  it('has defaults for everything', () => {
    expect(demo()).toMatchObject({
      ...{ mode: 'demo', host: '127.0.0.1', port: 4173, logLevel: 'info', trustProxy: 0, bcryptCost: 12 },
    })
  })

  it('takes an empty variable as one that is not set', () => {
    expect(demo({ PORT: '', HOST: ' ', NODE_ENV: '' })).toMatchObject({
      mode: 'demo',
      port: 4173,
      host: '127.0.0.1',
    })
  })

  it('places a relative database file in the project', () => {
    const { databaseFile } = production({ DATABASE_FILE: 'data/here.sqlite' })
    expect(databaseFile).toBe(join(projectRoot, 'data', 'here.sqlite'))
  })

  it('keeps a secret of its own beside the database, readable by its owner alone', () => {
    const first = demo()
    const file = `${first.databaseFile}.secret`
    expect(first.sessionSecret).toMatch(/^[0-9a-f]{64}$/)
    expect(readFileSync(file, 'utf8').trim()).toBe(first.sessionSecret)
    expect(statSync(file).mode & 0o777).toBe(0o600)
    expect(demo().sessionSecret).toBe(first.sessionSecret)
    expect(demo({ DATABASE_FILE: join(folder.path, 'second.sqlite') }).sessionSecret).not.toBe(
      first.sessionSecret,
    )
  })

  it.each(['0.0.0.0', '::', '192.0.2.1', 'sinewright.example', '127.0.0.1.evil.example'])(
    'refuses to listen at %s',
    (HOST) => {
      expect(() => demo({ HOST })).toThrow(`HOST must be 127.0.0.1, ::1 or localhost, not ${HOST}.`)
    },
  )

  it.each(['localhost', '::1', '127.0.0.53'])('listens at %s', (HOST) => {
    expect(demo({ HOST }).host).toBe(HOST)
  })

  it('says so when the folder of the database cannot be written', () => {
    expect(() => demo({ DATABASE_FILE: '/proc/nowhere/demo.sqlite' })).toThrow(
      /^The folder of the database, \/proc\/nowhere, cannot be written \(\w+\)/,
    )
  })
})

describe('readConfig in production', () => {
  it.each([undefined, '', 'short', 's'.repeat(31)])('refuses the secret %j', (SESSION_SECRET) => {
    expect(() => production({ SESSION_SECRET })).toThrow(
      'In production SESSION_SECRET must be set to a random text of at least 32 characters',
    )
  })

  it('takes a secret of 32 characters, listens anywhere and writes no secret', () => {
    expect(production({ HOST: '0.0.0.0' })).toMatchObject({
      ...{ mode: 'production', host: '0.0.0.0', sessionSecret: 's'.repeat(32) },
    })
    expect(existsSync(join(folder.path, 'real.sqlite.secret'))).toBe(false)
  })
})

describe('readConfig', () => {
  it.each([
    ['PORT', 'http', 'PORT must be a whole number from 0 to 65535.'],
    ['PORT', '65536', 'PORT must be a whole number from 0 to 65535.'],
    ['PORT', '80.5', 'PORT must be a whole number from 0 to 65535.'],
    ['TRUST_PROXY', '-1', 'TRUST_PROXY must be the number of proxies in front, 0 to 10.'],
    ['LOG_LEVEL', 'loud', 'LOG_LEVEL must be one of fatal, error, warn, info, debug, trace, silent.'],
  ])('refuses %s=%s', (name, value, sentence) => {
    expect(() => demo({ [name]: value })).toThrow(sentence)
  })
})

describe('isLoopbackName', () => {
  // Addresses of RFC 1122 §3.2.1.3 and RFC 4291 §2.5.3; look-alikes are ours.
  it.each(['localhost', 'LOCALHOST', '127.0.0.1', '127.255.255.254', '[::1]', '::1', '::ffff:127.0.0.1'])(
    'accepts %s',
    (host) => expect(isLoopbackName(host)).toBe(true),
  )
  it.each([
    '',
    'localhost.example',
    '127.0.0.1.example',
    '128.0.0.1',
    '0.0.0.0',
    '[::]',
    '::2',
    '2130706433',
  ])('refuses %j', (host) => expect(isLoopbackName(host)).toBe(false))
})
