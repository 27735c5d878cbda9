/**
 * The equations of the oscillator, one set per mode. States: `v1` across the shunt C (the amplifier's non-inverting
 * input), `v2` across the series C, `vo` the output, and the gain device's own state where it has one.
 *
 *     i       = (vo − v1 − v2)/Rs
 *     Cp v1'  = i − v1/Rp
 *     Cs v2'  = i
 *     demand  = ωt (v1 + Vos − vn) − (ωt/A0) vo      the slope that the amplifier would give its output, ωt = 2π·GBW
 *     vo'     = demand, ± the slew rate while slewing, the rail's own slope while held
 */
import type { Circuit } from '#shared/schemas/circuit.ts'
import type { GainPath } from '#sim/circuit/gain-path.ts'
import { gainPathOf } from '#sim/circuit/gain-path-of.ts'

/** Positions in a state vector. */
export const v1Index = 0
export const v2Index = 1
export const voIndex = 2
export const deviceIndex = 3

/** Writes dy/dt into `out`. */
export type Derivative = (t: number, y: readonly number[], out: number[]) => void

export class Plant {
  readonly path: GainPath
  readonly dimension: 3 | 4
  readonly slewRate: number
  /** 2π·GBW, rad/s. */
  readonly unityRate: number
  private readonly seriesG: number
  private readonly shuntG: number
  private readonly perShuntC: number
  private readonly perSeriesC: number
  private readonly leak: number
  private readonly offset: number
  private readonly loadG: number
  private readonly rates: number[]

  constructor(circuit: Circuit) {
    const { network, amplifier, load } = circuit
    this.path = gainPathOf(circuit)
    this.dimension = this.path.state ? 4 : 3
    this.slewRate = amplifier.slewRate
    this.unityRate = 2 * Math.PI * amplifier.gainBandwidth
    this.leak = this.unityRate / amplifier.openLoopGain
    this.offset = amplifier.offset
    this.seriesG = 1 / network.seriesR
    this.shuntG = 1 / network.shuntR
    this.perShuntC = 1 / network.shuntC
    this.perSeriesC = 1 / network.seriesC
    this.loadG = load ? 1 / load.resistance : 0
    this.rates = new Array<number>(this.dimension).fill(0)
  }

  /** The state at power-on: all discharged, the device at rest, `kick` volts on the shunt C. */
  initialState(kick: number): number[] {
    const state = [kick, 0, 0]
    if (this.path.state) state.push(this.path.state.initial)
    return state
  }

  /** Slope that the amplifier would give the output, V/s. */
  demand(y: readonly number[]): number {
    const vo = y[voIndex]!
    const inverting = this.path.invertingInput(vo, y[deviceIndex]!)
    return this.unityRate * (y[v1Index]! + this.offset - inverting) - this.leak * vo
  }

  /** Its time derivative, V/s², while the output moves at `voRate`. */
  demandRate(y: readonly number[], voRate: number): number {
    const vo = y[voIndex]!
    this.network(y, voRate, this.rates)
    const device = y[deviceIndex]!
    const invertingRate = this.path.invertingInputRate(vo, device, voRate, this.rates[deviceIndex]!)
    return this.unityRate * (this.rates[v1Index]! - invertingRate) - this.leak * voRate
  }

  /** The loop in command: dy/dt with the output at the amplifier's demand. */
  readonly linear: Derivative = (_t, y, out) => this.network(y, this.demand(y), out)

  /** The output moving at a fixed slope, V/s. */
  imposed(slope: number): Derivative {
    return (_t, y, out) => this.network(y, slope, out)
  }

  /** Current that network, gain path and load draw from the output, A. */
  outputCurrent(y: readonly number[]): number {
    const vo = y[voIndex]!
    const network = this.seriesG * (vo - y[v1Index]! - y[v2Index]!)
    return network + this.path.current(vo, y[deviceIndex]!) + this.loadG * vo
  }

  private network(y: readonly number[], voRate: number, out: number[]): void {
    const v1 = y[v1Index]!
    const current = this.seriesG * (y[voIndex]! - v1 - y[v2Index]!)
    out[v1Index] = this.perShuntC * (current - this.shuntG * v1)
    out[v2Index] = this.perSeriesC * current
    out[voIndex] = voRate
    if (this.dimension === 4) out[deviceIndex] = this.path.deviceRate(y[voIndex]!, y[deviceIndex]!)
  }
}
