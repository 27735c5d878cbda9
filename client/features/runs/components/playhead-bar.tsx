/** Controls of the slow-motion playhead: play, step from change to change, scrub, speed. */
import { Button } from '#client/components/ui/button.tsx'
import { Field } from '#client/components/ui/field.tsx'
import { Select } from '#client/components/ui/select.tsx'
import type { Playhead } from '#client/features/runs/hooks/use-playhead.ts'
import { limitSentences } from '#client/features/runs/lib/limit-sentences.ts'
import type { RunModeSpan } from '#shared/schemas/run.ts'
import { formatCount, formatQuantity } from '#shared/units/format.ts'

/** How much slower than life, in words. */
function pace(speed: number): string {
  const amount = `${formatQuantity(speed, 's')} of record per second`
  return speed < 1 ? `${amount}, ${formatCount(1 / speed)} × slower` : amount
}

export interface PlayheadBarProps {
  playhead: Playhead
  /** s. */
  time: number
  /** Grid of the record, s. */
  sampleInterval: number
  /** Span that the slider covers: what the plot shows, s. */
  view: readonly [number, number]
  mode: RunModeSpan['mode']
  speed: number
  speeds: readonly number[]
  onSpeed: (speed: number) => void
  /** Zooms to a few periods around the playhead. */
  onCloseUp: () => void
}

export function PlayheadBar(props: PlayheadBarProps) {
  const { playhead, time, sampleInterval, view, mode, speed, speeds } = props
  const limited = mode !== 'linear'
  const now = formatQuantity(time, 's', { digits: 6 })
  return (
    <div role="group" aria-label="Playhead" data-print="hidden" className="space-y-2 px-4 py-3">
      <div className="flex flex-wrap items-baseline gap-x-4">
        <p className="min-w-32 text-lg font-medium">{now}</p>
        <p aria-live={playhead.playing ? 'off' : 'polite'} className={limited ? 'text-copper' : 'text-soft'}>
          {limitSentences[mode]}
        </p>
      </div>
      <input
        type="range"
        aria-label="Instant within the visible span"
        aria-valuetext={`${now}. ${limitSentences[mode]}`}
        className="block h-8 w-full accent-petrol"
        min={view[0]}
        max={view[1]}
        step={sampleInterval}
        value={Math.min(view[1], Math.max(view[0], time))}
        onChange={(event) => playhead.seek(event.target.valueAsNumber)}
      />
      <div className="flex flex-wrap items-end gap-2">
        <Button
          variant="main"
          className="min-w-20"
          onClick={playhead.playing ? playhead.pause : playhead.play}
        >
          {playhead.playing ? 'Pause' : 'Play'}
        </Button>
        <Button disabled={!playhead.stepBack} onClick={() => playhead.stepBack?.()}>
          ← Previous change
        </Button>
        <Button disabled={!playhead.stepForward} onClick={() => playhead.stepForward?.()}>
          Next change →
        </Button>
        <Button variant="quiet" onClick={props.onCloseUp}>
          Zoom in here
        </Button>
        <Field label="Speed" labelHidden className="ml-auto min-w-0 basis-88 max-sm:grow">
          <Select value={speed} onChange={(event) => props.onSpeed(Number(event.target.value))}>
            {speeds.map((choice) => (
              <option key={choice} value={choice}>
                {pace(choice)}
              </option>
            ))}
          </Select>
        </Field>
      </div>
    </div>
  )
}
