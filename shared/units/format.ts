/** Numbers and quantities as the interface writes them: the one formatter. */
const prefixes: Record<number, string> = {
  [-18]: 'a',
  [-15]: 'f',
  [-12]: 'p',
  [-9]: 'n',
  [-6]: 'µ',
  [-3]: 'm',
  0: '',
  3: 'k',
  6: 'M',
  9: 'G',
  12: 'T',
}

/** Thin space between number and unit; a true minus sign before negative numbers. */
export const thinSpace = '\u2009'
export const minusSign = '\u2212'

export interface FormatOptions {
  /** Significant digits, 4 unless told. */
  digits?: number
  /** Always show a sign, `+` included. */
  signed?: boolean
}

/** The parts of a formatted quantity, for places that set number and unit in different type. */
export interface QuantityParts {
  number: string
  /** SI prefix and unit, `kHz`; empty for a pure number. */
  unit: string
}

function withSign(text: string, signed: boolean): string {
  if (text.startsWith('-')) return minusSign + text.slice(1)
  return signed ? `+${text}` : text
}

/** From here on thousands are set apart. */
const grouped = new Intl.NumberFormat('en', { maximumFractionDigits: 0 })
const leastGrouped = 1e4

/** Rounds to `digits` significant digits without exponent and without trailing zeros after the point. */
function plain(value: number, digits: number): string {
  const rounded = Number(value.toPrecision(digits))
  const text = rounded.toString()
  if (text.includes('e')) return value.toExponential(digits - 1)
  return Math.abs(rounded) >= leastGrouped && Number.isInteger(rounded) ? grouped.format(rounded) : text
}

/** Power of ten of the SI prefix, from atto to tera, that brings a value other than zero to between 1 and 1000. */
export function prefixExponent(value: number): number {
  const thousands = Math.floor(Math.log10(Math.abs(value)) / 3 + 1e-12)
  return Math.min(12, Math.max(-18, thousands * 3))
}

/**
 * A value in SI units as engineering number and prefixed unit: 989.69 Hz, 2.2 kΩ, −1.5 mV. A unit that begins with
 * `1/` takes no prefix: k1/s would say nothing. A slew rate is in V/µs, as every data sheet has it.
 */
export function quantityParts(value: number, unit: string, options: FormatOptions = {}): QuantityParts {
  const { digits = 4, signed = false } = options
  if (Number.isNaN(value)) return { number: '–', unit }
  if (!Number.isFinite(value)) return { number: withSign(value < 0 ? '-∞' : '∞', signed), unit }
  if (value === 0) return { number: '0', unit }
  // Slew rates are given in volts a microsecond.
  if (unit === 'V/s' && Math.abs(value) >= 1e3)
    return { number: withSign(plain(value / 1e6, digits), signed), unit: 'V/µs' }
  const rounded = Number(value.toPrecision(digits))
  const exponent = unit.startsWith('1/') ? 0 : prefixExponent(rounded)
  return {
    number: withSign(plain(rounded / 10 ** exponent, digits), signed),
    unit: `${prefixes[exponent] ?? ''}${unit}`,
  }
}

/** Number, thin space, prefixed unit. */
export function formatQuantity(value: number, unit: string, options?: FormatOptions): string {
  const parts = quantityParts(value, unit, options)
  return parts.unit ? `${parts.number}${thinSpace}${parts.unit}` : parts.number
}

/** A pure ratio as number of per cent and its sign: 0.01375 → 1.375 and %. */
export function percentParts(ratio: number, options: FormatOptions = {}): QuantityParts {
  const { digits = 4, signed = false } = options
  if (!Number.isFinite(ratio)) return { number: '–', unit: '' }
  return { number: withSign(plain(ratio * 100, digits), signed), unit: '%' }
}

/** A pure ratio in per cent: 0.01375 → `1.375 %`. */
export function formatPercent(ratio: number, options?: FormatOptions): string {
  const { number, unit } = percentParts(ratio, options)
  return unit ? `${number}${thinSpace}${unit}` : number
}

/** A pure number with a true minus sign. */
export function formatNumber(value: number, options: FormatOptions = {}): string {
  const { digits = 4, signed = false } = options
  return Number.isFinite(value) ? withSign(plain(value, digits), signed) : '–'
}

/** A value as an engineer types it into a field: `4k7` style is accepted there, this writes `4.7k`. */
export function formatInput(value: number, digits = 6): string {
  const parts = quantityParts(value, '', { digits })
  return `${parts.number.replace(minusSign, '-')}${parts.unit.replace('µ', 'u')}`
}

/** A count, rounded, its thousands set apart: 30,001. */
export function formatCount(value: number): string {
  return grouped.format(value)
}
