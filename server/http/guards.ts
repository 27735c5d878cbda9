import type { RequestHandler } from 'express'
import helmet from 'helmet'
import type { Config } from '#server/config.ts'
import { HttpError } from '#server/http/errors.ts'
import { isLoopbackName } from '#server/loopback.ts'

/** Security headers: everything comes from this origin, nothing is framed, no inline code or style. */
export function securityHeaders({ mode, trustProxy }: Config): RequestHandler {
  const behindTls = mode === 'production' && trustProxy > 0
  const none = ["'none'"]
  const self = ["'self'"]
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: none,
        baseUri: none,
        frameAncestors: none,
        scriptSrc: self,
        styleSrc: self,
        fontSrc: self,
        connectSrc: self,
        workerSrc: self,
        manifestSrc: self,
        formAction: self,
        imgSrc: ["'self'", 'data:'],
        ...(behindTls && { upgradeInsecureRequests: [] }),
      },
    },
    strictTransportSecurity: behindTls,
    xFrameOptions: { action: 'deny' },
  })
}

/** The demo answers only to this machine's own names: a foreign page cannot reach it by rebinding a DNS name. */
export const loopbackHostOnly: RequestHandler = (request, _response, next) => {
  if (!isLoopbackName(request.hostname ?? ''))
    throw new HttpError(421, 'wrong-host', 'The demo answers only on 127.0.0.1, [::1] or localhost.')
  next()
}

/** A body under /api is JSON or nothing. */
export const jsonOnly: RequestHandler = (request, _response, next) => {
  const isEmpty = request.get('Content-Length') === '0'
  if (!isEmpty && request.is('application/json') === false)
    throw new HttpError(415, 'unsupported-type', 'The body must be application/json.')
  next()
}

/** Answers of the API are personal: no cache keeps them unless a route says otherwise. */
export const noStore: RequestHandler = (_request, response, next) => {
  response.set('Cache-Control', 'no-store')
  next()
}
