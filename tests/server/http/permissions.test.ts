/** Every route of the application against every role, and against somebody who is not signed in. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from '#server/app.ts'
import type { Compute } from '#server/compute/index.ts'
import { startingDraft } from '#shared/starting-draft.ts'
import { roleIncludes, roles, type Role } from '#shared/roles.ts'
import type { Agent, Method } from '#tests/support/agent.ts'
import { testPassword } from '#tests/support/factories.ts'
import { allRoutes } from '#tests/support/routes.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

/** Refuses every computation: who may ask is the question here, not what comes out. */
const refusingCompute: Compute = {
  run: async () => ({ kind: 'solver', path: [], sentence: 'Refused in this test.' }),
  close: async () => undefined,
}

let server: TestServer
beforeAll(async () => {
  server = await startTestServer({ context: { compute: refusingCompute } })
})
afterAll(() => server.close())

interface Row {
  /** Method and path as the application states them. */
  route: string
  /** Makes what `:id` names. */
  id?: () => Promise<{ id: number }>
  body?: () => object | Promise<object>
  /** Least role by the contract; `anyone` needs no sign-in. */
  needs: Role | 'anyone'
  /** Status for those who may. */
  status: number
}

const project = () => server.createProject()
const design = () => server.createDesign()
const run = () => server.createRun()
const { circuit, stimulus, timing } = startingDraft
let names = 0
const newName = () => ({ name: `Permission ${++names}` })

const table: Row[] = [
  { route: 'GET /api/health', needs: 'anyone', status: 200 },
  {
    route: 'POST /api/session',
    body: async () => ({ email: (await server.createPerson('technician')).email, password: testPassword }),
    needs: 'anyone',
    status: 200,
  },
  { route: 'GET /api/session', needs: 'technician', status: 200 },
  { route: 'DELETE /api/session', needs: 'technician', status: 204 },
  { route: 'DELETE /api/sessions', needs: 'technician', status: 204 },
  {
    route: 'PUT /api/account/password',
    body: () => ({ currentPassword: testPassword, newPassword: 'another password' }),
    needs: 'technician',
    status: 204,
  },
  { route: 'GET /api/projects', needs: 'technician', status: 200 },
  { route: 'POST /api/projects', body: newName, needs: 'engineer', status: 201 },
  { route: 'PATCH /api/projects/:id', id: project, body: newName, needs: 'engineer', status: 200 },
  { route: 'GET /api/designs', needs: 'technician', status: 200 },
  {
    route: 'POST /api/designs',
    body: async () => ({ ...newName(), projectId: (await project()).id }),
    needs: 'engineer',
    status: 201,
  },
  { route: 'GET /api/designs/:id', id: design, needs: 'technician', status: 200 },
  {
    route: 'PATCH /api/designs/:id',
    id: design,
    body: () => ({ archived: true }),
    needs: 'engineer',
    status: 200,
  },
  {
    route: 'POST /api/designs/:id/duplicate',
    id: design,
    body: () => ({}),
    needs: 'engineer',
    status: 201,
  },
  {
    route: 'PUT /api/designs/:id/draft',
    id: design,
    body: () => ({ version: 1, content: startingDraft }),
    needs: 'engineer',
    status: 200,
  },
  { route: 'GET /api/runs', needs: 'technician', status: 200 },
  {
    route: 'POST /api/runs',
    body: async () => ({
      ...{ designId: (await design()).id, title: 'Run', inputs: { circuit, stimulus, timing } },
    }),
    needs: 'engineer',
    status: 422,
  },
  { route: 'GET /api/runs/:id', id: run, needs: 'technician', status: 200 },
  { route: 'GET /api/runs/:id/record', id: run, needs: 'technician', status: 200 },
  { route: 'GET /api/runs/:id/export.csv', id: run, needs: 'technician', status: 200 },
  // Somebody else's run: only an administrator. The author's own case is tested with the runs.
  { route: 'DELETE /api/runs/:id', id: run, needs: 'admin', status: 204 },
]

async function ask(agent: Agent, { route, id, body }: Row) {
  const [method, path] = route.split(' ') as [string, string]
  const named = id ? path.replace(':id', String((await id()).id)) : path
  return agent.send(method.toLowerCase() as Method, named, await body?.())
}

describe.each(table)('$route', (row) => {
  const { needs, status } = row

  it.each(roles)(`answers a %s as the contract says (${needs} and up: ${status})`, async (role) => {
    const answer = await ask(await server.signInAs(role), row)
    if (needs === 'anyone' || roleIncludes(role, needs)) {
      expect(answer.status).toBe(status)
    } else {
      expect(answer.status).toBe(403)
      expect(answer.body).toMatchObject({ status: 403, code: 'forbidden' })
    }
  })

  it(`answers somebody signed out with ${needs === 'anyone' ? status : 401}`, async () => {
    const answer = await ask(server.agent(), row)
    expect(answer.status).toBe(needs === 'anyone' ? status : 401)
    if (needs !== 'anyone') expect(answer.body).toMatchObject({ status: 401, code: 'signed-out' })
  })
})

describe('the table above', () => {
  it('has a row for every route of the application, and no other', () => {
    const routes = allRoutes(createApp(server.context))
    expect(table.map(({ route }) => route).sort()).toEqual(routes.sort())
  })
})
