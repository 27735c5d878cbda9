import { act, screen, waitFor, within } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { draftCopies } from '#client/features/sheet/draft-copy.ts'
import type { RecordResult } from '#client/lib/engine-context.ts'
import type { Draft } from '#shared/schemas/design.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'
import type { Failure } from '#sim/types.ts'
import { startingDraft } from '#shared/starting-draft.ts'
import { axeViolations } from '#tests/support/axe.ts'
import { sessionQueries } from '#client/lib/session.ts'
import { aFullDesign, aSession } from '#tests/support/client-data.ts'
import { answer, problem } from '#tests/support/fake-api.ts'
import {
  fakeEngine,
  inventedRecord,
  renderSheet,
  settled,
} from '#tests/client/features/sheet/support/render-sheet.tsx'

beforeEach(() => localStorage.clear())
afterEach(() => {
  vi.unstubAllGlobals()
  vi.restoreAllMocks()
})

const field = (name: string) => screen.getByRole('textbox', { name })
const content = () => JSON.parse(screen.getByLabelText('Saved content').textContent) as Circuit
const line = () => screen.getByLabelText('Figures')
const sentence = () => screen.getByText(/^It (starts|does not start|runs)/).closest('p')
const alert = (text: RegExp | string) => screen.findByText(text)

describe('the answers', () => {
  it('stand in a sentence and six figures', async () => {
    await renderSheet()
    await waitFor(() =>
      expect(sentence()).toHaveTextContent('reaches 90 % of its level after 42.6 ms; the rails stop'),
    )
    for (const figure of ['Gain margin', 'Time to 90 %', 'Frequency', 'Level, peak', 'THD', 'Held at rails'])
      expect(within(line()).getByText(figure)).toBeVisible()
    expect(line()).toHaveTextContent('+1.66%')
    expect(line()).toHaveTextContent('26.9%')
  })

  it('explain each figure in the words of the list of figures', async () => {
    const { user } = await renderSheet()
    await user.click(screen.getByRole('button', { name: 'THD: what it means' }))
    expect(await screen.findByText(/Root sum of squares of harmonics 2 to 20/)).toBeVisible()
  })

  it('never show gain and ratio without their words', async () => {
    await renderSheet()
    const gain = screen.getByText('Closed-loop gain').closest('div')
    expect(gain).toHaveTextContent('3.05= 1 + feedback R ÷ ground R')
    expect(screen.getByText('Resistor ratio').closest('div')).toHaveTextContent('2.05 : 1= 20.5 kΩ ÷ 10 kΩ')
  })

  it('follow the small signal at once and mark older figures while a record is computed', async () => {
    let finish: (result: RecordResult) => void = () => undefined
    const engine = fakeEngine(() => new Promise((resolve) => (finish = resolve)))
    const { user } = await renderSheet({ engine })
    await act(async () => finish(inventedRecord(settled)))
    await user.clear(field('feedback R'))
    await user.type(field('feedback R'), '19k')
    await waitFor(() => expect(sentence()).toHaveTextContent(/^It does not start/))
    expect(within(line()).getAllByText(', of the values before')).toHaveLength(5)
    expect(line()).toHaveAttribute('aria-busy', 'true')
    await act(async () => finish(inventedRecord({})))
    expect(line()).toHaveAttribute('aria-busy', 'false')
    expect(within(line()).queryByText(', of the values before')).toBeNull()
  })

  it('say what happened when the worker died, and go on with the next edit', async () => {
    let dying = true
    const engine = fakeEngine(() =>
      dying
        ? Promise.reject(new Error('The computation stopped unexpectedly.'))
        : Promise.resolve(inventedRecord(settled)),
    )
    const { user } = await renderSheet({ engine })
    await waitFor(() => expect(line()).toHaveAttribute('aria-busy', 'false'))
    dying = false
    await user.type(field('feedback R'), '{ArrowUp}')
    await waitFor(() => expect(line()).toHaveTextContent('7.5V'))
  })
})

