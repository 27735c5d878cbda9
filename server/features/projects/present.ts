import type { Project as ProjectModel } from '#server/db/models/project.ts'
import type { Project } from '#shared/schemas/design.ts'

/** A project as the client reads it. */
export function presentProject(project: ProjectModel): Project {
  return { id: project.id, name: project.name, designs: Number(project.get('designs') ?? 0) }
}
