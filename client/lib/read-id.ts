/** An identifier as an address holds it: a positive whole number, or null for anything else. */
export function readId(text: string | null | undefined): number | null {
  return text && /^[1-9]\d{0,15}$/.test(text) ? Number(text) : null
}
