/** Rows → the answers of `shared/schemas/run.ts`. */
import type { Run as RunRow } from '#server/db/models/run.ts'
import type { RecordLayout, Run, RunSummary } from '#shared/schemas/run.ts'

/** Needs `design` with its `project`, and `author`. */
export function presentRunSummary(row: RunRow): RunSummary {
  const { design, author } = row
  if (!design?.project || !author) throw new Error('a run was read without its design, project and author')
  return {
    id: row.id,
    title: row.title,
    note: row.note,
    design: { id: design.id, name: design.name },
    project: { id: design.project.id, name: design.project.name },
    author: { id: author.id, name: author.name },
    createdAt: row.createdAt.toISOString(),
    engineVersion: row.engineVersion,
    figures: row.figures,
  }
}

export function presentRun(row: RunRow): Run {
  return {
    ...presentRunSummary(row),
    inputs: row.inputs,
    record: layoutOf(row),
    modes: row.modes,
    unsettled: row.unsettled,
  }
}

/** What the stored bytes hold. */
export function layoutOf(row: RunRow): RecordLayout {
  return { sampleInterval: row.sampleInterval, samples: row.samples, columns: row.columns }
}
