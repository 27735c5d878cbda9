import type { Amplifier } from '#shared/schemas/circuit.ts'

export interface AmplifierClass {
  key: string
  name: string
  /** What the class is good for, one line. */
  use: string
  figures: Amplifier
}

/** Said beside every class in the interface. */
export const amplifierClassOrigin =
  'Typical of the class, from memory: enter the data sheet’s own figures before sign-off.'

/** Generic classes of operational amplifier. No real part: the figures are typical of the class, from memory. */
export const amplifierClasses: readonly AmplifierClass[] = [
  {
    key: 'general-1mhz',
    name: 'General purpose, 1 MHz',
    use: 'Tones to a few kilohertz.',
    figures: {
      gainBandwidth: 1e6,
      openLoopGain: 2e5,
      slewRate: 5e5,
      offset: 1e-3,
      headroomHigh: 1.5,
      headroomLow: 1.5,
      outputCurrent: 0.02,
    },
  },
  {
    key: 'low-power',
    name: 'Low power, 100 kHz',
    use: 'Battery probes below a kilohertz.',
    figures: {
      gainBandwidth: 1e5,
      openLoopGain: 1e5,
      slewRate: 4e4,
      offset: 2e-3,
      headroomHigh: 1,
      headroomLow: 0.1,
      outputCurrent: 0.005,
    },
  },
  {
    key: 'rail-to-rail',
    name: 'Rail-to-rail CMOS, 3 MHz',
    use: 'Single low supplies.',
    figures: {
      gainBandwidth: 3e6,
      openLoopGain: 1e5,
      slewRate: 1.5e6,
      offset: 1e-3,
      headroomHigh: 0.05,
      headroomLow: 0.05,
      outputCurrent: 0.02,
    },
  },
  {
    key: 'audio',
    name: 'Low-distortion audio, 10 MHz',
    use: 'Clean tones through the audio band.',
    figures: {
      gainBandwidth: 1e7,
      openLoopGain: 1e5,
      slewRate: 9e6,
      offset: 5e-4,
      headroomHigh: 1.5,
      headroomLow: 1.5,
      outputCurrent: 0.03,
    },
  },
  {
    key: 'fet-input',
    name: 'FET input, 4 MHz',
    use: 'High network resistances.',
    figures: {
      gainBandwidth: 4e6,
      openLoopGain: 2e5,
      slewRate: 1.3e7,
      offset: 3e-3,
      headroomHigh: 1.5,
      headroomLow: 1.5,
      outputCurrent: 0.02,
    },
  },
  {
    key: 'fast',
    name: 'Fast, 50 MHz',
    use: 'Tones above 50 kHz.',
    figures: {
      gainBandwidth: 5e7,
      openLoopGain: 5e4,
      slewRate: 1e8,
      offset: 1e-3,
      headroomHigh: 1.5,
      headroomLow: 1.5,
      outputCurrent: 0.05,
    },
  },
]
