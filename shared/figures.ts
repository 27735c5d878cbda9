import type { AmplitudeControl } from '#shared/schemas/circuit.ts'

/** Where a figure is taken from. */
export type FigureSource = 'smallSignal' | 'record' | 'settled'

export interface FigureDefinition {
  key: string
  /** As the interface says it. */
  name: string
  /** SI unit, empty for pure numbers. */
  unit: string
  /** `ratio` figures are stored as 0.01 and shown as 1 %. */
  shownAs: 'quantity' | 'percent' | 'number'
  source: FigureSource
  /** One sentence, once and for all. */
  definition: string
  /**
   * Largest difference between a run and its replay that still passes: `relative` to the stored value, or `absolute`
   * in the figure's own unit, whichever is wider.
   */
  tolerance: { relative: number; absolute: number }
}

/** The only list of figures: every page, report, CSV column and replay takes name, unit and definition from here. */
export const figureDefinitions = [
  {
    key: 'gain',
    name: 'Closed-loop gain',
    unit: '',
    shownAs: 'number',
    source: 'smallSignal',
    definition: '1 + feedback R / ground R at zero signal, device cold.',
    tolerance: { relative: 1e-9, absolute: 0 },
  },
  {
    key: 'criticalGain',
    name: 'Critical gain',
    unit: '',
    shownAs: 'number',
    source: 'smallSignal',
    definition:
      'The closed-loop gain at which the growth rate is zero, in the full model with the finite amplifier.',
    tolerance: { relative: 1e-7, absolute: 0 },
  },
  {
    key: 'idealCriticalGain',
    name: 'Ideal critical gain',
    unit: '',
    shownAs: 'number',
    source: 'smallSignal',
    definition: '1 + series R / shunt R + shunt C / series C: the critical gain with a perfect amplifier.',
    tolerance: { relative: 1e-9, absolute: 0 },
  },
  {
    key: 'gainMargin',
    name: 'Gain margin',
    unit: '',
    shownAs: 'percent',
    source: 'smallSignal',
    definition: 'Closed-loop gain over critical gain, less one.',
    tolerance: { relative: 1e-5, absolute: 1e-9 },
  },
  {
    key: 'growthRate',
    name: 'Growth rate',
    unit: '1/s',
    shownAs: 'quantity',
    source: 'smallSignal',
    definition: 'Largest real part over all poles of the linear loop; positive means that it starts.',
    tolerance: { relative: 1e-5, absolute: 1e-6 },
  },
  {
    key: 'linearFrequency',
    name: 'Small-signal frequency',
    unit: 'Hz',
    shownAs: 'quantity',
    source: 'smallSignal',
    definition: 'Imaginary part of the fastest-growing pole over 2π; zero if that pole is real.',
    tolerance: { relative: 1e-7, absolute: 1e-9 },
  },
  {
    key: 'timeTo90',
    name: 'Time to 90 %',
    unit: 's',
    shownAs: 'quantity',
    source: 'record',
    definition:
      'From power-on until the successive maxima of |output|, joined linearly, first reach 90 % of the larger settled peak. A rail plateau counts at its start.',
    tolerance: { relative: 1e-4, absolute: 1e-9 },
  },
  {
    key: 'frequency',
    name: 'Frequency',
    unit: 'Hz',
    shownAs: 'quantity',
    source: 'settled',
    definition:
      'Whole settled periods between rising zero crossings of the network node, divided by their time.',
    tolerance: { relative: 1e-6, absolute: 0 },
  },
  {
    key: 'level',
    name: 'Level',
    unit: 'V',
    shownAs: 'quantity',
    source: 'settled',
    definition:
      'The larger of the settled positive and negative output peaks, volts from the reference node.',
    tolerance: { relative: 1e-5, absolute: 1e-9 },
  },
  {
    key: 'high',
    name: 'Highest output',
    unit: 'V',
    shownAs: 'quantity',
    source: 'settled',
    definition: 'Greatest output voltage over the settled periods.',
    tolerance: { relative: 1e-5, absolute: 1e-9 },
  },
  {
    key: 'low',
    name: 'Lowest output',
    unit: 'V',
    shownAs: 'quantity',
    source: 'settled',
    definition: 'Least output voltage over the settled periods.',
    tolerance: { relative: 1e-5, absolute: 1e-9 },
  },
  {
    key: 'rms',
    name: 'RMS level',
    unit: 'V',
    shownAs: 'quantity',
    source: 'settled',
    definition: 'Root mean square of the output over whole settled periods, mean included.',
    tolerance: { relative: 1e-5, absolute: 1e-9 },
  },
  {
    key: 'mean',
    name: 'Mean output',
    unit: 'V',
    shownAs: 'quantity',
    source: 'settled',
    definition: 'Mean of the output over whole settled periods.',
    tolerance: { relative: 1e-4, absolute: 1e-6 },
  },
  {
    key: 'thd',
    name: 'THD',
    unit: '',
    shownAs: 'percent',
    source: 'settled',
    definition:
      'Root sum of squares of harmonics 2 to 20 of the output over its fundamental (THD_F), whole settled periods.',
    tolerance: { relative: 1e-4, absolute: 1e-7 },
  },
  {
    key: 'thdAtInput',
    name: 'THD at the network node',
    unit: '',
    shownAs: 'percent',
    source: 'settled',
    definition: 'THD_F over harmonics 2 to 20 at the non-inverting input, the quieter node.',
    tolerance: { relative: 1e-4, absolute: 1e-7 },
  },
  {
    key: 'heldHigh',
    name: 'Held at the upper rail',
    unit: '',
    shownAs: 'percent',
    source: 'settled',
    definition: 'Share of whole settled periods during which the output is held at the upper rail.',
    tolerance: { relative: 1e-4, absolute: 1e-6 },
  },
  {
    key: 'heldLow',
    name: 'Held at the lower rail',
    unit: '',
    shownAs: 'percent',
    source: 'settled',
    definition: 'Share of whole settled periods during which the output is held at the lower rail.',
    tolerance: { relative: 1e-4, absolute: 1e-6 },
  },
  {
    key: 'slewUp',
    name: 'Slewing up',
    unit: '',
    shownAs: 'percent',
    source: 'settled',
    definition: 'Share of whole settled periods during which the output rises at its slew rate.',
    tolerance: { relative: 1e-4, absolute: 1e-6 },
  },
  {
    key: 'slewDown',
    name: 'Slewing down',
    unit: '',
    shownAs: 'percent',
    source: 'settled',
    definition: 'Share of whole settled periods during which the output falls at its slew rate.',
    tolerance: { relative: 1e-4, absolute: 1e-6 },
  },
  {
    key: 'peakOutputCurrent',
    name: 'Peak output current',
    unit: 'A',
    shownAs: 'quantity',
    source: 'settled',
    definition:
      'Greatest |current| that network, gain arm and load together draw from the amplifier over the settled periods.',
    tolerance: { relative: 1e-4, absolute: 1e-12 },
  },
] as const satisfies readonly FigureDefinition[]

export type FigureKey = (typeof figureDefinitions)[number]['key']

/** Every figure of one simulation; null where it does not exist (it dies out, it has not settled in the record). */
export type Figures = Record<FigureKey, number | null>

export const figureKeys = figureDefinitions.map((figure) => figure.key) as readonly FigureKey[]

const byKey = new Map<FigureKey, FigureDefinition & { key: FigureKey }>(
  figureDefinitions.map((figure) => [figure.key, figure]),
)

/** The definition of one figure. */
export function figure(key: FigureKey): FigureDefinition & { key: FigureKey } {
  const found = byKey.get(key)
  if (!found) throw new RangeError(`no figure ${key}`)
  return found
}

/**
 * Share of the settled period above which a limit is said to act. Beside a device that holds the level a brief touch is
 * not worth a word; without one, it is what stops the growth, however brief.
 */
export const countedShare = (control: AmplitudeControl['kind']): number => (control === 'none' ? 0 : 1e-4)
