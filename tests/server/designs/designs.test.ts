import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startingDraft } from '#shared/starting-draft.ts'
import type { Design } from '#shared/schemas/design.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'
import type { Agent } from '#tests/support/agent.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
let engineer: Agent
beforeAll(async () => {
  server = await startTestServer()
  engineer = await server.signInAs('engineer')
})
afterAll(() => server.close())

const content: DraftContent = { ...startingDraft, series: 'E96', amplifierClass: null }

describe('POST /api/designs', () => {
  it('begins with the starting circuit when none is sent', async () => {
    const project = await server.createProject('Brackwater')
    const answer = await engineer.post('/api/designs', { projectId: project.id, name: ' Exciter ' })
    const me = { id: engineer.person!.id, name: engineer.person!.name }
    const now = server.clock().toISOString()
    expect(answer.status).toBe(201)
    expect(answer.body).toEqual({
      ...{ id: expect.any(Number), name: 'Exciter', project: { id: project.id, name: 'Brackwater' } },
      ...{ archived: false, runs: 0, createdBy: me, updatedBy: me, updatedAt: now },
      draft: { version: 1, content: startingDraft, savedBy: me, savedAt: now },
    })
  })

  it('begins with what is sent', async () => {
    const { id: projectId } = await server.createProject()
    const answer = await engineer.post('/api/designs', { projectId, name: 'Given', content })
    expect((answer.body as Design).draft.content).toEqual(content)
  })

  it('refuses a project that does not exist, at its field', async () => {
    const answer = await engineer.post('/api/designs', { projectId: 999_999, name: 'Orphan' })
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({
      errors: [{ path: ['projectId'], message: 'This project does not exist.' }],
    })
  })

  it('refuses a circuit that cannot be, at its field', async () => {
    const { id: projectId } = await server.createProject()
    const circuit = { ...content.circuit, supply: { positive: 1, negative: 9 } }
    const answer = await engineer.post('/api/designs', {
      ...{ projectId, name: 'Starved', content: { ...content, circuit } },
    })
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({ errors: [{ path: ['content', 'circuit', 'supply', 'positive'] }] })
  })
})

describe('PATCH /api/designs/:id', () => {
  it('renames and leaves the draft alone', async () => {
    const { id } = await server.createDesign({ content })
    const answer = await engineer.patch(`/api/designs/${id}`, { name: 'Renamed' })
    expect(answer.body).toMatchObject({
      id,
      name: 'Renamed',
      archived: false,
      draft: { version: 1, content },
    })
    expect((await engineer.get(`/api/designs/${id}`)).body).toEqual(answer.body)
  })

  it('archives and restores; both may be asked twice', async () => {
    const { id } = await server.createDesign()
    for (const archived of [true, true, false, false]) {
      const answer = await engineer.patch(`/api/designs/${id}`, { archived })
      expect(answer.status).toBe(200)
      expect(answer.body).toMatchObject({ archived })
    }
  })

  it('refuses to change nothing, or a name that is too long', async () => {
    const { id } = await server.createDesign()
    expect((await engineer.patch(`/api/designs/${id}`, {})).status).toBe(422)
    const answer = await engineer.patch(`/api/designs/${id}`, { name: 'x'.repeat(121) })
    expect(answer.body).toMatchObject({
      errors: [{ path: ['name'], message: 'Name may have at most 120 characters.' }],
    })
  })
})

describe('POST /api/designs/:id/duplicate', () => {
  it('copies the draft into a new design of the same project', async () => {
    const original = await server.createDesign({ name: 'Lamp', content })
    const copy = (await engineer.post(`/api/designs/${original.id}/duplicate`, {})).body as Design
    expect(copy).toMatchObject({
      ...{ name: 'Copy of Lamp', project: { id: original.projectId }, runs: 0, archived: false },
      ...{ createdBy: { id: engineer.person!.id }, draft: { version: 1, content } },
    })
    expect(copy.id).not.toBe(original.id)
    const changed = { version: 1, content: startingDraft }
    await engineer.put(`/api/designs/${copy.id}/draft`, changed).expect(200)
    const untouched = (await engineer.get(`/api/designs/${original.id}`)).body as Design
    expect(untouched.draft).toMatchObject({ version: 1, content })
  })

  it('takes a name, and needs no body at all', async () => {
    const { id } = await server.createDesign()
    const named = await engineer.post(`/api/designs/${id}/duplicate`, { name: 'Second' })
    expect(named.body).toMatchObject({ name: 'Second' })
    expect((await engineer.post(`/api/designs/${id}/duplicate`)).status).toBe(201)
  })

  it('keeps within the length of a name', async () => {
    const { id } = await server.createDesign({ name: 'n'.repeat(120) })
    const { name } = (await engineer.post(`/api/designs/${id}/duplicate`, {})).body as Design
    expect(name).toBe(`Copy of ${'n'.repeat(112)}`)
  })

  it('brings an archived design back into use as a copy', async () => {
    const { id } = await server.createDesign({ archived: true })
    expect((await engineer.post(`/api/designs/${id}/duplicate`, {})).body).toMatchObject({ archived: false })
  })
})
