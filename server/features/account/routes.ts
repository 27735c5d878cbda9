import { Router } from 'express'
import type { AppContext } from '#server/context.ts'
import { accountUseCases } from '#server/features/account/use-cases.ts'
import { authorise, signedIn } from '#server/http/authenticate.ts'
import { readBody } from '#server/http/input.ts'
import { changePasswordSchema } from '#shared/schemas/account.ts'

/** A person's own account. */
export function accountRouter(context: AppContext): Router {
  const { changePassword } = accountUseCases(context)
  const router = Router()
  router.put('/password', authorise('account.changePassword'), async (request, response) => {
    await changePassword(signedIn(request), readBody(request, changePasswordSchema), request.ip)
    response.status(204).end()
  })
  return router
}
