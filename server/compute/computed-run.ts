/** What a computation hands to the rest of the server. Data only: it crosses the thread boundary. */
import type { Figures } from '#shared/figures.ts'
import type { RecordLayout, RunModeSpan } from '#shared/schemas/run.ts'
import type { Failure } from '#sim/types.ts'

export type { Failure } from '#sim/types.ts'

/** A finished run: everything that is stored as evidence. */
export interface ComputedRun {
  kind: 'computed'
  engineVersion: string
  figures: Figures
  modes: RunModeSpan[]
  /** Why the settled figures are missing; null when they are there. */
  unsettled: string | null
  record: RecordLayout
  /** The record's bytes (`shared/record-codec.ts`), gzip'd. */
  bytes: Uint8Array
}

/** Success or failure, told apart by `kind`. */
export type ComputeResult = ComputedRun | Failure

/** Every place is taken: ask again later. */
export class BusyError extends Error {
  override name = 'BusyError'
}

/** The worker thread ended or threw before it answered: out of memory, or a defect. `cause` tells. */
export class ComputeError extends Error {
  override name = 'ComputeError'
}
