/** Renders a runs page the way the application does: cache with a session, router, engine; answers made up here. */
import { QueryClientProvider } from '@tanstack/react-query'
import { render } from '@testing-library/react'
import type { ReactNode } from 'react'
import { createMemoryRouter, RouterProvider } from 'react-router-dom'
import { vi } from 'vitest'
import { EngineContext, type EngineClient } from '#client/lib/engine-context.ts'
import { createQueryClient } from '#client/lib/query-client.ts'
import { sessionQueries } from '#client/lib/session.ts'
import type { Person } from '#shared/schemas/account.ts'
import { engineer } from '#tests/client/features/runs/support/runs.ts'

/** Answers by "METHOD /path"; a function is asked with the request's body. */
export type Answers = Record<string, Response | ((body: string | undefined) => Response | Promise<Response>)>

export { answer as json, problem } from '#tests/support/fake-api.ts'

/** Puts a server of `answers` in the place of fetch; paths without an answer cannot be reached. */
export function serve(answers: Answers) {
  const server = vi.fn(async (input: string | URL | Request, init: RequestInit = {}) => {
    const { pathname } = new URL(String(input), 'http://sinewright.example')
    const answer = answers[`${init.method ?? 'GET'} ${pathname}`]
    if (!answer) throw new TypeError('Failed to fetch')
    return typeof answer === 'function' ? answer(init.body as string | undefined) : answer.clone()
  })
  vi.stubGlobal('fetch', server)
  return server
}

const noEngine: EngineClient = {
  smallSignal: () => Promise.reject(new Error('no engine in this test')),
  run: () => Promise.reject(new Error('no engine in this test')),
}

export interface RenderOptions {
  viewer?: Person
  engine?: EngineClient
  /** Where the page stands. */
  address?: string
}

export function renderRuns(page: ReactNode, options: RenderOptions = {}) {
  const { viewer = engineer, engine = noEngine, address = '/' } = options
  const queryClient = createQueryClient()
  queryClient.setDefaultOptions({ queries: { retry: false, networkMode: 'always' } })
  queryClient.setQueryData(sessionQueries.current().queryKey, {
    person: viewer,
    csrfToken: 'token',
    mode: 'demo',
  })
  const router = createMemoryRouter([{ path: '*', element: page }], { initialEntries: [address] })
  const view = render(
    <QueryClientProvider client={queryClient}>
      <EngineContext value={engine}>
        <RouterProvider router={router} />
      </EngineContext>
    </QueryClientProvider>,
  )
  return { ...view, router, queryClient }
}
