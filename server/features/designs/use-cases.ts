import type { AppContext } from '#server/context.ts'
import type { Design as DesignRow } from '#server/db/models/design.ts'
import type { Person } from '#server/db/models/person.ts'
import { presentPage } from '#server/db/paging.ts'
import { presentDesign, presentDesignSummary, presentDraft } from '#server/features/designs/present.ts'
import { designsRepository } from '#server/features/designs/repository.ts'
import { conflict, invalid, notFound } from '#server/http/errors.ts'
import { limits } from '#shared/limits.ts'
import type {
  ChangeDesign,
  CreateDesign,
  Design,
  DesignSummary,
  Draft,
  ListDesigns,
  SaveDraft,
} from '#shared/schemas/design.ts'
import type { Page } from '#shared/schemas/paging.ts'
import { startingDraft } from '#shared/starting-draft.ts'

/** What can be done with designs and their drafts, in the shapes that are sent. */
export function designsUseCases({ database, clock }: Pick<AppContext, 'database' | 'clock'>) {
  const designs = designsRepository({ database })

  async function open(...[id, transaction]: Parameters<typeof designs.find>): Promise<DesignRow> {
    const design = await designs.find(id, transaction)
    if (!design) throw notFound('This design')
    return design
  }

  return {
    list: async (query: ListDesigns): Promise<Page<DesignSummary>> =>
      presentPage(query, await designs.page(query), presentDesignSummary),

    read: async (id: number): Promise<Design> => presentDesign(await open(id)),

    async create(
      { projectId, name, content = startingDraft }: CreateDesign,
      person: Person,
    ): Promise<Design> {
      const id = await database.write(async (transaction) => {
        if (!(await designs.projectExists(projectId, transaction)))
          throw invalid([{ path: ['projectId'], message: 'This project does not exist.' }])
        return designs.create({ projectId, name, content }, person, clock(), transaction)
      })
      return presentDesign(await open(id))
    },

    /** Renames, archives or restores. */
    change: (id: number, { name, archived }: ChangeDesign): Promise<Design> =>
      database.write(async (transaction) => {
        const design = await open(id, transaction)
        if (name !== undefined) design.name = name
        if (archived !== undefined) design.archivedAt = archived ? (design.archivedAt ?? clock()) : null
        return presentDesign(await design.save({ transaction }))
      }),

    /** Makes a new design in the same project that begins with what the draft holds now. */
    async duplicate(id: number, name: string | undefined, person: Person): Promise<Design> {
      const copyId = await database.write(async (transaction) => {
        const original = await open(id, transaction)
        const { projectId, draft } = original
        const copyName = name ?? `Copy of ${original.name}`.slice(0, limits.nameLength).trimEnd()
        return designs.create(
          { projectId, name: copyName, content: draft!.content },
          person,
          clock(),
          transaction,
        )
      })
      return presentDesign(await open(copyId))
    },

    /** Saves the draft if nobody saved it since the version that the edit began from; hands back theirs otherwise. */
    saveDraft: (id: number, { version, content }: SaveDraft, person: Person): Promise<Draft> =>
      database.write(async (transaction) => {
        const design = await open(id, transaction)
        const draft = design.draft!
        if (design.archivedAt) throw conflict('archived', 'The design is archived. Restore it to edit it.')
        if (draft.version !== version)
          throw conflict('stale-draft', `${draft.saver!.name} saved this draft in the meantime.`, {
            members: { draft: presentDraft(draft) },
          })
        return presentDraft(await designs.saveDraft(draft, content, person, clock(), transaction))
      }),
  }
}
