import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { Link } from 'react-router-dom'
import { Button } from '#client/components/ui/button.tsx'
import { Dialog } from '#client/components/ui/dialog.tsx'
import { ErrorState } from '#client/components/ui/error-state.tsx'
import { Field } from '#client/components/ui/field.tsx'
import { Loading } from '#client/components/ui/loading.tsx'
import { TextInput } from '#client/components/ui/text-input.tsx'
import { comparePath } from '#client/features/runs/lib/pick.ts'
import { runQueries } from '#client/features/runs/queries.ts'
import { formatAge } from '#client/lib/dates.ts'
import { useSearchText } from '#client/lib/use-search-text.ts'

/** Runs offered at a time; the search finds the rest. */
const offered = 8

function Choices({ runId, search }: { runId: number; search: string }) {
  const list = useQuery(runQueries.list({ search, pageSize: offered + 1 }))
  if (list.isPending) return <Loading label="Loading runs" />
  if (list.error) return <ErrorState error={list.error} retry={() => void list.refetch()} />
  const others = list.data.items.filter((run) => run.id !== runId).slice(0, offered)
  if (others.length === 0)
    return (
      <p className="py-6 text-center text-soft">
        {search ? 'No other run matches.' : 'There is no other run yet.'}
      </p>
    )
  return (
    <ul aria-label="Runs" className="divide-y divide-hair">
      {others.map((run) => (
        <li key={run.id}>
          <Link
            to={comparePath(runId, run.id)}
            className="block rounded-sm px-2 py-2 text-ink no-underline hover:bg-petrol-wash"
          >
            <span className="font-medium text-petrol wrap-anywhere">{run.title}</span>
            <span className="block text-sm text-soft">
              {run.design.name} · {run.author.name} · {formatAge(run.createdAt)}
            </span>
          </Link>
        </li>
      ))}
    </ul>
  )
}

/** "Compare with…": finds the second run. */
export function ComparePicker({ runId }: { runId: number }) {
  const [open, setOpen] = useState(false)
  const [search, setSearch] = useState('')
  const [text, setText] = useSearchText(search, setSearch)
  return (
    <>
      <Button onClick={() => setOpen(true)}>Compare with…</Button>
      <Dialog title="Compare with" open={open} onOpenChange={setOpen}>
        <Field label="Search titles, notes and designs" className="mb-2">
          <TextInput type="search" value={text} onChange={(event) => setText(event.target.value)} />
        </Field>
        <Choices runId={runId} search={search} />
      </Dialog>
    </>
  )
}
