/** Runs in the database. Reads go straight through the models; writes take the transaction that they belong to. */
import { Op, type Includeable, type Order, type Transaction, type WhereOptions } from 'sequelize'
import type { ComputedRun } from '#server/compute/index.ts'
import type { AppContext } from '#server/context.ts'
import type { Design } from '#server/db/models/design.ts'
import type { Run } from '#server/db/models/run.ts'
import { rowsOf } from '#server/db/paging.ts'
import { containsText } from '#server/db/search.ts'
import type { CreateRun, ListRuns } from '#shared/schemas/run.ts'

const names: Includeable[] = [
  {
    association: 'design',
    attributes: ['id', 'name'],
    include: [{ association: 'project', attributes: ['id', 'name'] }],
  },
  { association: 'author', attributes: ['id', 'name'] },
]

function conditions({ search, designId, authorId }: ListRuns): WhereOptions {
  return {
    [Op.and]: [
      designId === undefined ? {} : { designId },
      authorId === undefined ? {} : { authorId },
      search === ''
        ? {}
        : { [Op.or]: ['run.title', 'run.note', 'design.name'].map((column) => containsText(column, search)) },
    ],
  }
}

function ordering({ sort, order }: ListRuns): Order {
  const first = {
    title: ['title', order] as const,
    design: ['design', 'name', order] as const,
    author: ['author', 'name', order] as const,
    createdAt: ['createdAt', order] as const,
  }[sort]
  return [[...first], ['id', order]] as Order
}

export function runsRepository({ database }: Pick<AppContext, 'database'>) {
  const { Design, Run, RunRecord } = database.models
  return {
    /** One page of runs without their inputs and spans, and how many there are over all pages. */
    page: (query: ListRuns): Promise<{ rows: Run[]; count: number }> =>
      Run.findAndCountAll({
        attributes: { exclude: ['inputs', 'modes', 'columns'] },
        where: conditions(query),
        include: names,
        order: ordering(query),
        ...rowsOf(query),
      }),

    find: (id: number): Promise<Run | null> => Run.findByPk(id, { include: names }),

    /** The packed bytes of a run's record; null when there is no such run. */
    async record(runId: number): Promise<Buffer | null> {
      const record = await RunRecord.findByPk(runId)
      return record && record.bytes
    },

    design: (id: number, transaction?: Transaction): Promise<Design | null> =>
      Design.findByPk(id, { transaction }),

    /** Stores a run and its record; resolves to the new id. */
    async create(
      { title, note, designId, inputs }: CreateRun,
      { engineVersion, figures, modes, unsettled, record, bytes }: ComputedRun,
      authorId: number,
      createdAt: Date,
      transaction: Transaction,
    ): Promise<number> {
      const evidence = { engineVersion, figures, modes, unsettled, ...record }
      const { id: runId } = await Run.create(
        { title, note, designId, inputs, authorId, createdAt, ...evidence },
        { transaction },
      )
      await RunRecord.create({ runId, bytes: Buffer.from(bytes) }, { transaction })
      return runId
    },

    /** Deletes a run; its record goes with it. */
    async remove(id: number, transaction: Transaction): Promise<void> {
      await Run.destroy({ where: { id }, transaction })
    },
  }
}
