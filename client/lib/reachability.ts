/** Whether the server answers. `api.ts` reports it; the shell shows it and asks again until it does. */
import { useSyncExternalStore } from 'react'

let reachable = true
const listeners = new Set<() => void>()

export function reportReachable(now: boolean): void {
  if (now === reachable) return
  reachable = now
  for (const listener of listeners) listener()
}

export function isReachable(): boolean {
  return reachable
}

export function subscribeReachable(listener: () => void): () => void {
  listeners.add(listener)
  return () => void listeners.delete(listener)
}

/** False from the first request that got no answer until the next one that does. */
export function useReachable(): boolean {
  return useSyncExternalStore(subscribeReachable, isReachable)
}
