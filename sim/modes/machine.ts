/**
 * The mode machine: integrates in one mode until one of its guards fires, takes the state there, and goes on in the next
 * mode. No right-hand side ever clips: a general integrator would step over the instant at which the output leaves a
 * rail and report success with volts of error.
 */
import { railAt, type RailPiece } from '#sim/circuit/rails.ts'
import { voIndex, type Plant } from '#sim/circuit/plant.ts'
import { Amplitude } from '#sim/modes/amplitude.ts'
import { guardsOf, modeAt, motion, nextMode } from '#sim/modes/mode.ts'
import { firstFiring, Stretch, watch, type Firing } from '#sim/modes/stretch.ts'
import { integrate, type IntegrationOutcome, type WorkMeter } from '#sim/ode/integrate.ts'
import type { Mode } from '#sim/types.ts'

/** Where a motion stands. */
export interface Position {
  t: number
  y: number[]
  mode: Mode
}

/** Sees the motion as it is integrated. */
export interface Observer {
  /** A mode begins at `position` (also at the start of a run). */
  enter?(position: Readonly<Position>): void
  /**
   * The motion from `a` to `b` is known and `stretch` can be read there.
   * @returns the time at which to stop for good, within [a, b], or nothing to go on
   */
  advance(stretch: Stretch, a: number, b: number): number | void
}

export interface MachineSettings {
  plant: Plant
  pieces: readonly RailPiece[]
  /** Error allowed per step, relative to the states' present size. */
  tolerance: number
  /** The same where a stiff amplifier keeps the steps far shorter than accuracy asks for. */
  stiffTolerance: number
  /** Sizes below which the states do not matter, each in its unit. */
  smallest: number[]
  /** Volts that count as large in this circuit. */
  scale: number
  /** Shortest time that the equations know, s: a step that is surely accepted. */
  shortTime: number
  /** s. */
  longestStep: number
  /** The same in the linear mode, where the amplifier's own pole limits it, s. */
  longestLinearStep: number
  /** About one period, s. */
  period: number
  /** Whether the amplifier's own pole, not accuracy, limits the steps in the linear mode. */
  stiff: boolean
  work: WorkMeter
}

export type MotionOutcome =
  'reachedEnd' | 'stopped' | 'modesDoNotRest' | Exclude<IntegrationOutcome, 'endedByObserver' | 'reachedEnd'>

/** Periods after which the integrator is set to the amplitude anew. */
const periodsPerSetting = 8
/** Looks at the guards per longest step. */
const looksPerLongestStep = 8
/** Mode changes in a row that take no time before the machine gives up. */
const mostInstantChanges = 12

export class Machine {
  /** Mode changes located so far. */
  events = 0
  private readonly stretch: Stretch
  private readonly amplitude: Amplitude

  constructor(readonly settings: MachineSettings) {
    this.stretch = new Stretch(settings.plant.dimension)
    this.amplitude = new Amplitude(settings.smallest, settings.period)
  }

  /** Position at power-on. */
  start(y: number[]): Position {
    const { plant, pieces } = this.settings
    return { t: 0, y, mode: modeAt(plant, pieces[0]!, 0, y) }
  }

  /** Moves `position` on until `end` (s) or until an observer stops it. */
  run(position: Position, end: number, observers: readonly Observer[]): MotionOutcome {
    const { period } = this.settings
    let instantChanges = 0
    for (const observer of observers) observer.enter?.(position)
    while (position.t < end) {
      const before = position.t
      const piece = this.pieceAt(position.t)
      const until = Math.min(end, piece.end, position.t + periodsPerSetting * period)
      const { outcome, firing } = this.runMode(position, piece, until, observers)
      if (outcome !== 'reachedEnd') return outcome
      if (firing) position.mode = nextMode(firing.guard.limit)
      else if (until === end) break
      else if (until < piece.end) continue
      this.settle(position, piece)
      if (!firing)
        position.mode = modeAt(this.settings.plant, this.pieceAt(position.t), position.t, position.y)
      this.events++
      instantChanges = position.t > before ? 0 : instantChanges + 1
      if (instantChanges > mostInstantChanges) return 'modesDoNotRest'
      for (const observer of observers) observer.enter?.(position)
    }
    return 'reachedEnd'
  }

  private pieceAt(t: number): RailPiece {
    return this.settings.pieces.findLast((piece) => piece.start <= t)!
  }

  /** Puts a held output exactly on its rail. */
  private settle({ t, y, mode }: Position, piece: RailPiece): void {
    if (mode === 'heldHigh') y[voIndex] = railAt(piece, piece.high, t)
    if (mode === 'heldLow') y[voIndex] = -railAt(piece, piece.low, t)
  }

  /** One mode, from `position` to the first guard that fires or to `until`; moves `position` there. */
  private runMode(position: Position, piece: RailPiece, until: number, observers: readonly Observer[]) {
    const { plant, scale, shortTime, longestStep, longestLinearStep, work } = this.settings
    const { stretch } = this
    const stiff = this.settings.stiff && position.mode === 'linear'
    const tolerance = stiff ? this.settings.stiffTolerance : this.settings.tolerance
    const { mode } = position
    const watched = guardsOf(plant, piece, mode, scale).map((guard) => watch(guard, position.t, position.y))
    let firing: Firing | null = null
    let stopped = false
    const outcome = integrate(
      {
        derivative: motion(plant, piece, mode),
        start: position.t,
        end: until,
        initial: position.y,
        tolerance: position.y.map((_value, index) => this.amplitude.size(index) * tolerance),
        stiff,
        firstStep: Math.min(shortTime, until - position.t),
        longestStep: mode === 'linear' ? longestLinearStep : longestStep,
        work,
      },
      (from, to, y, dense) => {
        this.amplitude.note(to, y)
        stretch.set(mode, from, to, y, dense)
        const looks = Math.max(1, Math.ceil(((to - from) / longestStep) * looksPerLongestStep))
        let a = from
        for (let look = 1; look <= looks; look++) {
          const b = look === looks ? to : from + ((to - from) * look) / looks
          firing = firstFiring(watched, stretch, a, b)
          const reached = firing ? firing.time : b
          const stop = this.show(observers, a, reached)
          if (stop !== null) {
            stopped = true
            this.moveTo(position, stop)
            return false
          }
          if (firing) {
            this.moveTo(position, reached)
            return false
          }
          a = b
        }
        position.t = to
        for (let i = 0; i < y.length; i++) position.y[i] = y[i]!
        return true
      },
    )
    if (outcome !== 'reachedEnd' && outcome !== 'endedByObserver') return { outcome, firing: null }
    if (!firing && !stopped) position.t = until
    return {
      outcome: stopped ? ('stopped' as const) : ('reachedEnd' as const),
      firing: firing as Firing | null,
    }
  }

  /** Lets every observer see [a, b]; the earliest stop asked for, or null. */
  private show(observers: readonly Observer[], a: number, b: number): number | null {
    let stop: number | null = null
    for (const observer of observers) {
      const wish = observer.advance(this.stretch, a, b)
      if (wish !== undefined && (stop === null || wish < stop)) stop = wish
    }
    return stop
  }

  private moveTo(position: Position, t: number): void {
    const y = this.stretch.at(t)
    position.t = t
    for (let i = 0; i < y.length; i++) position.y[i] = y[i]!
  }
}
