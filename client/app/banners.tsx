/** Lines under the header: what this installation is, and whether the server is there. */
import { useQuery } from '@tanstack/react-query'
import { api } from '#client/lib/api.ts'
import { useReachable } from '#client/lib/reachability.ts'
import { useSession } from '#client/lib/session.ts'

const askAgainAfter = 3000

export function DemoBanner() {
  if (useSession().mode !== 'demo') return null
  return <p className="gutter border-b border-hair bg-sunk py-1 text-sm text-soft">Demo: invented data</p>
}

/** While the server is away, asks for its health until it answers; everything typed stays in the page. */
export function OfflineBanner() {
  const away = !useReachable()
  useQuery({
    queryKey: ['health'],
    queryFn: ({ signal }) => api.get('/health', { signal }),
    enabled: away,
    retry: false,
    gcTime: 0,
    refetchInterval: askAgainAfter,
  })
  return (
    <div role="status">
      {away && (
        <p className="gutter border-b border-warn/40 bg-warn-wash py-2 font-medium">
          The server cannot be reached. What you typed stays in this page; trying again…
        </p>
      )}
    </div>
  )
}
