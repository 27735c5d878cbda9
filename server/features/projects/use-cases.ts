import { UniqueConstraintError } from 'sequelize'
import type { AppContext } from '#server/context.ts'
import { presentProject } from '#server/features/projects/present.ts'
import { projectsRepository } from '#server/features/projects/repository.ts'
import { conflict, notFound } from '#server/http/errors.ts'
import type { CreateProject, Project } from '#shared/schemas/design.ts'

/** What can be done with projects, in the shapes that are sent. */
export function projectsUseCases({ database, clock }: Pick<AppContext, 'database' | 'clock'>) {
  const projects = projectsRepository({ database })

  return {
    list: async (): Promise<Project[]> => (await projects.all()).map(presentProject),

    create: ({ name }: CreateProject): Promise<Project> =>
      nameTakenAsConflict(() =>
        database.write(async (transaction) =>
          presentProject(await projects.create(name, clock(), transaction)),
        ),
      ),

    rename: (id: number, { name }: CreateProject): Promise<Project> =>
      nameTakenAsConflict(() =>
        database.write(async (transaction) => {
          const project = await projects.find(id, transaction)
          if (!project) throw notFound('This project')
          return presentProject(await project.update({ name, updatedAt: clock() }, { transaction }))
        }),
      ),
  }
}

/** Names of projects differ in more than case; the table sees to it. */
async function nameTakenAsConflict<T>(work: () => Promise<T>): Promise<T> {
  try {
    return await work()
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error
    const message = 'There is already a project of this name.'
    throw conflict('name-taken', message, { errors: [{ path: ['name'], message }] })
  }
}
