import { z } from 'zod'
import { limits } from '#shared/limits.ts'
import { quantity } from '#shared/schemas/quantity.ts'

const resistance = (name: string) => quantity(name, 'Ω', limits.resistance)
const capacitance = (name: string) => quantity(name, 'F', limits.capacitance)
const temperature = (name: string) => quantity(name, 'K', limits.temperature)

export const networkSchema = z.strictObject({
  seriesR: resistance('Series R'),
  seriesC: capacitance('Series C'),
  shuntR: resistance('Shunt R'),
  shuntC: capacitance('Shunt C'),
})

export const gainSchema = z.strictObject({
  feedbackR: resistance('Feedback R'),
  groundR: resistance('Ground R'),
})

/** Figures of the amplifier that the model needs. Hz, V/V, V/s, V, V, V, A. */
export const amplifierSchema = z.strictObject({
  gainBandwidth: quantity('Gain-bandwidth', 'Hz', limits.gainBandwidth),
  openLoopGain: quantity('Open-loop gain', '', limits.openLoopGain),
  slewRate: quantity('Slew rate', 'V/s', limits.slewRate),
  offset: quantity('Offset', 'V', limits.offset),
  headroomHigh: quantity('Upper headroom', 'V', limits.headroom),
  headroomLow: quantity('Lower headroom', 'V', limits.headroom),
  /** Rated peak output current, A. */
  outputCurrent: quantity('Output current', 'A', [1e-6, 100]).optional(),
})

/**
 * Rails as magnitudes in volts from the node that the model calls ground. On a single supply `reference` is that
 * node's voltage above the negative rail, so `negative === reference`.
 */
export const supplySchema = z
  .strictObject({
    positive: quantity('Positive supply', 'V', limits.supplyVoltage),
    negative: quantity('Negative supply', 'V', limits.supplyVoltage),
    reference: quantity('Reference', 'V', limits.supplyVoltage).optional(),
  })
  .refine(
    (supply) =>
      supply.reference === undefined ||
      Math.abs(supply.reference - supply.negative) <= 1e-9 * supply.negative,
    {
      path: ['reference'],
      error: 'On a single supply the negative rail lies one reference voltage below the reference.',
    },
  )

/** What holds the level. `none`: the rails clip. Laws and symbols: `sim/circuit/`. */
export const amplitudeControlSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('none') }),
  /** Feedback R split: `seriesR` + (`shuntedR` ∥ antiparallel diode pair). A, –, V. */
  z.strictObject({
    kind: z.literal('diodes'),
    seriesR: resistance('Feedback R in series with the diodes'),
    shuntedR: resistance('Feedback R across the diodes'),
    saturationCurrent: quantity('Saturation current', 'A', [1e-18, 1e-3]),
    emissionCoefficient: quantity('Emission coefficient', '', [0.5, 5]),
    thermalVoltage: quantity('Thermal voltage', 'V', [1e-3, 0.1]),
  }),
  /** A filament in ground R's place. Ω, K, K, W/K, J/K. */
  z.strictObject({
    kind: z.literal('lamp'),
    coldR: resistance('Cold resistance'),
    coldTemperature: temperature('Cold temperature'),
    ambientTemperature: temperature('Ambient temperature'),
    thermalConductance: quantity('Thermal conductance', 'W/K', [1e-9, 1]),
    thermalCapacity: quantity('Thermal capacity', 'J/K', [1e-12, 10]),
    exponent: quantity('Resistance exponent', '', [0.1, 5]).optional(),
    radiation: quantity('Radiation constant', 'W/K⁴', [0, 1e-6]).optional(),
  }),
])

/** Whether two resistances that must be one value agree to rounding. */
const same = (a: number, b: number) => Math.abs(a - b) <= 1e-9 * Math.max(a, b)

/** The oscillator, SI units throughout. The only description of a circuit that client, server and engine exchange. */
export const circuitSchema = z
  .strictObject({
    network: networkSchema,
    gain: gainSchema,
    amplifier: amplifierSchema,
    supply: supplySchema,
    amplitudeControl: amplitudeControlSchema,
    load: z.strictObject({ resistance: resistance('Load') }).optional(),
  })
  .superRefine((circuit, context) => {
    const { amplifier, supply, gain, amplitudeControl: control } = circuit
    const refuse = (path: string[], message: string) => context.addIssue({ code: 'custom', path, message })
    if (supply.positive <= amplifier.headroomHigh)
      refuse(
        ['supply', 'positive'],
        'The positive supply must exceed the upper headroom, or the output cannot move.',
      )
    if (supply.negative <= amplifier.headroomLow)
      refuse(
        ['supply', 'negative'],
        'The negative supply must exceed the lower headroom, or the output cannot move.',
      )
    if (control.kind === 'diodes' && !same(gain.feedbackR, control.seriesR + control.shuntedR))
      refuse(['gain', 'feedbackR'], 'Feedback R must be the sum of its two parts around the diodes.')
    if (control.kind === 'lamp' && !same(gain.groundR, control.coldR))
      refuse(['gain', 'groundR'], "Ground R is the lamp: it must equal the lamp's cold resistance.")
  })

export type Circuit = z.infer<typeof circuitSchema>
export type Network = z.infer<typeof networkSchema>
export type Amplifier = z.infer<typeof amplifierSchema>
export type Supply = z.infer<typeof supplySchema>
export type AmplitudeControl = z.infer<typeof amplitudeControlSchema>
