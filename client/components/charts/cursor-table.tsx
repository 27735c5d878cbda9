/** The cursors' read-outs: time and every series at either cursor, and their differences. */
import type { Cursors, WaveformSeries } from '#client/components/charts/chart-types.ts'
import { cursorReadings } from '#client/components/charts/cursor-readings.ts'
import { formatQuantity } from '#shared/units/format.ts'

export interface CursorTableProps {
  series: readonly WaveformSeries[]
  /** Grid of the record, s. */
  sampleInterval: number
  cursors: Cursors
}

const digits = 5
const nothing = '–'

function quantity(value: number | null, unit: string, signed = false): string {
  return value === null ? nothing : formatQuantity(value, unit, { digits, signed })
}

export function CursorTable({ series, sampleInterval, cursors }: CursorTableProps) {
  const readings = cursorReadings(series, sampleInterval, cursors)
  const unplaced = cursors.every((cursor) => cursor === null)
  const cell = 'px-3 py-1.5 text-right'
  return (
    <div className="overflow-x-auto" data-print={unplaced ? 'hidden' : undefined}>
      <table className="w-full border-collapse text-sm">
        <caption className="sr-only">Cursor read-outs</caption>
        <thead className="text-soft">
          <tr>
            <th scope="col" className="px-3 py-1.5 text-left font-normal">
              <span className="sr-only">Quantity</span>
            </th>
            <th scope="col" className={`${cell} font-medium text-plum`}>
              Cursor 1
            </th>
            <th scope="col" className={`${cell} font-medium text-moss`}>
              Cursor 2
            </th>
            <th scope="col" className={`${cell} font-medium`}>
              Difference
            </th>
          </tr>
        </thead>
        <tbody>
          <tr className="border-t border-hair">
            <th scope="row" className="px-3 py-1.5 text-left font-normal text-soft">
              time
            </th>
            <td className={cell}>{quantity(cursors[0], 's')}</td>
            <td className={cell}>{quantity(cursors[1], 's')}</td>
            <td className={cell}>
              {quantity(readings.interval, 's', true)}
              {readings.frequency !== null && (
                <span className="ml-2 whitespace-nowrap text-soft">
                  <abbr title="one over the difference in time" className="no-underline">
                    1/Δt
                  </abbr>{' '}
                  {quantity(readings.frequency, 'Hz')}
                </span>
              )}
            </td>
          </tr>
          {readings.series.map((one) => (
            <tr key={one.key} className="border-t border-hair">
              <th scope="row" className="px-3 py-1.5 text-left font-normal text-soft">
                {one.label}
              </th>
              <td className={cell}>{quantity(one.first, one.unit)}</td>
              <td className={cell}>{quantity(one.second, one.unit)}</td>
              <td className={cell}>{quantity(one.difference, one.unit, true)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}
