import { useQuery } from '@tanstack/react-query'
import { Field } from '#client/components/ui/field.tsx'
import { Select } from '#client/components/ui/select.tsx'
import { TextInput } from '#client/components/ui/text-input.tsx'
import { runQueries } from '#client/features/runs/queries.ts'
import { useSession } from '#client/lib/session.ts'
import { useSearchText } from '#client/lib/use-search-text.ts'
import { limits } from '#shared/limits.ts'
import type { ListRuns, RunSummary } from '#shared/schemas/run.ts'

interface Option {
  id: number
  name: string
}

/** Options by name, each once, the chosen one among them even when no list names it. */
function optionsOf(known: readonly Option[], chosen: number | undefined, noun: string): Option[] {
  const byId = new Map(known.map((option) => [option.id, option]))
  if (chosen !== undefined && !byId.has(chosen)) byId.set(chosen, { id: chosen, name: `${noun} ${chosen}` })
  return [...byId.values()].sort((a, b) => a.name.localeCompare(b.name))
}

interface FilterProps {
  label: string
  anything: string
  options: readonly Option[]
  value: number | undefined
  onChange: (id: number | undefined) => void
}

function Filter({ label, anything, options, value, onChange }: FilterProps) {
  return (
    <Field label={label} className="basis-52 max-sm:grow">
      <Select
        value={value ?? ''}
        onChange={(event) => onChange(event.target.value ? Number(event.target.value) : undefined)}
      >
        <option value="">{anything}</option>
        {options.map((option) => (
          <option key={option.id} value={option.id}>
            {option.name}
          </option>
        ))}
      </Select>
    </Field>
  )
}

export interface RunFiltersProps {
  params: ListRuns
  /** The runs shown: their designs and authors can be filtered by. */
  shown: readonly RunSummary[]
  onChange: (changes: Partial<ListRuns>) => void
}

/** Search and filters of the list of runs. */
export function RunFilters({ params, shown, onChange }: RunFiltersProps) {
  const [text, setText] = useSearchText(params.search, (search) => onChange({ search }))
  const designs = useQuery(runQueries.designs())
  const { person } = useSession()
  const shownDesigns = shown.map((run) => run.design)
  const authors = [...shown.map((run) => run.author), { id: person.id, name: `${person.name} (you)` }]
  return (
    <div role="search" className="flex flex-wrap gap-3 border-b border-hair px-4 py-3">
      <Field label="Search titles, notes and designs" className="min-w-48 grow basis-64">
        <TextInput
          type="search"
          maxLength={limits.nameLength}
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
      </Field>
      <Filter
        label="Design"
        anything="Any design"
        options={optionsOf([...(designs.data?.items ?? []), ...shownDesigns], params.designId, 'Design')}
        value={params.designId}
        onChange={(designId) => onChange({ designId })}
      />
      <Filter
        label="Saved by"
        anything="Anyone"
        options={optionsOf(authors, params.authorId, 'Person')}
        value={params.authorId}
        onChange={(authorId) => onChange({ authorId })}
      />
    </div>
  )
}
