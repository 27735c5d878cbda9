/** The two numbers that are so easily taken for one another, each with its own words. */
import type { Circuit } from '#shared/schemas/circuit.ts'
import { formatNumber, formatQuantity } from '#shared/units/format.ts'

export function GainWords({ gain }: Pick<Circuit, 'gain'>) {
  const ratio = gain.feedbackR / gain.groundR
  return (
    <dl className="grid grid-cols-2 gap-x-4 text-sm">
      <div>
        <dt className="text-soft">Closed-loop gain</dt>
        <dd>
          <b className="text-lg font-medium">{formatNumber(1 + ratio)}</b>
          <span className="block text-xs text-soft">= 1 + feedback R ÷ ground R</span>
        </dd>
      </div>
      <div>
        <dt className="text-soft">Resistor ratio</dt>
        <dd>
          <b className="text-lg font-medium">{formatNumber(ratio)} : 1</b>
          <span className="block text-xs text-soft">
            = {formatQuantity(gain.feedbackR, 'Ω')} ÷ {formatQuantity(gain.groundR, 'Ω')}
          </span>
        </dd>
      </div>
    </dl>
  )
}
