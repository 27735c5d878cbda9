/** A password that changes while somebody is being let in with the old one. */
import type * as passwords from '#server/identity/passwords.ts'
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest'
import { testPassword } from '#tests/support/factories.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

/** Awaited between the check of a password and what follows from it; a test puts an event there. */
let meanwhile: (() => Promise<unknown>) | null = null
vi.mock('#server/identity/passwords.ts', async (original) => {
  const actual = await original<typeof passwords>()
  const createPasswordCheck: typeof actual.createPasswordCheck = (cost) => {
    const isRight = actual.createPasswordCheck(cost)
    return async (...given) => {
      const answer = await isRight(...given)
      const event = meanwhile
      meanwhile = null
      await event?.()
      return answer
    }
  }
  return { ...actual, createPasswordCheck }
})

let server: TestServer
beforeAll(async () => {
  server = await startTestServer()
})
afterAll(() => server.close())

const newPassword = 'fresh and long enough'
const change = { currentPassword: testPassword, newPassword }

describe('POST /api/session', () => {
  it('opens nothing with a password that was changed while it was checked', async () => {
    const owner = await server.signInAs('engineer')
    const thief = server.agent()
    meanwhile = async () => expect((await owner.put('/api/account/password', change)).status).toBe(204)
    const credentials = { email: owner.person!.email, password: testPassword }
    const answer = await thief.post('/api/session', credentials)
    expect(answer.status).toBe(401)
    expect(answer.body).toMatchObject({ code: 'wrong-credentials' })
    expect((await thief.get('/api/session')).status).toBe(401)
    expect((await owner.get('/api/session')).status).toBe(200)
  })

  it('opens nothing for an account that was closed while its password was checked', async () => {
    const person = await server.createPerson('engineer')
    meanwhile = () =>
      server.context.database.write((transaction) =>
        server.context.database.models.Person.update(
          { active: false },
          { where: { id: person.id }, transaction },
        ),
      )
    const credentials = { email: person.email, password: testPassword }
    expect((await server.agent().post('/api/session', credentials)).status).toBe(401)
  })
})

describe('PUT /api/account/password', () => {
  it('lets one of two changes at the same moment win and tells the other', async () => {
    const owner = await server.signInAs('engineer')
    const second = server.agent()
    await second.signIn(owner.person!)
    meanwhile = async () => expect((await owner.put('/api/account/password', change)).status).toBe(204)
    const answer = await second.put('/api/account/password', { ...change, newPassword: 'another new one' })
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({ errors: [{ path: ['currentPassword'] }] })
    await server.agent().signIn(owner.person!, newPassword)
  })
})