describe('typing values', () => {
  it('reads engineering notation, steps along the series, and finely with Shift', async () => {
    const { user } = await renderSheet()
    await user.clear(field('ground R'))
    await user.type(field('ground R'), '4k7')
    expect(content().gain.groundR).toBe(4700)
    await user.keyboard('{ArrowUp}')
    expect(content().gain.groundR).toBe(5100)
    await user.keyboard('{Shift>}{ArrowDown}{/Shift}')
    expect(content().gain.groundR).toBe(5099)
    await user.tab()
    expect(field('ground R')).toHaveValue('5.099k')
  })

  it('keeps wrong text in its field, says what is wrong there, and goes on with the last valid circuit', async () => {
    const { user, saved } = await renderSheet()
    await user.clear(field('series R'))
    await user.type(field('series R'), '4q7')
    await user.tab()
    expect(field('series R')).toHaveValue('4q7')
    expect(field('series R')).toBeInvalid()
    expect(field('series R')).toHaveAccessibleDescription(
      '“4q7” is not a number with a prefix such as 4k7, 100n or 0.1u.',
    )
    // The 4 on the way there was a value for a moment; nothing of it stays.
    expect(content()).toEqual(startingDraft.circuit)
    expect(saved()).toHaveLength(0)
    expect(await screen.findByText('not saved: mend the marked field', {}, { timeout: 3000 })).toBeVisible()
  })

  it('lists what is wrong in the drawing under it, each sentence with its part', async () => {
    const { user, container } = await renderSheet()
    await user.clear(field('feedback R'))
    await user.type(field('feedback R'), '4q7')
    await user.clear(field('ground R'))
    await user.type(field('ground R'), '0')
    const list = screen.getByRole('list', { name: 'Values to mend in the drawing' })
    expect(
      within(list)
        .getAllByRole('alert')
        .map((one) => one.textContent),
    ).toEqual([
      'feedback R: “4q7” is not a number with a prefix such as 4k7, 100n or 0.1u.',
      'Ground R must be greater than zero.',
    ])
    // Trim and gain stay with the last valid circuit, as everything that is computed does.
    expect(screen.getByText('Closed-loop gain').closest('div')).toHaveTextContent('3.05')
    expect(screen.queryByText('no gain sustains this loop')).toBeNull()
    expect(await axeViolations(container)).toEqual([])
    await user.clear(field('feedback R'))
    await user.type(field('feedback R'), '21k')
    expect(within(list).getAllByRole('alert')).toHaveLength(1)
  })

  it('shows the schema’s refusals at the field', async () => {
    const { user } = await renderSheet()
    await user.clear(field('series R'))
    await user.type(field('series R'), '0')
    expect(field('series R')).toHaveAccessibleDescription('Series R must be greater than zero.')
    expect(content()).toEqual(startingDraft.circuit)
  })

  it('shows the engine’s own refusals at the field', async () => {
    const failure: Failure = {
      kind: 'invalid',
      path: ['timing', 'duration'],
      sentence: 'Duration spans 1e6 periods: at most 20000 are computed.',
    }
    const { user } = await renderSheet({ engine: fakeEngine(() => Promise.resolve(failure)) })
    await user.type(field('Duration'), '1000')
    await waitFor(() => expect(field('Duration')).toHaveAccessibleDescription(failure.sentence))
  })

  it('edits both arms while ganged and states the mismatch when split', async () => {
    const { user } = await renderSheet()
    await user.type(field('series C'), '{ArrowUp}')
    expect(content().network).toMatchObject({ seriesC: 18e-9, shuntC: 18e-9 })
    await user.click(
      screen
        .getByRole('radio', { name: 'Split', checked: false })
        .closest('fieldset')!
        .querySelector('input[value=split]')!,
    )
    await user.clear(field('shunt R'))
    await user.type(field('shunt R'), '10k1')
    expect(content().network).toMatchObject({ seriesR: 10e3, shuntR: 10.1e3 })
    expect(screen.getByText(/Mismatch/).closest('p')).toHaveTextContent('R +1 %')
  })

  it('moves feedback R by the trim from the keyboard', async () => {
    const { user } = await renderSheet()
    const trim = await screen.findByRole('slider', { name: 'Gain trim, feedback R' })
    trim.focus()
    await user.keyboard('{ArrowLeft}')
    expect(content().gain.feedbackR).toBeLessThan(20.5e3)
    expect(content().gain.feedbackR).toBeGreaterThan(20.4e3)
    await waitFor(() =>
      expect(trim).toHaveAttribute('aria-valuetext', expect.stringContaining('gain margin +')),
    )
  })

  it('undoes and redoes by keyboard, a typed value being one step', async () => {
    const { user } = await renderSheet()
    await user.clear(field('ground R'))
    await user.type(field('ground R'), '12k')
    await user.keyboard('{Control>}z{/Control}')
    expect(content().gain.groundR).toBe(10e3)
    expect(field('ground R')).toHaveValue('10k')
    await user.keyboard('{Control>}{Shift>}z{/Shift}{/Control}')
    expect(content().gain.groundR).toBe(12e3)
    await user.click(screen.getByRole('button', { name: 'Undo' }))
    expect(content().gain.groundR).toBe(10e3)
  })
})

