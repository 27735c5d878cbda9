import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Project } from '#shared/schemas/design.ts'
import type { Agent } from '#tests/support/agent.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
let engineer: Agent
beforeAll(async () => {
  server = await startTestServer()
  engineer = await server.signInAs('engineer')
})
afterAll(() => server.close())

const nameTaken = {
  status: 409,
  code: 'name-taken',
  errors: [{ path: ['name'], message: 'There is already a project of this name.' }],
}

describe('projects', () => {
  it('are listed by name, each with the number of its designs in use', async () => {
    const project = await server.createProject('beta')
    await server.createProject('Alpha')
    await server.createDesign({ project })
    await server.createDesign({ project })
    await server.createDesign({ project, archived: true })
    const { items } = (await engineer.get('/api/projects')).body as { items: Project[] }
    expect(items.map(({ name, designs }) => [name, designs])).toEqual([
      ['Alpha', 0],
      ['beta', 2],
    ])
  })

  it('are made and renamed', async () => {
    const made = await engineer.post('/api/projects', { name: ' Calibrators ' })
    expect(made.status).toBe(201)
    expect(made.body).toEqual({ id: expect.any(Number), name: 'Calibrators', designs: 0 })
    const { id } = made.body as Project
    await server.createDesign({ project: (await server.context.database.models.Project.findByPk(id))! })
    const renamed = await engineer.patch(`/api/projects/${id}`, { name: 'CALIBRATORS' })
    expect(renamed.status).toBe(200)
    expect(renamed.body).toEqual({ id, name: 'CALIBRATORS', designs: 1 })
  })

  it('have names that differ in more than case', async () => {
    await server.createProject('Cable tracer')
    const { id } = await server.createProject('Another')
    const made = await engineer.post('/api/projects', { name: 'CABLE tracer' })
    const renamed = await engineer.patch(`/api/projects/${id}`, { name: 'cable Tracer' })
    for (const answer of [made, renamed]) {
      expect(answer.status).toBe(409)
      expect(answer.body).toMatchObject(nameTaken)
    }
  })

  it('are made once when two people ask at the same moment', async () => {
    const second = await server.signInAs('engineer')
    const answers = await Promise.all(
      [engineer, second].map((person) => person.post('/api/projects', { name: 'At once' })),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409])
  })
})
