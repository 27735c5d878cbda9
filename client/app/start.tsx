/** Puts the application into the page. */
import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { RouterProvider } from 'react-router-dom'
import { Providers } from '#client/app/providers.tsx'
import { createRouter } from '#client/app/router.tsx'
import { queryClient } from '#client/lib/query-client.ts'
import { startTheme } from '#client/lib/theme.ts'

export function start(element: HTMLElement): void {
  startTheme()
  createRoot(element).render(
    <StrictMode>
      <Providers queryClient={queryClient}>
        <RouterProvider router={createRouter(queryClient)} />
      </Providers>
    </StrictMode>,
  )
}
