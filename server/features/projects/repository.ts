import { literal, type Transaction } from 'sequelize'
import type { AppContext } from '#server/context.ts'
import type { Project } from '#server/db/models/project.ts'

const designsInUse = literal(
  '(SELECT COUNT(*) FROM designs WHERE designs.project_id = project.id AND designs.archived_at IS NULL)',
)
const withCount = { attributes: { include: [[designsInUse, 'designs']] as [typeof designsInUse, string][] } }

export function projectsRepository({ database }: Pick<AppContext, 'database'>) {
  const { Project } = database.models
  return {
    /** All projects by name, each with the number of its designs in use as `get('designs')`. */
    all: (): Promise<Project[]> => Project.findAll({ ...withCount, order: [['name', 'ASC']] }),

    find: (id: number, transaction?: Transaction): Promise<Project | null> =>
      Project.findByPk(id, { ...withCount, transaction }),

    create: (name: string, now: Date, transaction: Transaction): Promise<Project> =>
      Project.create({ name, createdAt: now, updatedAt: now }, { transaction }),
  }
}
