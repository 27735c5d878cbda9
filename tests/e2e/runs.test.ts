/** Saved runs in a browser: list, compare, step through the limits, export, delete. */
import { readFile } from 'node:fs/promises'
import Papa from 'papaparse'
import type { Page } from 'playwright-core'
import { describe, expect, it } from 'vitest'
import { serveForTests } from '#tests/support/e2e.ts'

const { openAs } = serveForTests()

/** The run of the bare exciter that clips: its title in the demo. */
const clipping = 'Power-on as drawn'

async function openRun(page: Page, title: string) {
  await page.getByRole('link', { name: title, exact: true }).click()
  await page.getByRole('heading', { name: title }).waitFor()
}

describe('saved runs', () => {
  it('steps the playhead through the limits and shows each on the circuit', async () => {
    const { page, errors, context } = await openAs('engineer', '/runs')
    await openRun(page, clipping)
    const bar = page.getByRole('group', { name: 'Playhead' })
    await bar.getByText('No limit is active').first().waitFor()
    await bar.getByRole('button', { name: /Next change/ }).click()
    await bar
      .getByText(/held at the (upper|lower) rail/i)
      .first()
      .waitFor()
    await page.locator('svg').getByText(/held/i).first().waitFor()
    const held = await bar.innerText()
    await bar.getByRole('button', { name: /Next change/ }).click()
    await expect.poll(() => bar.innerText()).not.toBe(held)
    // A link holds the view: the same instant after a reload.
    const instant = await bar.locator('p').first().innerText()
    await page.waitForURL(/[?&]/)
    await page.reload()
    await expect
      .poll(() => page.getByRole('group', { name: 'Playhead' }).locator('p').first().innerText())
      .toBe(instant)
    expect(errors).toEqual([])
    await context.close()
  })

  it('compares two runs in one plot, with their figures and inputs side by side', async () => {
    const { page, errors, context } = await openAs('engineer', '/runs?search=exciter')
    const boxes = page.getByRole('checkbox', { name: /^Compare / })
    await boxes.nth(0).check()
    await boxes.nth(1).check()
    await page.getByRole('link', { name: 'Compare', exact: true }).click()
    await page.waitForURL('**/runs/compare?**')
    await page.locator('canvas').first().waitFor()
    await page
      .getByRole('rowheader', { name: /Closed-loop gain/ })
      .first()
      .waitFor()
    expect(errors).toEqual([])
    await context.close()
  })

  it('exports the record as CSV with units', async () => {
    const { page, context } = await openAs('engineer', '/runs')
    await openRun(page, clipping)
    const [download] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('link', { name: 'Export CSV' }).click(),
    ])
    const text = await readFile(await download.path(), 'utf8')
    const { data, errors } = Papa.parse<string[]>(text, { skipEmptyLines: true })
    expect(errors).toEqual([])
    expect(data[0]!.slice(0, 4)).toEqual([
      'time (s)',
      'output (V)',
      'network node (V)',
      'series capacitor (V)',
    ])
    // 60 ms at 2 µs, both ends included.
    expect(data.length - 1).toBe(30_001)
    expect(Number(data.at(-1)![0])).toBeCloseTo(0.06, 12)
    await context.close()
  })

  it('deletes an own run after asking, and finds it no more', async () => {
    const { page, context } = await openAs('engineer', '/runs')
    await openRun(page, clipping)
    await page.getByRole('button', { name: 'Delete' }).click()
    await page
      .getByRole('dialog')
      .getByRole('button', { name: /Delete/ })
      .click()
    await page.waitForURL(/\/runs(\?|$)/)
    await page
      .getByRole('checkbox', { name: /^Compare / })
      .first()
      .waitFor()
    await expect.poll(() => page.getByRole('link', { name: clipping, exact: true }).count()).toBe(0)
    await context.close()
  })
})
