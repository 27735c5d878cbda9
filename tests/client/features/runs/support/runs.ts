/** Invented runs for the tests of the runs pages. The numbers are made up; nothing computes them here. */
import { figureKeys, type Figures } from '#shared/figures.ts'
import type { Person } from '#shared/schemas/account.ts'
import type { Run } from '#shared/schemas/run.ts'
import { startingDraft } from '#shared/starting-draft.ts'

export const engineer: Person = {
  id: 2,
  name: 'Edda Engineer',
  email: 'edda@brackwater.example',
  role: 'engineer',
}
export const reviewer: Person = {
  id: 3,
  name: 'Rolf Reviewer',
  email: 'rolf@brackwater.example',
  role: 'reviewer',
}

export function makeFigures(changes: Partial<Figures> = {}): Figures {
  const none = Object.fromEntries(figureKeys.map((key) => [key, null])) as Figures
  return {
    ...none,
    gain: 3.05,
    gainMargin: 0.0166,
    frequency: 989.7,
    level: 7.5,
    thd: 0.0321,
    timeTo90: 0.041,
    ...changes,
  }
}

const { circuit, stimulus, timing } = startingDraft

/** A run of four samples: held at the upper rail over the third and fourth. */
export function makeRun(changes: Partial<Run> = {}): Run {
  return {
    id: 7,
    title: 'First article',
    note: 'Bare loop, nominal parts.',
    design: { id: 1, name: '1 kHz exciter, bare' },
    project: { id: 1, name: 'Salinity probe exciter' },
    author: { id: engineer.id, name: engineer.name },
    createdAt: '2026-03-04T09:30:00.000Z',
    engineVersion: '1.0.0',
    figures: makeFigures(),
    inputs: { circuit, stimulus, timing },
    record: {
      sampleInterval: 1e-3,
      samples: 4,
      columns: [
        { name: 'output', unit: 'V' },
        { name: 'network node', unit: 'V' },
        { name: 'series capacitor', unit: 'V' },
      ],
    },
    modes: [
      { mode: 'linear', start: 0, end: 2e-3 },
      { mode: 'heldHigh', start: 2e-3, end: 3e-3 },
    ],
    unsettled: null,
    ...changes,
  }
}
