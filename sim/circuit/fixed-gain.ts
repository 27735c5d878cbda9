/** Two fixed resistors: vn = vo·Rg/(Rg + Rf). */
import type { Circuit } from '#shared/schemas/circuit.ts'
import type { GainPath } from '#sim/circuit/gain-path.ts'

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
