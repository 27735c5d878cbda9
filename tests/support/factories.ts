import { gzipSync } from 'node:zlib'
import type { Database } from '#server/db/database.ts'
import type { Design } from '#server/db/models/design.ts'
import type { Person } from '#server/db/models/person.ts'
import type { Project } from '#server/db/models/project.ts'
import type { Run } from '#server/db/models/run.ts'
import type { Clock } from '#server/clock.ts'
import { hashPassword } from '#server/identity/passwords.ts'
import { figureKeys, type Figures } from '#shared/figures.ts'
import { encodeColumns } from '#shared/record-codec.ts'
import { startingDraft } from '#shared/starting-draft.ts'
import type { Role } from '#shared/roles.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

/** bcrypt's least cost: tests do not wait for hashes. */
export const testBcryptCost = 4

/** Password of every person that `createPerson` makes. */
export const testPassword = 'a password for tests'

const noFigures = Object.fromEntries(figureKeys.map((key) => [key, null])) as Figures

/** Makes rows straight in the database, each with a name of its own. */
export function createFactories(database: Database, clock: Clock) {
  const { Person, Project, Design, Draft, Run, RunRecord } = database.models
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

  /** A run with a record of three samples and no figures. */
  async function createRun(
    changes: { title?: string; note?: string; design?: Design; author?: Person } = {},
  ): Promise<Run> {
    const author = changes.author ?? (await createPerson('engineer'))
    const design = changes.design ?? (await createDesign({ author }))
    const { title = `Run ${++count}`, note = '' } = changes
    const { circuit, stimulus, timing } = startingDraft
    const createdAt = clock()
    return database.write(async (transaction) => {
      const run = await Run.create(
        {
          ...{ designId: design.id, authorId: author.id, title, note, createdAt },
          ...{ engineVersion: 'test', inputs: { circuit, stimulus, timing } },
          ...{ figures: noFigures, modes: [], unsettled: 'Made for a test.' },
          ...{ sampleInterval: 1e-3, samples: 3, columns: [{ name: 'output', unit: 'V' }] },
        },
        { transaction },
      )
      const bytes = gzipSync(encodeColumns([Float64Array.of(0, 0.5, -0.25)]))
      await RunRecord.create({ runId: run.id, bytes }, { transaction })
      return run
    })
  }

  return { createPerson, createProject, createDesign, createRun }
}
