import type { Failure, Simulation, SmallSignal } from '#sim/types.ts'

/** What the sheet knows of the circuit as it stands, and of the computation under way. */
export interface LiveResult {
  /** Follows every edit within a frame; null until the first answer or while the inputs are invalid. */
  smallSignal: SmallSignal | null
  /** The latest complete record; it may belong to an earlier edit, then `stale` is true. */
  simulation: Simulation | null
  /** Grid of `simulation`, s. */
  grid: { duration: number; sampleInterval: number } | null
  stale: boolean
  /** Share done of the computation under way, 0…1; null while idle. */
  progress: number | null
  /** Why the latest inputs gave no record. */
  failure: Failure | null
  /** Gives up the computation under way: `progress` becomes null and the older record stays, stale. */
  cancel?: () => void
  /** Computes the record after all. */
  resume?: () => void
}
