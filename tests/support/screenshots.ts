/**
 * `npm run screenshots [folder]`: every page of the built demo at three widths in both themes, to be looked at before a
 * page is called done. Writes `<page>-<width>-<theme>.png`.
 */
import { mkdir } from 'node:fs/promises'
import { join } from 'node:path'
import { launchBrowser, openPage, signIn } from '#tests/support/browser.ts'
import { serveApp } from '#tests/support/served-app.ts'

const pages: Record<string, string> = {
  designs: '/designs',
  'start-up': '/designs/1/start-up',
  'start-up-diodes': '/designs/2/start-up',
  'start-up-lamp': '/designs/3/start-up',
  'start-up-single-supply': '/designs/4/start-up',
  'start-up-does-not-start': '/designs/6/start-up',
  tone: '/designs/1/tone',
  'tone-does-not-start': '/designs/6/tone',
  runs: '/runs',
  run: '/runs/1',
  compare: '/runs/compare?a=1&b=2',
  account: '/account',
  'not-found': '/nowhere',
}
/** Time for the engine and the plots on a small machine, ms. */
const settlingTime = 3000

const folder = process.argv[2] ?? '.cache/screenshots'
await mkdir(folder, { recursive: true })
const app = await serveApp()
const browser = await launchBrowser()
try {
  for (const width of [1440, 1024, 390])
    for (const colorScheme of ['light', 'dark'] as const) {
      const { page, context } = await openPage(browser, app.url, { width, colorScheme })
      const shoot = (name: string) =>
        page.screenshot({ path: join(folder, `${name}-${width}-${colorScheme}.png`), fullPage: true })
      await page.goto('/sign-in')
      await page.getByRole('button', { name: 'Sign in' }).waitFor()
      await shoot('sign-in')
      await signIn(page, 'engineer')
      for (const [name, path] of Object.entries(pages)) {
        await page.goto(path)
        await page.waitForTimeout(settlingTime)
        await shoot(name)
      }
      await context.close()
    }
} finally {
  await browser.close()
  await app.remove()
}
console.log(`Screenshots are in ${folder}.`)
