/** Debian's Chromium through playwright-core, quiet on a machine without network. */
import { createRequire } from 'node:module'
import { readFileSync } from 'node:fs'
import type axeCore from 'axe-core'
import { chromium, type Browser, type Page } from 'playwright-core'
import { demoAccounts } from '#server/db/demo/accounts.ts'
import type { Role } from '#shared/roles.ts'

export function launchBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  })
}

export interface OpenPageOptions {
  width?: number
  height?: number
  colorScheme?: 'light' | 'dark'
}

/** A page of its own session. Errors that it throws or logs are collected in `errors`, to be asserted empty. */
export async function openPage(browser: Browser, baseURL: string, options: OpenPageOptions = {}) {
  const { width = 1440, height = 900, colorScheme = 'light' } = options
  const context = await browser.newContext({
    baseURL,
    viewport: { width, height },
    colorScheme,
    reducedMotion: 'reduce',
    acceptDownloads: true,
  })
  const page = await context.newPage()
  const errors: string[] = []
  page.on('pageerror', (error) => errors.push(error.message))
  page.on('console', (message) => {
    if (message.type() === 'error') errors.push(message.text())
  })
  return { page, context, errors }
}

/** Signs in through the form as the first demo person of that role. */
export async function signIn(page: Page, role: Role): Promise<void> {
  const account = demoAccounts.find((candidate) => candidate.role === role)
  if (!account) throw new Error(`no demo ${role}`)
  await page.goto('/sign-in')
  await page.getByLabel('E-mail').fill(account.email)
  await page.getByLabel('Password').fill(account.password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL('**/designs')
}

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8')

/** What axe-core finds wrong on the page by WCAG 2.2 A and AA, one line a finding. */
export async function accessibilityFindings(page: Page): Promise<string[]> {
  await page.evaluate(axeSource)
  return page.evaluate(async () => {
    const { axe } = window as unknown as { axe: typeof axeCore }
    const { violations } = await axe.run(document, {
      runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'],
    })
    return violations.flatMap((violation) =>
      violation.nodes.map(
        (node) => `${violation.id}: ${node.target.join(' ')} (${node.failureSummary ?? ''})`,
      ),
    )
  })
}
