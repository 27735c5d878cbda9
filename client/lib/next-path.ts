/** Where to go after signing in. Only paths of this application are followed, never another site. */
const home = '/designs'
const here = 'http://sinewright.invalid'

/** A path, query and fragment of this origin; anything else (other sites, `//host`, `javascript:`) gives the home page. */
export function safeNext(next: string | null): string {
  if (!next?.startsWith('/') || !URL.canParse(next, here)) return home
  const url = new URL(next, here)
  if (url.origin !== here) return home
  const path = `${url.pathname}${url.search}${url.hash}`
  // A pathname such as `//host`, left after dots were resolved, would name a host when followed.
  if (path.startsWith('//') || url.pathname === '/sign-in') return home
  return path
}

/** Address of the sign-in page that leads back to `path`. */
export function signInPath(path: string): string {
  return path === home || path === '/' ? '/sign-in' : `/sign-in?${new URLSearchParams({ next: path })}`
}
