import { render, screen } from '@testing-library/react'
import { createMemoryRouter, RouterProvider } from 'react-router-dom'
import { afterEach, expect, it, vi } from 'vitest'
import { RouteError } from '#client/app/route-error.tsx'
import { isReachable, reportReachable } from '#client/lib/reachability.ts'

function open(lazy: () => Promise<{ Component: () => null }>) {
  const router = createMemoryRouter([{ path: '/', ErrorBoundary: RouteError, lazy }])
  return render(<RouterProvider router={router} />)
}

afterEach(() => {
  reportReachable(true)
  vi.restoreAllMocks()
})

it("explains a page whose file cannot be had, as a browser words it, and has the server's health asked", async () => {
  open(() => Promise.reject(new TypeError('Failed to fetch dynamically imported module: /assets/run-1.js')))
  expect(await screen.findByText('This page could not be loaded')).toBeInTheDocument()
  expect(screen.getByRole('button', { name: 'Reload' })).toBeInTheDocument()
  expect(isReachable()).toBe(false)
})

it('tells a fault of ours as such, and leaves it in the console', async () => {
  const log = vi.spyOn(console, 'error').mockImplementation(() => undefined)
  const fault = new RangeError('no figure colour')
  open(() => Promise.reject(fault))
  expect(await screen.findByText('This part of the page failed')).toBeInTheDocument()
  expect(log).toHaveBeenCalledWith(fault)
  expect(isReachable()).toBe(true)
})
