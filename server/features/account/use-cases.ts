import type { AppContext } from '#server/context.ts'
import { invalid, tooManyAttempts } from '#server/http/errors.ts'
import { createPasswordCheck, hashPassword } from '#server/identity/passwords.ts'
import { createSessions, type SignedIn } from '#server/identity/sessions.ts'
import { createSignInDelay } from '#server/identity/sign-in-delay.ts'
import type { ChangePassword } from '#shared/schemas/account.ts'

const wrongCurrent = () =>
  invalid([{ path: ['currentPassword'], message: 'This is not your current password.' }])

export function accountUseCases(context: AppContext) {
  const { config, database, clock } = context
  const sessions = createSessions(context)
  const delay = createSignInDelay(clock)
  const passwordIsRight = createPasswordCheck(config.bcryptCost)

  return {
    /** Sets a new password and ends every other session of the person; the one that asks goes on. */
    async changePassword(
      { person, sessionHash }: SignedIn,
      { currentPassword, newPassword }: ChangePassword,
      address: string | undefined,
    ): Promise<void> {
      const wait = delay.attempt(person.email, address)
      if (wait > 0) throw tooManyAttempts(wait)
      if (!(await passwordIsRight(currentPassword, person.passwordHash))) throw wrongCurrent()
      delay.succeed(person.email, address)
      const passwordHash = await hashPassword(newPassword, config.bcryptCost)
      await database.write(async (transaction) => {
        // Hashing took a while: of two changes at once the second no longer knows the current password.
        const checked = person.passwordHash
        await person.reload({ transaction })
        if (person.passwordHash !== checked) throw wrongCurrent()
        await person.update({ passwordHash, updatedAt: clock() }, { transaction })
        await sessions.endOthers(person.id, sessionHash, transaction)
      })
    },
  }
}
