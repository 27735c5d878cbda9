import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createSignInDelay } from '#server/identity/sign-in-delay.ts'
import { createTestClock } from '#tests/support/clock.ts'
import { testPassword } from '#tests/support/factories.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

describe('the delay after failed sign-ins', () => {
  const account = ['a@tests.example', '192.0.2.1'] as const

  it('starts after three failures and doubles up to a minute', () => {
    const clock = createTestClock()
    const delay = createSignInDelay(clock)
    const waits = Array.from({ length: 12 }, () => {
      const wait = delay.attempt(...account)
      clock.advance(wait * 1000)
      if (wait > 0) expect(delay.attempt(...account)).toBe(0)
      return wait
    })
    expect(waits).toEqual([0, 0, 0, 1, 2, 4, 8, 16, 32, 60, 60, 60])
  })

  it('is not prolonged by attempts while it lasts', () => {
    const clock = createTestClock()
    const delay = createSignInDelay(clock)
    for (let attempt = 0; attempt < 5; attempt++) {
      clock.advance(delay.attempt(...account) * 1000)
    }
    const wait = delay.attempt(...account)
    for (let attempt = 0; attempt < 50; attempt++) delay.attempt(...account)
    expect(delay.attempt(...account)).toBe(wait)
    clock.advance(wait * 1000)
    expect(delay.attempt(...account)).toBe(0)
  })

  it('counts attempts at the same moment, before any of them has failed', () => {
    const delay = createSignInDelay(createTestClock())
    const waits = Array.from({ length: 100 }, () => delay.attempt(...account))
    expect(waits.filter((wait) => wait === 0)).toHaveLength(3)
  })

  it('holds for one account from one address: a stranger does not lock the owner out', () => {
    const delay = createSignInDelay(createTestClock())
    for (let attempt = 0; attempt < 50; attempt++) delay.attempt(...account)
    expect(delay.attempt(account[0], '192.0.2.2')).toBe(0)
    expect(delay.attempt('b@tests.example', account[1])).toBe(0)
  })

  it('ends with a right password, and is forgotten after an hour', () => {
    const clock = createTestClock()
    const delay = createSignInDelay(clock)
    const fail = () => {
      for (let attempt = 0; attempt < 3; attempt++) delay.attempt(...account)
    }
    fail()
    delay.succeed(...account)
    expect(delay.attempt(...account)).toBe(0)
    fail()
    expect(delay.attempt(...account)).toBeGreaterThan(0)
    clock.advance(60 * 60_000)
    expect(delay.attempt(...account)).toBe(0)
  })
})

describe('POST /api/session', () => {
  let server: TestServer
  beforeAll(async () => {
    server = await startTestServer({
      config: { rates: { failedSignInsPerQuarterHour: 8, requestsPerMinute: 30 } },
    })
  })
  afterAll(() => server.close())

  it('answers 429 with Retry-After even to the right password while the delay lasts', async () => {
    const { email } = await server.createPerson('engineer')
    const attempt = (password: string) => server.agent().post('/api/session', { email, password })
    for (let failed = 0; failed < 3; failed++) expect((await attempt('wrong')).status).toBe(401)
    const refused = await attempt(testPassword)
    expect(refused.status).toBe(429)
    expect(refused.get('Retry-After')).toBe('1')
    expect(refused.body).toMatchObject({
      code: 'too-many-attempts',
      title: 'Too many attempts. Try again in 1 second.',
    })
    server.clock.advance(1000)
    expect((await attempt(testPassword)).status).toBe(200)
  })

  it('limits the failures of one address over all accounts', async () => {
    const attempt = (number: number) =>
      server.agent().post('/api/session', { email: `nobody-${number}@tests.example`, password: 'wrong' })
    const statuses: number[] = []
    for (let number = 0; number < 6; number++) statuses.push((await attempt(number)).status)
    // Four of the eight went in the test before: three wrong ones and the one that came too early.
    expect(statuses).toEqual([401, 401, 401, 401, 429, 429])
    expect((await attempt(7)).body).toMatchObject({ code: 'too-many-attempts' })
  })

  it('limits the requests of one address altogether', async () => {
    const statuses: number[] = []
    for (let count = 0; count < 31; count++)
      statuses.push((await request(server.url).get('/api/health')).status)
    expect(statuses.at(0)).toBe(200)
    expect(statuses.at(-1)).toBe(429)
  })
})
