/** Every number of the sheet: its name, unit, where it stands in the content and how it is changed. */
import { withDiodeParts, withFeedback, withGround } from '#client/features/sheet/amplitude-control.ts'
import { withPart } from '#client/features/sheet/gang.ts'
import { singleSupply, totalOf, withSupply } from '#client/features/sheet/supply.ts'
import type { Amplifier, AmplitudeControl, Network } from '#shared/schemas/circuit.ts'
import type { DraftContent, Timing } from '#shared/schemas/simulation.ts'
import type { Ramp } from '#shared/schemas/stimulus.ts'

export interface FieldSpec {
  key: string
  label: string
  /** SI unit symbol, empty for a pure number. */
  unit: string
  /** Dotted schema paths whose refusals belong at this field. */
  paths: readonly string[]
  /** Null where the quantity is not stated (left to the engine) or not part of this circuit. */
  read: (content: DraftContent) => number | null
  /** Null only for an `optional` field. */
  write: (content: DraftContent, value: number) => DraftContent
  /** May be left empty; what that does. */
  clear?: (content: DraftContent) => DraftContent
  /** A refusal of this field's own, said before the schema's. */
  check?: (content: DraftContent) => string | null
  /** Arrow keys go along the preferred series instead of by digits. */
  preferred?: boolean
}

const network = (key: keyof Network, label: string, unit: string): FieldSpec => ({
  key,
  label,
  unit,
  paths: [`circuit.network.${key}`],
  read: (content) => content.circuit.network[key],
  write: (content, value) => withPart(content, key, value),
  preferred: true,
})

const amplifier = (key: keyof Amplifier, label: string, unit: string): FieldSpec => ({
  key: `amplifier.${key}`,
  label,
  unit,
  paths: [`circuit.amplifier.${key}`],
  read: (content) => content.circuit.amplifier[key] ?? null,
  write: (content, value) => ({
    ...content,
    amplifierClass: null,
    circuit: { ...content.circuit, amplifier: { ...content.circuit.amplifier, [key]: value } },
  }),
})

/** A figure of the device that holds the level, read and written only while it is of that kind. */
function device<Kind extends 'diodes' | 'lamp'>(
  kind: Kind,
  key: Exclude<keyof Extract<AmplitudeControl, { kind: Kind }>, 'kind'> & string,
  label: string,
  unit: string,
): FieldSpec {
  return {
    key: `${kind}.${key}`,
    label,
    unit,
    paths: [`circuit.amplitudeControl.${key}`],
    read: ({ circuit }) => {
      const control: Readonly<Record<string, unknown>> = circuit.amplitudeControl
      const value = control.kind === kind ? control[key] : null
      return typeof value === 'number' ? value : null
    },
    write: (content, value) => ({
      ...content,
      circuit: {
        ...content.circuit,
        amplitudeControl: { ...content.circuit.amplitudeControl, [key]: value } as AmplitudeControl,
      },
    }),
  }
}

const ramp = (rail: 'positive' | 'negative', key: keyof Ramp, label: string): FieldSpec => ({
  key: `ramp.${rail}.${key}`,
  label,
  unit: 's',
  paths: [`stimulus.${rail}.${key}`],
  read: ({ stimulus }) => (stimulus.kind === 'ramp' ? stimulus[rail][key] : null),
  write: (content, value) =>
    content.stimulus.kind === 'ramp'
      ? {
          ...content,
          stimulus: { ...content.stimulus, [rail]: { ...content.stimulus[rail], [key]: value } },
        }
      : content,
})

const timing = (key: keyof Timing, label: string): FieldSpec => ({
  key: `timing.${key}`,
  label,
  unit: 's',
  paths: [`timing.${key}`],
  read: (content) => content.timing[key],
  write: (content, value) => ({ ...content, timing: { ...content.timing, [key]: value } }),
  clear: (content) => ({ ...content, timing: { ...content.timing, [key]: null } }),
})

/** A rail is stated as a magnitude; whoever types the lower one with its sign means the same. */
const rail = (key: 'positive' | 'negative', label: string): FieldSpec => ({
  key: `supply.${key}`,
  label,
  unit: 'V',
  paths: [`circuit.supply.${key}`],
  read: (content) => content.circuit.supply[key],
  write: (content, value) =>
    withSupply(content, {
      ...content.circuit.supply,
      [key]: key === 'negative' ? Math.abs(value) : value,
    }),
})

