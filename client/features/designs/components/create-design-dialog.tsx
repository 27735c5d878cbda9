/** A new design in a project that exists or that is created with it; opens it on success. */
import { zodResolver } from '@hookform/resolvers/zod'
import { useQuery } from '@tanstack/react-query'
import { useEffect, useId } from 'react'
import { useForm } from 'react-hook-form'
import { useNavigate } from 'react-router-dom'
import { z } from 'zod'
import { Button } from '#client/components/ui/button.tsx'
import { Dialog } from '#client/components/ui/dialog.tsx'
import { Field } from '#client/components/ui/field.tsx'
import { Notice } from '#client/components/ui/notice.tsx'
import { Select } from '#client/components/ui/select.tsx'
import { TextInput } from '#client/components/ui/text-input.tsx'
import { useCreateDesign } from '#client/features/designs/hooks/use-design-changes.ts'
import { projectQueries } from '#client/features/designs/queries.ts'
import { ApiError } from '#client/lib/api.ts'
import { showProblem } from '#client/lib/form-problem.ts'
import { limits } from '#shared/limits.ts'
import { createDesignSchema } from '#shared/schemas/design.ts'
import { line } from '#shared/schemas/text.ts'

const newProject = 'new'
const projectName = line('Project name', limits.nameLength)

/** The form's own shape: `project` is an id as text, or `new` with a name beside it. */
const formSchema = z
  .object({
    name: createDesignSchema.shape.name,
    project: z.string().min(1, { error: 'Choose a project.' }),
    projectName: z.string(),
  })
  .superRefine((form, context) => {
    if (form.project !== newProject) return
    const { error } = projectName.safeParse(form.projectName)
    for (const { message } of error?.issues ?? [])
      context.addIssue({ code: 'custom', path: ['projectName'], message })
  })

export interface CreateDesignDialogProps {
  open: boolean
  onOpenChange: (open: boolean) => void
  /** The project that the list is filtered by. */
  projectId?: number
}

export function CreateDesignDialog({ open, onOpenChange, projectId }: CreateDesignDialogProps) {
  const id = useId()
  const navigate = useNavigate()
  const projects = useQuery(projectQueries.list())
  const create = useCreateDesign()
  const form = useForm({
    resolver: zodResolver(formSchema),
    defaultValues: { name: '', project: '', projectName: '' },
  })
  const { errors, isSubmitting } = form.formState
  const none = projects.data?.length === 0
  useEffect(() => {
    if (open) form.reset({ name: '', project: none ? newProject : String(projectId ?? ''), projectName: '' })
  }, [open, none, projectId, form])

  const submit = form.handleSubmit(async (values) => {
    const project =
      values.project === newProject ? { name: values.projectName.trim() } : { id: Number(values.project) }
    try {
      const design = await create.mutateAsync({ name: values.name, project })
      onOpenChange(false)
      await navigate(`/designs/${design.id}/start-up`)
    } catch (error) {
      if (error instanceof ApiError && error.problem.code === 'name-taken')
        form.setError('projectName', { message: error.message }, { shouldFocus: true })
      else showProblem(form, error, ['name'])
    }
  })

  return (
    <Dialog
      title="New design"
      open={open}
      onOpenChange={onOpenChange}
      footer={
        <>
          <Button onClick={() => onOpenChange(false)}>Cancel</Button>
          <Button type="submit" form={id} variant="main" busy={isSubmitting}>
            Create design
          </Button>
        </>
      }
    >
      <form id={id} noValidate onSubmit={(event) => void submit(event)} className="flex flex-col gap-4">
        {errors.root?.message && <Notice tone="bad">{errors.root.message}</Notice>}
        {projects.isError && (
          <Notice tone="warn">The projects could not be loaded; a new one can still be named.</Notice>
        )}
        <Field label="Name" error={errors.name?.message} hint="Such as “1 kHz exciter, bare”." required>
          <TextInput autoComplete="off" {...form.register('name')} />
        </Field>
        <Field label="Project" error={errors.project?.message} required>
          <Select {...form.register('project')}>
            <option value="">Choose…</option>
            {projects.data?.map((project) => (
              <option key={project.id} value={project.id}>
                {project.name}
              </option>
            ))}
            <option value={newProject}>A new project</option>
          </Select>
        </Field>
        {form.watch('project') === newProject && (
          <Field label="Name of the new project" error={errors.projectName?.message} required>
            <TextInput autoComplete="off" {...form.register('projectName')} />
          </Field>
        )}
      </form>
    </Dialog>
  )
}
