import { screen, waitFor, within } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { axeViolations } from '#tests/support/axe.ts'
import { aDesign, aPage, aSession, exciterProject } from '#tests/support/client-data.ts'
import { answer, fakeApi, problem } from '#tests/support/fake-api.ts'
import { renderApp } from '#tests/support/render-app.tsx'

/** A server that knows nobody until the right password comes. */
function closedServer() {
  const server = fakeApi({
    'GET /api/session': problem(401, 'signed-out'),
    'GET /api/designs': answer(aPage([aDesign()])),
    'GET /api/projects': answer({ items: [exciterProject] }),
    'POST /api/session': ({ body }) => {
      if ((body as { password: string }).password !== 'river-salinity')
        return problem(401, 'wrong-credentials', { detail: 'E-mail or password is wrong.' })
      server.set('GET /api/session', answer(aSession()))
      return answer(aSession())
    },
  })
  return server
}

async function fillIn(user: ReturnType<typeof renderApp>['user'], email: string, password: string) {
  const [mail, word] = [screen.getByLabelText('E-mail'), screen.getByLabelText('Password')]
  await user.clear(mail)
  await user.clear(word)
  if (email) await user.type(mail, email)
  if (password) await user.type(word, password)
  await user.click(screen.getByRole('button', { name: 'Sign in' }))
}

afterEach(() => vi.unstubAllGlobals())

describe('sign-in', () => {
  it('stands before every page and leads on to the one asked for', async () => {
    closedServer()
    const { at, user } = renderApp('/designs?search=kHz')
    await screen.findByLabelText('E-mail')
    expect(at()).toBe('/sign-in?next=%2Fdesigns%3Fsearch%3DkHz')
    expect(document.title).toBe('Sign in · Sinewright')
    await fillIn(user, ' Engineer@Brackwater.example', 'river-salinity')
    expect(await screen.findByRole('link', { name: '1 kHz exciter, bare' })).toBeInTheDocument()
    expect(at()).toBe('/designs?search=kHz')
  })

  it.each(['demo', 'production'] as const)('says where the sign-ins are in a demo only: %s', async (mode) => {
    closedServer().set('GET /api/health', answer({ status: 'ok', version: '1', database: 'ok', mode }))
    renderApp('/sign-in')
    await screen.findByLabelText('E-mail')
    expect(screen.queryByText(/sign-ins are printed/) !== null).toBe(mode === 'demo')
  })

  it('does not lead to another site', async () => {
    closedServer()
    const { at, user } = renderApp('/sign-in?next=//elsewhere.example/')
    await screen.findByLabelText('E-mail')
    await fillIn(user, 'engineer@brackwater.example', 'river-salinity')
    await waitFor(() => expect(at()).toBe('/designs'))
  })

  it('says at the field what is missing or no e-mail address, without asking the server', async () => {
    const server = closedServer()
    const { user } = renderApp('/sign-in')
    await screen.findByLabelText('E-mail')
    await fillIn(user, 'engineer', '')
    const email = screen.getByLabelText('E-mail')
    await waitFor(() => expect(email).toHaveAccessibleDescription(/not an e-mail address/))
    expect(email).toBeInvalid()
    expect(email).toHaveFocus()
    expect(screen.getByLabelText('Password')).toHaveAccessibleDescription('Password is missing.')
    expect(server.asked('POST /api/session')).toHaveLength(0)
    expect(await axeViolations()).toEqual([])
  })

  it('says that the pair is wrong, keeps what was typed and selects the password', async () => {
    closedServer()
    const { user } = renderApp('/sign-in')
    await screen.findByLabelText('E-mail')
    await fillIn(user, 'engineer@brackwater.example', 'wrong')
    expect(await screen.findByRole('alert')).toHaveTextContent('E-mail or password is wrong.')
    expect(screen.getByLabelText('E-mail')).toHaveValue('engineer@brackwater.example')
    expect(screen.getByLabelText('Password')).toHaveFocus()
  })

  it('counts down the wait after too many attempts, then lets one try again', async () => {
    const server = closedServer()
    server.set('POST /api/session', problem(429, 'too-many-attempts', {}, { 'Retry-After': '2' }))
    const { user } = renderApp('/sign-in')
    await screen.findByLabelText('E-mail')
    await fillIn(user, 'engineer@brackwater.example', 'wrong')
    expect(await screen.findByText(/Wait 2 s before the next try/)).toBeInTheDocument()
    expect(screen.getByRole('button', { name: 'Sign in' })).toBeDisabled()
    await waitFor(() => expect(screen.getByRole('button', { name: 'Sign in' })).toBeEnabled(), {
      timeout: 5000,
    })
  })

  it('says so when the server is away, and keeps what was typed', async () => {
    const server = closedServer()
    const { user } = renderApp('/sign-in')
    await screen.findByLabelText('E-mail')
    server.away()
    await fillIn(user, 'engineer@brackwater.example', 'river-salinity')
    expect(await screen.findByRole('alert')).toHaveTextContent('The server cannot be reached.')
    expect(screen.getByLabelText('Password')).toHaveValue('river-salinity')
  })
})

describe('a session that ends in the middle of work', () => {
  it('is renewed over the page, which then asks again', async () => {
    const server = closedServer()
    server.set('GET /api/session', answer(aSession()))
    const { user, at } = renderApp('/designs')
    await screen.findByRole('link', { name: '1 kHz exciter, bare' })
    server.set('GET /api/designs', problem(401, 'signed-out'))
    await user.type(screen.getByLabelText('Search'), 'tone')
    const dialog = await screen.findByRole('dialog', { name: 'Your session has ended' })
    expect(dialog).toHaveAccessibleDescription(/The page behind stays/)
    expect(within(dialog).getByLabelText('E-mail')).toHaveValue('engineer@brackwater.example')
    await user.keyboard('{Escape}')
    expect(dialog).toBeInTheDocument()

    server.set('GET /api/designs', answer(aPage([aDesign({ name: 'Calibrator tone' })])))
    await user.type(within(dialog).getByLabelText('Password'), 'river-salinity{Enter}')
    expect(await screen.findByRole('link', { name: 'Calibrator tone' })).toBeInTheDocument()
    expect(screen.queryByRole('dialog')).not.toBeInTheDocument()
    expect(screen.getByLabelText('Search')).toHaveValue('tone')
    expect(at()).toBe('/designs?search=tone')
  })
})
