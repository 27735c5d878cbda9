/**
 * Feedback R in two parts, one of them shunted by an antiparallel pair of equal diodes.
 *
 * Each diode follows Shockley's law I = Is (exp(v/(n·Vt)) − 1) (W. Shockley, Bell System Technical Journal 28, 1949),
 * so the pair carries 2 Is sinh(vx/(n·Vt)), and Kirchhoff's current law at its node reads
 *
 *     (vo − vx)/(Rf1 + Rg) = vx/Rf2 + 2 Is sinh(vx/(n·Vt)),     vn = Rg (vo − vx)/(Rf1 + Rg)
 */
import type { AmplitudeControl, Circuit } from '#shared/schemas/circuit.ts'
import type { GainPath } from '#sim/circuit/gain-path.ts'

type Diodes = Extract<AmplitudeControl, { kind: 'diodes' }>

/** Newton steps; from the start below the method converges monotonically, in six or so. */
const mostSteps = 100

export class DiodePath implements GainPath {
  readonly state = null
  readonly smallSignal: { feedbackR: number; groundR: number }
  private readonly seriesG: number
  private readonly shuntG: number
  private readonly groundR: number
  private readonly saturation: number
  private readonly scale: number
  /** vx for the last output asked, so that value and slope need one solution between them. */
  private lastOutput = 0
  private lastPair = 0

  constructor({ groundR }: Circuit['gain'], diodes: Diodes) {
    this.groundR = groundR
    this.seriesG = 1 / (diodes.seriesR + groundR)
    this.shuntG = 1 / diodes.shuntedR
    this.saturation = 2 * diodes.saturationCurrent
    this.scale = diodes.emissionCoefficient * diodes.thermalVoltage
    const atZero = 1 / (this.shuntG + this.saturation / this.scale)
    this.smallSignal = { feedbackR: diodes.seriesR + atZero, groundR }
  }

  /**
   * Voltage across the pair, V. The residual is odd, increasing, and convex for positive vx, so Newton's method started
   * at or above the root descends to it. Two upper bounds are at hand: the pair left out, and the pair carrying all the
   * current that the output could drive; the second also keeps sinh from overflowing.
   */
  pairVoltage(vo: number): number {
    if (vo === this.lastOutput) return this.lastPair
    const { seriesG, shuntG, saturation, scale } = this
    const drive = Math.abs(vo) * seriesG
    let vx = Math.min(drive / (seriesG + shuntG), scale * Math.asinh(drive / saturation))
    for (let n = 0; n < mostSteps; n++) {
      const grown = Math.exp(vx / scale)
      const sinh = vx < scale * 1e-3 ? Math.sinh(vx / scale) : (grown - 1 / grown) / 2
      const cosh = (grown + 1 / grown) / 2
      const residual = (seriesG + shuntG) * vx + saturation * sinh - drive
      const step = residual / (seriesG + shuntG + (saturation * cosh) / scale)
      vx -= step
      if (!(step > 4 * Number.EPSILON * vx)) break
    }
    this.lastOutput = vo
    this.lastPair = vo < 0 ? -vx : vx
    return this.lastPair
  }

  invertingInput(vo: number): number {
    return this.groundR * this.current(vo)
  }
  invertingInputRate(vo: number, _device: number, voRate: number): number {
    const pairG = (this.saturation / this.scale) * Math.cosh(this.pairVoltage(vo) / this.scale)
    const pairShare = this.seriesG / (this.seriesG + this.shuntG + pairG)
    return this.groundR * this.seriesG * (1 - pairShare) * voRate
  }
  deviceRate(): number {
    return 0
  }
  current(vo: number): number {
    return this.seriesG * (vo - this.pairVoltage(vo))
  }
}
