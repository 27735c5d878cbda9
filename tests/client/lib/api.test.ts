/** The contract with the server: /api, X-CSRF-Token, problem+json (RFC 9457), silence. */
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { api, ApiError, apiUrl, OfflineError, onSignedOut, keepSession } from '#client/lib/api.ts'
import { isReachable, reportReachable } from '#client/lib/reachability.ts'
import { aSession } from '#tests/support/client-data.ts'
import { answer, fakeApi, problem } from '#tests/support/fake-api.ts'

const failure = (promise: Promise<unknown>): Promise<unknown> =>
  promise.then(
    () => expect.unreachable('should have failed'),
    (error: unknown) => error,
  )

beforeEach(() => reportReachable(true))
afterEach(() => {
  keepSession(null)
  vi.unstubAllGlobals()
})

describe('requests', () => {
  it('leaves empty parameters out of the query', () => {
    expect(apiUrl('/runs', { search: '', page: 2, designId: undefined, archived: false, sort: 'a&b' })).toBe(
      '/api/runs?page=2&archived=false&sort=a%26b',
    )
    expect(apiUrl('/runs')).toBe('/api/runs')
  })

  it('sends JSON and the CSRF token with what changes something, neither with GET', async () => {
    const server = fakeApi({
      'GET /api/projects': answer({ items: [] }),
      'POST /api/projects': answer({ id: 1 }, 201),
      'DELETE /api/runs/4': answer(null, 204),
    })
    keepSession(aSession('engineer', { csrfToken: 'abc' }))
    await api.get('/projects')
    await expect(api.post('/projects', { name: 'Line set' })).resolves.toEqual({ id: 1 })
    await expect(api.delete('/runs/4')).resolves.toBeUndefined()
    const [get, post, remove] = server.requests
    expect(get?.headers.get('X-CSRF-Token')).toBeNull()
    expect(get?.headers.get('Content-Type')).toBeNull()
    expect(post?.headers.get('X-CSRF-Token')).toBe('abc')
    expect(post?.headers.get('Content-Type')).toBe('application/json')
    expect(post?.body).toEqual({ name: 'Line set' })
    expect(remove?.headers.get('X-CSRF-Token')).toBe('abc')
  })

  it('hands over bytes unchanged', async () => {
    fakeApi({ 'GET /api/runs/4/record': new Response(new Uint8Array([1, 2, 250])) })
    expect([...new Uint8Array(await api.bytes('/runs/4/record'))]).toEqual([1, 2, 250])
  })

  it('passes an abort on as such, without calling the server away', async () => {
    fakeApi({})
    const error = await failure(api.get('/projects', { signal: AbortSignal.abort() }))
    expect(error).not.toBeInstanceOf(OfflineError)
    expect(isReachable()).toBe(true)
  })
})

describe('refusals', () => {
  it('keeps extension members, field errors and Retry-After', async () => {
    fakeApi({
      'PUT /api/designs/7/draft': problem(409, 'stale-draft', {
        draft: { version: 5 },
        detail: 'Saved by Ruben.',
      }),
      'POST /api/session': problem(429, 'too-many-attempts', {}, { 'Retry-After': '30' }),
    })
    const stale = await failure(api.put('/designs/7/draft', {}))
    expect(stale).toBeInstanceOf(ApiError)
    expect(stale).toMatchObject({
      message: 'Saved by Ruben.',
      problem: { code: 'stale-draft', draft: { version: 5 } },
    })
    expect(await failure(api.post('/session', {}))).toMatchObject({ retryAfter: 30 })
  })

  it('turns an answer that is no problem into one', async () => {
    fakeApi({ 'GET /api/projects': new Response('<h1>Sorry</h1>', { status: 500 }) })
    const error = await failure(api.get('/projects'))
    expect(error).toMatchObject({ problem: { status: 500, code: 'unknown' } })
  })

  it('tells listeners that the session ended, and only that', async () => {
    fakeApi({
      'GET /api/designs': problem(401, 'signed-out'),
      'POST /api/session': problem(401, 'wrong-credentials'),
    })
    const heard = vi.fn()
    const stop = onSignedOut(heard)
    await failure(api.post('/session', {}))
    expect(heard).not.toHaveBeenCalled()
    await failure(api.get('/designs'))
    expect(heard).toHaveBeenCalledTimes(1)
    stop()
    await failure(api.get('/designs'))
    expect(heard).toHaveBeenCalledTimes(1)
  })
})

describe('a second tab that signed in anew', () => {
  /** Knows only the token of the new session. */
  const serverOf = (session: ReturnType<typeof aSession>) =>
    fakeApi({
      'GET /api/session': answer(session),
      'POST /api/projects': ({ headers }) =>
        headers.get('X-CSRF-Token') === session.csrfToken ? answer({ id: 1 }, 201) : problem(403, 'csrf'),
    })

  it('goes unnoticed when it is the same person', async () => {
    keepSession(aSession())
    const server = serverOf(aSession('engineer', { csrfToken: 'token-2' }))
    await expect(api.post('/projects', { name: 'Line set' })).resolves.toEqual({ id: 1 })
    await api.post('/projects', { name: 'Probe set' })
    expect(server.asked('GET /api/session')).toHaveLength(1)
  })

  it('ends the session of this page when it is somebody else', async () => {
    keepSession(aSession())
    const other = {
      id: 2,
      name: 'Ruben Achterberg',
      email: 'ruben@brackwater.example',
      role: 'admin',
    } as const
    const server = serverOf(aSession('admin', { csrfToken: 'token-2', person: other }))
    const heard = vi.fn()
    const stop = onSignedOut(heard)
    const error = await failure(api.post('/projects', { name: 'Line set' }))
    expect(error).toMatchObject({
      message: expect.stringMatching(/^Ruben Achterberg has signed in/) as string,
      problem: { code: 'signed-out' },
    })
    expect(heard).toHaveBeenCalledTimes(1)
    expect(server.asked('POST /api/projects')).toHaveLength(1)
    stop()
  })
})

describe('silence', () => {
  it('is an OfflineError, and known until the next answer', async () => {
    const server = fakeApi({ 'GET /api/health': answer({ status: 'ok' }) })
    server.away()
    expect(await failure(api.get('/health'))).toBeInstanceOf(OfflineError)
    expect(isReachable()).toBe(false)
    server.away(false)
    await api.get('/health')
    expect(isReachable()).toBe(true)
  })

  it.each([502, 504])('is what a proxy says with %i', async (status) => {
    fakeApi({ 'GET /api/health': new Response('', { status }) })
    expect(await failure(api.get('/health'))).toBeInstanceOf(OfflineError)
    expect(isReachable()).toBe(false)
  })

  it('counts a body that breaks off', async () => {
    fakeApi({ 'GET /api/projects': new Response('{"items": [', { status: 200 }) })
    expect(await failure(api.get('/projects'))).toBeInstanceOf(OfflineError)
  })
})
