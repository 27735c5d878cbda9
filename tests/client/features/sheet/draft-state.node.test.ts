import { describe, expect, it } from 'vitest'
import { beginDraft, draftReducer, refusals, type DraftAction } from '#client/features/sheet/draft-state.ts'
import { fieldError, fieldOf } from '#client/features/sheet/fields.ts'
import { startingDraft } from '#shared/starting-draft.ts'

const run = (...actions: DraftAction[]) => actions.reduce(draftReducer, beginDraft(startingDraft))
const set = (name: 'seriesR' | 'positive' | 'feedbackR', value: number): DraftAction => ({
  type: 'edit',
  change: (content) => fieldOf(name).write(content, value),
  step: name,
  field: fieldOf(name).key,
})
const refuse: DraftAction = {
  type: 'refuse',
  field: 'seriesR',
  text: { text: '4q7', sentence: '“4q7” is not a number.' },
}

describe('draftReducer', () => {
  it('takes a valid edit as content to compute and save', () => {
    expect(run(set('feedbackR', 21e3)).valid.circuit.gain.feedbackR).toBe(21e3)
  })

  it.each([
    ['zero', 0],
    ['a negative value', -5],
    ['an absurd value, 1 TΩ', 1e12],
  ])('keeps the last valid content beside %s, which stays in the field', (_name, value) => {
    const state = run(set('seriesR', value))
    expect(state.valid).toBe(startingDraft)
    expect(state.history.present.content.circuit.network.seriesR).toBe(value)
  })

  it('keeps refused text until the field holds a number again', () => {
    const refused = run(refuse)
    expect(refused.history.present.refused.seriesR?.text).toBe('4q7')
    expect(refused.valid).toBe(startingDraft)
    expect(draftReducer(refused, set('feedbackR', 21e3)).history.present.refused.seriesR?.text).toBe('4q7')
    expect(draftReducer(refused, set('seriesR', 4700)).history.present.refused).toEqual({})
  })

  it('undoes refused text and invalid values like everything else', () => {
    const state = run(set('seriesR', 0), { type: 'undo' })
    expect(state.history.present.content).toBe(startingDraft)
    expect(run(refuse, { type: 'undo' }).history.present.refused).toEqual({})
    expect(run(set('seriesR', 4700), { type: 'undo' }, { type: 'redo' }).valid.circuit.network.seriesR).toBe(
      4700,
    )
  })

  it('brings one’s own values back by undo after the other side was taken', () => {
    const theirs = { ...startingDraft, series: 'E96' as const }
    const state = run(set('feedbackR', 21e3), { type: 'replace', content: theirs })
    expect(state.valid).toBe(theirs)
    expect(draftReducer(state, { type: 'undo' }).valid.circuit.gain.feedbackR).toBe(21e3)
  })

  it('begins anew when content comes from elsewhere unasked', () => {
    const state = run(set('feedbackR', 21e3), { type: 'reset', content: startingDraft })
    expect(state.history.past).toEqual([])
  })
})

describe('refusals and fieldError', () => {
  const errorOf = (name: 'seriesR' | 'positive', value: number) => {
    const { content } = run(set(name, value)).history.present
    return fieldError(fieldOf(name), content, refusals(content))
  }

  it('say at the field what is wrong', () => {
    expect(errorOf('seriesR', 0)).toBe('Series R must be greater than zero.')
    expect(errorOf('seriesR', 1e12)).toBe('Series R must be at most 1\u2009GΩ.')
    expect(errorOf('positive', 1)).toBe(
      'The positive supply must exceed the upper headroom, or the output cannot move.',
    )
    expect(errorOf('seriesR', 10e3)).toBeNull()
  })
})
