/** Gives pages the engine. One for the whole application: its workers start with the first question. */
import type { ReactNode } from 'react'
import { EngineContext } from '#client/lib/engine-context.ts'
import { createEngineClient } from '#client/workers/engine-client.ts'

const engine = createEngineClient()

export function EngineProvider({ children }: { children: ReactNode }) {
  return <EngineContext value={engine}>{children}</EngineContext>
}
