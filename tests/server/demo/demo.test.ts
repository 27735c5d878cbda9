/** The demo scenario: complete, computed, idempotent, and each circuit does what its name says. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { demoAccounts, seedDemo } from '#server/db/demo/index.ts'
import { roles } from '#shared/roles.ts'
import { passwordSchema } from '#shared/schemas/account.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'
import type { Design, DesignSummary } from '#shared/schemas/design.ts'
import type { Page } from '#shared/schemas/paging.ts'
import type { Run, RunSummary } from '#shared/schemas/run.ts'
import { draftContentSchema } from '#shared/schemas/simulation.ts'
import { simulateRun, type Simulation } from '#sim/index.ts'
import type { Agent } from '#tests/support/agent.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
let admin: Agent
let designs: Design[]
let runs: Run[]
beforeAll(async () => {
  server = await startTestServer()
  expect(await seedDemo(server.context)).toBe(true)
  admin = await server.signInAs('admin')
  const read = async <T>(path: string) => (await admin.get(path)).body as T
  const designPage = await read<Page<DesignSummary>>('/api/designs?pageSize=100')
  const runPage = await read<Page<RunSummary>>('/api/runs?pageSize=100')
  designs = await Promise.all(designPage.items.map(({ id }) => read<Design>(`/api/designs/${id}`)))
  runs = await Promise.all(runPage.items.map(({ id }) => read<Run>(`/api/runs/${id}`)))
}, 120_000)
afterAll(() => server.close())

/** The only design whose name has the word in it. */
const design = (word: string) => {
  const found = designs.filter(({ name }) => name.toLowerCase().includes(word))
  expect(found).toHaveLength(1)
  return found[0]!
}
/** A run of that design whose title has the other words in it. */
const runOf = (word: string, title = '') => {
  const { id } = design(word)
  return runs.find((run) => run.design.id === id && run.title.includes(title))!
}

const circuitOf = (word: string) => design(word).draft.content.circuit
/** Closed-loop gain, and the textbook's critical gain 1 + Rs/Rp + Cp/Cs and frequency 1/(2π√(Rs Rp Cs Cp)). */
const gain = ({ gain: { feedbackR, groundR } }: Circuit) => 1 + feedbackR / groundR
const criticalGain = ({ network: { seriesR, seriesC, shuntR, shuntC } }: Circuit) =>
  1 + seriesR / shuntR + shuntC / seriesC
const idealFrequency = ({ network: { seriesR, seriesC, shuntR, shuntC } }: Circuit) =>
  1 / (2 * Math.PI * Math.sqrt(seriesR * shuntR * seriesC * shuntC))
const upperRail = ({ supply, amplifier }: Circuit) => supply.positive - amplifier.headroomHigh

describe('the demo', () => {
  it('has somebody in every role, at addresses that cannot exist (RFC 2606)', async () => {
    expect(new Set(demoAccounts.map(({ role }) => role))).toEqual(new Set(roles))
    for (const account of demoAccounts) {
      expect(account.email).toMatch(/^[a-z]+@brackwater\.example$/)
      expect(passwordSchema.safeParse(account.password).success).toBe(true)
      const agent = server.agent()
      const answer = await agent.post('/api/session', { email: account.email, password: account.password })
      expect(answer.body).toMatchObject({ person: { name: account.name, role: account.role }, mode: 'demo' })
    }
  })

  it('marks its accounts, so that they are refused outside the demo', async () => {
    const people = await server.context.database.models.Person.findAll({ where: { demo: true } })
    expect(people.map(({ email }) => email).sort()).toEqual(demoAccounts.map(({ email }) => email).sort())
  })

  it('has six designs whose drafts are valid, in projects that are labelled as invented', () => {
    expect(designs).toHaveLength(6)
    for (const { draft, project } of designs) {
      expect(draftContentSchema.safeParse(draft.content).error).toBeUndefined()
      expect(project.name).toContain('(invented)')
    }
  })

  it('has a run of every design, by several people, labelled as invented and quoting no figures', () => {
    expect(new Set(runs.map((run) => run.design.id))).toEqual(new Set(designs.map(({ id }) => id)))
    expect(new Set(runs.map(({ author }) => author.id)).size).toBeGreaterThanOrEqual(3)
    for (const { note } of runs) {
      expect(note).toContain('Invented demo data.')
      expect(note).not.toMatch(/\d/)
    }
  })

  it('stores what the engine computes from the stored inputs, nothing typed in', () => {
    const quick = runs.filter(({ design }) => !design.name.includes('Lamp'))
    expect(quick.length).toBeGreaterThanOrEqual(6)
    for (const run of quick) {
      const { figures, modes } = simulateRun(run.inputs) as Simulation
      expect(run.figures).toEqual(figures)
      expect(run.modes).toEqual(modes)
    }
  })

  it('is seeded once only', async () => {
    const { models } = server.context.database
    const { Person, Project, Design, Run, RunRecord } = models
    const counts = () =>
      Promise.all([Person.count(), Project.count(), Design.count(), Run.count(), RunRecord.count()])
    const before = await counts()
    expect(await seedDemo(server.context)).toBe(false)
    expect(await counts()).toEqual(before)
  })
})

