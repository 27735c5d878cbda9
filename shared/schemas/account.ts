import { z } from 'zod'
import { limits } from '#shared/limits.ts'
import { roles } from '#shared/roles.ts'

const email = z
  .string({ error: 'E-mail is missing.' })
  .trim()
  .toLowerCase()
  .min(1, { error: 'E-mail is missing.' })
  .max(limits.emailLength, { error: `E-mail may have at most ${limits.emailLength} characters.` })
  .pipe(z.email({ error: 'This is not an e-mail address, such as name@company.example.' }))

/** bcrypt reads 72 bytes and no more: longer passwords are refused rather than cut. */
export const passwordSchema = z
  .string({ error: 'Password is missing.' })
  .min(limits.passwordLength[0], {
    error: `A password needs at least ${limits.passwordLength[0]} characters.`,
  })
  .refine((text) => new TextEncoder().encode(text).length <= limits.passwordLength[1], {
    error: `A password may take at most ${limits.passwordLength[1]} bytes.`,
  })

export const signInSchema = z.strictObject({
  email,
  password: z.string({ error: 'Password is missing.' }).min(1, { error: 'Password is missing.' }).max(1000),
})

export const changePasswordSchema = z
  .strictObject({
    currentPassword: z.string().min(1, { error: 'Current password is missing.' }).max(1000),
    newPassword: passwordSchema,
  })
  .refine((body) => body.currentPassword !== body.newPassword, {
    path: ['newPassword'],
    error: 'The new password must differ from the current one.',
  })

export const personSchema = z.object({
  id: z.number().int(),
  name: z.string(),
  email: z.string(),
  role: z.enum(roles),
})

/** Answer of `GET` and `POST /api/session`. */
export const sessionSchema = z.object({
  person: personSchema,
  /** Sent back as `X-CSRF-Token` with every request that changes something. */
  csrfToken: z.string(),
  /** `demo` when the data is invented and the demo accounts exist. */
  mode: z.enum(['demo', 'production']),
})

export type SignIn = z.infer<typeof signInSchema>
export type ChangePassword = z.infer<typeof changePasswordSchema>
export type Person = z.infer<typeof personSchema>
export type Session = z.infer<typeof sessionSchema>
