import { describe, expect, it } from 'vitest'
import { readViewState, writeViewState } from '#client/lib/view-params.ts'

const whole = [0, 0.18] as const
const params = (text: string) => new URLSearchParams(text)

describe('view in the address', () => {
  it('shows the whole record when the address says nothing', () => {
    expect(readViewState(params(''), whole)).toEqual({ view: [0, 0.18], cursors: [null, null], time: null })
  })

  it('comes back as it was written', () => {
    const state = { view: [0.05, 0.06] as const, cursors: [0.051, null] as const, time: 0.0523 }
    const address = writeViewState(params('a=1'), state, whole)
    expect(address.toString()).toBe('a=1&from=0.05&to=0.06&c1=0.051&t=0.0523')
    expect(readViewState(address, whole)).toEqual(state)
  })

  it('leaves what is usual out, and removes what no longer holds', () => {
    const state = { view: whole, cursors: [null, null] as const, time: null }
    expect(writeViewState(params('from=0.1&to=0.12&c1=1&c2=2&t=3'), state, whole).toString()).toBe('')
  })

  it.each(['from=-1', 'to=9', 'from=x', 'from=0.1&to=0.05', 'from=', 'from=NaN&to=Infinity'])(
    'falls back to the whole record for %s',
    (text) => {
      expect(readViewState(params(text), whole).view).toEqual([0, 0.18])
    },
  )
})
