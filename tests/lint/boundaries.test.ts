/** The import boundaries bite: each forbidden direction is planted once and must be refused. */
import { ESLint } from 'eslint'
import { describe, expect, it } from 'vitest'

const eslint = new ESLint()

/** Lints `code` as if it stood in an existing file, so that the type-aware parser knows the file. */
async function refusals(filePath: string, code: string): Promise<string[]> {
  const [result] = await eslint.lintText(code, { filePath })
  return result!.messages.map((message) => message.ruleId ?? message.message)
}

const forbidden: [string, string, string][] = [
  [
    'shared',
    'shared/roles.ts',
    `import { engineVersion } from '#sim/index.ts'\nexport const x = engineVersion\n`,
  ],
  ['sim', 'sim/index.ts', `import { parseConfig } from '#server/config.ts'\nexport const x = parseConfig\n`],
  [
    'server outside compute',
    'server/config.ts',
    `import { engineVersion } from '#sim/index.ts'\nexport const x = engineVersion\n`,
  ],
  [
    'client lib',
    'client/lib/api.ts',
    `import { engineVersion } from '#sim/index.ts'\nexport const x = engineVersion\n`,
  ],
  [
    'client feature to feature',
    'client/features/tone/tone-page.tsx',
    `export * from '#client/features/start-up/start-up-page.tsx'\n`,
  ],
  [
    'client to server',
    'client/lib/api.ts',
    `import { parseConfig } from '#server/config.ts'\nexport const x = parseConfig\n`,
  ],
]

describe('import boundaries', () => {
  it.each(forbidden)('refuses a forbidden import from %s', async (_name, filePath, code) => {
    expect(await refusals(filePath, code)).toContain('boundaries/dependencies')
  })

  it('allows a type of the engine in the client', async () => {
    const code = `import type { Mode } from '#sim/types.ts'\nexport const mode: Mode = 'linear'\n`
    expect(await refusals('client/lib/api.ts', code)).not.toContain('boundaries/dependencies')
  })

  it('refuses the clock and unseeded chance in the engine', async () => {
    const code = `export const x = Math.random() + Date.now()\n`
    expect(await refusals('sim/index.ts', code)).toEqual(
      expect.arrayContaining(['no-restricted-properties', 'no-restricted-globals']),
    )
  })
})