describe('saving', () => {
  it('saves by itself and says so', async () => {
    const { user, saved } = await renderSheet()
    await user.type(field('ground R'), '{ArrowUp}')
    expect(screen.getByText('unsaved changes')).toBeVisible()
    await waitFor(() => expect(saved()).toHaveLength(1), { timeout: 3000 })
    expect(saved()[0]?.body).toMatchObject({ version: 1, content: { circuit: { gain: { groundR: 11e3 } } } })
    expect(await screen.findByText('draft, saved just now')).toBeVisible()
  })

  it('shows both sides of a conflict and takes the one that is chosen', async () => {
    const { user, api, saved, design } = await renderSheet()
    const theirs: Draft = {
      version: 5,
      content: { ...startingDraft, series: 'E96' },
      savedBy: { id: 2, name: 'Ruben Achterberg' },
      savedAt: '2026-03-12T10:00:00.000Z',
    }
    const route = `PUT /api/designs/${design.id}/draft`
    api.set(route, problem(409, 'stale-draft', { draft: theirs }))
    await user.type(field('ground R'), '{ArrowUp}')
    const dialog = await screen.findByRole('dialog', {}, { timeout: 3000 })
    expect(dialog).toHaveTextContent('Ruben Achterberg')
    expect(within(dialog).getByRole('row', { name: /Ground R 11.kΩ 10.kΩ/ })).toBeVisible()
    expect(within(dialog).getByRole('row', { name: /Preferred series E24 E96/ })).toBeVisible()
    expect(await axeViolations(dialog)).toEqual([])
    api.set(route, answer({ ...theirs, version: 6 }))
    await user.click(within(dialog).getByRole('button', { name: 'Keep mine, save over' }))
    await waitFor(() => expect(saved()).toHaveLength(2))
    expect(saved()[1]?.body).toMatchObject({ version: 5, content: { circuit: { gain: { groundR: 11e3 } } } })
  })

  it('takes theirs, and Undo brings mine back', async () => {
    const { user, api, design } = await renderSheet()
    const theirs = {
      ...aFullDesign().draft,
      version: 5,
      content: { ...startingDraft, series: 'E96' as const },
    }
    api.set(`PUT /api/designs/${design.id}/draft`, problem(409, 'stale-draft', { draft: theirs }))
    await user.type(field('ground R'), '{ArrowUp}')
    await user.click(await screen.findByRole('button', { name: 'Take theirs' }, { timeout: 3000 }))
    expect(content().gain.groundR).toBe(10e3)
    await user.click(screen.getByRole('button', { name: 'Undo' }))
    expect(content().gain.groundR).toBe(11e3)
  })

  it('keeps edits in the browser while the server is away and offers them again', async () => {
    const first = await renderSheet()
    first.api.away()
    await first.user.type(field('ground R'), '{ArrowUp}')
    expect(await alert(/^offline/)).toBeVisible()
    first.unmount()
    const second = await renderSheet()
    expect(screen.getByText('Edits of an earlier visit were not saved')).toBeVisible()
    await second.user.click(screen.getByRole('button', { name: 'Bring them back' }))
    expect(content().gain.groundR).toBe(11e3)
    await waitFor(() => expect(second.saved()).toHaveLength(1), { timeout: 3000 })
  })

  it('saves what an ended session kept from being saved, once somebody is signed in again', async () => {
    const { user, api, saved, client, design } = await renderSheet()
    const route = `PUT /api/designs/${design.id}/draft`
    api.set(route, problem(401, 'signed-out', { detail: 'The session has ended.' }))
    await user.type(field('ground R'), '{ArrowUp}')
    expect(await screen.findByText('not saved: The session has ended.', {}, { timeout: 3000 })).toBeVisible()
    api.set(route, answer({ ...design.draft, version: 2, savedAt: new Date().toISOString() }))
    act(
      () =>
        void client.setQueryData(
          sessionQueries.current().queryKey,
          aSession('engineer', { csrfToken: 'new' }),
        ),
    )
    await waitFor(() => expect(saved()).toHaveLength(2))
    expect(await screen.findByText('draft, saved just now')).toBeVisible()
    expect(content().gain.groundR).toBe(11e3)
  })

  it('forgets a copy that is not wanted', async () => {
    const copies = draftCopies(1, aFullDesign().id, localStorage)
    copies.keep(1, { ...startingDraft, series: 'E6' })
    const { user } = await renderSheet()
    await user.click(screen.getByRole('button', { name: 'Discard' }))
    expect(copies.read()).toBeNull()
  })
})

describe('who may edit', () => {
  it('lets a technician read', async () => {
    await renderSheet({ role: 'technician' })
    expect(screen.getByText(/Editing it needs the role of an engineer/)).toBeVisible()
    expect(field('series R')).toHaveAttribute('readonly')
    expect(screen.queryByRole('button', { name: 'Undo' })).toBeNull()
    expect(await screen.findByRole('slider')).toHaveAttribute('data-disabled')
  })

  it('lets nobody edit an archived design', async () => {
    await renderSheet({ design: aFullDesign({ archived: true }) })
    expect(screen.getByText(/This design is archived/)).toBeVisible()
    expect(field('series R')).toHaveAttribute('readonly')
  })
})

describe('accessibility', () => {
  it.each(['none', 'diodes', 'lamp'])('has no violations with %s', async (kind) => {
    const { user, container } = await renderSheet()
    await user.selectOptions(screen.getByRole('combobox', { name: 'Amplitude control' }), kind)
    await user.click(screen.getByRole('button', { name: 'Add load' }))
    expect(await axeViolations(container)).toEqual([])
  })
})
