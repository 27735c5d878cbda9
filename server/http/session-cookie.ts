import type { CookieOptions, Request, Response } from 'express'
import type { Config } from '#server/config.ts'
import { sessionLife } from '#server/identity/session-life.ts'

const cookieName = 'sinewright_session'

const options = ({ mode }: Config): CookieOptions => ({
  httpOnly: true,
  sameSite: 'strict',
  secure: mode === 'production',
  path: '/api',
})

/** The token that the browser sent, undefined when it sent none. Needs cookie-parser before it. */
export function readSessionCookie(request: Request): string | undefined {
  const token: unknown = (request.cookies as Record<string, unknown> | undefined)?.[cookieName]
  return typeof token === 'string' ? token : undefined
}

export function setSessionCookie(response: Response, config: Config, token: string): void {
  response.cookie(cookieName, token, { ...options(config), maxAge: sessionLife.absolute })
}

export function clearSessionCookie(response: Response, config: Config): void {
  response.clearCookie(cookieName, options(config))
}
