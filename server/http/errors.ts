/** A request that cannot be served, as the client will read it: RFC 9457 status and title, and our stable code. */
export interface FieldError {
  path: (string | number)[]
  message: string
}

interface Details {
  detail?: string
  errors?: FieldError[]
  /** Further members of the problem document (RFC 9457 §3.2). */
  members?: Record<string, unknown>
  headers?: Record<string, string>
}

export class HttpError extends Error {
  override name = 'HttpError'

  constructor(
    readonly status: number,
    readonly code: string,
    /** Short sentence for people; becomes the problem's `title`. */
    title: string,
    readonly details: Details = {},
  ) {
    super(title)
  }
}

export const signedOut = () => new HttpError(401, 'signed-out', 'Sign in to go on.')

export const wrongCredentials = () => new HttpError(401, 'wrong-credentials', 'E-mail or password is wrong.')

export const forbidden = (title = 'Your role does not allow this.') => new HttpError(403, 'forbidden', title)

export const csrfRefused = () =>
  new HttpError(403, 'csrf', 'The request did not come from the page you signed in to. Reload the page.')

export const notFound = (what = 'This') => new HttpError(404, 'not-found', `${what} does not exist.`)

/** A state of the thing that the request did not reckon with: `name-taken`, `stale-draft`, `archived`. */
export const conflict = (code: string, title: string, details: Details = {}) =>
  new HttpError(409, code, title, details)

/** Input that was understood and refused, field by field. */
export const invalid = (errors: FieldError[]) =>
  new HttpError(422, 'invalid', errors.length === 1 ? errors[0]!.message : 'Some values cannot be used.', {
    errors,
  })

/** @param seconds how long to wait before the next attempt */
export const tooManyAttempts = (seconds: number) =>
  new HttpError(
    429,
    'too-many-attempts',
    `Too many attempts. Try again in ${seconds} ${seconds === 1 ? 'second' : 'seconds'}.`,
    { headers: { 'Retry-After': String(seconds) } },
  )
