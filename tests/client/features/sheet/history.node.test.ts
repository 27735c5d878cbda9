import { describe, expect, it } from 'vitest'
import { advance, begin, depth, redo, seal, undo } from '#client/features/sheet/history.ts'

describe('history', () => {
  it('undoes and redoes step by step', () => {
    const edited = advance(advance(begin(1), 2, null), 3, null)
    expect(undo(edited).present).toBe(2)
    expect(undo(undo(undo(edited))).present).toBe(1)
    expect(redo(undo(edited)).present).toBe(3)
    expect(redo(edited)).toBe(edited)
  })

  it('forgets what was undone once something else is done', () => {
    const branched = advance(undo(advance(begin(1), 2, null)), 9, null)
    expect(branched.future).toEqual([])
    expect(undo(branched).present).toBe(1)
  })

  it('makes one step of a drag, and another after it was let go', () => {
    let drag = begin(0)
    for (const position of [1, 2, 3]) drag = advance(drag, position, 'trim')
    drag = seal(drag)
    for (const position of [4, 5]) drag = advance(drag, position, 'trim')
    expect(undo(drag).present).toBe(3)
    expect(undo(undo(drag)).present).toBe(0)
  })

  it('keeps steps of different names apart', () => {
    const typed = advance(advance(begin('a'), 'b', 'seriesR'), 'c', 'shuntR')
    expect(undo(typed).present).toBe('b')
  })

  it('remembers a limited number of steps', () => {
    let long = begin(0)
    for (let i = 1; i <= depth + 50; i += 1) long = advance(long, i, null)
    expect(long.past).toHaveLength(depth)
    expect(long.past[0]).toBe(50)
  })
})
