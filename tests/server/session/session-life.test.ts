import jwt from 'jsonwebtoken'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Agent } from '#tests/support/agent.ts'
import { testPassword } from '#tests/support/factories.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

const minute = 60_000
const hour = 60 * minute

let server: TestServer
beforeAll(async () => {
  server = await startTestServer()
})
afterAll(() => server.close())

const isIn = async (agent: Agent) => (await agent.get('/api/session')).status === 200
const cookieOf = (answer: { get(name: 'Set-Cookie'): string[] | undefined }) =>
  /^sinewright_session=([^;]*)/.exec(answer.get('Set-Cookie')?.[0] ?? '')?.[1]

describe('a session', () => {
  it('ends two hours after the last request', async () => {
    const agent = await server.signInAs('engineer')
    server.clock.advance(2 * hour - minute)
    expect(await isIn(agent)).toBe(true)
    server.clock.advance(2 * hour - minute)
    expect(await isIn(agent)).toBe(true)
    server.clock.advance(2 * hour)
    expect(await isIn(agent)).toBe(false)
  })

  it('ends twelve hours after signing in, however busy', async () => {
    const agent = await server.signInAs('engineer')
    for (let past = 0; past < 11; past++) {
      server.clock.advance(hour)
      expect(await isIn(agent)).toBe(true)
    }
    server.clock.advance(hour)
    expect(await isIn(agent)).toBe(false)
  })

  it('renews its token after a quarter of an hour, and not before', async () => {
    const agent = await server.signInAs('engineer')
    server.clock.advance(15 * minute - 1000)
    expect(cookieOf(await agent.get('/api/session'))).toBeUndefined()
    server.clock.advance(1000)
    const renewed = await agent.get('/api/session')
    const claims = jwt.decode(cookieOf(renewed)!) as { exp: number }
    expect(renewed.status).toBe(200)
    expect(claims.exp * 1000).toBe(server.clock().getTime() + 15 * minute)
    expect(renewed.body).toEqual(agent.session)
    expect(cookieOf(await agent.get('/api/session'))).toBeUndefined()
  })

  it('ends when its person is made inactive', async () => {
    const agent = await server.signInAs('admin')
    await server.context.database.write((transaction) =>
      agent.person!.update({ active: false }, { transaction }),
    )
    expect(await isIn(agent)).toBe(false)
  })

  it('follows a change of role at once', async () => {
    const agent = await server.signInAs('engineer')
    await server.context.database.write((transaction) =>
      agent.person!.update({ role: 'technician' }, { transaction }),
    )
    expect((await agent.post('/api/projects', { name: 'No longer' })).status).toBe(403)
  })
})

describe('DELETE /api/session', () => {
  it('ends this session, clears the cookie and leaves the other sessions of the person', async () => {
    const agent = await server.signInAs('engineer')
    const second = server.agent()
    await second.signIn(agent.person!)
    const answer = await agent.delete('/api/session')
    expect(answer.status).toBe(204)
    expect(cookieOf(answer)).toBe('')
    expect(await isIn(agent)).toBe(false)
    expect(await isIn(second)).toBe(true)
  })

  it('refuses the cookie of before when it is sent again', async () => {
    const person = await server.createPerson('engineer')
    const signedIn = await server
      .agent()
      .post('/api/session', { email: person.email, password: testPassword })
    const cookie = `sinewright_session=${cookieOf(signedIn)}`
    const copy = server.agent()
    const { csrfToken } = signedIn.body as { csrfToken: string }
    expect((await copy.get('/api/session').set('Cookie', cookie)).status).toBe(200)
    await copy.delete('/api/session').set('Cookie', cookie).set('X-CSRF-Token', csrfToken).expect(204)
    expect((await server.agent().get('/api/session').set('Cookie', cookie)).status).toBe(401)
  })
})

describe('DELETE /api/sessions', () => {
  it('ends every session of the person and of nobody else', async () => {
    const first = await server.signInAs('engineer')
    const second = server.agent()
    await second.signIn(first.person!)
    const other = await server.signInAs('engineer')
    expect((await first.delete('/api/sessions')).status).toBe(204)
    expect(await Promise.all([first, second, other].map(isIn))).toEqual([false, false, true])
  })
})

describe('a token', () => {
  const base64 = (part: object) => Buffer.from(JSON.stringify(part)).toString('base64url')
  const ask = (token: string) =>
    server.agent().get('/api/session').set('Cookie', `sinewright_session=${token}`)

  async function realToken(): Promise<string> {
    const { email } = await server.createPerson('engineer')
    return cookieOf(await server.agent().post('/api/session', { email, password: testPassword }))!
  }

  it('opens its session as long as nobody touched it', async () => {
    expect((await ask(await realToken())).status).toBe(200)
  })

  it('is refused without a signature (RFC 8725 §3.1: algorithm "none")', async () => {
    const [, payload] = (await realToken()).split('.')
    const answer = await ask(`${base64({ alg: 'none', typ: 'JWT' })}.${payload}.`)
    expect(answer.status).toBe(401)
    expect(answer.body).toMatchObject({ code: 'signed-out' })
  })

  it('is refused when signed with another secret, or with the bare secret', async () => {
    const claims = jwt.decode(await realToken()) as object
    for (const secret of ['x'.repeat(64), server.context.config.sessionSecret])
      expect((await ask(jwt.sign(claims, secret, { algorithm: 'HS256' }))).status).toBe(401)
  })

  it('is refused when its claims were changed', async () => {
    const admin = await server.createPerson('admin')
    const [header, payload, signature] = (await realToken()).split('.')
    const claims = JSON.parse(Buffer.from(payload!, 'base64url').toString()) as object
    const forged = base64({ ...claims, sub: String(admin.id) })
    expect((await ask(`${header}.${forged}.${signature}`)).status).toBe(401)
  })

  it.each(['', 'x', 'a.b.c', '"; DROP TABLE sessions; --', 'é'.repeat(50)])(
    'is refused when it is no token at all: %j',
    async (text) => {
      expect((await ask(encodeURIComponent(text))).status).toBe(401)
    },
  )
})
