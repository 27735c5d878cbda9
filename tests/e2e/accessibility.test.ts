/** Every page by axe-core (WCAG 2.2 A and AA), in both themes, on a desk and on a phone, and no sideways scrolling. */
import { describe, expect, it } from 'vitest'
import { accessibilityFindings } from '#tests/support/browser.ts'
import { serveForTests } from '#tests/support/e2e.ts'

const { openStranger, openAs } = serveForTests()

/** Address and the text that shows that the page has its content. */
const pages: [path: string, ready: string | RegExp][] = [
  ['/designs', 'Bare 1 kHz exciter'],
  ['/designs/1/start-up', 'What governs a settled period'],
  ['/designs/1/tone', 'One settled period'],
  ['/designs/6/start-up', 'It does not start.'],
  ['/runs', 'Power-on as drawn'],
  ['/runs/1', 'All that decides the result.'],
  ['/runs/compare?a=1&b=2', 'Power-on as drawn'],
  ['/account', /password/i],
  ['/nowhere', /not found|no such page|nothing here/i],
]

const settings = [
  { width: 1440, colorScheme: 'light' },
  { width: 390, colorScheme: 'dark' },
] as const

describe.each(settings)('at $width px, $colorScheme', ({ width, colorScheme }) => {
  it('finds nothing on the sign-in page', async () => {
    const { page, context } = await openStranger({ width, colorScheme })
    await page.goto('/sign-in')
    await page.getByRole('button', { name: 'Sign in' }).waitFor()
    expect(await accessibilityFindings(page)).toEqual([])
    await context.close()
  })

  it('finds nothing on the pages behind it', async () => {
    const { page, context, errors } = await openAs('engineer', undefined, { width, colorScheme })
    const findings: string[] = []
    for (const [path, ready] of pages) {
      await page.goto(path)
      await page.getByText(ready).first().waitFor({ timeout: 60_000 })
      findings.push(...(await accessibilityFindings(page)).map((finding) => `${path} ${finding}`))
      const overflow = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      )
      if (overflow > 0) findings.push(`${path} is ${overflow} px wider than the window`)
    }
    expect(findings).toEqual([])
    expect(errors).toEqual([])
    await context.close()
  })
})
