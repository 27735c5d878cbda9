/** What every browser test begins with: the built application with a fresh demo, a browser, and people who sign in. */
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll } from 'vitest'
import { launchBrowser, openPage, signIn, type OpenPageOptions } from '#tests/support/browser.ts'
import { serveApp, type ServedApp } from '#tests/support/served-app.ts'
import type { Role } from '#shared/roles.ts'

export interface BrowserTest {
  app(): ServedApp
  /** A page of a session of its own, nobody signed in. */
  openStranger(options?: OpenPageOptions): ReturnType<typeof openPage>
  /** The same, signed in, at `path`. */
  openAs(role: Role, path?: string, options?: OpenPageOptions): ReturnType<typeof openPage>
}

/** Serves the application for one test file. Call it at the top of the file. */
export function serveForTests(): BrowserTest {
  let app: ServedApp
  let browser: Browser
  beforeAll(async () => {
    app = await serveApp()
    browser = await launchBrowser()
  })
  afterAll(async () => {
    await browser?.close()
    await app?.remove()
  })
  const openStranger = (options?: OpenPageOptions) => openPage(browser, app.url, options)
  return {
    app: () => app,
    openStranger,
    async openAs(role, path, options) {
      const opened = await openStranger(options)
      await signIn(opened.page, role)
      if (path) await opened.page.goto(path)
      return opened
    },
  }
}

/** Types into a labelled field and confirms, as a person does. */
export async function enter(page: Page, label: string, text: string): Promise<void> {
  const field = page.getByLabel(label, { exact: true })
  await field.fill(text)
  await field.press('Enter')
}

/** The verdict line as shown: names and values, one a line. */
export function verdictLine(page: Page): Promise<string> {
  return page.locator('dl[aria-label="Figures"]').innerText()
}

/** A figure of the verdict line as shown, number first; `–` while there is none. */
export async function figure(page: Page, name: string): Promise<string> {
  const rows = (await verdictLine(page)).split('\n').map((row) => row.trim())
  return rows[rows.indexOf(name) + 1] ?? ''
}
