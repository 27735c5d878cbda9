/** Reading a stored record: its bytes, their caching, and the CSV. */
import { gunzipSync } from 'node:zlib'

import { once } from 'node:events'
import { get, type IncomingMessage } from 'node:http'
import Papa from 'papaparse'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Design } from '#server/db/models/design.ts'
import type { Run } from '#shared/schemas/run.ts'
import { simulateRun, type Simulation } from '#sim/index.ts'
import { engineersHeaders, runBody, shortInputs, storeRun } from '#tests/server/runs/saving.ts'
import type { Agent } from '#tests/support/agent.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

const inputs = { ...shortInputs, timing: { duration: 20e-3, sampleInterval: 5e-6 } }

let server: TestServer
let engineer: Agent
let run: Run
let design: Design
beforeAll(async () => {
  server = await startTestServer({ config: { logLevel: 'error' } })
  engineer = await server.signInAs('engineer')
  design = await server.createDesign()
  const answer = await engineer.post('/api/runs', runBody(design, { title: '=HYPERLINK("x")/ü', inputs }))
  run = answer.body as Run
})
afterAll(() => server.close())

/** Little-endian doubles, column after column, read without our own codec. */
function doubles(bytes: Buffer): number[] {
  return Array.from({ length: bytes.length / 8 }, (_, index) => bytes.readDoubleLE(index * 8))
}

describe('GET /api/runs/:id/record', () => {
  const read = () => engineer.get(`/api/runs/${run.id}/record`).responseType('blob')

  it('holds the columns as little-endian doubles, one column after the other', async () => {
    const { vo, v1, v2 } = simulateRun(inputs) as Simulation
    const answer = await read()
    expect(answer.type).toBe('application/octet-stream')
    expect(answer.get('Content-Encoding')).toBe('gzip')
    expect(doubles(answer.body as Buffer)).toEqual([...vo, ...v1, ...v2])
  })

  it('is sent unpacked to a client that takes no gzip', async () => {
    const packed = await read()
    const plain = await read().set('Accept-Encoding', 'identity')
    expect(plain.get('Content-Encoding')).toBeUndefined()
    expect((plain.body as Buffer).equals(packed.body as Buffer)).toBe(true)
    expect(plain.get('ETag')).not.toBe(packed.get('ETag'))
  })

  it('sends the stored bytes untouched', async () => {
    const stored = await server.context.database.models.RunRecord.findByPk(run.id)
    const answer = await read()
    expect(answer.get('Content-Length')).toBe(String(stored!.bytes.length))
    expect(gunzipSync(stored!.bytes).equals(answer.body as Buffer)).toBe(true)
  })

  it('is kept by the browser alone, which asks again and gets 304 (RFC 9110 §15.4.5)', async () => {
    const first = await read()
    expect(first.get('Cache-Control')).toMatch(/^private, no-cache/)
    expect(first.get('ETag')).toMatch(/^"run-.+"$/)
    const again = await read().set('If-None-Match', first.get('ETag')!)
    expect(again.status).toBe(304)
    const other = await read().set('If-None-Match', '"run-0-0"')
    expect(other.status).toBe(200)
  })
})

describe('GET /api/runs/:id/export.csv', () => {
  it('holds the record with its units, as another reader understands it', async () => {
    const { vo, v1, v2 } = simulateRun(inputs) as Simulation
    const answer = await engineer.get(`/api/runs/${run.id}/export.csv`)
    expect(answer.get('Content-Type')).toBe('text/csv; charset=utf-8')
    const { data, errors } = Papa.parse<(string | number)[]>(answer.text, {
      dynamicTyping: true,
      skipEmptyLines: true,
    })
    expect(errors).toEqual([])
    const [header, ...rows] = data
    expect(header).toEqual(['time (s)', 'output (V)', 'network node (V)', 'series capacitor (V)'])
    expect(rows).toHaveLength(4001)
    const column = (index: number) => rows.map((row) => row[index])
    expect(column(1)).toEqual([...vo])
    expect(column(2)).toEqual([...v1])
    expect(column(3)).toEqual([...v2])
    expect(rows[3]![0]).toBe(15e-6)
    expect(rows.at(-1)![0]).toBe(20e-3)
  })

  it('is a download with a harmless name', async () => {
    const answer = await engineer.get(`/api/runs/${run.id}/export.csv`)
    const disposition = answer.get('Content-Disposition')!
    expect(disposition).toMatch(/^attachment; filename="HYPERLINK x/)
    // RFC 6266: the name with its umlaut, percent-encoded UTF-8.
    expect(disposition).toContain(`filename*=UTF-8''HYPERLINK%20x%20%C3%BC%20%28run%20${run.id}%29.csv`)
  })

  it('serves the next reader after one that left in the middle', async () => {
    const id = await storeRun(server, design, engineer.person!, { samples: 250_001 })
    const leaving = get(`${server.url}/api/runs/${id}/export.csv`, {
      headers: await engineersHeaders(server),
    })
    const [answer] = (await once(leaving, 'response')) as [IncomingMessage]
    await once(answer, 'data')
    answer.destroy()
    expect((await engineer.get(`/api/runs/${run.id}/export.csv`)).status).toBe(200)
    expect(server.logged).toEqual([])
  })
})
