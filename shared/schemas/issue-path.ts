import type { z } from 'zod'

/** Where an issue lies, as it is sent and shown: JSON knows no symbols. */
export function issuePath({ path }: Pick<z.core.$ZodIssue, 'path'>): (string | number)[] {
  return path.map((part) => (typeof part === 'symbol' ? String(part) : part))
}
