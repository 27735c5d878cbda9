import { screen, waitFor, within } from '@testing-library/react'
import { Outlet } from 'react-router-dom'
import { afterEach, describe, expect, it, vi } from 'vitest'
import type { Role } from '#shared/roles.ts'
import type { DesignSummary } from '#shared/schemas/design.ts'
import { axeViolations } from '#tests/support/axe.ts'
import { aDesign, aFullDesign, aPage, aSession, exciterProject } from '#tests/support/client-data.ts'
import { answer, fakeApi, problem, type FakeAnswer } from '#tests/support/fake-api.ts'
import { renderApp } from '#tests/support/render-app.tsx'

// Creating and duplicating lead to the design's own pages, which have tests of their own.
vi.mock('#client/app/routes/design-sheet.tsx', () => ({ Component: Outlet }))
vi.mock('#client/app/routes/start-up.tsx', () => ({ Component: () => <h1>Start-up</h1> }))

const bare = aDesign()
const tone = aDesign({ id: 8, name: 'Calibrator tone', project: { id: 2, name: 'Calibrator' }, runs: 0 })

function open(
  address: string,
  {
    role = 'engineer',
    list = answer(aPage<DesignSummary>([bare, tone])),
  }: { role?: Role; list?: FakeAnswer } = {},
) {
  const server = fakeApi({
    'GET /api/session': answer(aSession(role)),
    'GET /api/projects': answer({ items: [exciterProject, { id: 2, name: 'Calibrator', designs: 1 }] }),
    'GET /api/designs': list,
  })
  const app = renderApp(address)
  const lastQuery = () => Object.fromEntries(server.asked('GET /api/designs').at(-1)?.query ?? [])
  return { ...app, server, lastQuery }
}

afterEach(() => vi.unstubAllGlobals())

describe('list of designs', () => {
  it('shows name, project, runs and who changed it, without faults that axe-core finds', async () => {
    open('/designs')
    const row = (await screen.findByRole('link', { name: bare.name })).closest('tr')
    expect(row).toHaveTextContent('Salinity probe exciter')
    expect(row).toHaveTextContent('by Ruben Achterberg')
    expect(screen.getByRole('link', { name: bare.name })).toHaveAttribute('href', '/designs/7/start-up')
    expect(screen.getByRole('link', { name: `3 runs of ${bare.name}` })).toHaveAttribute(
      'href',
      '/runs?designId=7',
    )
    expect(screen.getByText('1–2 of 2 designs')).toBeInTheDocument()
    expect(await axeViolations()).toEqual([])
  })

  it('asks the server for what the address says', async () => {
    const { lastQuery } = open('/designs?search=tone&projectId=2&archived=true&sort=name&order=asc&page=2')
    await screen.findByRole('link', { name: tone.name })
    expect(lastQuery()).toMatchObject({
      search: 'tone',
      projectId: '2',
      archived: 'true',
      sort: 'name',
      order: 'asc',
      page: '2',
    })
    expect(screen.getByLabelText('Search')).toHaveValue('tone')
    await waitFor(() => expect(screen.getByLabelText('Project')).toHaveValue('2'))
  })

  it('searches once typing rests and keeps the search in the address', async () => {
    const { user, at, server, lastQuery } = open('/designs?page=2')
    await screen.findByRole('link', { name: bare.name })
    const before = server.asked('GET /api/designs').length
    await user.type(screen.getByLabelText('Search'), 'kHz')
    await waitFor(() => expect(at()).toBe('/designs?search=kHz'))
    await waitFor(() => expect(lastQuery()).toMatchObject({ search: 'kHz', page: '1' }))
    expect(server.asked('GET /api/designs').length - before).toBeLessThanOrEqual(2)
  })

  it('follows the address back', async () => {
    const { user, router, at } = open('/designs')
    await screen.findByRole('link', { name: bare.name })
    await user.selectOptions(screen.getByLabelText('Show'), 'Archived')
    await waitFor(() => expect(at()).toBe('/designs?archived=true'))
    await router.navigate('/designs?search=lamp')
    await waitFor(() => expect(screen.getByLabelText('Search')).toHaveValue('lamp'))
    expect(screen.getByLabelText('Show')).toHaveValue('false')
  })

  it('sorts by a column, then the other way', async () => {
    const { user, at } = open('/designs')
    await screen.findByRole('link', { name: bare.name })
    expect(screen.getByRole('columnheader', { name: /Changed/ })).toHaveAttribute('aria-sort', 'descending')
    await user.click(screen.getByRole('button', { name: 'Name' }))
    await waitFor(() =>
      expect(screen.getByRole('columnheader', { name: 'Name' })).toHaveAttribute('aria-sort', 'ascending'),
    )
    expect(at()).toBe('/designs?order=asc&sort=name')
    await user.click(screen.getByRole('button', { name: 'Name' }))
    await waitFor(() => expect(at()).toBe('/designs?sort=name'))
  })

  it('pages through', async () => {
    const { user, at } = open('/designs', {
      list: ({ query }) => answer(aPage([bare], { total: 45, page: Number(query.get('page')) })),
    })
    expect(await screen.findByText('1–20 of 45 designs')).toBeInTheDocument()
    await user.click(screen.getByRole('button', { name: 'Next' }))
    expect(await screen.findByText('21–40 of 45 designs')).toBeInTheDocument()
    expect(at()).toBe('/designs?page=2')
  })
})

