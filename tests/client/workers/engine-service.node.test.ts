import { expose, proxy, releaseProxy, wrap, type Remote } from 'comlink'
import nodeEndpoint from 'comlink/dist/umd/node-adapter.js'
import { MessageChannel } from 'node:worker_threads'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { isFailure, type RecordResult } from '#client/lib/engine-context.ts'
import { callsOn, type EngineConnection, type EngineService } from '#client/workers/engine-connection.ts'
import { engineService } from '#client/workers/engine-service.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'
import { startingDraft } from '#shared/starting-draft.ts'
import type { SmallSignal } from '#sim/types.ts'

let channel: MessageChannel
let remote: Remote<EngineService>
let engine: Omit<EngineConnection, 'terminate'>

beforeEach(() => {
  channel = new MessageChannel()
  expose(engineService, nodeEndpoint(channel.port1))
  remote = wrap<EngineService>(nodeEndpoint(channel.port2))
  engine = callsOn(remote)
})
afterEach(() => {
  remote[releaseProxy]()
  channel.port1.close()
  channel.port2.close()
})

const { circuit, stimulus } = startingDraft
const inputs: RunInputs = { circuit, stimulus, timing: { duration: 0.06, sampleInterval: 2e-6 } }

describe('the engine over a message channel', () => {
  it('reports its progress as growing shares', async () => {
    const shares: number[] = []
    await engine.run(
      inputs,
      proxy((done: number) => void shares.push(done)),
    )
    await vi.waitFor(() => expect(shares.at(-1)).toBe(1))
    expect(shares.length).toBeGreaterThan(1)
    expect([...shares].sort((a, b) => a - b)).toEqual(shares)
    expect(shares.every((share) => share >= 0 && share <= 1)).toBe(true)
  })

  it('answers small-signal questions', async () => {
    const answer = (await engine.smallSignal(circuit)) as SmallSignal
    expect(answer.gain).toBe(3.05)
    // Equal arms with a perfect amplifier: critical gain 3 (any textbook).
    expect(answer.idealCriticalGain).toBeCloseTo(3, 12)
    expect(answer.starts).toBe(true)
  })

  it('sends a record of 60 ms at 2 µs whole', async () => {
    const { simulation, grid } = (await engine.run(inputs)) as RecordResult
    expect(grid).toEqual({ duration: 0.06, sampleInterval: 2e-6, samples: 30_001 })
    for (const column of [simulation.vo, simulation.v1, simulation.v2]) {
      expect(column).toBeInstanceOf(Float64Array)
      expect(column).toHaveLength(30_001)
    }
    // Kirchhoff at the rails: the output never passes the supply less the headroom.
    expect(Math.max(...simulation.vo)).toBeLessThanOrEqual(7.5 + 1e-9)
    expect(simulation.figures?.gain).toBe(3.05)
  })

  it('returns what the engine refuses as data with the path of the field', async () => {
    const answer = await engine.run({ ...inputs, timing: { duration: 3000, sampleInterval: null } })
    expect(isFailure(answer) && answer).toMatchObject({ kind: 'invalid', path: ['timing', 'duration'] })
  })

  it('returns a fault of its own as data too', async () => {
    const answer = await engine.smallSignal({} as typeof circuit)
    expect(isFailure(answer) && answer.sentence).toMatch(/^The engine failed on these values: /)
  })
})
