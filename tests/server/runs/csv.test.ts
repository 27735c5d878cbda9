/** The CSV export against another reader (papaparse) and the rules of RFC 4180. */
import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { csvChunks, downloadName } from '#server/features/runs/csv.ts'

const layout = {
  sampleInterval: 2e-6,
  samples: 2501,
  columns: [
    { name: 'output', unit: 'V' },
    { name: 'network node', unit: 'V' },
  ],
}
const output = Float64Array.from(
  { length: layout.samples },
  (_, i) => -7.5 * Math.cos(i / 7) * 1e-3 ** (i % 5),
)
const node = output.map((value) => value / 3)

describe('csvChunks', () => {
  const text = [...csvChunks(layout, [output, node])].join('')

  it('is read back by a CSV reader as the very same numbers', () => {
    const { data, errors } = Papa.parse<number[]>(text, { dynamicTyping: true, skipEmptyLines: true })
    expect(errors).toEqual([])
    expect(data[0]).toEqual(['time (s)', 'output (V)', 'network node (V)'])
    expect(data).toHaveLength(layout.samples + 1)
    expect(data.slice(1).map((row) => row[1])).toEqual([...output])
    expect(data.slice(1).map((row) => row[2])).toEqual([...node])
  })

  it('writes round times without the dust of index × interval', () => {
    expect(5 * layout.sampleInterval).not.toBe(10e-6)
    const times = text.split('\r\n').map((row) => row.split(',')[0])
    expect(times[6]).toBe('0.00001')
    expect(times[2501]).toBe('0.005')
  })

  it('ends every line with CR LF, the last one too (RFC 4180 §2)', () => {
    expect(text.endsWith('\r\n')).toBe(true)
    expect(text.replaceAll('\r\n', '')).not.toMatch(/[\r\n]/)
  })

  it('comes in pieces', () => {
    expect([...csvChunks(layout, [output, node])]).toHaveLength(4)
  })

  it('quotes a column name that a spreadsheet would run as a formula', () => {
    const hostile = { ...layout, samples: 1, columns: [{ name: '=1+1', unit: 'V' }] }
    const [header] = csvChunks(hostile, [Float64Array.of(1)])
    expect(header).toBe(`time (s),"'=1+1 (V)"\r\n`)
  })
})

describe('downloadName', () => {
  it.each([
    ['Power-on as drawn', 'Power-on as drawn (run 7).csv'],
    ['../../etc/passwd', 'etc passwd (run 7).csv'],
    ['=cmd|calc!A1', 'cmd calc A1 (run 7).csv'],
    ['Start "quoted"\r\nX-Header: 1', 'Start quoted X-Header 1 (run 7).csv'],
    ['Überprüfung 1 kΩ', 'Überprüfung 1 kΩ (run 7).csv'],
    ['..', 'run (run 7).csv'],
    ['x'.repeat(200), `${'x'.repeat(80)} (run 7).csv`],
  ])('makes %j safe', (title, expected) => {
    expect(downloadName(title, 7)).toBe(expected)
  })
})
