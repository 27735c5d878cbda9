/** The envelope as it is drawn. */
import type { Envelope } from '#sim/types.ts'

/**
 * The successive maxima of |output| without those that lie below both neighbours: an output that swings about an
 * offset has a higher and a lower maximum in every cycle, and a line through both would saw up and down.
 * @param lift added to every value, V
 */
export function envelopeLine({ time, value }: Envelope, lift = 0): Envelope {
  const kept = (_one: number, at: number) => !(value[at]! < value[at - 1]! && value[at]! < value[at + 1]!)
  return { time: time.filter(kept), value: value.filter(kept).map((one) => one + lift) }
}
