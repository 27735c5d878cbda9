import { render, screen } from '@testing-library/react'
import { describe, expect, it } from 'vitest'
import { CircuitDrawing, limitWords } from '#client/components/circuit/circuit-drawing.tsx'
import { DrawnValue } from '#client/components/circuit/drawn-value.tsx'
import { axeViolations } from '#tests/support/axe.ts'

const values = {
  seriesR: <DrawnValue label="series R" value="10 kΩ" />,
  groundR: <DrawnValue label="ground R" value="10 kΩ" />,
}

describe('CircuitDrawing', () => {
  it('describes itself with its amplitude control and load', () => {
    const { rerender } = render(<CircuitDrawing values={values} control="none" />)
    expect(screen.getByRole('img')).toHaveAccessibleName(/Bridge oscillator.*feedback R and ground R/)
    rerender(<CircuitDrawing values={values} control="lamp" loaded />)
    expect(screen.getByRole('img')).toHaveAccessibleName(
      /filament lamp in the place of ground R.*A load hangs/,
    )
    rerender(<CircuitDrawing values={values} control="diodes" />)
    expect(screen.getByRole('img')).toHaveAccessibleName(/two antiparallel diodes/)
  })

  it('shows the values that it is given beside the parts', async () => {
    const { container } = render(<CircuitDrawing values={values} control="none" />)
    expect(screen.getByText('series R')).toBeVisible()
    expect(screen.getAllByText('10 kΩ')).toHaveLength(2)
    expect(await axeViolations(container)).toEqual([])
  })

  it.each(Object.entries(limitWords))('marks %s in copper with the words “%s”', (limit, words) => {
    const { container } = render(
      <CircuitDrawing values={values} control="none" limit={limit as keyof typeof limitWords} />,
    )
    expect(screen.getByText(words)).toHaveClass('fill-copper')
    expect(container.querySelector('[data-limit]')).toHaveClass('stroke-copper')
  })

  it('marks nothing while the loop governs', () => {
    const { container } = render(<CircuitDrawing values={values} control="none" limit="linear" />)
    expect(container.querySelector('[data-limit]')).toBeNull()
  })

  it('names the reference of a single supply in place of earth', () => {
    render(<CircuitDrawing values={values} control="none" reference="reference, 4.5 V" />)
    expect(screen.getByText('reference, 4.5 V')).toBeInTheDocument()
  })
})
