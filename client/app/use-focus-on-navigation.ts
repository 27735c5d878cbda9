import { useEffect, useRef } from 'react'
import { useLocation } from 'react-router-dom'

/** Pages of one design share their frame: moving between them is no change of place. */
function place(pathname: string): string {
  return pathname.split('/').slice(1, 3).join('/')
}

/**
 * After a change of page, focus goes to its <main>, so that keyboard and screen reader start at the new content. Not on
 * the first page, which the browser handles, nor between the pages of one design, whose links stay.
 */
export function useFocusOnNavigation(): void {
  const { pathname } = useLocation()
  const here = place(pathname)
  const before = useRef(here)
  useEffect(() => {
    if (before.current === here) return
    before.current = here
    document.querySelector('main')?.focus({ preventScroll: true })
  }, [here])
}
