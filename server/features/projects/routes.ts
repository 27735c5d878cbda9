import { Router } from 'express'
import type { AppContext } from '#server/context.ts'
import { projectsUseCases } from '#server/features/projects/use-cases.ts'
import { authorise } from '#server/http/authenticate.ts'
import { readBody, readId } from '#server/http/input.ts'
import { createProjectSchema, renameProjectSchema } from '#shared/schemas/design.ts'

/** `/api/projects`: the named holders of designs. */
export function projectsRouter(context: AppContext): Router {
  const projects = projectsUseCases(context)
  const router = Router()
  router.get('/', authorise('projects.read'), async (_request, response) => {
    response.json({ items: await projects.list() })
  })
  router.post('/', authorise('projects.edit'), async (request, response) => {
    const project = await projects.create(readBody(request, createProjectSchema))
    response.status(201).json(project)
  })
  router.patch('/:id', authorise('projects.edit'), async (request, response) => {
    const id = readId(request, 'This project')
    response.json(await projects.rename(id, readBody(request, renameProjectSchema)))
  })
  return router
}
