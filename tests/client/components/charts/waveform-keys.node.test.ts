import { describe, expect, it } from 'vitest'
import { keyChange, placedCursor, type ChartState } from '#client/components/charts/waveform-keys.ts'

const state: ChartState = {
  view: [20e-3, 40e-3],
  whole: [0, 60e-3],
  sampleInterval: 1e-6,
  cursors: [null, null],
  active: null,
}
const press = (key: string, more: Partial<ChartState> = {}, shift = false) =>
  keyChange(key, shift, { ...state, ...more })
const near = (value: number) => expect.closeTo(value, 12) as number

describe('keyChange', () => {
  it('pans by a tenth of the view, with Shift by a hundredth', () => {
    expect(press('ArrowRight')).toEqual({ view: [near(22e-3), near(42e-3)] })
    expect(press('ArrowLeft', {}, true)).toEqual({ view: [near(19.8e-3), near(39.8e-3)] })
  })

  it('zooms about the middle, or about the active cursor', () => {
    expect(press('+')).toEqual({ view: [near(25e-3), near(35e-3)] })
    expect(press('-')).toEqual({ view: [near(10e-3), near(50e-3)] })
    expect(press('=', { cursors: [20e-3, null], active: 0 })).toEqual({ view: [near(20e-3), near(30e-3)] })
  })

  it('shows the whole record with 0, and its ends with Home and End', () => {
    expect(press('0')).toEqual({ view: [0, 60e-3] })
    expect(press('Home')).toEqual({ view: [0, near(20e-3)] })
    expect(press('End')).toEqual({ view: [near(40e-3), near(60e-3)] })
  })

  it('places a cursor in the middle with 1 or 2, and finds it again when it is out of sight', () => {
    expect(press('1')).toEqual({ active: 0, cursors: [near(30e-3), null] })
    expect(press('2', { cursors: [null, 50e-3] })).toEqual({ active: 1, view: [near(30e-3), near(50e-3)] })
  })

  it('moves the active cursor by a two-hundredth of the view, with Shift by one sample', () => {
    const active = { cursors: [30e-3, null], active: 0 } as const
    expect(press('ArrowRight', active)?.cursors).toEqual([near(30.1e-3), null])
    expect(press('ArrowLeft', active, true)?.cursors).toEqual([near(29.999e-3), null])
  })

  it('takes the view along when the cursor leaves it, and stops at the end of the record', () => {
    const change = press('ArrowRight', { cursors: [null, 40e-3], active: 1 })
    expect(change?.view).toEqual([near(20.1e-3), near(40.1e-3)])
    expect(press('ArrowRight', { cursors: [null, 60e-3], active: 1 })?.cursors).toEqual([null, 60e-3])
  })

  it('removes the active cursor with Delete and lets go of it with Escape', () => {
    const active = { cursors: [30e-3, 31e-3], active: 1 } as const
    expect(press('Delete', active)).toEqual({ cursors: [30e-3, null], active: null })
    expect(press('Escape', active)).toEqual({ active: null })
  })

  it('leaves other keys to the page', () => {
    for (const key of ['a', 'Tab', 'Enter', 'ArrowUp', 'Escape', 'Delete']) expect(press(key)).toBeNull()
  })
})

describe('placedCursor', () => {
  it('sets the free one first, then the nearer, or always the active one', () => {
    expect(placedCursor([null, null], null, 1)).toEqual([1, null])
    expect(placedCursor([1, null], null, 2)).toEqual([1, 2])
    expect(placedCursor([1, 2], null, 1.8)).toEqual([1, 1.8])
    expect(placedCursor([1, 2], 0, 1.8)).toEqual([1.8, 2])
  })
})
