/** Bad input and bad luck in a real browser: each has a clear message, keeps what was typed, leaves the rest working. */
import type { Page } from 'playwright-core'
import { describe, expect, it } from 'vitest'
import { demoAccounts } from '#server/db/demo/accounts.ts'
import { enter, serveForTests } from '#tests/support/e2e.ts'

const { app, openAs, openStranger } = serveForTests()

async function openSheet(path = '/designs/1/start-up'): Promise<{ page: Page; errors: string[] }> {
  const opened = await openAs('engineer', path)
  await opened.page.getByText('It starts.').waitFor({ timeout: 60_000 })
  return opened
}

const saved = (page: Page) => page.getByText(/draft, saved/)

describe('bad input on the sheet', () => {
  it('says at the field what is wrong, keeps the text, and goes on with the last valid circuit', async () => {
    const { page, errors } = await openSheet()
    const wrong: [label: string, text: string, sentence: RegExp][] = [
      ['ground R', '', /missing|empty/i],
      ['ground R', '0', /greater than zero/],
      ['ground R', '-5', /greater than zero/],
      ['ground R', '4q7', /is not|cannot/i],
      ['ground R', 'Infinity', /is not|finite/i],
      ['ground R', '1T', /at most 1.GΩ/],
      ['shunt C', '1a', /at least/],
      ['Positive rail, +', '1', /must exceed the upper headroom/],
      ['Duration', '400', /periods/],
    ]
    for (const [label, text, sentence] of wrong) {
      const field = page.getByLabel(label, { exact: true })
      const before = await field.inputValue()
      await enter(page, label, text)
      await page.getByText(sentence).first().waitFor({ timeout: 10_000 })
      // A number that only the whole circuit refuses may gain its unit; what was typed stays.
      expect((await field.inputValue()).startsWith(text), `${label} keeps “${text}”`).toBe(true)
      await page.getByText('It starts.').waitFor()
      await enter(page, label, before)
    }
    await saved(page).waitFor()
    expect(errors).toEqual([])
    await page.context().close()
  })

  it('covers no other field with the sentence, on a phone either', async () => {
    const { page } = await openAs('engineer', '/designs/2/start-up', { width: 390 })
    for (const label of ['series R', 'shunt C', 'feedback R', 'load']) {
      await enter(page, label, '4q7')
      const sentence = (await page.getByRole('alert').filter({ hasText: label }).boundingBox())!
      const fields = page.getByRole('group', { name: 'Circuit', exact: true }).getByRole('textbox')
      for (const field of await fields.all()) {
        const box = (await field.boundingBox())!
        const apart = box.y + box.height <= sentence.y || sentence.y + sentence.height <= box.y
        expect(apart, `the sentence on ${label} lies apart from every field`).toBe(true)
      }
      await page.getByRole('button', { name: 'Undo', exact: true }).click()
    }
    await page.context().close()
  })

  it('warns of an amplifier slower than the oscillator and still answers', async () => {
    const { page } = await openSheet()
    await page.getByText('Amplifier figures').click()
    await enter(page, 'Gain-bandwidth', '500')
    await page.getByText('It does not start.').waitFor()
    await page
      .getByText(/amplifier/i)
      .first()
      .waitFor()
    await page.getByRole('button', { name: 'Undo' }).click()
    await page.getByText('It starts.').waitFor()
    await page.context().close()
  })
})

