/** Mounts the whole client at an address, against a fake server, as `app/start.tsx` does in a browser. */
import { configure, render } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { vi } from 'vitest'
import { createMemoryRouter, RouterProvider } from 'react-router-dom'
import { Providers } from '#client/app/providers.tsx'
import { createRoutes } from '#client/app/router.tsx'
import { queryClient } from '#client/lib/query-client.ts'

// Pages are separate files, read when first opened: on a busy machine that takes a while.
configure({ asyncUtilTimeout: 8000 })

/** The loaders' own cache, emptied: what one test saw is no answer to the next. */
export function renderApp(address: string) {
  queryClient.clear()
  // jsdom has no layout to scroll.
  vi.spyOn(window, 'scrollTo').mockImplementation(() => undefined)
  const router = createMemoryRouter(createRoutes(queryClient), {
    initialEntries: [address],
    future: { v8_middleware: true },
  })
  const view = render(
    <Providers queryClient={queryClient}>
      <RouterProvider router={router} />
    </Providers>,
  )
  const at = () => `${router.state.location.pathname}${router.state.location.search}`
  return { ...view, router, at, user: userEvent.setup() }
}
