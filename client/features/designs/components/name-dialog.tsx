/** A dialog that asks for one name: for renaming a design or a project, and for duplicating. */
import { zodResolver } from '@hookform/resolvers/zod'
import { useEffect, useId } from 'react'
import { useForm } from 'react-hook-form'
import { Button } from '#client/components/ui/button.tsx'
import { Dialog } from '#client/components/ui/dialog.tsx'
import { Field } from '#client/components/ui/field.tsx'
import { Notice } from '#client/components/ui/notice.tsx'
import { TextInput } from '#client/components/ui/text-input.tsx'
import { showProblem } from '#client/lib/form-problem.ts'
import { createProjectSchema } from '#shared/schemas/design.ts'

export interface NameDialogProps {
  title: string
  description?: string
  /** Where the name starts from. */
  initial: string
  /** The verb on the main button. */
  confirm: string
  open: boolean
  onOpenChange: (open: boolean) => void
  /** Rejects with the server's problem, which is then shown here. */
  onName: (name: string) => Promise<void>
}

export function NameDialog({
  title,
  description,
  initial,
  confirm,
  open,
  onOpenChange,
  onName,
}: NameDialogProps) {
  const id = useId()
  // A design is named under the same rule as a project.
  const form = useForm({ resolver: zodResolver(createProjectSchema), defaultValues: { name: initial } })
  const { errors, isSubmitting } = form.formState
  useEffect(() => {
    if (open) form.reset({ name: initial })
  }, [open, initial, form])

  const submit = form.handleSubmit(async ({ name }) => {
    try {
      await onName(name)
    } catch (error) {
      showProblem(form, error, ['name'])
    }
  })

  return (
    <Dialog
      title={title}
      description={description}
      open={open}
      onOpenChange={onOpenChange}
      footer={
        <>
          <Button onClick={() => onOpenChange(false)}>Cancel</Button>
          <Button type="submit" form={id} variant="main" busy={isSubmitting}>
            {confirm}
          </Button>
        </>
      }
    >
      <form id={id} noValidate onSubmit={(event) => void submit(event)} className="flex flex-col gap-3">
        {errors.root?.message && <Notice tone="bad">{errors.root.message}</Notice>}
        <Field label="Name" error={errors.name?.message} required>
          <TextInput
            autoComplete="off"
            onFocus={(event) => event.target.select()}
            {...form.register('name')}
          />
        </Field>
      </form>
    </Dialog>
  )
}
