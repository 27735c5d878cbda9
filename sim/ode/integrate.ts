/**
 * The only place that calls `odex`, E. Hairer and G. Wanner's extrapolated explicit midpoint rule with dense output
 * (Hairer, Nørsett & Wanner, Solving Ordinary Differential Equations I, §II.9).
 *
 * odex never tries a first step below 1e-4 of its variable's unit, so the variable is scaled here until that unit fits
 * the problem, and counted from the start of the stretch.
 */
import { Solver } from '#odex'

export interface Problem {
  /** Writes dy/dt at `t` (s) into `out`. Must not keep or change `y`. */
  derivative: (t: number, y: readonly number[], out: number[]) => void
  /** s. */
  start: number
  end: number
  initial: readonly number[]
  /** Error allowed per step, one per component, in its unit. */
  tolerance: number[]
  /** Whether a real negative pole far off, not accuracy, limits the steps. */
  stiff: boolean
  /** Length of the first step tried, s. */
  firstStep: number
  /** s. */
  longestStep: number
  work: WorkMeter
}

/** Counts evaluations and ends a computation that takes more than it may. */
export class WorkMeter {
  evaluations = 0
  steps = 0
  constructor(readonly limit: number) {}
}

/** Thrown through odex when the work limit is reached; `integrate` turns it into an outcome. */
class WorkExceeded extends Error {}

/** `at(index, t)`: component `index` at `t` within the step. */
export type Dense = (index: number, t: number) => number

/** Called after each accepted step. False ends the integration there. */
type StepObserver = (from: number, to: number, y: readonly number[], dense: Dense) => boolean

export type IntegrationOutcome =
  'reachedEnd' | 'endedByObserver' | 'workExceeded' | 'tooManySteps' | 'notFinite'

/** odex's smallest first step, in units of its variable. */
const smallestFirstStep = 1e-4
/** Sizes come as absolute tolerances; what odex adds in proportion to the momentary value only has to be small. */
const relativeTolerance = 1e-12
/** Columns of the extrapolation table where accuracy limits the steps: odex chooses orders up to 16. */
const columns = 9
/**
 * Columns where stability does: odex then stays with its fourth-order member (2 and 6 substeps), which reaches furthest
 * along the negative real axis for its work: 5.03 with 9 evaluations, against 6.39 with 33 for the member of order eight
 * (from their stability functions).
 */
const stiffColumns = 3
/** |step × pole| that is still well damped for a negative real pole. */
export const stableReach = 4.5
/** Outcomes by odex's numbering. */
const converged = 0
const maxStepsExceeded = 1

/** Integrates from `start` to `end`; the solution is what `observe` sees. Throws what `derivative` or `observe` throws. */
export function integrate(problem: Problem, observe: StepObserver): IntegrationOutcome {
  const { derivative, start, end, work } = problem
  const unit = problem.firstStep / smallestFirstStep
  const span = (end - start) / unit
  const rate = new Array<number>(problem.initial.length).fill(0)
  const solver = new Solver(problem.initial.length)
  solver.denseOutput = true
  solver.relativeTolerance = relativeTolerance
  solver.absoluteTolerance = problem.tolerance
  solver.initialStepSize = smallestFirstStep
  solver.maxStepSize = Math.min(problem.longestStep / unit, span)
  solver.maxExtrapolationColumns = problem.stiff ? stiffColumns : columns
  solver.maxSteps = work.limit
  let finite = true

  const scaledDerivative = (x: number, y: number[]) => {
    if (++work.evaluations > work.limit) throw new WorkExceeded()
    derivative(start + x * unit, y, rate)
    for (let i = 0; i < rate.length; i++) rate[i] = rate[i]! * unit
    return rate
  }
  const observeStep = (
    step: number,
    xOld: number,
    x: number,
    y: number[],
    dense: (i: number, x: number) => number,
  ) => {
    if (step === 1) return true
    work.steps++
    finite = y.every(Number.isFinite)
    if (!finite) return false
    const to = x >= span ? end : start + x * unit
    return observe(start + xOld * unit, to, y, (index, t) => dense(index, (t - start) / unit))
  }
  try {
    const { outcome } = solver.solve(scaledDerivative, 0, [...problem.initial], span, observeStep)
    if (!finite) return 'notFinite'
    if (outcome === converged) return 'reachedEnd'
    return outcome === maxStepsExceeded ? 'tooManySteps' : 'endedByObserver'
  } catch (error) {
    if (error instanceof WorkExceeded) return 'workExceeded'
    throw error
  }
}
