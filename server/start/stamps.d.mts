/** Types of `stamps.mjs` for TypeScript; what the parts mean stands there. */
export interface Step {
  stamp: string
  inputs: string[]
  outputs?: string[]
  make: () => unknown
}
export function isUpToDate(step: Step): boolean
export function whenChanged(step: Step): Promise<boolean>
