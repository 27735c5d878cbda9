import { timingSafeEqual } from 'node:crypto'
import type { RequestHandler } from 'express'
import { csrfRefused } from '#server/http/errors.ts'
import { signedIn } from '#server/http/authenticate.ts'

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses an unsafe request that another site's page sent. Browsers say where a request comes from in
 * `Sec-Fetch-Site` (W3C Fetch Metadata) or at least in `Origin`; programs that send neither pass on to the token.
 */
export const sameOriginOnly: RequestHandler = (request, _response, next) => {
  if (!safeMethods.has(request.method) && comesFromElsewhere(request)) throw csrfRefused()
  next()
}

function comesFromElsewhere(request: Parameters<RequestHandler>[0]): boolean {
  const site = request.get('Sec-Fetch-Site')
  if (site !== undefined) return site !== 'same-origin' && site !== 'none'
  const origin = request.get('Origin')
  return origin !== undefined && (!URL.canParse(origin) || new URL(origin).host !== request.host)
}

/** Asks every unsafe request of a signed-in person for the session's token in `X-CSRF-Token`. */
export const requireCsrfToken: RequestHandler = (request, _response, next) => {
  if (!safeMethods.has(request.method)) {
    const sent = Buffer.from(request.get('X-CSRF-Token') ?? '')
    const expected = Buffer.from(signedIn(request).csrfToken)
    if (sent.length !== expected.length || !timingSafeEqual(sent, expected)) throw csrfRefused()
  }
  next()
}
