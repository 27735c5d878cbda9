/** The six invented designs of the demo. Inputs only: every result is the engine's. SI units. */
import { mara, tomasz } from '#server/db/demo/accounts.ts'
import { amplifierClasses } from '#shared/amplifier-classes.ts'
import type { Circuit } from '#shared/schemas/circuit.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

export type DemoDesignKey = 'bare' | 'diodes' | 'lamp' | 'tracer' | 'mismatched' | 'silent'

interface DemoDesign {
  key: DemoDesignKey
  project: string
  name: string
  /** E-mail of whoever created it. */
  author: string
  content: DraftContent
}

/** Three projects, each named as what it is. */
export const demoProjects = {
  cell: 'River cell exciter (invented)',
  calibrator: 'Bench calibrator (invented)',
  tracer: 'Cable tracer (invented)',
} as const

const equalArms = (resistance: number, capacitance: number): Circuit['network'] => ({
  seriesR: resistance,
  seriesC: capacitance,
  shuntR: resistance,
  shuntC: capacitance,
})

function draft(
  amplifierClass: string,
  circuit: Omit<Circuit, 'amplifier'>,
  sheet: Partial<DraftContent> = {},
): DraftContent {
  const amplifier = amplifierClasses.find(({ key }) => key === amplifierClass)
  if (!amplifier) throw new RangeError(`no amplifier class ${amplifierClass}`)
  return {
    circuit: { ...circuit, amplifier: amplifier.figures },
    stimulus: { kind: 'offset' },
    timing: { duration: null, sampleInterval: null },
    ganged: true,
    series: 'E24',
    amplifierClass,
    ...sheet,
  }
}

/** A small-signal silicon diode near 25 °C; typical of the kind, from memory. */
const siliconDiode = { saturationCurrent: 4e-9, emissionCoefficient: 1.9, thermalVoltage: 0.025693 }

export const demoDesigns: readonly DemoDesign[] = [
  {
    key: 'bare',
    project: demoProjects.cell,
    name: 'Bare 1 kHz exciter',
    author: mara,
    content: draft('general-1mhz', {
      network: equalArms(10e3, 16e-9),
      gain: { feedbackR: 22e3, groundR: 10e3 },
      supply: { positive: 9, negative: 9 },
      amplitudeControl: { kind: 'none' },
      load: { resistance: 2.2e3 },
    }),
  },
  {
    key: 'diodes',
    project: demoProjects.cell,
    name: 'Diode-limited exciter',
    author: mara,
    content: draft('general-1mhz', {
      network: equalArms(10e3, 16e-9),
      gain: { feedbackR: 22.8e3, groundR: 10e3 },
      supply: { positive: 9, negative: 9 },
      amplitudeControl: { kind: 'diodes', seriesR: 16e3, shuntedR: 6.8e3, ...siliconDiode },
      load: { resistance: 2.2e3 },
    }),
  },
  {
    key: 'lamp',
    project: demoProjects.calibrator,
    name: 'Lamp-stabilised calibrator tone',
    author: tomasz,
    content: draft(
      'general-1mhz',
      {
        network: equalArms(10e3, 16e-9),
        gain: { feedbackR: 510, groundR: 180 },
        supply: { positive: 12, negative: 12 },
        amplitudeControl: {
          kind: 'lamp',
          coldR: 180,
          coldTemperature: 298.15,
          ambientTemperature: 298.15,
          thermalConductance: 9e-5,
          thermalCapacity: 1.08e-6,
        },
      },
      { timing: { duration: 0.25, sampleInterval: 5e-6 } },
    ),
  },
  {
    key: 'tracer',
    project: demoProjects.tracer,
    name: '620 Hz cable-tracer tone',
    author: tomasz,
    content: draft(
      'rail-to-rail',
      {
        network: equalArms(25.5e3, 10e-9),
        gain: { feedbackR: 20.5e3, groundR: 10e3 },
        supply: { positive: 2.5, negative: 2.5, reference: 2.5 },
        amplitudeControl: { kind: 'none' },
        load: { resistance: 1e3 },
      },
      { series: 'E96' },
    ),
  },
  {
    key: 'mismatched',
    project: demoProjects.cell,
    name: 'Exciter with a wrong shunt resistor',
    author: mara,
    content: draft(
      'general-1mhz',
      {
        network: { seriesR: 1e3, seriesC: 100e-9, shuntR: 2.2e3, shuntC: 100e-9 },
        gain: { feedbackR: 68e3, groundR: 33e3 },
        supply: { positive: 9, negative: 9 },
        amplitudeControl: { kind: 'none' },
      },
      { ganged: false },
    ),
  },
  {
    key: 'silent',
    project: demoProjects.calibrator,
    name: 'First prototype, does not start',
    author: tomasz,
    content: draft(
      'fet-input',
      {
        network: equalArms(10e3, 16e-9),
        gain: { feedbackR: 18e3, groundR: 10e3 },
        supply: { positive: 12, negative: 12 },
        amplitudeControl: { kind: 'none' },
      },
      { stimulus: { kind: 'kick', voltage: 1 } },
    ),
  },
]
