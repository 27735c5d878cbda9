/** Poles of the linear loop, with the growth rate that they decide. */
import { PlotCard } from '#client/components/charts/plot-card.tsx'
import { PolePlot } from '#client/components/charts/pole-plot.tsx'
import { formatNumber, formatQuantity } from '#shared/units/format.ts'
import type { SmallSignal } from '#sim/types.ts'

const perSecond = (value: number) => formatNumber(value, { digits: 6, signed: true })

export function PolesCard({ smallSignal }: { smallSignal: SmallSignal }) {
  const { poles, growthRate, frequency } = smallSignal
  return (
    <PlotCard
      title="Poles of the linear loop"
      table={() => ({
        columns: ['pole', 'real part, 1/s', 'imaginary part, rad/s'],
        rows: poles.map(({ re, im }, index) => [String(index + 1), perSecond(re), perSecond(im)]),
        note: 'The growth rate is the largest real part.',
      })}
    >
      <p className="px-2 pb-2 text-sm text-soft">
        Growth rate {formatQuantity(growthRate, '1/s', { digits: 4, signed: true })}
        {frequency > 0 && `, turning at ${formatQuantity(frequency, 'Hz', { digits: 5 })}`}
      </p>
      <PolePlot poles={poles} />
    </PlotCard>
  )
}
