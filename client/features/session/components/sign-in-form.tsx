/** E-mail and password; used by the sign-in page and by the dialog over a page whose session ended. */
import { zodResolver } from '@hookform/resolvers/zod'
import { useEffect, useState } from 'react'
import { useForm } from 'react-hook-form'
import { Button } from '#client/components/ui/button.tsx'
import { Field } from '#client/components/ui/field.tsx'
import { Notice } from '#client/components/ui/notice.tsx'
import { TextInput } from '#client/components/ui/text-input.tsx'
import { useSignIn } from '#client/features/session/hooks/use-sign-in.ts'
import { ApiError } from '#client/lib/api.ts'
import { showProblem } from '#client/lib/form-problem.ts'
import { signInSchema, type Session } from '#shared/schemas/account.ts'

export interface SignInFormProps {
  /** Filled in already, as when the session of a known person ended. */
  email?: string
  onSignedIn: (session: Session) => void
}

/** Seconds left of a wait that the server asked for. */
function useWait() {
  const [left, setLeft] = useState(0)
  useEffect(() => {
    if (left <= 0) return
    const timer = setTimeout(() => setLeft(left - 1), 1000)
    return () => clearTimeout(timer)
  }, [left])
  return [left, setLeft] as const
}

function inWords(seconds: number): string {
  if (seconds < 90) return `${seconds} s`
  return `${Math.ceil(seconds / 60)} minutes`
}

export function SignInForm({ email = '', onSignedIn }: SignInFormProps) {
  const form = useForm({ resolver: zodResolver(signInSchema), defaultValues: { email, password: '' } })
  const { errors } = form.formState
  const signIn = useSignIn()
  const [wait, setWait] = useWait()

  const submit = form.handleSubmit(async (body) => {
    try {
      onSignedIn(await signIn.mutateAsync(body))
    } catch (error) {
      if (error instanceof ApiError && error.problem.status === 429) return setWait(error.retryAfter ?? 60)
      showProblem(form, error, ['email', 'password'])
      if (error instanceof ApiError && error.problem.code === 'wrong-credentials')
        form.setFocus('password', { shouldSelect: true })
    }
  })

  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="flex flex-col gap-4">
      {wait > 0 && (
        <Notice tone="warn" title="Too many attempts">
          Wait {inWords(wait)} before the next try.
        </Notice>
      )}
      {wait === 0 && errors.root?.message && <Notice tone="bad">{errors.root.message}</Notice>}
      <Field label="E-mail" error={errors.email?.message} required>
        <TextInput type="email" autoComplete="username" autoFocus={!email} {...form.register('email')} />
      </Field>
      <Field label="Password" error={errors.password?.message} required>
        <TextInput
          type="password"
          autoComplete="current-password"
          autoFocus={Boolean(email)}
          {...form.register('password')}
        />
      </Field>
      <Button type="submit" variant="main" busy={signIn.isPending} disabled={wait > 0} className="min-h-10">
        Sign in
      </Button>
    </form>
  )
}
