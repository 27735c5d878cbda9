import { z } from 'zod'

/** One line of text that a person gave a thing as its name, trimmed. */
export function line(name: string, longest: number) {
  return z
    .string({ error: `${name} is missing.` })
    .trim()
    .min(1, { error: `${name} is missing.` })
    .max(longest, { error: `${name} may have at most ${longest} characters.` })
}
