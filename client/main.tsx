/** Starts the browser application. */
import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { RouterProvider } from 'react-router-dom'
import { z } from 'zod'
import { Providers } from '#client/app/providers.tsx'
import { createRouter } from '#client/app/router.tsx'
import { queryClient } from '#client/lib/query-client.ts'
import { startTheme } from '#client/lib/theme.ts'
import './styles.css'

// The content security policy forbids `new Function`, which zod would otherwise probe.
z.config({ jitless: true })
startTheme()

const root = document.getElementById('root')
if (!root) throw new Error('index.html has no #root')

createRoot(root).render(
  <StrictMode>
    <Providers queryClient={queryClient}>
      <RouterProvider router={createRouter(queryClient)} />
    </Providers>
  </StrictMode>,
)
