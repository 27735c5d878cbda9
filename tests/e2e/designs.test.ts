/** The list of designs in a browser: found, ordered and paged by the address; created, renamed, copied, archived. */
import type { Page } from 'playwright-core'
import { beforeAll, describe, expect, it } from 'vitest'
import { demoProjects } from '#server/db/demo/designs.ts'
import { serveForTests } from '#tests/support/e2e.ts'

const { openAs } = serveForTests()
const project = 'Paging bench'
const made = 25
/** Names that sort by their number: Bench 01 … Bench 25. */
const benchName = (n: number) => `Bench ${String(n).padStart(2, '0')}`

/** Creates a project of `made` designs through the API, within the page's own session. */
async function fill(page: Page): Promise<void> {
  const statuses = await page.evaluate(
    async ([projectName, names]) => {
      const { csrfToken } = (await (await fetch('/api/session')).json()) as { csrfToken: string }
      const post = (path: string, body: unknown) =>
        fetch(`/api${path}`, {
          method: 'POST',
          headers: { 'Content-Type': 'application/json', 'X-CSRF-Token': csrfToken },
          body: JSON.stringify(body),
        })
      const { id } = (await (await post('/projects', { name: projectName })).json()) as { id: number }
      const answers: number[] = []
      for (const name of names) answers.push((await post('/designs', { projectId: id, name })).status)
      return answers
    },
    [project, Array.from({ length: made }, (_, i) => benchName(i + 1))] as const,
  )
  expect(new Set(statuses)).toEqual(new Set([201]))
}

const rows = (page: Page) => page.getByRole('table', { name: 'Designs' }).locator('tbody tr')
/** Names of the list, top to bottom. */
const names = (page: Page) => rows(page).locator('td:first-child').allInnerTexts()
const counted = (page: Page, text: string | RegExp) => page.getByText(text, { exact: true }).waitFor()

async function act(page: Page, design: string, action: string) {
  await page.getByRole('button', { name: `Actions for ${design}`, exact: true }).click()
  await page.getByRole('menuitem', { name: action }).click()
  return page.getByRole('dialog')
}

beforeAll(async () => {
  const { page, context } = await openAs('engineer')
  await fill(page)
  await context.close()
})

describe('finding a design', () => {
  it('searches by name and project, says when nothing is found, and clears', async () => {
    const { page, errors, context } = await openAs('technician')
    const search = page.getByRole('searchbox', { name: 'Search' })
    await search.fill('DIODE')
    await expect.poll(() => names(page)).toEqual(['Diode-limited exciter'])
    await page.waitForURL('**/designs?search=DIODE')
    await search.fill('calibrator')
    await counted(page, '1–2 of 2 designs')
    await search.fill('100 %_')
    await page.getByText('Nothing found').waitFor()
    await page.getByRole('button', { name: 'Clear search and project' }).click()
    await counted(page, `1–20 of ${made + 6} designs`)
    expect(await search.inputValue()).toBe('')
    expect(errors).toEqual([])
    await context.close()
  })

  it('filters, orders and pages, and finds the same view by back, forward and reload', async () => {
    const { page, errors, context } = await openAs('engineer')
    await page.getByRole('combobox', { name: 'Project' }).selectOption({ label: project })
    await counted(page, `1–20 of ${made} designs`)
    const heading = page.getByRole('columnheader', { name: 'Name' })
    await heading.getByRole('button').click()
    await expect.poll(async () => (await names(page))[0]).toBe(benchName(1))
    expect(await heading.getAttribute('aria-sort')).toBe('ascending')
    await page.getByRole('button', { name: 'Next' }).click()
    await counted(page, `21–25 of ${made} designs`)
    expect(await names(page)).toEqual([21, 22, 23, 24, 25].map(benchName))
    const second = page.url()
    await page.reload()
    await counted(page, `21–25 of ${made} designs`)
    expect((await names(page))[0]).toBe(benchName(21))
    await page.goBack()
    await counted(page, `1–20 of ${made} designs`)
    await page.goForward()
    await counted(page, `21–25 of ${made} designs`)
    expect(page.url()).toBe(second)
    // Away to a design and back: the same page of the same view.
    await page.getByRole('link', { name: benchName(23) }).click()
    await page.getByRole('heading', { name: benchName(23) }).waitFor()
    await page.goBack()
    await counted(page, `21–25 of ${made} designs`)
    // Another order starts from its first page.
    await heading.getByRole('button').click()
    await expect.poll(async () => (await names(page))[0]).toBe(benchName(25))
    await counted(page, `1–20 of ${made} designs`)
    expect(await heading.getAttribute('aria-sort')).toBe('descending')
    expect(errors).toEqual([])
    await context.close()
  })
})