describe('bad luck on the sheet', () => {
  it('shows both sides when two tabs edit one draft', async () => {
    const first = await openSheet('/designs/2/start-up')
    const second = await openSheet('/designs/2/start-up')
    await enter(first.page, 'ground R', '9k1')
    await saved(first.page).waitFor()
    await enter(second.page, 'ground R', '8k2')
    const dialog = second.page.getByRole('dialog', { name: 'This draft was saved elsewhere' })
    await dialog.waitFor()
    const row = dialog.getByRole('row', { name: /ground R/i })
    await row.getByText(/8\.2/).waitFor()
    await row.getByText(/9\.1/).waitFor()
    await dialog.getByRole('button', { name: 'Take theirs' }).click()
    await expect
      .poll(() => second.page.getByLabel('ground R', { exact: true }).inputValue())
      .toMatch(/^9\.1k|^9k1/)
    await first.page.context().close()
    await second.page.context().close()
  })

  it('lets a person whose session ended sign in again over the page and loses nothing', async () => {
    const { page } = await openSheet('/designs/3/start-up')
    await page.context().clearCookies()
    await enter(page, 'shunt C', '15n')
    const dialog = page.getByRole('dialog', { name: 'Your session has ended' })
    await dialog.waitFor()
    const account = demoAccounts.find(({ role }) => role === 'engineer')!
    await dialog.getByLabel('E-mail').fill(account.email)
    await dialog.getByLabel('Password').fill(account.password)
    await dialog.getByRole('button', { name: 'Sign in' }).click()
    await dialog.waitFor({ state: 'hidden' })
    await saved(page).waitFor({ timeout: 30_000 })
    await page.reload()
    await expect.poll(() => page.getByLabel('shunt C', { exact: true }).inputValue()).toBe('15n')
    await page.context().close()
  })

  it('keeps an edit made while the server is away and saves it when it is back', async () => {
    const { page } = await openSheet('/designs/4/start-up')
    await app().stop('SIGKILL')
    await enter(page, 'shunt C', '22n')
    await page.getByText(/offline: kept in this browser/).waitFor({ timeout: 30_000 })
    await page.getByText('It starts.').waitFor()
    await app().restart()
    await saved(page).waitFor({ timeout: 30_000 })
    await page.reload()
    await expect.poll(() => page.getByLabel('shunt C', { exact: true }).inputValue()).toBe('22n')
    await page.context().close()
  })

  it('says so when the computing worker cannot be had, and computes again when it can', async () => {
    const { page } = await openAs('engineer')
    await page.route('**/engine.worker*', (route) => route.abort())
    await page.goto('/designs/1/start-up')
    await page
      .getByText(/worker|could not be computed|stopped unexpectedly/i)
      .first()
      .waitFor({ timeout: 30_000 })
    await page.unroute('**/engine.worker*')
    await enter(page, 'ground R', '9k1')
    await page.getByText('It starts.').waitFor({ timeout: 30_000 })
    await page.context().close()
  })
})

describe('who may do what', () => {
  it('lets a technician read and replay but not edit or save', async () => {
    const { page, context } = await openAs('technician')
    expect(await page.getByRole('button', { name: 'New design' }).count()).toBe(0)
    await page.goto('/designs/1/start-up')
    await page.getByText('It starts.').waitFor({ timeout: 60_000 })
    expect(await page.getByLabel('ground R', { exact: true }).isEditable()).toBe(false)
    expect(await page.getByRole('button', { name: 'Save run' }).count()).toBe(0)
    await page.goto('/runs/1')
    await page.getByRole('button', { name: 'Replay' }).click()
    await page.getByText('It replays.').waitFor({ timeout: 60_000 })
    expect(await page.getByRole('button', { name: 'Delete' }).count()).toBe(0)
    await context.close()
  })

  it('sends a stranger to the sign-in page and then on to where he or she wanted to go', async () => {
    const { page, context } = await openStranger()
    await page.goto('/runs/1')
    await page.waitForURL('**/sign-in?next=*')
    const account = demoAccounts.find(({ role }) => role === 'technician')!
    await page.getByLabel('E-mail').fill(account.email)
    await page.getByLabel('Password').fill('not the password')
    await page.getByRole('button', { name: 'Sign in' }).click()
    await page
      .getByText(/do not match|wrong|not right/i)
      .first()
      .waitFor()
    await page.getByLabel('Password').fill(account.password)
    await page.getByRole('button', { name: 'Sign in' }).click()
    await page.waitForURL('**/runs/1')
    await context.close()
  })
})