export const fields = {
  seriesR: network('seriesR', 'Series R', 'Ω'),
  seriesC: network('seriesC', 'Series C', 'F'),
  shuntR: network('shuntR', 'Shunt R', 'Ω'),
  shuntC: network('shuntC', 'Shunt C', 'F'),
  feedbackR: {
    key: 'feedbackR',
    label: 'Feedback R',
    unit: 'Ω',
    paths: ['circuit.gain.feedbackR'],
    read: (content) => content.circuit.gain.feedbackR,
    write: withFeedback,
    preferred: true,
  },
  groundR: {
    key: 'groundR',
    label: 'Ground R',
    unit: 'Ω',
    paths: ['circuit.gain.groundR', 'circuit.amplitudeControl.coldR'],
    read: (content) => content.circuit.gain.groundR,
    write: withGround,
    preferred: true,
  },
  feedbackSeriesR: {
    ...device('diodes', 'seriesR', 'Feedback R in series', 'Ω'),
    write: (content, seriesR) => withDiodeParts(content, { seriesR }),
    preferred: true,
  },
  feedbackShuntedR: {
    ...device('diodes', 'shuntedR', 'Feedback R across diodes', 'Ω'),
    write: (content, shuntedR) => withDiodeParts(content, { shuntedR }),
    preferred: true,
  },
  load: {
    key: 'load',
    label: 'Load',
    unit: 'Ω',
    paths: ['circuit.load.resistance'],
    read: (content) => content.circuit.load?.resistance ?? null,
    write: (content, resistance) => ({ ...content, circuit: { ...content.circuit, load: { resistance } } }),
    preferred: true,
  },
  gainBandwidth: amplifier('gainBandwidth', 'Gain-bandwidth', 'Hz'),
  openLoopGain: amplifier('openLoopGain', 'Open-loop gain', ''),
  slewRate: amplifier('slewRate', 'Slew rate', 'V/s'),
  offset: amplifier('offset', 'Offset', 'V'),
  headroomHigh: amplifier('headroomHigh', 'Upper headroom', 'V'),
  headroomLow: amplifier('headroomLow', 'Lower headroom', 'V'),
  outputCurrent: {
    ...amplifier('outputCurrent', 'Rated output current', 'A'),
    clear: (content) => {
      const { outputCurrent: _rating, ...rest } = content.circuit.amplifier
      return { ...content, amplifierClass: null, circuit: { ...content.circuit, amplifier: rest } }
    },
  },
  positive: rail('positive', 'Positive rail'),
  negative: rail('negative', 'Negative rail'),
  total: {
    key: 'supply.total',
    label: 'Total supply',
    unit: 'V',
    paths: ['circuit.supply.positive'],
    read: ({ circuit }) => totalOf(circuit.supply),
    write: (content, total) => withSupply(content, singleSupply(total, content.circuit.supply.negative)),
    check: ({ circuit }) =>
      circuit.supply.positive <= 0
        ? 'The total supply must exceed the reference, which lies between the rails.'
        : null,
  },
  reference: {
    key: 'supply.reference',
    label: 'Reference above negative rail',
    unit: 'V',
    paths: ['circuit.supply.reference', 'circuit.supply.negative'],
    read: ({ circuit }) => circuit.supply.reference ?? null,
    write: (content, reference) =>
      withSupply(content, singleSupply(totalOf(content.circuit.supply), reference)),
  },
  saturationCurrent: device('diodes', 'saturationCurrent', 'Saturation current', 'A'),
  emissionCoefficient: device('diodes', 'emissionCoefficient', 'Emission coefficient', ''),
  thermalVoltage: device('diodes', 'thermalVoltage', 'Thermal voltage', 'V'),
  coldTemperature: device('lamp', 'coldTemperature', 'Cold R measured at', 'K'),
  ambientTemperature: device('lamp', 'ambientTemperature', 'Ambient temperature', 'K'),
  thermalConductance: device('lamp', 'thermalConductance', 'Thermal conductance', 'W/K'),
  thermalCapacity: device('lamp', 'thermalCapacity', 'Thermal capacity', 'J/K'),
  kick: {
    key: 'kick.voltage',
    label: 'Kick on shunt C',
    unit: 'V',
    paths: ['stimulus.voltage'],
    read: ({ stimulus }) => (stimulus.kind === 'kick' ? stimulus.voltage : null),
    write: (content, voltage) => ({ ...content, stimulus: { kind: 'kick', voltage } }),
  },
  positiveDelay: ramp('positive', 'delay', 'Positive rail delay'),
  positiveRise: ramp('positive', 'riseTime', 'Positive rail rise time'),
  negativeDelay: ramp('negative', 'delay', 'Negative rail delay'),
  negativeRise: ramp('negative', 'riseTime', 'Negative rail rise time'),
  duration: timing('duration', 'Duration'),
  sampleInterval: timing('sampleInterval', 'Sample interval'),
} satisfies Record<string, FieldSpec>

export type FieldName = keyof typeof fields

/** The specification of a field with all its optional members. */
export const fieldOf = (name: FieldName): FieldSpec => fields[name]

/** What is wrong with a field's number: its own refusal, else the schema's at one of its paths. */
export function fieldError(
  spec: FieldSpec,
  content: DraftContent,
  refused: ReadonlyMap<string, string>,
): string | null {
  const own = spec.check?.(content)
  if (own) return own
  for (const path of spec.paths) {
    const sentence = refused.get(path)
    if (sentence) return sentence
  }
  return null
}
