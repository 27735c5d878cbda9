/** Two runs side by side: which inputs differ, and by how much each figure. */
import { inputRows, type InputRow } from '#client/features/runs/lib/input-rows.ts'
import { compareFigure } from '#shared/replay.ts'
import { figureKeys, type FigureKey, type Figures } from '#shared/figures.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'

export interface InputPair {
  group: string
  name: string
  /** As shown; null where this run has no such input. */
  a: string | null
  b: string | null
  differs: boolean
}

export interface FigurePair {
  key: FigureKey
  a: number | null
  b: number | null
  /** b − a in the figure's unit; null when either is missing. */
  difference: number | null
  /** (b − a) / |a|; null when either is missing or a is zero. */
  relative: number | null
  /** The difference is not zero, but less than the same run may differ by when it is computed again. */
  negligible: boolean
}

const keyOf = (row: InputRow) => `${row.group}/${row.name}`

/** Every input that either run has, the first run's order first, and whether the two differ. */
export function compareInputs(a: RunInputs, b: RunInputs): InputPair[] {
  const inA = new Map(inputRows(a).map((row) => [keyOf(row), row]))
  const inB = new Map(inputRows(b).map((row) => [keyOf(row), row]))
  const pairs = [...new Map([...inA, ...inB]).keys()].map((key) => {
    const rowA = inA.get(key)
    const rowB = inB.get(key)
    const { group, name } = (rowA ?? rowB)!
    return { group, name, a: rowA?.text ?? null, b: rowB?.text ?? null, differs: rowA?.value !== rowB?.value }
  })
  // What only one of the two has belongs to its group, not at the end.
  const groups = [...new Set(pairs.map((pair) => pair.group))]
  return groups.flatMap((group) => pairs.filter((pair) => pair.group === group))
}

/** Every figure of both, with the difference. */
export function compareFigures(a: Figures, b: Figures): FigurePair[] {
  return figureKeys.map((key) => {
    const left = a[key]
    const right = b[key]
    const { difference, passes } = compareFigure(key, left, right)
    return {
      key,
      a: left,
      b: right,
      difference,
      relative: difference === null || !left ? null : difference / Math.abs(left),
      negligible: passes && difference !== null && difference !== 0,
    }
  })
}
