import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { createAutosave, restTime, retryTimes, type SaveStatus } from '#client/features/sheet/autosave.ts'
import { draftCopies, sameContent } from '#client/features/sheet/draft-copy.ts'
import { ApiError, OfflineError } from '#client/lib/api.ts'
import type { Draft } from '#shared/schemas/design.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'
import { startingDraft } from '#shared/starting-draft.ts'

const content = (feedbackR: number): DraftContent => ({
  ...startingDraft,
  circuit: { ...startingDraft.circuit, gain: { ...startingDraft.circuit.gain, feedbackR } },
})
const draft = (version: number, of: DraftContent, name = 'Ina Moor'): Draft => ({
  version,
  content: of,
  savedBy: { id: 2, name },
  savedAt: `2026-03-01T10:00:0${version}.000Z`,
})
const problem = (status: number, code: string, more = {}) =>
  new ApiError({ type: 'about:blank', title: 'No.', detail: `Refused: ${code}.`, status, code, ...more })

function setUp() {
  const requests: {
    version: number
    content: DraftContent
    answer: () => void
    refuse: (error: Error) => void
  }[] = []
  const statuses: SaveStatus[] = []
  const autosave = createAutosave({
    draft: draft(1, startingDraft),
    save: (version, sent) =>
      new Promise((resolve, refuse) =>
        requests.push({ version, content: sent, answer: () => resolve(draft(version + 1, sent)), refuse }),
      ),
    onStatus: (status) => statuses.push(status),
  })
  return { autosave, requests, statuses, last: () => statuses.at(-1) }
}

beforeEach(() => void vi.useFakeTimers())
afterEach(() => void vi.useRealTimers())
const rest = (time = restTime) => vi.advanceTimersByTimeAsync(time)

describe('autosave', () => {
  it('saves the last of a burst of edits once, with the version that it began from', async () => {
    const { autosave, requests, last } = setUp()
    for (const feedbackR of [20e3, 21e3, 22e3]) {
      autosave.change(content(feedbackR))
      await rest(restTime / 2)
    }
    expect(last()).toEqual({ kind: 'unsaved' })
    await rest()
    expect(requests).toHaveLength(1)
    expect(requests[0]).toMatchObject({ version: 1, content: content(22e3) })
    requests[0]!.answer()
    await rest(0)
    expect(last()).toEqual({ kind: 'saved', at: draft(2, startingDraft).savedAt })
    expect(autosave.pending()).toBe(false)
  })

  it('keeps one request in flight and sends what came meanwhile after it', async () => {
    const { autosave, requests } = setUp()
    autosave.change(content(21e3))
    await rest()
    autosave.change(content(22e3))
    await rest(10 * restTime)
    expect(requests).toHaveLength(1)
    requests[0]!.answer()
    await rest()
    expect(requests[1]).toMatchObject({ version: 2, content: content(22e3) })
  })

  it('saves nothing when an edit was undone in time', async () => {
    const { autosave, requests, last } = setUp()
    autosave.change(content(21e3))
    autosave.change(startingDraft)
    await rest()
    expect(requests).toHaveLength(0)
    expect(last()).toEqual({ kind: 'saved', at: draft(1, startingDraft).savedAt })
  })

  it('tries again by itself while the server is away, and at once when told', async () => {
    const { autosave, requests, last } = setUp()
    autosave.change(content(21e3))
    await rest()
    requests[0]!.refuse(new OfflineError())
    await rest(0)
    expect(last()).toEqual({ kind: 'offline' })
    expect(autosave.pending()).toBe(true)
    await rest(retryTimes[0])
    expect(requests).toHaveLength(2)
    requests[1]!.refuse(new OfflineError())
    autosave.change(content(22e3))
    await rest(0)
    autosave.retry()
    expect(requests[2]).toMatchObject({ version: 1, content: content(22e3) })
    requests[2]!.answer()
    await rest(0)
    expect(last()?.kind).toBe('saved')
  })

  it('shows both sides of a conflict, sends nothing meanwhile, and saves over theirs when told', async () => {
    const { autosave, requests, last } = setUp()
    const theirs = draft(7, content(33e3), 'Oke Brandt')
    autosave.change(content(21e3))
    await rest()
    requests[0]!.refuse(problem(409, 'stale-draft', { draft: theirs }))
    await rest(0)
    expect(last()).toEqual({ kind: 'conflict', theirs })
    autosave.change(content(22e3))
    await rest(10 * restTime)
    expect(requests).toHaveLength(1)
    autosave.keepMine()
    expect(requests[1]).toMatchObject({ version: 7, content: content(22e3) })
  })

  it('goes on from theirs when it is taken', async () => {
    const { autosave, requests, last } = setUp()
    const theirs = draft(7, content(33e3))
    autosave.change(content(21e3))
    await rest()
    requests[0]!.refuse(problem(409, 'stale-draft', { draft: theirs }))
    await rest(0)
    autosave.adopt(theirs)
    expect(last()).toEqual({ kind: 'saved', at: theirs.savedAt })
    expect(autosave.pending()).toBe(false)
    autosave.change(content(34e3))
    await rest()
    expect(requests[1]).toMatchObject({ version: 7, content: content(34e3) })
  })

  it('says why the server refused, and tries again after the next edit or when told', async () => {
    const { autosave, requests, last } = setUp()
    autosave.change(content(21e3))
    await rest()
    requests[0]!.refuse(problem(401, 'signed-out'))
    await rest(0)
    expect(last()).toEqual({ kind: 'refused', sentence: 'Refused: signed-out.' })
    autosave.retry()
    expect(requests).toHaveLength(2)
  })

  it('sends what waits when the sheet is left', async () => {
    const { autosave, requests, statuses } = setUp()
    autosave.change(content(21e3))
    autosave.dispose()
    expect(requests).toHaveLength(1)
    const told = statuses.length
    requests[0]!.answer()
    await rest(10 * restTime)
    expect(requests).toHaveLength(1)
    expect(statuses.length).toBe(told)
  })
})

describe('draftCopies', () => {
  function storage(): Storage {
    const items = new Map<string, string>()
    return {
      getItem: (key: string) => items.get(key) ?? null,
      setItem: (key: string, value: string) => void items.set(key, value),
      removeItem: (key: string) => void items.delete(key),
    } as Storage
  }

  it('gives back what was kept, to the same person for the same design only', () => {
    const store = storage()
    draftCopies(2, 1, store).keep(3, content(21e3))
    expect(draftCopies(2, 1, store).read()).toMatchObject({ version: 3, content: content(21e3) })
    expect(draftCopies(3, 1, store).read()).toBeNull()
    expect(draftCopies(2, 2, store).read()).toBeNull()
    draftCopies(2, 1, store).forget()
    expect(draftCopies(2, 1, store).read()).toBeNull()
  })

  it('ignores what is not a valid copy and says when nothing could be kept', () => {
    const read = (text: string) => draftCopies(2, 1, { ...storage(), getItem: () => text }).read()
    expect(read('{"version":')).toBeNull()
    expect(read('{"version":1}')).toBeNull()
    const full = {
      ...storage(),
      setItem: () => {
        throw new DOMException('The quota has been exceeded.')
      },
    }
    expect(draftCopies(2, 1, full).keep(1, startingDraft)).toBe(false)
    expect(draftCopies(2, 1, storage()).keep(1, startingDraft)).toBe(true)
  })

  it('compares values, not the order that they are written in', () => {
    const { circuit, ...rest } = startingDraft
    expect(sameContent({ ...rest, circuit }, startingDraft)).toBe(true)
    expect(sameContent(content(21e3), startingDraft)).toBe(false)
  })
})
