import type { ErrorRequestHandler, RequestHandler } from 'express'
import type { Logger } from 'pino'
import { HttpError, notFound } from '#server/http/errors.ts'
import { limits } from '#shared/limits.ts'
import type { Problem } from '#shared/schemas/problem.ts'

/** Answers any path under /api that no router knows. */
export const unknownPath: RequestHandler = () => {
  throw notFound('This address')
}

/** Turns every error into an `application/problem+json` answer (RFC 9457). What we did not foresee is logged, not shown. */
export function errorHandler(log: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    const known = asHttpError(error)
    if (!known) log.error({ err: error, requestId: request.id }, 'request failed')
    if (response.headersSent) {
      next(error)
      return
    }
    const { status, code, message, details } =
      known ?? new HttpError(500, 'internal', 'The server failed. Nothing was changed; try again.')
    const problem: Problem & Record<string, unknown> = {
      ...details.members,
      type: 'about:blank',
      title: message,
      status,
      code,
      ...(details.detail !== undefined && { detail: details.detail }),
      ...(details.errors && { errors: details.errors }),
      ...(!known && { requestId: request.id }),
    }
    response.status(status).set(details.headers ?? {})
    response.type('application/problem+json').send(JSON.stringify(problem))
  }
}

/** Our own errors, and those of Express and its body parser that the client caused; null for the rest. */
function asHttpError(error: unknown): HttpError | null {
  if (error instanceof HttpError) return error
  const { type, status } = error as { type?: unknown; status?: unknown }
  if (type === 'entity.parse.failed') return new HttpError(400, 'malformed', 'The body is not valid JSON.')
  if (type === 'entity.too.large')
    return new HttpError(
      413,
      'too-large',
      `The body is too large: at most ${limits.requestBody / 1024} KiB are accepted.`,
    )
  if (status === 415)
    return new HttpError(415, 'unsupported-type', 'This encoding of the body is not understood.')
  if (typeof status === 'number' && status >= 400 && status < 500)
    return new HttpError(status, 'malformed', 'The request is malformed.')
  return null
}
