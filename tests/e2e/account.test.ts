/** Who is signed in, in a browser: the password, the ways out and the theme. */
import type { Page } from 'playwright-core'
import { describe, expect, it } from 'vitest'
import { demoAccounts } from '#server/db/demo/accounts.ts'
import { enter, serveForTests } from '#tests/support/e2e.ts'

const { openAs, openStranger } = serveForTests()

const accountOf = (role: string) => demoAccounts.find((account) => account.role === role)!

async function fillSignIn(page: Page, email: string, password: string) {
  await page.getByLabel('E-mail').fill(email)
  await page.getByLabel('Password').fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
}

/** Opens the menu of the signed-in person. */
const openMenu = (page: Page, person: string) => page.getByRole('button', { name: person }).click()

const background = (page: Page) =>
  page.evaluate(() => getComputedStyle(document.documentElement).getPropertyValue('--color-paper').trim())

describe('the password', () => {
  it('is changed with the current one only; the old one and the other sessions end', async () => {
    const reviewer = accountOf('reviewer')
    const elsewhere = await openAs('reviewer', '/runs')
    const { page, context, errors } = await openAs('reviewer', '/account')
    const current = page.getByLabel('Current password')
    const next = page.getByLabel('New password')
    const change = page.getByRole('button', { name: 'Change password' })

    await current.fill('not the password')
    await next.fill('short')
    await change.click()
    await page.getByText('A password needs at least 10 characters.').waitFor()
    await next.fill('a longer password')
    await change.click()
    await expect.poll(() => current.getAttribute('aria-invalid')).toBe('true')
    const sentence = page.locator(`[id="${await current.getAttribute('aria-describedby')}"]`)
    expect(await sentence.innerText()).toMatch(/current password/i)
    // What was typed for the new one stays, and the session goes on.
    expect(await next.inputValue()).toBe('a longer password')

    await current.fill(reviewer.password)
    await change.click()
    await page.getByText(/The password is changed/).waitFor()
    await page.reload()
    await page.getByRole('heading', { name: 'Account' }).waitFor()
    // The refused attempt was a 403 or 422 that the browser logs; nothing else went wrong.
    expect(errors.filter((text) => !/status of 4\d\d/.test(text))).toEqual([])

    await elsewhere.page.getByRole('link', { name: 'Designs', exact: true }).click()
    await elsewhere.page.getByRole('dialog', { name: 'Your session has ended' }).waitFor()
    await elsewhere.context.close()

    const fresh = await openStranger()
    await fresh.page.goto('/sign-in')
    await fillSignIn(fresh.page, reviewer.email, reviewer.password)
    await fresh.page
      .getByText(/do not match|wrong|not right/i)
      .first()
      .waitFor()
    await fillSignIn(fresh.page, reviewer.email, 'a longer password')
    await fresh.page.waitForURL('**/designs')
    await fresh.context.close()
    await context.close()
  })
})

describe('signing in and out', () => {
  it('signs in and opens a design by keyboard alone', async () => {
    const { email, password } = accountOf('engineer')
    const { page, context, errors } = await openStranger()
    await page.goto('/designs?search=lamp')
    await page.waitForURL('**/sign-in?next=*')
    await expect.poll(() => page.evaluate(() => document.activeElement?.getAttribute('type'))).toBe('email')
    await page.keyboard.type(email)
    await page.keyboard.press('Tab')
    await page.keyboard.type(password)
    await page.keyboard.press('Enter')
    await page.waitForURL('**/designs?search=lamp')
    await page.getByRole('link', { name: 'Lamp-stabilised calibrator tone', exact: true }).waitFor()
    const focused = () => page.evaluate(() => document.activeElement?.textContent ?? '')
    for (let tab = 0; tab < 30 && !(await focused()).startsWith('Lamp-stabilised'); tab++)
      await page.keyboard.press('Tab')
    await page.keyboard.press('Enter')
    await page.getByRole('heading', { name: 'Lamp-stabilised calibrator tone' }).waitFor()
    // The one answer of 401 that told the page that nobody was signed in.
    expect(errors.filter((text) => !text.includes('401'))).toEqual([])
    await context.close()
  })

  it('signs out, and the back button shows nothing private', async () => {
    const { page, context } = await openAs('engineer', '/designs/1/start-up')
    await page.getByRole('heading', { name: 'Bare 1 kHz exciter' }).waitFor()
    await openMenu(page, 'Mara Lindholm')
    await page.getByRole('menuitem', { name: 'Sign out' }).click()
    await page.waitForURL('**/sign-in')
    await page.goBack()
    await page.waitForURL('**/sign-in?next=*')
    await page.getByRole('button', { name: 'Sign in' }).waitFor()
    expect(await page.locator('body').innerText()).not.toMatch(/Bare 1 kHz exciter|Mara Lindholm/)
    expect(await page.evaluate(async () => (await fetch('/api/designs')).status)).toBe(401)
    await context.close()
  })

  it('signs out everywhere: a sheet open elsewhere keeps its edit and asks to sign in', async () => {
    const { email, password } = accountOf('engineer')
    const elsewhere = await openAs('engineer', '/designs/1/start-up')
    await elsewhere.page.getByText('It starts.').waitFor({ timeout: 60_000 })
    const { page, context } = await openAs('engineer', '/account')
    await page.getByRole('button', { name: 'Sign out everywhere' }).click()
    await page.waitForURL('**/sign-in')
    await context.close()

    await enter(elsewhere.page, 'ground R', '9k1')
    const dialog = elsewhere.page.getByRole('dialog', { name: 'Your session has ended' })
    await dialog.waitFor()
    await fillSignIn(elsewhere.page, email, password)
    await dialog.waitFor({ state: 'hidden' })
    await elsewhere.page.getByText(/draft, saved/).waitFor({ timeout: 30_000 })
    await elsewhere.page.reload()
    await expect
      .poll(() => elsewhere.page.getByLabel('ground R', { exact: true }).inputValue())
      .toMatch(/^9\.1k|^9k1/)
    await elsewhere.context.close()
  })
})

describe('the theme', () => {
  it('is light, dark or as the system says, and survives a reload', async () => {
    const { page, context } = await openAs('technician', undefined, { colorScheme: 'light' })
    const light = await background(page)
    const choose = async (choice: string) => {
      await openMenu(page, 'Jonas Ekberg')
      await page.getByRole('menuitemradio', { name: choice }).click()
      await page.keyboard.press('Escape')
      await page.reload()
      await page.getByRole('heading', { name: 'Designs' }).waitFor()
      return background(page)
    }
    const dark = await choose('Dark')
    expect(dark).not.toBe(light)
    expect(await choose('Light')).toBe(light)
    await page.emulateMedia({ colorScheme: 'dark' })
    expect(await background(page)).toBe(light)
    expect(await choose('As the system')).toBe(dark)
    await page.emulateMedia({ colorScheme: 'light' })
    expect(await background(page)).toBe(light)
    await context.close()
  })
})
