/** A server at the network edge for component tests: answers `fetch` from a table and remembers what it was asked. */
import { vi } from 'vitest'
import type { Problem } from '#shared/schemas/problem.ts'

export interface FakeRequest {
  method: string
  path: string
  query: URLSearchParams
  headers: Headers
  body: unknown
}

export type FakeAnswer = Response | ((request: FakeRequest) => Response | Promise<Response>)

export function answer(body: unknown, status = 200): Response {
  return status === 204 ? new Response(null, { status }) : Response.json(body, { status })
}

export function problem(
  status: number,
  code: string,
  more: Partial<Problem> & Record<string, unknown> = {},
  headers: Record<string, string> = {},
): Response {
  const body = { type: 'about:blank', title: `Refused: ${code}.`, status, code, ...more }
  return new Response(JSON.stringify(body), {
    status,
    headers: { 'Content-Type': 'application/problem+json', ...headers },
  })
}

/**
 * Takes `fetch`'s place until the test ends (`vi.unstubAllGlobals`). Routes are written `GET /api/designs`; what none
 * answers is a 404 problem. `away()` makes every request fail as without a network.
 */
export function fakeApi(routes: Record<string, FakeAnswer>) {
  const table = { ...routes }
  const requests: FakeRequest[] = []
  let isAway = false
  const fetchStub = async (input: string, init: RequestInit = {}): Promise<Response> => {
    init.signal?.throwIfAborted()
    if (isAway) throw new TypeError('Failed to fetch')
    const url = new URL(input, 'http://sinewright.example')
    const request: FakeRequest = {
      method: init.method ?? 'GET',
      path: url.pathname,
      query: url.searchParams,
      headers: new Headers(init.headers),
      body: typeof init.body === 'string' ? JSON.parse(init.body) : undefined,
    }
    requests.push(request)
    const found = table[`${request.method} ${request.path}`]
    if (!found) return problem(404, 'not-found')
    return typeof found === 'function' ? found(request) : found.clone()
  }
  vi.stubGlobal('fetch', vi.fn(fetchStub))
  return {
    requests,
    asked: (route: string) => requests.filter((request) => `${request.method} ${request.path}` === route),
    set: (route: string, next: FakeAnswer) => void (table[route] = next),
    away: (now = true) => void (isAway = now),
  }
}
