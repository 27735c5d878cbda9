import { describe, expect, it } from 'vitest'
import { line } from '#shared/schemas/text.ts'

const name = line('Name', 120)
const refusal = (text: string) => name.safeParse(text).error?.issues.map(({ message }) => message)

describe('a name of one line', () => {
  // Combining mark, joined emoji, right-to-left script, zero-width joiner within a word: all in ordinary use.
  it.each(['Ωmega', '正弦波 🎛', 'e\u0301tude', '👩\u200d🔬 lab', 'مرحبا', 'کتاب\u200cها', '-', '⚡'])(
    'takes %s',
    (text) => {
      expect(name.parse(` ${text} `)).toBe(text)
    },
  )

  // Unicode's names: zero width space, line separator, override, isolate, word joiner, a half surrogate pair.
  it.each([
    ['\u200b', 'Name has no visible character.'],
    ['\u2060\u2060', 'Name has no visible character.'],
    ['a\u2028b', 'Name may not contain line breaks or control characters.'],
    ['\u202efdp.exe', 'Name may not contain line breaks or control characters.'],
    ['\u2066a\u2069', 'Name may not contain line breaks or control characters.'],
    ['a\ud800', 'Name may not contain line breaks or control characters.'],
    ['   ', 'Name is missing.'],
    ['', 'Name is missing.'],
  ])('refuses %j', (text, sentence) => {
    expect(refusal(text)).toEqual([sentence])
  })
})
