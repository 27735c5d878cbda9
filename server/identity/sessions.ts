import { Op, type Transaction } from 'sequelize'
import type { AppContext } from '#server/context.ts'
import type { Person } from '#server/db/models/person.ts'
import { isLoopbackAddress } from '#server/loopback.ts'
import { sessionLife } from '#server/identity/session-life.ts'
import { createTokens, hashSessionId, newSessionId } from '#server/identity/tokens.ts'

/** A person behind a request. */
export interface SignedIn {
  person: Person
  /** Names the session row; see `tokens.ts`. */
  sessionHash: string
  csrfToken: string
}

export interface StartedSession {
  token: string
  csrfToken: string
}

/** Whether this account may be used here: demo accounts only in the demo and from this machine. */
export function mayUse(
  person: Person,
  mode: AppContext['config']['mode'],
  address: string | undefined,
): boolean {
  if (!person.active) return false
  return !person.demo || (mode === 'demo' && address !== undefined && isLoopbackAddress(address))
}

/** Begins, resumes and ends sign-ins. */
export function createSessions({ config, database, clock }: AppContext) {
  const { Session } = database.models
  const tokens = createTokens(config.sessionSecret)

  return {
    /** Begins a session for a person whose password was checked. */
    async start(personId: number, userAgent: string, transaction: Transaction): Promise<StartedSession> {
      const now = clock()
      const sessionId = newSessionId()
      // Rows that no cookie can name any more are swept out on the way.
      await Session.destroy({ where: { expiresAt: { [Op.lt]: now } }, transaction })
      await Session.create(
        {
          idHash: hashSessionId(sessionId),
          personId,
          userAgent: userAgent.slice(0, 300),
          createdAt: now,
          lastSeenAt: now,
          expiresAt: new Date(now.getTime() + sessionLife.absolute),
        },
        { transaction },
      )
      return { token: tokens.sign(sessionId, personId, now), csrfToken: tokens.csrf(sessionId) }
    },

    /** The person behind a cookie's token, and a fresh token when that one has run out; null when it opens nothing. */
    async resume(
      token: string,
      address: string | undefined,
    ): Promise<{ signedIn: SignedIn; renewedToken: string | null } | null> {
      const claims = tokens.read(token)
      if (!claims) return null
      const now = clock()
      const sessionHash = hashSessionId(claims.sessionId)
      const row = await Session.findByPk(sessionHash, { include: 'person' })
      const person = row?.person
      if (!row || !person || person.id !== claims.personId) return null
      const idle = now.getTime() - row.lastSeenAt.getTime()
      if (row.revokedAt || now >= row.expiresAt || idle >= sessionLife.idle) return null
      if (!mayUse(person, config.mode, address)) return null
      if (idle >= sessionLife.seenStep)
        await database.write((transaction) => row.update({ lastSeenAt: now }, { transaction }))
      return {
        signedIn: { person, sessionHash, csrfToken: tokens.csrf(claims.sessionId) },
        renewedToken:
          now.getTime() >= claims.expiresAt ? tokens.sign(claims.sessionId, person.id, now) : null,
      }
    },

    /** Revokes one session. */
    async end(sessionHash: string, transaction: Transaction): Promise<void> {
      await Session.update({ revokedAt: clock() }, { where: { idHash: sessionHash }, transaction })
    },

    /** Revokes every session of a person but one. */
    async endOthers(personId: number, kept: string, transaction: Transaction): Promise<void> {
      const where = { personId, revokedAt: null, idHash: { [Op.ne]: kept } }
      await Session.update({ revokedAt: clock() }, { where, transaction })
    },

    /** Revokes every session of a person. */
    async endAll(personId: number, transaction: Transaction): Promise<void> {
      await Session.update({ revokedAt: clock() }, { where: { personId, revokedAt: null }, transaction })
    },
  }
}
