/** Mounts a design sheet with the real small-signal engine and records that are invented. */
import { QueryClientProvider, useQuery } from '@tanstack/react-query'
import { render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { MemoryRouter } from 'react-router-dom'
import { vi } from 'vitest'
import { DesignSheet } from '#client/features/sheet/design-sheet.tsx'
import { useSheet } from '#client/features/sheet/hooks/use-sheet.ts'
import { sheetQueries } from '#client/features/sheet/queries.ts'
import { EngineContext, type EngineClient, type RecordResult } from '#client/lib/engine-context.ts'
import { createQueryClient } from '#client/lib/query-client.ts'
import { sessionQueries } from '#client/lib/session.ts'
import { figureKeys, type Figures } from '#shared/figures.ts'
import type { Role } from '#shared/roles.ts'
import type { Design } from '#shared/schemas/design.ts'
import { engineVersion, smallSignal } from '#sim/index.ts'
import { aFullDesign, aSession } from '#tests/support/client-data.ts'
import { answer, fakeApi } from '#tests/support/fake-api.ts'

const noFigures = Object.fromEntries(figureKeys.map((key) => [key, null])) as Figures

/** A record without samples and with the figures given. */
export function inventedRecord(figures: Partial<Figures>): RecordResult {
  const empty = new Float64Array(0)
  return {
    engineVersion,
    grid: { duration: 0.08, sampleInterval: 5e-6, samples: 16_001 },
    simulation: {
      status: 'complete',
      sampleInterval: 5e-6,
      vo: empty,
      v1: empty,
      v2: empty,
      modes: [],
      envelope: { time: empty, value: empty },
      figures: { ...noFigures, ...figures },
      tone: null,
      unsettled: null,
      cost: { method: 'odex', steps: 0, evaluations: 0, events: 0 },
    },
  }
}

export const settled: Partial<Figures> = {
  timeTo90: 0.0426,
  frequency: 989.1,
  level: 7.5,
  thd: 0.0486,
  heldHigh: 0.135,
  heldLow: 0.134,
}

export function fakeEngine(run: EngineClient['run'] = () => Promise.resolve(inventedRecord(settled))) {
  return { smallSignal: vi.fn((circuit) => Promise.resolve(smallSignal(circuit))), run: vi.fn(run) }
}

function OpenSheet({ design }: { design: Design }) {
  const state = useSheet(design)
  const pages = [{ to: '/start-up', name: 'Start-up', question: 'Does it start?' }]
  return (
    <DesignSheet state={state} pages={pages} actions={null}>
      <output aria-label="Saved content">{JSON.stringify(state.sheet.content.circuit)}</output>
    </DesignSheet>
  )
}

function LoadedSheet({ id }: { id: number }) {
  const { data } = useQuery(sheetQueries.detail(id))
  return data ? <OpenSheet design={data} /> : null
}

export interface SheetSetting {
  role?: Role
  design?: Design
  engine?: EngineClient
}

export async function renderSheet({
  role = 'engineer',
  design = aFullDesign(),
  engine = fakeEngine(),
}: SheetSetting = {}) {
  // The slider measures its thumb, which jsdom cannot.
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe() {}
      unobserve() {}
      disconnect() {}
    },
  )
  const api = fakeApi({
    [`GET /api/designs/${design.id}`]: answer(design),
    [`PUT /api/designs/${design.id}/draft`]: ({ body }) => {
      const { version, content } = body as { version: number; content: unknown }
      return answer({
        version: version + 1,
        content,
        savedBy: { id: 1, name: 'Edda Holm' },
        savedAt: new Date().toISOString(),
      })
    },
  })
  const client = createQueryClient()
  client.setQueryData(sessionQueries.current().queryKey, aSession(role))
  const view = render(
    <QueryClientProvider client={client}>
      <MemoryRouter>
        <EngineContext value={engine}>
          <LoadedSheet id={design.id} />
        </EngineContext>
      </MemoryRouter>
    </QueryClientProvider>,
  )
  await screen.findByRole('group', { name: 'Circuit' })
  const saved = () => api.asked(`PUT /api/designs/${design.id}/draft`)
  return { ...view, api, client, saved, design, user: userEvent.setup() }
}
