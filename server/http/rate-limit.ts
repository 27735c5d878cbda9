import type { RequestHandler } from 'express'
import { rateLimit, type AugmentedRequest } from 'express-rate-limit'
import type { Config } from '#server/config.ts'
import { tooManyAttempts } from '#server/http/errors.ts'

const minute = 60_000

/** @param counted which requests count against the limit */
const perAddress = (windowMs: number, limit: number, counted: 'all' | 'failed'): RequestHandler =>
  rateLimit({
    windowMs,
    limit,
    skipSuccessfulRequests: counted === 'failed',
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: (request) => {
      const resetTime = (request as AugmentedRequest).rateLimit?.resetTime?.getTime() ?? Date.now() + windowMs
      throw tooManyAttempts(Math.max(1, Math.ceil((resetTime - Date.now()) / 1000)))
    },
  })

/** Generous: stops a runaway client, never a working person. */
export const limitRequests = ({ rates }: Config) => perAddress(minute, rates.requestsPerMinute, 'all')

/** Failed sign-ins of one address, whatever the account. */
export const limitSignIns = ({ rates }: Config) =>
  perAddress(15 * minute, rates.failedSignInsPerQuarterHour, 'failed')
