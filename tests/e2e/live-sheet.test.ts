/** The sheet while somebody works on it: a moving slider, a dense record, zoom and cursors, undo. */
import type { Page } from 'playwright-core'
import { beforeAll, describe, expect, it } from 'vitest'
import { enter, serveForTests, verdictLine } from '#tests/support/e2e.ts'

const { openAs } = serveForTests()
let page: Page
let errors: string[]

beforeAll(async () => {
  ;({ page, errors } = await openAs('engineer', '/designs/1/start-up'))
  await page.getByText('It starts.').waitFor({ timeout: 60_000 })
})

describe('the live sheet', () => {
  it('lets every figure follow a moving trim slider', async () => {
    await expect.poll(() => verdictLine(page), { timeout: 30_000 }).toMatch(/Level, peak\n7\.5\s*V/)
    const seen = new Set<string>()
    const slider = page.getByRole('slider', { name: /Gain trim/ })
    await slider.focus()
    for (let step = 0; step < 12; step++) {
      await slider.press('ArrowLeft')
      await page.waitForTimeout(150)
      seen.add(await verdictLine(page))
    }
    // Not only the last position is shown: the figures changed on the way.
    expect(seen.size).toBeGreaterThan(4)
    await page.getByRole('button', { name: 'Undo' }).click()
  })

  it('shows 60 ms at 2 µs without holding up the page', async () => {
    // Frames are counted by the page itself while the record is computed.
    await page.evaluate(() => {
      const state = window as unknown as { frames: number }
      state.frames = 0
      const count = () => {
        state.frames++
        requestAnimationFrame(count)
      }
      requestAnimationFrame(count)
    })
    await enter(page, 'Duration', '60 ms')
    await enter(page, 'Sample interval', '2u')
    await page.getByText(/30,001 samples/).waitFor({ timeout: 60_000 })
    const frames = await page.evaluate(() => (window as unknown as { frames: number }).frames)
    expect(frames).toBeGreaterThan(5)
    await page.locator('canvas').first().waitFor()
  })

  it('zooms, places two cursors and keeps both in the address', async () => {
    const plot = page.locator('[data-plot="waveform"], [role="application"], canvas').first()
    await plot.scrollIntoViewIfNeeded()
    const box = (await plot.boundingBox())!
    const at = (x: number) => [box.x + box.width * x, box.y + box.height * 0.4] as const
    await page.mouse.move(...at(0.4))
    await page.mouse.down()
    await page.mouse.move(...at(0.6), { steps: 5 })
    await page.mouse.up()
    await page.waitForURL(/from=/)
    await page.mouse.click(...at(0.45))
    await page.waitForURL(/c1=/)
    await page.mouse.click(...at(0.55))
    await page.waitForURL(/c2=/)
    const readings = page.getByRole('table', { name: 'Cursor read-outs' }).first()
    await expect.poll(() => readings.innerText()).toMatch(/1\/Δt/)
    const address = page.url()
    await page.reload()
    await expect
      .poll(() => page.getByRole('table', { name: 'Cursor read-outs' }).first().innerText(), {
        timeout: 30_000,
      })
      .toMatch(/1\/Δt/)
    expect(page.url()).toBe(address)
  })

  it('undoes and redoes from the keyboard', async () => {
    await enter(page, 'ground R', '9k1')
    await page.getByLabel('ground R', { exact: true }).blur()
    await page.keyboard.press('Control+z')
    await expect.poll(() => page.getByLabel('ground R', { exact: true }).inputValue()).toBe('10k')
    await page.keyboard.press('Control+Shift+z')
    await expect
      .poll(() => page.getByLabel('ground R', { exact: true }).inputValue())
      .toMatch(/^9\.1k$|^9k1$/)
    expect(errors).toEqual([])
  })
})
