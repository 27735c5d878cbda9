/** Saving when the computing goes wrong: clients that leave, threads that die, a full queue. Real threads throughout. */
import { request } from 'node:http'
import { setTimeout as pause } from 'node:timers/promises'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Design } from '#server/db/models/design.ts'
import { createCompute, type Compute } from '#server/compute/index.ts'
import { behaviours, oddWorker } from '#tests/server/compute/worker-files.ts'
import { engineersHeaders, runBody, shortInputs } from '#tests/server/runs/saving.ts'
import type { Agent } from '#tests/support/agent.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
let engineer: Agent
let headers: Record<string, string>
let design: Design
let underWay = 0
beforeAll(async () => {
  const compute = createCompute({ threads: 1, maxQueue: 0, worker: oddWorker })
  server = await startTestServer({ context: { compute: counted(compute) }, config: { logLevel: 'error' } })
  design = await server.createDesign()
  engineer = await server.signInAs('engineer')
  headers = await engineersHeaders(server)
})
afterAll(() => server.close())

/** Knows how many computations are under way. */
const counted = (compute: Compute): Compute => ({
  close: () => compute.close(),
  async run(inputs, options) {
    underWay += 1
    return compute.run(inputs, options).finally(() => (underWay -= 1))
  },
})

const asking = (behaviour: keyof typeof behaviours) =>
  runBody(design, {
    inputs: { ...shortInputs, timing: { duration: behaviours[behaviour], sampleInterval: null } },
  })

/** Sends a run to save over a connection of its own, so that it can be cut. */
function send(body: object) {
  const sent = request(`${server.url}/api/runs`, {
    method: 'POST',
    headers: { ...headers, 'Content-Type': 'application/json' },
  })
  // Being cut is what these connections are for.
  sent.on('error', () => undefined)
  sent.end(JSON.stringify(body))
  return sent
}

async function until(condition: () => boolean): Promise<void> {
  while (!condition()) await pause(5)
}

const savedRuns = () => server.context.database.models.Run.count()

describe('POST /api/runs', () => {
  it('ends the computation of a client that goes away, saves nothing, and serves the next one', async () => {
    const leaving = send(asking('hang'))
    await until(() => underWay === 1)
    leaving.destroy()
    await until(() => underWay === 0)
    const next = await engineer.post('/api/runs', asking('answer'))
    expect(next.body).toMatchObject({ code: 'not-computed' })
    expect(await savedRuns()).toBe(0)
    expect(server.logged).toEqual([])
  })

  it('answers 503 with Retry-After while every place is taken', async () => {
    const first = send(asking('hang'))
    await until(() => underWay === 1)
    const refused = await engineer.post('/api/runs', asking('answer'))
    expect(refused.status).toBe(503)
    expect(refused.get('Retry-After')).toBe('5')
    expect(refused.body).toMatchObject({
      code: 'busy',
      title: 'Every computing thread is taken. Try again in a moment.',
    })
    first.destroy()
    await until(() => underWay === 0)
  })

  it('answers 422 with the sentence of a solver that fails', async () => {
    const answer = await engineer.post('/api/runs', asking('answer'))
    expect(answer.status).toBe(422)
    expect(answer.body).toEqual({
      type: 'about:blank',
      title: 'The run could not be computed; nothing was saved.',
      status: 422,
      code: 'not-computed',
      detail: 'The odd worker answered.',
    })
  })

  it('answers 500 when the thread dies, logs why, and serves the next one', async () => {
    const answer = await engineer.post('/api/runs', asking('die'))
    expect(answer.status).toBe(500)
    expect(answer.body).toMatchObject({
      code: 'compute-failed',
      title: 'The computing thread failed before it answered. Nothing was saved; try again.',
    })
    expect(server.logged.join()).toContain('worker exited with code: 7')
    expect((await engineer.post('/api/runs', asking('answer'))).body).toMatchObject({ code: 'not-computed' })
    expect(await savedRuns()).toBe(0)
  })
})
