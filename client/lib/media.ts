/** Media queries as values; where the environment has none (tests), nothing matches. */
import { useMemo, useSyncExternalStore } from 'react'

export interface MediaValue {
  matches: () => boolean
  subscribe: (listener: () => void) => () => void
}

export function mediaQuery(query: string): MediaValue {
  if (typeof window === 'undefined' || !window.matchMedia)
    return { matches: () => false, subscribe: () => () => undefined }
  const list = window.matchMedia(query)
  return {
    matches: () => list.matches,
    subscribe: (listener) => {
      list.addEventListener('change', listener)
      return () => list.removeEventListener('change', listener)
    },
  }
}

export function useMedia(query: string): boolean {
  const value = useMemo(() => mediaQuery(query), [query])
  return useSyncExternalStore(value.subscribe, value.matches)
}

/** Below this width lists become cards. */
export const phone = '(max-width: 639px)'
