import { screen, waitFor } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { axeViolations } from '#tests/support/axe.ts'
import { aSession } from '#tests/support/client-data.ts'
import { answer, fakeApi, problem } from '#tests/support/fake-api.ts'
import { renderApp } from '#tests/support/render-app.tsx'

afterEach(() => vi.unstubAllGlobals())

async function openAccount() {
  const server = fakeApi({
    'GET /api/session': answer(aSession('reviewer')),
    'PUT /api/account/password': answer(null, 204),
    'DELETE /api/sessions': answer(null, 204),
  })
  const app = renderApp('/account')
  await screen.findByRole('heading', { name: 'Change password' })
  const change = async (current: string, next: string) => {
    await app.user.type(screen.getByLabelText('Current password'), current)
    await app.user.type(screen.getByLabelText('New password'), next)
    await app.user.click(screen.getByRole('button', { name: 'Change password' }))
  }
  return { ...app, server, change }
}

describe('account', () => {
  it('says who I am, without faults that axe-core finds', async () => {
    await openAccount()
    expect(screen.getByText('reviewer@brackwater.example')).toBeInTheDocument()
    expect(screen.getByText(/^reviewer: /)).toBeInTheDocument()
    expect(await axeViolations()).toEqual([])
  })

  it('changes the password and says what else that did', async () => {
    const { server, change } = await openAccount()
    await change('old password', 'salt and pepper')
    expect(await screen.findByText(/The password is changed/)).toBeInTheDocument()
    expect(server.asked('PUT /api/account/password')[0]?.body).toEqual({
      currentPassword: 'old password',
      newPassword: 'salt and pepper',
    })
    expect(screen.getByLabelText('New password')).toHaveValue('')
  })

  it('refuses a short or unchanged password at the field', async () => {
    const { server, change, user } = await openAccount()
    await change('same-password', 'short')
    const next = screen.getByLabelText('New password')
    await waitFor(() => expect(next).toHaveAccessibleDescription('A password needs at least 10 characters.'))
    await user.clear(next)
    await user.type(next, 'same-password')
    await waitFor(() => expect(next).toHaveAccessibleDescription(/must differ from the current one/))
    expect(server.asked('PUT /api/account/password')).toHaveLength(0)
  })

  it("puts the server's refusal at the field that it names", async () => {
    const { server, change } = await openAccount()
    const message = 'This is not your current password.'
    server.set(
      'PUT /api/account/password',
      problem(422, 'invalid', { errors: [{ path: ['currentPassword'], message }] }),
    )
    await change('not the one', 'salt and pepper')
    const current = screen.getByLabelText('Current password')
    await waitFor(() => expect(current).toHaveAccessibleDescription(message))
    expect(current).toHaveFocus()
    expect(screen.getByLabelText('New password')).toHaveValue('salt and pepper')
  })

  it('signs out everywhere', async () => {
    const { server, user, at } = await openAccount()
    server.set('GET /api/session', problem(401, 'signed-out'))
    await user.click(screen.getByRole('button', { name: 'Sign out everywhere' }))
    await waitFor(() => expect(at()).toBe('/sign-in'))
    expect(server.asked('DELETE /api/sessions')).toHaveLength(1)
  })

  it('stays, and says why, when signing out fails', async () => {
    const { server, user, at } = await openAccount()
    server.away()
    await user.click(screen.getByRole('button', { name: 'Sign out' }))
    expect(await screen.findByText(/Not signed out: The server cannot be reached/)).toBeInTheDocument()
    expect(at()).toBe('/account')
  })
})
