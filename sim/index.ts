/** The engine's public face: synchronous, typed, failures as data. */
export type * from '#sim/types.ts'
export { plan, type Plan } from '#sim/plan.ts'
export { simulateRun, type RunHooks } from '#sim/run.ts'
export { simulate } from '#sim/simulate.ts'
export { smallSignal } from '#sim/small-signal.ts'
export { engineVersion } from '#sim/version.ts'
