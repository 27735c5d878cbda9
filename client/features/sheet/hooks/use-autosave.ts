/** Ties `autosave.ts` to a page: its status, its retries, the copy in this browser and the warning on leaving. */
import { useQueryClient } from '@tanstack/react-query'
import { useCallback, useEffect, useMemo, useRef, useState } from 'react'
import { createAutosave, type Autosave, type SaveStatus } from '#client/features/sheet/autosave.ts'
import { draftCopies, sameContent, type DraftCopy } from '#client/features/sheet/draft-copy.ts'
import { rememberDraft, saveDraft } from '#client/features/sheet/queries.ts'
import { isReachable, subscribeReachable } from '#client/lib/reachability.ts'
import { useSession } from '#client/lib/session.ts'
import type { Design, Draft } from '#shared/schemas/design.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

export interface DraftSaving {
  status: SaveStatus
  /** Whether unsaved edits are safe in this browser meanwhile. */
  kept: boolean
  /** Edits of an earlier visit that never reached the server; null when there are none or they were dealt with. */
  copy: DraftCopy | null
  restoreCopy: () => void
  discardCopy: () => void
  keepMine: () => void
  takeTheirs: () => void
  retry: () => void
}

export interface AutosaveInputs {
  design: Design
  content: DraftContent
  readOnly: boolean
  /** Shows content that came from elsewhere: as an undo step (`replace`), or as a new beginning (`reset`). */
  show: (content: DraftContent, how: 'replace' | 'reset') => void
}

export function useAutosave({ design, content, readOnly, show }: AutosaveInputs): DraftSaving {
  const client = useQueryClient()
  const session = useSession()
  const copies = useMemo(
    () => draftCopies(session.person.id, design.id, localStorage),
    [session.person.id, design.id],
  )
  const [status, setStatus] = useState<SaveStatus>({ kind: 'saved', at: design.draft.savedAt })
  const [kept, setKept] = useState(true)
  const [copy, setCopy] = useState(() => {
    const found = readOnly ? null : copies.read()
    return found && !sameContent(found.content, design.draft.content) ? found : null
  })
  const autosave = useRef<Autosave>(null)
  const version = useRef(design.draft.version)
  const first = useRef(design.draft)

  useEffect(() => {
    if (readOnly) return
    const created = createAutosave({
      draft: first.current,
      save: (from, next) => saveDraft(design.id, { version: from, content: next }),
      onStatus: setStatus,
      onSaved: (draft) => {
        version.current = draft.version
        first.current = draft
        rememberDraft(client, design.id, draft)
        if (!created.pending()) copies.forget()
      },
    })
    autosave.current = created
    const unsubscribe = subscribeReachable(() => isReachable() && created.retry())
    return () => {
      unsubscribe()
      created.dispose()
      autosave.current = null
    }
  }, [client, copies, design.id, readOnly])

  useEffect(() => {
    autosave.current?.change(content)
    if (autosave.current?.pending()) setKept(copies.keep(version.current, content))
  }, [content, copies])

  // A session that was renewed over the page: what was refused for want of it goes now.
  useEffect(() => autosave.current?.retry(), [session])

  // Somebody else's save, noticed while nothing here waits to be saved.
  useEffect(() => {
    if (design.draft.version <= version.current || autosave.current?.pending()) return
    version.current = design.draft.version
    first.current = design.draft
    autosave.current?.adopt(design.draft)
    show(design.draft.content, 'reset')
  }, [design.draft, show])

  const waiting = status.kind !== 'saved'
  useEffect(() => {
    if (!waiting) return
    const warn = (event: BeforeUnloadEvent) => event.preventDefault()
    addEventListener('beforeunload', warn)
    return () => removeEventListener('beforeunload', warn)
  }, [waiting])

  const adopt = useCallback(
    (draft: Draft) => {
      autosave.current?.adopt(draft)
      show(draft.content, 'replace')
    },
    [show],
  )

  return {
    status,
    kept,
    copy,
    restoreCopy() {
      if (!copy) return
      autosave.current?.beginFrom(copy.version)
      show(copy.content, 'replace')
      setCopy(null)
    },
    discardCopy() {
      copies.forget()
      setCopy(null)
    },
    keepMine: () => autosave.current?.keepMine(),
    takeTheirs: () => status.kind === 'conflict' && adopt(status.theirs),
    retry: () => autosave.current?.retry(),
  }
}
