/** What can be done with runs. The computing stays outside the write queue: only its result is stored in there. */
import { BusyError, ComputeError, type ComputedRun } from '#server/compute/index.ts'
import type { AppContext } from '#server/context.ts'
import type { Person } from '#server/db/models/person.ts'
import type { Run as RunRow } from '#server/db/models/run.ts'
import { presentPage } from '#server/db/paging.ts'
import { presentRun, presentRunSummary } from '#server/features/runs/present.ts'
import { runsRepository } from '#server/features/runs/repository.ts'
import { HttpError, conflict, forbidden, invalid, notFound } from '#server/http/errors.ts'
import { roleIncludes } from '#shared/roles.ts'
import type { Page } from '#shared/schemas/paging.ts'
import type { CreateRun, ListRuns, Run, RunSummary } from '#shared/schemas/run.ts'

/** Seconds after which a caller who found every thread taken may ask again. */
const busyRetry = 5

export function runsUseCases(context: AppContext) {
  const { database, compute, clock, log } = context
  const repository = runsRepository(context)

  async function rowOf(id: number): Promise<RunRow> {
    const row = await repository.find(id)
    if (!row) throw notFound('This run')
    return row
  }

  async function computed({ inputs }: CreateRun, signal: AbortSignal): Promise<ComputedRun> {
    const result = await compute.run(inputs, { signal }).catch((error: unknown) => {
      if (error instanceof BusyError)
        throw new HttpError(503, 'busy', error.message, { headers: { 'Retry-After': String(busyRetry) } })
      if (error instanceof ComputeError) {
        log.error({ err: error }, 'a computing thread failed')
        throw new HttpError(500, 'compute-failed', `${error.message} Nothing was saved; try again.`)
      }
      throw error
    })
    if (result.kind === 'computed') return result
    if (result.kind === 'invalid')
      throw invalid([{ path: ['inputs', ...result.path], message: result.sentence }])
    throw new HttpError(422, 'not-computed', 'The run could not be computed; nothing was saved.', {
      detail: result.sentence,
    })
  }

  return {
    /**
     * Computes and stores a run.
     * @param signal aborts the computation when nobody waits for it any more; nothing is stored then
     */
    async create(author: Person, body: CreateRun, signal: AbortSignal): Promise<Run> {
      assertInUse(await repository.design(body.designId))
      const result = await computed(body, signal)
      const id = await database.write(async (transaction) => {
        signal.throwIfAborted()
        assertInUse(await repository.design(body.designId, transaction))
        return repository.create(body, result, author.id, clock(), transaction)
      })
      return presentRun(await rowOf(id))
    },

    async list(query: ListRuns): Promise<Page<RunSummary>> {
      return presentPage(query, await repository.page(query), presentRunSummary)
    },

    async get(id: number): Promise<Run> {
      return presentRun(await rowOf(id))
    },

    /** The run's row and its packed record (gzip of `shared/record-codec.ts`). */
    async record(id: number): Promise<{ row: RunRow; bytes: Buffer }> {
      const [row, bytes] = await Promise.all([rowOf(id), repository.record(id)])
      if (!bytes) throw notFound('This run')
      return { row, bytes }
    },

    /** Its author may delete a run, and an administrator any. */
    async remove(person: Person, id: number): Promise<void> {
      const { authorId } = await rowOf(id)
      if (authorId !== person.id && !roleIncludes(person.role, 'admin'))
        throw forbidden('Only its author or an administrator may delete a run.')
      await database.write((transaction) => repository.remove(id, transaction))
    },
  }
}

function assertInUse(design: { archivedAt: Date | null } | null): void {
  if (!design) throw notFound('This design')
  if (design.archivedAt) throw conflict('archived', 'This design is archived: restore it to save runs.')
}
