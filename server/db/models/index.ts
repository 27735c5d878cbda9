import type { Sequelize } from 'sequelize'
import { defineDesign } from '#server/db/models/design.ts'
import { defineDraft } from '#server/db/models/draft.ts'
import { definePerson } from '#server/db/models/person.ts'
import { defineProject } from '#server/db/models/project.ts'
import { defineRunRecord } from '#server/db/models/run-record.ts'
import { defineRun } from '#server/db/models/run.ts'
import { defineSession } from '#server/db/models/session.ts'

/**
 * The models bound to one connection, and how they belong together. Each call makes its own classes, so that a
 * process (a test) may hold several databases.
 */
export function defineModels(sequelize: Sequelize) {
  const Person = definePerson(sequelize)
  const Session = defineSession(sequelize)
  const Project = defineProject(sequelize)
  const Design = defineDesign(sequelize)
  const Draft = defineDraft(sequelize)
  const Run = defineRun(sequelize)
  const RunRecord = defineRunRecord(sequelize)

  Session.belongsTo(Person, { as: 'person', foreignKey: 'personId' })
  Design.belongsTo(Project, { as: 'project', foreignKey: 'projectId' })
  Design.belongsTo(Person, { as: 'creator', foreignKey: 'createdBy' })
  Design.hasOne(Draft, { as: 'draft', foreignKey: 'designId' })
  Draft.belongsTo(Person, { as: 'saver', foreignKey: 'savedBy' })
  Run.belongsTo(Design, { as: 'design', foreignKey: 'designId' })
  Run.belongsTo(Person, { as: 'author', foreignKey: 'authorId' })

  return { Person, Session, Project, Design, Draft, Run, RunRecord }
}

export type Models = ReturnType<typeof defineModels>
