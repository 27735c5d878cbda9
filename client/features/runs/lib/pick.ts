/** Picking two runs to compare. */

/** Adds or drops a run; a third takes the second's place. The order is the order of picking. */
export function togglePick<Run extends { id: number }>(picked: readonly Run[], run: Run): Run[] {
  if (picked.some((other) => other.id === run.id)) return picked.filter((other) => other.id !== run.id)
  return [...picked.slice(0, 1), run]
}

/** Address of the page that compares two runs. */
export const comparePath = (a: number, b: number) => `/runs/compare?a=${a}&b=${b}`
