import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { RecordResult } from '#client/lib/engine-context.ts'
import { createEngineClient } from '#client/workers/engine-client.ts'
import type { Connect, EngineConnection } from '#client/workers/engine-connection.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'
import { startingDraft } from '#shared/starting-draft.ts'
import type { SmallSignal } from '#sim/types.ts'

/** Workers that answer when the test says so. */
function fakeWorkers() {
  const workers: {
    runs: {
      inputs: RunInputs
      progress?: (done: number) => void
      answer: (result: RecordResult) => void
      fail: (error: Error) => void
    }[]
    smallSignals: ((answer: SmallSignal) => void)[]
    terminated: boolean
    die: (reason: string) => void
  }[] = []
  const connect: Connect = (onDeath) => {
    const worker: (typeof workers)[number] = { runs: [], smallSignals: [], terminated: false, die: onDeath }
    workers.push(worker)
    const connection: EngineConnection = {
      smallSignal: () => new Promise((resolve) => worker.smallSignals.push(resolve)),
      run: (inputs, progress) =>
        new Promise((answer, fail) => worker.runs.push({ inputs, progress, answer, fail })),
      terminate: () => void (worker.terminated = true),
    }
    return connection
  }
  /** The worker that has been given the newest record. */
  const busy = () => workers.findLast((worker) => worker.runs.length > 0)!
  return { workers, connect, busy }
}

const { circuit, stimulus, timing } = startingDraft
const inputs = (feedbackR: number): RunInputs => ({
  circuit: { ...circuit, gain: { ...circuit.gain, feedbackR } },
  stimulus,
  timing,
})
const record = (samples: number) => ({ grid: { samples } }) as RecordResult
const abort = { name: 'AbortError' }
const grace = 250

beforeEach(() => void vi.useFakeTimers())
afterEach(() => void vi.useRealTimers())

/** Lets promise reactions run. */
const settle = () => vi.advanceTimersByTimeAsync(0)

describe('the record lane', () => {
  it('answers, and keeps a spare worker warm', async () => {
    const { workers, connect, busy } = fakeWorkers()
    const answer = createEngineClient(connect, grace).run(inputs(20e3))
    busy().runs[0]!.answer(record(11))
    expect(await answer).toEqual(record(11))
    expect(workers).toHaveLength(2)
  })

  it('reports progress, but none that the answer has overtaken', async () => {
    const { connect, busy } = fakeWorkers()
    const shares: number[] = []
    const answer = createEngineClient(connect, grace).run(inputs(1), {
      onProgress: (done) => shares.push(done),
    })
    const [run] = busy().runs
    run!.progress?.(0.5)
    run!.answer(record(11))
    await answer
    run!.progress?.(1)
    expect(shares).toEqual([0.5])
  })

  it('lets a record finish within its grace, then takes the newest request and drops those between', async () => {
    const { connect, busy } = fakeWorkers()
    const engine = createEngineClient(connect, grace)
    const first = engine.run(inputs(1))
    await vi.advanceTimersByTimeAsync(grace / 2)
    const second = engine.run(inputs(2))
    const third = engine.run(inputs(3))
    await expect(second).rejects.toMatchObject(abort)
    busy().runs[0]!.answer(record(1))
    expect(await first).toEqual(record(1))
    await settle()
    expect(busy().terminated).toBe(false)
    expect(busy().runs.map((run) => run.inputs.circuit.gain.feedbackR)).toEqual([1, 3])
    busy().runs[1]!.answer(record(3))
    expect(await third).toEqual(record(3))
  })

  it('cuts a record that outlasts its grace and goes on in the spare', async () => {
    const { workers, connect, busy } = fakeWorkers()
    const engine = createEngineClient(connect, grace)
    const first = engine.run(inputs(1))
    const refused = expect(first).rejects.toMatchObject(abort)
    const slow = busy()
    const second = engine.run(inputs(2))
    await vi.advanceTimersByTimeAsync(grace)
    await refused
    expect(slow.terminated).toBe(true)
    expect(busy()).toBe(workers[1])
    busy().runs[0]!.answer(record(2))
    expect(await second).toEqual(record(2))
  })

  it('cuts a record at once that has had its grace already', async () => {
    const { connect, busy } = fakeWorkers()
    const engine = createEngineClient(connect, grace)
    const refused = expect(engine.run(inputs(1))).rejects.toMatchObject(abort)
    const slow = busy()
    await vi.advanceTimersByTimeAsync(10 * grace)
    expect(slow.terminated).toBe(false)
    void engine.run(inputs(2))
    await vi.advanceTimersByTimeAsync(0)
    await refused
    expect(slow.terminated).toBe(true)
  })

  it('stops when its caller gives up, whether it runs or waits', async () => {
    const { connect, busy } = fakeWorkers()
    const engine = createEngineClient(connect, grace)
    const [running, waiting] = [new AbortController(), new AbortController()]
    const first = expect(engine.run(inputs(1), { signal: running.signal })).rejects.toMatchObject(abort)
    const second = expect(engine.run(inputs(2), { signal: waiting.signal })).rejects.toMatchObject(abort)
    const slow = busy()
    waiting.abort()
    await second
    expect(slow.terminated).toBe(false)
    running.abort()
    await first
    expect(slow.terminated).toBe(true)
    await expect(engine.run(inputs(3), { signal: running.signal })).rejects.toMatchObject(abort)
  })

  it('says what happened when a worker dies, and the next request works again', async () => {
    const { connect, busy } = fakeWorkers()
    const engine = createEngineClient(connect, grace)
    const first = engine.run(inputs(1))
    busy().die('out of memory')
    await expect(first).rejects.toThrow(
      'The computation stopped unexpectedly (out of memory). Your values are kept; the next change starts it again.',
    )
    const dead = busy()
    expect(dead.terminated).toBe(true)
    const second = engine.run(inputs(2))
    expect(busy()).not.toBe(dead)
    busy().runs[0]!.answer(record(2))
    expect(await second).toEqual(record(2))
  })

  it('passes on what the channel refuses as a sentence', async () => {
    const { connect, busy } = fakeWorkers()
    const answer = createEngineClient(connect, grace).run(inputs(1))
    busy().runs[0]!.fail(new Error('could not be cloned'))
    await expect(answer).rejects.toThrow('(could not be cloned)')
  })
})

describe('the quick lane', () => {
  it('answers while a record is under way, and survives its own death', async () => {
    const { workers, connect } = fakeWorkers()
    const engine = createEngineClient(connect, grace)
    void engine.run(inputs(1))
    const quick = () => workers.findLast((worker) => worker.smallSignals.length > 0)!
    const lost = engine.smallSignal(circuit)
    quick().die('it could not be loaded')
    await expect(lost).rejects.toThrow('it could not be loaded')
    const answer = engine.smallSignal(circuit)
    quick().smallSignals[0]!({ gain: 3.05 } as SmallSignal)
    expect(await answer).toEqual({ gain: 3.05 })
  })
})

describe('dispose', () => {
  it('ends every worker and rejects what is under way', async () => {
    const { workers, connect } = fakeWorkers()
    const engine = createEngineClient(connect, grace)
    const all = Promise.allSettled([
      engine.run(inputs(1)),
      engine.run(inputs(2)),
      engine.smallSignal(circuit),
    ])
    engine.dispose()
    const settled = await all
    expect(settled.map((one) => one.status === 'rejected' && (one.reason as Error).name)).toEqual(
      Array(3).fill('AbortError'),
    )
    expect(workers.every((worker) => worker.terminated)).toBe(true)
  })
})
