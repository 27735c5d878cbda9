import type { Design as DesignModel } from '#server/db/models/design.ts'
import type { Draft as DraftModel } from '#server/db/models/draft.ts'
import type { Design, DesignSummary, Draft, PersonReference } from '#shared/schemas/design.ts'

/** A row of the list; needs project, creator and draft with saver loaded. */
export function presentDesignSummary(design: DesignModel): DesignSummary {
  const project = loaded(design.project)
  const draft = loaded(design.draft)
  return {
    id: design.id,
    name: design.name,
    project: { id: project.id, name: project.name },
    archived: design.archivedAt !== null,
    runs: Number(design.get('runs') ?? 0),
    createdBy: reference(design.creator),
    updatedBy: reference(draft.saver),
    updatedAt: draft.savedAt.toISOString(),
  }
}

/** A design with its draft. */
export function presentDesign(design: DesignModel): Design {
  return { ...presentDesignSummary(design), draft: presentDraft(loaded(design.draft)) }
}

export function presentDraft({ version, content, saver, savedAt }: DraftModel): Draft {
  return { version, content, savedBy: reference(saver), savedAt: savedAt.toISOString() }
}

function reference(person: PersonReference | undefined): PersonReference {
  const { id, name } = loaded(person)
  return { id, name }
}

function loaded<T>(association: T | undefined | null): T {
  if (association === undefined || association === null) throw new Error('an association was not loaded')
  return association
}
