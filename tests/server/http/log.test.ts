import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createLog } from '#server/http/request-log.ts'
import { testPassword } from '#tests/support/factories.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
beforeAll(async () => {
  server = await startTestServer({ config: { logLevel: 'trace' } })
})
afterAll(() => server.close())

describe('the log', () => {
  it('has a line for each request: what, how it ended and who asked', async () => {
    const engineer = await server.signInAs('engineer')
    const answer = await engineer.get('/api/designs?search=probe')
    const line = server.logged
      .map((text) => JSON.parse(text) as { reqId: string })
      .find(({ reqId }) => reqId === answer.get('X-Request-Id'))
    expect(line).toMatchObject({
      req: { method: 'GET', url: '/api/designs?search=probe' },
      res: { statusCode: 200 },
      responseTime: expect.any(Number),
      personId: engineer.person!.id,
    })
  })

  it('holds no password, cookie or token, whatever happens', async () => {
    const agent = await server.signInAs('engineer')
    const newPassword = 'never to be logged'
    await agent.put('/api/account/password', { currentPassword: testPassword, newPassword })
    await agent.put('/api/account/password', { currentPassword: 'wrong guess', newPassword })
    await server.agent().post('/api/session', { email: agent.person!.email, password: 'another guess' })
    await agent.post('/api/projects', { name: 'Refused' }).set('X-CSRF-Token', 'forged-token')
    const all = server.logged.join('')
    const secrets = [newPassword, testPassword, 'wrong guess', 'another guess', 'forged-token']
    for (const secret of [...secrets, agent.session!.csrfToken, 'sinewright_session', 'eyJ'])
      expect(all).not.toContain(secret)
  })

  it('strikes out secrets by their name should somebody log them', () => {
    const lines: string[] = []
    const log = createLog({ logLevel: 'info' }, { write: (line) => void lines.push(line) })
    log.info({
      body: { email: 'a@tests.example', password: 'hunter', newPassword: 'hunter' },
      token: 'hunter',
    })
    log.info({ request: { headers: { cookie: 'hunter', authorization: 'hunter' } } })
    expect(lines.join('')).not.toContain('hunter')
    expect(lines[0]).toContain('a@tests.example')
  })
})
