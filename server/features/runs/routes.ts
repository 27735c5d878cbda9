import { Router, type Request, type Response } from 'express'
import type { AppContext } from '#server/context.ts'
import { sendCsv, sendRecord } from '#server/features/runs/send.ts'
import { runsUseCases } from '#server/features/runs/use-cases.ts'
import { authorise, signedIn } from '#server/http/authenticate.ts'
import { readBody, readId, readQuery } from '#server/http/input.ts'
import { createRunSchema, listRunsSchema } from '#shared/schemas/run.ts'

/** `/api/runs`: saved runs with their evidence. */
export function runsRouter(context: AppContext): Router {
  const runs = runsUseCases(context)
  const router = Router()

  router.get('/', authorise('runs.read'), async (request, response) => {
    response.json(await runs.list(readQuery(request, listRunsSchema)))
  })

  router.post('/', authorise('runs.create'), async (request, response) => {
    const body = readBody(request, createRunSchema)
    const { person } = signedIn(request)
    await whileConnected(response, async (signal) => {
      response.status(201).json(await runs.create(person, body, signal))
    })
  })

  router.get('/:id', authorise('runs.read'), async (request, response) => {
    response.json(await runs.get(idOf(request)))
  })

  router.get('/:id/record', authorise('runs.read'), async (request, response) => {
    await sendRecord(request, response, await runs.record(idOf(request)))
  })

  router.get('/:id/export.csv', authorise('runs.read'), async (request, response) => {
    await sendCsv(response, await runs.record(idOf(request)))
  })

  router.delete('/:id', authorise('runs.delete'), async (request, response) => {
    await runs.remove(signedIn(request).person, idOf(request))
    response.status(204).end()
  })

  return router
}

const idOf = (request: Request) => readId(request, 'This run')

/** Runs `work` with a signal that aborts when the client goes away; nobody is left to be told then. */
async function whileConnected(
  response: Response,
  work: (signal: AbortSignal) => Promise<void>,
): Promise<void> {
  const gone = new AbortController()
  response.once('close', () => gone.abort())
  try {
    await work(gone.signal)
  } catch (error) {
    if (!gone.signal.aborted) throw error
  }
}
