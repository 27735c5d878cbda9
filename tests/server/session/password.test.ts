import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createPasswordCheck, hashPassword } from '#server/identity/passwords.ts'
import { testPassword } from '#tests/support/factories.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
beforeAll(async () => {
  server = await startTestServer()
})
afterAll(() => server.close())

const newPassword = 'fresh and long enough'

describe('PUT /api/account/password', () => {
  it('changes the password, keeps this session and ends the others', async () => {
    const agent = await server.signInAs('technician')
    const elsewhere = server.agent()
    await elsewhere.signIn(agent.person!)
    const body = { currentPassword: testPassword, newPassword }
    expect((await agent.put('/api/account/password', body)).status).toBe(204)
    expect((await agent.get('/api/session')).body).toEqual(agent.session)
    expect((await elsewhere.get('/api/session')).status).toBe(401)
    await expect(server.agent().signIn(agent.person!)).rejects.toThrow('401')
    await server.agent().signIn(agent.person!, newPassword)
  })

  it('answers a wrong current password at its field and changes nothing', async () => {
    const agent = await server.signInAs('engineer')
    const answer = await agent.put('/api/account/password', { currentPassword: 'guess', newPassword })
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({
      code: 'invalid',
      errors: [{ path: ['currentPassword'], message: 'This is not your current password.' }],
    })
    await server.agent().signIn(agent.person!)
  })

  it('makes guessing the current password slow', async () => {
    const agent = await server.signInAs('engineer')
    const guess = () => agent.put('/api/account/password', { currentPassword: 'guess', newPassword })
    for (let attempt = 0; attempt < 3; attempt++) expect((await guess()).status).toBe(422)
    const answer = await guess()
    expect(answer.status).toBe(429)
    expect(answer.get('Retry-After')).toBe('1')
  })

  it.each([
    ['too short', 'short', 'A password needs at least 10 characters.'],
    ['longer than bcrypt reads', 'é'.repeat(37), 'A password may take at most 72 bytes.'],
    ['the old one', testPassword, 'The new password must differ from the current one.'],
  ])('refuses a new password that is %s', async (_why, refused, message) => {
    const agent = await server.signInAs('engineer')
    const body = { currentPassword: testPassword, newPassword: refused }
    const answer = await agent.put('/api/account/password', body)
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({ errors: [{ path: ['newPassword'], message }] })
  })
})

describe('the password check', () => {
  it('never accepts anything for an account that does not exist', async () => {
    const isRight = createPasswordCheck(4)
    expect(await isRight('no account has this hash', null)).toBe(false)
  })

  it('accepts a password of 72 bytes and refuses the same with one more', async () => {
    const isRight = createPasswordCheck(4)
    const longest = 'p'.repeat(72)
    const hash = await hashPassword(longest, 4)
    expect(await isRight(longest, hash)).toBe(true)
    expect(await isRight(`${longest}p`, hash)).toBe(false)
  })
})
