/**
 * The one way to the server: JSON in and out, problems (RFC 9457) as `ApiError`, silence as `OfflineError`.
 * Keeps the session's CSRF token and says aloud when the session has ended or the server came or went.
 */
import type { Session } from '#shared/schemas/account.ts'
import { problemSchema, type Problem } from '#shared/schemas/problem.ts'
import { reportReachable } from '#client/lib/reachability.ts'

/** The server refused. `problem` keeps its extension members, such as `draft` of a `stale-draft`. */
export class ApiError extends Error {
  override name = 'ApiError'
  readonly problem: Problem & Record<string, unknown>
  /** Seconds to wait before another try, from `Retry-After`; null when the server named none. */
  readonly retryAfter: number | null

  constructor(problem: Problem & Record<string, unknown>, retryAfter: number | null = null) {
    super(problem.detail ?? problem.title)
    this.problem = problem
    this.retryAfter = retryAfter
  }
}

/** No answer came: the network or the server is away. Nothing was necessarily saved. */
export class OfflineError extends Error {
  override name = 'OfflineError'

  constructor(cause?: unknown) {
    super('The server cannot be reached. Check the connection and try again.', { cause })
  }
}

export type Query = Record<string, string | number | boolean | null | undefined>

export interface RequestOptions {
  signal?: AbortSignal
  /** Undefined, null and empty values are left out. */
  query?: Query
}

const base = '/api'
let current: { csrfToken: string; personId: number } | null = null

/** Keeps whose session this page works in, and its token for requests that change something; null forgets it. */
export function keepSession(session: Session | null): void {
  current = session && { csrfToken: session.csrfToken, personId: session.person.id }
}

/** Whether this page works in a session: false once it was signed out of, whatever is still in memory. */
export function sessionIsKept(): boolean {
  return current !== null
}

type Listener = () => void
const signedOutListeners = new Set<Listener>()

/** Calls `listener` whenever the server answers that the session has ended. Returns the way to stop. */
export function onSignedOut(listener: Listener): () => void {
  signedOutListeners.add(listener)
  return () => void signedOutListeners.delete(listener)
}

/** Address of an API path with its query, for requests and for download links. */
export function apiUrl(path: string, query: Query = {}): string {
  const search = new URLSearchParams()
  for (const [key, value] of Object.entries(query))
    if (value !== undefined && value !== null && value !== '') search.set(key, String(value))
  const text = search.toString()
  return `${base}${path}${text && `?${text}`}`
}

/** Reads a problem; an answer that is none (a proxy's page, say) becomes one, so that callers see one shape. */
async function toError(response: Response): Promise<ApiError> {
  const body: unknown = await response.json().catch(() => null)
  const parsed = problemSchema.loose().safeParse(body)
  const seconds = Number(response.headers.get('Retry-After') ?? Number.NaN)
  if (parsed.success) return new ApiError(parsed.data, Number.isFinite(seconds) ? seconds : null)
  return new ApiError({
    type: 'about:blank',
    title: `The server answered with status ${response.status}, which this page does not understand.`,
    status: response.status,
    code: 'unknown',
  })
}

async function send(method: string, path: string, body: unknown, options: RequestOptions): Promise<Response> {
  const headers: Record<string, string> = { Accept: 'application/json, application/problem+json' }
  if (body !== undefined) headers['Content-Type'] = 'application/json'
  if (method !== 'GET' && current) headers['X-CSRF-Token'] = current.csrfToken
  let response: Response
  try {
    response = await fetch(apiUrl(path, options.query), {
      method,
      headers,
      body: body === undefined ? undefined : JSON.stringify(body),
      credentials: 'same-origin',
      signal: options.signal,
    })
  } catch (error) {
    if (options.signal?.aborted) throw error
    reportReachable(false)
    throw new OfflineError(error)
  }
  // A development or reverse proxy answers for a server that is away.
  if (response.status === 502 || response.status === 504) {
    reportReachable(false)
    throw new OfflineError()
  }
  reportReachable(true)
  if (response.ok) return response
  throw await toError(response)
}

/**
 * Another tab has signed in anew, so the cookie belongs to a session whose token this page does not know. Takes the
 * token if it is the same person's.
 * @throws ApiError `signed-out` when somebody else has signed in: this page must not act in another's name
 */
async function adoptNewSession(before: { personId: number }): Promise<void> {
  const session = (await (await send('GET', '/session', undefined, {})).json()) as Session
  if (session.person.id === before.personId) return keepSession(session)
  const title = `${session.person.name} has signed in in another tab. Sign in again to go on.`
  throw new ApiError({ type: 'about:blank', title, status: 401, code: 'signed-out' })
}

async function request(method: string, path: string, body: unknown, options: RequestOptions) {
  try {
    return await send(method, path, body, options).catch(async (error: unknown) => {
      if (!(error instanceof ApiError) || error.problem.code !== 'csrf' || !current) throw error
      await adoptNewSession(current)
      return send(method, path, body, options)
    })
  } catch (error) {
    if (error instanceof ApiError && error.problem.code === 'signed-out')
      for (const listener of signedOutListeners) listener()
    throw error
  }
}

/** A connection that breaks within the body is silence too. */
async function read<T>(options: RequestOptions, body: () => Promise<T>): Promise<T> {
  try {
    return await body()
  } catch (error) {
    if (options.signal?.aborted) throw error
    throw new OfflineError(error)
  }
}

async function json<T>(method: string, path: string, body: unknown, options: RequestOptions): Promise<T> {
  const response = await request(method, path, body, options)
  if (response.status === 204) return undefined as T
  return read(options, () => response.json() as Promise<T>)
}

export const api = {
  get: <T>(path: string, options: RequestOptions = {}) => json<T>('GET', path, undefined, options),
  post: <T>(path: string, body?: unknown, options: RequestOptions = {}) =>
    json<T>('POST', path, body, options),
  put: <T>(path: string, body?: unknown, options: RequestOptions = {}) => json<T>('PUT', path, body, options),
  patch: <T>(path: string, body?: unknown, options: RequestOptions = {}) =>
    json<T>('PATCH', path, body, options),
  delete: <T = void>(path: string, body?: unknown, options: RequestOptions = {}) =>
    json<T>('DELETE', path, body, options),
  /** The raw bytes of an answer, such as a run's record. */
  bytes: async (path: string, options: RequestOptions = {}): Promise<ArrayBuffer> => {
    const response = await request('GET', path, undefined, options)
    return read(options, () => response.arrayBuffer())
  },
}
