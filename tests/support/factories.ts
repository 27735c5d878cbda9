import type { Database } from '#server/db/database.ts'
import type { Design } from '#server/db/models/design.ts'
import type { Person } from '#server/db/models/person.ts'
import type { Project } from '#server/db/models/project.ts'
import type { Clock } from '#server/clock.ts'
import { hashPassword } from '#server/identity/passwords.ts'
import { startingDraft } from '#shared/starting-draft.ts'
import type { Role } from '#shared/roles.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

/** bcrypt's least cost: tests do not wait for hashes. */
export const testBcryptCost = 4

/** Password of every person that `createPerson` makes. */
export const testPassword = 'a password for tests'

/** Makes rows straight in the database, each with a name of its own. */
export function createFactories(database: Database, clock: Clock) {
  const { Person, Project, Design, Draft } = database.models
  const passwordHash = hashPassword(testPassword, testBcryptCost)
  let count = 0

  async function createPerson(
    role: Role,
    changes: Partial<Pick<Person, 'name' | 'email' | 'active' | 'demo'>> = {},
  ): Promise<Person> {
    const number = ++count
    const now = clock()
    const hash = await passwordHash
    return database.write((transaction) =>
      Person.create(
        {
          ...{ name: `${role} ${number}`, email: `${role}-${number}@tests.example`, role },
          ...{ passwordHash: hash, createdAt: now, updatedAt: now },
          ...changes,
        },
        { transaction },
      ),
    )
  }

  function createProject(name = `Project ${++count}`): Promise<Project> {
    const now = clock()
    return database.write((transaction) =>
      Project.create({ name, createdAt: now, updatedAt: now }, { transaction }),
    )
  }

  /** A design with a draft of version 1; project and author are made when not given. */
  async function createDesign(
    changes: {
      name?: string
      project?: Project
      author?: Person
      content?: DraftContent
      archived?: boolean
    } = {},
  ): Promise<Design> {
    const project = changes.project ?? (await createProject())
    const author = changes.author ?? (await createPerson('engineer'))
    const { name = `Design ${++count}`, content = startingDraft, archived = false } = changes
    const now = clock()
    return database.write(async (transaction) => {
      const design = await Design.create(
        {
          ...{ projectId: project.id, name, createdBy: author.id, createdAt: now },
          archivedAt: archived ? now : null,
        },
        { transaction },
      )
      const draft = { designId: design.id, version: 1, content, savedBy: author.id, savedAt: now }
      await Draft.create(draft, { transaction })
      return design
    })
  }

  return { createPerson, createProject, createDesign }
}
