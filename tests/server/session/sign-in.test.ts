import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { testPassword } from '#tests/support/factories.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
let production: TestServer
beforeAll(async () => {
  server = await startTestServer()
  production = await startTestServer({ config: { mode: 'production' } })
})
afterAll(() => Promise.all([server.close(), production.close()]))

const signIn = (to: TestServer, email: string, password: string) =>
  to.agent().post('/api/session', { email, password })

describe('POST /api/session', () => {
  it('answers with the person, a CSRF token and the mode', async () => {
    const { id, name, email } = await server.createPerson('reviewer')
    const answer = await signIn(server, email, testPassword)
    expect(answer.status).toBe(200)
    expect(answer.body).toEqual({
      person: { id, name, email, role: 'reviewer' },
      csrfToken: expect.stringMatching(/^[\w-]{43}$/),
      mode: 'demo',
    })
  })

  it('sets a cookie that scripts and other sites cannot use', async () => {
    const { email } = await server.createPerson('engineer')
    const [cookie] = (await signIn(server, email, testPassword)).get('Set-Cookie') ?? []
    expect(cookie).toMatch(/^sinewright_session=/)
    expect(cookie).toContain('; HttpOnly')
    expect(cookie).toContain('; SameSite=Strict')
    expect(cookie).toContain('; Path=/api')
    expect(cookie).not.toContain('Secure')
  })

  it('sets it for encrypted connections only in production', async () => {
    const { email } = await production.createPerson('engineer')
    const [cookie] = (await signIn(production, email, testPassword)).get('Set-Cookie') ?? []
    expect(cookie).toContain('; Secure')
  })

  it('keeps neither the session id nor the password readable in the database', async () => {
    const { email } = await server.createPerson('engineer')
    const [cookie] = (await signIn(server, email, testPassword)).get('Set-Cookie') ?? []
    const payload = cookie!.split('.')[1]!
    const { sid } = JSON.parse(Buffer.from(payload, 'base64url').toString()) as { sid: string }
    const rows = JSON.stringify([
      await server.context.database.models.Session.findAll(),
      await server.context.database.models.Person.findAll(),
    ])
    expect(Buffer.from(sid, 'base64url')).toHaveLength(32)
    expect(rows).not.toContain(sid)
    expect(rows).not.toContain(testPassword)
  })

  it('takes the e-mail address in any case', async () => {
    const { email } = await server.createPerson('engineer')
    expect((await signIn(server, ` ${email.toUpperCase()} `, testPassword)).status).toBe(200)
  })

  it('answers a wrong password and an unknown address alike', async () => {
    const { email } = await server.createPerson('engineer')
    const wrong = await signIn(server, email, 'not the password')
    const unknown = await signIn(server, 'nobody@tests.example', testPassword)
    expect(wrong.status).toBe(401)
    expect(wrong.body).toMatchObject({ code: 'wrong-credentials' })
    expect(unknown.status).toBe(401)
    expect(unknown.body).toEqual(wrong.body)
    expect(wrong.get('Set-Cookie')).toBeUndefined()
  })

  it('refuses an account that was made inactive', async () => {
    const { email } = await server.createPerson('admin', { active: false })
    expect((await signIn(server, email, testPassword)).body).toMatchObject({ code: 'wrong-credentials' })
  })

  it('knows demo accounts in the demo only', async () => {
    const here = await server.createPerson('engineer', { demo: true })
    const there = await production.createPerson('engineer', { demo: true })
    expect((await signIn(server, here.email, testPassword)).status).toBe(200)
    expect((await signIn(production, there.email, testPassword)).status).toBe(401)
  })

  it('knows demo accounts from this machine only', async () => {
    const proxied = await startTestServer({ config: { trustProxy: 1 } })
    try {
      const { email } = await proxied.createPerson('engineer', { demo: true })
      const from = (address: string) =>
        request(proxied.url)
          .post('/api/session')
          .set('X-Forwarded-For', address)
          .send({ email, password: testPassword })
      expect((await from('192.0.2.7')).status).toBe(401)
      expect((await from('127.0.0.1')).status).toBe(200)
    } finally {
      await proxied.close()
    }
  })

  it('names the fields that are missing', async () => {
    const answer = await server.agent().post('/api/session', { email: 'no address' })
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({
      code: 'invalid',
      errors: [
        { path: ['email'], message: 'This is not an e-mail address, such as name@company.example.' },
        { path: ['password'], message: 'Password is missing.' },
      ],
    })
  })
})
