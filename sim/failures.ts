/** Failures of the engine as data. */
import { formatQuantity } from '#shared/units/format.ts'
import type { MotionOutcome } from '#sim/modes/machine.ts'
import type { Failure } from '#sim/types.ts'

/** Inputs that are refused: the field at fault as a path within `RunInputs`, and a sentence for it. */
export function invalid(path: (string | number)[], sentence: string): Failure {
  return { kind: 'invalid', path, sentence }
}

/** The caller asked to stop. */
export const stoppedFailure: Failure = {
  kind: 'stopped',
  path: [],
  sentence: 'Stopped before the end of the record.',
}

const fasterThanIntegrator = ['circuit', 'amplifier', 'gainBandwidth']

/** An amplifier so fast that following it would take more work than a computation may. */
export function tooStiff(evaluations: number, limit: number, duration: number): Failure {
  const times = (evaluations / limit).toPrecision(3)
  return {
    kind: 'solver',
    path: fasterThanIntegrator,
    sentence: `The amplifier is too fast to follow over ${formatQuantity(duration, 's')}: that takes about ${Number(times)} times the work allowed. Shorten the duration or lower the gain-bandwidth.`,
  }
}

/** What ended a motion early, at `t` seconds. */
export function solverFailure(outcome: Exclude<MotionOutcome, 'reachedEnd' | 'stopped'>, t: number): Failure {
  const at = formatQuantity(t, 's', { digits: 6 })
  switch (outcome) {
    case 'workExceeded':
    case 'tooManySteps':
      return {
        kind: 'solver',
        path: fasterThanIntegrator,
        sentence: `The computation used up the work allowed at ${at}: the circuit changes too fast for this duration. Shorten the duration or lower the gain-bandwidth.`,
      }
    case 'notFinite':
      return { kind: 'solver', path: [], sentence: `The solution left the range of numbers at ${at}.` }
    case 'modesDoNotRest':
      return {
        kind: 'solver',
        path: [],
        sentence: `At ${at} the output keeps changing between limits without time passing.`,
      }
  }
}
