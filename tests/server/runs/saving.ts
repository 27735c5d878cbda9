/** What the tests of saved runs share. */
import type { Design } from '#server/db/models/design.ts'
import type { Person } from '#server/db/models/person.ts'
import { runsRepository } from '#server/features/runs/repository.ts'
import { encodeColumns } from '#shared/record-codec.ts'
import { figureKeys, type Figures } from '#shared/figures.ts'
import type { CreateRun } from '#shared/schemas/run.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'
import { startingDraft } from '#shared/starting-draft.ts'
import { gzipSync } from 'node:zlib'
import type { Session } from '#shared/schemas/account.ts'
import { testPassword } from '#tests/support/factories.ts'
import type { TestServer } from '#tests/support/server.ts'

/** A few periods of the starting circuit: computed in some milliseconds. */
export const shortInputs: RunInputs = {
  circuit: startingDraft.circuit,
  stimulus: { kind: 'kick', voltage: 1 },
  timing: { duration: 4e-3, sampleInterval: 10e-6 },
}

export const runBody = (design: { id: number }, changes: Partial<CreateRun> = {}) => ({
  designId: design.id,
  title: 'A run',
  note: '',
  inputs: shortInputs,
  ...changes,
})

/** Puts a run straight into the database. Record and figures are made up: for tests of everything but computing. */
export function storeRun(
  { context }: TestServer,
  design: Design,
  author: Person,
  { title = 'A stored run', note = '', samples = 3 } = {},
): Promise<number> {
  const output = Float64Array.from({ length: samples }, (_, index) => Math.sin(index))
  const columns = [output, output.map((value) => value / 3)]
  const computed = {
    kind: 'computed' as const,
    engineVersion: '0.0.0-test',
    figures: Object.fromEntries(figureKeys.map((key) => [key, 1])) as Figures,
    modes: [{ mode: 'linear' as const, start: 0, end: 2e-6 }],
    unsettled: null,
    record: {
      sampleInterval: 1e-6,
      samples,
      columns: [
        { name: 'output', unit: 'V' },
        { name: 'network node', unit: 'V' },
      ],
    },
    bytes: new Uint8Array(gzipSync(encodeColumns(columns))),
  }
  const body = { designId: design.id, title, note, inputs: shortInputs }
  return context.database.write((transaction) =>
    runsRepository(context).create(body, computed, author.id, context.clock(), transaction),
  )
}

/** Headers of an engineer's requests, for connections that a test opens and cuts by itself. */
export async function engineersHeaders(server: TestServer): Promise<Record<string, string>> {
  const { email } = await server.createPerson('engineer')
  const answer = await server.agent().post('/api/session', { email, password: testPassword })
  const [cookie] = answer.get('Set-Cookie')![0]!.split(';')
  return { Cookie: cookie!, 'X-CSRF-Token': (answer.body as Session).csrfToken }
}
