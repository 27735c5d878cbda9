import { existsSync } from 'node:fs'
import { join } from 'node:path'
import express, { Router, type Request } from 'express'
import { HttpError, notFound } from '#server/http/errors.ts'

/**
 * Serves the built client: files with a hash in their name for ever, the rest asked anew each time, and index.html
 * for every page address that the client's own router knows.
 */
export function clientFiles(directory: string): Router {
  const router = Router()
  const index = join(directory, 'index.html')
  router.use(
    '/assets',
    express.static(join(directory, 'assets'), {
      index: false,
      immutable: true,
      maxAge: '1y',
      redirect: false,
    }),
  )
  router.use(
    express.static(directory, { index: false, cacheControl: false, setHeaders: askAnew, redirect: false }),
  )
  router.use((request, response) => {
    if (!asksForPage(request)) throw notFound('This file')
    if (!existsSync(index))
      throw new HttpError(404, 'not-found', 'The client is not built. Run "npm run build:client".')
    askAnew(response)
    response.sendFile(index, { cacheControl: false })
  })
  return router
}

/** Page addresses hold no dot: a missing script or picture is never answered with the page. */
const asksForPage = (request: Request) =>
  (request.method === 'GET' || request.method === 'HEAD') &&
  !request.path.includes('.') &&
  request.accepts('html') !== false

const askAnew = (response: { setHeader(name: string, value: string): unknown }) => {
  response.setHeader('Cache-Control', 'no-cache')
}