describe('nothing to show', () => {
  it('offers an engineer the first design, a technician none', async () => {
    const first = open('/designs', { list: answer(aPage([])) })
    expect(await screen.findByRole('button', { name: 'Create the first design' })).toBeInTheDocument()
    first.unmount()
    open('/designs', { list: answer(aPage([])), role: 'technician' })
    expect(await screen.findByText(/Engineers create designs/)).toBeInTheDocument()
    expect(screen.queryByRole('button', { name: /design/ })).not.toBeInTheDocument()
  })

  it('says what was not found and clears the search', async () => {
    const { user, at } = open('/designs?search=zzz', {
      list: ({ query }) => answer(aPage(query.get('search') ? [] : [bare])),
    })
    expect(await screen.findByText(/No design or project has “zzz”/)).toBeInTheDocument()
    await user.click(screen.getByRole('button', { name: 'Clear search and project' }))
    expect(await screen.findByRole('link', { name: bare.name })).toBeInTheDocument()
    expect(at()).toBe('/designs')
    expect(screen.getByLabelText('Search')).toHaveValue('')
  })

  it('says why a list could not be had and asks again', async () => {
    const { user, server } = open('/designs', {
      list: problem(403, 'forbidden', { detail: 'You may not see this.' }),
    })
    expect(await screen.findByText('You may not see this.')).toBeInTheDocument()
    server.set('GET /api/designs', answer(aPage([bare])))
    await user.click(screen.getByRole('button', { name: 'Try again' }))
    expect(await screen.findByRole('link', { name: bare.name })).toBeInTheDocument()
  })
})

describe('who may do what', () => {
  it('shows a technician no way to change anything', async () => {
    open('/designs', { role: 'technician' })
    await screen.findByRole('link', { name: bare.name })
    expect(screen.queryByRole('button', { name: 'New design' })).not.toBeInTheDocument()
    expect(screen.queryByRole('button', { name: /Actions for/ })).not.toBeInTheDocument()
  })

  it.each(['engineer', 'reviewer', 'admin'] as const)('lets %s create and change designs', async (role) => {
    open('/designs', { role })
    expect(await screen.findByRole('button', { name: `Actions for ${bare.name}` })).toBeInTheDocument()
    expect(screen.getByRole('button', { name: 'New design' })).toBeInTheDocument()
  })
})

