/** Every address of the application. Pages load when they are first opened. */
import type { QueryClient } from '@tanstack/react-query'
import { createBrowserRouter, redirect, type RouteObject } from 'react-router-dom'
import { requireSession } from '#client/app/guard.ts'
import { RouteError } from '#client/app/route-error.tsx'
import { Root } from '#client/app/root.tsx'
import { Shell } from '#client/app/shell.tsx'
import { Loading } from '#client/components/ui/loading.tsx'

const pages: RouteObject[] = [
  { path: '/designs', lazy: () => import('#client/app/routes/designs.tsx') },
  {
    path: '/designs/:designId',
    lazy: () => import('#client/app/routes/design-sheet.tsx'),
    children: [
      {
        index: true,
        element: null,
        loader: ({ request }) => redirect(`${new URL(request.url).pathname.replace(/\/$/, '')}/start-up`),
      },
      { path: 'start-up', lazy: () => import('#client/app/routes/start-up.tsx') },
      { path: 'tone', lazy: () => import('#client/app/routes/tone.tsx') },
    ],
  },
  { path: '/runs', lazy: () => import('#client/app/routes/runs.tsx') },
  { path: '/runs/compare', lazy: () => import('#client/app/routes/compare-runs.tsx') },
  { path: '/runs/:runId', lazy: () => import('#client/app/routes/run.tsx') },
  { path: '/account', lazy: () => import('#client/app/routes/account.tsx') },
  { path: '*', lazy: () => import('#client/app/routes/not-found.tsx') },
]

/** The route tree; tests mount it in a memory router. */
export function createRoutes(queryClient: QueryClient): RouteObject[] {
  return [
    {
      Component: Root,
      ErrorBoundary: RouteError,
      HydrateFallback: () => <Loading label="Loading Sinewright" className="min-h-dvh" />,
      children: [
        { path: '/sign-in', lazy: () => import('#client/app/routes/sign-in.tsx') },
        {
          Component: Shell,
          ErrorBoundary: RouteError,
          middleware: [requireSession(queryClient)],
          // Without a loader of its own the guard would not run for pages that load nothing.
          loader: () => null,
          children: [
            { path: '/', element: null, loader: () => redirect('/designs') },
            { ErrorBoundary: RouteError, children: pages },
          ],
        },
      ],
    },
  ]
}

export function createRouter(queryClient: QueryClient) {
  return createBrowserRouter(createRoutes(queryClient), { future: { v8_middleware: true } })
}
