/** The whole job in a real browser: an engineer proves a design and saves the run, a reviewer replays it. */
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser, openPage, signIn } from '#tests/support/browser.ts'
import { serveApp, type ServedApp } from '#tests/support/served-app.ts'

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

/** Types into a labelled field and leaves it, as a person does. */
async function enter(page: Page, label: string, text: string) {
  const field = page.getByLabel(label, { exact: true })
  await field.fill(text)
  await field.press('Enter')
}

/** A figure of the verdict line as shown, number only. */
async function figure(page: Page, name: string): Promise<string> {
  const line = page.locator('dl[aria-label="Figures"]')
  return line.innerText().then((text) => {
    const rows = text.split('\n').map((row) => row.trim())
    return rows[rows.indexOf(name) + 1] ?? ''
  })
}

describe('from power-on to a replayed run', () => {
  it('lets an engineer make a design, prove it and save the run, and a reviewer replay it', async () => {
    const engineer = await openPage(browser, app.url)
    const { page } = engineer
    await signIn(page, 'engineer')

    await page.getByRole('button', { name: 'New design' }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByRole('textbox', { name: /^Name/ }).fill('Line probe, 1 k and 100 n')
    await dialog.getByRole('combobox', { name: /^Project/ }).selectOption({ label: 'A new project' })
    await dialog.getByRole('textbox', { name: /^Name of the new project/ }).fill('Line probes')
    await dialog.getByRole('button', { name: 'Create design' }).click()
    await page.waitForURL('**/start-up')

    // Common practice, no source: 1 kΩ and 100 nF with 68 kΩ / 33 kΩ at ±9 V gave 1.585 kHz on the bench.
    await enter(page, 'series R', '1k')
    await enter(page, 'series C', '100n')
    await enter(page, 'feedback R', '68k')
    await enter(page, 'ground R', '33k')
    await page.getByText('It starts.').waitFor()
    await expect.poll(() => figure(page, 'Frequency'), { timeout: 30_000 }).toMatch(/^1\.5[789]/)

    // Below the critical gain it says so, and nothing pretends to be a tone.
    await enter(page, 'feedback R', '64k')
    await page.getByText('It does not start.').waitFor()

    await page.getByRole('button', { name: 'Undo' }).click()
    await page.getByText('It starts.').waitFor()

    await page.getByRole('link', { name: /Tone/ }).click()
    await page.getByRole('heading', { name: 'One settled period' }).waitFor()

    await page.getByText(/saved/i).first().waitFor()
    await page.getByRole('button', { name: 'Save run' }).click()
    const save = page.getByRole('dialog')
    await save.getByLabel('Title').fill('Bench pair, first proof')
    await save.getByLabel('Note').fill('68 k over 33 k, as built.')
    await save.getByRole('button', { name: 'Save run' }).click()
    await save.getByRole('link', { name: 'Open the run' }).click()
    await page.getByRole('heading', { name: 'Bench pair, first proof' }).waitFor()
    const runAddress = page.url()
    expect(engineer.errors).toEqual([])

    const reviewer = await openPage(browser, app.url)
    await signIn(reviewer.page, 'reviewer')
    await reviewer.page.goto(runAddress)
    await reviewer.page.getByText('68 k over 33 k, as built.').waitFor()
    await reviewer.page.getByRole('button', { name: 'Replay' }).click()
    await reviewer.page.getByText('It replays.').waitFor({ timeout: 60_000 })
    expect(reviewer.errors).toEqual([])
    await engineer.context.close()
    await reviewer.context.close()
  })
})
