import { chmodSync, existsSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { readConfig } from '#server/config.ts'
import { isLoopbackName } from '#server/loopback.ts'
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

  it('makes a new secret when the kept one is damaged, and closes it to others', () => {
    const { databaseFile, sessionSecret } = demo()
    const file = `${databaseFile}.secret`
    // What a file system may leave after a power failure, an empty file, and one that was cut off.
    for (const damaged of ['\0'.repeat(65), '', sessionSecret.slice(0, 40)]) {
      writeFileSync(file, damaged)
      chmodSync(file, 0o644)
      const renewed = demo().sessionSecret
      expect(renewed).toMatch(/^[0-9a-f]{64}$/)
      expect(readFileSync(file, 'utf8').trim()).toBe(renewed)
      expect(statSync(file).mode & 0o777).toBe(0o600)
    }
  })

  it('takes away the right of others to read a secret that is sound', () => {
    const { databaseFile, sessionSecret } = demo()
    chmodSync(`${databaseFile}.secret`, 0o644)
    expect(demo().sessionSecret).toBe(sessionSecret)
    expect(statSync(`${databaseFile}.secret`).mode & 0o777).toBe(0o600)
  })

  it('refuses a proxy in front: whose headers it believed could pass for this machine', () => {
    expect(() => demo({ TRUST_PROXY: '1' })).toThrow('The demo takes no proxy in front')
    expect(production({ TRUST_PROXY: '1' }).trustProxy).toBe(1)
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

  it('takes an IPv6 address in the brackets of a URL', () => {
    expect(demo({ HOST: '[::1]' }).host).toBe('::1')
  })

  it('says so when the folder of the database cannot be written', () => {
    expect(() => demo({ DATABASE_FILE: '/proc/nowhere/demo.sqlite' })).toThrow(
      /^The folder of the database cannot be written \(\/proc\/nowhere\/demo\.sqlite\.secret: \w+\)/,
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
    ['NODE_ENV', 'Production', 'NODE_ENV must be production, development, test or demo, or not be set.'],
    ['NODE_ENV', 'prod', 'NODE_ENV must be production, development, test or demo, or not be set.'],
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
