import { z } from 'zod'

/** Whether a text is free of line breaks, NUL and the other control characters (Unicode category Cc). */
export const isPlainText = (text: string) => !/\p{Cc}/u.test(text)

/** One line of text that a person gave a thing as its name, trimmed. */
export function line(name: string, longest: number) {
  return z
    .string({ error: `${name} is missing.` })
    .trim()
    .min(1, { error: `${name} is missing.` })
    .max(longest, { error: `${name} may have at most ${longest} characters.` })
    .refine(isPlainText, { error: `${name} may not contain line breaks or control characters.` })
}
