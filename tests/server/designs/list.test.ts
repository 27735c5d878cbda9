import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startingDraft } from '#shared/starting-draft.ts'
import type { DesignSummary } from '#shared/schemas/design.ts'
import type { Page } from '#shared/schemas/paging.ts'
import type { Agent } from '#tests/support/agent.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
let technician: Agent
let ids: { probe: number; salinity: number }
beforeAll(async () => {
  server = await startTestServer()
  technician = await server.signInAs('technician')
  const [probe, salinity] = await Promise.all([
    server.createProject('Probe 100% wet'),
    server.createProject('Salinity_cell'),
  ])
  ids = { probe: probe.id, salinity: salinity.id }
  for (const [name, project] of [
    ['beta tone', probe],
    ['Alpha tone', salinity],
    ['Gamma exciter', probe],
    ['Élan', salinity],
  ] as const) {
    server.clock.advance(60_000)
    await server.createDesign({ name, project })
  }
  await server.createDesign({ name: 'Old tone', project: probe, archived: true })
})
afterAll(() => server.close())

async function list(query: Record<string, string | number> = {}): Promise<Page<DesignSummary>> {
  const answer = await technician.get('/api/designs').query(query)
  expect(answer.status).toBe(200)
  return answer.body as Page<DesignSummary>
}
const names = async (query: Record<string, string | number> = {}) =>
  (await list(query)).items.map(({ name }) => name)

describe('GET /api/designs', () => {
  it('lists what is in use, saved last first', async () => {
    expect(await names()).toEqual(['Élan', 'Gamma exciter', 'Alpha tone', 'beta tone'])
  })

  it('tells of each its project, people, date and number of runs, without the content of the draft', async () => {
    const author = await server.createPerson('engineer', { name: 'Ada Author' })
    const project = await server.createProject('With runs')
    const design = await server.createDesign({ name: 'Summary', author, project })
    await server.createRun({ design })
    await server.createRun({ design })
    const { items } = await list({ projectId: project.id })
    expect(items).toEqual([
      {
        id: design.id,
        name: 'Summary',
        project: { id: project.id, name: 'With runs' },
        archived: false,
        runs: 2,
        createdBy: { id: author.id, name: 'Ada Author' },
        updatedBy: { id: author.id, name: 'Ada Author' },
        updatedAt: design.createdAt.toISOString(),
      },
    ])
    await technician.get(`/api/designs/${design.id}`).expect(200)
    const archive = await server.signInAs('engineer')
    await archive.patch(`/api/designs/${design.id}`, { archived: true }).expect(200)
  })

  it('sorts by name without regard to case, by project and by date, both ways', async () => {
    expect(await names({ sort: 'name', order: 'asc' })).toEqual([
      ...['Alpha tone', 'beta tone', 'Gamma exciter', 'Élan'],
    ])
    expect(await names({ sort: 'name', order: 'desc' })).toEqual([
      ...['Élan', 'Gamma exciter', 'beta tone', 'Alpha tone'],
    ])
    expect(await names({ sort: 'project', order: 'asc' })).toEqual([
      ...['beta tone', 'Gamma exciter', 'Alpha tone', 'Élan'],
    ])
    expect(await names({ sort: 'updatedAt', order: 'asc' })).toEqual([
      ...['beta tone', 'Alpha tone', 'Gamma exciter', 'Élan'],
    ])
  })

  it('moves a design to the front when its draft is saved', async () => {
    const engineer = await server.signInAs('engineer')
    const { items } = await list({ search: 'beta tone' })
    server.clock.advance(60_000)
    await engineer
      .put(`/api/designs/${items[0]!.id}/draft`, { version: 1, content: startingDraft })
      .expect(200)
    const [first] = (await list()).items
    expect(first).toMatchObject({
      name: 'beta tone',
      updatedBy: { id: engineer.person!.id },
      updatedAt: server.clock().toISOString(),
    })
  })

  it('searches the names of designs and projects', async () => {
    const sort = { sort: 'name', order: 'asc' }
    expect(await names({ search: 'TONE', ...sort })).toEqual(['Alpha tone', 'beta tone'])
    expect(await names({ search: 'salinity', ...sort })).toEqual(['Alpha tone', 'Élan'])
    expect(await names({ search: 'Élan' })).toEqual(['Élan'])
    expect(await names({ search: 'nothing like it' })).toEqual([])
  })

  it('takes wildcards of SQL for the characters that they are', async () => {
    const sort = { sort: 'name', order: 'asc' }
    expect(await names({ search: '%', ...sort })).toEqual(['beta tone', 'Gamma exciter'])
    expect(await names({ search: '_', ...sort })).toEqual(['Alpha tone', 'Élan'])
    expect(await names({ search: 'a%t' })).toEqual([])
  })

  it('lists one project, or the archived ones', async () => {
    expect(await names({ projectId: ids.salinity, sort: 'name' })).toEqual(['Élan', 'Alpha tone'])
    expect(await names({ archived: 'true', projectId: ids.probe })).toEqual(['Old tone'])
  })

  it('gives one page at a time and says how many there are', async () => {
    const query = { sort: 'name', order: 'asc', pageSize: 3 }
    const first = await list({ ...query, page: 1 })
    const second = await list({ ...query, page: 2 })
    const beyond = await list({ ...query, page: 9 })
    expect(first).toMatchObject({ total: 4, page: 1, pageSize: 3 })
    expect([...first.items, ...second.items].map(({ name }) => name)).toEqual([
      ...['Alpha tone', 'beta tone', 'Gamma exciter', 'Élan'],
    ])
    expect(beyond).toEqual({ items: [], total: 4, page: 9, pageSize: 3 })
  })
})
