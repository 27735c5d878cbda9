import type { Express } from 'express'

/** The parts of the router package's layers (its version 2) that are needed here. */
interface Layer {
  rawPath: string
  route?: { path: string; stack: { method?: string }[] }
  handle: { stack?: Layer[] }
}

/** Every route of an application as `GET /api/designs/:id`, so that a test can tell whether it covers them all. */
export function allRoutes(app: Express): string[] {
  const { stack } = (app as unknown as { router: { stack: Layer[] } }).router
  return [...new Set(walk(stack, ''))]
}

function walk(layers: Layer[], prefix: string): string[] {
  return layers.flatMap(({ rawPath, route, handle }) => {
    const path = `${prefix}${rawPath === '/' ? '' : rawPath}`
    const methods = route?.stack.flatMap(({ method }) => method ?? []) ?? []
    return [...methods.map((method) => `${method.toUpperCase()} ${path}`), ...walk(handle.stack ?? [], path)]
  })
}
