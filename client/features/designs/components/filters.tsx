import { useQuery } from '@tanstack/react-query'
import { useEffect, useRef, useState } from 'react'
import { Field } from '#client/components/ui/field.tsx'
import { Select } from '#client/components/ui/select.tsx'
import { TextInput } from '#client/components/ui/text-input.tsx'
import { projectQueries } from '#client/features/designs/queries.ts'
import { useDebounced } from '#client/lib/use-debounced.ts'
import { limits } from '#shared/limits.ts'
import type { ListDesigns } from '#shared/schemas/design.ts'

const searchRest = 300

export interface FiltersProps {
  params: ListDesigns
  change: (part: Partial<ListDesigns>) => void
}

/** The search as it is typed; the address follows once typing rests, and typing follows the address (back, links). */
function useSearchText({ params, change }: FiltersProps) {
  const [text, setText] = useState(params.search)
  const rested = useDebounced(text, searchRest)
  const stated = useRef(params.search)
  useEffect(() => {
    const wanted = rested.trim()
    if (wanted === stated.current) return
    stated.current = wanted
    change({ search: wanted })
    // Only a rest in typing is a reason to search; `change` is new on every draw.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [rested])
  useEffect(() => {
    if (params.search === stated.current) return
    stated.current = params.search
    setText(params.search)
  }, [params.search])
  return [text, setText] as const
}

export function Filters({ params, change }: FiltersProps) {
  const [text, setText] = useSearchText({ params, change })
  const projects = useQuery(projectQueries.list())
  return (
    <div
      role="search"
      className="grid grid-cols-2 gap-3 border-b border-line p-4 sm:grid-cols-[minmax(12rem,24rem)_minmax(10rem,16rem)_10rem]"
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
    </div>
  )
}
