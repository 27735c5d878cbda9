import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { createApp } from '#server/app.ts'
import type { AppContext } from '#server/context.ts'
import { StartError } from '#server/start-error.ts'

/** Longest time for a request's headers and body to arrive, milliseconds. */
const requestTimeout = 60_000
/** How often connections that have become idle are closed while stopping, milliseconds. */
const idleSweep = 50

export interface RunningServer {
  /** Address to open, e.g. `http://127.0.0.1:4173`. */
  url: string
  /** Takes no more requests, lets those under way finish, then closes computing threads and database. */
  stop(): Promise<void>
}

/**
 * Listens at the configured address; 0 as the port takes a free one.
 * @throws StartError when the address is taken or not this machine's
 */
export async function runServer(context: AppContext): Promise<RunningServer> {
  const { config, compute, database } = context
  const server = createServer({ requestTimeout, headersTimeout: requestTimeout }, createApp(context))
  await new Promise<void>((resolve, reject) => {
    server.once('error', (error: NodeJS.ErrnoException) => reject(asStartError(error, config)))
    server.listen(config.port, config.host, resolve)
  })
  const { port } = server.address() as AddressInfo

  async function stop(): Promise<void> {
    // Connections that finish their request now would otherwise be kept alive.
    const sweep = setInterval(() => server.closeIdleConnections(), idleSweep)
    await new Promise<void>((resolve) => server.close(() => resolve()))
    clearInterval(sweep)
    await compute.close()
    await database.close()
  }

  let stopped: Promise<void> | null = null
  return {
    url: `http://${config.host.includes(':') ? `[${config.host}]` : config.host}:${port}`,
    stop: () => (stopped ??= stop()),
  }
}

function asStartError(error: NodeJS.ErrnoException, { host, port }: AppContext['config']): Error {
  if (error.code === 'EADDRINUSE')
    return new StartError(`Port ${port} on ${host} is taken: stop what uses it, or set PORT to another one.`)
  if (error.code === 'EACCES')
    return new StartError(`Port ${port} may not be opened by this user: set PORT to one above 1023.`)
  if (error.code === 'EADDRNOTAVAIL' || error.code === 'ENOTFOUND')
    return new StartError(`HOST ${host} is not an address of this machine.`)
  return error
}
