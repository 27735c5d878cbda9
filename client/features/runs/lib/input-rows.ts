/** Every input of a run as rows for people: the one list that the run page, the compare page and their tests use. */
import type { AmplitudeControl } from '#shared/schemas/circuit.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'
import type { Stimulus } from '#shared/schemas/stimulus.ts'
import { formatQuantity } from '#shared/units/format.ts'

export interface InputRow {
  group: string
  name: string
  /** The value itself, for comparison; null where the input is left out or left to the engine. */
  value: number | string | null
  /** As it is shown. */
  text: string
}

/** Digits that show a typed value as it was typed, and a computed one without its rounding noise. */
const inputDigits = 6

const rowsOf =
  (group: string) =>
  (name: string, value: number | undefined, unit: string, left = 'not stated'): InputRow => ({
    group,
    name,
    value: value ?? null,
    text: value === undefined ? left : formatQuantity(value, unit, { digits: inputDigits }),
  })

function controlRows(control: AmplitudeControl): InputRow[] {
  const row = rowsOf('Amplitude control')
  const kind = (text: string): InputRow => ({
    group: 'Amplitude control',
    name: 'Kind',
    value: control.kind,
    text,
  })
  switch (control.kind) {
    case 'none':
      return [kind('none, the rails clip')]
    case 'diodes':
      return [
        kind('diodes'),
        row('Feedback R in series with the diodes', control.seriesR, 'Ω'),
        row('Feedback R across the diodes', control.shuntedR, 'Ω'),
        row('Saturation current', control.saturationCurrent, 'A'),
        row('Emission coefficient', control.emissionCoefficient, ''),
        row('Thermal voltage', control.thermalVoltage, 'V'),
      ]
    case 'lamp':
      return [
        kind('filament lamp'),
        row('Cold resistance', control.coldR, 'Ω'),
        row('Cold temperature', control.coldTemperature, 'K'),
        row('Ambient temperature', control.ambientTemperature, 'K'),
        row('Thermal conductance', control.thermalConductance, 'W/K'),
        row('Thermal capacity', control.thermalCapacity, 'J/K'),
        row('Resistance exponent', control.exponent, ''),
        row('Radiation constant', control.radiation, 'W/K⁴'),
      ]
  }
}

function stimulusRows(stimulus: Stimulus): InputRow[] {
  const row = rowsOf('Power-on')
  const kind = (text: string): InputRow => ({ group: 'Power-on', name: 'Kind', value: stimulus.kind, text })
  switch (stimulus.kind) {
    case 'offset':
      return [kind("from rest, the amplifier's own offset")]
    case 'kick':
      return [kind('a voltage on shunt C'), row('Kick', stimulus.voltage, 'V')]
    case 'ramp':
      return [
        kind('the rails rise'),
        row('Positive rail, delay', stimulus.positive.delay, 's'),
        row('Positive rail, rise time', stimulus.positive.riseTime, 's'),
        row('Negative rail, delay', stimulus.negative.delay, 's'),
        row('Negative rail, rise time', stimulus.negative.riseTime, 's'),
      ]
  }
}

/** All inputs of a run, grouped, in the order of the circuit drawing. */
export function inputRows({ circuit, stimulus, timing }: RunInputs): InputRow[] {
  const { network, gain, amplifier, supply } = circuit
  const inNetwork = rowsOf('Network')
  const inGain = rowsOf('Gain pair')
  const inAmplifier = rowsOf('Amplifier')
  const inSupply = rowsOf('Supply and load')
  const inTiming = (name: string, value: number | null): InputRow => ({
    group: 'Record',
    name,
    value,
    text: value === null ? 'chosen by the engine' : formatQuantity(value, 's', { digits: inputDigits }),
  })
  return [
    inNetwork('Series R', network.seriesR, 'Ω'),
    inNetwork('Series C', network.seriesC, 'F'),
    inNetwork('Shunt R', network.shuntR, 'Ω'),
    inNetwork('Shunt C', network.shuntC, 'F'),
    inGain('Feedback R', gain.feedbackR, 'Ω'),
    inGain('Ground R', gain.groundR, 'Ω'),
    inAmplifier('Gain-bandwidth', amplifier.gainBandwidth, 'Hz'),
    inAmplifier('Open-loop gain', amplifier.openLoopGain, ''),
    inAmplifier('Slew rate', amplifier.slewRate, 'V/s'),
    inAmplifier('Offset', amplifier.offset, 'V'),
    inAmplifier('Upper headroom', amplifier.headroomHigh, 'V'),
    inAmplifier('Lower headroom', amplifier.headroomLow, 'V'),
    inAmplifier('Output current', amplifier.outputCurrent, 'A'),
    inSupply('Positive supply', supply.positive, 'V'),
    inSupply('Negative supply', supply.negative, 'V'),
    inSupply('Reference', supply.reference, 'V', 'middle of the split supply'),
    inSupply('Load', circuit.load?.resistance, 'Ω', 'none'),
    ...controlRows(circuit.amplitudeControl),
    ...stimulusRows(stimulus),
    inTiming('Duration', timing.duration),
    inTiming('Sample interval', timing.sampleInterval),
  ]
}
