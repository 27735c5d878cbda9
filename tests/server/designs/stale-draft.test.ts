import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startingDraft } from '#shared/starting-draft.ts'
import type { Design, Draft } from '#shared/schemas/design.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
beforeAll(async () => {
  server = await startTestServer()
})
afterAll(() => server.close())

const withFeedback = (feedbackR: number): DraftContent => ({
  ...startingDraft,
  circuit: { ...startingDraft.circuit, gain: { ...startingDraft.circuit.gain, feedbackR } },
})

describe('PUT /api/designs/:id/draft', () => {
  it('raises the version by one and keeps what was sent', async () => {
    const engineer = await server.signInAs('engineer')
    const { id } = await server.createDesign()
    const saved = await engineer.put(`/api/designs/${id}/draft`, { version: 1, content: withFeedback(21e3) })
    expect(saved.status).toBe(200)
    expect(saved.body).toEqual({
      version: 2,
      content: withFeedback(21e3),
      savedBy: { id: engineer.person!.id, name: engineer.person!.name },
      savedAt: server.clock().toISOString(),
    })
    const read = (await engineer.get(`/api/designs/${id}`)).body as Design
    expect(read.draft).toEqual(saved.body)
    expect(read.updatedBy).toEqual((saved.body as Draft).savedBy)
  })

  it('accepts exactly one of two people who save at the same moment, and shows the other the first', async () => {
    const { id } = await server.createDesign()
    const people = await Promise.all([server.signInAs('engineer'), server.signInAs('reviewer')])
    const answers = await Promise.all(
      people.map((person, index) =>
        person.put(`/api/designs/${id}/draft`, { version: 1, content: withFeedback(21e3 + index) }),
      ),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    const winner = answers.find(({ status }) => status === 200)!
    const loser = answers.find(({ status }) => status === 409)!
    expect(loser.type).toBe('application/problem+json')
    expect(loser.body).toMatchObject({ status: 409, code: 'stale-draft', draft: winner.body })
    const { draft } = (await people[0]!.get(`/api/designs/${id}`)).body as Design
    expect(draft).toEqual(winner.body)
  })

  it('refuses a version from the future as it does an old one', async () => {
    const engineer = await server.signInAs('engineer')
    const { id } = await server.createDesign()
    const answer = await engineer.put(`/api/designs/${id}/draft`, { version: 7, content: startingDraft })
    expect(answer.body).toMatchObject({ code: 'stale-draft', draft: { version: 1 } })
  })

  it('refuses to save into an archived design', async () => {
    const engineer = await server.signInAs('engineer')
    const { id } = await server.createDesign({ archived: true })
    const answer = await engineer.put(`/api/designs/${id}/draft`, { version: 1, content: startingDraft })
    expect(answer.status).toBe(409)
    expect(answer.body).toMatchObject({ code: 'archived' })
  })

  it('names the field of a circuit that cannot be, and saves nothing', async () => {
    const engineer = await server.signInAs('engineer')
    const { id } = await server.createDesign()
    const answer = await engineer.put(`/api/designs/${id}/draft`, { version: 1, content: withFeedback(0) })
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({
      code: 'invalid',
      errors: [
        {
          path: ['content', 'circuit', 'gain', 'feedbackR'],
          message: 'Feedback R must be greater than zero.',
        },
      ],
    })
    expect(((await engineer.get(`/api/designs/${id}`)).body as Design).draft.version).toBe(1)
  })
})
