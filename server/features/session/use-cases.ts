import type { AppContext } from '#server/context.ts'
import type { Person } from '#server/db/models/person.ts'
import { tooManyAttempts, wrongCredentials } from '#server/http/errors.ts'
import { createPasswordCheck } from '#server/identity/passwords.ts'
import { createSessions, mayUse, type SignedIn, type StartedSession } from '#server/identity/sessions.ts'
import { createSignInDelay } from '#server/identity/sign-in-delay.ts'
import type { SignIn } from '#shared/schemas/account.ts'

/** Where a sign-in comes from. */
interface Origin {
  address: string | undefined
  userAgent: string
}

/** Signing in and out. Holds the count of failed sign-ins: one set for the whole application. */
export function sessionUseCases(context: AppContext) {
  const { config, database, clock } = context
  const sessions = createSessions(context)
  const delay = createSignInDelay(clock)
  const passwordIsRight = createPasswordCheck(config.bcryptCost)

  return {
    /** Begins a session; the same refusal, after the same work, for a wrong password and for an unknown account. */
    async signIn(
      { email, password }: SignIn,
      { address, userAgent }: Origin,
    ): Promise<StartedSession & { person: Person }> {
      const wait = delay.attempt(email, address)
      if (wait > 0) throw tooManyAttempts(wait)
      const person = await database.models.Person.findOne({ where: { email } })
      const checked = person?.passwordHash ?? null
      const right = await passwordIsRight(password, checked)
      if (!right || !person || !mayUse(person, config.mode, address)) throw wrongCredentials()
      delay.succeed(email, address)
      const started = await database.write(async (transaction) => {
        // Hashing took a while: a password changed or an account closed in the meantime must not open a session.
        await person.reload({ transaction })
        if (person.passwordHash !== checked || !mayUse(person, config.mode, address)) throw wrongCredentials()
        return sessions.start(person.id, userAgent, transaction)
      })
      return { person, ...started }
    },

    signOut: ({ sessionHash }: SignedIn) =>
      database.write((transaction) => sessions.end(sessionHash, transaction)),

    signOutEverywhere: ({ person }: SignedIn) =>
      database.write((transaction) => sessions.endAll(person.id, transaction)),
  }
}
