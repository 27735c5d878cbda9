/** Frequency, level, distortion and their kin, with their definitions at hand. */
import { Card } from '#client/components/ui/card.tsx'
import { figure, type FigureKey, type Figures } from '#shared/figures.ts'
import { percentParts, quantityParts } from '#shared/units/format.ts'

const main: FigureKey[] = ['frequency', 'level', 'rms', 'mean', 'thd', 'thdAtInput']
const further: FigureKey[] = ['high', 'low', 'peakOutputCurrent']
const shown = [...main, ...further]

function Value({ name, value }: { name: FigureKey; value: number | null }) {
  const { unit, shownAs } = figure(name)
  if (value === null) return <>–</>
  const parts =
    shownAs === 'percent'
      ? percentParts(value)
      : quantityParts(value, unit, { digits: name === 'frequency' ? 6 : 4 })
  return (
    <>
      {parts.number} <span className="text-base font-normal text-soft">{parts.unit}</span>
    </>
  )
}

export function FiguresCard({ figures }: { figures: Figures }) {
  return (
    <Card>
      <h2 className="sr-only">Figures of the settled tone</h2>
      <dl className="grid grid-cols-2 gap-x-6 gap-y-3 px-4 py-3 sm:grid-cols-3">
        {shown.map((key) => (
          <div key={key}>
            <dt className="text-sm text-soft">{figure(key).name}</dt>
            <dd className="text-xl font-medium">
              <Value name={key} value={figures[key]} />
            </dd>
          </div>
        ))}
      </dl>
      <details className="border-t border-line px-4 py-1 text-sm">
        <summary className="min-h-8 cursor-pointer py-1.5 text-petrol">How these figures are defined</summary>
        <dl className="max-w-prose space-y-2 pb-2">
          {shown.map((key) => (
            <div key={key}>
              <dt className="font-medium">{figure(key).name}</dt>
              <dd className="text-soft">{figure(key).definition}</dd>
            </div>
          ))}
        </dl>
      </details>
    </Card>
  )
}
