import { literal, Op, type Includeable, type Order, type Transaction, type WhereOptions } from 'sequelize'
import type { AppContext } from '#server/context.ts'
import type { Design } from '#server/db/models/design.ts'
import type { Draft } from '#server/db/models/draft.ts'
import type { Person } from '#server/db/models/person.ts'
import { rowsOf } from '#server/db/paging.ts'
import { containsText } from '#server/db/search.ts'
import type { ListDesigns } from '#shared/schemas/design.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

const runs = literal('(SELECT COUNT(*) FROM runs WHERE runs.design_id = design.id)')
const attributes = { include: [[runs, 'runs']] as [typeof runs, string][] }

const people: Includeable = { association: 'creator', attributes: ['id', 'name'] }
const project: Includeable = { association: 'project', attributes: ['id', 'name'] }
const saver: Includeable = { association: 'saver', attributes: ['id', 'name'] }
const wholeDraft: Includeable = { association: 'draft', include: [saver] }
/** Lists show who saved when; the content stays in its table. */
const draftHead: Includeable = {
  association: 'draft',
  attributes: ['designId', 'version', 'savedBy', 'savedAt'],
  include: [saver],
}

function conditions({ search, projectId, archived }: ListDesigns): WhereOptions {
  return {
    [Op.and]: [
      { archivedAt: archived === 'true' ? { [Op.ne]: null } : null },
      projectId === undefined ? {} : { projectId },
      search === ''
        ? {}
        : { [Op.or]: [containsText('design.name', search), containsText('project.name', search)] },
    ],
  }
}

function ordering({ sort, order }: ListDesigns): Order {
  const first = {
    name: ['name', order] as const,
    project: ['project', 'name', order] as const,
    updatedAt: ['draft', 'savedAt', order] as const,
  }[sort]
  return [[...first], ['id', order]] as Order
}

export function designsRepository({ database }: Pick<AppContext, 'database'>) {
  const { Design, Draft } = database.models
  return {
    /** One page of designs with project, creator, head of the draft, and the number of runs as `get('runs')`. */
    page: (query: ListDesigns): Promise<{ rows: Design[]; count: number }> =>
      Design.findAndCountAll({
        attributes,
        where: conditions(query),
        include: [project, people, draftHead],
        order: ordering(query),
        ...rowsOf(query),
      }),

    /** A design with everything that belongs to it, its draft's content included. */
    find: (id: number, transaction?: Transaction): Promise<Design | null> =>
      Design.findByPk(id, { attributes, include: [project, people, wholeDraft], transaction }),

    projectExists: async (id: number, transaction: Transaction): Promise<boolean> =>
      (await database.models.Project.count({ where: { id }, transaction })) > 0,

    /** Makes a design whose draft has version 1. */
    async create(
      { projectId, name, content }: { projectId: number; name: string; content: DraftContent },
      person: Person,
      now: Date,
      transaction: Transaction,
    ): Promise<number> {
      const { id } = await Design.create(
        { projectId, name, createdBy: person.id, createdAt: now },
        { transaction },
      )
      await Draft.create(
        { designId: id, version: 1, content, savedBy: person.id, savedAt: now },
        { transaction },
      )
      return id
    },

    /** Replaces a draft's content and raises its version by one. */
    async saveDraft(
      draft: Draft,
      content: DraftContent,
      person: Person,
      now: Date,
      transaction: Transaction,
    ): Promise<Draft> {
      const { version } = draft
      await draft.update({ version: version + 1, content, savedBy: person.id, savedAt: now }, { transaction })
      draft.saver = person
      return draft
    },
  }
}