describe('changing designs', () => {
  /** Opens the row's menu and takes an item. */
  async function act(app: ReturnType<typeof open>, item: string) {
    await app.user.click(await screen.findByRole('button', { name: `Actions for ${bare.name}` }))
    await app.user.click(await screen.findByRole('menuitem', { name: item }))
    return screen.findByRole('dialog')
  }

  it('renames', async () => {
    const app = open('/designs')
    app.server.set('PATCH /api/designs/7', answer(aFullDesign({ name: 'Exciter' })))
    const dialog = await act(app, 'Rename…')
    const name = within(dialog).getByLabelText('Name')
    expect(name).toHaveFocus()
    expect(name).toHaveValue(bare.name)
    app.server.set('GET /api/designs', answer(aPage([aDesign({ name: 'Exciter' })])))
    await app.user.clear(name)
    await app.user.type(name, 'Exciter{Enter}')
    expect(await screen.findByRole('link', { name: 'Exciter' })).toBeInTheDocument()
    expect(app.server.asked('PATCH /api/designs/7')[0]?.body).toEqual({ name: 'Exciter' })
    expect(screen.getByText('Renamed to “Exciter”.')).toBeInTheDocument()
    await waitFor(() => expect(screen.getByRole('button', { name: 'Actions for Exciter' })).toHaveFocus())
  })

  it('refuses an empty name at the field', async () => {
    const app = open('/designs')
    const dialog = await act(app, 'Rename…')
    const name = within(dialog).getByLabelText('Name')
    await app.user.clear(name)
    await app.user.type(name, '   {Enter}')
    await waitFor(() => expect(name).toHaveAccessibleDescription('Name is missing.'))
    expect(app.server.asked('PATCH /api/designs/7')).toHaveLength(0)
  })

  it('asks before archiving, and stays with the reason when it fails', async () => {
    const app = open('/designs')
    app.server.set('PATCH /api/designs/7', problem(403, 'forbidden', { detail: 'Your role has changed.' }))
    const dialog = await act(app, 'Archive…')
    expect(dialog).toHaveAccessibleDescription(/Its runs stay/)
    expect(within(dialog).getByRole('button', { name: 'Cancel' })).toHaveFocus()
    await app.user.click(within(dialog).getByRole('button', { name: 'Archive' }))
    expect(await within(dialog).findByText('Your role has changed.')).toBeInTheDocument()
    app.server.set('PATCH /api/designs/7', answer(aFullDesign({ archived: true })))
    await app.user.click(within(dialog).getByRole('button', { name: 'Archive' }))
    app.server.set('GET /api/designs', answer(aPage([tone])))
    await waitFor(() => expect(dialog).not.toBeInTheDocument())
    expect(app.server.asked('PATCH /api/designs/7').at(-1)?.body).toEqual({ archived: true })
  })

  it('restores an archived design', async () => {
    const app = open('/designs?archived=true', { list: answer(aPage([aDesign({ archived: true })])) })
    app.server.set('PATCH /api/designs/7', answer(aFullDesign()))
    const dialog = await act(app, 'Restore…')
    await app.user.click(within(dialog).getByRole('button', { name: 'Restore' }))
    await waitFor(() =>
      expect(app.server.asked('PATCH /api/designs/7')[0]?.body).toEqual({ archived: false }),
    )
  })

  it('duplicates and opens the copy', async () => {
    const app = open('/designs')
    app.server.set(
      'POST /api/designs/7/duplicate',
      answer(aFullDesign({ id: 9, name: `Copy of ${bare.name}` }), 201),
    )
    const dialog = await act(app, 'Duplicate…')
    await app.user.click(within(dialog).getByRole('button', { name: 'Duplicate' }))
    await waitFor(() => expect(app.at()).toMatch(/^\/designs\/9\/start-up/))
    expect(app.server.asked('POST /api/designs/7/duplicate')[0]?.body).toEqual({
      name: `Copy of ${bare.name}`,
    })
  })
})

