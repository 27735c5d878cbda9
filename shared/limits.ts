/** Numbers that client, server and engine obey alike. Times in seconds, sizes in bytes. */
export const limits = {
  /** Widest values the circuit accepts, as [least, greatest]; see `schemas/circuit.ts` for the sentences. */
  resistance: [1e-3, 1e9],
  capacitance: [1e-13, 1],
  gainBandwidth: [1, 1e11],
  openLoopGain: [10, 1e9],
  slewRate: [1, 1e11],
  offset: [-0.1, 0.1],
  headroom: [0, 50],
  supplyVoltage: [0.1, 200],
  kickVoltage: [-100, 100],
  rampTime: [0, 10],
  temperature: [1, 4000],
  sampleInterval: [1e-10, 1],
  duration: [1e-7, 3600],
  /** Samples per column of one simulation. */
  samples: 1_000_001,
  /** Samples per column of a run that is stored. */
  storedSamples: 250_001,
  /** Periods that one simulation may span. */
  periods: 20_000,
  nameLength: 120,
  titleLength: 120,
  noteLength: 4000,
  passwordLength: [10, 72],
  emailLength: 254,
  requestBody: 256 * 1024,
  pageSize: 100,
} as const
