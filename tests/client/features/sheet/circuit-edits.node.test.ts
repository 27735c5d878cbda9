import { describe, expect, it } from 'vitest'
import {
  criticalRatio,
  withControl,
  withDiodeParts,
  withFeedback,
  withGround,
} from '#client/features/sheet/amplitude-control.ts'
import { differences } from '#client/features/sheet/differences.ts'
import { fieldError, fieldOf, fields, type FieldName } from '#client/features/sheet/fields.ts'
import { mismatch, withGang, withPart } from '#client/features/sheet/gang.ts'
import { totalOf, withSupplyKind } from '#client/features/sheet/supply.ts'
import { draftContentSchema, type DraftContent } from '#shared/schemas/simulation.ts'
import { startingDraft } from '#shared/starting-draft.ts'
import { smallSignal } from '#sim/index.ts'

const valid = (content: DraftContent) => draftContentSchema.safeParse(content).success

describe('ganged and split parts', () => {
  it('sets both while ganged and one when split', () => {
    const ganged = withPart(startingDraft, 'shuntC', 10e-9)
    expect(ganged.circuit.network).toMatchObject({ seriesC: 10e-9, shuntC: 10e-9, seriesR: 10e3 })
    const split = withPart(withGang(startingDraft, false), 'shuntR', 10.1e3)
    expect(split.circuit.network).toMatchObject({ seriesR: 10e3, shuntR: 10.1e3 })
    expect(mismatch(split.circuit.network).r).toBeCloseTo(0.01, 12)
    expect(mismatch(split.circuit.network).c).toBe(0)
  })

  it('takes the series arm’s values when ganged again', () => {
    const split = withPart(withGang(startingDraft, false), 'shuntR', 22e3)
    expect(withGang(split, true).circuit.network.shuntR).toBe(10e3)
  })
})

describe('single supply', () => {
  const single = withSupplyKind(startingDraft, true)

  it('describes the same rails from the negative one', () => {
    expect(single.circuit.supply).toEqual({ positive: 9, negative: 9, reference: 9 })
    expect(valid(single)).toBe(true)
    expect(withSupplyKind(single, false).circuit.supply).toEqual({ positive: 9, negative: 9 })
  })

  it('keeps the total when the reference moves and the reference when the total does', () => {
    const battery = fieldOf('total').write(single, 12)
    expect(battery.circuit.supply).toEqual({ positive: 3, negative: 9, reference: 9 })
    const halved = fieldOf('reference').write(battery, 6)
    expect(halved.circuit.supply).toEqual({ positive: 6, negative: 6, reference: 6 })
    expect(totalOf(halved.circuit.supply)).toBe(12)
    expect(valid(halved)).toBe(true)
  })

  it('says that the reference lies between the rails', () => {
    const outside = fieldOf('total').write(single, 5)
    expect(valid(outside)).toBe(false)
    expect(fieldError(fieldOf('total'), outside, new Map())).toContain('must exceed the reference')
  })

  it('takes a negative rail with or without its sign', () => {
    expect(fieldOf('negative').write(startingDraft, -12).circuit.supply.negative).toBe(12)
  })
})

describe('amplitude control', () => {
  it.each(['diodes', 'lamp', 'none'] as const)('begins %s with values that are valid and start', (kind) => {
    const other = withControl(startingDraft, kind === 'none' ? 'lamp' : 'none')
    const content = withControl(other, kind)
    expect(content.circuit.amplitudeControl.kind).toBe(kind)
    expect(valid(content)).toBe(true)
    expect(smallSignal(content.circuit).starts).toBe(true)
  })

  it('begins in proportion to the network', () => {
    const uneven = withPart(withGang(startingDraft, false), 'shuntR', 5e3)
    // Textbook: critical ratio Rf/Rg = Rs/Rp + Cp/Cs, here 2 + 1.
    expect(criticalRatio(uneven.circuit)).toBe(3)
    expect(smallSignal(withControl(uneven, 'diodes').circuit).starts).toBe(true)
  })

  it('keeps feedback R the sum of its parts around diodes, and a lamp equal to ground R', () => {
    const diodes = withControl(startingDraft, 'diodes')
    expect(valid(withFeedback(diodes, 23_456))).toBe(true)
    expect(withFeedback(diodes, 23_456).circuit.gain.feedbackR).toBeCloseTo(23_456, 6)
    expect(valid(withFeedback(diodes, 1))).toBe(true)
    expect(valid(withDiodeParts(diodes, { shuntedR: 4700 }))).toBe(true)
    expect(valid(withGround(withControl(startingDraft, 'lamp'), 180))).toBe(true)
  })
})

describe('fields', () => {
  const withEverything: DraftContent = {
    ...withSupplyKind(withGang(startingDraft, false), true),
    stimulus: {
      kind: 'ramp',
      positive: { delay: 0, riseTime: 1e-3 },
      negative: { delay: 0, riseTime: 1e-3 },
    },
  }
  const diodes = withControl(withEverything, 'diodes')
  const lamp = withControl(withEverything, 'lamp')
  const kick: DraftContent = { ...withEverything, stimulus: { kind: 'kick', voltage: 0.1 } }

  it.each(Object.keys(fields) as FieldName[])('%s reads back what it wrote', (name) => {
    const spec = fieldOf(name)
    const content = [diodes, lamp, kick].find((one) => spec.read(one) !== null) ?? diodes
    const before = spec.read(content) ?? 1e-3
    const next = before === 0 ? 1e-3 : before * 1.25
    expect(spec.read(spec.write(content, next))).toBeCloseTo(next, 12)
  })

  it('leave the amplifier class once a figure is entered by hand', () => {
    expect(fieldOf('slewRate').write(startingDraft, 1e6).amplifierClass).toBeNull()
  })
})

describe('differences', () => {
  it('names every value that differs, both ways, and nothing else', () => {
    const mine = withPart(startingDraft, 'seriesR', 11e3)
    const theirs: DraftContent = {
      ...withControl(startingDraft, 'lamp'),
      timing: { duration: 0.06, sampleInterval: null },
    }
    const rows = differences(mine, theirs)
    const of = (label: string) => rows.find((row) => row.label === label)
    expect(of('Series R')).toEqual({ label: 'Series R', mine: '11\u2009kΩ', theirs: '10\u2009kΩ' })
    expect(of('Duration')).toEqual({ label: 'Duration', mine: '–', theirs: '60\u2009ms' })
    expect(of('Amplitude control')?.theirs).toContain('lamp')
    expect(of('Series C')).toBeUndefined()
    expect(differences(mine, mine)).toEqual([])
  })
})
