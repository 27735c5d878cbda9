/** The pool against worker threads that hang, die and break: real threads throughout. */
import { afterEach, describe, expect, it } from 'vitest'
import { BusyError, ComputeError, createCompute, type Compute } from '#server/compute/index.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'
import { startingDraft } from '#shared/starting-draft.ts'
import { behaviours, brokenWorker, oddWorker } from '#tests/server/compute/worker-files.ts'

const asked = (behaviour: keyof typeof behaviours): RunInputs => ({
  circuit: startingDraft.circuit,
  stimulus: startingDraft.stimulus,
  timing: { duration: behaviours[behaviour], sampleInterval: null },
})
const answered = { kind: 'solver', path: [], sentence: 'The odd worker answered.' }

let compute: Compute
afterEach(() => compute.close())

describe('compute.run', () => {
  it('ends a computation whose caller went away, and the thread is free again', async () => {
    compute = createCompute({ threads: 1, worker: oddWorker })
    const caller = new AbortController()
    const hanging = compute.run(asked('hang'), { signal: caller.signal })
    const waiting = compute.run(asked('answer'))
    caller.abort(new Error('the caller went away'))
    await expect(hanging).rejects.toThrow('the caller went away')
    await expect(waiting).resolves.toEqual(answered)
  })

  it('does not begin for a caller who has gone already', async () => {
    compute = createCompute({ threads: 1, worker: oddWorker })
    await expect(compute.run(asked('answer'), { signal: AbortSignal.abort() })).rejects.toThrow(/abort/)
  })

  it('says so when the time limit ends a computation', async () => {
    compute = createCompute({ threads: 1, timeLimit: 500, worker: oddWorker })
    const result = await compute.run(asked('hang'))
    expect(result).toEqual({
      kind: 'stopped',
      path: [],
      sentence: 'The computation took longer than 0.5 s and was ended. Shorten the duration.',
    })
  })

  it('reports a thread that dies, and recovers', async () => {
    compute = createCompute({ threads: 1, worker: oddWorker })
    await expect(compute.run(asked('die'))).rejects.toThrow(ComputeError)
    await expect(compute.run(asked('answer'))).resolves.toEqual(answered)
  })

  it('keeps the cause when the engine throws', async () => {
    compute = createCompute({ threads: 1, worker: oddWorker })
    const failure: unknown = await compute.run(asked('throw')).catch((error: unknown) => error)
    expect(failure).toBeInstanceOf(ComputeError)
    expect((failure as ComputeError).cause).toMatchObject({ message: 'a defect in the engine' })
    await expect(compute.run(asked('answer'))).resolves.toEqual(answered)
  })

  it('reports a thread that cannot start, every time anew', async () => {
    compute = createCompute({ threads: 1, worker: brokenWorker })
    await expect(compute.run(asked('answer'))).rejects.toThrow(ComputeError)
    await expect(compute.run(asked('answer'))).rejects.toThrow(ComputeError)
  })

  it('refuses at once when every place is taken, and serves again when one is free', async () => {
    compute = createCompute({ threads: 1, maxQueue: 1, worker: oddWorker })
    const caller = new AbortController()
    const hanging = compute.run(asked('hang'), { signal: caller.signal })
    const waiting = compute.run(asked('answer'), { signal: new AbortController().signal })
    await expect(compute.run(asked('answer'))).rejects.toThrow(BusyError)
    caller.abort()
    await expect(hanging).rejects.toThrow(/abort/)
    await expect(waiting).resolves.toEqual(answered)
    await expect(compute.run(asked('answer'))).resolves.toEqual(answered)
  })

  it('does not let a computation that never ends keep the pool from closing', async () => {
    compute = createCompute({ threads: 1, closeTimeout: 300, worker: oddWorker })
    const hanging = compute.run(asked('hang'))
    const [outcome] = await Promise.allSettled([hanging, compute.close()])
    expect(outcome).toMatchObject({ status: 'rejected', reason: expect.any(ComputeError) })
  })

  it('refuses after the pool was closed', async () => {
    compute = createCompute({ threads: 1, worker: oddWorker })
    await compute.run(asked('answer'))
    await compute.close()
    await expect(compute.run(asked('answer'))).rejects.toThrow('The server is stopping.')
  })
})
