import { Button } from '#client/components/ui/button.tsx'
import type { Page } from '#shared/schemas/paging.ts'

export interface PagerProps {
  /** The page that is shown, of whatever items. */
  list: Pick<Page<unknown>, 'page' | 'pageSize' | 'total'>
  onPage: (page: number) => void
  /** What is counted, one of it: "design". */
  noun: string
}

/** Steps through a list page by page and says where one is. */
export function Pager({ list: { page, pageSize, total }, onPage, noun }: PagerProps) {
  const pages = Math.max(1, Math.ceil(total / pageSize))
  const first = total === 0 ? 0 : (page - 1) * pageSize + 1
  const last = Math.min(total, page * pageSize)
  const range = first === last ? first : `${first}–${last}`
  return (
    <nav
      aria-label={`Pages of ${noun}s`}
      className="flex flex-wrap items-center justify-between gap-3 text-sm"
    >
      <p className="text-soft">
        {range} of {total} {total === 1 ? noun : `${noun}s`}
      </p>
      {pages > 1 && (
        <div className="flex items-center gap-2">
          <Button disabled={page <= 1} onClick={() => onPage(page - 1)}>
            Previous
          </Button>
          <span className="text-soft">
            page {page} of {pages}
          </span>
          <Button disabled={page >= pages} onClick={() => onPage(page + 1)}>
            Next
          </Button>
        </div>
      )}
    </nav>
  )
}
