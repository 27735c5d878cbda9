/** Two contents side by side, value by value, in the words of the sheet. */
import { amplifierClasses } from '#shared/amplifier-classes.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'
import { formatQuantity } from '#shared/units/format.ts'
import { controlNames } from '#client/features/sheet/amplitude-control.ts'
import { fieldOf, fields, type FieldName } from '#client/features/sheet/fields.ts'
import { isSingle } from '#client/features/sheet/supply.ts'

export interface Difference {
  label: string
  mine: string
  theirs: string
}

export const stimulusNames: Record<DraftContent['stimulus']['kind'], string> = {
  offset: 'Offset',
  kick: 'Kick',
  ramp: 'Ramped supply',
}

/** The choices that are not numbers. */
const choices: { label: string; say: (content: DraftContent) => string }[] = [
  { label: 'R and C', say: ({ ganged }) => (ganged ? 'ganged' : 'split') },
  { label: 'Preferred series', say: ({ series }) => series },
  {
    label: 'Amplifier class',
    say: ({ amplifierClass }) =>
      amplifierClasses.find(({ key }) => key === amplifierClass)?.name ?? 'own figures',
  },
  { label: 'Supply', say: ({ circuit }) => (isSingle(circuit.supply) ? 'single' : 'split') },
  { label: 'Amplitude control', say: ({ circuit }) => controlNames[circuit.amplitudeControl.kind] },
  { label: 'Power-on', say: ({ stimulus }) => stimulusNames[stimulus.kind] },
]

/** Derived from others, so that it would be listed twice. */
const derived = new Set<FieldName>(['total'])

const numbers = (Object.keys(fields) as FieldName[]).filter((name) => !derived.has(name)).map(fieldOf)

const absent = '–'

export function differences(mine: DraftContent, theirs: DraftContent): Difference[] {
  const chosen = choices.map(({ label, say }) => ({ label, mine: say(mine), theirs: say(theirs) }))
  const stated = numbers.map(({ label, unit, read }) => {
    const say = (content: DraftContent) => {
      const value = read(content)
      return value === null ? absent : formatQuantity(value, unit, { digits: 8 })
    }
    return { label, mine: say(mine), theirs: say(theirs) }
  })
  return [...chosen, ...stated].filter((row) => row.mine !== row.theirs)
}
