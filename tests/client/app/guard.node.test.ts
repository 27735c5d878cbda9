import { QueryClient } from '@tanstack/react-query'
import { afterEach, describe, expect, it } from 'vitest'
import { requireSession } from '#client/app/guard.ts'
import { keepSession } from '#client/lib/api.ts'
import { sessionQueries } from '#client/lib/session.ts'
import { aSession } from '#tests/support/client-data.ts'

afterEach(() => keepSession(null))

/** What the guard throws for a cached session on the way to a design; null when it lets one through. */
async function refusal(): Promise<Response | null> {
  const queryClient = new QueryClient()
  queryClient.setQueryData(sessionQueries.current().queryKey, aSession('engineer'))
  const request = new Request('http://127.0.0.1/designs/1/tone?from=1')
  const guard = requireSession(queryClient) as (argument: { request: Request }) => Promise<void>
  return guard({ request }).then(
    () => null,
    (thrown: unknown) => thrown as Response,
  )
}

describe('requireSession', () => {
  it('lets a person through whose session is kept', async () => {
    keepSession(aSession('engineer'))
    expect(await refusal()).toBeNull()
  })

  it('lets nobody back who has just signed out, though the cache is still full', async () => {
    keepSession(null)
    const answer = await refusal()
    expect(answer?.status).toBe(302)
    expect(answer?.headers.get('Location')).toBe('/sign-in?next=%2Fdesigns%2F1%2Ftone%3Ffrom%3D1')
  })
})
