/** Choosing what holds the level, and the resistances that stand in the gain arm for it. */
import type { AmplitudeControl, Circuit } from '#shared/schemas/circuit.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

export type ControlKind = AmplitudeControl['kind']

export const controlNames: Record<ControlKind, string> = {
  none: 'None, the rails clip',
  diodes: 'Diodes across part of feedback R',
  lamp: 'Filament lamp as ground R',
}

/** Small silicon signal diode at room temperature: typical of the class, from memory. A, –, V. */
const signalDiode = { saturationCurrent: 4e-9, emissionCoefficient: 1.9, thermalVoltage: 0.025852 }

/** Small low-current filament at room temperature: typical of the class, from memory. Ω, K, K, W/K, J/K. */
const smallFilament = {
  coldR: 150,
  coldTemperature: 300,
  ambientTemperature: 300,
  thermalConductance: 8e-5,
  thermalCapacity: 6.4e-6,
}

/** Where the feedback stands in a new control, as multiples of the ideal critical ratio Rf/Rg. */
const start = {
  none: 1.02,
  /** The part that the diodes bridge must be able to take the whole excess away. */
  diodes: { whole: 1.25, shunted: 0.5 },
  /** A cold filament is far below its working resistance, so the gain begins high. */
  lamp: 1.43,
}

function withCircuit(content: DraftContent, change: Partial<Circuit>): DraftContent {
  return { ...content, circuit: { ...content.circuit, ...change } }
}

/** Ideal critical ratio Rf/Rg of the network: Rs/Rp + Cp/Cs. */
export function criticalRatio({ network }: Circuit): number {
  return network.seriesR / network.shuntR + network.shuntC / network.seriesC
}

/** Four digits are enough for a starting value. */
const round = (value: number) => Number(value.toPrecision(4))

/** Changes the kind of amplitude control; the gain arm begins with sensible values for it. */
export function withControl(content: DraftContent, kind: ControlKind): DraftContent {
  const { circuit } = content
  const before = circuit.amplitudeControl
  if (before.kind === kind) return content
  const ratio = criticalRatio(circuit)
  if (kind === 'lamp') {
    const groundR = smallFilament.coldR
    return withCircuit(content, {
      gain: { groundR, feedbackR: round(ratio * start.lamp * groundR) },
      amplitudeControl: { kind, ...smallFilament },
    })
  }
  // Leaving a lamp behind, its few ohms would overload the amplifier in a fixed gain arm.
  const groundR = before.kind === 'lamp' ? 10e3 : circuit.gain.groundR
  if (kind === 'diodes') {
    const shuntedR = round(ratio * start.diodes.shunted * groundR)
    const seriesR = round(ratio * start.diodes.whole * groundR - shuntedR)
    return withCircuit(content, {
      gain: { groundR, feedbackR: seriesR + shuntedR },
      amplitudeControl: { kind, seriesR, shuntedR, ...signalDiode },
    })
  }
  return withCircuit(content, {
    gain: { groundR, feedbackR: round(ratio * start.none * groundR) },
    amplitudeControl: { kind },
  })
}

/** Least share of feedback R that stays outside the diodes when it is trimmed down. */
const leastSeriesShare = 0.01

/** Sets the whole feedback R. Around diodes the part in series takes the change, as a trimmer there would. */
export function withFeedback(content: DraftContent, feedbackR: number): DraftContent {
  const { gain, amplitudeControl: control } = content.circuit
  if (control.kind !== 'diodes') return withCircuit(content, { gain: { ...gain, feedbackR } })
  const seriesR = Math.max(feedbackR - control.shuntedR, leastSeriesShare * control.shuntedR)
  return withDiodeParts(content, { seriesR })
}

/** Sets one of the two parts of feedback R around the diodes; the whole follows. */
export function withDiodeParts(
  content: DraftContent,
  parts: { seriesR?: number; shuntedR?: number },
): DraftContent {
  const { gain, amplitudeControl: control } = content.circuit
  if (control.kind !== 'diodes') return content
  const next = { ...control, ...parts }
  return withCircuit(content, {
    gain: { ...gain, feedbackR: next.seriesR + next.shuntedR },
    amplitudeControl: next,
  })
}

/** Sets ground R; a lamp there is it, cold. */
export function withGround(content: DraftContent, groundR: number): DraftContent {
  const { gain, amplitudeControl: control } = content.circuit
  return withCircuit(content, {
    gain: { ...gain, groundR },
    amplitudeControl: control.kind === 'lamp' ? { ...control, coldR: groundR } : control,
  })
}
