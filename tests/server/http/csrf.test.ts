import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { testPassword } from '#tests/support/factories.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
beforeAll(async () => {
  server = await startTestServer()
})
afterAll(() => server.close())

let names = 0
const body = () => ({ name: `Forged ${++names}` })
const refused = { status: 403, code: 'csrf' }

describe('a request that changes something', () => {
  it('is refused without the token', async () => {
    const agent = await server.signInAs('engineer')
    const answer = await agent.post('/api/projects', body()).unset('X-CSRF-Token')
    expect(answer.status).toBe(403)
    expect(answer.body).toMatchObject(refused)
  })

  it.each(['', 'x', 'é', 'A'.repeat(43)])('is refused with the wrong token %j', async (token) => {
    const agent = await server.signInAs('engineer')
    const answer = await agent.post('/api/projects', body()).set('X-CSRF-Token', encodeURIComponent(token))
    expect(answer.body).toMatchObject(refused)
  })

  it("is refused with another session's token, even of the same person", async () => {
    const agent = await server.signInAs('engineer')
    const second = server.agent()
    await second.signIn(agent.person!)
    const answer = await agent.post('/api/projects', body()).set('X-CSRF-Token', second.session!.csrfToken)
    expect(answer.body).toMatchObject(refused)
  })

  it.each(['cross-site', 'same-site'])('is refused when the browser says %s', async (site) => {
    const agent = await server.signInAs('engineer')
    const answer = await agent.post('/api/projects', body()).set('Sec-Fetch-Site', site)
    expect(answer.body).toMatchObject(refused)
  })

  it.each(['https://evil.example', 'null', 'http://127.0.0.1:1'])(
    'is refused with the origin %s',
    async (origin) => {
      const agent = await server.signInAs('engineer')
      const answer = await agent.post('/api/projects', body()).set('Origin', origin)
      expect(answer.body).toMatchObject(refused)
    },
  )

  it('passes from our own page', async () => {
    const agent = await server.signInAs('engineer')
    const fetched = await agent.post('/api/projects', body()).set('Sec-Fetch-Site', 'same-origin')
    const older = await agent.post('/api/projects', body()).set('Origin', server.url)
    expect([fetched.status, older.status]).toEqual([201, 201])
  })

  it('needs no token to read', async () => {
    const agent = await server.signInAs('technician')
    expect((await agent.get('/api/projects').set('Sec-Fetch-Site', 'cross-site')).status).toBe(200)
  })
})

describe('signing in', () => {
  it.each([
    ['Sec-Fetch-Site', 'cross-site'],
    ['Origin', 'https://evil.example'],
  ])('is refused from a foreign page (%s: %s)', async (header, value) => {
    const { email } = await server.createPerson('engineer')
    const answer = await server
      .agent()
      .post('/api/session', { email, password: testPassword })
      .set(header, value)
    expect(answer.body).toMatchObject(refused)
    expect(answer.get('Set-Cookie')).toBeUndefined()
  })
})
