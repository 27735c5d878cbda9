/** What every page may rely on: the cache of server state and the live region for short messages. */
import { QueryClientProvider, type QueryClient } from '@tanstack/react-query'
import type { ReactNode } from 'react'
import { StatusProvider } from '#client/components/ui/status.tsx'

export function Providers({ queryClient, children }: { queryClient: QueryClient; children: ReactNode }) {
  return (
    <QueryClientProvider client={queryClient}>
      <StatusProvider>{children}</StatusProvider>
    </QueryClientProvider>
  )
}
