import type { Circuit } from '#shared/schemas/circuit.ts'
import { DiodePath } from '#sim/circuit/diodes.ts'
import { FixedPath } from '#sim/circuit/fixed-gain.ts'
import type { GainPath } from '#sim/circuit/gain-path.ts'
import { LampPath } from '#sim/circuit/lamp.ts'

/** The gain path that the circuit's amplitude control makes. */
export function gainPathOf({ gain, amplitudeControl }: Circuit): GainPath {
  switch (amplitudeControl.kind) {
    case 'none':
      return new FixedPath(gain)
    case 'diodes':
      return new DiodePath(gain, amplitudeControl)
    case 'lamp':
      return new LampPath(gain, amplitudeControl)
  }
}