describe('renaming a project', () => {
  it('is offered to an engineer beside the project that the list is filtered by', async () => {
    const app = open('/designs')
    await screen.findByRole('option', { name: 'Calibrator' })
    expect(screen.queryByRole('button', { name: 'Rename project…' })).not.toBeInTheDocument()
    await app.user.selectOptions(screen.getByLabelText('Project'), 'Calibrator')
    await app.user.click(await screen.findByRole('button', { name: 'Rename project…' }))
    const dialog = within(await screen.findByRole('dialog', { name: 'Rename project' }))
    const name = dialog.getByLabelText('Name')
    expect(name).toHaveValue('Calibrator')

    const taken = 'There is already a project of this name.'
    const errors = [{ path: ['name'], message: taken }]
    app.server.set('PATCH /api/projects/2', problem(409, 'name-taken', { detail: taken, errors }))
    await app.user.clear(name)
    await app.user.type(name, 'Bench tone{Enter}')
    await waitFor(() => expect(name).toHaveAccessibleDescription(taken))

    app.server.set('PATCH /api/projects/2', answer({ id: 2, name: 'Bench tone', designs: 1 }))
    app.server.set('GET /api/projects', answer({ items: [{ id: 2, name: 'Bench tone', designs: 1 }] }))
    await app.user.type(name, '{Enter}')
    expect(await screen.findByRole('option', { name: 'Bench tone' })).toBeInTheDocument()
    expect(app.server.asked('PATCH /api/projects/2').at(-1)?.body).toEqual({ name: 'Bench tone' })
    expect(screen.getByText('The project is now “Bench tone”.')).toBeInTheDocument()
    await waitFor(() => expect(screen.getByRole('button', { name: 'Rename project…' })).toHaveFocus())
  })

  it('is not offered to a technician', async () => {
    open('/designs?projectId=2', { role: 'technician' })
    await screen.findByRole('option', { name: 'Calibrator' })
    expect(screen.queryByRole('button', { name: 'Rename project…' })).not.toBeInTheDocument()
  })
})

describe('creating a design', () => {
  async function openDialog(app: ReturnType<typeof open>) {
    await app.user.click(await screen.findByRole('button', { name: 'New design' }))
    return within(await screen.findByRole('dialog', { name: 'New design' }))
  }

  it('goes into a project that exists, the one filtered by first', async () => {
    const app = open('/designs?projectId=2')
    app.server.set('POST /api/designs', answer(aFullDesign({ id: 11 }), 201))
    const dialog = await openDialog(app)
    expect(dialog.getByLabelText('Project')).toHaveValue('2')
    expect(await axeViolations()).toEqual([])
    await app.user.type(dialog.getByLabelText('Name'), 'Second tone{Enter}')
    await waitFor(() => expect(app.at()).toMatch(/^\/designs\/11\/start-up/))
    expect(app.server.asked('POST /api/designs')[0]?.body).toEqual({ name: 'Second tone', projectId: 2 })
  })

  it('creates the project with it', async () => {
    const app = open('/designs')
    app.server.set('POST /api/projects', answer({ id: 5, name: 'Line set', designs: 0 }, 201))
    app.server.set('POST /api/designs', answer(aFullDesign({ id: 12 }), 201))
    const dialog = await openDialog(app)
    await app.user.type(dialog.getByLabelText('Name'), 'Line tone')
    await app.user.selectOptions(dialog.getByLabelText('Project'), 'A new project')
    await app.user.type(dialog.getByLabelText('Name of the new project'), ' Line set ')
    await app.user.click(dialog.getByRole('button', { name: 'Create design' }))
    await waitFor(() => expect(app.at()).toMatch(/^\/designs\/12\//))
    expect(app.server.asked('POST /api/projects')[0]?.body).toEqual({ name: 'Line set' })
    expect(app.server.asked('POST /api/designs')[0]?.body).toEqual({ name: 'Line tone', projectId: 5 })
  })

  it('says what is missing, and that a project name is taken, each at its field', async () => {
    const app = open('/designs')
    app.server.set(
      'POST /api/projects',
      problem(409, 'name-taken', { detail: 'There is a project of this name.' }),
    )
    const dialog = await openDialog(app)
    await app.user.click(dialog.getByRole('button', { name: 'Create design' }))
    await waitFor(() => expect(dialog.getByLabelText('Name')).toHaveAccessibleDescription('Name is missing.'))
    expect(dialog.getByLabelText('Project')).toHaveAccessibleDescription('Choose a project.')
    await app.user.type(dialog.getByLabelText('Name'), 'Tone')
    await app.user.selectOptions(dialog.getByLabelText('Project'), 'A new project')
    await app.user.type(dialog.getByLabelText('Name of the new project'), 'Calibrator')
    await app.user.click(dialog.getByRole('button', { name: 'Create design' }))
    await waitFor(() =>
      expect(dialog.getByLabelText('Name of the new project')).toHaveAccessibleDescription(
        'There is a project of this name.',
      ),
    )
    expect(app.server.asked('POST /api/designs')).toHaveLength(0)
  })
})
