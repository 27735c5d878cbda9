/** What a waveform page shows, as its address holds it: span, cursors and playhead, in seconds from power-on. */

/** Visible span of time, [from, to], s. */
export type View = readonly [from: number, to: number]
/** The two cursors; null while one is not placed. */
export type Cursors = readonly [first: number | null, second: number | null]

export interface ViewState {
  view: View
  cursors: Cursors
  /** Where the playhead stands; null on pages without one. */
  time: number | null
}

/** Significant digits of a time in an address: a sample in a million, and something to spare. */
const digits = 9

function read(params: URLSearchParams, key: string, [from, to]: View): number | null {
  const text = params.get(key)
  const value = text === null || text.trim() === '' ? NaN : Number(text)
  return value >= from && value <= to ? value : null
}

/** The state that the address asks for; what lies outside `whole` or makes no sense is left out. */
export function readViewState(params: URLSearchParams, whole: View): ViewState {
  const from = read(params, 'from', whole) ?? whole[0]
  const to = read(params, 'to', whole) ?? whole[1]
  return {
    view: from < to ? [from, to] : whole,
    cursors: [read(params, 'c1', whole), read(params, 'c2', whole)],
    time: read(params, 't', whole),
  }
}

/** The address that shows this state; the whole record and cursors not placed leave nothing in it. */
export function writeViewState(params: URLSearchParams, state: ViewState, whole: View): URLSearchParams {
  const next = new URLSearchParams(params)
  const write = (key: string, value: number | null) => {
    if (value === null) next.delete(key)
    else next.set(key, String(Number(value.toPrecision(digits))))
  }
  const [from, to] = state.view
  write('from', from > whole[0] ? from : null)
  write('to', to < whole[1] ? to : null)
  write('c1', state.cursors[0])
  write('c2', state.cursors[1])
  write('t', state.time)
  return next
}
