import { randomUUID } from 'node:crypto'
import { pino, type Logger } from 'pino'
import { pinoHttp } from 'pino-http'
import type { Config } from '#server/config.ts'

/** Names under which a secret could reach a log line; their values are never written. */
const secrets = [
  'password',
  'currentPassword',
  'newPassword',
  'passwordHash',
  'token',
  'cookie',
  'authorization',
]

/** The process's structured log: one JSON object a line on standard output. */
export function createLog({ logLevel }: Pick<Config, 'logLevel'>): Logger {
  return pino({
    level: logLevel,
    redact: secrets.flatMap((name) => [name, `*.${name}`, `*.*.${name}`]),
  })
}

/** One line per request: method, path, status, time and who asked. Headers and bodies stay out of the log. */
export function requestLog(log: Logger) {
  return pinoHttp({
    logger: log,
    genReqId: (_request, response) => {
      const id = randomUUID()
      response.setHeader('X-Request-Id', id)
      return id
    },
    quietReqLogger: true,
    customLogLevel: (_request, response, error) =>
      error || response.statusCode >= 500 ? 'error' : response.statusCode >= 400 ? 'info' : 'debug',
    customProps: (request) => ({ personId: (request as Partial<Express.Request>).signedIn?.person.id }),
    serializers: {
      req: ({ id, method, url }: { id: string; method: string; url: string }) => ({ id, method, url }),
      res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
    },
  })
}
