import { randomUUID } from 'node:crypto'
import { pino, stdSerializers, type DestinationStream, type LevelWithSilent, type Logger } from 'pino'
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

/**
 * An error as the log keeps it. The database layer's errors carry their statement and the values bound to it, password
 * hashes and session keys among them: of what an error adds to a plain one only its code is written.
 */
function describeError(error: Error) {
  const { type, message, stack } = stdSerializers.err(error)
  const { code } = ((error as { original?: object }).original ?? error) as { code?: unknown }
  return { type, message, stack, ...(code !== undefined && { code }) }
}

/** The structured log: one JSON object a line, on standard output unless `destination` says otherwise. */
export function createLog({ logLevel }: Pick<Config, 'logLevel'>, destination?: DestinationStream): Logger {
  const redact = secrets.flatMap((name) => [name, `*.${name}`, `*.*.${name}`])
  return pino(
    { level: logLevel, redact, serializers: { err: describeError } },
    destination ?? pino.destination(1),
  )
}

/** 503 is the server saying that it has enough to do: worth a look, but no failure. */
function levelOf(status: number, error?: Error): LevelWithSilent {
  if (status === 503) return 'warn'
  if (error || status >= 500) return 'error'
  return status >= 400 ? 'info' : 'debug'
}

/** One line per request: method, path, status, time and who asked. Queries, headers and bodies stay out of the log. */
export function requestLog(log: Logger) {
  return pinoHttp({
    logger: log,
    genReqId: (_request, response) => {
      const id = randomUUID()
      response.setHeader('X-Request-Id', id)
      return id
    },
    quietReqLogger: true,
    customLogLevel: (_request, response, error) => levelOf(response.statusCode, error),
    customProps: (request) => ({ personId: (request as Partial<Express.Request>).signedIn?.person.id }),
    serializers: {
      req: ({ id, method, url }: { id: string; method: string; url: string }) => ({
        id,
        method,
        path: url.split('?', 1)[0],
      }),
      res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
    },
  })
}
