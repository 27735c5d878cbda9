/**
 * What stands between the output and the inverting input. One class per kind of amplitude control, all of this shape;
 * `sim/circuit/plant.ts` asks it at every evaluation, so no method allocates.
 */
import type { Circuit } from '#shared/schemas/circuit.ts'
import { DiodePath } from '#sim/circuit/diodes.ts'
import { LampPath } from '#sim/circuit/lamp.ts'

export interface GainPath {
  /** The device's own state, where it has one. */
  readonly state: { name: string; unit: string; initial: number } | null
  /** Feedback and ground resistance at zero signal, device cold, Ω. */
  readonly smallSignal: { feedbackR: number; groundR: number }
  /** Voltage at the inverting input, V, for the output `vo` (V) and the device's state. */
  invertingInput(vo: number, device: number): number
  /** Its time derivative, V/s, when `vo` and the state change at the rates given. */
  invertingInputRate(vo: number, device: number, voRate: number, deviceRate: number): number
  /** Time derivative of the device's state; 0 without one. */
  deviceRate(vo: number, device: number): number
  /** Current from the output into the path, A. */
  current(vo: number, device: number): number
}

/** Two fixed resistors: vn = vo·Rg/(Rg + Rf). */
export class FixedPath implements GainPath {
  readonly state = null
  readonly smallSignal: { feedbackR: number; groundR: number }
  private readonly ratio: number
  private readonly conductance: number

  constructor({ feedbackR, groundR }: Circuit['gain']) {
    this.smallSignal = { feedbackR, groundR }
    this.ratio = groundR / (groundR + feedbackR)
    this.conductance = 1 / (groundR + feedbackR)
  }
  invertingInput(vo: number): number {
    return this.ratio * vo
  }
  invertingInputRate(_vo: number, _device: number, voRate: number): number {
    return this.ratio * voRate
  }
  deviceRate(): number {
    return 0
  }
  current(vo: number): number {
    return this.conductance * vo
  }
}

/** The gain path that the circuit's amplitude control makes. */
export function gainPath({ gain, amplitudeControl }: Circuit): GainPath {
  switch (amplitudeControl.kind) {
    case 'none':
      return new FixedPath(gain)
    case 'diodes':
      return new DiodePath(gain, amplitudeControl)
    case 'lamp':
      return new LampPath(gain, amplitudeControl)
  }
}
