/**
 * Saves a draft as it is edited: after a rest, one request at a time, again once the server is back. It never
 * overwrites what somebody else saved meanwhile: the server refuses a stale version, and a person decides.
 * Free of React; time comes from `setTimeout`.
 */
import { ApiError, OfflineError } from '#client/lib/api.ts'
import type { Draft } from '#shared/schemas/design.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

/** Rest after an edit before it is sent, ms. */
export const restTime = 800
/** Waits between tries while the server is away, ms; the last one repeats. */
export const retryTimes = [2_000, 4_000, 8_000, 15_000, 30_000] as const

export type SaveStatus =
  | { kind: 'saved'; at: string }
  | { kind: 'unsaved' }
  | { kind: 'saving' }
  /** No answer; it is tried again by itself. */
  | { kind: 'offline' }
  /** Refused; it is tried again after the next edit or on demand. */
  | { kind: 'refused'; sentence: string }
  /** Somebody saved another version: `theirs`. Nothing is sent until a person decides. */
  | { kind: 'conflict'; theirs: Draft }

export interface AutosaveOptions {
  draft: Draft
  /** Sends one version; rejects with ApiError or OfflineError. */
  save: (version: number, content: DraftContent) => Promise<Draft>
  onStatus: (status: SaveStatus) => void
  onSaved?: (draft: Draft) => void
}

export interface Autosave {
  /** The draft as it is now. Saves after a rest when it differs from what the server has. */
  change(content: DraftContent): void
  /** Tries at once, as after signing in again or when the server is back. */
  retry(): void
  /** After a conflict: saves the present content over theirs. */
  keepMine(): void
  /** The server's draft is taken as it is; the caller shows its content. */
  adopt(draft: Draft): void
  /** Sends later versions as if they began from `version`: a restored copy of an older draft. */
  beginFrom(version: number): void
  /** Whether something would be lost if the page closed now. */
  pending(): boolean
  /** Sends what waits and stops. */
  dispose(): void
}

export function createAutosave({ draft, save, onStatus, onSaved }: AutosaveOptions): Autosave {
  let { version } = draft
  let savedContent = draft.content
  let content = draft.content
  let status: SaveStatus = { kind: 'saved', at: draft.savedAt }
  let inFlight = false
  let tries = 0
  let timer: ReturnType<typeof setTimeout> | undefined
  let stopped = false

  function tell(next: SaveStatus) {
    status = next
    if (!stopped) onStatus(next)
  }

  function later(delay: number) {
    clearTimeout(timer)
    if (!stopped) timer = setTimeout(() => void send(), delay)
  }

  function took(saved: Draft) {
    version = saved.version
    tries = 0
    onSaved?.(saved)
  }

  function failed(error: unknown) {
    if (error instanceof OfflineError) {
      tell({ kind: 'offline' })
      later(retryTimes[Math.min(tries, retryTimes.length - 1)]!)
      tries += 1
    } else if (error instanceof ApiError && error.problem.code === 'stale-draft' && error.problem.draft) {
      tell({ kind: 'conflict', theirs: error.problem.draft as Draft })
    } else {
      tell({ kind: 'refused', sentence: error instanceof Error ? error.message : 'the page failed' })
    }
  }

  async function send() {
    clearTimeout(timer)
    if (inFlight || status.kind === 'conflict') return
    if (content === savedContent) {
      if (status.kind !== 'saved') tell({ kind: 'saved', at: draft.savedAt })
      return
    }
    const sent = content
    inFlight = true
    tell({ kind: 'saving' })
    try {
      const saved = await save(version, sent)
      inFlight = false
      savedContent = sent
      draft = saved
      took(saved)
      if (content === sent) tell({ kind: 'saved', at: saved.savedAt })
      else {
        tell({ kind: 'unsaved' })
        if (stopped) void send()
        else later(restTime)
      }
    } catch (error) {
      inFlight = false
      failed(error)
    }
  }

  return {
    change(next) {
      if (next === content) return
      content = next
      if (status.kind === 'conflict' || inFlight) return
      // While the server is away its own retries will send it.
      if (status.kind === 'offline') return
      tell({ kind: 'unsaved' })
      later(restTime)
    },
    retry() {
      if (status.kind === 'offline' || status.kind === 'refused') void send()
    },
    keepMine() {
      if (status.kind !== 'conflict') return
      version = status.theirs.version
      tell({ kind: 'unsaved' })
      void send()
    },
    adopt(theirs) {
      clearTimeout(timer)
      draft = theirs
      version = theirs.version
      savedContent = theirs.content
      content = theirs.content
      tell({ kind: 'saved', at: theirs.savedAt })
      onSaved?.(theirs)
    },
    beginFrom(base) {
      version = base
    },
    pending: () => inFlight || content !== savedContent,
    dispose() {
      if (status.kind === 'unsaved') void send()
      clearTimeout(timer)
      stopped = true
    },
  }
}
