import { render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it, vi } from 'vitest'
import { movedPart, OverviewStrip } from '#client/components/charts/overview-strip.tsx'
import type { View } from '#client/components/charts/chart-types.ts'

const series = {
  key: 'vo',
  label: 'output',
  unit: 'V',
  values: new Float64Array(1_001),
  color: 'petrol',
} as const
const near = (value: number) => expect.closeTo(value, 9) as number

function setUp(view: View) {
  const onViewChange = vi.fn()
  render(<OverviewStrip series={series} sampleInterval={1e-5} view={view} onViewChange={onViewChange} />)
  return onViewChange
}

describe('OverviewStrip', () => {
  it('tells where the visible span begins and ends', () => {
    setUp([2e-3, 5e-3])
    expect(screen.getByRole('slider', { name: 'Visible span' })).toHaveAttribute(
      'aria-valuetext',
      '2\u2009ms to 5\u2009ms',
    )
    expect(screen.getByRole('slider', { name: 'End of the visible span' })).toHaveAttribute(
      'aria-valuenow',
      '0.005',
    )
  })

  it('moves window and edges by arrow keys', async () => {
    const user = userEvent.setup()
    const onViewChange = setUp([2e-3, 5e-3])
    screen.getByRole('slider', { name: 'Visible span' }).focus()
    await user.keyboard('{ArrowRight}')
    expect(onViewChange).toHaveBeenLastCalledWith([near(2.2e-3), near(5.2e-3)])
    await user.tab()
    await user.keyboard('{Shift>}{ArrowLeft}{/Shift}')
    expect(onViewChange).toHaveBeenLastCalledWith([near(1.98e-3), 5e-3])
    await user.tab()
    await user.keyboard('{ArrowRight}')
    expect(onViewChange).toHaveBeenLastCalledWith([2e-3, near(5.2e-3)])
  })
})

describe('movedPart', () => {
  it('keeps the edges apart and within the record', () => {
    expect(movedPart('start', [2, 5], 9, [0, 10], 0.5)).toEqual([4.5, 5])
    expect(movedPart('end', [2, 5], 9, [0, 10], 0.5)).toEqual([2, 10])
    expect(movedPart('window', [2, 5], -9, [0, 10], 0.5)).toEqual([0, 3])
  })
})
