import { screen, waitFor } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { reportReachable } from '#client/lib/reachability.ts'
import { axeViolations } from '#tests/support/axe.ts'
import { aDesign, aPage, aSession, exciterProject } from '#tests/support/client-data.ts'
import { answer, fakeApi, problem } from '#tests/support/fake-api.ts'
import { renderApp } from '#tests/support/render-app.tsx'

function openServer(session = aSession()) {
  return fakeApi({
    'GET /api/session': answer(session),
    'GET /api/designs': answer(aPage([aDesign()])),
    'GET /api/projects': answer({ items: [exciterProject] }),
    'GET /api/health': answer({ status: 'ok' }),
    'DELETE /api/session': answer(null, 204),
    'DELETE /api/sessions': answer(null, 204),
  })
}

afterEach(() => {
  vi.unstubAllGlobals()
  reportReachable(true)
})

describe('the frame of every page', () => {
  it('names where one is, who one is, and the caution', async () => {
    openServer()
    renderApp('/designs')
    expect(await screen.findByRole('link', { name: 'Designs' })).toHaveAttribute('aria-current', 'page')
    expect(screen.getByRole('button', { name: /Edda Holm/ })).toHaveTextContent('engineer')
    expect(screen.getByRole('contentinfo')).toHaveTextContent('Simulation does not replace measurement.')
    expect(screen.getByText('Demo: invented data')).toBeInTheDocument()
  })

  it('does not call real data invented', async () => {
    openServer(aSession('engineer', { mode: 'production' }))
    renderApp('/account')
    await screen.findByRole('heading', { name: 'Account' })
    expect(screen.queryByText(/Demo/)).not.toBeInTheDocument()
  })

  it('opens the designs at /', async () => {
    openServer()
    const { at } = renderApp('/')
    await screen.findByRole('heading', { name: 'Designs' })
    expect(at()).toBe('/designs')
  })

  it('says that an address leads nowhere, and shows the way back', async () => {
    openServer()
    renderApp('/desings')
    expect(await screen.findByText('There is no page at this address')).toBeInTheDocument()
    expect(screen.getByRole('link', { name: 'To the designs' })).toHaveAttribute('href', '/designs')
    expect(document.title).toBe('Page not found · Sinewright')
    expect(await axeViolations()).toEqual([])
  })

  it('moves focus to the new page and titles it', async () => {
    openServer()
    const { user } = renderApp('/designs')
    await user.click(await screen.findByRole('button', { name: /Edda Holm/ }))
    await user.click(screen.getByRole('menuitem', { name: 'Account' }))
    await screen.findByRole('heading', { name: 'Account' })
    await waitFor(() => expect(screen.getByRole('main')).toHaveFocus())
    expect(document.title).toBe('Account · Sinewright')
  })

  it('is silent while the server is away and says when it is back', async () => {
    const server = openServer()
    const { user } = renderApp('/designs')
    await screen.findByRole('link', { name: '1 kHz exciter, bare' })
    server.away()
    await user.selectOptions(screen.getByLabelText('Show'), 'Archived')
    expect(await screen.findByText(/What you typed stays in this page/)).toBeInTheDocument()
    server.away(false)
    await waitFor(() => expect(screen.queryByText(/What you typed stays/)).not.toBeInTheDocument(), {
      timeout: 6000,
    })
  })

  it('explains a server that fails at the very start, and tries again', async () => {
    const server = openServer()
    server.set('GET /api/session', problem(400, 'broken', { detail: 'The database does not answer.' }))
    const { user } = renderApp('/designs')
    expect(await screen.findByText('The database does not answer.')).toBeInTheDocument()
    server.set('GET /api/session', answer(aSession()))
    await user.click(screen.getByRole('button', { name: 'Try again' }))
    expect(await screen.findByRole('heading', { name: 'Designs' })).toBeInTheDocument()
  })
})

describe('the account menu', () => {
  it('works by keyboard and changes the theme', async () => {
    openServer()
    const { user } = renderApp('/designs')
    const button = await screen.findByRole('button', { name: /Edda Holm/ })
    button.focus()
    await user.keyboard('{Enter}')
    expect(await screen.findByRole('menuitemradio', { name: 'As the system' })).toHaveFocus()
    await user.keyboard('{ArrowDown}{ArrowDown}{Enter}')
    expect(document.documentElement).toHaveAttribute('data-theme', 'dark')
    expect(screen.getByRole('menuitemradio', { name: 'Dark' })).toBeChecked()
    await user.keyboard('{ArrowUp}{ArrowUp}{Enter}{Escape}')
    expect(document.documentElement).not.toHaveAttribute('data-theme')
    await waitFor(() => expect(button).toHaveFocus())
  })

  it('signs out and keeps nothing', async () => {
    const server = openServer()
    const { user, at } = renderApp('/designs')
    await user.click(await screen.findByRole('button', { name: /Edda Holm/ }))
    server.set('GET /api/session', problem(401, 'signed-out'))
    await user.click(screen.getByRole('menuitem', { name: 'Sign out' }))
    expect(await screen.findByLabelText('E-mail')).toBeInTheDocument()
    expect(at()).toBe('/sign-in')
    expect(server.asked('DELETE /api/session')[0]?.headers.get('X-CSRF-Token')).toBe('token-1')
  })
})
