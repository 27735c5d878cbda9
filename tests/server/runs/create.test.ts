/** Saving a run: the server's own result is stored, and bad input is refused field by field. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Design } from '#server/db/models/design.ts'
import { decodeColumns } from '#shared/record-codec.ts'
import type { Run } from '#shared/schemas/run.ts'
import { engineVersion, simulateRun, type Simulation } from '#sim/index.ts'
import { runBody, shortInputs } from '#tests/server/runs/saving.ts'
import type { Agent } from '#tests/support/agent.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
let engineer: Agent
let design: Design
beforeAll(async () => {
  server = await startTestServer()
  engineer = await server.signInAs('engineer')
  design = await server.createDesign()
})
afterAll(() => server.close())

const savedRuns = () => server.context.database.models.Run.count()

async function columnsOf(run: Run): Promise<Float64Array[]> {
  const { body } = await engineer.get(`/api/runs/${run.id}/record`).responseType('blob')
  return decodeColumns(Uint8Array.from(body as Buffer).buffer, run.record.columns.length)
}

describe('POST /api/runs', () => {
  it('stores what the engine computes in this very process, to the last bit', async () => {
    const answer = await engineer.post('/api/runs', runBody(design, { title: '  Kicked ', note: 'By hand.' }))
    expect(answer.status).toBe(201)
    const run = answer.body as Run
    const expected = simulateRun(shortInputs) as Simulation
    expect(run).toEqual({
      id: run.id,
      title: 'Kicked',
      note: 'By hand.',
      design: { id: design.id, name: design.name },
      project: { id: design.projectId, name: expect.any(String) },
      author: { id: engineer.person!.id, name: engineer.person!.name },
      createdAt: server.clock().toISOString(),
      engineVersion,
      figures: expected.figures,
      inputs: shortInputs,
      record: {
        sampleInterval: 10e-6,
        samples: 401,
        columns: [
          { name: 'output', unit: 'V' },
          { name: 'network node', unit: 'V' },
          { name: 'series capacitor', unit: 'V' },
        ],
      },
      modes: expected.modes,
      unsettled: expected.unsettled,
    })
    expect((await engineer.get(`/api/runs/${run.id}`)).body).toEqual(run)
    expect(await columnsOf(run)).toEqual([expected.vo, expected.v1, expected.v2])
  })

  it('stores 60 ms at 2 µs and gives it back whole', async () => {
    const inputs = { ...shortInputs, timing: { duration: 60e-3, sampleInterval: 2e-6 } }
    const answer = await engineer.post('/api/runs', runBody(design, { inputs }))
    expect(answer.status).toBe(201)
    const run = answer.body as Run
    expect(run.record.samples).toBe(30_001)
    const expected = simulateRun(inputs) as Simulation
    expect(run.figures).toEqual(expected.figures)
    expect(run.figures.frequency).not.toBeNull()
    expect(await columnsOf(run)).toEqual([expected.vo, expected.v1, expected.v2])
  })

  it('keeps the temperature of a filament as a fourth column', async () => {
    const lamp = {
      ...{ kind: 'lamp' as const, coldR: 10e3, coldTemperature: 300, ambientTemperature: 300 },
      ...{ thermalConductance: 1e-4, thermalCapacity: 1e-5 },
    }
    const inputs = { ...shortInputs, circuit: { ...shortInputs.circuit, amplitudeControl: lamp } }
    const run = (await engineer.post('/api/runs', runBody(design, { inputs }))).body as Run
    const { control } = simulateRun(inputs) as Simulation
    expect(run.record.columns[3]).toEqual({ name: control!.name, unit: 'K' })
    expect((await columnsOf(run))[3]).toEqual(control!.values)
  })

  it('saves what two people send at the same moment, each under the own name', async () => {
    const people = await Promise.all([server.signInAs('engineer'), server.signInAs('reviewer')])
    const answers = await Promise.all(people.map((person) => person.post('/api/runs', runBody(design))))
    expect(answers.map(({ status }) => status)).toEqual([201, 201])
    const runs = answers.map(({ body }) => body as Run)
    expect(runs[0]!.id).not.toBe(runs[1]!.id)
    expect(runs.map(({ author }) => author.id)).toEqual(people.map(({ person }) => person!.id))
    expect(runs[0]!.figures).toEqual(runs[1]!.figures)
  })

  it.each([
    ['figures', { figures: { thd: 0 } }],
    ['a record', { record: { samples: 1 } }],
    ['an engine version', { engineVersion: '9.9.9' }],
    ['an author', { author: { id: 1 } }],
  ])('refuses %s that the client sends: only inputs are accepted', async (_what, extra) => {
    const before = await savedRuns()
    const answer = await engineer.post('/api/runs', { ...runBody(design), ...extra })
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({ code: 'invalid' })
    expect(await savedRuns()).toBe(before)
  })

  it('lists every field that cannot be used', async () => {
    const { circuit, stimulus } = shortInputs
    const answer = await engineer.post('/api/runs', {
      ...runBody(design),
      title: ' ',
      inputs: {
        stimulus,
        circuit: {
          ...circuit,
          network: { ...circuit.network, seriesR: 0, shuntC: 1e-18 },
          supply: { positive: 9, negative: 1 },
        },
        timing: { duration: -1, sampleInterval: null },
      },
    })
    expect(answer.status).toBe(422)
    expect(answer.type).toBe('application/problem+json')
    const { errors } = answer.body as { errors: { path: string[]; message: string }[] }
    const sentences = Object.fromEntries(errors.map(({ path, message }) => [path.join('.'), message]))
    expect(sentences).toMatchObject({
      title: 'Title is missing.',
      'inputs.circuit.network.seriesR': 'Series R must be greater than zero.',
      'inputs.circuit.network.shuntC': 'Shunt C must be at least 100\u2009fF.',
      'inputs.timing.duration': 'Duration must be greater than zero.',
    })
  })

  it.each([
    ['a million periods', { duration: 1000, sampleInterval: null }, 'duration', /periods/],
    [
      'more samples than a stored run may have',
      { duration: 60e-3, sampleInterval: 1e-7 },
      'sampleInterval',
      /250001/,
    ],
    [
      'more samples than the engine computes',
      { duration: 60e-3, sampleInterval: 1e-10 },
      'sampleInterval',
      /1,000,001/,
    ],
    ['an interval longer than the record', { duration: 1e-3, sampleInterval: 1e-2 }, 'duration', /shorter/],
  ])('refuses %s at its field', async (_what, timing, field, sentence) => {
    const before = await savedRuns()
    const answer = await engineer.post('/api/runs', runBody(design, { inputs: { ...shortInputs, timing } }))
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({
      code: 'invalid',
      errors: [{ path: ['inputs', 'timing', field], message: expect.stringMatching(sentence) }],
    })
    expect(await savedRuns()).toBe(before)
  })

  it('answers 409 for an archived design', async () => {
    const archived = await server.createDesign({ archived: true })
    const answer = await engineer.post('/api/runs', runBody(archived))
    expect(answer.body).toMatchObject({ status: 409, code: 'archived' })
  })

  it('answers 409 when the design is archived while the run is being computed', async () => {
    const doomed = await server.createDesign()
    const { compute } = server.context
    const run = compute.run
    compute.run = async (inputs, options) => {
      const result = await run(inputs, options)
      await engineer.patch(`/api/designs/${doomed.id}`, { archived: true })
      return result
    }
    const before = await savedRuns()
    const answer = await engineer.post('/api/runs', runBody(doomed))
    compute.run = run
    expect(answer.body).toMatchObject({ status: 409, code: 'archived' })
    expect(await savedRuns()).toBe(before)
  })

  it('answers 404 for a design that does not exist', async () => {
    const answer = await engineer.post('/api/runs', runBody({ id: 999_999 }))
    expect(answer.body).toMatchObject({
      status: 404,
      code: 'not-found',
      title: 'This design does not exist.',
    })
  })

  it('answers 413 to a body far beyond the limit', async () => {
    const answer = await engineer.post('/api/runs', { ...runBody(design), note: 'x'.repeat(300 * 1024) })
    expect(answer.body).toMatchObject({ status: 413, code: 'too-large' })
  })
})
