import { randomUUID } from 'node:crypto'
import { pino, type DestinationStream, type Logger } from 'pino'
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

/** The structured log: one JSON object a line, on standard output unless `destination` says otherwise. */
export function createLog({ logLevel }: Pick<Config, 'logLevel'>, destination?: DestinationStream): Logger {
  const redact = secrets.flatMap((name) => [name, `*.${name}`, `*.*.${name}`])
  return pino({ level: logLevel, redact }, destination ?? pino.destination(1))
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
