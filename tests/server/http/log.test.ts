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
      req: { method: 'GET', path: '/api/designs' },
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

  it('holds no query: a form that a browser sends as an address may carry anything', async () => {
    const engineer = await server.signInAs('engineer')
    for (const path of ['/sign-in', '/api/session', '/api/designs', '/api/nothing'])
      await engineer.get(`${path}?password=in-the-address`)
    expect(server.logged.join('')).not.toContain('in-the-address')
  })

  it('holds no value of a statement that the database refused', async () => {
    const agent = await server.signInAs('engineer')
    const { sequelize, models } = server.context.database
    const refuse = "CREATE TRIGGER full BEFORE UPDATE ON people BEGIN SELECT RAISE(ABORT, 'no room'); END"
    await sequelize.query(refuse)
    try {
      const before = server.logged.length
      const body = { currentPassword: testPassword, newPassword: 'never to be stored' }
      const answer = await agent.put('/api/account/password', body)
      expect(answer.status).toBe(500)
      const lines = server.logged.slice(before).join('')
      expect(lines).toContain('"SQLITE_CONSTRAINT"')
      // What every bcrypt hash begins with.
      expect(lines).not.toMatch(/\$2[aby]\$/)
      const { passwordHash } = (await models.Person.findByPk(agent.person!.id))!
      expect(passwordHash).toBe(agent.person!.passwordHash)
    } finally {
      await sequelize.query('DROP TRIGGER full')
    }
  })

  it('tells why an error happened, down to its cause', () => {
    const lines: string[] = []
    const log = createLog({ logLevel: 'info' }, { write: (line) => void lines.push(line) })
    log.error({ err: new Error('the thread failed', { cause: new Error('worker exited with code: 7') }) })
    expect(lines[0]).toMatch(/the thread failed.*worker exited with code: 7/)
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
