/** Around every page, signed in or not: progress of a change of page and where focus goes after it. */
import { ScrollRestoration, Outlet, useNavigation } from 'react-router-dom'
import { useFocusOnNavigation } from '#client/app/use-focus-on-navigation.ts'

export function Root() {
  const busy = useNavigation().state !== 'idle'
  useFocusOnNavigation()
  return (
    <>
      {busy && (
        <div
          role="progressbar"
          aria-label="Loading page"
          className="late fixed inset-x-0 top-0 z-60 h-0.5 bg-copper"
        />
      )}
      <Outlet />
      <ScrollRestoration getKey={(location) => location.pathname} />
    </>
  )
}
