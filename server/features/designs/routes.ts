import { Router } from 'express'
import type { AppContext } from '#server/context.ts'
import { designsUseCases } from '#server/features/designs/use-cases.ts'
import { authorise, signedIn } from '#server/http/authenticate.ts'
import { readBody, readId, readQuery } from '#server/http/input.ts'
import {
  changeDesignSchema,
  createDesignSchema,
  duplicateDesignSchema,
  listDesignsSchema,
  saveDraftSchema,
} from '#shared/schemas/design.ts'

const what = 'This design'

/** `/api/designs`: designs and the one draft of each. */
export function designsRouter(context: AppContext): Router {
  const designs = designsUseCases(context)
  const router = Router()
  router.get('/', authorise('designs.read'), async (request, response) => {
    response.json(await designs.list(readQuery(request, listDesignsSchema)))
  })
  router.post('/', authorise('designs.edit'), async (request, response) => {
    const body = readBody(request, createDesignSchema)
    response.status(201).json(await designs.create(body, signedIn(request).person))
  })
  router.get('/:id', authorise('designs.read'), async (request, response) => {
    response.json(await designs.read(readId(request, what)))
  })
  router.patch('/:id', authorise('designs.edit'), async (request, response) => {
    const id = readId(request, what)
    response.json(await designs.change(id, readBody(request, changeDesignSchema)))
  })
  router.post('/:id/duplicate', authorise('designs.edit'), async (request, response) => {
    const id = readId(request, what)
    const { name } = readBody(request, duplicateDesignSchema)
    response.status(201).json(await designs.duplicate(id, name, signedIn(request).person))
  })
  router.put('/:id/draft', authorise('designs.edit'), async (request, response) => {
    const id = readId(request, what)
    const body = readBody(request, saveDraftSchema)
    response.json(await designs.saveDraft(id, body, signedIn(request).person))
  })
  return router
}
