import { zodResolver } from '@hookform/resolvers/zod'
import { useMutation } from '@tanstack/react-query'
import { useForm } from 'react-hook-form'
import { Button } from '#client/components/ui/button.tsx'
import { Field } from '#client/components/ui/field.tsx'
import { Notice } from '#client/components/ui/notice.tsx'
import { TextInput } from '#client/components/ui/text-input.tsx'
import { api } from '#client/lib/api.ts'
import { showProblem } from '#client/lib/form-problem.ts'
import { limits } from '#shared/limits.ts'
import { changePasswordSchema, type ChangePassword } from '#shared/schemas/account.ts'

/** Asks for the current password and a new one; says when it is changed. */
export function PasswordForm() {
  const form = useForm({
    resolver: zodResolver(changePasswordSchema),
    defaultValues: { currentPassword: '', newPassword: '' },
  })
  const { errors } = form.formState
  const change = useMutation({
    mutationFn: (body: ChangePassword) => api.put<void>('/account/password', body),
  })

  const submit = form.handleSubmit(async (body) => {
    try {
      await change.mutateAsync(body)
      form.reset()
    } catch (error) {
      showProblem(form, error, ['currentPassword', 'newPassword'])
    }
  })

  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="flex flex-col gap-4">
      {errors.root?.message && <Notice tone="bad">{errors.root.message}</Notice>}
      {change.isSuccess && (
        <Notice tone="ok">The password is changed. Your sessions elsewhere have been signed out.</Notice>
      )}
      <Field label="Current password" error={errors.currentPassword?.message} required>
        <TextInput type="password" autoComplete="current-password" {...form.register('currentPassword')} />
      </Field>
      <Field
        label="New password"
        error={errors.newPassword?.message}
        hint={`At least ${limits.passwordLength[0]} characters.`}
        required
      >
        <TextInput type="password" autoComplete="new-password" {...form.register('newPassword')} />
      </Field>
      <Button type="submit" variant="main" busy={change.isPending} className="self-start">
        Change password
      </Button>
    </form>
  )
}
