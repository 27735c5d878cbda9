import { screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { CompareRunsPage } from '#client/features/runs/compare-runs-page.tsx'
import { encodeColumns } from '#shared/record-codec.ts'
import { json, renderRuns, serve } from '#tests/client/features/runs/support/render-runs.tsx'
import { makeFigures, makeRun } from '#tests/client/features/runs/support/runs.ts'

// The plot needs a canvas, which this environment has not; what it is given is tested with the plots.
vi.mock('#client/components/charts/waveform-canvas.tsx', () => ({ WaveformCanvas: () => null }))

const a = makeRun({ id: 1, title: 'Nominal', figures: makeFigures({ level: 7.5 }) })
const b = makeRun({ id: 2, title: 'Low supply', figures: makeFigures({ level: 6 }) })
b.inputs = { ...b.inputs, circuit: { ...b.inputs.circuit, supply: { positive: 7.5, negative: 9 } } }
const bytes = () => {
  const column = Float64Array.of(0, 1, 2, 3)
  return new Response(encodeColumns([column, column, column]).buffer as ArrayBuffer)
}
const answers = {
  'GET /api/runs/1': json(a),
  'GET /api/runs/2': json(b),
  'GET /api/runs/1/record': bytes,
  'GET /api/runs/2/record': bytes,
}

afterEach(() => vi.unstubAllGlobals())

describe('CompareRunsPage', () => {
  it('sets figures side by side with their difference', async () => {
    serve(answers)
    renderRuns(<CompareRunsPage a={1} b={2} />)
    const table = within(await screen.findByRole('table', { name: 'Figures of both runs' }))
    // By hand: 6 − 7.5 = −1.5 V, a fifth of 7.5 V.
    expect(table.getByRole('row', { name: /^Level 7\.5.V 6.V −1\.5.V −20.%$/ })).toBeVisible()
  })

  it('calls a difference that a replay may show no difference', async () => {
    const frequency = 989.7
    const moved = makeRun({ id: 2, figures: makeFigures({ frequency: frequency * (1 + 1e-9) }) })
    const first = makeRun({ id: 1, figures: makeFigures({ frequency }) })
    serve({ ...answers, 'GET /api/runs/1': json(first), 'GET /api/runs/2': json(moved) })
    renderRuns(<CompareRunsPage a={1} b={2} />)
    const table = within(await screen.findByRole('table', { name: 'Figures of both runs' }))
    expect(table.getByRole('row', { name: /^Frequency 989\.7.Hz 989\.7.Hz ≈ 0 ≈ 0$/ })).toBeVisible()
    expect(table.getByRole('row', { name: /^Level .* 0 0$/ })).toBeVisible()
  })

  it('sets off the inputs that differ, and shows them alone when asked', async () => {
    serve(answers)
    renderRuns(<CompareRunsPage a={1} b={2} />)
    const table = within(await screen.findByRole('table', { name: 'Inputs of both runs' }))
    expect(table.getByRole('row', { name: /^Positive supply ?≠ differs 9.V 7\.5.V$/ })).toBeVisible()
    expect(table.getAllByText('≠ differs')).toHaveLength(1)
    await userEvent.click(screen.getByRole('checkbox', { name: 'Only what differs' }))
    expect(table.queryByRole('row', { name: /Series R/ })).toBeNull()
  })

  it('draws both records in one plot', async () => {
    serve(answers)
    renderRuns(<CompareRunsPage a={1} b={2} />)
    expect(
      await screen.findByRole('application', { name: 'output of both runs from power-on' }),
    ).toBeVisible()
    expect(screen.getByRole('link', { name: 'Swap A and B' })).toHaveAttribute(
      'href',
      '/runs/compare?a=2&b=1',
    )
  })

  it.each([
    [null, 2],
    [1, null],
    [1, 1],
  ])('asks for two different runs when the address names %s and %s', (first, second) => {
    serve({})
    renderRuns(<CompareRunsPage a={first} b={second} />)
    expect(screen.getByText('Two different runs are needed')).toBeVisible()
    expect(screen.getByRole('link', { name: 'Pick two runs' })).toHaveAttribute('href', '/runs')
  })

  it('says when one of them is gone', async () => {
    const gone = json(
      { type: 'about:blank', title: 'There is no such run.', status: 404, code: 'not-found' },
      404,
    )
    serve({ ...answers, 'GET /api/runs/2': gone })
    renderRuns(<CompareRunsPage a={1} b={2} />)
    expect(await screen.findByRole('alert')).toHaveTextContent('There is no such run.')
  })
})
