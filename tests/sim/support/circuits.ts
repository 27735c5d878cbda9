/** Circuits for the engine's tests: a 1 kHz oscillator with equal arms and a 1 MHz-class amplifier, varied by hand. */
import type { Circuit } from '#shared/schemas/circuit.ts'

interface Changes {
  network?: Partial<Circuit['network']>
  gain?: Partial<Circuit['gain']>
  amplifier?: Partial<Circuit['amplifier']>
  supply?: Partial<Circuit['supply']>
  amplitudeControl?: Circuit['amplitudeControl']
  load?: Circuit['load']
}

export function makeCircuit(changes: Changes = {}): Circuit {
  return {
    network: { seriesR: 10e3, seriesC: 16e-9, shuntR: 10e3, shuntC: 16e-9, ...changes.network },
    gain: { feedbackR: 25e3, groundR: 10e3, ...changes.gain },
    amplifier: {
      gainBandwidth: 1e6,
      openLoopGain: 2e5,
      slewRate: 5e5,
      offset: 1e-3,
      headroomHigh: 1.5,
      headroomLow: 1.5,
      ...changes.amplifier,
    },
    supply: { positive: 9, negative: 9, ...changes.supply },
    amplitudeControl: changes.amplitudeControl ?? { kind: 'none' },
    ...(changes.load ? { load: changes.load } : {}),
  }
}

/** A diode pair round 10 kΩ of a 25 kΩ feedback. */
export const diodes: Circuit['amplitudeControl'] = {
  kind: 'diodes',
  seriesR: 15e3,
  shuntedR: 10e3,
  saturationCurrent: 4e-9,
  emissionCoefficient: 1.9,
  thermalVoltage: 0.025852,
}

/** A small filament with a thermal time constant of 10 ms, so that its level settles within a short record. */
export const quickLamp: Circuit['amplitudeControl'] = {
  kind: 'lamp',
  coldR: 150,
  coldTemperature: 300,
  ambientTemperature: 300,
  thermalConductance: 8e-5,
  thermalCapacity: 8e-7,
}