describe('in production', () => {
  it('nothing is seeded', async () => {
    const production = await startTestServer({ config: { mode: 'production' } })
    await expect(seedDemo(production.context)).rejects.toThrow('The demo is never seeded in production.')
    expect(await production.context.database.models.Person.count()).toBe(0)
    await production.close()
  })
})

describe('the bare 1 kHz exciter', () => {
  it('exceeds the critical gain and clips at both rails near 1 kHz', () => {
    const circuit = circuitOf('bare')
    const { figures } = runOf('bare', 'as drawn')
    expect(gain(circuit)).toBeGreaterThan(criticalGain(circuit))
    expect(idealFrequency(circuit)).toBeCloseTo(994.7, 1)
    expect(figures.high).toBeCloseTo(upperRail(circuit), 9)
    expect(figures.heldHigh).toBeGreaterThan(0.01)
    expect(figures.heldLow).toBeGreaterThan(0.01)
    expect(Math.abs(figures.frequency! / 1000 - 1)).toBeLessThan(0.05)
  })

  it('has a run of 60 ms at 2 µs', () => {
    expect(runOf('bare', 'as drawn').record).toMatchObject({ sampleInterval: 2e-6, samples: 30_001 })
  })
})

describe('the diode-limited exciter', () => {
  it('stays clear of the rails near 1 kHz', () => {
    const { figures, modes } = runOf('diode')
    expect(figures.level).toBeLessThan(0.8 * upperRail(circuitOf('diode')))
    expect(modes.every(({ mode }) => mode === 'linear')).toBe(true)
    expect(Math.abs(figures.frequency! / 1000 - 1)).toBeLessThan(0.05)
    expect(figures.thd).toBeLessThan(0.05)
  })
})

describe('the lamp-stabilised calibrator tone', () => {
  it('settles to the level at which the filament makes the loop critical, cleaner than the diodes', () => {
    const circuit = circuitOf('lamp')
    const control = circuit.amplitudeControl
    if (control.kind !== 'lamp') throw new Error('no lamp')
    const { figures } = runOf('lamp')
    // Closed form for an ideal amplifier: gain 3 needs R = Rf/2; R = R0 (T/T0)^1.2 gives T; the heat balance
    // Vn²/R = G (T − Tamb) gives the r.m.s. at the lamp, three times that at the output.
    const resistance = circuit.gain.feedbackR / 2
    const temperature = control.coldTemperature * (resistance / control.coldR) ** (1 / 1.2)
    const power = control.thermalConductance * (temperature - control.ambientTemperature)
    expect(figures.rms! / (3 * Math.sqrt(power * resistance))).toBeCloseTo(1, 2)
    expect(figures.heldHigh).toBe(0)
    expect(figures.thd).toBeLessThan(runOf('diode').figures.thd!)
  })
})

describe('the cable-tracer tone', () => {
  it('comes out within 2 % of 620 Hz from a single supply into a load', () => {
    const { supply, load } = circuitOf('tracer')
    expect(supply.reference).toBe(supply.negative)
    expect(load).toBeDefined()
    expect(Math.abs(runOf('tracer').figures.frequency! / 620 - 1)).toBeLessThan(0.02)
  })
})

describe('the exciter with a wrong shunt resistor', () => {
  it('has so much gain to spare that it distorts far more than the bare one', () => {
    const circuit = circuitOf('wrong')
    expect(circuit.network.shuntR).not.toBe(circuit.network.seriesR)
    expect(gain(circuit) / criticalGain(circuit)).toBeGreaterThan(1.2)
    expect(runOf('wrong').figures.thd).toBeGreaterThan(2 * runOf('bare', 'as drawn').figures.thd!)
  })
})

describe('the prototype that does not start', () => {
  it('has a gain below the critical one and dies away', () => {
    const circuit = circuitOf('does not start')
    const { figures, unsettled } = runOf('does not start')
    expect(gain(circuit)).toBeLessThan(criticalGain(circuit))
    // Textbook, equal arms: growth rate (A − 3) ω0/2.
    const expected = (gain(circuit) - 3) * Math.PI * idealFrequency(circuit)
    expect(figures.growthRate! / expected).toBeCloseTo(1, 1)
    expect(figures.level).toBeNull()
    expect(unsettled).not.toBeNull()
  })
})
