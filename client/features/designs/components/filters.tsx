import { useQuery } from '@tanstack/react-query'
import { Field } from '#client/components/ui/field.tsx'
import { Select } from '#client/components/ui/select.tsx'
import { TextInput } from '#client/components/ui/text-input.tsx'
import { RenameProject } from '#client/features/designs/components/rename-project.tsx'
import { projectQueries } from '#client/features/designs/queries.ts'
import { useIncludesRole } from '#client/lib/session.ts'
import { useSearchText } from '#client/lib/use-search-text.ts'
import { limits } from '#shared/limits.ts'
import type { ListDesigns } from '#shared/schemas/design.ts'

export interface FiltersProps {
  params: ListDesigns
  change: (part: Partial<ListDesigns>) => void
}

/** Search and filters of the list of designs; with a project chosen, the way to rename it. */
export function Filters({ params, change }: FiltersProps) {
  const [text, setText] = useSearchText(params.search, (search) => change({ search }))
  const projects = useQuery(projectQueries.list())
  const mayEdit = useIncludesRole('engineer')
  const project = projects.data?.find(({ id }) => id === params.projectId)
  return (
    <div
      role="search"
      className="grid grid-cols-2 gap-3 border-b border-line p-4 items-end sm:grid-cols-[minmax(12rem,24rem)_minmax(10rem,16rem)_10rem_auto]"
    >
      <Field label="Search" className="max-sm:col-span-2">
        <TextInput
          type="search"
          placeholder="Design or project"
          maxLength={limits.nameLength}
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
      </Field>
      <Field label="Project">
        <Select
          value={params.projectId ?? ''}
          onChange={(event) => change({ projectId: Number(event.target.value) || undefined })}
        >
          <option value="">All projects</option>
          {projects.data?.map((project) => (
            <option key={project.id} value={project.id}>
              {project.name}
            </option>
          ))}
        </Select>
      </Field>
      <Field label="Show">
        <Select
          value={params.archived}
          onChange={(event) => change({ archived: event.target.value === 'true' ? 'true' : 'false' })}
        >
          <option value="false">Current</option>
          <option value="true">Archived</option>
        </Select>
      </Field>
      {mayEdit && project && <RenameProject key={project.id} project={project} />}
    </div>
  )
}
