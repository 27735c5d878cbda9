/** The whole job in a real browser: an engineer proves a design and saves the run, a reviewer replays it. */
import { describe, expect, it } from 'vitest'
import { enter, figure, serveForTests } from '#tests/support/e2e.ts'

const { openAs } = serveForTests()

describe('from power-on to a replayed run', () => {
  it('lets an engineer make a design, prove it and save the run, and a reviewer replay it', async () => {
    const engineer = await openAs('engineer')
    const { page } = engineer

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

    const reviewer = await openAs('reviewer', runAddress)
    await reviewer.page.getByText('68 k over 33 k, as built.').waitFor()
    await reviewer.page.getByRole('button', { name: 'Replay' }).click()
    await reviewer.page.getByText('It replays.').waitFor({ timeout: 60_000 })
    expect(reviewer.errors).toEqual([])
    await engineer.context.close()
    await reviewer.context.close()
  })
})
