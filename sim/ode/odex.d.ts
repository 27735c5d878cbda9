/** Declarations of our own for `odex` 2.0.4 (its sources fail strict checks). Only what the adapter uses. */

/** Component `index` (from 0) at `x` within the step just accepted. */
export type DenseOutput = (index: number, x: number) => number

export declare class Solver {
  constructor(dimension: number)
  maxSteps: number
  initialStepSize: number
  maxStepSize: number
  maxExtrapolationColumns: number
  denseOutput: boolean
  relativeTolerance: number | number[]
  absoluteTolerance: number | number[]
  solve(
    derivative: (x: number, y: number[]) => number[],
    x: number,
    y: number[],
    xEnd: number,
    /** Called at the start (step 1, no dense output) and after every accepted step; false ends the integration. */
    observe?: (step: number, xOld: number, x: number, y: number[], dense: DenseOutput) => boolean | void,
  ): { y: number[]; outcome: number; nStep: number; nAccept: number; nReject: number; nEval: number }
}
