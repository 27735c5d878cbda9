import { z } from 'zod'

/** Whether a text is free of line breaks, NUL and the other control characters (Unicode category Cc). */
export const isPlainText = (text: string) => !/\p{Cc}/u.test(text)

/** Whether a reader sees anything of it: a letter, number, mark of punctuation or symbol (categories L, N, P, S). */
const isVisible = (text: string) => /[\p{L}\p{N}\p{P}\p{S}]/u.test(text)

/**
 * Whether a text is free of line and paragraph separators, half characters, and the marks that turn the direction of
 * what follows, with which one name can be made to look like another (Unicode Technical Report 36, §2.5).
 */
const isOrderly = (text: string) => !/[\p{Zl}\p{Zp}\p{Cs}\u202a-\u202e\u2066-\u2069]/u.test(text)

/** One line of text that a person gave a thing as its name, trimmed. */
export function line(name: string, longest: number) {
  return z
    .string({ error: `${name} is missing.` })
    .trim()
    .min(1, { error: `${name} is missing.` })
    .max(longest, { error: `${name} may have at most ${longest} characters.` })
    .refine((text) => isPlainText(text) && isOrderly(text), {
      error: `${name} may not contain line breaks or control characters.`,
    })
    .refine((text) => text === '' || isVisible(text), { error: `${name} has no visible character.` })
}
