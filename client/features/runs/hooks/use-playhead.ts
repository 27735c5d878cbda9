import { useEffect, useState } from 'react'
import { advance, nextChange, previousChange } from '#client/features/runs/lib/playhead.ts'
import type { RunModeSpan } from '#shared/schemas/run.ts'

/** Longest frame that counts, s: a page that was in the background goes on from where it was. */
const longestFrame = 0.1

/**
 * The playhead of a record. It never starts by itself, so nothing moves for those who prefer no motion until they
 * press play.
 * @param end last instant of the record, s
 * @param speed seconds of record per second
 * @param time where it stands, s; controlled
 */
export function usePlayhead(
  modes: readonly RunModeSpan[],
  end: number,
  speed: number,
  time: number,
  onTime: (time: number) => void,
) {
  const [wantsToPlay, setWantsToPlay] = useState(false)
  const playing = wantsToPlay && time < end

  useEffect(() => {
    if (!playing) return
    const shown = performance.now()
    const frame = requestAnimationFrame((now) => {
      const elapsed = Math.min(longestFrame, Math.max(0, (now - shown) / 1000))
      onTime(advance(time, elapsed, speed, end))
    })
    return () => cancelAnimationFrame(frame)
  }, [playing, time, speed, end, onTime])

  const seek = (wanted: number) => {
    setWantsToPlay(false)
    onTime(Math.min(end, Math.max(0, wanted)))
  }
  const next = nextChange(modes, time)
  const previous = previousChange(modes, time)
  return {
    playing,
    /** Begins again from power-on when it stands at the end. */
    play: () => {
      if (time >= end) onTime(0)
      setWantsToPlay(true)
    },
    pause: () => setWantsToPlay(false),
    seek,
    stepForward: next === null ? null : () => seek(next),
    stepBack: previous === null ? null : () => seek(previous),
  }
}
