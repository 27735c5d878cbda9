import { createHash, createHmac, hkdfSync, randomBytes } from 'node:crypto'
import jwt from 'jsonwebtoken'
import { z } from 'zod'
import { sessionLife } from '#server/identity/session-life.ts'

const claimsSchema = z.object({ sid: z.string().min(1), sub: z.string(), exp: z.number() })

/** What a token says: which session, whose, and until when (ms since 1970). */
export interface Claims {
  sessionId: string
  personId: number
  expiresAt: number
}

/** A new session id: 256 random bits. */
export const newSessionId = () => randomBytes(32).toString('base64url')

/** What the database keeps of a session id, so that a stolen copy of it opens nothing. */
export const hashSessionId = (sessionId: string) => createHash('sha256').update(sessionId).digest('base64url')

/** Signs and reads session tokens (JWT, HS256 and nothing else) and derives CSRF tokens, each with its own key (RFC 5869). */
export function createTokens(secret: string) {
  const key = (purpose: string) => Buffer.from(hkdfSync('sha256', secret, '', `sinewright ${purpose}`, 32))
  const tokenKey = key('session token')
  const csrfKey = key('csrf token')
  const seconds = (time: Date) => Math.floor(time.getTime() / 1000)

  return {
    sign(sessionId: string, personId: number, now: Date): string {
      const issued = seconds(now)
      return jwt.sign({ sid: sessionId, iat: issued, exp: issued + sessionLife.token / 1000 }, tokenKey, {
        algorithm: 'HS256',
        subject: String(personId),
      })
    },

    /**
     * The claims of a token that we signed, null for any other. Its age is the caller's to judge: an old token still
     * names a session, whose row decides.
     */
    read(token: string): Claims | null {
      try {
        const { sid, sub, exp } = claimsSchema.parse(
          jwt.verify(token, tokenKey, { algorithms: ['HS256'], ignoreExpiration: true }),
        )
        return { sessionId: sid, personId: Number(sub), expiresAt: exp * 1000 }
      } catch (error) {
        if (error instanceof jwt.JsonWebTokenError || error instanceof z.ZodError) return null
        throw error
      }
    },

    csrf: (sessionId: string) => createHmac('sha256', csrfKey).update(sessionId).digest('base64url'),
  }
}
