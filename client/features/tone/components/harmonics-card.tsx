/** The spectrum of the settled tone: stems, and every harmonic in figures. */
import { useMemo, useState } from 'react'
import { SpectrumChart } from '#client/components/charts/spectrum-chart.tsx'
import type { LevelScale } from '#client/components/charts/spectrum-levels.ts'
import { Card } from '#client/components/ui/card.tsx'
import { Choice } from '#client/components/ui/choice.tsx'
import { HarmonicTable } from '#client/features/tone/components/harmonic-table.tsx'
import { harmonicRows } from '#client/components/charts/harmonic-rows.ts'
import { figure } from '#shared/figures.ts'
import type { SettledTone } from '#sim/types.ts'

type Node = 'output' | 'network'

export function HarmonicsCard({ tone }: { tone: SettledTone }) {
  const [node, setNode] = useState<Node>('output')
  const [scale, setScale] = useState<LevelScale>('decibel')
  const rows = useMemo(
    () => harmonicRows(node === 'output' ? tone.harmonics : tone.harmonicsAtInput, tone.frequency),
    [tone, node],
  )
  const place = node === 'output' ? 'the output' : 'the network node'
  return (
    <Card>
      <div className="flex flex-wrap items-center gap-x-5 gap-y-1 px-4 pt-3 pb-1">
        <h2 className="text-base font-medium">Harmonics at {place}</h2>
        <div className="ml-auto flex flex-wrap gap-x-5">
          <Choice
            legend="Node"
            legendHidden
            value={node}
            onChange={setNode}
            options={[
              { value: 'output', label: 'Output' },
              { value: 'network', label: 'Network node' },
            ]}
          />
          <Choice
            legend="Levels"
            legendHidden
            value={scale}
            onChange={setScale}
            options={[
              { value: 'decibel', label: 'dB' },
              { value: 'percent', label: '%' },
            ]}
          />
        </div>
      </div>
      <div className="px-2">
        <SpectrumChart
          stems={rows}
          fundamental={tone.frequency}
          scale={scale}
          label={`Harmonics 1 to ${rows.length} of ${place} relative to the fundamental; the table below has the same data.`}
        />
      </div>
      <p className="max-w-prose px-4 pb-3 text-sm text-soft">
        {figure(node === 'output' ? 'thd' : 'thdAtInput').definition}
      </p>
      <HarmonicTable rows={rows} caption={`Harmonics of ${place}`} />
    </Card>
  )
}
