import { useEffect, useEffectEvent, useState } from 'react'
import { advance, nextChange, previousChange } from '#client/features/runs/lib/playhead.ts'
import type { RunModeSpan } from '#shared/schemas/run.ts'

/** Longest frame that counts, s: a page that was in the background goes on from where it was. */
const longestFrame = 0.1

export interface Playhead {
  playing: boolean
  /** Begins again from power-on when it stands at the end. */
  play: () => void
  pause: () => void
  /** Pauses and goes to an instant, s. */
  seek: (time: number) => void
  /** To the next and the previous change of mode; null where there is none. */
  stepForward: (() => void) | null
  stepBack: (() => void) | null
}

export interface PlayheadOptions {
  modes: readonly RunModeSpan[]
  /** Last instant of the record, s. */
  end: number
  /** Seconds of record per second. */
  speed: number
  /** Where it stands, s. */
  time: number
  onTime: (time: number) => void
}

/**
 * Moves the playhead of a record. It never starts by itself, so nothing moves for those who prefer no motion until
 * they press play.
 */
export function usePlayhead({ modes, end, speed, time, onTime }: PlayheadOptions): Playhead {
  const [wantsToPlay, setWantsToPlay] = useState(false)
  const playing = wantsToPlay && time < end
  const onFrame = useEffectEvent((elapsed: number) => onTime(advance(time, elapsed, speed, end)))

  useEffect(() => {
    if (!playing) return
    let latest: number | null = null
    let frame = requestAnimationFrame(function step(now) {
      if (latest !== null) onFrame(Math.min(longestFrame, (now - latest) / 1000))
      latest = now
      frame = requestAnimationFrame(step)
    })
    return () => cancelAnimationFrame(frame)
  }, [playing])

  const seek = (wanted: number) => {
    setWantsToPlay(false)
    onTime(Math.min(end, Math.max(0, wanted)))
  }
  const next = nextChange(modes, time)
  const previous = previousChange(modes, time)
  return {
    playing,
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
