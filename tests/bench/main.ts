/**
 * Speed and memory of the engine (`npm run bench`; `--json` prints one JSON object). Times are multiples of a bare loop
 * that fills the same number of samples by a 3 × 3 affine recurrence in the same run, so that they mean something on any
 * machine. Exits with 1 when a bound is broken.
 */
import { writeSync } from 'node:fs'
import { simulate, smallSignal, type Circuit } from '#sim/index.ts'
import reference from '#tests/reference/reference-values.json' with { type: 'json' }

const samples = 30_001
const sampleInterval = 2e-6
const duration = (samples - 1) * sampleInterval
const repetitions = 9
/** The bare loop is short: each of its timings is the mean of this many. */
const unitRuns = 50

/** Largest time of the record over the bare loop. `odex` follows a stiff amplifier, so this is no small number. */
const mostRecordUnits = 1200
/** Largest time of the poles over the bare loop. */
const mostPolesUnits = 1
/** Memory that a record may keep, over the size of its three columns. */
const mostMemoryRatio = 2

/** Fills three columns by y ← M·y + b, and returns a value that keeps the loop alive. */
function bareLoop(): number {
  const [x, y, z] = [new Float64Array(samples), new Float64Array(samples), new Float64Array(samples)]
  let [a, b, c] = [1, 0.5, 0.25]
  for (let n = 0; n < samples; n++) {
    x[n] = a
    y[n] = b
    z[n] = c
    const nextA = 0.99 * a + 0.012 * b - 0.001 * c + 1e-6
    const nextB = -0.012 * a + 0.99 * b + 0.002 * c - 1e-6
    c = 0.001 * a - 0.002 * b + 0.9 * c + 1e-6
    a = nextA
    b = nextB
  }
  return x[samples - 1]! + y[samples - 1]! + z[samples - 1]!
}

/** Least of several timings, ms: what else the machine does can only add. */
function leastTime(action: () => unknown, times = repetitions): number {
  let least = Infinity
  for (let n = 0; n < times; n++) {
    const start = performance.now()
    action()
    least = Math.min(least, performance.now() - start)
  }
  return least
}

function collected(): number {
  globalThis.gc?.()
  globalThis.gc?.()
  const { heapUsed, arrayBuffers } = process.memoryUsage()
  return heapUsed + arrayBuffers
}

const circuit = reference.cases.A.circuit as Circuit
const record = () => simulate(circuit, { stimulus: { kind: 'offset' }, duration, sampleInterval })

const unit = leastTime(() => Array.from({ length: unitRuns }, bareLoop)) / unitRuns
const recordTime = leastTime(record)
const polesTime = leastTime(() => smallSignal(circuit))
const before = collected()
const kept = record()
const memory = collected() - before
const columns = kept.vo.byteLength + kept.v1.byteLength + kept.v2.byteLength

const results = {
  samples,
  unitMilliseconds: unit,
  record: { milliseconds: recordTime, units: recordTime / unit, most: mostRecordUnits, cost: kept.cost },
  poles: { milliseconds: polesTime, units: polesTime / unit, most: mostPolesUnits },
  memory: { bytes: memory, ofColumns: memory / columns, most: mostMemoryRatio },
}
const broken = [
  results.record.units > mostRecordUnits && 'the record takes too long',
  results.poles.units > mostPolesUnits && 'the poles take too long',
  globalThis.gc && results.memory.ofColumns > mostMemoryRatio && 'the record keeps too much memory',
].filter((complaint) => typeof complaint === 'string')

const table = [
  `bare loop of ${samples} samples   ${unit.toFixed(3)} ms = 1 unit`,
  `record of 60 ms at 2 µs       ${recordTime.toFixed(1)} ms, ${results.record.units.toFixed(0)} units (at most ${mostRecordUnits})`,
  `  ${kept.cost.steps} steps, ${kept.cost.evaluations} evaluations, ${kept.cost.events} mode changes`,
  `poles and critical gain       ${polesTime.toFixed(4)} ms, ${results.poles.units.toFixed(3)} units (at most ${mostPolesUnits})`,
  `memory kept by the record     ${results.memory.ofColumns.toFixed(2)} of its columns (at most ${mostMemoryRatio})`,
  ...broken.map((complaint) => `BROKEN: ${complaint}`),
]
writeSync(
  1,
  `${process.argv.includes('--json') ? JSON.stringify({ ...results, broken }, null, 2) : table.join('\n')}\n`,
)
process.exitCode = broken.length > 0 ? 1 : 0
