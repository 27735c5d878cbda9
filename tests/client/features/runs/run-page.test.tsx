import { act, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { afterEach, describe, expect, it, vi } from 'vitest'
import type { EngineClient, RecordResult } from '#client/lib/engine-context.ts'
import { runQueries } from '#client/features/runs/queries.ts'
import { RunPage } from '#client/features/runs/run-page.tsx'
import { encodeColumns } from '#shared/record-codec.ts'
import type { Person } from '#shared/schemas/account.ts'
import { roles } from '#shared/roles.ts'
import { json, problem, renderRuns, serve } from '#tests/client/features/runs/support/render-runs.tsx'
import { engineer, makeFigures, makeRun, reviewer } from '#tests/client/features/runs/support/runs.ts'

// The plot needs a canvas, which this environment has not; what it is given is tested with the plots.
vi.mock('#client/components/charts/waveform-canvas.tsx', () => ({ WaveformCanvas: () => null }))

const run = makeRun()
const columns = [Float64Array.of(0, 2, 4, 4), Float64Array.of(0, 1, 2, 1), Float64Array.of(0, 0, 1, 2)]
const record = () => new Response(encodeColumns(columns).buffer as ArrayBuffer)
const stored = () => ({ 'GET /api/runs/7': json(run), 'GET /api/runs/7/record': record })

/** An engine that answers with `vo` as its output and otherwise with what is stored. */
function engineOf(vo: Float64Array, figures = makeFigures()): EngineClient {
  const empty = new Float64Array()
  const result: RecordResult = {
    engineVersion: '1.1.0',
    grid: { duration: 3e-3, sampleInterval: 1e-3, samples: 4 },
    simulation: {
      status: 'complete',
      sampleInterval: 1e-3,
      vo,
      v1: columns[1]!,
      v2: columns[2]!,
      modes: run.modes,
      envelope: { time: empty, value: empty },
      figures,
      tone: null,
      unsettled: null,
      cost: { method: 'odex', steps: 1, evaluations: 1, events: 0 },
    },
  }
  return { smallSignal: () => Promise.reject(new Error('not asked')), run: () => Promise.resolve(result) }
}

afterEach(() => vi.unstubAllGlobals())

describe('RunPage', () => {
  it('shows what is stored: note, author, inputs and every figure', async () => {
    serve(stored())
    renderRuns(<RunPage runId={7} />)
    expect(await screen.findByRole('heading', { level: 1, name: 'First article' })).toBeVisible()
    expect(screen.getByText('Bare loop, nominal parts.')).toBeVisible()
    expect(screen.getByText('Edda Engineer')).toBeVisible()
    const figures = screen.getByRole('table', { name: 'Figures of this run' })
    expect(within(figures).getByRole('row', { name: /^Frequency .* 989.7/ })).toBeVisible()
    expect(within(figures).getByRole('row', { name: /^Mean output .* does not exist/ })).toBeVisible()
    const inputs = screen.getByRole('table', { name: 'Inputs of this run' })
    expect(within(inputs).getByRole('row', { name: /^Feedback R 20.5/ })).toBeVisible()
    expect(screen.getByRole('link', { name: 'Export CSV' })).toHaveAttribute('href', '/api/runs/7/export.csv')
  })

  it.each(roles)('offers deletion to a %s only as the rules say', async (role) => {
    const other: Person = { ...reviewer, role }
    serve(stored())
    renderRuns(<RunPage runId={7} />, { viewer: other })
    await screen.findByRole('heading', { level: 1, name: 'First article' })
    const offered = screen.queryByRole('button', { name: 'Delete' }) !== null
    expect(offered).toBe(role === 'admin')
  })

  it('deletes after a question and goes to the list', async () => {
    const server = serve({ ...stored(), 'DELETE /api/runs/7': new Response(null, { status: 204 }) })
    const { router, queryClient } = renderRuns(<RunPage runId={7} />, { viewer: engineer })
    const list = runQueries.list({ page: 1 }).queryKey
    const designs = ['designs', 'list', {}]
    const kept = makeRun({ id: 8 })
    queryClient.setQueryData(list, { items: [run, kept], page: 1, pageSize: 25, total: 2 })
    queryClient.setQueryData(designs, [])
    await userEvent.click(await screen.findByRole('button', { name: 'Delete' }))
    expect(server).not.toHaveBeenCalledWith('/api/runs/7', expect.objectContaining({ method: 'DELETE' }))
    await userEvent.click(screen.getByRole('button', { name: 'Delete run' }))
    await vi.waitFor(() => expect(router.state.location.pathname).toBe('/runs'))
    // The list shown next no longer has it, and both lists that told of it ask again.
    expect(queryClient.getQueryData(list)).toMatchObject({ items: [kept], total: 1 })
    expect(queryClient.getQueryState(list)?.isInvalidated).toBe(true)
    expect(queryClient.getQueryState(designs)?.isInvalidated).toBe(true)
  })

  it('stays with a reason when deletion is refused', async () => {
    serve({
      ...stored(),
      'DELETE /api/runs/7': problem(403, 'forbidden', { detail: 'Only its author may.' }),
    })
    renderRuns(<RunPage runId={7} />, { viewer: engineer })
    await userEvent.click(await screen.findByRole('button', { name: 'Delete' }))
    await userEvent.click(screen.getByRole('button', { name: 'Delete run' }))
    expect(await screen.findByText('Only its author may.')).toBeVisible()
  })

  it('says that a run is not there', async () => {
    serve({ 'GET /api/runs/7': problem(404, 'not-found', { title: 'There is no such run.' }) })
    renderRuns(<RunPage runId={7} />)
    expect(await screen.findByRole('alert')).toHaveTextContent('There is no such run.')
  })

  it('shows figures and inputs even when the record cannot be had', async () => {
    serve({ 'GET /api/runs/7': json(run) })
    renderRuns(<RunPage runId={7} />)
    expect(await screen.findByRole('table', { name: 'Figures of this run' })).toBeVisible()
    expect(await screen.findByRole('button', { name: 'Try again' })).toBeVisible()
  })
})

describe('replay on the run page', () => {
  const replay = async (engine: EngineClient) => {
    serve(stored())
    renderRuns(<RunPage runId={7} />, { viewer: { ...reviewer, role: 'technician' }, engine })
    await userEvent.click(await screen.findByRole('button', { name: 'Replay' }))
  }

  it('passes the same result, with both engine versions', async () => {
    await replay(engineOf(columns[0]!))
    expect(await screen.findByText('It replays.')).toBeVisible()
    expect(screen.getByText(/Stored by engine 1.0.0, replayed by engine 1.1.0/)).toBeVisible()
    const table = screen.getByRole('table', { name: 'Figures of this run' })
    expect(within(table).getAllByText('✓ passes')).toHaveLength(20)
  })

  it('keeps the outcome when news of progress comes late', async () => {
    const engine = engineOf(columns[0]!)
    let report: ((done: number) => void) | undefined
    await replay({
      ...engine,
      run: (inputs, options) => {
        report = options?.onProgress
        return engine.run(inputs, options)
      },
    })
    await screen.findByText('It replays.')
    act(() => report?.(1))
    expect(screen.getByText('It replays.')).toBeVisible()
  })

  it('fails another one and says where', async () => {
    await replay(engineOf(Float64Array.of(0, 2, 3, 4), makeFigures({ level: 8 })))
    expect(await screen.findByText('It does not replay.')).toBeVisible()
    const waveforms = screen.getByRole('table', { name: 'Largest deviation of each waveform' })
    // By hand: |3 − 4| = 1 V of a 4 V peak at the third sample, 2 ms.
    expect(within(waveforms).getByRole('row', { name: /^output 1.V 2.ms 25.% .* fails/ })).toBeVisible()
    const figures = screen.getByRole('table', { name: 'Figures of this run' })
    expect(within(figures).getByRole('row', { name: /^Level .* 7.5.V 8.V \+500.mV .* fails/ })).toBeVisible()
  })

  it('says what the engine refused', async () => {
    const failure = { kind: 'solver', path: [], sentence: 'The step became too small at 3 ms.' } as const
    await replay({ ...engineOf(columns[0]!), run: () => Promise.resolve({ ...failure, path: [] }) })
    expect(await screen.findByRole('alert')).toHaveTextContent('The step became too small at 3 ms.')
  })

  it('shows progress and stops when cancelled', async () => {
    let signal: AbortSignal | undefined
    await replay({
      ...engineOf(columns[0]!),
      run: (_, options) => {
        signal = options?.signal
        options?.onProgress?.(0.25)
        return new Promise(() => undefined)
      },
    })
    expect(await screen.findByRole('progressbar', { name: 'Replay' })).toHaveAttribute('value', '0.25')
    await userEvent.click(screen.getByRole('button', { name: 'Cancel' }))
    expect(signal?.aborted).toBe(true)
    expect(screen.getByRole('button', { name: 'Replay' })).toBeVisible()
  })
})

describe('playhead on the run page', () => {
  it('steps from change to change, names the limit, and leaves its place in the address', async () => {
    serve(stored())
    const { router } = renderRuns(<RunPage runId={7} />)
    const bar = within(await screen.findByRole('group', { name: 'Playhead' }))
    expect(bar.getByText(/No limit is active/)).toBeVisible()
    await userEvent.click(bar.getByRole('button', { name: /Next change/ }))
    expect(bar.getByText('The output is held at the upper rail.')).toBeVisible()
    expect(bar.getByRole('button', { name: /Next change/ })).toBeDisabled()
    await vi.waitFor(() => expect(router.state.location.search).toBe('?t=0.002'))
    await userEvent.click(bar.getByRole('button', { name: /Previous change/ }))
    expect(bar.getByText(/No limit is active/)).toBeVisible()
  })

  it('stands where the address says, and still', async () => {
    serve(stored())
    renderRuns(<RunPage runId={7} />, { address: '/runs/7?t=0.0025' })
    const bar = within(await screen.findByRole('group', { name: 'Playhead' }))
    expect(bar.getByText(/^2\.5.ms$/)).toBeVisible()
    expect(bar.getByRole('button', { name: 'Play' })).toBeVisible()
  })
})
