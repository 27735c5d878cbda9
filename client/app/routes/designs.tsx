import type { LoaderFunctionArgs } from 'react-router-dom'
import { designQueries, projectQueries } from '#client/features/designs/queries.ts'
import { parseListParams } from '#client/lib/list-params.ts'
import { queryClient } from '#client/lib/query-client.ts'
import { listDesignsSchema } from '#shared/schemas/design.ts'

export { DesignsPage as Component } from '#client/features/designs/designs-page.tsx'

/** Starts both requests at once; the page shows their progress. */
export function loader({ request }: LoaderFunctionArgs) {
  const params = parseListParams(listDesignsSchema, new URL(request.url).searchParams)
  void queryClient.prefetchQuery(designQueries.list(params))
  void queryClient.prefetchQuery(projectQueries.list())
  return null
}
