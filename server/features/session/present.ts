import type { Config } from '#server/config.ts'
import type { Person as PersonModel } from '#server/db/models/person.ts'
import type { Session } from '#shared/schemas/account.ts'

/** The session as its owner sees it. */
export function presentSession(person: PersonModel, csrfToken: string, mode: Config['mode']): Session {
  const { id, name, email, role } = person
  return { person: { id, name, email, role }, csrfToken, mode }
}