describe('changing the list', () => {
  it('creates a project by the dialog, refuses its name twice, and renames it', async () => {
    const { page, context } = await openAs('engineer')
    await page.getByRole('button', { name: 'New design' }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByRole('button', { name: 'Create design' }).click()
    await dialog.getByText('Choose a project.').waitFor()
    await dialog.getByRole('textbox', { name: /^Name/ }).fill('Sounder, first try')
    await dialog.getByRole('combobox', { name: /^Project/ }).selectOption({ label: 'A new project' })
    const projectName = dialog.getByRole('textbox', { name: /^Name of the new project/ })
    await projectName.fill(demoProjects.cell)
    await dialog.getByRole('button', { name: 'Create design' }).click()
    await expect.poll(() => projectName.getAttribute('aria-invalid')).toBe('true')
    await projectName.fill('Sounders')
    await dialog.getByRole('button', { name: 'Create design' }).click()
    await page.waitForURL('**/start-up')
    await page.getByRole('link', { name: 'Designs', exact: true }).click()
    await page.getByRole('combobox', { name: 'Project' }).selectOption({ label: 'Sounders' })
    await counted(page, /^1 of 1 design$/)
    await page.getByRole('button', { name: 'Rename project…' }).click()
    await dialog.getByRole('textbox', { name: /^Name/ }).fill('Echo sounders')
    await dialog.getByRole('button', { name: 'Rename' }).click()
    await page.getByText('The project is now “Echo sounders”.').waitFor()
    await page.getByRole('cell', { name: 'Echo sounders' }).waitFor()
    await context.close()
  })

  it('duplicates, renames, archives and restores a design', async () => {
    const { page, errors, context } = await openAs('engineer', '/designs?search=620+Hz')
    const original = '620 Hz cable-tracer tone'
    const copying = await act(page, original, 'Duplicate…')
    await copying.getByRole('button', { name: 'Duplicate' }).click()
    await page.getByRole('heading', { name: `Copy of ${original}` }).waitFor()
    // The copy takes the draft along: 25.5 kΩ is the original's own.
    expect(await page.getByLabel('series R', { exact: true }).inputValue()).toBe('25.5k')

    await page.goto('/designs?search=Copy+of')
    const renaming = await act(page, `Copy of ${original}`, 'Rename…')
    await renaming.getByRole('textbox', { name: /^Name/ }).fill('Tracer, second try')
    await renaming.getByRole('button', { name: 'Rename' }).click()
    await page.getByText('Nothing found').waitFor()

    await page.goto('/designs?search=second+try')
    const archiving = await act(page, 'Tracer, second try', 'Archive…')
    await archiving.getByRole('button', { name: 'Archive' }).click()
    await page.getByText('Nothing found').waitFor()
    await page.getByRole('combobox', { name: 'Show' }).selectOption('Archived')
    await page.getByRole('link', { name: 'Tracer, second try' }).click()
    await page.getByText(/archived: it can be read but not edited/).waitFor()
    expect(await page.getByLabel('series R', { exact: true }).isEditable()).toBe(false)
    await page.goBack()
    const restoring = await act(page, 'Tracer, second try', 'Restore…')
    await restoring.getByRole('button', { name: 'Restore' }).click()
    await page.getByText('Nothing found').waitFor()
    await page.getByRole('combobox', { name: 'Show' }).selectOption('Current')
    await page.getByRole('link', { name: 'Tracer, second try' }).waitFor()
    expect(errors).toEqual([])
    await context.close()
  })

  it('offers none of it to a technician', async () => {
    const { page, context } = await openAs('technician', '/designs?sort=name&order=asc')
    await page.getByRole('link', { name: 'Bare 1 kHz exciter', exact: true }).waitFor()
    await page.getByRole('combobox', { name: 'Project' }).selectOption({ label: demoProjects.cell })
    await counted(page, '1–3 of 3 designs')
    for (const name of [/^New design/, /^Actions for/, /^Rename project/])
      expect(await page.getByRole('button', { name }).count(), String(name)).toBe(0)
    await context.close()
  })
})
