import request from 'supertest'
import type { Person } from '#server/db/models/person.ts'
import { testPassword } from '#tests/support/factories.ts'
import type { Session } from '#shared/schemas/account.ts'

export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete'

/** A client with a cookie jar, and the session's CSRF token with every request once it is signed in. */
export interface Agent {
  get(path: string): request.Test
  post(path: string, body?: object): request.Test
  put(path: string, body?: object): request.Test
  patch(path: string, body?: object): request.Test
  delete(path: string): request.Test
  /** Any method, for tests that go through a table of routes. */
  send(method: Method, path: string, body?: object): request.Test
  /** Null while signed out. */
  session: Session | null
  person: Person | null
  /** Signs in with the password of the factories, or another. */
  signIn(person: Person, password?: string): Promise<void>
}

/** A signed-out client of the server at `url`. */
export function createAgent(url: string): Agent {
  const jar = request.agent(url)
  function send(method: Method, path: string, body?: object): request.Test {
    const test = jar[method](path)
    if (agent.session && method !== 'get') void test.set('X-CSRF-Token', agent.session.csrfToken)
    return body === undefined ? test : test.send(body)
  }
  const agent: Agent = {
    get: (path) => send('get', path),
    post: (path, body) => send('post', path, body),
    put: (path, body) => send('put', path, body),
    patch: (path, body) => send('patch', path, body),
    delete: (path) => send('delete', path),
    send,
    session: null,
    person: null,
    async signIn(person, password = testPassword) {
      const answer = await jar.post('/api/session').send({ email: person.email, password })
      if (answer.status !== 200) throw new Error(`signing in failed: ${answer.status} ${answer.text}`)
      agent.session = answer.body as Session
      agent.person = person
    },
  }
  return agent
}
