/**
 * What stands between the output and the inverting input. One class per kind of amplitude control, all of this shape;
 * `sim/circuit/plant.ts` asks it at every evaluation, so no method allocates.
 */
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
