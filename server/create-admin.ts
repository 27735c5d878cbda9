/**
 * Makes an administrator: a real installation begins without anybody. The password comes from standard input or from
 * ADMIN_PASSWORD, never from the command line, where other users of the machine could read it.
 *
 *     node dist/server/create-admin.js "Ada Example" ada@company.example < password-file
 */
import { text } from 'node:stream/consumers'
import { UniqueConstraintError } from 'sequelize'
import { z } from 'zod'
import { readConfig, type Config } from '#server/config.ts'
import { openDatabase } from '#server/db/database.ts'
import { hashPassword } from '#server/identity/passwords.ts'
import { endWith, StartError } from '#server/start-error.ts'
import { limits } from '#shared/limits.ts'
import { passwordSchema, signInSchema } from '#shared/schemas/account.ts'
import { line } from '#shared/schemas/text.ts'

const adminSchema = z.object({
  name: line('Name', limits.nameLength),
  email: signInSchema.shape.email,
  password: passwordSchema,
})

async function createAdmin(config: Config, input: unknown): Promise<string> {
  const parsed = adminSchema.safeParse(input)
  if (!parsed.success) throw new StartError(parsed.error.issues.map((issue) => issue.message).join(' '))
  const { name, email, password } = parsed.data
  const database = await openDatabase(config.databaseFile)
  try {
    const passwordHash = await hashPassword(password, config.bcryptCost)
    const now = new Date()
    await database.write((transaction) =>
      database.models.Person.create(
        { name, email, role: 'admin', passwordHash, createdAt: now, updatedAt: now },
        { transaction },
      ),
    )
    return email
  } catch (error) {
    if (error instanceof UniqueConstraintError)
      throw new StartError(`There is already an account of ${email}.`)
    throw error
  } finally {
    await database.close()
  }
}

async function main(): Promise<void> {
  process.umask(0o077)
  const [name, email, ...rest] = process.argv.slice(2)
  if (name === undefined || email === undefined || rest.length > 0)
    throw new StartError('Usage: create-admin "<name>" <e-mail>, with the password on standard input.')
  const password = process.env.ADMIN_PASSWORD ?? (await text(process.stdin)).replace(/\r?\n$/, '')
  const created = await createAdmin(readConfig(process.env), { name, email, password })
  process.stdout.write(`${created} can now sign in as administrator.\n`)
}

main().catch(endWith)
