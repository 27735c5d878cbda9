/**
 * A filament in ground R's place. Its resistance follows R(T) = R0 (T/T0)^exponent, 1.2 for tungsten unless given (from
 * memory, as practice has it), and its temperature the heat balance
 *
 *     Cth T' = vn²/R(T) − Gth (T − Tamb) − radiation (T⁴ − Tamb⁴)
 *
 * (L. Carlà, American Journal of Physics 81, 2013, doi 10.1119/1.4802873, for the two ways of losing heat). One
 * temperature for the whole filament.
 */
import { limits } from '#shared/limits.ts'
import type { AmplitudeControl, Circuit } from '#shared/schemas/circuit.ts'
import type { GainPath } from '#sim/circuit/gain-path.ts'

type Lamp = Extract<AmplitudeControl, { kind: 'lamp' }>

/** Of R(T) where the circuit states none. */
export const tungstenExponent = 1.2
/** K; no filament that the schema accepts is colder. */
const leastTemperature = limits.temperature[0]

export class LampPath implements GainPath {
  readonly state: { name: string; unit: string; initial: number }
  readonly smallSignal: { feedbackR: number; groundR: number }
  private readonly exponent: number
  private readonly radiation: number

  constructor(
    private readonly gain: Circuit['gain'],
    private readonly lamp: Lamp,
  ) {
    this.exponent = lamp.exponent ?? tungstenExponent
    this.radiation = lamp.radiation ?? 0
    this.state = { name: 'Filament temperature', unit: 'K', initial: lamp.ambientTemperature }
    this.smallSignal = { feedbackR: gain.feedbackR, groundR: this.resistance(lamp.ambientTemperature) }
  }

  /**
   * Ω at `temperature` (K). An integrator may try a step so long that it would cool the filament below zero; the law is
   * held at 1 K there, so that the trial has a finite error and is rejected.
   */
  resistance(temperature: number): number {
    const warm = Math.max(leastTemperature, temperature)
    return this.lamp.coldR * Math.pow(warm / this.lamp.coldTemperature, this.exponent)
  }
  invertingInput(vo: number, temperature: number): number {
    const resistance = this.resistance(temperature)
    return (vo * resistance) / (resistance + this.gain.feedbackR)
  }
  invertingInputRate(vo: number, temperature: number, voRate: number, temperatureRate: number): number {
    const resistance = this.resistance(temperature)
    const total = resistance + this.gain.feedbackR
    const resistanceRate = ((this.exponent * resistance) / temperature) * temperatureRate
    return (resistance / total) * voRate + ((vo * this.gain.feedbackR) / (total * total)) * resistanceRate
  }
  deviceRate(vo: number, temperature: number): number {
    const { thermalConductance, thermalCapacity, ambientTemperature } = this.lamp
    const resistance = this.resistance(temperature)
    const current = vo / (resistance + this.gain.feedbackR)
    let power = current * current * resistance - thermalConductance * (temperature - ambientTemperature)
    if (this.radiation > 0) power -= this.radiation * (temperature ** 4 - ambientTemperature ** 4)
    return power / thermalCapacity
  }
  current(vo: number, temperature: number): number {
    return vo / (this.resistance(temperature) + this.gain.feedbackR)
  }
}
