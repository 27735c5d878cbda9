/** Who may do what with runs: every route for every role, signed out, and without the CSRF token. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Design } from '#server/db/models/design.ts'
import type { Person } from '#server/db/models/person.ts'
import { roles, type Role } from '#shared/roles.ts'
import type { Method } from '#tests/support/agent.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'
import { runBody, storeRun } from '#tests/server/runs/saving.ts'

let server: TestServer
let design: Design
let author: Person
beforeAll(async () => {
  server = await startTestServer()
  author = await server.createPerson('engineer')
  design = await server.createDesign({ author })
})
afterAll(() => server.close())

interface Route {
  method: Method
  path: (id: number) => string
  body?: () => object
  /** The status that each role gets, of a run that somebody else saved. */
  answers: Record<Role, number>
}

const everybody = (status: number) => ({
  ...{ technician: status, engineer: status },
  ...{ reviewer: status, admin: status },
})

const routes: Route[] = [
  { method: 'get', path: () => '/api/runs', answers: everybody(200) },
  {
    method: 'post',
    path: () => '/api/runs',
    body: () => runBody(design),
    answers: { technician: 403, engineer: 201, reviewer: 201, admin: 201 },
  },
  { method: 'get', path: (id) => `/api/runs/${id}`, answers: everybody(200) },
  { method: 'get', path: (id) => `/api/runs/${id}/record`, answers: everybody(200) },
  { method: 'get', path: (id) => `/api/runs/${id}/export.csv`, answers: everybody(200) },
  {
    method: 'delete',
    path: (id) => `/api/runs/${id}`,
    answers: { technician: 403, engineer: 403, reviewer: 403, admin: 204 },
  },
]

describe.each(routes)('$method $path', ({ method, path, body, answers }) => {
  it.each(roles)('answers a %s by the policy', async (role) => {
    const agent = await server.signInAs(role)
    const id = await storeRun(server, design, author)
    const answer = await agent.send(method, path(id), body?.())
    expect(answer.status).toBe(answers[role])
    if (answer.status === 403) {
      expect(answer.type).toBe('application/problem+json')
      expect(answer.body).toMatchObject({ status: 403, code: 'forbidden' })
    }
  })

  it('answers 401 to whoever is not signed in', async () => {
    const id = await storeRun(server, design, author)
    const answer = await server.agent().send(method, path(id), body?.())
    expect(answer.status).toBe(401)
    expect(answer.body).toMatchObject({ code: 'signed-out' })
  })
})

describe('POST /api/runs', () => {
  it('is refused without the CSRF token, and nothing is saved', async () => {
    const engineer = await server.signInAs('engineer')
    const before = await server.context.database.models.Run.count()
    const answer = await engineer.post('/api/runs', runBody(design)).set('X-CSRF-Token', 'guess')
    expect(answer.body).toMatchObject({ status: 403, code: 'csrf' })
    expect(await server.context.database.models.Run.count()).toBe(before)
  })
})

describe('DELETE /api/runs/:id', () => {
  it.each(['engineer', 'reviewer', 'admin'] as const)('lets its author, a %s, delete it', async (role) => {
    const agent = await server.signInAs(role)
    const id = await storeRun(server, design, agent.person!)
    expect((await agent.delete(`/api/runs/${id}`)).status).toBe(204)
    expect((await agent.get(`/api/runs/${id}`)).status).toBe(404)
    expect((await agent.get(`/api/runs/${id}/record`)).status).toBe(404)
    expect(await server.context.database.models.RunRecord.findByPk(id)).toBeNull()
  })

  it('leaves a run in place that was not ours to delete', async () => {
    const engineer = await server.signInAs('engineer')
    const id = await storeRun(server, design, author)
    const answer = await engineer.delete(`/api/runs/${id}`)
    expect(answer.body).toMatchObject({
      code: 'forbidden',
      title: 'Only its author or an administrator may delete a run.',
    })
    expect((await engineer.get(`/api/runs/${id}`)).status).toBe(200)
  })

  it('refuses an author who has become a technician', async () => {
    const former = await server.signInAs('engineer')
    const id = await storeRun(server, design, former.person!)
    const { database } = server.context
    await database.write((transaction) => former.person!.update({ role: 'technician' }, { transaction }))
    expect((await former.delete(`/api/runs/${id}`)).status).toBe(403)
  })
})

describe('an id that names no run', () => {
  it.each(['0', '-1', '1.5', 'abc', '999999', '1e3', "1'"])('%j answers 404', async (id) => {
    const admin = await server.signInAs('admin')
    for (const path of ['', '/record', '/export.csv']) {
      const answer = await admin.get(`/api/runs/${encodeURIComponent(id)}${path}`)
      expect(answer.body).toMatchObject({ status: 404, code: 'not-found' })
    }
    expect((await admin.delete(`/api/runs/${encodeURIComponent(id)}`)).status).toBe(404)
  })
})
