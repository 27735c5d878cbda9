/**
 * Reads a quantity as engineers type it: plain or with an SI prefix (`4.7k`, `100n`, `1e-9`), with the unit or without
 * it (`10 kΩ`, `0.5 V/µs`), decimal comma allowed, or in the letter code of IEC 60062 where the prefix or unit stands in
 * the place of the decimal sign (`4k7`, `R47`, `4n7`, `2R2`). `M` is mega and `m` milli, as SI has it.
 */
export type Parsed = { ok: true; value: number } | { ok: false; sentence: string }

const exponents: Record<string, number> = {
  a: -18,
  f: -15,
  p: -12,
  n: -9,
  u: -6,
  m: -3,
  '': 0,
  k: 3,
  M: 6,
  G: 9,
  T: 12,
}

/** Prefixes whose letter case people mix up, with the letter that they most likely meant. */
const likelyMeant: Record<string, string> = { N: 'n', P: 'p', U: 'u', g: 'G', t: 'T' }

const number = String.raw`(?:\d+\.?\d*|\.\d+)`
const plainForm = new RegExp(`^([+-]?)(${number})(?:[eE]([+-]?\\d{1,4}))?(.*)$`)
const codeForm = /^([+-]?)(\d*)([A-Za-z])(\d+)(.*)$/

/** One spelling for signs, prefixes and spaces; the case of letters is kept. */
function normalise(text: string): string {
  return text
    .trim()
    .replace(/[\u2212\u2013]/g, '-')
    .replace(/[\u00b5\u03bc]/g, 'u')
    .replace(/\u2126/g, 'Ω')
    .replace(/[\s\u2009\u202f\u00a0]+/g, '')
}

/** Whether `text` names the unit itself; `ohm` and the letter `R` stand for Ω. */
function isUnit(text: string, unit: string): boolean {
  if (text === '' || text === unit) return true
  return unit === 'Ω' && /^(ohms?|R)$/i.test(text)
}

/** Power of ten of a prefix with or without the unit behind it, or null when it is neither. */
function tailExponent(tail: string, unit: string): number | null {
  // Slew rates are given in volts a microsecond: a bare number is one.
  if (unit === 'V/s' && tail === '') return 6
  if (isUnit(tail, unit)) return 0
  if (unit === '%' || tail === '%') return null
  const exponent = exponents[tail.charAt(0)]
  if (exponent !== undefined && isUnit(tail.slice(1), unit)) return exponent
  // IEC 60062 writes kilo-ohms with a capital K; kelvin is the only unit that the letter could be taken for.
  if (tail.startsWith('K') && unit !== 'K' && isUnit(tail.slice(1), unit)) return 3
  if (unit === 'V/s' && /^V\/[um]s$/.test(tail)) return tail === 'V/us' ? 6 : 3
  return null
}

/** Power of ten of the letter that stands in the place of the decimal sign, or null. */
function codeExponent(letter: string, unit: string): number | null {
  if (letter === unit || (unit === 'Ω' && letter === 'R')) return 0
  if (letter === 'K' && unit !== 'K') return 3
  return exponents[letter] ?? null
}

function refusal(typed: string, unit: string, tail: string): Parsed {
  const meant = likelyMeant[tail.charAt(0)]
  if (meant && isUnit(tail.slice(1), unit))
    return { ok: false, sentence: `“${typed}”: ${tail.charAt(0)} is no prefix, write ${meant}.` }
  if (/^meg/i.test(tail))
    return { ok: false, sentence: `“${typed}”: write M for mega, such as 1M; m is milli.` }
  return {
    ok: false,
    sentence: `“${typed}” is not a number with a prefix${unit === '%' ? ', such as 1.5 %' : ' such as 4k7, 100n or 0.1u'}.`,
  }
}

function finite(sign: string, digits: string, exponent: number, typed: string): Parsed {
  // Decimal text is converted once, so that 4k7 is exactly the number 4700.
  const value = Number(`${sign}${digits}e${exponent}`)
  return Number.isFinite(value)
    ? { ok: true, value: value === 0 ? 0 : value }
    : { ok: false, sentence: `“${typed}” is too large to be a number.` }
}

/**
 * @param text as typed
 * @param unit SI unit symbol that the quantity is measured in: Ω, F, Hz, V, s, A, V/s, …, empty for a pure number, or
 *   `%` when the value is wanted as a ratio (1 % → 0.01)
 * @returns the value in that unit without prefix, or a sentence that says what is wrong
 */
export function parseQuantity(text: string, unit = ''): Parsed {
  const typed = text.trim()
  const clean = normalise(text)
  if (clean === '')
    return { ok: false, sentence: 'Nothing is typed here yet; a value such as 4k7 is needed.' }
  if (/^[+-]?(inf|infinity|∞|nan)$/i.test(clean))
    return { ok: false, sentence: `“${typed}” is not a finite number.` }
  if (/,.*[.,]|\..*,/.test(clean))
    return { ok: false, sentence: `“${typed}” has more than one decimal sign; leave thousands unseparated.` }
  if (/^[+-]?[1-9]\d{0,2},\d{3}$/.test(clean)) {
    const [whole, rest] = clean.split(',')
    return {
      ok: false,
      sentence: `“${typed}” can be read in two ways: write ${whole}.${rest} or ${whole}${rest}.`,
    }
  }
  const pointed = clean.replace(',', '.')
  const scale = unit === '%' ? -2 : 0

  const plain = plainForm.exec(pointed)
  if (plain) {
    const [, sign = '', digits = '', power = '0', tail = ''] = plain
    const exponent = tailExponent(tail, unit)
    if (exponent !== null) return finite(sign, digits, Number(power) + exponent + scale, typed)
  }
  const code = codeForm.exec(pointed)
  if (code && unit !== '%') {
    const [, sign = '', whole = '', letter = '', fraction = '', tail = ''] = code
    const exponent = codeExponent(letter, unit)
    const bare = whole === '' && letter !== 'R' && letter !== unit && !(letter in exponents) && letter !== 'K'
    if (exponent !== null && !bare && isUnit(tail, unit))
      return finite(sign, `${whole || '0'}.${fraction}`, exponent, typed)
  }
  return refusal(typed, unit, plain?.[4] ?? '')
}
