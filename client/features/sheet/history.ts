/** Undo and redo over immutable states. */
export interface History<State> {
  past: readonly State[]
  present: State
  future: readonly State[]
  /** Name of the step that the present still belongs to: a change of the same step replaces it. Null once sealed. */
  step: string | null
}

/** Steps that can be undone. */
export const depth = 200

export function begin<State>(present: State): History<State> {
  return { past: [], present, future: [], step: null }
}

/** Takes the next state as a new undo step, or into the open step of the same name. */
export function advance<State>(history: History<State>, next: State, step: string | null): History<State> {
  if (next === history.present) return history
  if (step !== null && step === history.step) return { ...history, present: next, future: [] }
  return { past: [...history.past, history.present].slice(-depth), present: next, future: [], step }
}

/** Closes the open step: the next change is undone by itself. */
export function seal<State>(history: History<State>): History<State> {
  return history.step === null ? history : { ...history, step: null }
}

export function undo<State>(history: History<State>): History<State> {
  const before = history.past.at(-1)
  if (before === undefined) return history
  return {
    past: history.past.slice(0, -1),
    present: before,
    future: [history.present, ...history.future],
    step: null,
  }
}

export function redo<State>(history: History<State>): History<State> {
  const [after, ...future] = history.future
  if (after === undefined) return history
  return { past: [...history.past, history.present], present: after, future, step: null }
}
