/** Saves the result on the sheet as a run: asks for title and note, lets the server compute, links to the run. */
import { zodResolver } from '@hookform/resolvers/zod'
import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useId, useRef, useState } from 'react'
import { useForm } from 'react-hook-form'
import type { z } from 'zod'
import { Button } from '#client/components/ui/button.tsx'
import { Dialog } from '#client/components/ui/dialog.tsx'
import { Field } from '#client/components/ui/field.tsx'
import { LinkButton } from '#client/components/ui/link-button.tsx'
import { Notice } from '#client/components/ui/notice.tsx'
import { TextArea } from '#client/components/ui/text-area.tsx'
import { TextInput } from '#client/components/ui/text-input.tsx'
import { saveFailure } from '#client/features/runs/lib/save-failure.ts'
import { runMutations } from '#client/features/runs/queries.ts'
import { ApiError } from '#client/lib/api.ts'
import { showProblem } from '#client/lib/form-problem.ts'
import { useIncludesRole } from '#client/lib/session.ts'
import { createRunSchema } from '#shared/schemas/run.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'

const formSchema = createRunSchema.pick({ title: true, note: true })
type FormInput = z.input<typeof formSchema>
type FormOutput = z.output<typeof formSchema>

const fields = ['title', 'note'] as const
const empty: FormInput = { title: '', note: '' }

/** Whether the refusal belongs to a field of this form, and is shown there. */
const atField = (error: unknown) =>
  error instanceof ApiError &&
  (error.problem.errors ?? []).some(
    ({ path }) => path.length === 1 && fields.some((name) => name === path[0]),
  )

export interface SaveRunDialogProps {
  design: { id: number; name: string }
  /** What is saved: the inputs as they stand when “Save run” is pressed in the dialog. */
  inputs: RunInputs
  disabled?: boolean
}

/** Only for those who may save runs. */
export function SaveRunDialog(props: SaveRunDialogProps) {
  return useIncludesRole('engineer') ? <SaveRun {...props} /> : null
}

function SaveRun({ design, inputs, disabled }: SaveRunDialogProps) {
  const [open, setOpen] = useState(false)
  const formId = useId()
  const queryClient = useQueryClient()
  const save = useMutation(runMutations.save(queryClient))
  const form = useForm<FormInput, unknown, FormOutput>({
    resolver: zodResolver(formSchema),
    defaultValues: empty,
  })
  // Set at once, before React has drawn the busy button: a double click saves one run.
  const underWay = useRef<AbortController | null>(null)
  const { errors } = form.formState
  const failure = save.error && !atField(save.error) && saveFailure(save.error)

  async function submit(values: FormOutput) {
    if (underWay.current) return
    const controller = new AbortController()
    underWay.current = controller
    try {
      await save.mutateAsync({ body: { designId: design.id, ...values, inputs }, signal: controller.signal })
      form.reset(empty)
    } catch (error) {
      if (atField(error)) showProblem(form, error, fields)
    } finally {
      underWay.current = null
    }
  }

  function show(next: boolean) {
    if (!next) underWay.current?.abort()
    if (next && save.isSuccess) save.reset()
    setOpen(next)
  }

  return (
    <>
      <Button variant="main" disabled={disabled} onClick={() => show(true)}>
        Save run
      </Button>
      <Dialog
        title={save.isSuccess ? 'Run saved' : 'Save run'}
        description={
          save.isSuccess
            ? undefined
            : 'The server computes the record and every figure again from the inputs and keeps those: what this page shows is not taken over.'
        }
        open={open}
        onOpenChange={show}
        stay={save.isPending}
        footer={
          save.isSuccess ? (
            <>
              <Button onClick={() => show(false)}>Stay here</Button>
              <LinkButton variant="main" to={`/runs/${save.data.id}`}>
                Open the run
              </LinkButton>
            </>
          ) : (
            <>
              <Button onClick={() => show(false)}>Cancel</Button>
              <Button variant="main" type="submit" form={formId} busy={save.isPending}>
                {save.isPending ? 'Computing and saving' : 'Save run'}
              </Button>
            </>
          )
        }
      >
        {save.isSuccess ? (
          <Notice tone="ok" title={save.data.title}>
            Saved with its inputs, figures and record for {design.name}.
          </Notice>
        ) : (
          <form
            id={formId}
            noValidate
            className="flex flex-col gap-4"
            onSubmit={(event) => void form.handleSubmit(submit)(event)}
          >
            <Field label="Title" required error={errors.title?.message}>
              <TextInput autoFocus autoComplete="off" readOnly={save.isPending} {...form.register('title')} />
            </Field>
            <Field
              label="Note"
              hint="What was changed, and why this result is worth keeping."
              error={errors.note?.message}
            >
              <TextArea readOnly={save.isPending} {...form.register('note')} />
            </Field>
            {save.isPending && (
              <div>
                <progress aria-label="Saving the run" className="h-1 w-full accent-petrol" />
                <p className="text-sm text-soft">The server computes the record, then stores it.</p>
              </div>
            )}
            {failure && (
              <Notice tone="bad" title="The run was not saved">
                <p>{failure.sentence}</p>
                {failure.details.length > 0 && (
                  <ul className="list-disc pl-5">
                    {failure.details.map((detail) => (
                      <li key={detail}>{detail}</li>
                    ))}
                  </ul>
                )}
              </Notice>
            )}
          </form>
        )}
      </Dialog>
    </>
  )
}
